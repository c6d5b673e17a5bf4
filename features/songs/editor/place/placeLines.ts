import { glyphs } from "@/shared/music/pitch";
import { parseChart } from "@/shared/songs/chart";
import { rowedLines, type ChartSpot } from "@/shared/songs/chartEdits";
import type { ChartToken } from "@/shared/songs/chordLine";
import { expandTabs } from "@/shared/songs/reflow";
import { syllableStarts } from "@/shared/songs/syllables";

/** One place of a line that a chord can stand over. */
export interface PlaceCell {
  column: number;
  /** the syllable, without blanks; "" over blanks, behind the words and on a line of chords alone */
  text: string;
  /** the whole word that it is a syllable of, without the stops around it */
  word: string;
  /** blanks behind it */
  gap: number;
  chord: ChartToken | null;
}

/** A line as one places chords on it. */
export interface PlaceLine {
  kind: "line";
  /** the row that its places are counted in */
  row: number;
  /** pieces that stay together: words, or single signs */
  words: PlaceCell[][];
}

export type PlaceItem =
  PlaceLine | { kind: "heading"; row: number; text: string } | { kind: "remark"; row: number; text: string };

/** The text with all tabs counted out, as places are counted in it. */
export function withoutTabs(text: string): string {
  return text.includes("\t") ? text.split("\n").map(expandTabs).join("\n") : text;
}

/** A row of chords longer than this is none: behind it, no chord could be placed. */
const longest = 2000;

/** A chart as headings and lines of places. */
export function placeItems(text: string): PlaceItem[] {
  const chart = parseChart(withoutTabs(text));
  const items: PlaceItem[] = [];
  let section = -1;
  for (const { line, section: at, chordRow, wordRow } of rowedLines(chart)) {
    for (; section < at; section += 1) {
      const label = chart.sections[section + 1]!.label;
      if (label !== null) items.push({ kind: "heading", row: -1, text: label });
    }
    const row = wordRow ?? chordRow;
    if (line.kind === "comment") items.push({ kind: "remark", row: -1, text: line.text.trim() });
    else if (row !== null) {
      const words = "lyrics" in line ? line.lyrics : "";
      items.push({ kind: "line", row, words: wordsOf(words.slice(0, longest), "chords" in line ? line.chords : []) });
      if (words.length > longest)
        items.push({ kind: "remark", row: -1, text: `${words.slice(longest, longest + 40)}…` });
    }
  }
  return items;
}

function wordsOf(lyrics: string, chords: readonly ChartToken[]): PlaceCell[][] {
  const end = Math.max(lyrics.trimEnd().length, ...chords.map(({ column, text }) => column + text.length));
  // Behind the last word, a place for a chord that is played after it.
  const behind = end === 0 ? 0 : end + 1;
  const starts = [...new Set([...syllableStarts(lyrics), ...chords.map(({ column }) => column), behind])];
  starts.sort((a, b) => a - b);
  const words: PlaceCell[][] = [];
  const over = new Map([...chords].reverse().map((chord) => [chord.column, chord]));
  let inside = false;
  starts.forEach((column, index) => {
    const piece = lyrics.slice(column, starts[index + 1] ?? lyrics.length);
    const text = piece.trim();
    const cell: PlaceCell = {
      column,
      text,
      word: wordAround(lyrics, column),
      gap: piece.length - piece.trimEnd().length,
      chord: over.get(column) ?? null,
    };
    if (inside) words.at(-1)!.push(cell);
    else words.push([cell]);
    // A piece that ends in the middle of a word goes on in the next one; the place behind the words stays with the last.
    const next = starts[index + 1];
    inside = (text !== "" && cell.gap === 0 && next !== undefined) || next === behind;
  });
  return words;
}

function wordAround(lyrics: string, column: number): string {
  if ((lyrics[column] ?? " ") === " ") return "";
  const start = lyrics.lastIndexOf(" ", column) + 1;
  const end = lyrics.indexOf(" ", start);
  const word = lyrics.slice(start, end < 0 ? undefined : end);
  return word.replace(/^[^\p{L}\p{N}]+|[^\p{L}\p{N}]+$/gu, "");
}

/** Where a place is, in words: "“har” of harbour, line 3". Lines count from 1, as the text does. */
function spotWords({ column: _, ...cell }: PlaceCell, row: number): string {
  const line = `line ${row + 1}`;
  const syllable = cell.text.replace(/^[^\p{L}\p{N}]+|[^\p{L}\p{N}]+$/gu, "");
  if (syllable === "")
    return cell.word === "" && cell.text === "" ? `after the words, ${line}` : `“${cell.text}”, ${line}`;
  return syllable === cell.word ? `“${syllable}”, ${line}` : `“${syllable}” of ${cell.word}, ${line}`;
}

/** A place with the chord that stands there, as it is spoken. */
export function cellWords(cell: PlaceCell, row: number): string {
  const spot = spotWords(cell, row);
  if (!cell.chord) return spot;
  return `${glyphs(cell.chord.text)} ${spot.startsWith("after") ? spot : `over ${spot}`}`;
}

export function cellAt(items: readonly PlaceItem[], spot: ChartSpot | null): PlaceCell | null {
  if (spot === null) return null;
  const line = items.find((item): item is PlaceLine => item.kind === "line" && item.row === spot.row);
  return line?.words.flat().find(({ column }) => column === spot.column) ?? null;
}
