import { partMaxima, roomEnough } from "@/shared/keys/keyParts";
import type { KeyParts } from "@/shared/keys/keyScore";
import { capitalized } from "@/shared/music/countWords";
import { semitoneWords } from "@/shared/music/moveWords";

/** The five parts of a score by their names, in their order. */
export const partNames: readonly { part: keyof KeyParts; name: string; inWords: string }[] = [
  { part: "comfort", name: "Time in comfort", inWords: "for time in comfort" },
  { part: "roomAbove", name: "Room above", inWords: "for room above" },
  { part: "roomBelow", name: "Room below", inWords: "for room below" },
  { part: "longHigh", name: "Long high notes", inWords: "for long high notes" },
  { part: "lowCarry", name: "Low notes carry", inWords: "for low notes" },
];

/** Semitones between the tune's ends and the ends of the range, and whether a note lies past them. */
interface Rooms {
  above: { semitones: number };
  below: { semitones: number };
  beyond?: boolean;
}

/** Why the parts of a key are small although much of it sits well. */
export const BEYOND_COUNTS = "with a note beyond your range, each of the five parts counts two fifths at most";

/** "50 of 50 for time in comfort, 15 of 15 for room above (5 semitones to the top of your range), …" */
export function partWords(parts: KeyParts, { above, below, beyond = false }: Rooms): string {
  const measured: Partial<Record<keyof KeyParts, string>> = {
    roomAbove: ` (${roomTo(above.semitones)} the top of your range)`,
    roomBelow: ` (${roomTo(below.semitones)} its bottom)`,
  };
  const each = partNames.map(
    ({ part, inWords }) => `${parts[part]} of ${partMaxima[part]} ${inWords}${measured[part] ?? ""}`,
  );
  return `${each.join(", ")}${beyond ? `; ${BEYOND_COUNTS}` : ""}.`;
}

/** What the two parts for room measure, with this key's figures. */
export function roomWords({ above, below, beyond = false }: Rooms): string {
  return (
    `Room counts to the ends of your range, not of the comfort band: ${roomTo(above.semitones)} the top, ` +
    `${roomTo(below.semitones)} the bottom. ` +
    (beyond
      ? `${capitalized(BEYOND_COUNTS)}.`
      : `Lying inside earns a part of the points, ${roomEnough.above} semitones above and ${roomEnough.below} below earn all.`)
  );
}

function roomTo(semitones: number): string {
  const amount = semitoneWords(Math.abs(semitones));
  return semitones < 0 ? `${amount} past` : `${amount} to`;
}
