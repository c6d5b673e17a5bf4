import type { ClipTruth } from "./corpusLine";
import { createRandom, type Random } from "./random";

/** null for the corpus as it is committed */
let seed: number | null = null;

/** Makes every clip anew, of the same kinds and from other random numbers: clips that nobody has seen. */
export function reseedCorpus(next: number): void {
  seed = next;
}

export type CorpusHalf = "dev" | "held-out";
/** All clips are made at this rate, in Hz. */
export const CORPUS_RATE = 44100;

export interface ClipSound {
  pcm: Float32Array;
  sampleRate: number;
  truth: ClipTruth;
}

/** One recording of the corpus, made when it is asked for and always the same. */
export interface Clip {
  name: string;
  half: CorpusHalf;
  tags: string[];
  /** null where a program that it needs is not installed */
  make(): ClipSound | null;
}

/** Random numbers that depend on nothing but a clip's name, its half and the corpus's seed. */
export function clipRandom(half: CorpusHalf, name: string): Random {
  let hash = 2166136261;
  for (const letter of `${seed === null ? "" : `${seed}/`}${half}/${name}`)
    hash = Math.imul(hash ^ letter.charCodeAt(0), 16777619);
  return createRandom(hash);
}
