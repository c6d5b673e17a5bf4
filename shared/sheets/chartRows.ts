import { glyphs } from "../music/pitch";
import type { Chart, ChartLine } from "../songs/chart";
import type { ChartToken } from "../songs/chordLine";
import { expandTabs } from "../songs/reflow";
import type { SectionKind } from "../songs/sectionKind";

/** A sign over the words: a chord, or what else stands on a line of chords. */
export interface RowSign {
  column: number;
  /** accidentals as glyphs where it is a chord */
  text: string;
  chord: boolean;
  /** the chord's number in its key; null where none is wanted or it has none */
  number: string | null;
}

/** A row of a chart on paper or on stage: its signs stand over the words of the same row, column by column. */
export interface ChartRow {
  kind: "heading" | "sung" | "chords" | "lyrics" | "remark" | "blank";
  words: string;
  signs: RowSign[];
  /** which part of the chart, from 0, and what it is */
  part: number;
  partKind: SectionKind | null;
  /** goes on with the line of the row before */
  continued: boolean;
}

type Laid = Pick<ChartRow, "kind" | "words" | "signs" | "continued">;

/**
 * Cuts a chart into rows of at most so many columns. A chord is never parted from its syllable, nor cut.
 *
 * @param chart any chart, chords named as they are to be read
 * @param columns columns of a row, at least 1; a chord longer than that is cut all the same
 * @param numberOf the number of a chord as it is named in this chart; without it rows have none
 * @returns rows; one blank row between parts, and never two in a row
 * @throws RangeError if columns is less than 1
 */
export function chartRows(chart: Chart, columns: number, numberOf?: (chord: string) => string | null): ChartRow[] {
  if (!(columns >= 1)) throw new RangeError("a row has at least one column");
  const rows = chart.sections.flatMap(({ heading, label, kind, lines }, part) => {
    const title = heading === null ? [] : wrapWords("heading", (label ?? heading).trim(), columns);
    const own = lines.flatMap((line) => rowsOf(line, columns, numberOf));
    return [...(part > 0 ? [blank] : []), ...title, ...own].map((row): ChartRow => ({ ...row, part, partKind: kind }));
  });
  const used = rows.findLastIndex(({ kind }) => kind !== "blank") + 1;
  // One blank row says as much as a hundred.
  return rows.slice(0, used).filter((row, k) => row.kind !== "blank" || (k > 0 && rows[k - 1]?.kind !== "blank"));
}

/**
 * The signs of a row as one line of letters.
 *
 * @param row any row
 * @returns its signs at their columns
 */
export function signLine({ signs }: Pick<ChartRow, "signs">): string {
  return signs.reduce((line, { column, text }) => line.padEnd(column) + text, "");
}

const blank: Laid = { kind: "blank", words: "", signs: [], continued: false };

function rowsOf(line: ChartLine, columns: number, numberOf: ((chord: string) => string | null) | undefined): Laid[] {
  switch (line.kind) {
    case "sung":
      return wrap("sung", expandTabs(line.lyrics).trimEnd(), signsOf(line, numberOf), columns);
    case "chords":
      return wrap("chords", "", signsOf(line, numberOf), columns);
    case "lyrics":
      return wrapWords("lyrics", expandTabs(line.lyrics).trimEnd(), columns);
    case "comment":
      return wrapWords("remark", expandTabs(line.text).trim(), columns);
    default:
      return [blank];
  }
}

/** All that stands on a line of chords, what stands between the signs that were read included; tabs counted out. */
function signsOf(
  { written, chords }: { written: string; chords: readonly ChartToken[] },
  numberOf: ((chord: string) => string | null) | undefined,
): RowSign[] {
  const signs: RowSign[] = [];
  const place = (column: number) => expandTabs(written.slice(0, column)).length;
  const between = (from: number, to: number) => {
    for (const { 0: text, index } of written.slice(from, to).matchAll(/\S+/g))
      signs.push({ column: place(from + index), text, chord: false, number: null });
  };
  let end = 0;
  for (const { column, text, chord } of chords) {
    between(end, column);
    const shown = text.trimEnd();
    signs.push({
      column: place(column),
      text: chord ? glyphs(shown) : shown,
      chord: chord !== null,
      number: chord ? (numberOf?.(chord.text) ?? null) : null,
    });
    end = column + text.length;
  }
  between(end, written.length);
  return signs;
}

function wrapWords(kind: ChartRow["kind"], words: string, columns: number): Laid[] {
  return wrap(kind, words, [], columns);
}

/** Cuts words and signs at the same columns, between words where there is room for it. */
function wrap(kind: ChartRow["kind"], words: string, signs: readonly RowSign[], columns: number): Laid[] {
  const rows: Laid[] = [];
  const ends = signs.map(({ column, text }) => column + text.length);
  const length = Math.max(words.length, ...ends.slice(-1), 0);
  let start = 0;
  let next = 0;
  do {
    const end = length - start <= columns ? length : cut(words, signs, next, start, start + columns);
    const own: RowSign[] = [];
    for (let sign = signs[next]; sign && sign.column < end; sign = signs[next]) {
      const rest = sign.text.slice(Math.max(0, end - sign.column));
      own.push({ ...sign, column: sign.column - start, text: sign.text.slice(0, sign.text.length - rest.length) });
      next += 1;
      if (rest === "") continue;
      // A sign longer than a row: what is left of it stands in the next one.
      const cutOff = { ...sign, column: end, text: rest, number: null };
      rows.push(rowOf(kind, words.slice(start, end), own, start > 0));
      return [...rows, ...remainder(kind, words, [cutOff, ...signs.slice(next)], end, columns)];
    }
    rows.push(rowOf(kind, words.slice(start, end), own, start > 0));
    start = end;
    const upTo = Math.min(signs[next]?.column ?? length, length);
    while (start < upTo && /^\s?$/.test(words.charAt(start))) start += 1;
  } while (start < length);
  return rows;
}

/** What is left of a sung line may be words alone, or chords alone. */
function rowOf(kind: ChartRow["kind"], text: string, signs: RowSign[], continued: boolean): Laid {
  const words = text.trimEnd();
  const alone = kind !== "sung" ? kind : signs.length === 0 ? "lyrics" : words === "" ? "chords" : kind;
  return { kind: alone, words, signs, continued };
}

function remainder(kind: ChartRow["kind"], words: string, signs: readonly RowSign[], from: number, columns: number) {
  const moved = signs.map((sign) => ({ ...sign, column: sign.column - from }));
  return wrap(kind, words.slice(from), moved, columns).map((row) => ({ ...row, continued: true }));
}

/** The last column before `most` at which neither a sign nor a word is cut; failing that, no sign; failing that, `most`. */
function cut(words: string, signs: readonly RowSign[], next: number, start: number, most: number): number {
  const near: RowSign[] = [];
  for (let k = next; k < signs.length && signs[k]!.column < most; k += 1) near.push(signs[k]!);
  const cutsSign = (at: number) => near.some(({ column, text }) => column < at && at < column + text.length);
  const cutsWord = (at: number) => /\S/.test(words.charAt(at - 1)) && /\S/.test(words.charAt(at));
  for (let at = most; at > start; at -= 1) if (!cutsSign(at) && !cutsWord(at)) return at;
  for (let at = most; at > start; at -= 1) if (!cutsSign(at)) return at;
  return most;
}
