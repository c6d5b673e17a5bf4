import { percent } from "@/shared/keys/keyReason";
import type { KeyParts } from "@/shared/keys/keyScore";
import type { PartFacts } from "@/shared/keys/partFacts";
import { whyNotHigher } from "@/shared/keys/whyNotHigher";
import { distanceWords } from "@/shared/music/moveWords";
import { glyphs, noteName, type Spelling } from "@/shared/music/pitch";
import type { KeyRow } from "../keyRows";
import { BEYOND_COUNTS } from "../partWords";
import { capitalized, countWord } from "@/shared/music/countWords";

/** "Three keys, side by side" */
export function compareTitle(count: number): string {
  return `${capitalized(countWord(count))} ${count === 1 ? "key" : "keys, side by side"}`;
}

/** What keeps the key a semitone higher from this one's score, or what it has over it; null where it is not known. */
export function whyNotOneHigher(row: KeyRow, rows: readonly KeyRow[]): string | null {
  const higher = rows.find(({ shift }) => (((shift - row.shift - 1) % 12) + 12) % 12 === 0);
  return higher ? whyNotHigher(higher.judged, row.judged, row.key.mode) : null;
}

/** A part of a score in words: what was measured, not how many points that gives. */
export function partInWords(part: keyof KeyParts, facts: PartFacts, spelling: Spelling, beyond = false): string {
  const name = (midi: number) => glyphs(noteName(midi, spelling));
  if (part === "comfort") {
    const { inside } = facts.comfort;
    const time = inside > 0.999 ? "all of the time" : `${percent(inside)} of the time`;
    return `${time} in your comfort band${beyond ? `; ${BEYOND_COUNTS}` : ""}`;
  }
  if (part === "roomAbove") return roomWords(facts.roomAbove.semitones, "top");
  if (part === "roomBelow") return roomWords(facts.roomBelow.semitones, "bottom");
  if (part === "lowCarry") {
    const { share, toMidi } = facts.lowCarry;
    return share === 0
      ? `nothing as low as ${name(toMidi)}`
      : `${percent(share)} of the time on ${name(toMidi)} or lower`;
  }
  const { share, longShare, fromMidi } = facts.longHigh;
  if (share === 0) return `nothing as high as ${name(fromMidi)}`;
  const long =
    longShare === null
      ? ""
      : longShare === 0
        ? ", no long notes"
        : `, ${percent(longShare).toLowerCase()} in long notes`;
  return `${percent(share)} of the time on ${name(fromMidi)} or higher${long}`;
}

function roomWords(semitones: number, end: "top" | "bottom"): string {
  if (semitones === 0) return `the ${end} note is your last`;
  return `${distanceWords(Math.abs(semitones))} ${semitones < 0 ? "past" : "to"} the ${end} of your range`;
}
