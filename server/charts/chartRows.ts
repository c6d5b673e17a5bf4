import { type ChartLine, parseChart } from "../../shared/songs/chart";
import { glyphs } from "../../shared/music/pitch";
import { expandTabs } from "../../shared/songs/reflow";

/** A row of a printed chart: chords stand over the words of the same row, column by column. */
export interface ChartRow {
  kind: "heading" | "sung" | "chords" | "lyrics" | "remark" | "blank";
  chords: string;
  words: string;
}

interface Taken {
  from: number;
  to: number;
}

/** A chart cut into rows of at most so many columns; a chord is never parted from its syllable, nor cut. */
export function chartRows(text: string, columns: number): ChartRow[] {
  const plain = text.split("\n").map(expandTabs).join("\n");
  const rows = parseChart(plain).sections.flatMap(({ heading, lines }) => [
    ...(heading === null ? [] : wrapWords("heading", heading.trim(), columns)),
    ...lines.flatMap((line) => rowsOf(line, columns)),
  ]);
  // One blank row says as much as a hundred.
  return rows.filter((row, k) => row.kind !== "blank" || (k > 0 && rows[k - 1]?.kind !== "blank"));
}

function rowsOf(line: ChartLine, columns: number): ChartRow[] {
  switch (line.kind) {
    case "sung":
      return wrapPair("sung", line, line.lyrics, columns);
    case "chords":
      return wrapPair("chords", line, "", columns);
    case "lyrics":
      return wrapWords("lyrics", line.lyrics.trimEnd(), columns);
    case "comment":
      return wrapWords("remark", line.text.trimEnd(), columns);
    default:
      return [{ kind: "blank", chords: "", words: "" }];
  }
}

function wrapWords(kind: ChartRow["kind"], text: string, columns: number): ChartRow[] {
  return wrap("", text, [], columns).map(({ words }) => ({ kind, chords: "", words }));
}

function wrapPair(
  kind: "sung" | "chords",
  { written, chords }: Extract<ChartLine, { chords: unknown }>,
  lyrics: string,
  columns: number,
): ChartRow[] {
  const taken = chords.map(({ column, text }) => ({ from: column, to: column + text.length }));
  let shown = written;
  for (const { column, text, chord } of chords)
    if (chord) shown = shown.slice(0, column) + glyphs(text) + shown.slice(column + text.length);
  return wrap(shown.trimEnd(), lyrics.trimEnd(), taken, columns).map((row) => ({ kind, ...row }));
}

/** Cuts both lines at the same columns, between words where there is room for it. */
function wrap(chords: string, words: string, taken: readonly Taken[], columns: number) {
  const rows: { chords: string; words: string }[] = [];
  const length = Math.max(chords.length, words.length);
  let start = 0;
  do {
    const end = length - start <= columns ? length : cut(words, taken, start, start + columns);
    rows.push({ chords: chords.slice(start, end), words: words.slice(start, end) });
    start = end;
    while (start < length && /^\s?$/.test(chords.charAt(start)) && /^\s?$/.test(words.charAt(start))) start += 1;
  } while (start < length);
  return rows;
}

/** The last column before `most` at which neither a chord nor a word is cut; failing that, no chord; failing that, `most`. */
function cut(words: string, taken: readonly Taken[], start: number, most: number): number {
  const near = taken.filter(({ from, to }) => to > start && from < most);
  const cutsChord = (at: number) => near.some(({ from, to }) => from < at && at < to);
  const cutsWord = (at: number) => /\S/.test(words.charAt(at - 1)) && /\S/.test(words.charAt(at));
  for (let at = most; at > start; at -= 1) if (!cutsChord(at) && !cutsWord(at)) return at;
  for (let at = most; at > start; at -= 1) if (!cutsChord(at)) return at;
  return most;
}
