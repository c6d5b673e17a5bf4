import { midiToHz } from "../music/pitch";
import type { MelodyNote } from "./melody";

/** Where a tune spends its time. MIDI numbers; fractional where the notes are. */
export interface Tessitura {
  /** mean pitch, weighted by time */
  mean: number;
  /** standard deviation about the mean, weighted by time, in semitones */
  sd: number;
  /** quarter, half and three quarters of the time is spent at or below these */
  q1: number;
  median: number;
  q3: number;
  lowMidi: number;
  highMidi: number;
}

/**
 * Share of the sung time at each semitone.
 *
 * @param notes the notes of a tune, durations > 0 in any one unit; pitches are rounded to semitones
 * @returns the semitones that are sung, ascending; shares add up to 1; empty for no notes
 * @throws RangeError if a duration is not positive or a pitch not finite
 * @see S. Thurmer, "The tessiturogram", Journal of Voice 2(4) (1988), 327-329
 * @example tessituragram([{ start: 0, duration: 2, midi: 60 }]) // => [{ midi: 60, share: 1 }]
 */
export function tessituragram(notes: readonly MelodyNote[]): { midi: number; share: number }[] {
  const total = totalTime(notes);
  const times = new Map<number, number>();
  for (const note of notes) {
    const midi = Math.round(note.midi);
    times.set(midi, (times.get(midi) ?? 0) + note.duration);
  }
  return [...times].sort(([a], [b]) => a - b).map(([midi, time]) => ({ midi, share: time / total }));
}

/**
 * Span, centre and spread of a tune, weighted by time.
 *
 * @param notes the notes of a tune, durations > 0 in any one unit
 * @returns the figures, or null for no notes
 * @throws RangeError if a duration is not positive or a pitch not finite
 * @see I. R. Titze, "Quantifying Tessitura in a Song", Journal of Singing 65(1) (2008), 59-61; Q1 to Q3 as tessitura:
 *   data set "Die schöne Müllerin", Mendeley Data 5msxnzhv27
 */
export function tessitura(notes: readonly MelodyNote[]): Tessitura | null {
  if (notes.length === 0) return null;
  const total = totalTime(notes);
  const sorted = [...notes].sort((a, b) => a.midi - b.midi);
  const mean = notes.reduce((sum, note) => sum + note.midi * note.duration, 0) / total;
  const variance = notes.reduce((sum, note) => sum + note.duration * (note.midi - mean) ** 2, 0) / total;
  const quantile = (part: number): number => {
    let time = 0;
    for (const note of sorted) {
      time += note.duration;
      // The last bits of a sum must not push an exact quarter over to the next note.
      if (time >= part * total * (1 - 1e-9)) return note.midi;
    }
    return sorted.at(-1)!.midi;
  };
  return {
    mean,
    sd: Math.sqrt(variance),
    q1: quantile(0.25),
    median: quantile(0.5),
    q3: quantile(0.75),
    lowMidi: sorted[0]!.midi,
    highMidi: sorted.at(-1)!.midi,
  };
}

/**
 * Cycle dose: how many times the vocal folds would swing while the tune is sung once.
 *
 * @param notes the notes of a tune, durations > 0 in beats
 * @param secondsPerBeat length of a beat in seconds, > 0
 * @returns number of cycles, 0 for no notes
 * @throws RangeError if a duration or secondsPerBeat is not positive
 * @see I. R. Titze, J. G. Švec and P. S. Popolo, Journal of Speech, Language, and Hearing Research 46 (2003), 919-932
 */
export function cycleDose(notes: readonly MelodyNote[], secondsPerBeat: number): number {
  if (!(secondsPerBeat > 0)) throw new RangeError("a beat must last some time");
  totalTime(notes);
  return notes.reduce((sum, note) => sum + midiToHz(note.midi) * note.duration * secondsPerBeat, 0);
}

function totalTime(notes: readonly MelodyNote[]): number {
  for (const note of notes) {
    if (!(note.duration > 0) || !Number.isFinite(note.duration)) throw new RangeError("durations must be positive");
    if (!Number.isFinite(note.midi)) throw new RangeError("pitches must be finite");
  }
  return notes.reduce((sum, note) => sum + note.duration, 0);
}
