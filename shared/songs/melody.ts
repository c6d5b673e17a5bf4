import type { Mode } from "../music/keyName";

/** One note of a tune. Start and duration in quarter notes (or seconds where a recording says so). */
export interface MelodyNote {
  start: number;
  duration: number;
  midi: number;
  /** the syllable sung on it, where known */
  lyric?: string;
}

/** A tune with its home note. */
export interface Melody {
  /** ordered by start; durations > 0; monophonic */
  notes: MelodyNote[];
  /** tonic spelled in ASCII, such as "D" or "Bb"; null when not known */
  home: string | null;
  mode: Mode | null;
}
