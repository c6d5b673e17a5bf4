import { sameKey } from "../sameKey";

/** What is asked of a key here. */
interface Standing {
  /** semitones from the tune as written */
  shift: number;
  score: number;
}

/**
 * The key that stands out among those side by side: the one pressed, else the decided one, else the one with the best
 * score, in whatever order they were pinned. Null where there is none.
 */
export function keyToBegin<Row extends Standing>(
  rows: readonly Row[],
  pressed: number | null,
  decided: number | null,
): Row | null {
  const at = (shift: number | null) => (shift === null ? undefined : rows.find((row) => sameKey(row.shift, shift)));
  const best = rows.reduce<Row | null>((most, row) => (most === null || row.score > most.score ? row : most), null);
  return at(pressed) ?? at(decided) ?? best;
}
