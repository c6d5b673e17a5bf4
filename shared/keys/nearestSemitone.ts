/**
 * The whole semitone that a pitch is named by. The last digits are dropped first, in which two sums of the same parts
 * may differ: a band that was moved must not be named differently for it.
 *
 * @param midi fractional MIDI number
 * @returns whole MIDI number, halves up
 * @example nearestSemitone(63.49999999999999) // => 64
 */
export function nearestSemitone(midi: number): number {
  return Math.round(Math.round(midi * 1e9) / 1e9);
}
