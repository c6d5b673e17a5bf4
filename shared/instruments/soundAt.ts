import { fretSemitones } from "./frets";
import type { Instrument } from "./instrument";
import { stringMidi } from "./tension";

/**
 * What sounds at a place of the neck.
 *
 * @param instrument in its tuning
 * @param string index from the bass side
 * @param fret from the nut, 0 = open
 * @returns MIDI note number; null where a short string or the neck has no such fret
 * @throws RangeError if the string's note cannot be read
 */
export function soundAt(
  instrument: Pick<Instrument, "strings" | "frets" | "fretMap">,
  string: number,
  fret: number,
): number | null {
  const of = instrument.strings[string];
  const semitones = fretSemitones(instrument, fret);
  if (!of || semitones === null) return null;
  const start = of.startsAtFret ?? 0;
  if (fret > 0 && fret <= start) return null;
  return stringMidi(of) + (fret === 0 ? 0 : semitones - (fretSemitones(instrument, start) ?? 0));
}
