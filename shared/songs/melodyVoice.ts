import type { KeyName } from "../music/keyName";
import type { Melody, MelodyNote } from "./melody";

/** A syllable of the words, with the start of its note in quarter notes. */
export interface MelodySyllable {
  start: number;
  /** ends with "-" where the word goes on with the next syllable */
  text: string;
  /** true where a line of the words begins; absent where the file does not tell lines */
  newLine?: true;
}

/** One line of a melody file, ready to be sung. */
export interface MelodyVoice {
  name: string;
  /** its notes carry their syllable as `lyric`, where the file has words */
  melody: Melody;
  /** the key the file states; null where it states none, and the melody's home note was found from its notes */
  stated: KeyName | null;
  /** absent where the file has no words */
  lyrics?: MelodySyllable[];
  /** sentences that say what speaks for and against this voice as the sung one, the weightiest first */
  reasons: string[];
}

/** What a file reader found in one voice or track, before it is made a single line. Times in quarter notes. */
export interface WrittenVoice {
  name: string;
  notes: MelodyNote[];
  lyrics: MelodySyllable[];
  /** the key the file states, or null */
  key: KeyName | null;
  /** the key signature the file states where it leaves the mode open, as a place on the circle of fifths; else null */
  signature: number | null;
  /** General MIDI program 0 to 127, or null */
  program: number | null;
  percussion: boolean;
}

/** What a reader of one kind of file hands back. */
export type WrittenFile =
  | {
      ok: true;
      title: string | null;
      voices: WrittenVoice[];
      /** quarter notes a minute at the beginning, or null */
      tempo: number | null;
      /** upper figure of the first metre, or null */
      beatsPerBar: number | null;
      /** sentences that say what of the file is not in what was read */
      cautions: string[];
    }
  | { ok: false; reason: string };

/**
 * Says which of the speed and the metre of a file are not the only ones.
 *
 * @param changes whether each changes after the beginning
 * @returns a sentence for each that does
 * @example laterChanges({ tempo: false, metre: true }) // => ["Its metre changes later; the first one is taken."]
 */
export function laterChanges(changes: { tempo: boolean; metre: boolean }): string[] {
  const said = (what: string) => `Its ${what} changes later; the first one is taken.`;
  return [...(changes.tempo ? [said("speed")] : []), ...(changes.metre ? [said("metre")] : [])];
}

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
