import { keyFifths, tonicPitchClass, type Mode } from "../music/keyName";

/**
 * Shortest move from one tonic to another.
 *
 * @param from pitch class
 * @param to pitch class
 * @returns semitones, -5 to 6
 * @example nearestMove(7, 0) // => 5
 */
export function nearestMove(from: number, to: number): number {
  const up = (((to - from) % 12) + 12) % 12;
  return up > 6 ? up - 12 : up;
}

/**
 * The order of keys that suit a voice equally: fewest accidentals, then closeness to the present key.
 *
 * @param mode decides the signatures
 * @param presentKey tonic that the song stands in now, ASCII
 * @returns a comparison of two keys for sorting; never 0 for two different tonics
 * @throws RangeError if a tonic is no note name
 */
export function compareTies(mode: Mode, presentKey: string): (a: { tonic: string }, b: { tonic: string }) => number {
  const present = tonicPitchClass(presentKey);
  const accidentals = ({ tonic }: { tonic: string }) => Math.abs(keyFifths({ tonic, mode }));
  const distance = ({ tonic }: { tonic: string }) => Math.abs(nearestMove(present, tonicPitchClass(tonic)));
  return (a, b) =>
    accidentals(a) - accidentals(b) || distance(a) - distance(b) || tonicPitchClass(a.tonic) - tonicPitchClass(b.tonic);
}
