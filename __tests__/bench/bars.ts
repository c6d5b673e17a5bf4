import { summarize, type Scored, type Summary } from "./scoring";

/** A clip's score with the clip's tags. */
export interface TaggedScore extends Scored {
  tags: readonly string[];
}

/** One promise of the range engine: which clips, which measure, and what it must reach at least or stay within. */
export interface Bar {
  name: string;
  /** null means every clip */
  tag: string | null;
  measure: Exclude<keyof Summary, "clips">;
  atLeast?: number;
  atMost?: number;
}

/** What a range that people can trust needs; shares of frames or of clips. */
export const BARS: readonly Bar[] = [
  { name: "pitch right, all clips", tag: null, measure: "rpa", atLeast: 0.97 },
  { name: "pitch right, clean", tag: "clean", measure: "rpa", atLeast: 0.99 },
  { name: "pitch right, noise at 10 dB", tag: "noise10", measure: "rpa", atLeast: 0.95 },
  { name: "octave errors, all clips", tag: null, measure: "octaveErrors", atMost: 0.005 },
  { name: "both ends of the range, all clips", tag: null, measure: "bothEnds", atLeast: 0.95 },
  { name: "both ends of the range, clean", tag: "clean", measure: "bothEnds", atLeast: 1 },
  { name: "both ends of the range, weak fundamental", tag: "weakfund", measure: "bothEnds", atLeast: 1 },
  { name: "both ends of the range, guitar at -20 dB", tag: "bleed", measure: "bothEnds", atLeast: 0.8 },
  { name: "singing refused", tag: null, measure: "refused", atMost: 0.01 },
  { name: "accepted although nobody sings", tag: null, measure: "accepted", atMost: 0 },
];

/** @returns the measured share, null where no clip belongs to the bar, and whether it is reached */
export function measureBar(bar: Bar, scores: readonly TaggedScore[]): { value: number | null; met: boolean } {
  const { tag } = bar;
  const value = summarize(tag === null ? scores : scores.filter(({ tags }) => tags.includes(tag)))[bar.measure];
  return { value, met: value !== null && value >= (bar.atLeast ?? 0) && value <= (bar.atMost ?? 1) };
}
