import type { Way } from "./way";

/** As much of a way as tells it from the others of its key. */
export type WayMoves = Pick<Way, "retune" | "capo" | "shapeKey">;

/** A way as an address asks for it. All of it as it stands there. */
export interface WayAddress {
  retune?: string;
  capo?: string;
  shapes?: string;
}

/**
 * An address's part for a way of playing.
 *
 * @param moves of the way
 * @returns what `askedWay` reads
 * @example wayAddress({ retune: -2, capo: 0, shapeKey: "D" }) // => { retune: "-2", capo: "0", shapes: "D" }
 */
export function wayAddress({ retune, capo, shapeKey }: WayMoves): Required<WayAddress> {
  return { retune: String(retune), capo: String(capo), shapes: shapeKey };
}

/**
 * The way that an address asks for, else the one kept with the decision, else the best.
 *
 * @param ways of one key on one instrument, best first
 * @param asked what the address says
 * @param kept the way of the decision; null without
 * @returns null where there is no way at all
 */
export function askedWay<Moves extends WayMoves>(
  ways: readonly Moves[],
  { retune, capo, shapes }: WayAddress,
  kept: WayMoves | null,
): Moves | null {
  const is = (want: WayMoves) => (way: Moves) =>
    way.retune === want.retune && way.capo === want.capo && way.shapeKey === want.shapeKey;
  const wanted =
    retune !== undefined && capo !== undefined && shapes !== undefined
      ? ways.find(is({ retune: Number(retune), capo: Number(capo), shapeKey: shapes }))
      : undefined;
  return wanted ?? (kept ? ways.find(is(kept)) : undefined) ?? ways[0] ?? null;
}
