import { type Mode, scaleSteps } from "../music/keyName";
import { glyphs, pitchClass } from "../music/pitch";
import { findKey, rankKeys } from "./findKey";
import type { MelodyNote } from "./melody";

/** What a listened-to take must tell for a tune to be read from it. Pitches in MIDI numbers with fractions. */
export interface SungTake {
  /** in order, times in seconds; one that is not clear may be a scoop or a crack */
  notes: readonly { start: number; end: number; midi: number; clear: boolean }[];
  /** null where nothing was heard */
  range: { lowMidi: number; highMidi: number } | null;
  /** how far the singer's own tuning lies from 440 Hz for A4 */
  tuningCents: number;
}

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
 * Proposes the home note of a tune from its notes alone, or, where the chart's mode is known, among the keys of that
 * third: a tune in A minor or C major uses the same notes.
 *
 * @param notes the notes of a tune, in order
 * @param mode the mode of the song's chart, where there is one
 * @returns the home note with its reasons; null for fewer than three notes, from which nothing can be told
 */
export function proposeHome(notes: readonly MelodyNote[], mode: Mode | null = null): ProposedHome | null {
  if (notes.length < 3) return null;
  const found = findKey({ notes });
  if (!found) return null;
  const { key, runnerUp, margin, reasons } = found;
  if (mode !== null && isMinor(mode) !== isMinor(key.mode)) {
    const [best, next] = rankKeys({ notes }).filter((ranked) => isMinor(ranked.key.mode) === isMinor(mode));
    if (!best || !next) return null;
    const third = isMinor(mode) ? "minor" : "major";
    return {
      ...best.key,
      orElse: best.score - next.score < plainLead ? next.key.tonic : null,
      reasons: [`Of the ${third} keys, as the chart is ${third}, ${glyphs(best.key.tonic)} fits its notes best.`],
    };
  }
  const orElse = margin < plainLead && runnerUp.tonic !== key.tonic ? runnerUp.tonic : null;
  return { ...key, orElse, reasons };
}

function isMinor(mode: Mode): boolean {
  return scaleSteps(mode).includes(3);
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
