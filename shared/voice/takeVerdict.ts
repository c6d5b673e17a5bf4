import type { RoomFloor } from "./roomFloor";
import type { TrackFrame } from "./pitchTrack";
import type { HeardNote } from "./sungNotes";
import type { Verdict } from "./takeReport";

/** Least held singing for a range in a phrase, in seconds. */
export const LEAST_HELD_S = 1.2;
const LEAST_HELD_IN_HOLD_S = 0.5;
const QUIET_DB = -60;

/** Everything a verdict is made from. */
export interface Evidence {
  durationS: number;
  hold: boolean;
  frames: readonly TrackFrame[];
  notes: readonly HeardNote[];
  room: RoomFloor;
  /** share of samples at a flat ceiling, 0 to 1 */
  clipped: number;
}

/**
 * Judges whether a take is singing that a range may be read from, and if not, why not.
 *
 * @param evidence what was measured
 * @returns "heard" or the reason for saying nothing
 */
export function judgeTake(evidence: Evidence): Verdict {
  const { notes, frames, hold } = evidence;
  const clear = notes.filter((n) => n.clear);
  const heldS = clear.reduce((sum, n) => sum + n.heldS, 0);
  const loudest = frames.reduce((top, f) => Math.max(top, f.levelDb), -Infinity);
  if (loudest < QUIET_DB) return "too-quiet";
  if (heldS >= (hold ? LEAST_HELD_IN_HOLD_S : LEAST_HELD_S)) return "heard";
  if (evidence.clipped > 0.05) return "clipped";
  const voicedS = frames.filter((f) => f.hz !== null).length / 100;
  if (evidence.durationS < 2 || (heldS > 0 && voicedS < 1.5)) return "too-short";
  if (evidence.room.levelDb !== null && loudest - evidence.room.levelDb < 10) return "too-noisy";
  return "not-singing";
}

const SENTENCES: Record<Exclude<Verdict, "heard">, [string, string]> = {
  "too-short": ["That was too short to tell.", "Sing a whole verse, or hold a few notes for a second each."],
  "too-quiet": ["Hardly any sound reached the microphone.", "Move closer to the microphone, or check that it is switched on, and sing again."],
  "too-noisy": ["The room was too loud to hear your voice apart from it.", "Find a quieter place or come closer to the microphone, and sing again."],
  clipped: ["The sound was too loud for the microphone.", "Step back a little or turn the microphone down, and sing again."],
  "not-singing": ["No singing was found in this recording.", "Sing a line you know well on your own, without an instrument."],
  "several-voices": ["More than one voice was heard.", "Sing alone for this one, so that the range is yours."],
};

/** @returns the sentence and the next step for a take that was not heard */
export function refusal(verdict: Exclude<Verdict, "heard">): { sentence: string; nextStep: string } {
  const [sentence, nextStep] = SENTENCES[verdict];
  return { sentence, nextStep };
}
