import { type Mode, scaleSteps } from "../music/keyName";
import { pitchClass } from "../music/pitch";
import type { Evidence } from "./chordEvidence";
import {
  aardenEssen,
  albrechtShanahan,
  correlateProfiles,
  krumhanslKessler,
  temperleyKostkaPayne,
} from "./keyProfiles";
import type { MelodyNote } from "./melody";

/**
 * Profiles that are asked together: each has its own bias (Krumhansl-Kessler to the dominant, Temperley-Kostka-Payne to
 * the relative major, Aarden-Essen to the subdominant), and they do not share it.
 */
const panel = [
  { profile: albrechtShanahan, weight: 0.35 },
  { profile: aardenEssen, weight: 0.25 },
  { profile: temperleyKostkaPayne, weight: 0.25 },
  { profile: krumhanslKessler, weight: 0.15 },
];

type PlainMode = "major" | "minor";

/**
 * Modes by the plain one that has their third, and the two degrees that change places in its profile: what is at home
 * in minor a sixth above the tonic is, in dorian, a semitone higher.
 *
 * @see common practice: dorian is minor with a major sixth, mixolydian major with a minor seventh
 */
const turnedModes: Partial<Record<Mode, { like: PlainMode; swap: readonly [number, number] }>> = {
  dorian: { like: "minor", swap: [8, 9] },
  mixolydian: { like: "major", swap: [10, 11] },
};

/**
 * What the notes of a tune say about its key.
 *
 * @param notes the notes in order, durations > 0
 * @returns the evidence, or null for no notes
 * @see keyProfiles.ts for the profiles; first and last note and range: common practice
 */
export function melodyEvidence(notes: readonly MelodyNote[]): Evidence | null {
  const first = notes[0];
  const last = notes.at(-1);
  if (!first || !last) return null;
  const weights = new Array<number>(12).fill(0);
  for (const note of notes) weights[pitchClass(note.midi)]! += note.duration;
  const correlation = correlations(weights);
  const total = weights.reduce((sum, weight) => sum + weight, 0);
  const low = Math.min(...[...new Set(notes.map((note) => note.midi))]);
  const degreeOf = (midi: number, tonic: number) => (pitchClass(midi) - tonic + 12) % 12;
  const score = (tonic: number, mode: Mode): number => {
    const ending = degreeOf(last.midi, tonic);
    const opening = degreeOf(first.midi, tonic);
    const third = scaleSteps(mode).includes(3) ? 3 : 4;
    const lowest = degreeOf(low, tonic);
    return (
      correlation(tonic, mode) +
      (ending === 0 ? 0.2 : ending === third || ending === 7 ? 0.03 : 0) +
      (opening === 0 ? 0.05 : opening === 7 ? 0.04 : opening === third ? 0.03 : 0) +
      (lowest === 0 || lowest === 7 ? 0.02 : 0)
    );
  };
  const reasons: Evidence["reasons"] = (tonic, mode, key) => {
    const starts = pitchClass(first.midi) === tonic;
    const ends = pitchClass(last.midi) === tonic;
    const steps = scaleSteps(mode);
    const outside =
      weights.reduce((sum, weight, pc) => (steps.includes((pc - tonic + 12) % 12) ? sum : sum + weight), 0) / total;
    const said: string[] = [];
    if (starts && ends) said.push(`The tune starts and ends on ${key.tonic}.`);
    else if (ends) said.push(`The tune ends on ${key.tonic}.`);
    else if (starts) said.push(`The tune starts on ${key.tonic}.`);
    if (outside === 0) said.push(`All its notes belong to the scale of ${key.tonic} ${mode}.`);
    else if (outside < 0.1) said.push(`Nearly all its notes belong to the scale of ${key.tonic} ${mode}.`);
    else said.push(`The scale of ${key.tonic} ${mode} fits its notes best.`);
    return said;
  };
  return { score, reasons };
}

/** How well weights fit a key, over the whole panel; asked for the same key again it does not count anew. */
function correlations(weights: readonly number[]): (tonic: number, mode: Mode) => number {
  const known = new Map<string, number>();
  return (tonic, mode) => {
    const turned = turnedModes[mode];
    const like = turned?.like ?? (mode === "minor" ? "minor" : "major");
    const swapped = turned?.swap.join() ?? "";
    const at = (key: { tonic: number; mode: Mode }) => `${swapped} ${key.tonic} ${key.mode}`;
    if (!known.has(at({ tonic, mode: like }))) {
      // Exchanging two weights is exchanging the two degrees of the profile, for this tonic alone.
      const shown = [...weights];
      if (turned) {
        const [one, other] = turned.swap.map((degree) => (tonic + degree) % 12) as [number, number];
        [shown[one], shown[other]] = [weights[other]!, weights[one]!];
      }
      for (const { profile, weight } of panel) {
        for (const match of correlateProfiles(shown, profile)) {
          if (turned && match.tonic !== tonic) continue;
          known.set(at(match), (known.get(at(match)) ?? 0) + weight * match.r);
        }
      }
    }
    return known.get(at({ tonic, mode: like })) ?? 0;
  };
}
