import { Note } from "tonal";

/** A note as people write it: spelled with ASCII accidentals ("F#4", "Bb3"), octave numbers with C4 = middle C. */
export type NoteName = string;

/** How to name the five black keys: by sharps, by flats, or, where no key decides, by their commonest names. */
export type Spelling = "sharps" | "flats" | "common";

/** C# Eb F# Ab Bb: common practice for a note that stands in no key. */
const commonlySharp = new Set([1, 6]);

/**
 * Frequency of a MIDI note number in equal temperament.
 *
 * @param midi MIDI note number, fractional allowed; 69 = A4
 * @param a4 reference frequency of A4 in Hz, > 0
 * @returns frequency in Hz
 * @throws RangeError if a4 is not a positive number
 * @see ISO 16:1975 (A4 = 440 Hz); MIDI Tuning convention, note 69 = A4
 * @example midiToHz(69) // => 440
 */
export function midiToHz(midi: number, a4 = 440): number {
  if (!(a4 > 0)) throw new RangeError("a4 must be a positive frequency in Hz");
  return a4 * 2 ** ((midi - 69) / 12);
}

/**
 * MIDI note number of a frequency, fractional.
 *
 * @param hz frequency in Hz, > 0
 * @param a4 reference frequency of A4 in Hz, > 0
 * @returns fractional MIDI note number; 60 = C4
 * @throws RangeError if hz or a4 is not positive
 * @see ISO 16:1975; MIDI Tuning convention
 * @example hzToMidi(220) // => 57
 */
export function hzToMidi(hz: number, a4 = 440): number {
  if (!(hz > 0) || !(a4 > 0)) throw new RangeError("frequencies must be positive, in Hz");
  return 69 + 12 * Math.log2(hz / a4);
}

/**
 * Name of the nearest semitone.
 *
 * @param midi MIDI note number; fractions are rounded to the nearest semitone
 * @param spelling how to name the five black keys
 * @returns ASCII name with octave, C4 = middle C
 * @throws RangeError if midi is not finite
 * @see ANSI/ASA S1.1 (standard octaves)
 * @example noteName(66, "flats") // => "Gb4"
 */
export function noteName(midi: number, spelling: Spelling = "common"): NoteName {
  if (!Number.isFinite(midi)) throw new RangeError("midi must be finite");
  const whole = Math.round(midi);
  const sharp = spelling === "sharps" || (spelling === "common" && commonlySharp.has(pitchClass(whole)));
  return sharp ? Note.fromMidiSharps(whole) : Note.fromMidi(whole);
}

/**
 * Reads a note name with octave, as a person types it.
 *
 * @param text such as "F#4", "f♯4", "Bb3", "B♭3"; surrounding blanks allowed
 * @returns MIDI note number, or null if this is no note with an octave
 * @example parseNoteName("B♭3") // => 58
 */
export function parseNoteName(text: string): number | null {
  const match = /^\s*([a-gA-G])([#b♯♭]{0,2})(-?\d)\s*$/.exec(text);
  if (!match) return null;
  const [, letter = "", accidentals = "", octave = ""] = match;
  return Note.midi(letter.toUpperCase() + plainAccidentals(accidentals) + octave);
}

/**
 * Pitch class of a MIDI note number.
 *
 * @param midi MIDI note number; fractions are rounded
 * @returns 0 (C) to 11 (B)
 * @example pitchClass(69) // => 9
 */
export function pitchClass(midi: number): number {
  return ((Math.round(midi) % 12) + 12) % 12;
}

/** An accidental behind a note letter, but not inside a word: "Bbm7" and "Eb", not "Above". */
const behindLetter = /(?<![A-Za-z])([A-G])(##|#|(?:bb|b)(?=$|[^a-z]|m(?![a-z])|maj|min|dim|aug|sus|add))/g;
/** An accidental before a degree: "m7b5", "#11", "b7". */
const beforeDegree = /#(?=\d)|(?<![a-ln-z])b(?=\d)/g;

/**
 * Sets accidentals as music glyphs for people to read.
 *
 * @param text sentences, note, key or chord names with ASCII accidentals
 * @returns the same with ♯ and ♭; words that only begin like a note stay as they are
 * @example glyphs("Above: F#m7b5 to Bb3") // => "Above: F♯m7♭5 to B♭3"
 */
export function glyphs(text: string): string {
  return text
    .replace(behindLetter, (_, letter: string, accidental: string) => letter + toGlyph(accidental))
    .replace(beforeDegree, toGlyph);
}

/**
 * Turns music glyphs back into ASCII accidentals.
 *
 * @param text any text with ♯ or ♭
 * @returns the same with # and b
 * @example plainAccidentals("E♭") // => "Eb"
 */
export function plainAccidentals(text: string): string {
  return text.replaceAll("♯", "#").replaceAll("♭", "b");
}

function toGlyph(accidental: string): string {
  return accidental.replaceAll("#", "♯").replaceAll("b", "♭");
}
