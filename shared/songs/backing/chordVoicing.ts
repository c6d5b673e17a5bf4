import type { Chord } from "../../music/chord";
import { tonicPitchClass } from "../../music/keyName";

/** The lowest note of a strum lies here, E3 to B3, so that its chords sound around A3 to E4, under most singers' tunes. */
const lowestFrom = 52;
const lowestTo = 59;
const middle = 60;
/** The bass lies in one octave from E2 on. */
const bassFrom = 40;

/**
 * The pitches of a strummed chord in close position, near the chord before it.
 *
 * @param chord a chord
 * @param semitones how far it is moved
 * @param before the chord before it as voiced; null at the start
 * @returns MIDI numbers ascending, each pitch class of the chord once (the slash bass is the bass's)
 */
export function voiceChord(chord: Chord, semitones: number, before: readonly number[] | null): number[] {
  const root = tonicPitchClass(chord.root) + semitones;
  const classes = [...new Set(chord.intervals.map((interval) => modulo(root + interval)))];
  let best: number[] = [];
  let bestCost = Infinity;
  for (let base = lowestFrom; base <= lowestTo; base += 1) {
    const pitches = classes.map((pc) => atOrAbove(base, pc)).sort((a, b) => a - b);
    if (pitches[0] !== base) continue;
    const mean = pitches.reduce((sum, midi) => sum + midi, 0) / pitches.length;
    const moved = before ? (travel(before, pitches) + travel(pitches, before)) / 2 : 0;
    const cost = moved + 0.5 * Math.abs(mean - middle);
    if (cost < bestCost - 1e-9) [best, bestCost] = [pitches, cost];
  }
  return best;
}

/** Semitones that the pitches of one chord are away from the nearest of another, on average. */
function travel(from: readonly number[], to: readonly number[]): number {
  const sum = from.reduce((all, midi) => all + Math.min(...to.map((other) => Math.abs(other - midi))), 0);
  return sum / Math.max(1, from.length);
}

/**
 * The two bass notes of a chord: root and fifth, or, over a slash, the written bass and the root.
 *
 * @param chord a chord
 * @param semitones how far it is moved
 * @returns MIDI numbers from E2 to D#3; `other` lies below where there is room, else above
 */
export function bassNotes(chord: Chord, semitones: number): { first: number; other: number } {
  const root = tonicPitchClass(chord.root) + semitones;
  const fifth = chord.intervals.find((interval) => interval >= 6 && interval <= 8);
  const over = chord.bass === null ? null : tonicPitchClass(chord.bass) + semitones;
  const first = atOrAbove(bassFrom, modulo(over ?? root));
  const second = modulo(over === null ? root + (fifth ?? 0) : root);
  return { first, other: atOrAbove(bassFrom, second) };
}

function atOrAbove(base: number, pc: number): number {
  return base + modulo(pc - base);
}

function modulo(value: number): number {
  return ((value % 12) + 12) % 12;
}
