import type { SheetStrokes } from "./sheet";
import type { SheetLine, SheetPicture } from "./sheetPiece";
import { textPiece } from "./textPiece";

/** Height of a line of strokes, px. */
export const strokesHeight = 46;

const spoken = { down: "down", up: "up", pluck: "pluck one string", bass: "bass string" } as const;

/**
 * What the right hand does in a bar as a line of arrows over the count: down, up, a ring for a plucked string, a dot for
 * the bass; strong strokes are thicker.
 *
 * @param strokes the pattern
 * @param at upper left corner, and how wide the bar may be drawn, px
 * @returns the picture with the pattern in words
 */
export function strokesPicture(
  { beats, quarters, strokes }: SheetStrokes,
  at: { x: number; y: number; width: number },
): SheetPicture {
  const inset = 10;
  const beat = quarters / beats;
  const x = (time: number) => at.x + inset + (time / quarters) * (at.width - inset);
  const count = (time: number) => {
    const place = time / beat;
    if (Math.abs(place - Math.round(place)) < 0.01) return String(Math.round(place) + 1);
    return Math.abs((place % 1) - 0.5) < 0.01 ? "+" : "·";
  };
  const pieces: SheetPicture["pieces"] = [];
  for (const { at: time, kind, strong } of strokes) {
    const [middle, width] = [x(time), strong ? 2.4 : 1.4];
    const label = count(time);
    const tip = { x: middle, y: at.y + 42, size: 12, face: "mono", tone: "ink", anchor: "middle" } as const;
    if (kind === "down") pieces.push(...arrow(middle, at.y + 2, at.y + (strong ? 24 : 19), width));
    else if (kind === "up") pieces.push(...arrow(middle, at.y + 24, at.y + 7, width));
    else if (kind === "pluck")
      pieces.push({ kind: "dot", x: middle, y: at.y + 15, radius: 4.3, stroke: width, tone: "ink" });
    else pieces.push({ kind: "dot", x: middle, y: at.y + 20, radius: 4.3, stroke: null, tone: "ink" });
    pieces.push(textPiece(label, tip));
  }
  const words = strokes.map(({ at: time, kind }) => `${spoken[kind]} on ${sayCount(count(time))}`).join(", ");
  return { kind: "picture", what: "strokes", words: `Right hand, each bar: ${words}`, pieces };
}

function sayCount(count: string): string {
  return count === "+" ? "the half" : count === "·" ? "the part" : count;
}

function arrow(x: number, from: number, to: number, width: number): SheetLine[] {
  const back = to > from ? -5 : 5;
  const line = (x1: number, y1: number, x2: number, y2: number): SheetLine => {
    return { kind: "line", x1, y1, x2, y2, width, tone: "ink" };
  };
  return [line(x, from, x, to), line(x - 4, to + back, x, to), line(x + 4, to + back, x, to)];
}
