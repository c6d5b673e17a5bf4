import type { Scale } from "@/features/span/ladderGeometry";
import type { SingingVoice } from "@/shared/keys/keyScore";

/** Semitones shown beside the voice, for songs that leave it. */
const air = 7;

/** The semitones of every row of the shelf: the voice, with room for songs that go beyond it. */
export function shelfScale({ range }: SingingVoice): Scale {
  return { low: Math.round(range.lowMidi) - air, high: Math.round(range.highMidi) + air };
}
