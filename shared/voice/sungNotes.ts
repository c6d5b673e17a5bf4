import { median } from "../signal/median";
import { cutContour, smoothContour } from "./noteContour";
import type { TrackFrame } from "./trackFrame";
import type { SungNote } from "./takeReport";

/** A note counts as held when it stays within this distance of its centre, vibrato removed. */
const HELD_WITHIN_CENTS = 60;
/** Least held time in a phrase, in seconds. */
export const HELD_IN_PHRASE_S = 0.24;
/** Least held time in a guided hold, in seconds. */
export const HELD_IN_HOLD_S = 0.5;
/** The analysis window hides about 25 ms of a note at each end; measured stretches are this much shorter than sung ones. */
const HIDDEN_S = 0.05;
const SHORTEST_NOTE_FRAMES = 6;
const BRIDGED_GAP_FRAMES = 3;

/** A note together with what weeding needs to know about it. */
export interface HeardNote extends SungNote {
  /** longest stretch within 60 cents of the centre, in seconds */
  heldS: number;
  /** mean clarity of its frames, 0 to 1 */
  clarity: number;
}

/**
 * Cuts a tracked take into notes.
 *
 * @param frames the track, one frame per 10 ms
 * @param leastHeldS held time from which a note is sustained, in seconds
 * @returns notes in order of time; all still `clear` if sustained
 */
export function findNotes(frames: readonly TrackFrame[], leastHeldS: number): HeardNote[] {
  const notes: HeardNote[] = [];
  for (const [from, to] of voicedRuns(frames)) {
    const voiced: number[] = [];
    for (let k = from; k < to; k++) if (frames[k]!.hz !== null) voiced.push(k);
    const midi = voiced.map((k) => 69 + 12 * Math.log2(frames[k]!.hz! / 440));
    const contour = smoothContour(midi);
    for (const piece of cutContour(contour)) {
      if (piece.to - piece.from < SHORTEST_NOTE_FRAMES) continue;
      notes.push(
        describe(
          frames,
          voiced.slice(piece.from, piece.to),
          midi.slice(piece.from, piece.to),
          contour.slice(piece.from, piece.to),
          leastHeldS,
        ),
      );
    }
  }
  return notes;
}

function voicedRuns(frames: readonly TrackFrame[]): [number, number][] {
  const runs: [number, number][] = [];
  let from = -1;
  let last = -1;
  frames.forEach((frame, k) => {
    if (frame.hz === null) return;
    if (from >= 0 && k - last > BRIDGED_GAP_FRAMES + 1) {
      runs.push([from, last + 1]);
      from = -1;
    }
    if (from < 0) from = k;
    last = k;
  });
  if (from >= 0) runs.push([from, last + 1]);
  return runs;
}

function describe(
  frames: readonly TrackFrame[],
  at: number[],
  midi: number[],
  contour: number[],
  leastHeldS: number,
): HeardNote {
  const centre = heldCentre(contour);
  const held = longestHeld(contour, centre);
  const heldS = (held.to - held.from) / 100 + HIDDEN_S;
  let deviation = 0;
  let power = 0;
  let clarity = 0;
  at.forEach((k, i) => {
    deviation += (contour[i]! - centre) ** 2;
    power += 10 ** (frames[k]!.levelDb / 10);
    clarity += frames[k]!.clarity;
  });
  const sustained = heldS >= leastHeldS - 1e-9;
  return {
    start: at[0]! / 100,
    end: (at[at.length - 1]! + 1) / 100,
    midi: centre,
    steadinessCents: 100 * Math.sqrt(deviation / at.length),
    vibrato: findVibrato(midi.slice(held.from, held.to), contour.slice(held.from, held.to)),
    levelDb: 10 * Math.log10(Math.max(1e-12, power / at.length)),
    sustained,
    clear: sustained,
    heldS,
    clarity: clarity / at.length,
  };
}

/** Median of the contour, then again of what lies within 60 cents of it. */
function heldCentre(contour: number[]): number {
  const first = median(contour);
  const near = contour.filter((m) => Math.abs(m - first) <= HELD_WITHIN_CENTS / 100);
  return median(near.length > 0 ? near : contour);
}

function longestHeld(contour: number[], centre: number): { from: number; to: number } {
  let best = { from: 0, to: 0 };
  let from = 0;
  for (let i = 0; i <= contour.length; i++) {
    if (i < contour.length && Math.abs(contour[i]! - centre) <= HELD_WITHIN_CENTS / 100) continue;
    if (i - from > best.to - best.from) best = { from, to: i };
    from = i + 1;
  }
  return best;
}

/** Vibrato of a held stretch from its crossings of the centre; null where there is none of 4 to 9 Hz. */
function findVibrato(midi: number[], contour: number[]): { rateHz: number; extentCents: number } | null {
  if (midi.length < 35) return null;
  const swing = midi.map((m, i) => m - contour[i]!);
  const rms = Math.sqrt(swing.reduce((sum, x) => sum + x * x, 0) / swing.length);
  const extentCents = 100 * Math.SQRT2 * rms;
  if (extentCents < 12) return null;
  const crossings: number[] = [];
  let side = 0;
  swing.forEach((x, i) => {
    const now = x > 0.4 * rms ? 1 : x < -0.4 * rms ? -1 : side;
    if (side !== 0 && now !== side) crossings.push(i);
    side = now;
  });
  if (crossings.length < 3) return null;
  const rateHz = (50 * (crossings.length - 1)) / (crossings[crossings.length - 1]! - crossings[0]!);
  return rateHz >= 4 && rateHz <= 9 ? { rateHz, extentCents } : null;
}
