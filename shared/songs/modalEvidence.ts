import { type Chord, chordThird } from "../music/chord";
import { type KeyName, type Mode, scaleSteps, tonicPitchClass } from "../music/keyName";

/** A church mode that a song's chords speak for. */
export interface ModalReading {
  /** 0 (C) to 11 (B) */
  tonic: number;
  mode: "dorian" | "mixolydian";
  /** 1 to 3: it starts there, it ends there, the chord is the one played most */
  cues: number;
  /** ASCII sentences; `key` is the same key as it is spelled */
  reasons(key: KeyName): string[];
}

interface Step {
  root: number;
  third: "major" | "minor" | null;
  chord: Chord;
}

/** What tells the mode from plain minor or major: a chord by its semitones above the tonic, and its third. */
const marks = {
  dorian: { third: "minor", chords: { 5: "major", 2: "minor" }, relative: 10 },
  mixolydian: { third: "major", chords: { 10: "major", 7: "minor" }, relative: 5 },
} as const;
/** Below this share a chord is one among others. */
const oftenFrom = 0.4;
const leastShare = 0.25;

/**
 * Finds dorian and mixolydian songs by their chords: every chord belongs to the mode, one that minor or major would not
 * have is among them, and the song starts or ends on the tonic without a cadence elsewhere.
 *
 * @param chords the chords as they are played, repeats included
 * @returns readings with the strongest first; empty where nothing speaks for a mode
 * @see common practice: dorian by its major IV, mixolydian by its bVII
 */
export function modalReadings(chords: readonly Chord[]): ModalReading[] {
  const steps = chords.map((chord): Step => ({ root: tonicPitchClass(chord.root), third: chordThird(chord), chord }));
  const ends = new Set([steps[0]?.root, steps.at(-1)?.root].filter((root) => root !== undefined));
  return [...ends]
    .flatMap((tonic) => (["dorian", "mixolydian"] as const).flatMap((mode) => readAs(steps, tonic, mode) ?? []))
    .sort((a, b) => b.cues - a.cues);
}

function readAs(steps: readonly Step[], tonic: number, mode: ModalReading["mode"]): ModalReading | null {
  const { third, chords, relative } = marks[mode];
  const degree = (step: Step) => (step.root - tonic + 12) % 12;
  const isTonic = (step: Step | undefined) => step?.root === tonic && step.third === third;
  const mark = steps.find((step) => (chords as Record<number, string>)[degree(step)] === step.third);
  const share = steps.filter(isTonic).length / steps.length;
  if (!mark || share < leastShare || !steps.every((step) => belongs(step, tonic, mode))) return null;
  const [starts, stops] = [isTonic(steps[0]), isTonic(steps.at(-1))];
  const often = share >= oftenFrom;
  // A last chord alone may be a turnaround, and a cadence onto the major key of the same notes speaks for that key.
  if (!starts && !(stops && often)) return null;
  if (!(starts && stops) && fallsOnto(steps, (tonic + relative) % 12)) return null;
  const cues = [starts, stops, often].filter(Boolean).length;
  return {
    tonic,
    mode,
    cues,
    reasons: (key) => {
      const home = third === "minor" ? `${key.tonic}m` : key.tonic;
      const told = starts && stops ? "starts and ends" : starts ? "starts" : "ends";
      const name = mark.chord.root + (mark.third === "minor" ? "m" : "");
      return [
        `It ${told} on ${home}.`,
        `All its chords belong to ${key.tonic} ${mode}; ${name} would not belong to ${key.tonic} ${third}.`,
      ];
    },
  };
}

/** Whether a major chord falls a fifth onto the major chord of this root. */
function fallsOnto(steps: readonly Step[], root: number): boolean {
  return steps.some((step, index) => {
    const before = steps[index - 1];
    return step.root === root && step.third === "major" && before?.root === (root + 7) % 12 && before.third === "major";
  });
}

/** Whether root, third and fifth of a chord lie in the mode. */
function belongs({ root, third, chord }: Step, tonic: number, mode: Mode): boolean {
  const inScale = (semitones: number) => scaleSteps(mode).includes((root - tonic + semitones + 12) % 12);
  const fifth = chord.intervals.find((interval) => interval >= 6 && interval <= 8);
  return (
    inScale(0) &&
    (third === null || inScale(third === "minor" ? 3 : 4)) &&
    (fifth === undefined || inScale(fifth)) &&
    // A seventh tells as much: G7 in G speaks of C, and Dm with a raised seventh of D minor.
    chord.intervals.every((interval) => (interval !== 10 && interval !== 11) || inScale(interval))
  );
}
