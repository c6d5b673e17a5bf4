import { midiToHz, noteName, parseNoteName } from "../music/pitch";
import type { Instrument, InstrumentString, StringMaterial } from "./instrument";
import { unitWeight } from "./unitWeights";

/** Gravity in inches per second squared, as the string makers' formula has it. */
const gravityIn = 386.4;
const mmPerInch = 25.4;
/** Density of steel music wire in lb per cubic inch. */
const steelDensity = 0.282;

/** Below this share of its own ordinary tension a string flaps and frets sharp. */
const slackBelow = 0.72;
/** A plain steel string is taken to no more than this share of the weakest wire's strength. */
const plainCap = 0.75;
/** Semitones above the note a string was made for that are never advised for it. */
const neverUpBy = 2;

/** Least tensile strength of music wire, in thousand pounds per square inch, by gauge in thousandths of an inch. */
const leastStrengthKsi: readonly (readonly [thousandths: number, ksi: number])[] = [
  [7, 407],
  [8, 399],
  [9, 393],
  [10, 387],
  [11, 382],
  [12, 377],
  [13, 373],
  [14, 369],
  [15, 365],
  [16, 362],
  [18, 356],
  [20, 350],
  [22, 345],
  [24, 341],
  [26, 337],
];

/** What a retune does to one string. */
export type RetuneVerdict = "fine" | "slack" | "tight" | "unsafe";

/** One string before and after, with its verdict. */
export interface TensionChange {
  string: string;
  to: string;
  gaugeIn: number | null;
  /** pounds-force; null where gauge or material is not known */
  beforeLb: number | null;
  afterLb: number | null;
  verdict: RetuneVerdict;
  /** semitones it is shifted by */
  semitones: number;
  /** tension afterwards as a share of the one at the note its set was made for */
  ofPacket: number;
  /** afterwards, as a share of what the weakest wire of its gauge bears; null but for plain steel of a known gauge */
  load: number | null;
  /** how many strings like this stand side by side */
  strings: number;
}

/**
 * Tension of a string.
 *
 * @param unitWeightLbPerIn weight of one inch of string in lb, > 0
 * @param scaleIn sounding length in inches, > 0
 * @param hz frequency it is tuned to, > 0
 * @returns pounds-force
 * @throws RangeError if an argument is not positive
 * @see D'Addario, string tension guide: T = UW (2 L F)^2 / 386.4
 * @example Math.round(stringTensionLb(0.0000319, 25.5, 329.628) * 10) / 10 // => 23.3
 */
export function stringTensionLb(unitWeightLbPerIn: number, scaleIn: number, hz: number): number {
  if (!(unitWeightLbPerIn > 0) || !(scaleIn > 0) || !(hz > 0))
    throw new RangeError("weight, scale and hz must be positive");
  return (unitWeightLbPerIn * (2 * scaleIn * hz) ** 2) / gravityIn;
}

/**
 * How tension changes with pitch, whatever the string.
 *
 * @param semitones shift, negative for down
 * @returns factor of the tension
 * @example tensionRatio(-6) // => 0.5
 */
export function tensionRatio(semitones: number): number {
  return 2 ** (semitones / 6);
}

/**
 * Load at which the weakest allowed music wire of a gauge breaks.
 *
 * @param gaugeIn diameter in inches, > 0
 * @returns pounds-force; outside 0.007 to 0.026 in the strength of the nearest gauge is taken
 * @throws RangeError if the gauge is not positive
 * @see ASTM A228/A228M, Steel Wire, Music Spring Quality: minimum tensile strength
 * @example Math.round(breakingLoadLb(0.01) * 10) / 10 // => 30.4
 */
export function breakingLoadLb(gaugeIn: number): number {
  return strengthPsi(gaugeIn) * Math.PI * (gaugeIn / 2) ** 2;
}

/**
 * Pitch at which the weakest allowed music wire snaps; to first order independent of its gauge.
 *
 * @param gaugeIn diameter in inches, > 0
 * @param scaleIn sounding length in inches, > 0
 * @returns frequency in Hz
 * @throws RangeError if an argument is not positive
 * @see ASTM A228/A228M; F = sqrt(386.4 s / d) / (2 L)
 * @example breakingHz(0.01, 25.5).toFixed(1) // => "451.5"
 */
export function breakingHz(gaugeIn: number, scaleIn: number): number {
  if (!(scaleIn > 0)) throw new RangeError("scaleIn must be a positive length in inches");
  return Math.sqrt((gravityIn * strengthPsi(gaugeIn)) / steelDensity) / (2 * scaleIn);
}

/**
 * Judges one string at another pitch, from the note its set was made for. Slack below 72 % of the tension it has there.
 * Above that note one semitone is tight, more is unsafe for wound strings and for those whose gauge is not known; a
 * plain steel string may go up to 75 % of the strength of the weakest wire. What is left or let down is never unsafe.
 *
 * @param string as it is tuned now, and what it was made for where that is another note
 * @param scaleMm scale length of the instrument in mm
 * @param semitones shift, whole, negative for down
 * @returns verdict; "unsafe" must never be proposed
 * @throws RangeError if the string has no readable note
 * @see common practice for the slack floor and the upper limits; ASTM A228/A228M for the strength of plain steel
 * @example retuneVerdict({ note: "A2", gaugeIn: 0.042, material: "phosphor-bronze" }, 648, 2) // => "unsafe"
 */
export function retuneVerdict(string: InstrumentString, scaleMm: number, semitones: number): RetuneVerdict {
  const above = abovePacket(string) + semitones;
  if (semitones > 0 && above > 0) {
    const load = plainLoad(string, scaleMm, semitones);
    if (load === null) return above >= neverUpBy ? "unsafe" : "tight";
    return load > plainCap ? "unsafe" : "tight";
  }
  if (above > 0) return "tight";
  return tensionRatio(above) < slackBelow ? "slack" : "fine";
}

/**
 * How far a string is kept from the note its set was made for.
 *
 * @param string as it is tuned now
 * @returns semitones, negative where it is kept lower
 * @throws RangeError if a note cannot be read
 * @example abovePacket({ note: "D2", madeFor: "E2" }) // => -2
 */
export function abovePacket({ note, madeFor = note }: Pick<InstrumentString, "note" | "madeFor">): number {
  return stringMidi({ note }) - stringMidi({ note: madeFor });
}

/**
 * Tensions of all strings before and after a retune.
 *
 * @param instrument in its present tuning
 * @param shifts whole semitones, negative for down: one for all strings alike, or one for each
 * @returns one entry a string, in playing order; tensions are of one string of a course
 * @throws RangeError if a string has no readable note, or a shift is missing or not whole
 */
export function tensionChanges(instrument: Instrument, shifts: number | readonly number[]): TensionChange[] {
  return instrument.strings.map((string, k) => {
    const semitones = typeof shifts === "number" ? shifts : shifts[k];
    if (!Number.isInteger(semitones)) throw new RangeError("semitones must be whole");
    const by = semitones!;
    const midi = stringMidi(string);
    const spelling = string.note.includes("b") ? "flats" : "sharps";
    return {
      string: string.note,
      to: by === 0 ? string.note : noteName(midi + by, spelling),
      gaugeIn: string.gaugeIn,
      beforeLb: tensionAt(string, instrument.scaleMm, midi),
      afterLb: tensionAt(string, instrument.scaleMm, midi + by),
      verdict: retuneVerdict(string, instrument.scaleMm, by),
      semitones: by,
      ofPacket: tensionRatio(abovePacket(string) + by),
      load: plainLoad(string, instrument.scaleMm, by),
      strings: string.inCourse ?? 1,
    };
  });
}

/** Pull on the neck before and after, as far as it is known. */
export interface TensionTotal {
  beforeLb: number;
  afterLb: number;
  /** strings whose gauge or material is not known are left out; how many */
  unknown: number;
}

/**
 * Total tension of all strings, every string of a course counted.
 *
 * @param changes of one instrument
 * @returns pounds-force before and after
 * @example totalTension([]) // => { beforeLb: 0, afterLb: 0, unknown: 0 }
 */
export function totalTension(changes: readonly TensionChange[]): TensionTotal {
  const total = { beforeLb: 0, afterLb: 0, unknown: 0 };
  for (const { beforeLb, afterLb, strings } of changes) {
    if (beforeLb === null || afterLb === null) total.unknown += strings;
    else {
      total.beforeLb += beforeLb * strings;
      total.afterLb += afterLb * strings;
    }
  }
  return total;
}

/**
 * MIDI number of an open string.
 *
 * @param string with a note such as "F#4"
 * @returns MIDI note number
 * @throws RangeError if the note cannot be read
 */
export function stringMidi(string: Pick<InstrumentString, "note">): number {
  const midi = parseNoteName(string.note);
  if (midi === null) throw new RangeError(`"${string.note}" is no note with an octave`);
  return midi;
}

/**
 * Whether a string is wound round a core, which carries its load and whose thickness no maker prints.
 *
 * @param material what the string is made of
 * @returns true for wound strings
 */
export function isWound(material: StringMaterial): boolean {
  return material === "nickel-wound" || material === "phosphor-bronze" || material === "brass-wound";
}

function tensionAt(string: InstrumentString, scaleMm: number, midi: number): number | null {
  if (string.gaugeIn === null) return null;
  const weight = unitWeight(string.material, string.gaugeIn);
  return weight === null ? null : stringTensionLb(weight, (string.scaleMm ?? scaleMm) / mmPerInch, midiToHz(midi));
}

/** Share of the weakest wire's strength that a plain steel string would bear; null for all others. */
function plainLoad(string: InstrumentString, scaleMm: number, semitones: number): number | null {
  if (string.material !== "plain-steel" || string.gaugeIn === null) return null;
  const hz = midiToHz(stringMidi(string) + semitones);
  return (hz / breakingHz(string.gaugeIn, (string.scaleMm ?? scaleMm) / mmPerInch)) ** 2;
}

function strengthPsi(gaugeIn: number): number {
  if (!(gaugeIn > 0)) throw new RangeError("gaugeIn must be a positive diameter in inches");
  const thousandths = gaugeIn * 1000;
  const above = leastStrengthKsi.findIndex(([gauge]) => gauge >= thousandths - 1e-9);
  const upper = leastStrengthKsi[above] ?? leastStrengthKsi[leastStrengthKsi.length - 1]!;
  const lower = leastStrengthKsi[above - 1];
  if (!lower || above < 0) return upper[1] * 1000;
  const part = Math.min(1, (thousandths - lower[0]) / (upper[0] - lower[0]));
  return (lower[1] + (upper[1] - lower[1]) * part) * 1000;
}
