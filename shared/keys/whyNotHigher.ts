import { glyphs, noteName } from "../music/pitch";
import { keyFifths, type Mode } from "../music/keyName";
import { percent } from "./keyReason";
import type { KeyParts, KeyScore } from "./keyScore";

const lossWords: Record<keyof KeyParts, string> = {
  comfort: "more of the tune leaves your comfort band",
  roomAbove: "there is less room above",
  roomBelow: "there is less room below",
  longHigh: "long notes lie higher in your voice",
  lowCarry: "low notes carry less",
};

/**
 * Says in one sentence what keeps one key from the score of another.
 *
 * @param key the key asked about
 * @param other a key to compare it with
 * @param mode decides the spelling of notes; default major
 * @returns plain sentence with glyphs
 * @throws RangeError if a tonic is no note name
 */
export function whyNotHigher(key: KeyScore, other: KeyScore, mode: Mode = "major"): string {
  const name = glyphs(key.tonic);
  const otherName = glyphs(other.tonic);
  if (key.tonic === other.tonic && key.shift === other.shift) return `${name} is compared with itself.`;
  if (key.score === other.score) return `${name} and ${otherName} suit your voice equally, ${key.score} of 100 each.`;
  if (key.score > other.score) return whyNotHigher(other, key, mode);
  const opening = `${name} scores ${key.score} where ${otherName} has ${other.score}: `;
  const spelling = keyFifths({ tonic: key.tonic, mode }) < 0 ? "flats" : "sharps";
  if (key.beyond && !other.beyond) {
    const beyond = key.marks.filter(({ zone }) => zone === "beyond");
    const share = beyond.reduce((sum, mark) => sum + mark.share, 0);
    const names = [...new Set(beyond.map(({ midi }) => glyphs(noteName(midi, spelling))))];
    return `${opening}${names.join(", ")} ${names.length === 1 ? "lies" : "lie"} outside your range${
      key.coarse ? "" : `, ${percent(share).toLowerCase()} of the tune`
    }.`;
  }
  const parts = Object.keys(lossWords) as (keyof KeyParts)[];
  const losses = parts
    .map((part) => ({ part, lost: other.parts[part] - key.parts[part] }))
    .filter(({ lost }) => lost > 0)
    .sort((a, b) => b.lost - a.lost)
    .slice(0, 2);
  return `${opening}${losses.map(({ part, lost }) => `${lossWords[part]} (${lost} less)`).join(" and ")}.`;
}
