import type { PupilKey } from "../judge/judgePupils";

const semitones = (count: number) => `${count} ${count === 1 ? "semitone" : "semitones"}`;

/** How a tune lies in a voice, short: "comfortable, 3 left above", "top 2 in reach", "leaves the range by 2 above". */
export function fitWords({ fit, over, above, under, below }: PupilKey): string {
  if (fit === "comfort") return `comfortable, ${above} left above`;
  const words: string[] = [];
  if (above < 0) words.push(`${semitones(-above)} above the range`);
  else if (over > 0) words.push(`top ${over} in reach, ${above} left above`);
  if (below < 0) words.push(`${semitones(-below)} below the range`);
  else if (under > 0) words.push(`lowest ${under} in reach`);
  return words.join("; ");
}

/** Colours beside the words of a fit. */
export const fitTone = { comfort: "lagoon", reach: "honey", beyond: "brick" } as const;
