import type { MeasureSigns } from "./repeats";

/** Signs of a measure, with those codas of which only the whole score tells whether one leaves there or arrives. */
export interface ScoreSigns extends MeasureSigns {
  codaSign?: boolean;
}

/**
 * Reads words over the music that send a player elsewhere.
 *
 * @param text the words, such as "D.S. al Coda"
 * @returns the signs they stand for; none for other words
 * @see common practice
 * @example readJumpWords("D.C. al Fine") // => { jump: "da capo" }
 */
export function readJumpWords(text: string): ScoreSigns {
  if (/^\s*(?:D\.?\s?C\b|da\s?capo\b)/i.test(text)) return { jump: "da capo" };
  if (/^\s*(?:D\.?\s?S\b|dal\s?segno\b)/i.test(text)) return { jump: "dal segno" };
  if (/^\s*fine\b/i.test(text)) return { fine: true };
  return /^\s*(?:to|da)\s?coda\b/i.test(text) ? { toCoda: true } : {};
}

/**
 * Tells of coda signs that nothing explains where one leaves and where the coda begins: the first of two is left at.
 *
 * @param signs signs of all measures, in order
 * @returns the same with the coda signs placed
 * @see common practice
 */
export function placeCodas<Signs extends ScoreSigns>(signs: readonly Signs[]): Signs[] {
  const marked = signs.flatMap((each, index) => (each.codaSign && !each.toCoda ? [index] : []));
  const leaves = signs.some((each) => each.toCoda) || marked.length < 2 ? -1 : marked[0]!;
  const arrives = signs.some((each) => each.coda) ? -1 : (marked.at(-1) ?? -1);
  return signs.map((each, index) => ({
    ...each,
    ...(index === leaves ? { toCoda: true } : {}),
    ...(index === arrives && index !== leaves ? { coda: true } : {}),
  }));
}
