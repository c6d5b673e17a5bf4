import type { KeyScore } from "./keyScore";

/** How one singer fares in a key that is sung together. */
export interface SharedSinger {
  name: string;
  /** octaves from the tune as written to where this singer is best off, after the move to the nearest place of the tonic */
  octave: number;
  /** semitones from the tune as written to where this singer sings it, octave included */
  shift: number;
  /** 0 to 100 */
  score: number;
  /** some of the tune lies outside this singer's range */
  beyond: boolean;
  /** how far the tune leaves the comfort band on each side, whole semitones, 0 = not at all */
  squeezed: { above: number; below: number };
  /** how far it leaves the range on each side, whole semitones, 0 = not at all */
  outOfRange: { above: number; below: number };
  /** this key as it is judged for this singer alone: span, parts, marks and the sentence that goes with it */
  key: KeyScore;
}
