import type { Chord } from "../../music/chord";
import { spellAbove, tonicPitchClass } from "../../music/keyName";

/** A tone of a chord. */
export interface ChordDegree {
  /** semitones above the root, within an octave */
  semitones: number;
  /** as players count it, with glyphs: "1", "♭3", "5", "9" */
  name: string;
  /** letters above the root, within an octave: 2 for any third */
  steps: number;
}

/** Each interval as it is counted: name and letters above the root. */
const counted: Record<number, readonly [name: string, steps: number]> = {
  0: ["1", 0],
  1: ["♭2", 1],
  2: ["2", 1],
  3: ["♭3", 2],
  4: ["3", 2],
  5: ["4", 3],
  6: ["♭5", 4],
  7: ["5", 4],
  8: ["♯5", 4],
  9: ["6", 5],
  10: ["♭7", 6],
  11: ["7", 6],
  13: ["♭9", 1],
  14: ["9", 1],
  15: ["♯9", 1],
  17: ["11", 3],
  18: ["♯11", 3],
  20: ["♭13", 5],
  21: ["13", 5],
};

/**
 * The tones of a chord as players count them from its root, the bass behind a slash among them.
 *
 * @param chord a parsed chord
 * @returns each pitch class once, in the order in which chords are spelled: root, third, fifth, seventh, extensions, bass
 * @see common practice: degrees are counted in the major scale of the root
 * @example chordDegrees({ root: "A", quality: "m7", intervals: [0, 3, 7, 10], bass: null, text: "Am7" }).map(({ name }) => name) // => ["1", "♭3", "5", "♭7"]
 */
export function chordDegrees(chord: Chord): ChordDegree[] {
  const degrees = new Map<number, ChordDegree>();
  const add = (interval: number, name: string, steps: number) => {
    const semitones = interval % 12;
    if (!degrees.has(semitones)) degrees.set(semitones, { semitones, name, steps });
  };
  const { intervals } = chord;
  // The seventh of a diminished chord is a seventh, though it sounds like a sixth.
  const diminished = intervals.includes(3) && intervals.includes(6) && !intervals.includes(7);
  for (const interval of [0, ...intervals]) {
    const [name, steps] = counted[interval] ?? counted[interval % 12]!;
    if (interval === 9 && diminished) add(9, "♭♭7", 6);
    else add(interval, name, steps);
  }
  if (chord.bass !== null) {
    const interval = (tonicPitchClass(chord.bass) - tonicPitchClass(chord.root) + 12) % 12;
    add(interval, ...counted[interval]!);
  }
  return [...degrees.values()];
}

/**
 * What the tones of a chord are called over another root: a shape's degrees as they sound.
 *
 * @param degree a tone of the chord
 * @param root of what is heard, ASCII
 * @returns note name, ASCII
 * @throws RangeError if root is no note name
 * @example degreeNote({ semitones: 3, name: "♭3", steps: 2 }, "C") // => "Eb"
 */
export function degreeNote({ semitones, steps }: ChordDegree, root: string): string {
  return spellAbove(root, steps, semitones);
}
