import type { Metre } from "../../songs/backing/metre";

/** What the right hand does on one eighth of a bar. */
export type Step = "down" | "up" | "bass" | "pluck" | "rest";

/** What the right hand does in every bar, eighth by eighth. */
export interface StrokePattern {
  name: string;
  /** the upper figure of the metre it is for */
  beats: number;
  /** one for each eighth of the bar */
  steps: Step[];
}

/** The steps in the order in which an editor offers them. */
export const stepKinds: readonly Step[] = ["down", "up", "bass", "pluck", "rest"];

/**
 * How many steps a bar has: its eighths.
 *
 * @param metre how the song is counted
 * @returns 2 to 32
 * @example stepsOf({ name: "6/8", beats: 6, quarters: 3, strong: [0, 3] }) // => 6
 */
export function stepsOf({ quarters }: Metre): number {
  return quarters * 2;
}

/** Each pattern in each metre, letter by letter: beginners' patterns of the folk guitar and of plucked strings at large. */
const letters: Record<string, readonly (readonly [name: string, steps: string])[]> = {
  "2/4": [
    ["Down, down-up", "D.DU"],
    ["Bass and strum", "B.D."],
    ["Pluck and strum", "P.DU"],
    ["String after string", "BPPP"],
  ],
  "3/4": [
    ["Down strokes", "D.D.D."],
    ["Down, down-up, down-up", "D.DUDU"],
    ["Bass, strum, strum", "B.D.D."],
    ["Pluck and strum", "P.D.DU"],
    ["String after string", "BPPPPP"],
  ],
  "4/4": [
    ["Down strokes", "D.D.D.D."],
    ["Down, down-up, up-down-up", "D.DU.UDU"],
    ["Alternating bass", "B.D.B.D."],
    ["Alternating bass with upstrokes", "B.DUB.DU"],
    ["Pluck and strum", "P.DUP.DU"],
    ["String after string", "BPPPBPPP"],
  ],
  "6/8": [
    ["Two down strokes", "D..D.."],
    ["Down-down-up, twice", "DDUDDU"],
    ["Alternating bass", "BDUBDU"],
    ["Pluck and strum", "PDUPDU"],
    ["String after string", "BPPPPP"],
  ],
};

const stepOf: Record<string, Step> = { D: "down", U: "up", B: "bass", P: "pluck", ".": "rest" };

/**
 * The usual patterns of a metre.
 *
 * @param metre how the song is counted
 * @returns one at least: metres without patterns of their own get down strokes on every beat
 * @see common practice
 * @example commonPatterns({ name: "3/4", beats: 3, quarters: 3, strong: [0] })[2].steps // => ["bass", "rest", "down", "rest", "down", "rest"]
 */
export function commonPatterns(metre: Metre): StrokePattern[] {
  const { name: metreName, beats } = metre;
  const known = letters[metreName];
  if (known) {
    return known.map(([name, steps]) => ({ name, beats, steps: [...steps].map((letter) => stepOf[letter]!) }));
  }
  const beat = stepsOf(metre) / beats;
  const steps = Array.from({ length: stepsOf(metre) }, (_, k): Step => (k % beat === 0 ? "down" : "rest"));
  return [{ name: "Down strokes", beats, steps }];
}

/**
 * Whether a pattern is for a metre.
 *
 * @param pattern any pattern
 * @param metre how the song is counted
 * @returns true if it fills the bar
 */
export function fitsMetre({ beats, steps }: StrokePattern, metre: Metre): boolean {
  return beats === metre.beats && steps.length === stepsOf(metre);
}
