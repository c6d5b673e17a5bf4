import type { RoomFloor } from "./roomFloor";
import type { TrackFrame } from "./trackFrame";
import { findSigns } from "./singingSigns";
import { likenessToSpeech } from "./speechLikeness";
import type { HeardNote } from "./sungNotes";
import type { Verdict } from "./takeReport";

/** Least held singing for a range in a phrase, in seconds. */
const LEAST_HELD_S = 1.2;
const LEAST_HELD_IN_HOLD_S = 0.5;
/** A phrase of fewer pitches shows no range. */
const LEAST_PITCHES = 3;
/** Held as long as this on average, one or two pitches are sung, not spoken, in seconds. */
const SUNG_LONG_S = 0.6;
const QUIET_DB = -60;
const FAINT_DB = -42;
/**
 * Of 140 lines by one singer, in rooms, with a guitar underneath and through small microphones, the most was 0.15, and of a
 * sampled choir singing in unison, tied, 0.27; most pairs of unrelated lines come to 0.3 to 0.5. Voices in unison or in
 * octaves are one to it.
 */
const MIXED_AT_MOST = 0.28;
const VOICED_AT_LEAST = 0.4;
/** Half-way between singing and the reading aloud that came nearest to it, 1.5, on lines that had no part in the weights. */
const SPOKEN_FROM = 0.75;
const CLIPPED_BEYOND_USE = 0.05;

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
  const { notes, frames, hold, durationS, room } = evidence;
  const loudest = frames.reduce((top, f) => Math.max(top, f.levelDb), -Infinity);
  if (loudest < QUIET_DB) return "too-quiet";
  const signs = findSigns(frames, notes, hold);
  const enough = hold
    ? signs.heldS >= LEAST_HELD_IN_HOLD_S
    : signs.heldS >= LEAST_HELD_S && signs.pitches >= LEAST_PITCHES;
  // One high note on one vowel is as pure as a whistle, which only a line of several can tell.
  if (signs.still || ((signs.whistled || signs.struck) && !hold)) return "not-singing";
  const sung =
    signs.voicedShare >= VOICED_AT_LEAST && (hold || signs.cues === null || likenessToSpeech(signs.cues) < SPOKEN_FROM);
  const monotone =
    signs.pitches < LEAST_PITCHES &&
    signs.voicedShare >= VOICED_AT_LEAST &&
    signs.heldS >= SUNG_LONG_S * notes.filter((n) => n.clear).length;
  if (enough && signs.mixedShare > MIXED_AT_MOST) return "several-voices";
  if (enough && sung) return "heard";
  if (evidence.clipped > CLIPPED_BEYOND_USE) return "clipped";
  if (durationS < 2 || (!enough && signs.heldS > 0 && (sung || monotone))) return "too-short";
  if (room.levelDb === null && loudest < FAINT_DB) return "too-quiet";
  if (isNoise(frames, room)) return "too-noisy";
  return signs.mixedShare > MIXED_AT_MOST ? "several-voices" : "not-singing";
}

/** Loud all through, without pauses and without any pitch: whatever voice there is, the room covers it. */
function isNoise(frames: readonly TrackFrame[], room: RoomFloor): boolean {
  const levels = frames.map((f) => f.levelDb).sort((a, b) => a - b);
  const spread = (levels[Math.floor(levels.length * 0.95)] ?? 0) - (levels[Math.floor(levels.length * 0.1)] ?? 0);
  const loudest = levels[levels.length - 1] ?? -Infinity;
  return spread < 10 || (room.levelDb !== null && loudest - room.levelDb < 10);
}

const SENTENCES: Record<Exclude<Verdict, "heard">, [string, string]> = {
  "too-short": ["That was too short to tell.", "Sing a whole verse, or hold a few notes for a second each."],
  "too-quiet": [
    "Hardly any sound reached the microphone.",
    "Move closer to the microphone, or check that it is switched on, and sing again.",
  ],
  "too-noisy": [
    "The room was too loud to hear your voice apart from it.",
    "Find a quieter place or come closer to the microphone, and sing again.",
  ],
  clipped: [
    "The sound was too loud for the microphone.",
    "Step back a little or turn the microphone down, and sing again.",
  ],
  "not-singing": [
    "No singing was found in this recording.",
    "Sing a line you know well on your own, without an instrument.",
  ],
  "several-voices": [
    "More than one voice or instrument was heard at once.",
    "Sing alone and without an instrument for this one, so that the range is yours.",
  ],
};

/** @returns the sentence and the next step for a take that was not heard */
export function refusal(verdict: Exclude<Verdict, "heard">): { sentence: string; nextStep: string } {
  const [sentence, nextStep] = SENTENCES[verdict];
  return { sentence, nextStep };
}
