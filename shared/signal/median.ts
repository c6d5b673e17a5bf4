/**
 * The middle of some measurements: as many are smaller as are larger.
 *
 * @param values any order, shape [n], n >= 1; not modified
 * @returns the middle value, or the mean of the two middle ones where n is even
 * @throws RangeError if there are none
 * @example median([9, 1, 4, 2]) // => 3
 */
export function median(values: readonly number[]): number {
  if (values.length === 0) throw new RangeError("nothing has no middle");
  const sorted = [...values].sort((a, b) => a - b);
  const half = sorted.length >> 1;
  return sorted.length % 2 === 1 ? sorted[half]! : (sorted[half - 1]! + sorted[half]!) / 2;
}
