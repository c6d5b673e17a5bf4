import { glyphs, plainAccidentals } from "./pitch";
import { type KeyName, letterSteps, scaleSteps, spellAbove, spellInKey, spellTonic, tonicPitchClass } from "./keyName";

/** A chord as written in a chart. */
export interface Chord {
  /** ASCII, such as "F#" */
  root: string;
  /** what stands behind the root, exactly as written, without the bass: "m7b5", "(add9)", "" */
  quality: string;
  /** semitones above the root, ascending, 0 first unless the root is left out; extensions above the octave (a ninth is 14) */
  intervals: number[];
  /** bass note behind a slash, ASCII, or null */
  bass: string | null;
  /** the whole symbol as written */
  text: string;
}

const chordPattern = /^([A-G])([#b]?)(.*?)(?:\/([A-G][#b]?))?$/;

/** The chord under construction: named places, so that an alteration replaces what it alters. */
interface Stack {
  thirds: number[];
  fifths: number[];
  others: Set<number>;
  seventh: number | null;
}

/**
 * Reads a chord symbol. A symbol counts only when every character of it is understood.
 *
 * @param text one symbol without blanks: "Am7", "F♯ø", "Gsus4/D", "C7(b9,#11)", "Bb°7"
 * @returns the chord, or null if this is no chord symbol
 * @see common practice of lead-sheet symbols
 * @example parseChord("Amen") // => null
 */
export function parseChord(text: string): Chord | null {
  if (text.length > 32) return null;
  const match = chordPattern.exec(plainAccidentals(text));
  if (!match) return null;
  const [, letter = "", accidental = "", quality = "", bass = null] = match;
  const intervals = readQuality(quality);
  if (!intervals) return null;
  const written = text.slice(1 + accidental.length, text.length - (bass === null ? 0 : bass.length + 1));
  return { root: letter + accidental, quality: written, intervals, bass, text };
}

/**
 * The pitch classes that a chord sounds, bass included.
 *
 * @param chord a parsed chord
 * @returns pitch classes 0 (C) to 11 (B), ascending, each once
 */
export function chordPitchClasses(chord: Chord): number[] {
  const root = tonicPitchClass(chord.root);
  const sounding = new Set(chord.intervals.map((interval) => (root + interval) % 12));
  if (chord.bass !== null) sounding.add(tonicPitchClass(chord.bass));
  return [...sounding].sort((a, b) => a - b);
}

/**
 * The kind of third in a chord.
 *
 * @param chord a parsed chord
 * @returns "major", "minor", or null for suspended and power chords
 */
export function chordThird(chord: Chord): "major" | "minor" | null {
  if (chord.intervals.includes(4)) return "major";
  return chord.intervals.includes(3) ? "minor" : null;
}

/**
 * Moves a chord and spells it as the target key would: scale notes by the key, chromatic roots by function,
 * a bass note by its place in the chord. The quality stays exactly as written.
 *
 * @param chord a parsed chord
 * @param semitones how far to move, whole, negative for down
 * @param target the key to arrive in
 * @param from the key it came from, for the spelling of passing diminished chords; default: the plainest name of that key
 * @returns the symbol; accidentals as glyphs where the chord was written with glyphs, else ASCII
 * @throws RangeError if semitones is not whole
 * @see common practice: bII, bIII, bVI, bVII as flats of the letter, #IV as a sharp
 */
export function transposeChord(chord: Chord, semitones: number, target: KeyName, from?: KeyName): string {
  if (!Number.isInteger(semitones)) throw new RangeError("semitones must be whole");
  const move = (pc: number) => (((pc + semitones) % 12) + 12) % 12;
  const root = spellRoot(chord, move(tonicPitchClass(chord.root)), semitones, target, from);
  const bass = chord.bass === null ? "" : `/${spellBass(chord, root, move(tonicPitchClass(chord.bass)), target)}`;
  const asWritten = /[♯♭]/.test(chord.text) ? glyphs : (name: string) => name;
  return asWritten(root) + chord.quality + asWritten(bass);
}

function spellRoot(chord: Chord, pc: number, semitones: number, target: KeyName, from?: KeyName): string {
  const plain = spellInKey(pc, target);
  if (!isDiminished(chord)) return plain;
  // A passing diminished chord leads up from a raised note or down from a lowered one: only its writer knows which.
  const oldTonic =
    from?.tonic ?? spellTonic((((tonicPitchClass(target.tonic) - semitones) % 12) + 12) % 12, target.mode);
  const degree = (pc - tonicPitchClass(target.tonic) + 12) % 12;
  const steps = letterSteps(oldTonic, chord.root);
  const raised: Record<number, number> = { 1: 0, 3: 1, 6: 3, 8: 4 };
  return raised[degree] === steps ? spellAbove(target.tonic, steps, degree) : plain;
}

function spellBass(chord: Chord, root: string, pc: number, target: KeyName): string {
  const semitones = (pc - tonicPitchClass(root) + 12) % 12;
  const sounding = chord.intervals.find((interval) => interval % 12 === semitones);
  if (sounding !== undefined) return spellAbove(root, stepsOfInterval(sounding, chord), semitones);
  const inScale = scaleSteps(target.mode).includes((pc - tonicPitchClass(target.tonic) + 12) % 12);
  return inScale ? spellInKey(pc, target) : spellAbove(root, stepsOfInterval(semitones, chord), semitones);
}

/** Letters above the root that a chord's interval is counted in. */
function stepsOfInterval(interval: number, chord: Chord): number {
  if (interval === 6 && chord.intervals.includes(6)) return 4;
  if (interval === 8 && chord.intervals.includes(8)) return 4;
  if (interval === 9 && isDiminished(chord) && chord.intervals.includes(9)) return 6;
  if (interval === 15) return 1;
  return [0, 1, 1, 2, 2, 3, 3, 4, 5, 5, 6, 6][interval % 12]!;
}

function isDiminished(chord: Chord): boolean {
  return chord.intervals.includes(3) && chord.intervals.includes(6) && !chord.intervals.includes(7);
}

/** The intervals of a quality, or null where something in it is not understood. */
function readQuality(written: string): number[] | null {
  if (!parenthesesMatch(written)) return null;
  const stack: Stack = { thirds: [4], fifths: [7], others: new Set(), seventh: null };
  // Brackets and commas only part one alteration from the next.
  let rest = written
    .replace(/[(),]+/g, "|")
    .replace(/^\|/, "")
    .replace(/\|$/, "");
  const take = (pattern: RegExp): string | null => {
    const found = pattern.exec(rest)?.[0] ?? null;
    rest = rest.slice(found?.length ?? 0);
    return found;
  };
  const family = readFamily(take, stack);
  readNumber(take, stack, family);
  while (rest !== "") {
    if (!readModifier(take, stack) && take(/^\|/) === null) return null;
  }
  const all = [
    0,
    ...stack.thirds,
    ...stack.fifths,
    ...stack.others,
    ...(stack.seventh === null ? [] : [stack.seventh]),
  ];
  return [...new Set(all)].sort((a, b) => a - b);
}

type Family = "plain" | "major" | "majorSeventh" | "diminished" | "halfDiminished";
type Take = (pattern: RegExp) => string | null;

function readFamily(take: Take, stack: Stack): Family {
  if (take(/^[Δ∆△^]/) !== null) {
    stack.seventh = 11;
    return "majorSeventh";
  }
  if (take(/^(?:[Mm]ajor|MAJ|[Mm]aj|MA|Ma|ma(?!dd)|M)/) !== null) return "major";
  if (take(/^(?:[Mm]inor|MIN|[Mm]in|MI|Mi|mi|m|-(?!5))/) !== null) {
    stack.thirds = [3];
    take(/^\|(?=[MmΔ∆△])/);
    if (take(/^[Δ∆△]/) !== null) {
      stack.seventh = 11;
      return "majorSeventh";
    }
    return take(/^(?:[Mm]aj|Ma|ma(?!dd)|M)(?=\|?(?:7|9|11|13))/) === null ? "plain" : "major";
  }
  if (take(/^(?:[Dd]im|[°ºo˚])/) !== null) {
    stack.thirds = [3];
    stack.fifths = [6];
    take(/^\|(?=[Mm]aj7)/);
    return take(/^(?:[Mm]aj|M)(?=7)/) === null ? "diminished" : "major";
  }
  if (take(/^[øØ]/) !== null) {
    stack.thirds = [3];
    stack.fifths = [6];
    stack.seventh = 10;
    return "halfDiminished";
  }
  if (take(/^(?:[Aa]ug|\+(?!5))/) !== null) stack.fifths = [8];
  return "plain";
}

function readNumber(take: Take, stack: Stack, family: Family): void {
  const number = take(/^\|?(?:6\/9|69|13|11|9|7M?|6|5|4|2)/)?.replace("|", "");
  if (number === undefined) return;
  const seventh =
    family === "major" || family === "majorSeventh" || number === "7M" ? 11 : family === "diminished" ? 9 : 10;
  switch (number) {
    case "5":
      stack.thirds = [];
      break;
    case "2":
      stack.others.add(2);
      break;
    case "4":
      stack.thirds = [5];
      break;
    case "6":
      stack.others.add(9);
      break;
    case "69":
    case "6/9":
      stack.others.add(9).add(14);
      break;
    default:
      stack.seventh = seventh;
      if (number === "9" || number === "11" || number === "13") stack.others.add(14);
      if (number === "11") stack.others.add(17);
      if (number === "13") stack.others.add(21);
  }
}

const naturalTop: Record<string, number> = { "2": 2, "4": 5, "6": 9, "9": 14, "11": 17, "13": 21 };

function readModifier(take: Take, stack: Stack): boolean {
  const suspended = take(/^(?:sus|Sus|SUS)(?:2sus4|4sus2|24|42|2|4)?/);
  if (suspended !== null) {
    const digits = suspended.replace(/\D/g, "");
    stack.thirds = digits === "2" ? [2] : digits.length > 1 ? [2, 5] : [5];
    return true;
  }
  const added = take(/^add[#b]?(?:13|11|9|6|4|2)/);
  if (added !== null) {
    stack.others.add(altered(added.slice(3)));
    return true;
  }
  const dropped = take(/^(?:no|omit)\.?(?:3rd|3|5th|5)/);
  if (dropped !== null) {
    if (dropped.includes("3")) stack.thirds = [];
    else stack.fifths = [];
    return true;
  }
  if (take(/^alt/) !== null) {
    stack.fifths = [6, 8];
    stack.seventh ??= 10;
    stack.others.delete(14);
    stack.others.add(13).add(15);
    return true;
  }
  const fifth = take(/^[#b+-]5/);
  if (fifth !== null) {
    const semitones = /^[#+]/.test(fifth) ? 8 : 6;
    stack.fifths =
      stack.fifths.includes(7) || stack.fifths.length === 0 ? [semitones] : [...new Set([...stack.fifths, semitones])];
    return true;
  }
  const alteration = take(/^[#b+-](?:13|11|9)/);
  if (alteration !== null) {
    const degree = alteration.slice(1);
    stack.others.delete(naturalTop[degree]!);
    stack.others.add(altered(alteration));
    return true;
  }
  const majorSeventh = take(/^(?:[Mm]aj|M|Δ)7/);
  if (majorSeventh !== null && stack.seventh === null) {
    stack.seventh = 11;
    return true;
  }
  if (take(/^\+/) !== null) {
    stack.fifths = [8];
    return true;
  }
  const tension = take(/^[/|](?:13|11|9|6)/);
  if (tension === null) return false;
  stack.others.add(altered(tension.slice(1)));
  return true;
}

function altered(degree: string): number {
  const natural = naturalTop[degree.replace(/^[#b+-]/, "")]!;
  return natural + (/^[#+]/.test(degree) ? 1 : /^[b-]/.test(degree) ? -1 : 0);
}

function parenthesesMatch(text: string): boolean {
  let open = 0;
  let previous = "";
  for (const character of text) {
    if (character === "(") open += 1;
    if (character === ")") open -= 1;
    if (open < 0 || open > 1 || (character === ")" && previous === "(")) return false;
    previous = character;
  }
  return open === 0;
}
