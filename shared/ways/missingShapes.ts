import { parseChord } from "../music/chord";
import type { WayChord } from "./way";

/**
 * Chords of a way that the instrument has no shape for. What is no chord ("N.C.") asks for none.
 *
 * @param chords of a way
 * @returns names of the shapes that are missing, ASCII, in order, and how many chords there are
 */
export function missingShapes(chords: readonly { played: string; shape: object | null }[]): {
  names: string[];
  of: number;
} {
  const real = chords.filter(({ played, shape }) => shape !== null || parseChord(played) !== null);
  return { names: real.filter(({ shape }) => shape === null).map(({ played }) => played), of: real.length };
}

/**
 * The same in words.
 *
 * @param chords of a way
 * @returns such as "2 of 5 chords have no shape here"; null where none is missing
 */
export function missingWords(chords: readonly Pick<WayChord, "played" | "shape">[]): string | null {
  const { names, of } = missingShapes(chords);
  if (names.length === 0) return null;
  if (names.length === of) return of === 1 ? "the chord has no shape here" : "none of the chords has a shape here";
  return `${names.length} of ${of} chords ${names.length === 1 ? "has" : "have"} no shape here`;
}
