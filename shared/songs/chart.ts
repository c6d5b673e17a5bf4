import { parseChord, transposeChord } from "../music/chord";
import { type KeyName, tonicPitchClass } from "../music/keyName";
import type { NoteNaming } from "../music/noteNaming";
import { type ChartToken, readChordLine } from "./chordLine";
import { reflow } from "./reflow";
import { leadingLabel, readSectionName, sectionHeading, timesAlone } from "./sectionHeading";
import type { SectionKind } from "./sectionKind";

/**
 * One line of a chart; a sung line is two lines of text, chords over words.
 * `written` is the chord line exactly as it stands, `chords` what was read from it.
 */
export type ChartLine =
  | { kind: "sung"; written: string; chords: ChartToken[]; lyrics: string }
  | { kind: "chords"; written: string; chords: ChartToken[] }
  | { kind: "lyrics"; lyrics: string }
  | { kind: "comment"; text: string }
  | { kind: "blank"; text: string };

/** A verse, a chorus …; label null for what stands before the first heading. */
interface ChartSection {
  label: string | null;
  /** the heading's line as written; null without heading, or where it stands on the first line of chords */
  heading: string | null;
  lines: ChartLine[];
  /** null without label */
  kind: SectionKind | null;
  /** 2 for "Verse 2"; null without */
  number: number | null;
  /** how often it is played in a row */
  times: number;
  /** where only a heading stands: which section (from 0) it asks for again; null if it has lines or nothing earlier fits */
  recalls: number | null;
}

/** A sign on a chord line that could not be read; it is kept as it is. Line and column count from 1, as editors show them. */
export interface UnreadSign {
  line: number;
  column: number;
  text: string;
}

/** A song's words with their chords. */
export interface Chart {
  sections: ChartSection[];
  unread: UnreadSign[];
  /** how its writer calls notes; English where nothing is said */
  naming?: NoteNaming;
  /** its line breaks in order, where any of them is not "\n" */
  breaks?: readonly string[];
}

const comment =
  /^\s*(?:#(?![#\d])|\/\/|;|(?:capo|key|tempo|tuning|time|strum|note|artist|title|words|music|bpm)(?:\s+by)?\s*[:=]|capo\s*(?:on|at)?\s*\d)/i;
const tabulature = /^\s*[A-Ga-g][#b]?\s*[|:][-\d|:hpbrstx()/\\~^<>* ]{0,400}--/;

/**
 * Reads a chart in the usual layout, chords over words. Any text is a chart: nothing is lost, and
 * printChart gives it back character by character.
 *
 * @param text the chart as typed or pasted
 * @param options `naming`: how its writer calls notes
 * @returns its sections, and the signs on chord lines that could not be read
 */
export function parseChart(text: string, { naming = "english" }: { naming?: NoteNaming } = {}): Chart {
  const breaks = text.match(/\r\n?|\n/g) ?? [];
  const rows = text.split(/\r\n?|\n/).map((row) => readRow(row, naming));
  const sections: ChartSection[] = [];
  const open = (label: string | null, heading: string | null): ChartSection => {
    const { kind, number, times } = label === null ? nameless : readSectionName(label);
    const section = { label, heading, lines: [], kind, number, times, recalls: null };
    sections.push(section);
    return section;
  };
  for (let index = 0; index < rows.length; index += 1) {
    const row = rows[index]!;
    if (row.kind === "heading") {
      open(row.label, row.text);
      continue;
    }
    const section =
      row.kind === "chords" && row.label !== null ? open(row.label, null) : (sections.at(-1) ?? open(null, null));
    if (row.kind !== "chords") {
      section.lines.push(row);
      continue;
    }
    const { written, chords } = row;
    const below = rows[index + 1];
    if (below?.kind === "lyrics") {
      section.lines.push({ kind: "sung", written, chords, lyrics: below.lyrics });
      index += 1;
    } else section.lines.push({ kind: "chords", written, chords });
  }
  return {
    sections: withRepeats(sections),
    unread: listUnread(sections),
    ...(naming === "english" ? {} : { naming }),
    ...(breaks.every((sign) => sign === "\n") ? {} : { breaks }),
  };
}

/**
 * Writes a chart as text, chords over words.
 *
 * @param chart any chart
 * @returns its text; lines that were added to one with other line breaks than "\n" get its first kind
 */
export function printChart({ sections, breaks }: Chart): string {
  const rows = sections.flatMap(({ heading, lines }) => [
    ...(heading === null ? [] : [heading]),
    ...lines.flatMap(printLine),
  ]);
  if (!breaks) return rows.join("\n");
  return rows.map((row, index) => (index === 0 ? row : (breaks[index - 1] ?? breaks[0] ?? "\n") + row)).join("");
}

/**
 * The chords of a chart.
 *
 * @param chart any chart
 * @returns each chord symbol once, as written, in order of first appearance
 */
export function chartChords(chart: Chart): string[] {
  const symbols = chartTokens(chart).flatMap((token) => (token.chord ? [token.chord.text] : []));
  return [...new Set(symbols)];
}

/**
 * All signs on the chord lines of a chart.
 *
 * @param chart any chart
 * @returns the signs in reading order
 */
export function chartTokens(chart: Chart): ChartToken[] {
  return chart.sections.flatMap((section) => section.lines.flatMap((line) => ("chords" in line ? line.chords : [])));
}

/**
 * Moves a chart into another key. Every chord stays over its syllable: where a longer symbol would run into the next
 * one, blanks are put between the words. Words, headings and unread signs stay as they are.
 *
 * @param chart any chart
 * @param from the key it is written in
 * @param to the key to move it to; its mode decides the spelling
 * @returns the moved chart
 * @throws RangeError if a tonic is no note name
 */
export function transposeChart(chart: Chart, from: KeyName, to: KeyName): Chart {
  const semitones = (tonicPitchClass(to.tonic) - tonicPitchClass(from.tonic) + 12) % 12;
  const { naming = "english" } = chart;
  const move = (token: ChartToken): ChartToken => {
    const bare = token.chord?.text;
    const symbol = token.chord ? transposeChord(token.chord, semitones, to, from, naming) : "";
    return bare === undefined
      ? token
      : { ...token, text: token.text.replace(bare, () => symbol), chord: parseChord(symbol, naming) };
  };
  const sections = chart.sections.map((section) => ({
    ...section,
    lines: section.lines.map((line): ChartLine => {
      if (line.kind !== "sung" && line.kind !== "chords") return line;
      const laid = reflow(line.written, line.chords, line.chords.map(move), line.kind === "sung" ? line.lyrics : "");
      return line.kind === "sung"
        ? { kind: "sung", ...laid }
        : { kind: "chords", written: laid.written, chords: laid.chords };
    }),
  }));
  return { ...chart, sections, unread: listUnread(sections) };
}

type Row =
  | { kind: "heading"; label: string; text: string }
  | { kind: "chords"; label: string | null; written: string; chords: ChartToken[] }
  | Extract<ChartLine, { kind: "lyrics" | "comment" | "blank" }>;

const nameless = { kind: null, number: null, times: 1 };

/** Lines that only say how often the part above is played, and headings that only call an earlier part back. */
function withRepeats(sections: ChartSection[]): ChartSection[] {
  const bare = ({ lines }: ChartSection) => lines.every(({ kind }) => kind === "blank" || kind === "comment");
  const latest = new Map<string, number>();
  return sections.map((section, index) => {
    const last = section.lines.findLast(({ kind }) => kind !== "blank");
    const counted = last?.kind === "comment" ? timesAlone(last.text) : null;
    const times = counted !== null && section.times === 1 ? counted : section.times;
    if (section.label === null) return { ...section, times };
    const { name, kind, number } = readSectionName(section.label);
    const anyOfKind = `any ${kind}`;
    if (bare(section)) {
      const same = latest.get(name) ?? (kind === "own" || number !== null ? undefined : latest.get(anyOfKind));
      return { ...section, times, recalls: same ?? null };
    }
    latest.set(name, index).set(anyOfKind, index);
    return { ...section, times };
  });
}

function readRow(row: string, naming: NoteNaming): Row {
  if (row.trim() === "") return { kind: "blank", text: row };
  if (timesAlone(row) !== null || comment.test(row) || tabulature.test(row)) return { kind: "comment", text: row };
  const heading = sectionHeading(row);
  const lead = leadingLabel(row);
  const chords = readChordLine(row.slice(lead?.length ?? 0), naming);
  // "[Am]" is a chord in brackets, "[Chorus]" a heading.
  if (heading !== null && !chords) return { kind: "heading", label: heading, text: row };
  if (!chords) return { kind: "lyrics", lyrics: row };
  const placed = chords.map((token) => ({ ...token, column: token.column + (lead?.length ?? 0) }));
  return { kind: "chords", label: lead?.label ?? null, written: row, chords: placed };
}

function printLine(line: ChartLine): string[] {
  switch (line.kind) {
    case "sung":
      return [line.written, line.lyrics];
    case "chords":
      return [line.written];
    case "lyrics":
      return [line.lyrics];
    default:
      return [line.text];
  }
}

function listUnread(sections: readonly ChartSection[]): UnreadSign[] {
  const unread: UnreadSign[] = [];
  let row = 1;
  for (const section of sections) {
    if (section.heading !== null) row += 1;
    for (const line of section.lines) {
      for (const token of "chords" in line ? line.chords : []) {
        if (token.kind === "unread") unread.push({ line: row, column: token.column + 1, text: token.text });
      }
      row += printLine(line).length;
    }
  }
  return unread;
}
