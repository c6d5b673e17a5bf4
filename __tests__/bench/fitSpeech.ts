import { parseArgs } from "node:util";
import { findNotes, HELD_IN_PHRASE_S } from "../../shared/voice/sungNotes";
import { weedNotes } from "../../shared/voice/noteWeeding";
import { trackPitch } from "../../shared/voice/pitchTrack";
import { findSigns } from "../../shared/voice/singingSigns";
import type { SpeechCues } from "../../shared/voice/speechCues";
import { hall, laptopMicrophone } from "../sound/corpusRoom";
import { createRandom } from "../sound/random";
import { folderClips, type BenchClip } from "./folderClips";
import { singer, speaker, type Utterance } from "./speakersAndSingers";

/**
 * Fits the weights of `likenessToSpeech`: `npx tsx __tests__/bench/fitSpeech.ts [--folder DIR] FROM TO [FROM TO …]` makes one
 * reading and one sung line for each seed, and prints the weights and, with each half left out in turn, how many are told
 * wrongly. Recordings of people in a folder (as for `bench:voice --folder`) count three times each, whole and in pieces.
 */
const RIDGE = 1;
const TRUST_IN_PEOPLE = 3;
const PIECE_S = 7;
const STEP_S = 2.5;
const { values: options, positionals } = parseArgs({ options: { folder: { type: "string" } }, allowPositionals: true });
const bounds = positionals.map(Number);
const made = Array.from({ length: bounds.length / 2 }, (_, k) => [bounds[2 * k]!, bounds[2 * k + 1]!] as const)
  .flatMap(([from, to]) => Array.from({ length: to - from }, (_, k) => from + k))
  .flatMap((seed) => [speaker(seed), singer(seed)])
  .flatMap((utterance) => (utterance ? caseOf(utterance) : []));
void fitAll();

async function fitAll(): Promise<void> {
  const recorded = options.folder ? (await folderClips(options.folder)).flatMap(inPieces).flatMap(caseOf) : [];
  const cases = [...made, ...recorded.flatMap((c) => Array<Case>(TRUST_IN_PEOPLE).fill(c))];
  process.stdout.write(`${made.length} made and ${recorded.length} recorded takes with notes\n`);
  for (const left of [0, 1]) {
    const fitted = fit(cases.filter((_, k) => (k >> 5) % 2 !== left));
    const wrong = cases.filter((_, k) => (k >> 5) % 2 === left).filter((c) => value(fitted, c.cues) > 0 === c.sung);
    process.stdout.write(`without this half ${wrong.length} wrong: ${wrong.map(({ name }) => name).join("; ")}\n`);
  }
  const { atRest, weights } = fit(cases);
  process.stdout.write(
    `${JSON.stringify({ atRest: round(atRest), ...Object.fromEntries(Object.entries(weights).map(([cue, w]) => [cue, round(w)])) })}\n`,
  );
}

/** A recording and its pieces, as they are, in an echo, and through a small microphone. */
function inPieces({ name, pcm, sampleRate, truth }: BenchClip): Utterance[] {
  const lengthS = pcm.length / sampleRate;
  const starts = Array.from({ length: Math.max(0, Math.ceil((lengthS - PIECE_S) / STEP_S)) }, (_, k) => k * STEP_S);
  const sung = truth.expected.verdict === "ok";
  return [[0, lengthS] as const, ...starts.map((at) => [at, at + PIECE_S] as const)].flatMap(([from, to], k) => {
    const piece = pcm.slice(from * sampleRate, to * sampleRate);
    const random = createRandom(7 * k + 1);
    const echoing = hall(piece, sampleRate, random.between(0.3, 1.2), random.between(0.15, 0.5), random);
    return [piece, echoing, laptopMicrophone(piece, sampleRate, random)].map((p) => ({
      name,
      sung,
      pcm: p,
      sampleRate,
      truth: null,
    }));
  });
}

interface Case {
  name: string;
  sung: boolean;
  cues: SpeechCues;
}

interface Fitted {
  atRest: number;
  weights: SpeechCues;
}

/** Only takes that come as far as this question count. */
function caseOf({ name, sung, pcm, sampleRate }: Utterance): Case[] {
  const { frames } = trackPitch(pcm, sampleRate);
  const signs = findSigns(frames, weedNotes(findNotes(frames, HELD_IN_PHRASE_S)));
  const { cues, heldS, pitches, voicedShare, still, whistled } = signs;
  return cues && heldS >= 1.2 && pitches >= 3 && voicedShare >= 0.4 && !still && !whistled
    ? [{ name, sung, cues }]
    : [];
}

function value({ atRest, weights }: Fitted, cues: SpeechCues): number {
  return (Object.keys(weights) as (keyof SpeechCues)[]).reduce((sum, cue) => sum + weights[cue] * cues[cue], atRest);
}

/** Logistic regression with a ridge on standardised cues, by Newton's method. @see C. Bishop, Pattern Recognition and Machine Learning, 2006, 4.3.3 */
function fit(from: readonly Case[]): Fitted {
  const names = Object.keys(from[0]!.cues) as (keyof SpeechCues)[];
  const mean = names.map((cue) => from.reduce((sum, c) => sum + c.cues[cue], 0) / from.length);
  const spread = names.map(
    (cue, k) => Math.sqrt(from.reduce((sum, c) => sum + (c.cues[cue] - mean[k]!) ** 2, 0) / from.length) + 1e-9,
  );
  const rows = from.map(({ cues }) => [1, ...names.map((cue, k) => (cues[cue] - mean[k]!) / spread[k]!)]);
  let b = new Array<number>(names.length + 1).fill(0);
  for (let round = 0; round < 60; round++) {
    const gradient = b.map((x, j) => (j === 0 ? 0 : -RIDGE * x));
    const bend = b.map((_, i) => b.map((_, j) => (i === j && i > 0 ? RIDGE : 0)));
    rows.forEach((row, n) => {
      const p = 1 / (1 + Math.exp(-row.reduce((sum, x, j) => sum + x * b[j]!, 0)));
      row.forEach((x, i) => {
        gradient[i]! += x * ((from[n]!.sung ? 0 : 1) - p);
        row.forEach((y, j) => (bend[i]![j]! += x * y * (p * (1 - p) + 1e-9)));
      });
    });
    const step = solve(bend, gradient);
    b = b.map((x, j) => x + step[j]!);
  }
  const weights = Object.fromEntries(names.map((cue, k) => [cue, b[k + 1]! / spread[k]!])) as unknown as SpeechCues;
  return { atRest: b[0]! - names.reduce((sum, cue, k) => sum + weights[cue] * mean[k]!, 0), weights };
}

/** Gauss elimination with pivots. */
function solve(matrix: readonly (readonly number[])[], right: readonly number[]): number[] {
  const a = matrix.map((row, i) => [...row, right[i]!]);
  const n = right.length;
  for (let col = 0; col < n; col++) {
    const pivot = a
      .slice(col)
      .reduce((best, row, k) => (Math.abs(row[col]!) > Math.abs(a[best]![col]!) ? col + k : best), col);
    [a[col], a[pivot]] = [a[pivot]!, a[col]!];
    for (let row = 0; row < n; row++) {
      if (row === col) continue;
      const factor = a[row]![col]! / a[col]![col]!;
      for (let j = col; j <= n; j++) a[row]![j]! -= factor * a[col]![j]!;
    }
  }
  return a.map((row, i) => row[n]! / row[i]!);
}

function round(x: number): number {
  return Number(x.toPrecision(3));
}
