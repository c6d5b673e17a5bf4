import type { Chart, ChartLine } from "@/shared/songs/chart";
import { rowedLines } from "@/shared/songs/chartEdits";

/** A part of a chart as it is drawn: no blank lines at its ends. */
export interface ShownSection {
  label: string | null;
  lines: readonly ChartLine[];
}

/** A line longer than so many letters takes up the room of several. */
const lettersInLine = 80;

/** The first lines of a chart, how many these are, and how many more there are, headings among them. There is always one, however long it is. */
export function firstLines(chart: Chart, most: number): { sections: ShownSection[]; shown: number; rest: number } {
  const sections: ShownSection[] = [];
  let room = most;
  let shown = 0;
  let rest = 0;
  for (const { label, lines } of chart.sections) {
    const used = lines.slice(firstUsed(lines), lastUsed(lines) + 1);
    const named = label !== null;
    const opens = room > 0 && (named || used.length > 0);
    // A heading takes a line too, so that thousands of bare ones are not drawn at once.
    if (opens && used.length === 0) room -= 1;
    let fits = 0;
    while (fits < used.length && room > 0) {
      room -= Math.max(1, Math.ceil(writtenIn(used[fits]!).length / lettersInLine));
      fits += 1;
    }
    if (opens) sections.push({ label, lines: fits === used.length ? used : used.slice(0, fits) });
    shown += fits;
    rest += opens || !named ? used.length - fits : used.length + 1;
  }
  return { sections, shown, rest };
}

/** A line as it is drawn: which section of those shown, and which line in it. */
export interface ShownPlace {
  section: number;
  line: number;
}

/** Where a row of the text, counted from 0, is drawn; null for a heading, a blank row at an end, and behind the end. */
export function shownPlace(chart: Chart, row: number): ShownPlace | null {
  const rowed = rowedLines(chart);
  const found = rowed.find((line) => line.start === row || line.chordRow === row || line.wordRow === row);
  if (!found) return null;
  let shown = -1;
  for (const [index, { label, lines }] of chart.sections.entries()) {
    const from = firstUsed(lines);
    const to = lastUsed(lines);
    if (label !== null || to >= from) shown += 1;
    if (index !== found.section) continue;
    const line = lines.indexOf(found.line);
    return line >= from && line <= to ? { section: shown, line: line - from } : null;
  }
  return null;
}

/** Whether two lines look the same; what was read from them follows from what is written. */
export function sameLine(one: ChartLine, other: ChartLine): boolean {
  return one === other || (one.kind === other.kind && writtenIn(one) === writtenIn(other));
}

export function sameLines(one: readonly ChartLine[], other: readonly ChartLine[]): boolean {
  return one.length === other.length && one.every((line, index) => sameLine(line, other[index]!));
}

function writtenIn(line: ChartLine): string {
  switch (line.kind) {
    case "sung":
      return `${line.written}\n${line.lyrics}`;
    case "chords":
      return line.written;
    case "lyrics":
      return line.lyrics;
    default:
      return line.text;
  }
}

function firstUsed(lines: readonly ChartLine[]): number {
  const index = lines.findIndex((line) => line.kind !== "blank");
  return index < 0 ? lines.length : index;
}

function lastUsed(lines: readonly ChartLine[]): number {
  return lines.reduce((last, line, index) => (line.kind === "blank" ? last : index), -1);
}
