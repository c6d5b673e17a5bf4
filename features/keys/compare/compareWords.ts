import { partMaxima } from "@/shared/keys/keyParts";
import type { KeyParts, SingingVoice } from "@/shared/keys/keyScore";
import { whyNotHigher } from "@/shared/keys/whyNotHigher";
import { distanceWords } from "@/shared/music/moveWords";
import type { KeyRow } from "../keyRows";

const numbers = ["No", "One", "Two", "Three", "Four"];

/** "Three keys, side by side" */
export function compareTitle(count: number): string {
  return `${numbers[count] ?? count} ${count === 1 ? "key" : "keys, side by side"}`;
}

/** What keeps the key a semitone higher from this one's score, or what it has over it; null where it is not known. */
export function whyNotOneHigher(row: KeyRow, rows: readonly KeyRow[]): string | null {
  const higher = rows.find(({ shift }) => (((shift - row.shift - 1) % 12) + 12) % 12 === 0);
  return higher ? whyNotHigher(higher.judged, row.judged, row.key.mode) : null;
}

/** A part of a score in words: what was measured, not how many points that gives. */
export function partInWords(part: keyof KeyParts, row: KeyRow, voice: SingingVoice): string {
  if (part === "comfort") {
    const share = row.marks.reduce((sum, mark) => sum + (mark.zone === "comfort" ? mark.share : 0), 0);
    const percent = Math.round(share * 100);
    return percent === 100 ? "all of the time in your comfort band" : `${percent} % of the time in your comfort band`;
  }
  if (part === "roomAbove") return roomWords(row.above.semitones, "top");
  if (part === "roomBelow") return roomWords(row.below.semitones, "bottom");
  const lost = 1 - row.parts[part] / partMaxima[part];
  const edge = part === "longHigh" ? voice.comfort.highMidi - 2 : voice.comfort.lowMidi + 2;
  const near = row.marks.some(({ midi }) => (part === "longHigh" ? midi >= edge : midi <= edge));
  const what = part === "longHigh" ? "long notes near the top edge" : "low notes near the bottom edge";
  if (!near || lost < 0.05) return `no ${what}`;
  return `${lost > 0.5 ? "much of the time on" : lost > 0.2 ? "some" : "few"} ${what}`;
}

function roomWords(semitones: number, end: "top" | "bottom"): string {
  if (semitones === 0) return `the ${end} note is your last`;
  return `${distanceWords(Math.abs(semitones))} ${semitones < 0 ? "past" : "to"} the ${end} of your range`;
}
