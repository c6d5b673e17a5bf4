import type { Metre } from "./metre";

/** A stroke of a pattern, laid into the song. */
export type StrokeInTime<Stroke> = Stroke & {
  /** index of the chord that it sounds */
  chord: number;
};

/** A right hand as far as its strokes in time go; all times in quarter notes. */
export interface HandInTime<Stroke> {
  metre: Metre;
  bars: number;
  /** strokes of a bar, by their time from its start */
  patternOf: (bar: number) => readonly Stroke[];
  /** what a change of chord adds to a bar's pattern, `at` quarters from the bar's start, where the pattern does not strike */
  struckAnyway: (at: number, pattern: readonly Stroke[]) => readonly Stroke[];
}

/**
 * Lays a right hand's strokes over the chords of a song. A change of chord is always heard, on a stroke of its own where
 * the pattern has none there; in the last bar each chord is struck once and rings.
 *
 * @param chords spans of time in order, in quarter notes from the song's start
 * @param hand its pattern and what it does when a chord changes
 * @returns strokes by time; none where no chord sounds
 */
export function strokesInTime<Stroke extends { at: number }>(
  chords: readonly { at: number; end: number }[],
  { metre, bars, patternOf, struckAnyway }: HandInTime<Stroke>,
): StrokeInTime<Stroke>[] {
  const strokes: StrokeInTime<Stroke>[] = [];
  let current = 0;
  for (let bar = 0; bar < bars; bar += 1) {
    const from = bar * metre.quarters;
    const last = bar === bars - 1;
    const pattern = last ? [] : patternOf(bar);
    const changes = chords.filter(({ at }) => at >= from - 1e-9 && at < from + metre.quarters - 1e-9);
    const here = [
      ...pattern,
      ...changes.flatMap(({ at }) => struckAnyway(at - from, pattern)),
      ...(last && changes.every(({ at }) => at > from + 1e-9) ? struckAnyway(0, []) : []),
    ].sort((a, b) => a.at - b.at);
    for (const each of here) {
      const at = from + each.at;
      while (chords[current] && chords[current]!.end <= at + 1e-9) current += 1;
      const chord = chords[current];
      if (chord && chord.at <= at + 1e-9) strokes.push({ ...each, at, chord: current });
    }
  }
  return strokes;
}

/**
 * Whether a pattern strikes at a time.
 *
 * @param pattern strokes of a bar
 * @param at quarters from the bar's start
 * @param which strokes count; default all
 * @returns true if one of them begins there
 */
export function strikesAt<Stroke extends { at: number }>(
  pattern: readonly Stroke[],
  at: number,
  which: (stroke: Stroke) => boolean = () => true,
): boolean {
  return pattern.some((each) => Math.abs(each.at - at) < 1e-6 && which(each));
}
