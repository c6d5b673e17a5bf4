import { type Chord, chordThird } from "../music/chord";
import { type KeyName, scaleStepOf, scaleSteps, tonicPitchClass } from "../music/keyName";

/** A chord by its place in a key. */
export interface ChordNumber {
  /** 1 to 7 */
  degree: number;
  /** the root lies off the scale: "b" below, "#" above its step; else "" */
  accidental: "" | "b" | "#";
  /** roman numeral, small for minor and diminished: "IV", "ii7", "bVII", "V/3" */
  roman: string;
  /** plain number: "4", "2m7", "b7", "5/3" */
  plain: string;
}

const romans = ["I", "II", "III", "IV", "V", "VI", "VII"];

/**
 * Numbers a chord by its place in a key.
 *
 * @param chord a parsed chord
 * @param key the key it stands in
 * @returns its numbers; a bass note is given by its own step behind a slash
 * @throws RangeError if the key's tonic is no note name
 * @see common practice: roman numerals, and plain numbers as bands call them
 */
export function chordNumber(chord: Chord, key: KeyName): ChordNumber {
  const { degree, accidental } = stepOf(chord.root, key);
  const bass = chord.bass === null ? null : stepOf(chord.bass, key);
  const over = bass === null ? "" : `/${bass.accidental}${bass.degree}`;
  const small = chordThird(chord) === "minor";
  const numeral = romans[degree - 1]!;
  const behind = small ? chord.quality.replace(/^(?:minor|min|mi|Min|MI|m(?!aj)|-)/, "") : chord.quality;
  // "5" and "7" side by side would read as fifty-seven.
  const plainQuality = chord.quality.replace(/^\d[^(]*/, (digits) => `(${digits})`);
  return {
    degree,
    accidental,
    roman: accidental + (small ? numeral.toLowerCase() : numeral) + behind + over,
    plain: accidental + degree + plainQuality + over,
  };
}

function stepOf(note: string, key: KeyName): Pick<ChordNumber, "degree" | "accidental"> {
  const semitones = (tonicPitchClass(note) - tonicPitchClass(key.tonic) + 12) % 12;
  const step = scaleStepOf(semitones, key.mode);
  const off = semitones - scaleSteps(key.mode)[step]!;
  return { degree: step + 1, accidental: off < 0 ? "b" : off > 0 ? "#" : "" };
}
