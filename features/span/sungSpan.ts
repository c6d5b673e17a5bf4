import type { SingingVoice } from "@/shared/keys/keyScore";

/** Lowest and highest note as they are sung, and where they leave the voice. */
export interface SungSpan {
  low: number;
  high: number;
  below: boolean;
  above: boolean;
  /** both ends lie in the comfort band */
  comfortable: boolean;
}

/** Where a tune lies in a voice, both on whole semitones. */
export function sungIn(low: number, high: number, { range, comfort }: SingingVoice): SungSpan {
  return {
    low,
    high,
    below: low < Math.round(range.lowMidi),
    above: high > Math.round(range.highMidi),
    comfortable: low >= Math.round(comfort.lowMidi) && high <= Math.round(comfort.highMidi),
  };
}
