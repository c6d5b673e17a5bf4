import type { KeyName } from "../music/keyName";
import type { Melody, MelodyNote } from "./melody";

/** One line of a melody file, ready to be sung. */
export interface MelodyVoice {
  name: string;
  melody: Melody;
  /** the key the file states; null where it states none, and the melody's home note was found from its notes */
  stated: KeyName | null;
  /** syllables with the start of their note in quarter notes; absent where the file has no words */
  lyrics?: { start: number; text: string }[];
}

/** What a file reader found in one voice or track, before it is made a single line. Times in quarter notes. */
export interface WrittenVoice {
  name: string;
  notes: MelodyNote[];
  lyrics: { start: number; text: string }[];
  /** the key the file states, or null */
  key: KeyName | null;
  /** the key signature the file states where it leaves the mode open, as a place on the circle of fifths; else null */
  signature: number | null;
  /** General MIDI program 0 to 127, or null */
  program: number | null;
  percussion: boolean;
}

/** What a reader of one kind of file hands back. */
export type WrittenFile = { ok: true; title: string | null; voices: WrittenVoice[] } | { ok: false; reason: string };

const vocalNames =
  /\b(?:vocals?|vox|voice|sing(?:er|ing)?|melod(?:y|ie)|lead|tune|solo|song|canto|cantus|gesang|stimme|soprano|chant)\b/i;
const otherNames =
  /\b(?:bass|drums?|percussion|guitar|piano|pad|strings|harmony|accomp\w*|chords?|organ|backing|choir)\b/i;

/**
 * Makes a single line of notes that may overlap: of notes that start together the highest, and a note ends where
 * the next of the line begins.
 *
 * @param notes notes in any order; durations > 0
 * @returns the line, ordered by start, without overlaps
 */
export function singleLine(notes: readonly MelodyNote[]): MelodyNote[] {
  const line: MelodyNote[] = [];
  for (const note of [...notes].sort((a, b) => a.start - b.start || b.midi - a.midi)) {
    const last = line.at(-1);
    const overlap = last ? last.start + last.duration - note.start : 0;
    if (!last || overlap <= 1e-6) {
      line.push({ ...note });
      continue;
    }
    const together = note.start - last.start < 1e-6;
    // A lower note under a held one is accompaniment, unless the held one was only let ring a little long.
    if (together || (note.midi < last.midi && overlap > 0.3 * Math.min(last.duration, note.duration))) continue;
    last.duration = note.start - last.start;
    line.push({ ...note });
  }
  return line;
}

/**
 * How much a voice looks like the one that is sung.
 *
 * @param voice a voice as read, with at least one note
 * @returns any number; the likeliest vocal line of a file has the largest
 */
export function vocalLikelihood(voice: WrittenVoice): number {
  const line = singleLine(voice.notes);
  const pitches = line.map((note) => note.midi);
  const span = Math.max(...pitches.map((p) => p)) - Math.min(...pitches);
  const time = line.reduce((sum, note) => sum + note.duration, 0);
  const mean = line.reduce((sum, note) => sum + note.midi * note.duration, 0) / time;
  let leaps = 0;
  for (let i = 1; i < pitches.length; i += 1) if (Math.abs(pitches[i]! - pitches[i - 1]!) > 9) leaps += 1;
  let points = 4 * (line.length / voice.notes.length) + Math.min(2, line.length / 40);
  if (voice.percussion) points -= 20;
  if (voice.lyrics.length > 0) points += 5;
  if (vocalNames.test(voice.name)) points += 3;
  if (otherNames.test(voice.name)) points -= 3;
  if (voice.program !== null && voice.program >= 52 && voice.program <= 54) points += 1;
  if (voice.program !== null && voice.program >= 32 && voice.program <= 39) points -= 3;
  points -= Math.max(0, 50 - mean) / 4 + Math.max(0, mean - 79) / 4;
  points -= Math.max(0, span - 24) / 4 + (span < 3 ? 2 : 0);
  points -= 8 * (leaps / line.length);
  return points;
}
