import { pitchClass } from "../music/pitch";
import type { TakeReport } from "../voice/takeReport";
import { findKey } from "./findKey";
import type { MelodyNote } from "./melody";
import type { Mode } from "../music/keyName";

/** What a listened-to take must tell for a tune to be read from it. */
export type SungTake = Pick<TakeReport, "notes" | "range" | "tuningCents">;

/** The beats a minute at which a tune is written down when its song has no tempo: a second is a quarter note. */
export const UNTIMED_TEMPO = 60;

/**
 * The tune in a take: whole semitones by the singer's own tuning, lengths in quarter notes. Scoops and cracks, short
 * notes outside the range that was heard, are left out.
 *
 * @param take a take with verdict "heard"
 * @param tempo quarter notes a minute, > 0
 * @returns the notes in order, the first starting at 0; empty where nothing was heard
 * @throws RangeError if the tempo is not positive
 * @example sungMelody({ notes: [], range: null, tuningCents: 0 }) // => []
 */
export function sungMelody({ notes, range, tuningCents }: SungTake, tempo = UNTIMED_TEMPO): MelodyNote[] {
  if (!(tempo > 0)) throw new RangeError("a tempo must be positive");
  if (!range) return [];
  const tune = notes.filter(({ clear, midi }) => clear || (midi > range.lowMidi - 0.5 && midi < range.highMidi + 0.5));
  const first = tune[0]?.start ?? 0;
  const beats = (seconds: number) => Math.round((seconds * tempo * 100) / 60) / 100;
  return tune.map(({ start, end, midi }) => ({
    start: beats(start - first),
    duration: Math.max(0.01, beats(end - start)),
    midi: Math.min(127, Math.max(0, Math.round(midi - tuningCents / 100))),
  }));
}

/** Which home note is proposed for a tune, and what else it could be. */
export interface ProposedHome {
  tonic: string;
  mode: Mode;
  /** another home note that is nearly as likely; null where one stands out */
  orElse: string | null;
  /** plain sentences with glyphs */
  reasons: string[];
}

/** Below this lead the runner-up is named too. */
const plainLead = 0.05;

/**
 * Proposes the home note of a tune from its notes alone.
 *
 * @param notes the notes of a tune, in order
 * @returns the home note with its reasons; null for fewer than three notes, from which nothing can be told
 */
export function proposeHome(notes: readonly MelodyNote[]): ProposedHome | null {
  if (notes.length < 3) return null;
  const found = findKey({ notes });
  if (!found) return null;
  const { key, runnerUp, margin, reasons } = found;
  const orElse = margin < plainLead && runnerUp.tonic !== key.tonic ? runnerUp.tonic : null;
  return { ...key, orElse, reasons };
}

/**
 * Semitones that bring a tune with one home note to another by the smaller move; of two equal ones, down.
 *
 * @param from pitch class of the home note as sung, 0 to 11
 * @param to pitch class wanted, 0 to 11
 * @returns -6 to 5
 * @throws RangeError if a pitch class is no whole number
 * @example moveToHomeNote(9, 0) // => 3
 */
export function moveToHomeNote(from: number, to: number): number {
  if (!Number.isInteger(from) || !Number.isInteger(to)) throw new RangeError("pitch classes are whole numbers");
  return pitchClass(to - from + 6) - 6;
}
