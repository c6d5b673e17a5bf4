import { plainAccidentals } from "./pitch";

/**
 * How notes are called: "english" C D E F G A B; "german" the same but H for B natural and B for B flat;
 * "solfege" Do Re Mi Fa Sol La Si on fixed notes.
 */
export type NoteNaming = "english" | "german" | "solfege";

const syllables = ["Do", "Re", "Mi", "Fa", "Sol", "La", "Si"];
const syllableLetters = "CDEFGAB";
const written = {
  english: /^([A-G])([#b]?)/,
  // "Es" and "As" are notes, "Esus4" and "Asus4" are chords.
  german: /^([A-H])(is(?!u)|es(?!u)|(?<=[EA])s(?!u)|[#b]?)/,
  solfege: /^(Do|DO|Ré|RÉ|Re|RE|Mi|MI|Fa|FA|Sol|SOL|La|LA|Si|SI)([#b]?)/,
} as const;

/**
 * Reads the note name that a text begins with, such as the root of a chord symbol.
 *
 * @param text such as "F♯m7"; in German also "Fis" and "Es"
 * @param naming how the writer calls notes
 * @returns the note in English naming, ASCII, and how many characters its name takes up; null if there is none
 * @see common practice: German H and B, fixed do
 * @example leadingNote("B7", "german") // => { note: "Bb", length: 1 }
 */
export function leadingNote(text: string, naming: NoteNaming = "english"): { note: string; length: number } | null {
  const [whole, name = "", sign = ""] = written[naming].exec(plainAccidentals(text)) ?? [];
  if (whole === undefined) return null;
  const found = (letter: string, accidental: string) => ({ note: letter + accidental, length: whole.length });
  if (naming === "solfege") {
    const plain = name.charAt(0).toUpperCase() + name.slice(1).toLowerCase().replace("é", "e");
    return found(syllableLetters.charAt(syllables.indexOf(plain)), sign);
  }
  if (naming === "english") return found(name, sign);
  const accidental = sign.startsWith("i") ? "#" : /^e?s$/.test(sign) ? "b" : sign;
  if (name === "H") return found("B", accidental);
  if (name !== "B") return found(name, accidental);
  // B is B flat already; many write "Bb" for it all the same. "B#" is nothing in German.
  return accidental === "#" || sign === "es" ? { note: "Bb", length: 1 } : found("B", "b");
}

/**
 * Reads a whole note name without octave.
 *
 * @param text such as "H", "B♭" or "Sol#"
 * @param naming how the writer calls notes
 * @returns the note in English naming, ASCII, or null if this is no note name
 * @example readNote("Sib", "solfege") // => "Bb"
 */
export function readNote(text: string, naming: NoteNaming = "english"): string | null {
  const read = leadingNote(text, naming);
  return read && read.length === text.length ? read.note : null;
}

/**
 * Writes a note as somebody calls it.
 *
 * @param note English naming, ASCII, without octave: a letter and accidentals
 * @param naming how the reader calls notes
 * @param syllabic German only: "Fis" and "Es" instead of "F#" and "Eb"
 * @returns the name, accidentals in ASCII
 * @throws RangeError if note is no note name
 * @see common practice: German H and B, fixed do
 * @example writeNote("Bb", "german") // => "B"
 */
export function writeNote(note: string, naming: NoteNaming = "english", syllabic = false): string {
  const match = /^([A-G])(#{0,2}|b{0,2})$/.exec(note);
  if (!match) throw new RangeError(`"${note}" is no note name`);
  const [, letter = "", sign = ""] = match;
  if (naming === "english") return note;
  if (naming === "solfege") return (syllables[syllableLetters.indexOf(letter)] ?? "") + sign;
  if (letter === "B") return sign === "b" ? "B" : sign === "bb" ? "Bb" : `H${sharpWords(sign, syllabic)}`;
  if (!syllabic || !sign.startsWith("b")) return letter + sharpWords(sign, syllabic);
  const flats = sign.replaceAll("b", "es");
  return letter + (letter === "E" || letter === "A" ? flats.slice(1) : flats);
}

function sharpWords(sign: string, syllabic: boolean): string {
  return syllabic ? sign.replaceAll("#", "is") : sign;
}
