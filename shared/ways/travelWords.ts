/** A hand that moves this little over a whole song stays where it is, mm. */
const still = 5;

/**
 * How far the hand travels along the neck, in words.
 *
 * @param travelMm the song through, mm, 0 or more
 * @returns one sentence
 * @example travelWords(0) // => "The hand stays in one place."
 * @example travelWords(380) // => "The hand travels 38 cm along the neck, the song through."
 */
export function travelWords(travelMm: number): string {
  if (travelMm < still) return "The hand stays in one place.";
  const length =
    travelMm < 100
      ? `${travelMm} mm`
      : travelMm < 1000
        ? `${Math.round(travelMm / 10)} cm`
        : `${(travelMm / 1000).toFixed(1)} m`;
  return `The hand travels ${length} along the neck, the song through.`;
}
