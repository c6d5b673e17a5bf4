import type { MelodyNote } from "../melody";
import { syllableStarts } from "../syllables";
import type { Metre } from "./metre";
import type { PlayedPart } from "./playedParts";

/** The stretch of a tune that a line of the chart is sung to. */
export interface TuneLine {
  /** bars from the start of the tune */
  bar: number;
  bars: number;
  /** notes `from` up to, without, `to` */
  from: number;
  to: number;
}

/** Notes around the place that counting gives, among which the end of a line is looked for. */
const around = 4;
/** Part of a bar that may lead into a line. */
const mostLeadIn = 0.75;

/**
 * Finds for each line of the chart the notes it is sung to. A tune is most often written for one verse and the chorus:
 * how many parts it covers is told by its notes against their syllables; verses after the first share its tune.
 *
 * @param parts the chart as it is played
 * @param notes the tune in order, times in quarter notes
 * @param metre how it is counted
 * @returns for each part and line its notes; null for a line without words or that the tune says nothing about
 */
export function tuneOfLines(
  parts: readonly PlayedPart[],
  notes: readonly MelodyNote[],
  metre: Metre,
): (TuneLine | null)[][] {
  const found = parts.map(({ lines }) => lines.map((): TuneLine | null => null));
  if (notes.length === 0) return found;
  const sung = parts.map(({ lines }) => lines.map(({ words }) => (words === null ? 0 : syllableStarts(words).length)));
  const last = notes[notes.length - 1]!;
  const bars = Math.max(1, Math.ceil((last.start + last.duration) / metre.quarters - 1e-6));
  const covered = coverage(sung, notes.length, bars);
  if (covered === null) return found;
  const counts = sung
    .slice(0, covered)
    .flat()
    .filter((count) => count > 0);
  const stretches = divide(counts, notes, bars, metre);
  let next = 0;
  sung.slice(0, covered).forEach((counted, part) => {
    counted.forEach((count, line) => {
      if (count > 0) found[part]![line] = stretches[next++] ?? null;
    });
  });
  parts.forEach(({ tune }, part) => {
    if (part < covered) return;
    const size = found[part]!.length;
    const model = parts.findIndex((each, k) => k < covered && each.tune === tune && each.lines.length === size);
    if (model >= 0) found[part] = [...found[model]!];
  });
  return found;
}

/** How many parts the tune covers: as many as have about as many syllables as it has notes. */
function coverage(sung: readonly number[][], notes: number, bars: number): number | null {
  let best: { parts: number; cost: number } | null = null;
  let syllables = 0;
  let lines = 0;
  sung.forEach((counts, part) => {
    const here = counts.filter((count) => count > 0);
    syllables += here.reduce((sum, count) => sum + count, 0);
    lines += here.length;
    if (lines === 0 || lines > bars || lines > notes) return;
    const cost = Math.abs(Math.log(notes / syllables)) + (bars % lines === 0 ? 0 : 0.15);
    if (here.length > 0 && (!best || cost < best.cost - 1e-9)) best = { parts: part + 1, cost };
  });
  return (best as { parts: number } | null)?.parts ?? null;
}

/** Divides the tune among lines of so many syllables. */
function divide(counts: readonly number[], notes: readonly MelodyNote[], bars: number, metre: Metre): TuneLine[] {
  const syllables = counts.reduce((sum, count) => sum + count, 0);
  const firsts: number[] = [0];
  let before = 0;
  counts.slice(0, -1).forEach((count, k) => {
    before += count;
    const guess = Math.round((before * notes.length) / syllables);
    firsts.push(lineStart(notes, guess, firsts[k]! + 1, notes.length - (counts.length - 1 - k)));
  });
  const barOf = (note: number) => {
    const place = notes[note]!.start / metre.quarters;
    const into = place - Math.floor(place + 1e-6);
    // Notes that lead into a bar belong to the line that begins there.
    return into > 0.5 - 1e-6 ? Math.ceil(place) : Math.floor(place + 1e-6);
  };
  const counted = firsts.map((first, k) => (k === 0 ? 0 : barOf(first)));
  const even = counts.map((_, k) => Math.round((k * bars) / counts.length));
  const isEven = bars % counts.length === 0 && counted.every((bar, k) => Math.abs(bar - even[k]!) <= 1);
  const rising = counted.every((bar, k) => k === 0 || bar > counted[k - 1]!) && counted[counts.length - 1]! < bars;
  const starts = isEven || !rising ? even : counted;
  // A line begins with its first bar or with the notes, less than a bar, that lead into it.
  const inside = firsts.map((first, k) => {
    const barStart = starts[k]! * metre.quarters - 1e-6;
    const firstFrom = (quarters: number) => notes.findIndex(({ start }) => start >= quarters);
    const latest = firstFrom(barStart);
    const earliest = firstFrom(barStart - mostLeadIn * metre.quarters);
    return k === 0 ? 0 : Math.max(earliest, latest < 0 ? first : Math.min(first, latest));
  });
  return counts.map((_, k) => ({
    bar: starts[k]!,
    bars: (starts[k + 1] ?? bars) - starts[k]!,
    from: inside[k]!,
    to: inside[k + 1] ?? notes.length,
  }));
}

/** The first note of a line near a guessed one: behind the longest note or rest. */
function lineStart(notes: readonly MelodyNote[], guess: number, least: number, most: number): number {
  let best = Math.min(most, Math.max(least, guess));
  let bestWorth = -Infinity;
  for (let at = Math.max(least, guess - around); at <= Math.min(most, guess + around); at += 1) {
    const note = notes[at];
    if (!note) continue;
    const worth = note.start - notes[at - 1]!.start - 0.25 * Math.abs(at - guess);
    if (worth > bestWorth + 1e-9) [best, bestWorth] = [at, worth];
  }
  return best;
}
