import type { AbcClef } from "./abcKey";
import type { WordPlace } from "./abcWords";
import type { ScoreSigns } from "./scoreSigns";

/** A note of ABC notation inside its bar; times in quarter notes. */
export interface AbcNote {
  start: number;
  duration: number;
  midi: number;
  tied: boolean;
  /** 0 for the voice itself, 1 and on for what "&" lays over it */
  layer: number;
}

/** What stands between two bar lines. */
export interface AbcBarText {
  notes: AbcNote[];
  words: (WordPlace & { start: number })[];
  length: number;
  signs: ScoreSigns & { section?: boolean };
  part: string;
}

/** What fields say about the notes that follow. */
export interface AbcSetting {
  /** semitones by letter */
  signature: Record<string, number>;
  /** quarter notes of the unit length, of a bar (null in free metre) */
  unit: number;
  bar: number | null;
  compound: boolean;
  /** what single letters stand for, such as S for !segno! */
  symbols: Readonly<Record<string, string>>;
  clef: Required<Omit<AbcClef, "name">>;
}

/** Thrown where a text asks for more than any song has. */
export class AbcTooLarge extends Error {}
