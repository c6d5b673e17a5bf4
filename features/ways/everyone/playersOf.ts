import type { Player } from "@/shared/contract/lineUp";
import type { Way } from "@/shared/ways/way";

/** The players with the way that one of them takes into a key. */
export function withWay(
  players: readonly Player[],
  id: string,
  into: string,
  { retune, capo, shapeKey }: Pick<Way, "retune" | "capo" | "shapeKey">,
): Player[] {
  return players.map((player) => (player.id === id ? { ...player, way: { into, retune, capo, shapeKey } } : player));
}

/** The way that a player uses in a key: the one they took for it, else the best. */
export function wayInUse(ways: readonly Way[], { way }: Pick<Player, "way">, into: string): Way | null {
  const taken =
    way?.into === into
      ? ways.find((each) => each.retune === way.retune && each.capo === way.capo && each.shapeKey === way.shapeKey)
      : undefined;
  return taken ?? ways[0] ?? null;
}
