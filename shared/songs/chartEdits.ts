import { type Chart, type ChartLine, parseChart } from "./chart";
import type { ChartToken } from "./chordLine";
import { expandTabs } from "./reflow";

/**
 * A place on a line of a chart, both counted from 0: the row of the words (of the chords, where a line has no words),
 * and the column in it, tabs counted out to the next multiple of eight.
 */
export interface ChartSpot {
  row: number;
  column: number;
}

/** A line of a chart with the rows of the text that it takes up, counted from 0; null where it has none of that kind. */
export interface RowedLine {
  line: ChartLine;
  /** index of its section in the chart */
  section: number;
  /** its first row */
  start: number;
  chordRow: number | null;
  wordRow: number | null;
}

/** A run of signs without a blank in a chord line. */
interface Run {
  column: number;
  text: string;
}

/**
 * The lines of a chart with the rows they stand on.
 *
 * @param chart any chart
 * @returns its lines in reading order; headings are no lines
 */
export function rowedLines(chart: Chart): RowedLine[] {
  const lines: RowedLine[] = [];
  let row = 0;
  chart.sections.forEach((part, section) => {
    if (part.heading !== null) row += 1;
    for (const line of part.lines) {
      const start = row;
      const chordRow = "chords" in line ? row : null;
      if (line.kind === "sung" || line.kind === "chords") row += 1;
      const worded = line.kind === "sung" || line.kind === "lyrics";
      lines.push({ line, section, start, chordRow, wordRow: worded ? row : null });
      if (line.kind !== "chords") row += 1;
    }
  });
  return lines;
}

/**
 * Puts a chord over a place in the words; one that stands exactly there is replaced. Where signs would run into each
 * other, blanks go in between two words, so that every other chord keeps its syllable.
 *
 * @param text a chart
 * @param spot where the chord is to stand
 * @param symbol the chord, as it is to be written
 * @returns the new text; null where there is no line to put it on, no room in the middle of a word, or where the line
 *   would not be read as chords any more
 * @example placeChord("Low tide and still", { row: 0, column: 4 }, "Am") // => "    Am\nLow tide and still"
 */
export function placeChord(text: string, spot: ChartSpot, symbol: string): string | null {
  const found = lineAt(text, spot.row);
  if (found === null || symbol.trim() === "" || /\s/.test(symbol) || spot.column < 0) return null;
  const { written, words, tokens } = found;
  const old = tokens.find((token) => token.column === spot.column);
  const runs = old
    ? runsOf(written.slice(0, old.column) + inPlaceOf(old, symbol) + written.slice(old.column + old.text.length))
    : runsOf(written);
  if (old) spread(runs, runsOf(written));
  else if (runs.some((run) => run.column === spot.column)) return null;
  else runs.push({ column: spot.column, text: symbol });
  const laid = lay(runs, words);
  return laid && checked(found, laid, symbol);
}

/**
 * Takes a chord away; all else stays where it is. A chord line that is left empty goes with it.
 *
 * @param text a chart
 * @param spot where the chord stands
 * @returns the new text; null if no sign stands there
 * @example removeChord("    Am\nLow tide", { row: 1, column: 4 }) // => "Low tide"
 */
export function removeChord(text: string, spot: ChartSpot): string | null {
  const found = lineAt(text, spot.row);
  const token = found?.tokens.find(({ column }) => column === spot.column);
  if (!found || !token) return null;
  const { written } = found;
  const blank = " ".repeat(token.text.length);
  const left = (written.slice(0, token.column) + blank + written.slice(token.column + token.text.length)).trimEnd();
  return withLine(found, left, found.words);
}

/**
 * Moves a chord along its line. It never passes or touches another sign.
 *
 * @param text a chart
 * @param spot where the chord stands
 * @param by characters to the right, negative to the left
 * @returns the new text and where the chord stands now; null if no chord stands there or there is no room
 * @example nudgeChord("G\nLow tide", { row: 1, column: 0 }, 4) // => { text: "    G\nLow tide", column: 4 }
 */
export function nudgeChord(text: string, spot: ChartSpot, by: number): { text: string; column: number } | null {
  const found = lineAt(text, spot.row);
  const token = found?.tokens.find(({ column }) => column === spot.column);
  if (!found || !token) return null;
  const column = spot.column + by;
  const others = runsOf(found.written).filter((run) => run.column !== spot.column || run.text !== token.text);
  const apart = others.every((run) => run.column + run.text.length < column || run.column > column + token.text.length);
  const passed = others.some((run) => run.column > spot.column !== run.column > column);
  if (column < 0 || passed || !apart || others.length === runsOf(found.written).length) return null;
  const laid = lay([...others, { column, text: token.text }], found.words);
  const moved = laid && checked(found, laid, token.text);
  return moved === null ? null : { text: moved, column };
}

/** One line of a text, taken out with its tabs counted out. */
interface FoundLine {
  rows: string[];
  chordRow: number | null;
  wordRow: number | null;
  written: string;
  words: string;
  tokens: readonly ChartToken[];
}

function lineAt(text: string, row: number): FoundLine | null {
  const rows = text.replace(/\r\n?/g, "\n").split("\n");
  const found = rowedLines(parseChart(text)).find(({ wordRow, chordRow }) => (wordRow ?? chordRow) === row);
  if (!found) return null;
  const { chordRow, wordRow } = found;
  for (const each of [chordRow, wordRow]) if (each !== null) rows[each] = expandTabs(rows[each] ?? "");
  const [again] = rowedLines(
    parseChart([chordRow, wordRow].flatMap((at) => (at === null ? [] : [rows[at]])).join("\n")),
  );
  return {
    rows,
    chordRow,
    wordRow,
    written: chordRow === null ? "" : rows[chordRow]!,
    words: wordRow === null ? "" : rows[wordRow]!,
    tokens: again && "chords" in again.line ? again.line.chords : [],
  };
}

function withLine({ rows, chordRow, wordRow }: FoundLine, written: string, words: string): string {
  return rows
    .flatMap((row, index) => {
      if (index === chordRow) return written === "" ? [] : [written];
      if (index !== wordRow) return [row];
      return chordRow === null && written !== "" ? [written, words] : [words];
    })
    .join("\n");
}

/** The new text, if the line is still read as chords that hold the symbol. */
function checked(found: FoundLine, laid: { written: string; words: string }, symbol: string): string | null {
  const row = found.wordRow ?? found.chordRow ?? 0;
  const now = withLine(found, laid.written, laid.words);
  const at = row + (found.chordRow === null ? 1 : 0);
  const line = rowedLines(parseChart(now)).find(({ wordRow, chordRow }) => (wordRow ?? chordRow) === at)?.line;
  return line && "chords" in line && line.chords.some((token) => token.text.includes(symbol)) ? now : null;
}

/** A new symbol keeps the brackets and marks of the old one. */
function inPlaceOf(old: ChartToken, symbol: string): string {
  return old.chord ? old.text.replace(old.chord.text, () => symbol) : symbol;
}

function runsOf(written: string): Run[] {
  return [...written.matchAll(/\S+/g)].map((match) => ({ column: match.index, text: match[0] }));
}

/** Gives runs whose texts changed in place the columns that they had. */
function spread(runs: Run[], before: readonly Run[]): void {
  runs.forEach((run, index) => {
    run.column = before[index]?.column ?? run.column;
  });
}

/** Writes runs over words; null where one would have to leave its syllable. */
function lay(runs: readonly Run[], lyrics: string): { written: string; words: string } | null {
  let written = "";
  let words = lyrics;
  let shift = 0;
  let previous = -1;
  for (const run of [...runs].sort((a, b) => a.column - b.column)) {
    let column = run.column + shift;
    const missing = previous < 0 ? 0 : written.length + 1 - column;
    if (missing > 0) {
      if (column < words.trimEnd().length) {
        const place = gapBetween(words, previous, column);
        if (place === null) return null;
        words = words.slice(0, place) + " ".repeat(missing) + words.slice(place);
      }
      shift += missing;
      column += missing;
    }
    written = written.padEnd(column) + run.text;
    previous = column;
  }
  return { written, words };
}

/** The last place between two words that lies behind one column and not behind another; null if there is none. */
function gapBetween(words: string, after: number, upTo: number): number | null {
  for (let place = upTo; place > after; place -= 1) if (words[place - 1] === " " || words[place] === " ") return place;
  return null;
}
