import type { InstrumentString } from "../instruments/instrument";
import { stringMidi } from "../instruments/tension";

/**
 * A name for what the fingers do, the same wherever it is done: frets from the bass side on, "x" for silent strings. A
 * shape without open strings is counted from its lowest fret, because it can be moved along the neck.
 *
 * @param frets low to high: 0 = open, null = silent; counted from nut or capo
 * @returns such as "x 3 2 0 1 0"
 * @example shapeMark([3, 5, 5, 4, 3, 3]) // => "1 3 3 2 1 1"
 * @example shapeMark([null, 3, 2, 0, 1, 0]) // => "x 3 2 0 1 0"
 */
export function shapeMark(frets: readonly (number | null)[]): string {
  let lowest = 99;
  for (const fret of frets) if (fret !== null && fret < lowest) lowest = fret;
  const down = lowest === 0 || lowest === 99 ? 0 : lowest - 1;
  return frets.map((fret) => (fret === null ? "x" : fret - down)).join(" ");
}

/**
 * A name for how the strings stand to each other: instruments with the same one share their shapes, whatever they are
 * tuned to as a whole.
 *
 * @param instrument tuning and frets
 * @returns such as "5 5 5 4 5"; short strings and diatonic frets are told
 * @throws RangeError if a string's note cannot be read
 * @example tuningMark({ strings: [{ note: "A3" }, { note: "D4" }, { note: "F#4" }] }) // => "5 4"
 */
export function tuningMark({ strings, fretMap }: Tuned): string {
  const midis = strings.map(stringMidi);
  const steps = midis.slice(1).map((midi, k) => midi - midis[k]!);
  const short = strings.flatMap(({ startsAtFret }, k) => (startsAtFret === undefined ? [] : [`short ${k + 1}`]));
  const frets = fretMap ? [`frets ${fretMap.join(" ")}`] : [];
  return [steps.join(" "), ...short, ...frets].join(", ");
}

/** As much of an instrument as its shapes hang on. */
interface Tuned {
  strings: readonly Pick<InstrumentString, "note" | "startsAtFret">[];
  fretMap?: readonly number[];
}
