import type { BenchReading } from "./tunerCases";

/** One promise of the tuner, for all plucks of one condition. */
export interface TunerBar {
  name: string;
  condition: string;
  /** the largest error in cents that is allowed once the pitch has settled */
  mostCents: number;
  /** seconds after the pluck within which the first reading is there */
  withinS: number;
}

const within = { mostCents: 1, withinS: 0.3 };

/** What tuning by the reader needs. */
export const tunerBars: readonly TunerBar[] = [
  { name: "clean, every stiffness", condition: "clean", ...within },
  { name: "noise at -20 dB", condition: "room noise at -20 dB", ...within },
  { name: "hum of 50 Hz", condition: "hum of 50 Hz at -12 dB", ...within },
  { name: "hum of 60 Hz", condition: "hum of 60 Hz at -12 dB", ...within },
  { name: "no fundamental", condition: "no fundamental", ...within },
  { name: "other strings ring along", condition: "other strings ring along at -18 dB", ...within },
  { name: "plucked hard", condition: "plucked hard, 8 cents sharp at first", ...within },
  { name: "plucked in the middle", condition: "plucked in the middle", ...within },
];

/** Median, 95th percentile and largest of errors, and how many were not read at all. */
export interface ErrorSummary {
  median: number;
  p95: number;
  most: number;
  unread: number;
}

/** @returns the summary of absolute errors in cents; null counts as unread */
export function summarizeErrors(cents: readonly (number | null)[]): ErrorSummary {
  const heard = cents.flatMap((each) => (each === null ? [] : [Math.abs(each)])).sort((a, b) => a - b);
  const at = (share: number) => heard[Math.min(heard.length - 1, Math.floor(share * heard.length))] ?? NaN;
  return { median: at(0.5), p95: at(0.95), most: at(1), unread: cents.length - heard.length };
}

/** @returns which plucks miss the bar */
export function missesOf(bar: TunerBar, readings: readonly BenchReading[]): BenchReading[] {
  return readings.filter(
    ({ condition, first, settledCents }) =>
      condition === bar.condition &&
      (first === null || first.afterS > bar.withinS || Math.abs(settledCents ?? Infinity) > bar.mostCents),
  );
}
