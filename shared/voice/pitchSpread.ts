import type { SungNote, TakeReport } from "./takeReport";

/**
 * Weighted quantile: the least value at which the weights so far reach a share of the whole.
 *
 * @param values values with their weights, each weight >= 0, any order
 * @param share 0 to 1
 * @returns the value; -Infinity without any weight
 * @example weightedQuantile([{ value: 1, weight: 3 }, { value: 2, weight: 1 }], 0.5) // => 1
 */
export function weightedQuantile(values: readonly { value: number; weight: number }[], share: number): number {
  const sorted = [...values].sort((a, b) => a.value - b.value);
  const whole = sorted.reduce((sum, { weight }) => sum + weight, 0);
  if (!(whole > 0)) return -Infinity;
  let seen = 0;
  for (const { value, weight } of sorted) {
    seen += weight;
    if (seen >= share * whole - 1e-9) return value;
  }
  return sorted[sorted.length - 1]!.value;
}

/**
 * Time-weighted quantiles of the sung pitch.
 *
 * @param notes notes to weigh, each by its length
 * @returns quartiles, median and the 5 % and 95 % points as fractional MIDI numbers; null without notes
 */
export function pitchSpread(notes: readonly SungNote[]): NonNullable<TakeReport["tessitura"]> | null {
  const weighed = notes.map((n) => ({ value: n.midi, weight: n.end - n.start }));
  if (!weighed.some(({ weight }) => weight > 0)) return null;
  const at = (share: number): number => weightedQuantile(weighed, share);
  return { q1: at(0.25), median: at(0.5), q3: at(0.75), p5: at(0.05), p95: at(0.95) };
}

/**
 * The singer's common offset from equal temperament: circular mean of the notes' cents, weighted by their length.
 *
 * @param notes notes as sung
 * @returns cents, -50 to 50; 0 without notes
 * @see N. I. Fisher, Statistical Analysis of Circular Data, 1993 (mean direction)
 */
export function commonTuning(notes: readonly Pick<SungNote, "start" | "end" | "midi">[]): number {
  let x = 0;
  let y = 0;
  for (const note of notes) {
    const angle = 2 * Math.PI * (note.midi - Math.round(note.midi));
    x += (note.end - note.start) * Math.cos(angle);
    y += (note.end - note.start) * Math.sin(angle);
  }
  if (Math.hypot(x, y) < 1e-9) return 0;
  return (50 * Math.atan2(y, x)) / Math.PI;
}
