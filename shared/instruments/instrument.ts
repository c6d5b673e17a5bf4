/** What a string is made of; decides its weight and its limits. */
export type StringMaterial =
  "plain-steel" | "nickel-wound" | "phosphor-bronze" | "brass-wound" | "nylon" | "fluorocarbon" | "unknown";

/** One string (or course). */
export interface InstrumentString {
  /** ASCII note name with octave: "F#4" */
  note: string;
  /** diameter in inches; null when not known */
  gaugeIn: number | null;
  material: StringMaterial;
  /** own sounding length in mm where it differs from the scale (a short drone string) */
  scaleMm?: number;
  /** fret of the main strings at which a short string's nut stands; it cannot be stopped below */
  startsAtFret?: number;
  /** note its set was made for, where it is kept at another one; decides how far it may be tuned */
  madeFor?: string;
  /** how many strings of this kind stand side by side here and sound as one; 1 when absent */
  inCourse?: number;
}

/** An instrument in one tuning. Strings in playing order, from the bass side of the neck to the treble side. */
export interface Instrument {
  id: string;
  name: string;
  strings: InstrumentString[];
  scaleMm: number;
  frets: number;
  /** semitones above the open string at each fret, for diatonic fretboards; chromatic when absent */
  fretMap?: number[];
  /** highest fret at which a capo is of use; 0 when none may be used */
  capoTo: number;
  leftHanded: boolean;
}
