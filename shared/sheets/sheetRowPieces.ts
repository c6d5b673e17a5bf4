import { glyphs } from "../music/pitch";
import type { ChartRow } from "./chartRows";
import type { PlacedRow } from "./rowPages";
import type { SheetPiece } from "./sheetPiece";
import { cellWidth, textPiece } from "./textPiece";

/** Heights in parts of the letters' size. */
const heights: Readonly<Record<ChartRow["kind"], number>> = {
  heading: 1.3,
  sung: 2.72,
  chords: 1.7,
  lyrics: 1.5,
  remark: 1.4,
  blank: 0.85,
};
/** What a line of numbers over the chords adds. */
const numberHeight = 0.85;
const numberSize = 0.68;

/**
 * How high a row of the chart is.
 *
 * @param row any row
 * @param size of the letters, px
 * @returns px
 */
export function rowHeight(row: Pick<ChartRow, "kind" | "signs">, size: number): number {
  return (heights[row.kind] + (hasNumbers(row) ? numberHeight : 0)) * size;
}

/**
 * A row of the chart on paper: its words, and every sign on its column over them.
 *
 * @param placed the row and where it stands
 * @param size of the letters, px
 * @param at left edge of the chart, and upper edge of the room for rows, px
 * @returns its pieces
 */
export function rowPieces({ row, top }: PlacedRow, size: number, at: { x: number; y: number }): SheetPiece[] {
  const y = at.y + top + (hasNumbers(row) ? numberHeight * size : 0);
  const words = (line: number, tone: "ink" | "soft" = "ink") =>
    row.words === "" ? [] : [textPiece(row.words, { x: at.x, y: y + line * size, size, face: "mono", tone })];
  if (row.kind === "blank") return [];
  if (row.kind === "heading") return [heading(row.words, { x: at.x, y: y + 0.9 * size }, size)];
  if (row.kind === "remark") return words(1, "soft");
  if (row.kind === "lyrics") return words(1.1);
  const signs = row.signs.flatMap(({ column, text, chord, number }): SheetPiece[] => {
    const x = at.x + column * cellWidth * size;
    const named = textPiece(text, { x, y: y + 1.17 * size, size, face: "monoBold", tone: chord ? "plum" : "soft" });
    if (number === null) return [named];
    const over = { x, y: y + 0.2 * size, size: size * numberSize, face: "mono", tone: "soft" } as const;
    return [textPiece(number, over), named];
  });
  return [...signs, ...words(2.235)];
}

function heading(words: string, { x, y }: { x: number; y: number }, size: number): SheetPiece {
  const times = words.replace(/\(?\b[x×]\s?(\d{1,2})\)?$/i, "×$1");
  return textPiece(glyphs(times), { x, y, size: size * 0.85, face: "title", tone: "soft", role: "heading" });
}

function hasNumbers({ signs }: Pick<ChartRow, "signs">): boolean {
  return signs.some(({ number }) => number !== null);
}
