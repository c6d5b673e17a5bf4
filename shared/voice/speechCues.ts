import { commonTuning, weightedQuantile } from "./pitchSpread";
import type { TrackFrame } from "./trackFrame";
import type { HeardNote } from "./sungNotes";

/** What a take shows that sets speech apart from singing; each a plain measure, none decides alone. */
export interface SpeechCues {
  /** semitones between the 5 % and the 95 % point of the pitch, at most 10: speech moves little, or as far as a song */
  band: number;
  /** share of steps of 0.35 to 0.8 semitones: neither a repeated tone nor a step of any common scale */
  untuned: number;
  /** share of the loud time with a pitch */
  voiced: number;
  /** share of the time with a pitch that belongs to held notes; above 1 where short gaps are bridged */
  held: number;
  /** median wavering of the held notes, vibrato removed, in cents, at most 15 */
  unsteady: number;
  /** share of steps beyond 3.5 semitones, which speech takes only by accident */
  leaps: number;
  /** how well the notes keep to one grid of semitones, whatever its offset: 0 at random to 1 exactly */
  grid: number;
  /** how long the notes are held, each on its way from a syllable's length (0) to one that only singing has (1), by held time */
  long: number;
  /** clarity that three quarters of the frames with a pitch reach: a pitch that glides through its own echo repeats badly */
  clarity: number;
}

const WIDEST_BAND = 10;
const UNTUNED = { from: 0.35, to: 0.8 };
const LEAP_FROM = 3.5;
const SYLLABLE_S = 0.24;
const LONG_S = 0.6;
const MOST_CENTS = 15;
/** A sound this little over the room tells nothing of voice or no voice, in dB. */
const OVER_ROOM_DB = 6;
/**
 * @param frames the track, one frame per 10 ms
 * @param clear its believed notes, in order of time, at least one
 * @param loudFromDb level in dBFS from which a frame counts as loud
 */
export function speechCues(frames: readonly TrackFrame[], clear: readonly HeardNote[], loudFromDb: number): SpeechCues {
  const midi = frames.flatMap((f) => (f.hz === null ? [] : [12 * Math.log2(f.hz)])).sort((a, b) => a - b);
  const at = (share: number): number => midi[Math.floor((midi.length - 1) * share)]!;
  const clarities = frames.flatMap((f) => (f.hz === null ? [] : [f.clarity])).sort((a, b) => a - b);
  const loud = frames.filter((f) => f.levelDb > loudFromDb && f.aboveRoomDb > OVER_ROOM_DB);
  const heldS = clear.reduce((sum, n) => sum + n.heldS, 0);
  const lengths = clear.reduce(
    (sum, n) => sum + n.heldS * Math.max(0, Math.min(1, (n.heldS - SYLLABLE_S) / (LONG_S - SYLLABLE_S))),
    0,
  );
  const steps = clear.slice(1).map((n, k) => Math.abs(n.midi - clear[k]!.midi));
  const share = (test: (step: number) => boolean): number => steps.filter(test).length / clear.length;
  return {
    band: Math.min(WIDEST_BAND, at(0.95) - at(0.05)),
    untuned: share((step) => step >= UNTUNED.from && step < UNTUNED.to),
    voiced: loud.filter((f) => f.hz !== null).length / Math.max(1, loud.length),
    held: heldS / Math.max(0.01, midi.length / 100),
    unsteady: Math.min(
      MOST_CENTS,
      weightedQuantile(
        clear.map((n) => ({ value: n.steadinessCents, weight: 1 })),
        0.5,
      ),
    ),
    leaps: share((step) => step > LEAP_FROM),
    grid: gridFit(clear, heldS),
    long: lengths / heldS,
    clarity: clarities[Math.floor((clarities.length - 1) * 0.25)]!,
  };
}

function gridFit(notes: readonly HeardNote[], heldS: number): number {
  const tuning = commonTuning(notes) / 100;
  return notes.reduce((sum, n) => sum + n.heldS * Math.cos(2 * Math.PI * (n.midi - tuning)), 0) / heldS;
}
