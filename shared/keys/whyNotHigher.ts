import { glyphs, noteName } from "../music/pitch";
import { keyFifths, tonicPitchClass, type Mode } from "../music/keyName";
import { percent } from "./keyReason";
import type { KeyParts, KeyScore } from "./keyScore";
import { nearestMove } from "./keyTies";

/** What a key may have over another although it scores less. */
const gainWords: Record<keyof KeyParts, string> = {
  comfort: "more of the tune is comfortable",
  roomAbove: "there is more room above",
  roomBelow: "there is more room below",
  longHigh: "long notes lie lower in your voice",
  lowCarry: "low notes carry better",
};

/**
 * Says in one sentence what keeps one key from the score of another: the two largest losses, measured and in points,
 * and what is gained in return. It answers "why not one higher?", "why not one lower?" and the question between any two.
 *
 * @param key the key asked about
 * @param other a key to compare it with, judged for the same tune and voice
 * @param mode decides the spelling of notes; default major
 * @returns plain sentence with glyphs; which of the two is given first changes nothing but equals
 * @throws RangeError if a tonic is no note name
 */
export function whyNotHigher(key: KeyScore, other: KeyScore, mode: Mode = "major"): string {
  const name = glyphs(key.tonic);
  const otherName = glyphs(other.tonic);
  if (key.tonic === other.tonic && key.shift === other.shift) return `${name} is compared with itself.`;
  if (key.score === other.score) return `${name} and ${otherName} suit your voice equally, ${key.score} of 100 each.`;
  if (key.score > other.score) return whyNotHigher(other, key, mode);
  const opening = `${name}${octaveWords(key, other)} scores ${key.score} where ${otherName} has ${other.score}: `;
  if (key.beyond && !other.beyond) return `${opening}${outsideWords(key, mode)}.`;
  const changes = (Object.keys(gainWords) as (keyof KeyParts)[])
    .map((part) => ({ part, lost: other.parts[part] - key.parts[part] }))
    .sort((a, b) => b.lost - a.lost);
  const losses = changes
    .filter(({ lost }) => lost > 0)
    .slice(0, 2)
    .map(({ part, lost }) => `${lossWords(part, key, other)} (${points(lost)} less)`);
  const gained = changes[changes.length - 1]!;
  const inReturn = gained.lost < 0 ? `, though ${gainWords[gained.part]} (${points(-gained.lost)} more)` : "";
  return `${opening}${losses.join(" and ")}${inReturn}.`;
}

/** Where a key is sung in another octave than its name alone would tell. */
function octaveWords(key: KeyScore, other: KeyScore): string {
  const move = key.shift - other.shift;
  if (Math.abs(move) <= 6) return "";
  const octaves = Math.round((move - nearestMove(tonicPitchClass(other.tonic), tonicPitchClass(key.tonic))) / 12);
  if (octaves === 0) return "";
  const size = Math.abs(octaves) === 1 ? "an octave" : `${Math.abs(octaves)} octaves`;
  return `, sung ${size} ${octaves < 0 ? "lower" : "higher"},`;
}

function outsideWords(key: KeyScore, mode: Mode): string {
  const spelling = keyFifths({ tonic: key.tonic, mode }) < 0 ? "flats" : "sharps";
  const outside = key.marks.filter(({ zone }) => zone === "beyond");
  const names = outside.map(({ midi }) => glyphs(noteName(midi, spelling)));
  const share = key.coarse ? "" : `, ${percent(shareOut(key, "beyond")).toLowerCase()} of the tune`;
  return `${names.join(", ")} ${names.length === 1 ? "lies" : "lie"} outside your range${share}`;
}

function lossWords(part: keyof KeyParts, key: KeyScore, other: KeyScore): string {
  if (part === "roomAbove") return roomWords("above", key.reserves.upper, other.reserves.upper);
  if (part === "roomBelow") return roomWords("below", key.reserves.lower, other.reserves.lower);
  if (part === "longHigh") return "long notes lie higher in your voice";
  if (part === "lowCarry") return "low notes carry less";
  const limit = key.beyond && !key.coarse ? "range" : "comfort band";
  const zone = limit === "range" ? "beyond" : "reach";
  const [out, before] = [shareOut(key, zone), shareOut(other, zone)];
  if (key.coarse) return `more of the tune leaves your ${limit}`;
  if (percent(out) === percent(before)) return `the tune leaves your ${limit} further`;
  const instead = before === 0 ? "none of it" : percent(before).toLowerCase();
  return `${percent(out).toLowerCase()} of the tune leaves your ${limit} instead of ${instead}`;
}

function roomWords(side: "above" | "below", room: number, before: number): string {
  if (room < 0) return `the tune goes further ${side} your range`;
  const left = room === 0 ? "nothing is" : room === 1 ? "1 semitone is" : `${room} semitones are`;
  return `${left} left ${side} instead of ${before}`;
}

function points(count: number): string {
  return `${count} ${count === 1 ? "point" : "points"}`;
}

/** Share of the tune beyond the range, or outside the comfort band. */
function shareOut({ marks }: KeyScore, from: "reach" | "beyond"): number {
  const out = marks.filter(({ zone }) => zone === "beyond" || (from === "reach" && zone === "reach"));
  return out.reduce((sum, { share }) => sum + share, 0);
}
