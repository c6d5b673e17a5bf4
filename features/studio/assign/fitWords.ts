import type { PupilKey } from "../judge/judgePupils";

/** How a tune lies in a voice, in semitones: "comfortable, 3 left above", "top 3 in reach, 1 left above", "2 above the range". */
export function fitWords({ fit, over, above, under, below }: PupilKey): string {
  if (fit === "comfort") return `comfortable, ${above} left above`;
  const words: string[] = [];
  if (above < 0) words.push(`${-above} above the range`);
  else if (over > 0) words.push(`top ${over} in reach, ${above} left above`);
  if (below < 0) words.push(`${-below} below the range`);
  else if (under > 0) words.push(`lowest ${under} in reach, ${below} left below`);
  return words.join("; ");
}

/** Colours beside the words of a fit. */
export const fitTone = { comfort: "lagoon", reach: "honey", beyond: "brick" } as const;
