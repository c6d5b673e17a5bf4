import type { PitchBand, TakeReport } from "./takeReport";

/** Default reserves of a comfortable band under the highest and over the lowest held note, in semitones. */
const TOP_RESERVE = 2.5;
const BOTTOM_RESERVE = 1.5;
/** Span, in semitones, that untrained adults like to sing in; the upper figure of the published 19 to 21. */
const PREFERRED_SPAN = 20;

/**
 * The band that is comfortable by default: inside the range heard by the default reserves, but always wide enough to
 * hold the middle half of what was sung, and never inverted.
 *
 * @param range lowest and highest believed note
 * @param spread time-weighted quantiles of what was sung
 */
export function comfortBand(range: PitchBand, spread: NonNullable<TakeReport["tessitura"]>): PitchBand {
  const span = range.highMidi - range.lowMidi;
  const scale = Math.min(1, span / (2 * (TOP_RESERVE + BOTTOM_RESERVE)));
  const lowMidi = Math.min(range.lowMidi + BOTTOM_RESERVE * scale, Math.max(range.lowMidi, spread.q1));
  const highMidi = Math.max(range.highMidi - TOP_RESERVE * scale, Math.min(range.highMidi, spread.q3));
  return { lowMidi, highMidi: Math.max(lowMidi, highMidi) };
}

/**
 * What the voice probably reaches beyond one take. A phrase shows only a part of a voice: where less than the span
 * people like to sing in was heard, a third of what is missing is added below and above, at most 3 semitones a side
 * and at least half a semitone. An estimate by defaults, not a measurement.
 *
 * @param range lowest and highest believed note
 * @see Moore, Staum, Brotons, J. Music Therapy 29(4) 1992 (preferred singing range, 19 semitones on average)
 * @example probableReach({ lowMidi: 50, highMidi: 61 }) // => { lowMidi: 47, highMidi: 64 }
 */
export function probableReach(range: PitchBand): PitchBand {
  const missing = Math.max(0, PREFERRED_SPAN - (range.highMidi - range.lowMidi));
  const step = Math.max(0.5, Math.min(3, missing / 3));
  return { lowMidi: range.lowMidi - step, highMidi: range.highMidi + step };
}
