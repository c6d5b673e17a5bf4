import type { InstrumentString, StringMaterial } from "../instrument";

/** Note, gauge in inches (null where nobody prints one), material and, where it is another, the note it was made for. */
export type Strung = readonly [note: string, gaugeIn: number | null, material: StringMaterial, madeFor?: string];

/**
 * Strings of a preset.
 *
 * @param strings from the bass side to the treble side
 * @returns the same as an instrument holds them
 * @example strung(["A3", 0.018, "plain-steel"]) // => [{ note: "A3", gaugeIn: 0.018, material: "plain-steel" }]
 */
export function strung(...strings: readonly Strung[]): InstrumentString[] {
  return strings.map(([note, gaugeIn, material, madeFor]) => ({
    note,
    gaugeIn,
    material,
    ...(madeFor === undefined || madeFor === note ? null : { madeFor }),
  }));
}

/**
 * Pairs: each string stands beside another of its kind.
 *
 * @param strings one of each pair
 * @returns the same strings, each counted twice
 * @example inPairs([{ note: "A4", gaugeIn: null, material: "plain-steel" }])[0].inCourse // => 2
 */
export function inPairs(strings: readonly InstrumentString[]): InstrumentString[] {
  return strings.map((string) => ({ ...string, inCourse: 2 }));
}

/**
 * A printed scale in millimetres.
 *
 * @param inches as makers print it
 * @returns mm, to a tenth
 * @example inchesToMm(25) // => 635
 */
export function inchesToMm(inches: number): number {
  return Math.round(inches * 254) / 10;
}
