import { plainAccidentals } from "./pitch";

/** Church modes as the trade names them; "major" and "minor" stand for ionian and aeolian. */
export type Mode = "major" | "minor" | "dorian" | "phrygian" | "lydian" | "mixolydian" | "locrian";

/** A key as musicians name it. The tonic is spelled in ASCII ("F#", "Bb"). */
export interface KeyName {
  tonic: string;
  mode: Mode;
}

const letters = "CDEFGAB";
const letterPitchClasses = [0, 2, 4, 5, 7, 9, 11];
/** Places of C, D, E … on the circle of fifths. */
const letterFifths = [0, 2, 4, -1, 1, 3, 5];
/** How far each mode's signature lies from that of the major key on the same tonic, in fifths. */
const modeFifths: Record<Mode, number> = {
  lydian: 1,
  major: 0,
  mixolydian: -1,
  dorian: -2,
  minor: -3,
  phrygian: -4,
  locrian: -5,
};
const modeSteps: Record<Mode, readonly number[]> = {
  lydian: [0, 2, 4, 6, 7, 9, 11],
  major: [0, 2, 4, 5, 7, 9, 11],
  mixolydian: [0, 2, 4, 5, 7, 9, 10],
  dorian: [0, 2, 3, 5, 7, 9, 10],
  minor: [0, 2, 3, 5, 7, 8, 10],
  phrygian: [0, 1, 3, 5, 7, 8, 10],
  locrian: [0, 1, 3, 5, 6, 8, 10],
};
/** Scale step (0 to 6) whose letter a chromatic note takes: b2, b3, #4, b6, b7. */
const chromaticSteps = [0, 1, 1, 2, 2, 3, 3, 4, 5, 5, 6, 6];
const modeWords: [RegExp, Mode][] = [
  [/^(?:major|maj|dur|ionian|ion)$/, "major"],
  [/^(?:minor|min|m|moll|aeolian|aeo)$/, "minor"],
  [/^(?:dorian|dor)$/, "dorian"],
  [/^(?:phrygian|phr)$/, "phrygian"],
  [/^(?:lydian|lyd)$/, "lydian"],
  [/^(?:mixolydian|mix)$/, "mixolydian"],
  [/^(?:locrian|loc)$/, "locrian"],
];

/**
 * Pitch class of a tonic or of any note name without octave.
 *
 * @param tonic a letter A to G with up to two accidentals, ASCII or glyphs
 * @returns 0 (C) to 11 (B)
 * @throws RangeError if this is no note name
 * @example tonicPitchClass("Bb") // => 10
 */
export function tonicPitchClass(tonic: string): number {
  const { letter, alter } = splitNote(tonic);
  return (letterPitchClasses[letter]! + alter + 24) % 12;
}

/**
 * Key signature as a place on the circle of fifths.
 *
 * @param key tonic and mode
 * @returns number of sharps (positive) or flats (negative); beyond 7 for keys nobody prints
 * @throws RangeError if the tonic is no note name
 * @see W3C MusicXML 4.0, element "fifths"
 * @example keyFifths({ tonic: "Eb", mode: "major" }) // => -3
 */
export function keyFifths(key: KeyName): number {
  const { letter, alter } = splitNote(key.tonic);
  return letterFifths[letter]! + 7 * alter + modeFifths[key.mode];
}

/**
 * How many sharps or flats a key has.
 *
 * @param key tonic and mode
 * @returns 0 or more
 * @throws RangeError if the tonic is no note name
 * @example accidentalCount({ tonic: "A", mode: "major" }) // => 3
 */
export function accidentalCount(key: KeyName): number {
  return Math.abs(keyFifths(key));
}

/**
 * The key with the given signature in a mode.
 *
 * @param fifths sharps (positive) or flats (negative), -14 to 14
 * @param mode which mode the tonic is to be found for
 * @returns the key, its tonic in ASCII
 * @throws RangeError if fifths is no whole number from -14 to 14
 * @see W3C MusicXML 4.0, elements "fifths" and "mode"
 * @example keyOfFifths(2, "minor").tonic // => "B"
 */
export function keyOfFifths(fifths: number, mode: Mode): KeyName {
  if (!Number.isInteger(fifths) || Math.abs(fifths) > 14)
    throw new RangeError("fifths must be a whole number, -14 to 14");
  const place = fifths - modeFifths[mode];
  const alter = Math.floor((place + 1) / 7);
  return { tonic: spell(letterFifths.indexOf(place - 7 * alter), alter), mode };
}

/**
 * Spells a tonic so that its key needs the fewest accidentals.
 *
 * @param pc pitch class, 0 (C) to 11 (B)
 * @param mode the key's mode
 * @returns ASCII name; of two keys with six accidentals the one with sharps, as on fretted instruments
 * @throws RangeError if pc is no whole number from 0 to 11
 * @see common practice; circle of fifths
 * @example spellTonic(1, "major") // => "Db"
 */
export function spellTonic(pc: number, mode: Mode): string {
  if (!Number.isInteger(pc) || pc < 0 || pc > 11) throw new RangeError("pc must be a whole number, 0 to 11");
  for (const fifths of [0, 1, -1, 2, -2, 3, -3, 4, -4, 5, -5, 6]) {
    const { tonic } = keyOfFifths(fifths, mode);
    if (tonicPitchClass(tonic) === pc) return tonic;
  }
  throw new RangeError("pc must be a whole number, 0 to 11");
}

/**
 * Spells any note as a key would: scale notes by their letters, chromatic ones by function
 * (flat second, third, sixth and seventh; sharp fourth; in minor a raised sixth and seventh).
 *
 * @param pc pitch class, 0 (C) to 11 (B)
 * @param key the key it stands in
 * @returns ASCII name with at most one accidental
 * @throws RangeError if pc is no whole number from 0 to 11 or the tonic is no note name
 * @see common practice; D. Temperley, The Cognition of Basic Musical Structures (2001), line of fifths
 * @example spellInKey(6, { tonic: "Db", mode: "major" }) // => "Gb"
 */
export function spellInKey(pc: number, key: KeyName): string {
  const semitones = (pc - tonicPitchClass(key.tonic) + 12) % 12;
  return spellAbove(key.tonic, scaleStepOf(semitones, key.mode), semitones);
}

/**
 * The scale step that a note belongs to: its own, or for a note off the scale the one it alters by function.
 *
 * @param semitones distance above the tonic, 0 to 11
 * @param mode the key's mode
 * @returns 0 (tonic) to 6
 * @throws RangeError if semitones is no whole number from 0 to 11
 * @see common practice: bII, bIII, #IV, bVI, bVII
 * @example scaleStepOf(10, "major") // => 6
 */
export function scaleStepOf(semitones: number, mode: Mode): number {
  const diatonic = modeSteps[mode].indexOf(semitones);
  const step = diatonic < 0 ? chromaticSteps[semitones] : diatonic;
  if (step === undefined) throw new RangeError("semitones must be a whole number, 0 to 11");
  return step;
}

/**
 * Spells the note a given number of letters and semitones above another.
 *
 * @param root the lower note, without octave
 * @param steps letters up, 0 or more: 2 for any third, 4 for any fifth
 * @param semitones semitones up
 * @returns ASCII name with at most one accidental: where the letter would need two, the plainer name is taken
 * @throws RangeError if root is no note name
 * @see common practice: intervals are counted in letters
 * @example spellAbove("E", 2, 4) // => "G#"
 */
export function spellAbove(root: string, steps: number, semitones: number): string {
  const letter = (splitNote(root).letter + steps) % 7;
  const pc = (((tonicPitchClass(root) + semitones) % 12) + 12) % 12;
  const alter = ((pc - letterPitchClasses[letter]! + 18) % 12) - 6;
  if (Math.abs(alter) <= 1) return spell(letter, alter);
  const natural = letterPitchClasses.indexOf(pc);
  if (natural >= 0) return spell(natural, 0);
  return alter > 0 ? spell(letterPitchClasses.indexOf(pc - 1), 1) : spell(letterPitchClasses.indexOf(pc + 1), -1);
}

/**
 * How many letters one note lies above another, whatever their accidentals.
 *
 * @param root lower note, without octave
 * @param note upper note, without octave
 * @returns 0 (same letter) to 6
 * @throws RangeError if either is no note name
 * @example letterSteps("D", "C#") // => 6
 */
export function letterSteps(root: string, note: string): number {
  return (splitNote(note).letter - splitNote(root).letter + 7) % 7;
}

/**
 * Reads a key as people write it.
 *
 * @param text such as "D", "F#m", "B♭ minor", "e", "A dorian"; a lone small letter means minor
 * @returns the key, or null if it cannot be read
 * @example parseKeyName("F♯m") // => { tonic: "F#", mode: "minor" }
 */
export function parseKeyName(text: string): KeyName | null {
  const match = /^([A-Ga-g])(#|b|[-\s]?(?:sharp|flat)(?![a-z]))?[-\s]*([A-Za-z]*)$/.exec(plainAccidentals(text).trim());
  if (!match) return null;
  const [, letter = "", accidental = "", word = ""] = match;
  const sign = accidental.endsWith("sharp") ? "#" : accidental.endsWith("flat") ? "b" : accidental;
  const tonic = letter.toUpperCase() + sign;
  if (word === "") return { tonic, mode: letter === letter.toUpperCase() ? "major" : "minor" };
  if (word === "M") return { tonic, mode: "major" };
  const mode = modeWords.find(([pattern]) => pattern.test(word.toLowerCase()))?.[1];
  return mode ? { tonic, mode } : null;
}

/**
 * Scale of a mode.
 *
 * @param mode which mode
 * @returns seven semitone distances above the tonic, ascending from 0
 * @example scaleSteps("mixolydian") // => [0, 2, 4, 5, 7, 9, 10]
 */
export function scaleSteps(mode: Mode): readonly number[] {
  return modeSteps[mode];
}

function splitNote(name: string): { letter: number; alter: number } {
  const match = /^([A-G])(#{0,2}|b{0,2})$/.exec(plainAccidentals(name));
  if (!match) throw new RangeError(`"${name}" is no note name`);
  const [, letter = "", accidental = ""] = match;
  return {
    letter: letters.indexOf(letter),
    alter: accidental.startsWith("b") ? -accidental.length : accidental.length,
  };
}

function spell(letter: number, alter: number): string {
  return letters.charAt(letter) + (alter < 0 ? "b".repeat(-alter) : "#".repeat(alter));
}
