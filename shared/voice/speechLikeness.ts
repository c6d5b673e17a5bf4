import { commonTuning, weightedQuantile } from "./pitchSpread";
import type { TrackFrame } from "./pitchTrack";
import type { HeardNote } from "./sungNotes";

/**
 * Weights of a linear discriminant between singing and speech, fitted by logistic regression to singers and speakers,
 * real and made, dry and in rooms with an echo of 0.4 to 1.2 s; an echo fills the gaps of speech and stretches its
 * syllables, so that length alone tells little. Zero lies half-way between the two.
 */
const WEIGHT = { atRest: 40.6, band: -1.34, untuned: 13.6, voiced: -14.7, held: -17.4, unsteady: 0.36, leaps: -3.5, grid: -3.5, long: -5.2 };
/** Lively speakers may move as far as singers: beyond this many semitones a wide band proves nothing more. */
const WIDEST_BAND = 10;
/** Steps of this size, in semitones, are neither a repeated tone nor a step of any common scale. */
const UNTUNED = { from: 0.35, to: 0.8 };
/** Speech glides; from here on it moves in leaps only by accident. */
const LEAP_FROM = 3.5;
/** Held at least this long, a note is longer than most syllables. */
const LONG_S = 0.45;
/** A sound this little over the room tells nothing of voice or no voice. */
const OVER_ROOM_DB = 6;

/**
 * How much a take is like speech. Speech leaves more of its loud time without a pitch, glides within its syllables,
 * keeps to no scale, and drifts by fractions of a semitone in a narrow band, where melodies repeat, step and leap.
 *
 * @param frames the track, one frame per 10 ms
 * @param clear its believed notes, in order of time
 * @param loudFromDb level in dBFS from which a frame counts as loud
 * @returns below 0 for singing, above 0 for speech; 0 without notes
 */
export function likenessToSpeech(frames: readonly TrackFrame[], clear: readonly HeardNote[], loudFromDb: number): number {
  if (clear.length === 0) return 0;
  const midi = frames.flatMap((f) => (f.hz === null ? [] : [12 * Math.log2(f.hz)])).sort((a, b) => a - b);
  const at = (share: number): number => midi[Math.floor((midi.length - 1) * share)]!;
  const band = Math.min(WIDEST_BAND, at(0.95) - at(0.05));
  const loud = frames.filter((f) => f.levelDb > loudFromDb && f.aboveRoomDb > OVER_ROOM_DB);
  const voiced = loud.filter((f) => f.hz !== null).length / Math.max(1, loud.length);
  const heldS = clear.reduce((sum, n) => sum + n.heldS, 0);
  const longS = clear.reduce((sum, n) => sum + (n.heldS > LONG_S ? n.heldS : 0), 0);
  const steps = clear.slice(1).map((n, k) => Math.abs(n.midi - clear[k]!.midi));
  const share = (test: (step: number) => boolean): number => steps.filter(test).length / clear.length;
  const unsteady = weightedQuantile(clear.map((n) => ({ value: n.steadinessCents, weight: 1 })), 0.5);
  return (
    WEIGHT.atRest +
    WEIGHT.band * band +
    WEIGHT.untuned * share((step) => step >= UNTUNED.from && step < UNTUNED.to) +
    WEIGHT.voiced * voiced +
    WEIGHT.held * (heldS / Math.max(0.01, midi.length / 100)) +
    WEIGHT.unsteady * Math.min(15, unsteady) +
    WEIGHT.leaps * share((step) => step > LEAP_FROM) +
    WEIGHT.grid * gridFit(clear, heldS) +
    WEIGHT.long * (longS / heldS)
  );
}

/** How well the notes keep to one grid of semitones, whatever its offset: 0 at random to 1 exactly. */
function gridFit(notes: readonly HeardNote[], heldS: number): number {
  const tuning = commonTuning(notes) / 100;
  return notes.reduce((sum, n) => sum + n.heldS * Math.cos(2 * Math.PI * (n.midi - tuning)), 0) / heldS;
}
