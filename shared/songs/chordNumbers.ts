import { type Chord, chordPitchClasses, chordThird } from "../music/chord";
import { type KeyName, type Mode, scaleStepOf, scaleSteps, tonicPitchClass } from "../music/keyName";
import { plainAccidentals } from "../music/pitch";

/** A chord by its place in a key. */
export interface ChordNumber {
  /** 1 to 7 */
  degree: number;
  /** the root lies off the scale: "b" below, "#" above its step; else "" */
  accidental: "" | "b" | "#";
  /** roman numeral, small for minor and diminished: "IV", "ii7", "bVII", "#iv°", "viiø7", "V/3" */
  roman: string;
  /** plain number: "4", "2m7", "b7", "5/3" */
  plain: string;
  /** what it leads to, where that is sure: "V7/V" for D7 before G in C, "vii°7/ii" for C#dim7 before Dm; else null */
  leadsTo: { roman: string; plain: string } | null;
}

const romans = ["I", "II", "III", "IV", "V", "VI", "VII"];

/**
 * Numbers a chord by its place in a key.
 *
 * @param chord a parsed chord
 * @param key the key it stands in
 * @param next the chord that follows; only with it can a chord be sure to lead somewhere
 * @returns its numbers; a bass note is given by its own step behind a slash
 * @throws RangeError if the key's tonic is no note name
 * @see common practice: roman numerals, and plain numbers as bands call them
 */
export function chordNumber(chord: Chord, key: KeyName, next: Chord | null = null): ChordNumber {
  const { degree, accidental } = stepOf(chord.root, key);
  const bass = chord.bass === null ? null : stepOf(chord.bass, key);
  const over = bass === null ? "" : `/${bass.accidental}${bass.degree}`;
  const small = chordThird(chord) === "minor";
  const numeral = romans[degree - 1]!;
  const behind = small ? shortQuality(chord.quality) : chord.quality;
  // "5" and "7" side by side would read as fifty-seven.
  const plainQuality = chord.quality.replace(/^\d[^(]*/, (digits) => `(${digits})`);
  return {
    degree,
    accidental,
    roman: accidental + (small ? numeral.toLowerCase() : numeral) + behind + over,
    plain: accidental + degree + plainQuality + over,
    leadsTo: next && leading(chord, next, key),
  };
}

/** What a small numeral leaves to say: that it is minor goes without, diminished and half diminished get their signs. */
function shortQuality(quality: string): string {
  return plainAccidentals(quality)
    .replace(/^(?:minor|min|mi|Min|MI|m(?!aj)|-)/, "m")
    .replace(/^m(?:7b5|7\(b5\))/, "ø7")
    .replace(/^(?:m(?:b5|\(b5\))|[Dd]im|o(?!mit))/, "°")
    .replace(/^m/, "");
}

/** Triads at home above each tonic, by their degree in semitones; minor with the raised seventh of its cadences. */
const triads: Partial<Record<Mode, Record<number, "major" | "minor">>> = {
  major: { 2: "minor", 4: "minor", 5: "major", 7: "major", 9: "minor" },
  minor: { 3: "major", 5: "minor", 7: "major", 8: "major", 10: "major" },
  dorian: { 2: "minor", 3: "major", 5: "major", 7: "minor", 10: "major" },
  mixolydian: { 2: "minor", 5: "major", 7: "minor", 9: "minor", 10: "major" },
};

/**
 * A dominant, or a diminished chord a semitone below, that goes to a chord of the key other than its tonic, and sounds a
 * note from outside the key on the way.
 */
function leading(chord: Chord, next: Chord, key: KeyName): ChordNumber["leadsTo"] {
  const tonic = tonicPitchClass(key.tonic);
  const target = (tonicPitchClass(next.root) - tonic + 12) % 12;
  const third = chordThird(next);
  // A minor key takes its dominant minor as well.
  const home = third !== null && (triads[key.mode]?.[target] === third || (key.mode === "minor" && target === 7));
  const foreign = chordPitchClasses(chord).some((pc) => !scaleSteps(key.mode).includes((pc - tonic + 12) % 12));
  if (!home || !foreign) return null;
  const distance = (tonicPitchClass(next.root) - tonicPitchClass(chord.root) + 12) % 12;
  const has = (interval: number) => chord.intervals.includes(interval);
  const { degree, accidental } = stepOf(next.root, key);
  const numeral = romans[degree - 1]!;
  const to = accidental + (third === "minor" ? numeral.toLowerCase() : numeral);
  const told = (roman: string, plain: string) => ({
    roman: `${roman}/${to}`,
    plain: `${plain}/${accidental}${degree}${third === "minor" ? "m" : ""}`,
  });
  if (distance === 5 && has(4) && !has(11)) return has(10) ? told("V7", "5(7)") : told("V", "5");
  const diminished = has(3) && has(6) && !has(7);
  if (distance !== 1 || !diminished) return null;
  return has(10) ? told("viiø7", "7m7b5") : has(9) ? told("vii°7", "7dim7") : told("vii°", "7dim");
}

function stepOf(note: string, key: KeyName): Pick<ChordNumber, "degree" | "accidental"> {
  const semitones = (tonicPitchClass(note) - tonicPitchClass(key.tonic) + 12) % 12;
  const step = scaleStepOf(semitones, key.mode);
  const off = semitones - scaleSteps(key.mode)[step]!;
  return { degree: step + 1, accidental: off < 0 ? "b" : off > 0 ? "#" : "" };
}
