import type { Random } from "./random";
import type { Vowel } from "./vocalTract";

/** Taken out once: inside a test runner every use of a global is slow. */
const { abs, ceil, exp, floor, max, min, PI, round, sin } = Math;

/** Points of a pitch curve per second. */
export const CURVE_RATE = 1000;
const HELD_S = 0.24;
const LOOSE_S = 0.15;
const HELD_WITHIN = 0.6;

/** How a note begins: tied to the one before, on a vowel, after a closed or a hissing consonant, or on m, n, l. */
export type Onset = "tied" | "open" | "stop" | "hiss" | "nasal";

/** One note of a line; voiced from start to end, in seconds. */
export interface LineNote {
  midi: number;
  start: number;
  end: number;
  onset: Onset;
  vowel: Vowel;
  levelDb: number;
  /** creaking: pulses that come too slowly and too unevenly for a pitch */
  fry?: boolean;
}

/** How a singer moves the pitch. */
export interface Delivery {
  vibrato: { rateHz: number; extentCents: number } | null;
  /** where an untied onset begins, in cents below the note */
  scoopCents: number;
  /** length of the glide between tied notes in seconds */
  glideS: number;
  /** slow wandering, standard deviation in cents */
  driftCents: number;
}

/** Pitch every millisecond, as MIDI numbers: as sung, and without vibrato and wandering. */
export interface PitchCurve {
  sung: Float32Array;
  centre: Float32Array;
}

/** Lays glides, scoops, vibrato and wandering over the notes. */
export function pitchCurve(
  notes: readonly LineNote[],
  delivery: Delivery,
  durationS: number,
  random: Random,
): PitchCurve {
  const length = ceil(durationS * CURVE_RATE) + 1;
  const centre = new Float32Array(length);
  const sung = new Float32Array(length);
  const slow = wander(length, 0.5, random);
  const quick = wander(length, 0.12, random);
  const { vibrato, scoopCents, glideS, driftCents } = delivery;
  const scoopTau = random.between(0.03, 0.06);
  notes.forEach((note, index) => {
    const before = notes[index - 1];
    const after = notes[index + 1];
    const phase = random.between(0, 2 * PI);
    const rate = vibrato ? vibrato.rateHz * random.between(0.95, 1.05) : 0;
    const extent = vibrato ? (vibrato.extentCents / 100) * random.between(0.8, 1.2) : 0;
    const wait = random.between(0.1, 0.25);
    const scoop = note.onset === "tied" || note.fry ? 0 : (scoopCents / 100) * random.between(0.6, 1.2);
    const from = index === 0 ? 0 : round(note.start * CURVE_RATE);
    const to = after ? round(after.start * CURVE_RATE) : length;
    for (let i = from; i < to; i++) {
      const t = i / CURVE_RATE;
      const since = t - note.start;
      let midi = note.midi;
      if (before && note.onset === "tied") midi -= (note.midi - before.midi) * (1 - sigmoid(since / glideS));
      if (after && after.onset === "tied") midi += (after.midi - note.midi) * sigmoid((t - after.start) / glideS);
      if (scoop > 0) midi -= scoop * exp(-max(0, since) / scoopTau);
      centre[i] = midi;
      midi += (driftCents / 100) * (0.9 * slow[i]! + 0.4 * quick[i]!);
      if (extent > 0 && !note.fry)
        midi += extent * min(1, max(0, since - wait) / 0.2) * sin(2 * PI * rate * since + phase);
      sung[i] = midi;
    }
  });
  return { sung, centre };
}

/** A random curve of about unit spread whose corners are `stepS` apart. */
function wander(length: number, stepS: number, random: Random): Float32Array {
  const step = stepS * CURVE_RATE;
  const corners = Array.from({ length: ceil(length / step) + 2 }, () => random.normal());
  return Float32Array.from({ length }, (_, i) => {
    const at = floor(i / step);
    const x = i / step - at;
    return corners[at]! + (corners[at + 1]! - corners[at]!) * x * x * (3 - 2 * x);
  });
}

function sigmoid(x: number): number {
  return 1 / (1 + exp(-6 * x));
}

/** What is true of a clip: pitch every 10 ms, stretches that are not scored, and what is to be found. */
export interface ClipTruth {
  hopS: number;
  f0: (number | null)[];
  /** from and to, in seconds: edges of the voice, creak, tails of echo */
  ignore: [number, number][];
  expected: {
    verdict: "ok" | "too_little" | "no_singing";
    accept: string[];
    lowMidi: number | null;
    highMidi: number | null;
    looseLowMidi: number | null;
    looseHighMidi: number | null;
  };
}

/** Nothing is sung. */
export function silentTruth(durationS: number): ClipTruth {
  const expected = { lowMidi: null, highMidi: null, looseLowMidi: null, looseHighMidi: null };
  return {
    hopS: 0.01,
    f0: Array.from({ length: floor(durationS * 100) }, () => null),
    ignore: [],
    expected: { verdict: "no_singing", accept: ["no_singing", "too_little"], ...expected },
  };
}

/** The truth of a line; @param tailS how long the room rings on after the voice, which is not scored */
export function lineTruth(notes: readonly LineNote[], curve: PitchCurve, durationS: number, tailS: number): ClipTruth {
  const truth = silentTruth(durationS);
  const edge = 0.03;
  const held: number[] = [];
  const loose: number[] = [];
  notes.forEach((note, index) => {
    const after = notes[index + 1];
    if (note.fry) {
      truth.ignore.push([note.start - 0.08, note.end + edge + tailS]);
      return;
    }
    for (let k = ceil(note.start * 100); k < min(note.end * 100, truth.f0.length); k++) {
      truth.f0[k] = 440 * 2 ** ((curve.sung[k * (CURVE_RATE / 100)]! - 69) / 12);
    }
    if (note.onset !== "tied") truth.ignore.push([note.start - edge, note.start + edge]);
    if (!after || after.onset !== "tied") truth.ignore.push([note.end - edge, note.end + edge + tailS]);
    const heldS = longestNear(curve.centre, note);
    if (heldS >= HELD_S) held.push(note.midi);
    if (heldS >= LOOSE_S) loose.push(note.midi);
  });
  truth.expected = {
    verdict: "ok",
    accept: ["ok"],
    lowMidi: held.length > 0 ? min(...held) : null,
    highMidi: held.length > 0 ? max(...held) : null,
    looseLowMidi: loose.length > 0 ? min(...loose) : null,
    looseHighMidi: loose.length > 0 ? max(...loose) : null,
  };
  return truth;
}

function longestNear(centre: Float32Array, note: LineNote): number {
  let longest = 0;
  let run = 0;
  for (let i = round(note.start * CURVE_RATE); i < note.end * CURVE_RATE; i++) {
    run = abs(centre[i]! - note.midi) <= HELD_WITHIN ? run + 1 : 0;
    longest = max(longest, run);
  }
  return longest / CURVE_RATE;
}
