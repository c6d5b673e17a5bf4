import { median } from "../signal/median";
import { hzToMidi } from "../music/pitch";
import type { TakeReport } from "../voice/takeReport";
import { foldedSemitones, PATH_RATE, pathThroughTune, type PathBand, type WantedFrames } from "./alignTakePath";

/** A note that was to be sung, in the key and in the singer's octave. Times in seconds. */
export interface WantedNote {
  at: number;
  duration: number;
  midi: number;
  /** index of the phrase it belongs to */
  phrase: number;
}

/** How a take was sung. */
export interface Singing {
  /**
   * when in the take the wanted notes' time 0 was, in seconds (negative: the recording began later), where a backing
   * told the singer the time; null where the singer sang without
   */
  startS: number | null;
}

/** A take laid on a tune. */
export interface Alignment {
  /** for each wanted note the stretch of the take it was sung in; null where the take has no time for it */
  spans: readonly ({ start: number; end: number } | null)[];
  /** octaves that the singer sang from the wanted notes: -1 is an octave lower */
  octaves: number;
  /** the singer's common deviation in semitones after the octave, fractional, -6 to 6: 0.3 is 30 cents sharp */
  offset: number;
  /** share of all that was sung that lies on the tune and within a semitone of it, 0 to 1: how far this is the tune */
  fit: number;
}

/** How far a singer may be from a backing's time, in seconds. */
const slackS = 0.5;
/** Silence that is wanted before and after the tune, in seconds. */
const aroundS = 1;
/** How many tunings are tried where it is not known at all. */
const tries = 4;
/** Less than this was sung, in seconds: nothing can be told. */
const leastSungS = 1;

/**
 * Lays a take on a tune: with a backing near the times that it gave, else wherever it fits best; octave and own tuning
 * of the singer are found on the way.
 *
 * @param wanted the notes to be sung, in order
 * @param f0 fundamental frequencies of the take in Hz every 10 ms, null where nothing is sung
 * @param singing when the backing began in the take
 * @returns the alignment; null where less than a second was sung, or nothing was to be sung
 */
export function alignTake(wanted: readonly WantedNote[], f0: TakeReport["f0"], singing: Singing): Alignment | null {
  const sung = sungFrames(f0);
  const voiced = sung.reduce((count, midi) => count + (Number.isNaN(midi) ? 0 : 1), 0);
  if (wanted.length === 0 || voiced < leastSungS * PATH_RATE) return null;
  const origin = wanted[0]!.at - aroundS;
  const tune = wantedFrames(wanted, origin);
  const band: PathBand | null =
    singing.startS === null ? null : { first: -(singing.startS + origin) * PATH_RATE, halfWidth: slackS * PATH_RATE };
  const runs = likelyOffsets(sung, tune).map((offset) => ({ offset, ...pathThroughTune(sung, tune, offset, band) }));
  const best = runs.reduce((a, b) => (b.cost < a.cost - 1e-6 ? b : a));
  const offset = ownTuning(sung, tune, best.frames, best.offset);
  const { frames } = pathThroughTune(sung, tune, offset, band);
  const fine = foldedSemitones(ownTuning(sung, tune, frames, offset));
  const pairs = pairsOf(sung, tune, frames);
  if (pairs.length === 0) return null;
  const octaves = Math.round(median(pairs.map((difference) => Math.round((difference - fine) / 12)))) || 0;
  const near = pairs.filter((difference) => Math.abs(foldedSemitones(difference - fine)) < 1).length;
  return { spans: spansOf(wanted, origin, frames), octaves, offset: fine, fit: near / voiced };
}

/** Pitches of the take in the path's frames; one with few voiced moments counts as silent. */
function sungFrames(f0: TakeReport["f0"]): Float32Array {
  const per = 100 / PATH_RATE;
  return Float32Array.from({ length: Math.floor(f0.length / per) }, (_, k) => {
    const voiced = f0.slice(k * per, (k + 1) * per).filter((hz) => hz !== null && hz > 0);
    return voiced.length < per / 2 ? NaN : hzToMidi(median(voiced as number[]));
  });
}

function wantedFrames(wanted: readonly WantedNote[], origin: number): WantedFrames {
  const frame = (seconds: number) => Math.round((seconds - origin) * PATH_RATE);
  const last = wanted.reduce((end, { at, duration }) => Math.max(end, at + duration), origin);
  const length = frame(last + aroundS);
  const midi = new Float32Array(length).fill(NaN);
  const begins = new Uint8Array(length);
  const ends = new Uint8Array(length);
  wanted.forEach((note, k) => {
    const from = Math.min(length - 1, frame(note.at));
    const to = Math.min(length, Math.max(from + 1, frame(note.at + note.duration)));
    midi.fill(note.midi, from, to);
    if (note.phrase !== wanted[k - 1]?.phrase) begins[from] = 1;
    if (note.phrase !== wanted[k + 1]?.phrase) ends[to - 1] = 1;
  });
  return { midi, begins, ends };
}

/** Offsets, in semitones, under which the pitch classes that were sung are most like those wanted. */
function likelyOffsets(sung: Float32Array, tune: WantedFrames): number[] {
  const wanted = classTimes(tune.midi);
  const heard = classTimes(sung);
  const likeness = (offset: number) =>
    wanted.reduce((sum, time, pc) => sum + time * heard[(pc + offset + 12) % 12]!, 0);
  // Of two alike the nearer to what was wanted is tried first.
  return [0, 1, -1, 2, -2, 3, -3, 4, -4, 5, -5, 6]
    .map((offset) => ({ offset, likeness: likeness(offset) }))
    .sort((a, b) => b.likeness - a.likeness)
    .slice(0, tries)
    .map(({ offset }) => offset);
}

/** Time on each pitch class, spread to its neighbours, since nobody sings on the semitone. */
function classTimes(pitches: Float32Array): number[] {
  const times = new Array<number>(12).fill(0);
  for (const midi of pitches) {
    if (Number.isNaN(midi)) continue;
    const low = Math.floor(midi);
    times[((low % 12) + 12) % 12]! += 1 - (midi - low);
    times[(((low + 1) % 12) + 12) % 12]! += midi - low;
  }
  const size = Math.hypot(...times) || 1;
  return times.map((time) => time / size);
}

/** The middle of the singer's deviations near an offset. */
function ownTuning(sung: Float32Array, tune: WantedFrames, frames: Int32Array, offset: number): number {
  const near = pairsOf(sung, tune, frames).map((difference) => foldedSemitones(difference - offset));
  const close = near.filter((difference) => Math.abs(difference) < 1.5);
  return close.length === 0 ? offset : offset + median(close);
}

function pairsOf(sung: Float32Array, tune: WantedFrames, frames: Int32Array): number[] {
  const pairs: number[] = [];
  frames.forEach((frame, t) => {
    const difference = frame < 0 ? NaN : sung[t]! - tune.midi[frame]!;
    if (!Number.isNaN(difference)) pairs.push(difference);
  });
  return pairs;
}

/** The stretch of each note: the longest one, where it was sung more than once. */
function spansOf(wanted: readonly WantedNote[], origin: number, frames: Int32Array): Alignment["spans"] {
  return wanted.map(({ at, duration }) => {
    const from = (at - origin) * PATH_RATE - 0.5;
    const to = (at + duration - origin) * PATH_RATE - 0.5;
    let longest: { start: number; end: number } | null = null;
    let start = -1;
    for (let t = 0; t <= frames.length; t += 1) {
      const inside = t < frames.length && frames[t]! >= from && frames[t]! < to;
      if (inside && start < 0) start = t;
      if (inside || start < 0) continue;
      if (!longest || t - start > (longest.end - longest.start) * PATH_RATE + 1e-6) {
        longest = { start: start / PATH_RATE, end: t / PATH_RATE };
      }
      start = -1;
    }
    return longest;
  });
}
