import { sameKey } from "../../sameKey";
import type { KnownTry } from "../tryQueries";

const sittingMs = 3 * 3_600_000;
const mostKeys = 3;

/** The newest try of each key of this sitting, at most three, in the order in which they were sung. */
export function sittingOf(tries: readonly KnownTry[], nowMs: number): KnownTry[] {
  const recent = tries
    .filter(({ sungAt }) => nowMs - Date.parse(sungAt) < sittingMs)
    .sort((a, b) => b.sungAt.localeCompare(a.sungAt));
  const newest = recent.filter((each, k) => recent.findIndex(({ shift }) => sameKey(shift, each.shift)) === k);
  return newest.slice(0, mostKeys).reverse();
}
