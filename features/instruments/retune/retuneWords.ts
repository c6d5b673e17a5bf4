import type { TensionChange, TensionTotal } from "@/shared/instruments/tension";
import { newtonWords, tensionWords, type Units } from "@/shared/instruments/units";
import { semitoneWords } from "@/shared/music/moveWords";

/** Semitones of each string, in playing order. */
export type Shifts = number[];

export const lowestShift = -12;
export const highestShift = 5;

/** "2 semitones down", "as it is". */
export function shiftWords(semitones: number): string {
  if (semitones === 0) return "as it is";
  return `${semitoneWords(Math.abs(semitones))} ${semitones < 0 ? "down" : "up"}`;
}

/** A tension in full: "10.3 kg, 101 N" or "22.8 lb". */
export function pullWords(lb: number | null, units: Units): string {
  if (lb === null) return "not known";
  return units === "metric" ? `${tensionWords(lb, units)}, ${newtonWords(lb)}` : tensionWords(lb, units);
}

/** A verdict with its reason. */
export function verdictWords({ verdict, ofPacket, load, semitones }: TensionChange): string {
  const share = `${Math.round(ofPacket * 100)} % of its own tension`;
  const borne = load === null ? "" : `, ${Math.round(load * 100)} % of what the wire bears`;
  if (verdict === "unsafe") return `Too far${load === null ? ": it may snap" : borne.replace(", ", ": ")}`;
  if (verdict === "slack") return `Slack: ${share}`;
  if (verdict === "tight") return `Tight: ${share}${borne}`;
  return semitones === 0 && ofPacket === 1 ? "As it was made for" : `Fine: ${share}`;
}

/** The whole pull on the neck, before and after. */
export function totalWords({ beforeLb, afterLb, unknown }: TensionTotal, units: Units): string {
  if (beforeLb === 0) return "The whole pull is not known: no gauge is.";
  const without = unknown === 0 ? "" : ` without ${unknown} of unknown gauge`;
  const change = Math.round((afterLb / beforeLb - 1) * 100);
  const by = change === 0 ? "" : ` (${change > 0 ? "+" : "−"}${Math.abs(change)} %)`;
  return `Whole pull${without}: ${pullWords(beforeLb, units)} before, ${pullWords(afterLb, units)} after${by}.`;
}
