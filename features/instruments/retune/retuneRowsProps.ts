import type { RetunePlan } from "@/shared/instruments/retunePlan";
import type { Units } from "@/shared/instruments/units";

/** What the table of the wide page and the cards of the phone are given. */
export interface RetuneRowsProps {
  plan: RetunePlan;
  units: Units;
  onChange: (index: number, semitones: number) => void;
}
