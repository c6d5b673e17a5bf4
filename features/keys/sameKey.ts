/** Two moves of a tune that bring it to the same key, though perhaps in another octave. */
export function sameKey(shift: number, other: number): boolean {
  return (shift - other) % 12 === 0;
}
