import { parseChord } from "../music/chord";
import { glyphs } from "../music/pitch";
import { gridHeight, gridPicture, gridWidth } from "./gridPicture";
import { type PlacedRow, rowPages } from "./rowPages";
import { letterSizes, paperSizes, type Sheet, type SheetChord, type SheetOptions } from "./sheet";
import { sheetRows } from "./sheetChart";
import { firstHead, laterHead, namingWords } from "./sheetHead";
import type { SheetPicture, SheetPiece } from "./sheetPiece";
import { rowHeight, rowPieces } from "./sheetRowPieces";
import { strokesHeight, strokesPicture } from "./strokesPicture";
import { cellWidth, textPiece, wrapText } from "./textPiece";
import { tuneHeight, tuneInVoice } from "./tuneInVoice";

/** Margins of the paper, the aside and the gap beside it, px. */
const margin = { top: 38, side: 56, bottom: 28 } as const;
const asideWidth = 164;
const gap = 28;
const footHeight = 32;
const gridGap = 12;
/** Grids that would reach lower than this share of the page stand at the side after all. */
const mostBand = 0.55;

/** One page of a sheet: everything on it with its place, in px from the upper left corner. */
export interface SheetPage {
  /** from 1 */
  number: number;
  of: number;
  width: number;
  height: number;
  pieces: SheetPiece[];
  /** the rows of the chart on it, placed from the top of their room */
  rows: PlacedRow[];
}

/** A stretch of the aside that is never parted. */
interface AsideBlock {
  height: number;
  draw: (at: { x: number; y: number }) => SheetPiece[];
}

/**
 * Lays a sheet out on paper. Screen, print and PDF draw what it gives and nothing else, so that all three agree.
 *
 * @param sheet what is to be played
 * @param options paper and what is shown
 * @returns its pages in order, at least one
 * @throws RangeError if a tonic is no note name
 */
export function sheetPages(sheet: Sheet, options: SheetOptions): SheetPage[] {
  const { width, height } = paperSizes[options.paper];
  const edges = { left: margin.side, right: width - margin.side };
  const size = letterSizes[options.letters];
  const blocks = asideBlocks(sheet, options);
  const head = firstHead(sheet, options, edges, margin.top);
  const across = gridBand(sheet, options, edges, head.bottom + 14);
  const onTop = options.grids === "top" && across.bottom <= mostBand * height;
  const band = onTop ? across : { pieces: [], bottom: 0 };
  const beside = options.grids !== "none" && !onTop && blocks.length > 0;
  const chartWidth = edges.right - edges.left - (beside ? asideWidth + gap : 0);
  const firstTop = Math.max(head.bottom, band.bottom) + 14;
  const later = laterHead(sheet, options, edges, margin.top);
  const topOf = (page: number) => (page === 0 ? firstTop : later.bottom + 14);
  const end = height - margin.bottom - footHeight;
  const rows = sheetRows(sheet, options, Math.max(1, Math.floor(chartWidth / (size * cellWidth) + 1e-6)));
  const chart = rowPages(
    rows,
    (row) => rowHeight(row, size),
    (page) => end - topOf(page),
  );
  const aside = beside ? asidePages(blocks, (page) => end - topOf(page)) : [];
  const of = Math.max(chart.length, aside.length);
  return Array.from({ length: of }, (_, page) => {
    const own = chart[page] ?? [];
    const top = topOf(page);
    return {
      number: page + 1,
      of,
      width,
      height,
      rows: own,
      pieces: [
        ...(page === 0 ? [...head.pieces, ...band.pieces] : later.pieces),
        ...chorusBars(own, { x: edges.left - 17.5, y: top }),
        ...own.flatMap((placed) => rowPieces(placed, size, { x: edges.left, y: top })),
        ...(aside[page] ?? []).flatMap(({ block, y }) => block.draw({ x: edges.right - asideWidth, y: top + y })),
        ...foot(sheet, options, edges, { y: height - margin.bottom - 24, number: page + 1, of }),
      ],
    };
  });
}

/** A bar beside each chorus, from its first row to its last on this page. */
function chorusBars(rows: readonly PlacedRow[], { x, y }: { x: number; y: number }): SheetPiece[] {
  const parts = new Map<number, { from: number; to: number }>();
  for (const { row, top, height } of rows) {
    if (row.partKind !== "chorus" || row.kind === "blank") continue;
    const known = parts.get(row.part);
    parts.set(row.part, { from: known?.from ?? top, to: top + height });
  }
  return [...parts.values()].map(({ from, to }) => ({
    kind: "line",
    ...{ x1: x, y1: y + from, x2: x, y2: y + to - 4, width: 3, tone: "plum" },
  }));
}

/** Chords that have a grid: real chords, each name once. */
function griddedChords({ chords, instrument }: Sheet, { shows }: SheetOptions) {
  if (!instrument) return [];
  const moved = instrument.capo > 0 || instrument.retune !== 0;
  const seen = new Set<string>();
  return chords.flatMap((chord: SheetChord) => {
    const key = `${chord.played} ${JSON.stringify(chord.shape?.frets)}`;
    if (parseChord(chord.played) === null || seen.has(key)) return [];
    seen.add(key);
    const name = glyphs(shows === "played" ? chord.played : chord.sounding);
    const sounds = shows === "played" && moved ? glyphs(chord.sounding) : null;
    return [{ chord, instrument, words: { name, sounds } }];
  });
}

function gridRow(row: ReturnType<typeof griddedChords>, leftHanded: boolean, pitch: number): AsideBlock {
  const height = Math.max(...row.map(({ chord, instrument }) => gridHeight(chord, instrument.strings.length)));
  return {
    height: height + gridGap,
    draw: ({ x, y }) =>
      row.map(({ chord, instrument, words }, k): SheetPicture => {
        return gridPicture(chord, words, instrument, leftHanded, { x: x + k * pitch, y });
      }),
  };
}

function inRows<Item>(items: readonly Item[], each: number): Item[][] {
  return Array.from({ length: Math.ceil(items.length / each) }, (_, k) => items.slice(k * each, (k + 1) * each));
}

function asideBlocks(sheet: Sheet, options: SheetOptions): AsideBlock[] {
  const grids = inRows(griddedChords(sheet, options), 2).map((row) => gridRow(row, options.leftHanded, gridWidth));
  const { strokes, tune, order } = sheet;
  const width = asideWidth - 10;
  if (grids.length === 0 && !strokes && !tune) return [];
  return [
    ...grids,
    ...(strokes
      ? [
          asideNote("Right hand, each bar", strokes.words, {
            height: strokesHeight,
            draw: (at) => strokesPicture(strokes, { ...at, width }),
          }),
        ]
      : []),
    ...(tune
      ? [
          asideNote("The tune in your voice", tune.words, {
            height: tuneHeight,
            draw: (at) => tuneInVoice(tune, { ...at, width }),
          }),
        ]
      : []),
    ...(order === "" ? [] : [asideNote("Order", order, null)]),
  ];
}

/** Something said in the aside: a heading, a picture where there is one, and the words under it. */
function asideNote(
  heading: string,
  said: string,
  picture: { height: number; draw: (at: { x: number; y: number }) => SheetPiece } | null,
): AsideBlock {
  const words = wrapText(said, "text", 13, asideWidth);
  const wordsAt = 34 + (picture ? picture.height + 14 : 8);
  return {
    height: wordsAt + 18 * words.length + 4,
    draw: ({ x, y }) => [
      textPiece(heading, { x, y: y + 24, size: 14, face: "title", tone: "soft", role: "heading" }),
      ...(picture ? [picture.draw({ x, y: y + 34 })] : []),
      ...words.map((line, k) => textPiece(line, { x, y: y + wordsAt + 18 * k, size: 13, face: "text", tone: "soft" })),
    ],
  };
}

/** Grids across the paper under the head, and the strokes behind them. */
function gridBand(sheet: Sheet, options: SheetOptions, { left, right }: { left: number; right: number }, top: number) {
  const each = Math.floor((right - left) / gridWidth);
  const pitch = (right - left - gridWidth) / (each - 1);
  const blocks = inRows(griddedChords(sheet, options), each).map((row) => gridRow(row, options.leftHanded, pitch));
  const pieces: SheetPiece[] = [];
  let y = top;
  for (const block of blocks) {
    pieces.push(...block.draw({ x: left, y }));
    y += block.height;
  }
  if (sheet.strokes) {
    pieces.push(strokesPicture(sheet.strokes, { x: left, y: y + 4, width: 240 }));
    y += strokesHeight + 12;
  }
  if (pieces.length === 0) return { pieces, bottom: 0 };
  pieces.push({ kind: "line", x1: left, y1: y, x2: right, y2: y, width: 1, tone: "line" });
  return { pieces, bottom: y };
}

/** The aside on as many pages as it needs; a block that is higher than a page stands at its top all the same. */
function asidePages(blocks: readonly AsideBlock[], roomOn: (page: number) => number) {
  const pages: { block: AsideBlock; y: number }[][] = [[]];
  let y = 0;
  for (const block of blocks) {
    if (y > 0 && y + block.height - gridGap > roomOn(pages.length - 1)) {
      pages.push([]);
      y = 0;
    }
    pages.at(-1)!.push({ block, y });
    y += block.height;
  }
  return pages;
}

function foot(
  sheet: Sheet,
  { shows }: SheetOptions,
  { left, right }: { left: number; right: number },
  { y, number, of }: { y: number; number: number; of: number },
): SheetPiece[] {
  const small = { size: 12, face: "text", tone: "soft" } as const;
  const mark: SheetPicture["pieces"] = [
    ...[0, 1, 2, 3].map((k) => {
      const height = y + 7 + 4.7 * k;
      return {
        kind: "line",
        x1: left + 1.8,
        y1: height,
        x2: left + 18.2,
        y2: height,
        width: 0.8,
        tone: "soft",
      } as const;
    }),
    { kind: "box", x: left + 6.5, y: y + 8.1, width: 7, height: 11.8, radius: 3.5, tone: "lagoon" },
  ];
  return [
    { kind: "line", x1: left, y1: y, x2: right, y2: y, width: 1, tone: "line" },
    { kind: "picture", what: "mark", words: "", pieces: mark },
    textPiece("Larkspan", { x: left + 26, y: y + 18, size: 13, face: "title", tone: "ink" }),
    ...(sheet.key
      ? [textPiece(namingWords(sheet, shows), { ...small, x: (left + right) / 2, y: y + 18, anchor: "middle" })]
      : []),
    textPiece(`Page ${number} of ${of}`, { ...small, x: right, y: y + 18, anchor: "end" }),
  ];
}
