import { tonicPitchClass } from "../music/keyName";
import type { Chord } from "../music/chord";

/** What a fingering must and may sound to count as a chord. Sets of pitch classes are bit masks: bit 0 = C. */
export interface ChordNeeds {
  root: number;
  /** every pitch class that may sound */
  allowed: number;
  /** every pitch class that must sound */
  needed: number;
  /** pitch class of the lowest note, or null for any */
  bass: number | null;
}

/**
 * What a fingering of a chord must sound on so many strings.
 *
 * Root and third always (in suspended chords the note in the third's place); then seventh or sixth, altered fifth and
 * the highest extension, as far as the strings go. The plain fifth may be left out of chords of four notes and more.
 *
 * @param chord a parsed chord
 * @param strings how many strings can be stopped, >= 1
 * @param loose true also lets the plain fifth of triads go, and from four notes on the root, where another instrument has it
 * @returns masks of pitch classes
 * @see common practice: root and third stay, the fifth is the first to go
 */
export function chordNeeds(chord: Chord, strings: number, loose: boolean): ChordNeeds {
  const root = tonicPitchClass(chord.root);
  const intervals = chord.intervals.filter((interval) => interval !== 0);
  const tones = new Set([0, ...intervals.map((interval) => interval % 12)]);
  const bass = chord.bass === null ? null : tonicPitchClass(chord.bass);
  const bassTone = bass === null ? null : (bass - root + 12) % 12;
  const room = bassTone !== null && !tones.has(bassTone) ? strings - 1 : strings;

  const wanted = inOrderOfWeight(intervals, tones.size, loose);
  const needed = new Set(wanted.slice(0, Math.max(2, room)));
  if (loose && tones.size >= 4) needed.delete(0);
  if (bassTone !== null) {
    tones.add(bassTone);
    needed.add(bassTone);
  }
  return { root, allowed: mask(tones, root), needed: mask(needed, root), bass };
}

/** The tones that carry a chord, the weightiest first. */
function inOrderOfWeight(intervals: readonly number[], size: number, loose: boolean): number[] {
  const third = intervals.filter((interval) => interval === 3 || interval === 4).slice(-1);
  const place = third.length > 0 ? third : intervals.filter((interval) => interval === 2 || interval === 5);
  const sevenths = intervals.filter((interval) => interval >= 9 && interval <= 11);
  const alteredFifths = intervals.filter((interval) => interval === 6 || interval === 8);
  const extension = intervals.filter((interval) => interval >= 12).slice(-1);
  const plainFifth = size <= (loose ? 2 : 3) ? intervals.filter((interval) => interval === 7) : [];
  const order = [0, ...place, ...sevenths, ...alteredFifths, ...extension, ...plainFifth];
  return [...new Set(order.map((interval) => interval % 12))];
}

function mask(tones: Iterable<number>, root: number): number {
  let bits = 0;
  for (const tone of tones) bits |= 1 << ((root + tone) % 12);
  return bits;
}
