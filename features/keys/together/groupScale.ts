import type { Scale } from "@/features/span/ladderGeometry";
import type { GroupKey } from "./groupKey";

/** Lowest and highest semitone of all voices and of the tune in each of them, with a little air: one scale for all. */
export function groupScale({ parts }: GroupKey): Scale {
  const lows = parts.flatMap(({ voice, lowMidi }) => [voice.range.lowMidi, lowMidi]);
  const highs = parts.flatMap(({ voice, highMidi }) => [voice.range.highMidi, highMidi]);
  return { low: Math.min(...lows) - 3, high: Math.max(...highs) + 3 };
}
