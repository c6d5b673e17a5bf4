import { commonTuning } from "./pitchSpread";
import type { TrackFrame } from "./pitchTrack";
import type { HeardNote } from "./sungNotes";

/** What tells singing from speech, from plucked strings, from whistling and from several sounds at once. */
export interface SingingSigns {
  /** held time of the believed notes, in seconds */
  heldS: number;
  /** share of the loud time with a pitch, 0 to 1 */
  voicedShare: number;
  /** share of the loud time in which only a common period of several sounds was found, 0 to 1 */
  mixedShare: number;
  /** 0 and below for singing, above 1 for speech */
  speechLikeness: number;
  /** pitch as still as a string's or machine's, and every note dying away */
  plucked: boolean;
  /** a nearly pure tone, high up */
  whistled: boolean;
}

const LOUD_WITHIN_DB = 12;
const STILL_CENTS = 1.3;
const DYING_DB_PER_S = -5;
const WHISTLE_FROM_MIDI = 79;
const PURE_BELOW_DB = -27;

/**
 * Gathers the signs from a tracked take.
 *
 * @param frames the track, one frame per 10 ms
 * @param notes its notes, weeded
 * @returns the signs; all zero or false where nothing was held
 */
export function findSigns(frames: readonly TrackFrame[], notes: readonly HeardNote[]): SingingSigns {
  const clear = notes.filter((n) => n.clear);
  const heldS = clear.reduce((sum, n) => sum + n.heldS, 0);
  const levels = frames.map((f) => f.levelDb).sort((a, b) => a - b);
  const top = levels[Math.floor(levels.length * 0.95)] ?? -Infinity;
  const loud = frames.filter((f) => f.levelDb > top - LOUD_WITHIN_DB);
  const of = (test: (f: TrackFrame) => boolean): number => (loud.length === 0 ? 0 : loud.filter(test).length / loud.length);
  const voicedShare = of((f) => f.hz !== null);
  const mixedShare = of((f) => f.mixed);
  if (clear.length === 0) return { heldS, voicedShare, mixedShare, speechLikeness: 0, plucked: false, whistled: false };
  const high = frames.filter((f) => f.overtoneDb !== null).map((f) => f.overtoneDb!);
  return {
    heldS,
    voicedShare,
    mixedShare,
    speechLikeness: likenessToSpeech(frames, clear, heldS),
    plucked: median(clear.map((n) => n.steadinessCents)) < STILL_CENTS && median(clear.map((n) => levelSlope(frames, n))) < DYING_DB_PER_S,
    whistled: weightedMedian(clear) >= WHISTLE_FROM_MIDI && high.length > 0 && median(high) < PURE_BELOW_DB,
  };
}

/** Speech glides within its syllables, leaves much of its voice unsteady, holds nothing long, keeps to no scale and moves in a narrow band. */
function likenessToSpeech(frames: readonly TrackFrame[], clear: readonly HeardNote[], heldS: number): number {
  const voicedS = frames.filter((f) => f.hz !== null).length / 100;
  const share = Math.min(1, heldS / Math.max(0.01, voicedS));
  const longShare = Math.min(1, clear.filter((n) => n.heldS >= 0.4).reduce((sum, n) => sum + n.heldS, 0) / Math.max(0.01, voicedS));
  const longest = Math.max(...clear.map((n) => n.heldS));
  const midi = frames.flatMap((f) => (f.hz === null ? [] : [12 * Math.log2(f.hz)])).sort((a, b) => a - b);
  const span = midi[Math.floor(midi.length * 0.95)]! - midi[Math.floor(midi.length * 0.05)]!;
  const glide = median(clear.map((n) => Math.abs(glideWithin(frames, n))));
  const band = span < 6 ? 0.2 * (6 - span) : -0.12 * Math.min(6, span - 6);
  const held = 6 * (1 - share) + 2 * (0.5 - longShare) - 1.5 * Math.max(0, longest - 0.6);
  return glide / 150 + held + band - (gridFit(clear) - 0.3);
}

/** How well the notes keep to one grid of semitones, whatever its offset: 0 at random to 1 exactly. */
function gridFit(notes: readonly HeardNote[]): number {
  const tuning = commonTuning(notes) / 100;
  const whole = notes.reduce((sum, n) => sum + n.heldS, 0);
  return notes.reduce((sum, n) => sum + n.heldS * Math.cos(2 * Math.PI * (n.midi - tuning)), 0) / whole;
}

/** Change from the first to the second half of a note, in cents per second. */
function glideWithin(frames: readonly TrackFrame[], note: HeardNote): number {
  const midi = inside(frames, note).flatMap((f) => (f.hz === null ? [] : [12 * Math.log2(f.hz)]));
  return 100 * halfChange(midi);
}

/** Change of level through a note, in dB per second. */
function levelSlope(frames: readonly TrackFrame[], note: HeardNote): number {
  return halfChange(inside(frames, note).flatMap((f) => (Number.isFinite(f.levelDb) ? [f.levelDb] : [])));
}

function inside(frames: readonly TrackFrame[], note: HeardNote): readonly TrackFrame[] {
  return frames.slice(Math.round(note.start * 100) + 2, Math.round(note.end * 100) - 2);
}

function halfChange(values: readonly number[]): number {
  const half = values.length >> 1;
  if (half < 2) return 0;
  const mean = (part: readonly number[]): number => part.reduce((sum, x) => sum + x, 0) / part.length;
  return (mean(values.slice(-half)) - mean(values.slice(0, half))) / (half / 100);
}

function weightedMedian(notes: readonly HeardNote[]): number {
  const sorted = [...notes].sort((a, b) => a.midi - b.midi);
  const whole = sorted.reduce((sum, n) => sum + n.heldS, 0);
  let seen = 0;
  for (const note of sorted) {
    seen += note.heldS;
    if (seen >= whole / 2) return note.midi;
  }
  return -Infinity;
}

function median(values: readonly number[]): number {
  const sorted = [...values].sort((a, b) => a - b);
  return sorted[sorted.length >> 1] ?? 0;
}
