import type { Instrument } from "../instruments/instrument";
import { stringMidi } from "../instruments/tension";
import { type KeyName, spellInKey } from "../music/keyName";
import { glyphs, noteName, pitchClass } from "../music/pitch";

/**
 * An instrument with all its strings moved alike.
 *
 * @param instrument any
 * @param semitones whole, negative = down
 * @param key spells the notes
 * @returns the same instrument, its strings renamed
 * @throws RangeError if a string's note cannot be read
 */
export function retuned(instrument: Instrument, semitones: number, key: KeyName): Instrument {
  if (semitones === 0) return instrument;
  const strings = instrument.strings.map((string) => {
    const midi = stringMidi(string) + semitones;
    const letter = spellInKey(pitchClass(midi), key);
    // B♯ and C♭ count their octave from their letter; the plain name says the same.
    const plain = noteName(midi);
    const octave = /-?\d+$/.exec(plain)?.[0] ?? "";
    return { ...string, note: /^(B#|Cb)$/.test(letter) ? plain : letter + octave };
  });
  return { ...instrument, strings };
}

/**
 * The strings by name: by letter alone where that tells them apart.
 *
 * @param strings from the bass side
 * @returns names with glyphs, such as "A" or "G2"
 * @example stringLetters([{ note: "G2" }, { note: "D3" }, { note: "G3" }]) // => ["G2", "D", "G3"]
 */
export function stringLetters(strings: readonly { note: string }[]): string[] {
  const letter = (note: string) => note.replace(/-?\d+$/, "");
  return strings.map(({ note }) =>
    glyphs(strings.filter((other) => letter(other.note) === letter(note)).length > 1 ? note : letter(note)),
  );
}
