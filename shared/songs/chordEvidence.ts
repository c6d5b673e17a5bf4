import { type Chord, chordThird } from "../music/chord";
import { type KeyName, type Mode, scaleSteps, tonicPitchClass } from "../music/keyName";
import { bellmanBudge, correlateProfiles, temperleyKostkaPayne } from "./keyProfiles";
import { listWords } from "../music/listWords";

/** How far evidence speaks for a key, and the words for it. */
export interface Evidence {
  /** larger is likelier; differences of 0.05 and more matter */
  score(tonic: number, mode: Mode): number;
  /** ASCII sentences; `key` is the same key as it is spelled */
  reasons(tonic: number, mode: Mode, key: KeyName): string[];
}

interface Step {
  root: number;
  third: "major" | "minor" | null;
  chord: Chord;
}

/** Weight of each tone of a chord: roots and thirds make the harmony, fifths and the rest colour it. */
const rootWeight = 1;
const thirdWeight = 0.6;
const otherWeight = 0.3;
/** Triads at home in a key, semitones above the tonic; minor with the raised seventh of its cadences. */
const home: Record<"major" | "minor", Record<number, ("major" | "minor" | "diminished")[]>> = {
  major: { 0: ["major"], 2: ["minor"], 4: ["minor"], 5: ["major"], 7: ["major"], 9: ["minor"], 11: ["diminished"] },
  minor: {
    0: ["minor"],
    2: ["diminished"],
    3: ["major"],
    5: ["minor"],
    7: ["minor", "major"],
    8: ["major"],
    10: ["major"],
    11: ["diminished"],
  },
};

/**
 * What a song's chords say about its key.
 *
 * @param chords the chords as they are played, repeats included
 * @returns the evidence, or null for no chords
 * @see common practice: the last chord tells more than the first; keyProfiles.ts for the profiles
 */
export function chordEvidence(chords: readonly Chord[]): Evidence | null {
  const steps = chords.map((chord): Step => ({ root: tonicPitchClass(chord.root), third: chordThird(chord), chord }));
  const first = steps[0];
  const last = steps.at(-1);
  if (!first || !last) return null;
  const weights = weighPitchClasses(steps);
  const matches = [bellmanBudge, temperleyKostkaPayne].map((profile) => correlateProfiles(weights, profile));
  const correlation = (tonic: number, mode: Mode) =>
    matches.reduce((sum, keys) => sum + (keys.find((key) => key.tonic === tonic && key.mode === mode)?.r ?? 0), 0) /
    matches.length;
  const counted = new Map<string, number>();
  const score = (tonic: number, mode: Mode): number => {
    const name = `${tonic} ${mode}`;
    const known = counted.get(name) ?? count(tonic, mode);
    counted.set(name, known);
    return known;
  };
  const count = (tonic: number, mode: Mode): number => {
    const kind = mode === "minor" ? "minor" : "major";
    const isTonic = (step: Step) =>
      step.root !== tonic ? 0 : step.third === kind ? 1 : step.third === null ? 0.8 : 0.1;
    const fitting = steps.reduce((sum, step) => sum + fit(step, tonic, kind), 0) / steps.length;
    const tonics = steps.reduce((sum, step) => sum + isTonic(step), 0) / steps.length;
    return (
      0.4 * correlation(tonic, mode) +
      0.35 * fitting +
      0.12 * isTonic(last) +
      0.07 * isTonic(first) +
      0.1 * Math.min(1, tonics / 0.4) +
      0.12 * cadences(steps, tonic, isTonic) +
      0.05 * pillars(steps, tonic, kind)
    );
  };
  return { score, reasons: (tonic, mode, key) => chordReasons(steps, tonic, mode, key) };
}

function weighPitchClasses(steps: readonly Step[]): number[] {
  const weights = new Array<number>(12).fill(0);
  for (const { root, chord } of steps) {
    for (const interval of chord.intervals) {
      const weight = interval === 0 ? rootWeight : interval === 3 || interval === 4 ? thirdWeight : otherWeight;
      weights[(root + interval) % 12]! += weight;
    }
  }
  return weights;
}

/** 1 for a chord at home in the key, 0.5 for its root alone in the scale, 0 for a stranger. */
function fit(step: Step, tonic: number, kind: "major" | "minor"): number {
  const degree = (step.root - tonic + 12) % 12;
  const triads = home[kind][degree];
  if (!triads) return 0;
  const diminished = step.third === "minor" && step.chord.intervals.includes(6) && !step.chord.intervals.includes(7);
  const own = diminished ? "diminished" : step.third;
  if (own === null || triads.includes(own))
    return degree === 0 && step.chord.intervals.includes(10) && kind === "major" ? 0.8 : 1;
  return scaleSteps(kind).includes(degree) ? 0.4 : 0;
}

/** Share of steps onto the tonic that come from its dominant, out of all falls of a fifth; 0.5 where there is none. */
function cadences(steps: readonly Step[], tonic: number, isTonic: (step: Step) => number): number {
  let falls = 0;
  let home = 0;
  for (let index = 1; index < steps.length; index += 1) {
    const [from, to] = [steps[index - 1]!, steps[index]!];
    if ((from.root - to.root + 12) % 12 !== 7 || from.third === "minor") continue;
    const weight = from.chord.intervals.includes(10) ? 2 : 1;
    falls += weight;
    if (to.root === tonic) home += weight * isTonic(to);
  }
  return falls === 0 ? 0 : home / falls;
}

/** How many of the chords on the first, fourth and fifth step the song uses, 0 to 1. */
function pillars(steps: readonly Step[], tonic: number, kind: "major" | "minor"): number {
  const used = [0, 5, 7].filter((degree) =>
    steps.some((step) => (step.root - tonic + 12) % 12 === degree && (step.third === kind || degree === 7)),
  );
  return used.length / 3;
}

function chordReasons(steps: readonly Step[], tonic: number, mode: Mode, key: KeyName): string[] {
  const kind = mode === "minor" ? "minor" : "major";
  const reasons: string[] = [];
  const name = kind === "minor" ? `${key.tonic}m` : key.tonic;
  const starts = steps[0]!.root === tonic && steps[0]!.third !== (kind === "major" ? "minor" : "major");
  const ends = steps.at(-1)!.root === tonic && steps.at(-1)!.third !== (kind === "major" ? "minor" : "major");
  if (starts && ends) reasons.push(`It starts and ends on ${name}.`);
  else if (ends) reasons.push(`It ends on ${name}.`);
  else if (starts) reasons.push(`It starts on ${name}.`);
  const pillar = [0, 5, 7].map((degree) =>
    steps.find((step) => (step.root - tonic + 12) % 12 === degree && fit(step, tonic, kind) > 0.7),
  );
  if (pillar.every((step) => step !== undefined)) {
    const names = pillar.map((step) => step.chord.root + (step.third === "minor" ? "m" : ""));
    reasons.push(`${names[0]}, ${names[1]} and ${names[2]} are its first, fourth and fifth chords.`);
  }
  const strangers = [...new Set(steps.filter((step) => fit(step, tonic, kind) < 0.7).map((step) => step.chord.text))];
  if (strangers.length === 0) reasons.push(`All its chords belong to ${key.tonic} ${kind}.`);
  else if (strangers.length === 1) reasons.push(`Outside ${key.tonic} ${kind} there is only ${strangers[0]}.`);
  else if (strangers.length <= 3) reasons.push(`Outside ${key.tonic} ${kind} there are only ${listWords(strangers)}.`);
  return reasons;
}
