import type { Way } from "./way";
import type { WayCandidate } from "./wayCandidates";

/** Costs of the hand that differ by no more than this are alike. */
const alike = 0.15;
/** A way that costs this much more than the best is not worth showing. */
const tooMuchMore = 1.5;

/**
 * Drops ways that another one beats, and puts the rest in order: those with fewer missing shapes first, then by cost,
 * and last the chart as it is written where it would cost too much to be proposed.
 *
 * What is dropped never costs less than what beats it, so the best of all is always there, and no wish can bring a way
 * past another that has less of what is unwished.
 *
 * @param candidates all ways
 * @returns those worth showing, best first
 */
export function worthwhileInOrder(candidates: readonly WayCandidate[]): WayCandidate[] {
  const standing = candidates.filter((way) => !candidates.some((other) => beats(other, way)));
  const byCost = [...standing].sort(
    (a, b) =>
      a.missing - b.missing ||
      a.total - b.total ||
      a.capo - b.capo ||
      Math.abs(a.retune) - Math.abs(b.retune) ||
      a.retune - b.retune,
  );
  const best = byCost[0];
  if (!best) return [];
  const near = (way: WayCandidate) => way.missing === best.missing && way.total <= best.total + tooMuchMore;
  return [...byCost.filter(near), ...byCost.filter((way) => !near(way) && (way.kind === "as-is" || way.asWritten))];
}

/**
 * The ways that really differ: the best of each kind (nothing changed, capo, retune, retune and capo).
 *
 * @param ways best first
 * @param most how many at most
 * @returns one of each kind, in the same order; where kinds are few, the next best ones besides
 */
export function differentWays<Kind extends Pick<Way, "kind">>(ways: readonly Kind[], most: number): Kind[] {
  const first = ways.filter((way, k) => ways.findIndex(({ kind }) => kind === way.kind) === k).slice(0, most);
  const more = ways.filter((way) => !first.includes(way)).slice(0, Math.max(0, most - first.length));
  return ways.filter((way) => first.includes(way) || more.includes(way));
}

/** Costs no more, is no worse in anything else that can be weighed, and better in something. */
function beats(a: WayCandidate, b: WayCandidate): boolean {
  if (a === b || a.missing > b.missing || a.total > b.total) return false;
  // A capo that only undoes the retune leaves the instrument as it is, with looser strings and fewer frets.
  if (b.retune !== 0 && a.retune === 0 && a.capo === 0 && a.shapeKey === b.shapeKey) return true;
  // A capo one fret higher spares the strings, so tuning up is nothing to go with a capo.
  if (b.retune > 0 && b.capo > 0 && a.retune === 0 && a.shapeKey === b.shapeKey) return true;
  const worth = (way: WayCandidate) => [
    way.missing,
    way.capo,
    Math.abs(way.retune),
    way.retune > 0 ? 1 : 0,
    way.played.amounts.barres,
    way.asWritten ? 0 : 1,
  ];
  const first = worth(a);
  const second = worth(b);
  const easier = b.played.total - a.played.total;
  if (easier < -alike || first.some((cost, k) => cost > second[k]!)) return false;
  return easier > alike || first.some((cost, k) => cost < second[k]!);
}
