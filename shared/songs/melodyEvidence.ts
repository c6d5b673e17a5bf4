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
  const matches = panel.map(({ profile, weight }) => ({ weight, keys: correlateProfiles(weights, profile) }));
  const total = weights.reduce((sum, weight) => sum + weight, 0);
  const low = Math.min(...[...new Set(notes.map((note) => note.midi))]);
  const degreeOf = (midi: number, tonic: number) => (pitchClass(midi) - tonic + 12) % 12;
  const score = (tonic: number, mode: Mode): number => {
    const correlation = matches.reduce(
      (sum, { weight, keys }) => sum + weight * (keys.find((key) => key.tonic === tonic && key.mode === mode)?.r ?? 0),
      0,
    );
    const ending = degreeOf(last.midi, tonic);
    const opening = degreeOf(first.midi, tonic);
    const third = mode === "minor" ? 3 : 4;
    const lowest = degreeOf(low, tonic);
    return (
      correlation +
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
