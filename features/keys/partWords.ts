import { partMaxima } from "@/shared/keys/keyParts";
import type { KeyParts } from "@/shared/keys/keyScore";

/** The five parts of a score by their names, in their order. */
export const partNames: readonly { part: keyof KeyParts; name: string; inWords: string }[] = [
  { part: "comfort", name: "Time in comfort", inWords: "for time in comfort" },
  { part: "roomAbove", name: "Room above", inWords: "for room above" },
  { part: "roomBelow", name: "Room below", inWords: "for room below" },
  { part: "longHigh", name: "Long high notes", inWords: "for long high notes" },
  { part: "lowCarry", name: "Low notes carry", inWords: "for low notes" },
];

/** "50 of 50 for time in comfort, 15 of 15 for room above, …" */
export function partWords(parts: KeyParts): string {
  return `${partNames.map(({ part, inWords }) => `${parts[part]} of ${partMaxima[part]} ${inWords}`).join(", ")}.`;
}
