/** What an answer is worth, and why, computed from what was answered. */
export interface Verdict {
  right: boolean;
  /** one or two sentences with glyphs */
  words: string;
}

/** A place on the neck. */
export interface NeckAnswer {
  /** index of the string, from the bass side */
  string: number;
  /** fret from the nut, 0 = open */
  fret: number;
}

/** A question about the song or the instrument, with what checks its answer. */
export type CoachQuestion =
  /** answered with a note in any octave: its pitch class, 0 (C) to 11 (B) */
  | { kind: "keyboard"; ask: string; check: (pc: number) => Verdict }
  /** answered with one of the options, each as it is shown */
  | { kind: "choices"; ask: string; options: readonly string[]; check: (option: string) => Verdict }
  /** answered with a place among these frets; `whole` takes any string of the fret, as a capo does */
  | {
      kind: "neck";
      ask: string;
      firstFret: number;
      frets: number;
      whole: boolean;
      check: (place: NeckAnswer) => Verdict;
    };
