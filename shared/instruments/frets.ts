import type { Instrument } from "./instrument";

/**
 * Distance of a fret from the nut.
 *
 * @param scale scale length, any unit, > 0
 * @param semitones equal-tempered semitones above the open string, >= 0
 * @returns distance in the same unit
 * @throws RangeError if the scale is not positive or semitones is negative
 * @see equal temperament: x = L - L / 2^(n/12)
 * @example fretPosition(25.5, 12) // => 12.75
 */
export function fretPosition(scale: number, semitones: number): number {
  if (!(scale > 0)) throw new RangeError("scale must be a positive length");
  if (!(semitones >= 0)) throw new RangeError("semitones must not be negative");
  return scale - scale / 2 ** (semitones / 12);
}

/**
 * Distance between two frets, from fret wire to fret wire.
 *
 * @param scaleMm scale length in mm, > 0
 * @param lower semitones of the lower fret above the open string, >= 0
 * @param higher semitones of the higher fret, >= lower
 * @returns mm
 * @throws RangeError if the frets are in the wrong order
 * @example Math.round(fretSpanMm(647.7, 1, 4) * 10) / 10 // => 97.3
 */
export function fretSpanMm(scaleMm: number, lower: number, higher: number): number {
  if (higher < lower) throw new RangeError("the higher fret comes second");
  return fretPosition(scaleMm, higher) - fretPosition(scaleMm, lower);
}

/** Semitones within an octave that a diatonic fretboard counts by whole numbers: the scale with a flat seventh. */
const counted = new Set([0, 2, 4, 5, 7, 9, 10]);

/** The scale with a flat seventh, and the fret between its sixth step and the seventh that players call 6½. */
const diatonicSteps = [2, 4, 5, 7, 9, 10, 12];
const sixAndAHalf = 11;

/**
 * Fret map of a diatonic fretboard.
 *
 * @param count how many frets it has, >= 0
 * @param withHalf with the 6½ in every octave
 * @returns semitones above the open string at each fret, from the nut
 * @throws RangeError if the count is not whole or negative
 * @see common practice of makers of mountain dulcimers: 0 2 4 5 7 9 10 12, and 11 for the 6½
 * @example diatonicFrets(8, true) // => [2, 4, 5, 7, 9, 10, 11, 12]
 */
export function diatonicFrets(count: number, withHalf: boolean): number[] {
  if (!Number.isInteger(count) || count < 0) throw new RangeError("count must be a whole number of frets");
  const steps = withHalf ? [...diatonicSteps, sixAndAHalf].sort((a, b) => a - b) : diatonicSteps;
  return Array.from({ length: count }, (_, k) => 12 * Math.floor(k / steps.length) + steps[k % steps.length]!);
}

/**
 * What players call a fret. On a diatonic fretboard the frets of the scale are counted, and one between two of them is
 * the half after the lower: 6½ lies between 6 and 7.
 *
 * @param instrument for its fret map, if it has one
 * @param fret place on the neck, 0 = open
 * @returns "6½", "7"; the plain number where frets are chromatic or the fretboard has no such fret
 * @see common practice of players of the mountain dulcimer
 * @example fretName({ frets: 8, fretMap: [2, 4, 5, 7, 9, 10, 11, 12] }, 7) // => "6½"
 */
export function fretName(instrument: Pick<Instrument, "frets" | "fretMap">, fret: number): string {
  const semitones = fretSemitones(instrument, fret);
  if (!instrument.fretMap || semitones === null) return String(fret);
  let whole = 0;
  for (let at = 1; at <= semitones; at++) if (counted.has(at % 12)) whole++;
  if (counted.has(semitones % 12)) return String(whole);
  return whole === 0 ? "½" : `${whole}½`;
}

/**
 * Semitones that a fret raises the open string.
 *
 * @param instrument for its fret map, if it has one
 * @param fret 0 = open
 * @returns semitones, or null where the fretboard has no such fret
 */
export function fretSemitones(instrument: Pick<Instrument, "frets" | "fretMap">, fret: number): number | null {
  if (fret === 0) return 0;
  if (fret < 0 || fret > instrument.frets) return null;
  return instrument.fretMap ? (instrument.fretMap[fret - 1] ?? null) : fret;
}
