import { median } from "../signal/median";
import { parseChart } from "./chart";

/** What taps on a beat tell. */
export interface TappedTempo {
  /** beats a minute, whole */
  tempo: number;
  /** counted half or twice as fast; null outside 20 to 400 */
  half: number | null;
  double: number | null;
  /** taps that the tempo comes from */
  beats: number;
  /** how far a tap usually strays, as a share of a beat */
  spread: number;
}

/** A pause this long begins a new count. */
const longestBeatS = 3;
/** Intervals this far from the middle one are slips: a beat missed or tapped twice. */
const slip = 0.3;
/** A tap this soon after another, as a share of the usual time between two, is the same beat. */
const bounce = 0.35;
const leastBeats = 4;
const tempoRange = { low: 20, high: 400 };

/**
 * The tempo of somebody tapping along: the middle of the time between taps, without the beats that were missed or tapped
 * twice.
 *
 * @param taps times of the taps in seconds, ascending
 * @returns the tempo; null for fewer than four taps in a row, and where they have no common tempo
 * @example tempoOfTaps([0, 0.5, 1, 1.5, 2]).tempo // => 120
 */
export function tempoOfTaps(taps: readonly number[]): TappedTempo | null {
  const since = taps.findLastIndex((time, k) => k > 0 && time - taps[k - 1]! > longestBeatS);
  const run = taps.slice(Math.max(0, since));
  if (run.length < leastBeats) return null;
  const usual = median(gapsOf(run));
  const gaps = gapsOf(run.filter((time, k) => k === 0 || time - run[k - 1]! > bounce * usual));
  if (gaps.length < leastBeats - 1) return null;
  const middle = median(gaps);
  const even = gaps.filter((gap) => Math.abs(gap / middle - 1) <= slip);
  if (even.length === 0) return null;
  // The mean of what is even is steadier than one gap; the median only says which gaps those are.
  const beat = even.reduce((sum, gap) => sum + gap, 0) / even.length;
  const tempo = Math.round(60 / beat);
  if (tempo < tempoRange.low || tempo > tempoRange.high) return null;
  const spread = median(even.map((gap) => Math.abs(gap / beat - 1)));
  return { tempo, half: within(Math.round(tempo / 2)), double: within(tempo * 2), beats: even.length + 1, spread };
}

/** Names of the parts that can be marked. */
export const partNames = ["Intro", "Verse", "Chorus", "Bridge", "Solo", "Outro"] as const;
/** One of them. */
export type PartName = (typeof partNames)[number];

/** A part that began at a moment while somebody listened. */
export interface PartMark {
  name: PartName;
  /** seconds from when the listening began */
  atS: number;
}

/** A part of a song's form. */
export interface FormPart {
  /** "Verse 2" where there are several; "Chorus" is the same each time */
  label: string;
  atS: number;
  seconds: number;
  /** whole bars; null while there is no tempo */
  bars: number | null;
}

/** Verses differ in words and are counted; the other parts come back as they were. */
const counted = new Set<PartName>(["Verse"]);

/**
 * The form of a song from marks made while listening.
 *
 * @param marks the parts in order, times ascending
 * @param endS when the song ended, seconds; not before the last mark
 * @param beat beats a minute and beats in a bar; null while no tempo is known
 * @returns the parts with their lengths
 * @throws RangeError if the times do not ascend or the beat is not positive
 */
export function formParts(
  marks: readonly PartMark[],
  endS: number,
  beat: { tempo: number; beatsPerBar: number } | null,
): FormPart[] {
  if (beat && !(beat.tempo > 0 && beat.beatsPerBar > 0)) throw new RangeError("a beat must be positive");
  const verses = marks.filter(({ name }) => counted.has(name)).length;
  let verse = 0;
  return marks.map(({ name, atS }, k) => {
    const seconds = (marks[k + 1]?.atS ?? endS) - atS;
    if (seconds < 0) throw new RangeError("parts come one after the other");
    if (counted.has(name)) verse += 1;
    const bars = beat && Math.max(1, Math.round((seconds * beat.tempo) / 60 / beat.beatsPerBar));
    return { label: counted.has(name) && verses > 1 ? `${name} ${verse}` : name, atS, seconds, bars };
  });
}

/**
 * The form in one line: "Intro 4 bars, Verse 1 8 bars".
 *
 * @param parts a form
 * @returns the line, parts joined by " · ", without a mark that makes it a comment
 * @example formLine([{ label: "Intro", atS: 0, seconds: 8, bars: 4 }]) // => "Intro (4 bars)"
 */
export function formLine(parts: readonly FormPart[]): string {
  return parts.map(headingOf).join(" · ");
}

/** How a form went into a chart. */
export interface SketchedChart {
  text: string;
  /**
   * skeleton: the chart was empty and is now its headings. headed: its blocks got the headings. noted: it keeps its own
   * parts, and the form stands in a comment at its head.
   */
  how: "skeleton" | "headed" | "noted";
}

const noteStart = "# Form as heard: ";

/**
 * Writes a form into a chart. Nothing of the chart is lost: an empty one becomes the headings, one without headings gets
 * them where its blocks are as many as the parts (each part once where it comes back), any other keeps its own.
 *
 * @param chart chart text
 * @param parts the form, at least one part
 * @returns the chart with its form, and what was done
 * @throws RangeError for a form without parts
 */
export function sketchIntoChart(chart: string, parts: readonly FormPart[]): SketchedChart {
  if (parts.length === 0) throw new RangeError("a form has parts");
  const note = `${noteStart}${formLine(parts)}`;
  const rest = chart
    .replace(/\r\n?/g, "\n")
    .split("\n")
    .filter((line) => !line.startsWith(noteStart))
    .join("\n");
  if (rest.trim() === "") return { text: parts.map((part) => `${headingOf(part)}\n`).join("\n"), how: "skeleton" };
  const { sections } = parseChart(rest);
  const blocks = blocksOf(rest);
  const once = parts.filter((part, k) => parts.findIndex(({ label }) => label === part.label) === k);
  const headings = [parts, once].find(({ length }) => length === blocks.length);
  if (sections.some(({ label }) => label !== null) || !headings) return { text: `${note}\n${rest}`, how: "noted" };
  const headed = blocks.map((block, k) => `${headingOf(headings[k]!)}\n${block}`).join("\n\n");
  return { text: headings === parts ? headed : `${note}\n${headed}`, how: "headed" };
}

function headingOf({ label, bars }: FormPart): string {
  return bars === null ? label : `${label} (${bars} ${bars === 1 ? "bar" : "bars"})`;
}

function blocksOf(text: string): string[] {
  return text
    .split(/\n[ \t]*\n(?:[ \t]*\n)*/)
    .map((block) => block.replace(/^\n+|\n+$/g, ""))
    .filter((block) => block.trim() !== "");
}

function gapsOf(times: readonly number[]): number[] {
  return times.slice(1).map((time, k) => time - times[k]!);
}

function within(tempo: number): number | null {
  return tempo >= tempoRange.low && tempo <= tempoRange.high ? tempo : null;
}
