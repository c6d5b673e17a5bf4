import { readQuality } from "./chordQuality";
import { leadingNote, type NoteNaming, readNote, writeNote } from "./noteNaming";
import { plainAccidentals } from "./pitch";
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

/**
 * Reads a chord symbol. A symbol counts only when every character of it is understood.
 *
 * @param text one symbol without blanks: "Am7", "F♯ø", "Gsus4/D", "C7(b9,#11)", "Bb°7"
 * @param naming how the writer calls notes; root and bass of the chord are in English naming whatever it is
 * @returns the chord, or null if this is no chord symbol
 * @see common practice of lead-sheet symbols
 * @example parseChord("Amen") // => null
 */
export function parseChord(text: string, naming: NoteNaming = "english"): Chord | null {
  if (text.length > 32) return null;
  const root = leadingNote(text, naming);
  if (!root) return null;
  const behind = text.slice(root.length);
  const slash = behind.lastIndexOf("/");
  const bass = slash < 0 ? null : readNote(behind.slice(slash + 1), naming);
  const quality = bass === null ? behind : behind.slice(0, slash);
  const intervals = readQuality(plainAccidentals(quality));
  return intervals && { root: root.note, quality, intervals, bass, text };
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
 * Moves a chord and spells it as the target key would: scale notes by the key, chromatic roots by the function they
 * were written with, a bass note by its place in the chord. The quality stays as written, and a chord that
 * stays in its key stays as it is.
 *
 * @param chord a parsed chord
 * @param semitones how far to move, whole, negative for down
 * @param target the key to arrive in
 * @param from the key it came from, which tells what a chromatic root was meant as; default: the plainest name of that key
 * @param naming how the chord was written and is to be written
 * @returns the symbol; accidentals as glyphs where the chord was written with glyphs, else ASCII
 * @throws RangeError if semitones is not whole
 * @see common practice: bII, bIII, bVI, bVII as flats of the letter, #iv as a sharp, roots that lead up as sharps
 */
export function transposeChord(
  chord: Chord,
  semitones: number,
  target: KeyName,
  from?: KeyName,
  naming: NoteNaming = "english",
): string {
  if (!Number.isInteger(semitones)) throw new RangeError("semitones must be whole");
  const staysInKey = !from || (from.tonic === target.tonic && from.mode === target.mode);
  if (semitones % 12 === 0 && staysInKey) return chord.text;
  const move = (pc: number) => (((pc + semitones) % 12) + 12) % 12;
  const source = from?.tonic ?? spellTonic((((tonicPitchClass(target.tonic) - semitones) % 12) + 12) % 12, target.mode);
  const root = spellRoot(chord, move(tonicPitchClass(chord.root)), source, target);
  const bass = chord.bass === null ? null : spellBass(chord, root, move(tonicPitchClass(chord.bass)), target);
  const withGlyphs = /[♯♭]/.test(chord.text);
  const syllabic = /^[A-H](?:e?s|is)(?!us)/.test(chord.text);
  const asWritten = (note: string) => {
    const name = writeNote(note, naming, syllabic);
    return withGlyphs ? name.replace(/[#b]+$/, glyphSigns) : name;
  };
  // Behind a root without a sign, an alteration would read as one: "Dbb9" becomes "C(b9)", not "Cb9".
  const quality = /[#b♯♭s]$/.test(asWritten(root)) ? chord.quality : chord.quality.replace(/^[#b♯♭]\d+/, "($&)");
  return asWritten(root) + quality + (bass === null ? "" : `/${asWritten(bass)}`);
}

function glyphSigns(signs: string): string {
  return signs.replaceAll("#", "♯").replaceAll("b", "♭");
}

/** Letters above the tonic of a chromatic root, by its semitones: written as a raised step, or as a lowered one. */
const raised: Record<number, number> = { 1: 0, 3: 1, 6: 3, 8: 4, 10: 5 };
const lowered: Record<number, number> = { 1: 1, 3: 2, 6: 4, 8: 5, 10: 6 };

function spellRoot(chord: Chord, pc: number, oldTonic: string, target: KeyName): string {
  const plain = spellInKey(pc, target);
  if (inScale(pc, target)) return plain;
  // A passing chord leads up from a raised note or down from a lowered one: only its writer knows which.
  // A major chord over a raised step, though, is a borrowed one in a hasty spelling: bVII, not #VI.
  const degree = degreeOf(pc, target);
  const steps = letterSteps(oldTonic, chord.root);
  const meant = lowered[degree] === steps || (raised[degree] === steps && chordThird(chord) !== "major");
  return meant ? spellAbove(target.tonic, steps, degree) : plain;
}

function spellBass(chord: Chord, root: string, pc: number, target: KeyName): string {
  const semitones = (pc - tonicPitchClass(root) + 12) % 12;
  const sounding = chord.intervals.find((interval) => interval % 12 === semitones);
  if (sounding !== undefined) return spellAbove(root, stepsOfInterval(sounding, chord), semitones);
  return inScale(pc, target) && inScale(tonicPitchClass(root), target)
    ? spellInKey(pc, target)
    : spellAbove(root, stepsOfInterval(semitones, chord), semitones);
}

function degreeOf(pc: number, key: KeyName): number {
  return (pc - tonicPitchClass(key.tonic) + 12) % 12;
}

function inScale(pc: number, key: KeyName): boolean {
  return scaleSteps(key.mode).includes(degreeOf(pc, key));
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
