import type { Metre } from "@/shared/songs/backing/metre";
import type { Step } from "@/shared/ways/hand/strokePattern";

export const stepWords: Record<Step, string> = {
  down: "Down",
  up: "Up",
  bass: "Bass",
  pluck: "Pluck",
  rest: "Rest",
};

/** How an eighth of the bar is counted: "1", "+", "2"; in metres of eighths each by its number. */
export function countOf(index: number, { beats, quarters }: Metre): string {
  const eighths = (quarters * 2) / beats;
  return index % eighths === 0 ? String(index / eighths + 1) : "+";
}

export function sayCount(count: string, before = ""): string {
  return count === "+" ? `the half${before === "" ? "" : ` after ${before}`}` : count;
}
