import { type Clip, type CorpusHalf } from "./corpusClip";
import { quietClips } from "./corpusWithoutSinging";
import { singingClips } from "./corpusWithSinging";

/**
 * The benchmark's recordings: about 75 in each half. Both halves hold the same kinds from different seeds; the tracker is
 * tuned on "dev" only, so that the figures on "held-out" are not fitted.
 */
export function corpus(half: CorpusHalf): Clip[] {
  return [...singingClips(half), ...quietClips(half)];
}
