import type { Instrument, InstrumentString } from "./instrument";
import { retuneVerdict, stringMidi, type RetuneVerdict } from "./tension";

/** One string on its way to another pitch. Pitches are MIDI numbers. */
interface TuningString {
  /** place among the instrument's strings */
  index: number;
  fromMidi: number;
  toMidi: number;
  /** as it sounds with the capo clamped */
  clampedMidi: number;
  verdict: RetuneVerdict;
  /** fret at which a short string needs its own stop once the capo is clamped; null where the capo stops it */
  ownStop: number | null;
}

/** How an instrument is brought into another tuning. */
export interface TuningPlan {
  /** in playing order */
  strings: TuningString[];
  /** indices in the order to tune in */
  order: number[];
  capo: number;
}

/** Where a string may be: between the pitch it had and the one it goes to. */
export interface StringPlace {
  index: number;
  lowMidi: number;
  highMidi: number;
  /** it stands where it shall; then only a small deviation is believed */
  done: boolean;
}

/** Which string sounds. `ask` names those it may be, likeliest first. */
export type StringFound =
  | { kind: "string"; index: number }
  | { kind: "octave"; index: number; octaves: number }
  | { kind: "ask"; indices: number[] };

/** Semitones that a string may be off and is still recognised: one not yet tuned, and one that is. */
const believed = { waiting: 2.5, done: 1.2 };
/** The string that was asked for is believed so much farther off. */
const askedFor = 0.8;
const clearBy = 0.5;
const sameOctave = 0.8;
/** A string a little above its mark is no danger yet. */
const overshoot = 0.35;

/**
 * Plans a retune of all strings alike, and a capo behind it.
 *
 * Strings that are let down come before those that are brought up, so that the neck's load never rises above what it was
 * before it must; among each the thickest first, because they move the others most.
 *
 * @param instrument in its own tuning
 * @param change semitones of the retune (whole, negative for down) and fret of the capo (0 for none)
 * @returns every string with its pitches and verdict, and the order
 * @throws RangeError if a string has no readable note, or retune or capo is not whole, or the capo is below 0
 * @see common practice
 */
export function planTuning(instrument: Instrument, { retune, capo }: { retune: number; capo: number }): TuningPlan {
  if (!Number.isInteger(retune) || !Number.isInteger(capo) || capo < 0)
    throw new RangeError("retune and capo must be whole, and the capo not below 0");
  const strings = instrument.strings.map((string, index): TuningString => {
    const fromMidi = stringMidi(string);
    const toMidi = fromMidi + retune;
    return {
      index,
      fromMidi,
      toMidi,
      clampedMidi: toMidi + capo,
      verdict: retuneVerdict(string, instrument.scaleMm, retune),
      ownStop: capo > 0 && string.startsAtFret !== undefined ? string.startsAtFret + capo : null,
    };
  });
  const byPitch = [...strings].sort((a, b) => a.fromMidi - b.fromMidi || a.index - b.index);
  const down = byPitch.filter(({ fromMidi, toMidi }) => toMidi <= fromMidi);
  const up = byPitch.filter(({ fromMidi, toMidi }) => toMidi > fromMidi);
  return { strings, order: [...down, ...up].map(({ index }) => index), capo };
}

/**
 * Tells which string of an instrument sounds at a pitch.
 *
 * Between its old pitch and its new one a string may be anywhere. The one that was asked for is believed more readily than
 * the others; where two are as likely, or none is near, the person must say.
 *
 * @param midi what is heard, fractional MIDI number
 * @param places where each string may be now
 * @param asked index of the string that was asked for
 * @returns the string; or that it is the asked one whole octaves off (negative: too low); or whom to ask about
 * @throws RangeError if the asked string is not among the places
 * @example identifyString(57, [{ index: 0, lowMidi: 57, highMidi: 57, done: false }], 0).kind // => "string"
 */
export function identifyString(midi: number, places: readonly StringPlace[], asked: number): StringFound {
  const wanted = places.find(({ index }) => index === asked);
  if (!wanted) throw new RangeError("the asked string is none of the instrument's");
  const ranked = places
    .map((place) => {
      const off = offOf(midi, place);
      return { place, off, rank: place === wanted ? Math.max(0, off - askedFor) : off };
    })
    .sort((a, b) => a.rank - b.rank || (a.place === wanted ? -1 : b.place === wanted ? 1 : a.off - b.off));
  const near = ranked.filter(({ place, off }) => off <= (place.done ? believed.done : believed.waiting));
  const [best, second] = near;
  if (best) {
    const alike = second !== undefined && second.rank - best.rank < clearBy && !samePlace(best.place, second.place);
    // Both may truly be there: only then is it a question. The asked one, nearer, needs none.
    if (alike && second.off < clearBy && !(best.place === wanted && best.off < second.off))
      return { kind: "ask", indices: [best.place.index, second.place.index] };
    return { kind: "string", index: best.place.index };
  }
  const octaves = Math.round((midi - (wanted.lowMidi + wanted.highMidi) / 2) / 12);
  if (octaves !== 0 && offOf(midi - 12 * octaves, wanted) <= sameOctave)
    return { kind: "octave", index: asked, octaves };
  return { kind: "ask", indices: [...ranked].sort((a, b) => a.off - b.off).map(({ place }) => place.index) };
}

/**
 * Whether a string bears the pitch it has been brought to.
 *
 * @param string as it is tuned ordinarily
 * @param scaleMm scale length of the instrument in mm
 * @param midi what it sounds now, fractional MIDI number
 * @returns "unsafe": let it down at once; "tight": no farther without care; else "fine" or "slack"
 * @throws RangeError if the string has no readable note
 * @see `retuneVerdict` for the limits
 */
export function loadNow(string: InstrumentString, scaleMm: number, midi: number): RetuneVerdict {
  const shift = Math.ceil(midi - stringMidi(string) - overshoot);
  return retuneVerdict(string, scaleMm, shift + 0);
}

function offOf(midi: number, { lowMidi, highMidi }: StringPlace): number {
  return Math.max(0, lowMidi - midi, midi - highMidi);
}

function samePlace(a: StringPlace, b: StringPlace): boolean {
  return a.lowMidi === b.lowMidi && a.highMidi === b.highMidi;
}
