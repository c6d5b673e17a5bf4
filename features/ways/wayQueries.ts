import { queryOptions, skipToken, useQueries } from "@tanstack/react-query";
import type { Instrument } from "@/shared/instruments/instrument";
import type { KeyName } from "@/shared/music/keyName";
import type { Way } from "@/shared/ways/way";
import { searchWays } from "./search/waySearch";
import { preferencesOf, type Wishes } from "./wishes";

/** A song's chords, where they stand, and on what they are to be played. */
export interface Playing {
  /** as written, each once, in order of first appearance */
  chords: readonly string[];
  from: KeyName;
  instrument: Instrument;
  wishes: Wishes;
}

export const wayQueries = {
  /** The ways into one key, best first. Searched on this device, beside the page. */
  into: (playing: Playing | null, to: KeyName | null) =>
    queryOptions({
      queryKey: ["ways", playing, to],
      queryFn: playing && to && playing.chords.length > 0 ? ({ signal }) => search(playing, to, signal) : skipToken,
      staleTime: Infinity,
      retry: false,
    }),
};

function search({ chords, from, instrument, wishes }: Playing, to: KeyName, signal: AbortSignal): Promise<Way[]> {
  return searchWays({ chords, from, to, instrument, preferences: preferencesOf(wishes) }, signal);
}

/** The ways into each key, best first: undefined while they are searched, null where there is nothing to search. */
export function useFoundWays(playing: Playing | null, keys: readonly KeyName[]): (readonly Way[] | null | undefined)[] {
  const results = useQueries({ queries: keys.map((key) => wayQueries.into(playing, key)) });
  const idle = playing === null || playing.chords.length === 0;
  return results.map(({ data, error }) => data ?? (idle || error ? null : undefined));
}
