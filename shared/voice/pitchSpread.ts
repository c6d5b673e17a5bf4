import type { SungNote, TakeReport } from "./takeReport";

/**
 * Time-weighted quantiles of the sung pitch.
 *
 * @param notes notes to weigh, each by its length
 * @returns quartiles, median and the 5 % and 95 % points as fractional MIDI numbers; null without notes
 */
export function pitchSpread(notes: readonly SungNote[]): NonNullable<TakeReport["tessitura"]> | null {
  const sorted = notes.map((n) => ({ midi: n.midi, weight: n.end - n.start })).sort((a, b) => a.midi - b.midi);
  const whole = sorted.reduce((sum, n) => sum + n.weight, 0);
  if (!(whole > 0)) return null;
  const at = (share: number): number => {
    let seen = 0;
    for (const { midi, weight } of sorted) {
      seen += weight;
      if (seen >= share * whole - 1e-9) return midi;
    }
    return sorted[sorted.length - 1]!.midi;
  };
  return { q1: at(0.25), median: at(0.5), q3: at(0.75), p5: at(0.05), p95: at(0.95) };
}

/**
 * The singer's common offset from equal temperament: circular mean of the notes' cents, weighted by their length.
 *
 * @param notes notes as sung
 * @returns cents, -50 to 50; 0 without notes
 * @see N. I. Fisher, Statistical Analysis of Circular Data, 1993 (mean direction)
 */
export function commonTuning(notes: readonly SungNote[]): number {
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
