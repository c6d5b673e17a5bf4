import { fretSemitones } from "../../instruments/frets";
import type { Instrument } from "../../instruments/instrument";
import { stringMidi } from "../../instruments/tension";

/** What is done to the instrument before the first chord. */
export interface NeckSetting {
  /** semitones, all strings alike; negative = down */
  retune: number;
  /** fret of the capo, 0 for none */
  capo: number;
}

/** A string that sounds. */
export interface SoundedString {
  /** index, from the bass side */
  string: number;
  midi: number;
}

/**
 * What is heard when a shape is played. A short string is taken to be stopped as many frets up as the capo stands.
 *
 * @param frets low to high, counted from nut or capo; 0 = open, null = silent
 * @param instrument tuning and frets
 * @param setting retune and capo
 * @returns the strings that sound, from the bass side on
 * @throws RangeError if a string's note cannot be read or the neck has no such fret
 * @example soundedStrings([null, 0], { strings: [{ note: "G3" }, { note: "D4" }], frets: 12 }, { retune: 0, capo: 2 }) // => [{ string: 1, midi: 64 }]
 */
export function soundedStrings(
  frets: readonly (number | null)[],
  instrument: Pick<Instrument, "frets" | "fretMap"> & {
    strings: readonly Pick<Instrument["strings"][number], "note">[];
  },
  { retune, capo }: NeckSetting,
): SoundedString[] {
  return frets.flatMap((fret, string) => {
    const open = instrument.strings[string];
    if (fret === null || !open) return [];
    const raised = fretSemitones(instrument, capo + fret);
    if (raised === null) throw new RangeError(`the neck has no fret ${capo + fret}`);
    return [{ string, midi: stringMidi(open) + retune + raised }];
  });
}
