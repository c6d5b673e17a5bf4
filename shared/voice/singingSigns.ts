import { median } from "../signal/median";
import { weightedQuantile } from "./pitchSpread";
import { speechCues, type SpeechCues } from "./speechCues";
import type { TrackFrame } from "./trackFrame";
import type { HeardNote } from "./sungNotes";

/** What tells singing from speech, from plucked strings, from whistling and from several sounds at once. */
export interface SingingSigns {
  /** held time of the believed notes, in seconds */
  heldS: number;
  /** share of the loud time with a pitch, 0 to 1 */
  voicedShare: number;
  /** share of the loud time in which only a common period of several sounds was found, 0 to 1 */
  mixedShare: number;
  /** how many different pitches the believed notes have */
  pitches: number;
  /** what tells speech from singing; null where nothing was held */
  cues: SpeechCues | null;
  /** pitch stiller than any throat holds it: a string, a pipe, a machine */
  still: boolean;
  /** every note loudest where it begins and fading from there, at a still pitch: strings plucked or struck, bars, bells */
  struck: boolean;
  /** a nearly pure tone, high up */
  whistled: boolean;
}

const LOUD_WITHIN_DB = 12;
/** Short notes have little time to waver, so that both signs must hold. Voices, trained ones too, waver by more than this about a held note, vibrato removed (singers, real and made: from 2 up). */
const STILL_CENTS = 1.7;
/** A throat's pitch bends by more than this within 80 ms, through jitter alone (the same singers: from 0.7 up). */
const FLUTTER_CENTS = 0.6;
/**
 * One held note may be held better than a phrase's notes, and nothing else about it can tell a machine: the mean of 150 ms
 * moves by less than this many cents from one end of a tone to the other (tones in noise at 10 dB: up to 1.8; singers
 * holding as well as they can: from 2.7 up), and where it moves by more than half of that the tone hardly wavers otherwise.
 */
const STILL_HOLD_DRIFT_CENTS = 2;
const STILL_HOLD_CENTS = 0.45;
const DRIFT_FRAMES = 15;
/** Half the stretch, in frames of 10 ms, over which flutter is looked for. */
const FLUTTER_REACH = 4;
/** Two notes nearer than this, in semitones, may be the same pitch sung twice. */
const SAME_PITCH = 0.75;
/** Lips hardly whistle lower than this; a singer up there comes down below it in nearly every line. */
const WHISTLE_FROM_MIDI = 76;
/**
 * Second harmonic against the first. A voice nearly as pure as a whistle on one vowel is not so on the next, so that
 * three quarters of the frames must be pure.
 */
const PURE_BELOW_DB = -24;
const PURE_SHARE = 0.75;
/**
 * Of the notes of a plucked or struck instrument (FluidR3: piano, guitars, vibraphone) 0.7 to 1 fade by more than this and
 * begin at their loudest, and their pitch flutters no more than a machine's. Notes of sampled voices fade as much, but flutter.
 */
const FADE_DB_PER_S = 3;
const FADING_SHARE = 0.7;
const LEAST_FADE_S = 0.2;
const LEAST_STRUCK = 3;
/** A second harmonic this far over the first is a whistle above the search limit, followed an octave too low. */
const OCTAVE_LOW_DB = 20;

/**
 * Gathers the signs from a tracked take.
 *
 * @param frames the track, one frame per 10 ms
 * @param notes its notes, weeded
 * @param hold the singer was asked to hold single notes
 * @returns the signs; all zero or false where nothing was held
 */
export function findSigns(frames: readonly TrackFrame[], notes: readonly HeardNote[], hold = false): SingingSigns {
  const clear = notes.filter((n) => n.clear);
  const heldS = clear.reduce((sum, n) => sum + n.heldS, 0);
  const levels = frames.map((f) => f.levelDb).sort((a, b) => a - b);
  const top = levels[Math.floor(levels.length * 0.95)] ?? -Infinity;
  const loud = frames.filter((f) => f.levelDb > top - LOUD_WITHIN_DB);
  const of = (test: (f: TrackFrame) => boolean): number =>
    loud.length === 0 ? 0 : loud.filter(test).length / loud.length;
  return {
    heldS,
    voicedShare: of((f) => f.hz !== null),
    mixedShare: of((f) => f.mixed),
    pitches: countPitches(clear),
    cues: clear.length > 0 ? speechCues(frames, clear, top - LOUD_WITHIN_DB) : null,
    still: isStill(frames, clear, hold),
    struck: isStruck(frames, clear),
    whistled: clear.length > 0 && clear.every((n) => n.midi >= WHISTLE_FROM_MIDI) && isPure(frames),
  };
}

function isStill(frames: readonly TrackFrame[], clear: readonly HeardNote[], hold: boolean): boolean {
  if (clear.length === 0) return false;
  const wavering = median(clear.map((n) => n.steadinessCents));
  if (!hold) return wavering < STILL_CENTS && flutter(frames, clear) < FLUTTER_CENTS;
  const drifting = drift(frames, clear);
  return drifting < STILL_HOLD_DRIFT_CENTS / 2 || (drifting < STILL_HOLD_DRIFT_CENTS && wavering < STILL_HOLD_CENTS);
}

/** Nobody begins nearly every note at its loudest, lets it die away, and holds it like a string. */
function isStruck(frames: readonly TrackFrame[], clear: readonly HeardNote[]): boolean {
  const measured = clear.filter((n) => n.end - n.start >= LEAST_FADE_S);
  if (measured.length < LEAST_STRUCK || flutter(frames, clear) >= FLUTTER_CENTS) return false;
  const fading = measured.filter((n) =>
    fades(frames.slice(Math.round(n.start * 100) + 3, Math.round(n.end * 100) - 5).map((f) => f.levelDb)),
  );
  return fading.length >= FADING_SHARE * measured.length;
}

/** Loudest in its first third, and falling along the line of least squares. */
function fades(levels: readonly number[]): boolean {
  const middle = (levels.length - 1) / 2;
  const slope =
    levels.reduce((sum, level, k) => sum + level * (k - middle), 0) /
    levels.reduce((sum, _, k) => sum + (k - middle) ** 2, 0);
  return levels.indexOf(Math.max(...levels)) < levels.length / 3 && 100 * slope < -FADE_DB_PER_S;
}

function isPure(frames: readonly TrackFrame[]): boolean {
  const overtones = frames.flatMap(({ overtoneDb }) =>
    overtoneDb === null || overtoneDb > OCTAVE_LOW_DB ? [] : [{ value: overtoneDb, weight: 1 }],
  );
  return overtones.length > 0 && weightedQuantile(overtones, PURE_SHARE) < PURE_BELOW_DB;
}

function countPitches(notes: readonly HeardNote[]): number {
  let count = 0;
  let last = -Infinity;
  for (const midi of notes.map((n) => n.midi).sort((a, b) => a - b)) {
    if (midi - last < SAME_PITCH) continue;
    count++;
    last = midi;
  }
  return count;
}

/** Median bend of the pitch inside the notes: distance of a frame from the middle between its neighbours, in cents. */
function flutter(frames: readonly TrackFrame[], notes: readonly HeardNote[]): number {
  const bends = notes.flatMap((note) => {
    const midi = inside(frames, note).flatMap((f) => (f.hz === null ? [] : [12 * Math.log2(f.hz)]));
    const own = midi
      .slice(FLUTTER_REACH, -FLUTTER_REACH)
      .map((m, i) => 100 * Math.abs(m - (midi[i]! + midi[i + 2 * FLUTTER_REACH]!) / 2));
    return own.length > 0 ? [median(own)] : [];
  });
  return bends.length > 0 ? median(bends) : Infinity;
}

/** Median over the notes of how far the pitch, averaged over 150 ms, moves inside a note, in cents. */
function drift(frames: readonly TrackFrame[], notes: readonly HeardNote[]): number {
  const moves = notes.flatMap((note) => {
    const midi = inside(frames, note).flatMap((f) => (f.hz === null ? [] : [12 * Math.log2(f.hz)]));
    const means = midi
      .slice(DRIFT_FRAMES - 1)
      .map((_, i) => midi.slice(i, i + DRIFT_FRAMES).reduce((sum, m) => sum + m, 0) / DRIFT_FRAMES);
    return means.length > 0 ? [100 * (Math.max(...means) - Math.min(...means))] : [];
  });
  return moves.length > 0 ? median(moves) : Infinity;
}

function inside(frames: readonly TrackFrame[], note: HeardNote): readonly TrackFrame[] {
  return frames.slice(Math.round(note.start * 100) + 5, Math.round(note.end * 100) - 5);
}
