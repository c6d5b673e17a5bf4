import { queryOptions, skipToken, useQueries } from "@tanstack/react-query";
import type { Instrument } from "@/shared/instruments/instrument";
import type { KeyName } from "@/shared/music/keyName";
import type { Way } from "@/shared/ways/way";
import { preferencesOf, type Wishes } from "./wishes";

/** A song's chords, where they stand, and on what they are to be played. */
export interface Playing {
  /** as written, each once, in order of first appearance */
  chords: readonly string[];
  from: KeyName;
  instrument: Instrument;
  wishes: Wishes;
}

let turn: Promise<void> = Promise.resolve();

/** One search after the other, with a breath between them in which the page answers. */
function nextTurn(): Promise<void> {
  turn = turn.then(() => new Promise((resolve) => setTimeout(resolve, 0)));
  return turn;
}

export const wayQueries = {
  /** The ways into one key, best first. Searched on this device; the search is fetched when it is first wanted. */
  into: (playing: Playing | null, to: KeyName | null) =>
    queryOptions({
      queryKey: ["ways", playing, to],
      queryFn: playing && to && playing.chords.length > 0 ? () => search(playing, to) : skipToken,
      staleTime: Infinity,
      retry: false,
    }),
};

async function search({ chords, from, instrument, wishes }: Playing, to: KeyName): Promise<Way[]> {
  const { findWays } = await import("@/shared/ways/findWays");
  await nextTurn();
  return findWays({ chords, from, to, instrument, preferences: preferencesOf(wishes) });
}

/** The ways into each key, best first: undefined while they are searched, null where there is nothing to search. */
export function useFoundWays(playing: Playing | null, keys: readonly KeyName[]): (readonly Way[] | null | undefined)[] {
  const results = useQueries({ queries: keys.map((key) => wayQueries.into(playing, key)) });
  const idle = playing === null || playing.chords.length === 0;
  return results.map(({ data, error }) => data ?? (idle || error ? null : undefined));
}
