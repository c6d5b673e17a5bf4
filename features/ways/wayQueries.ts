import { queryOptions, skipToken, useQueries } from "@tanstack/react-query";
import type { Instrument } from "@/shared/instruments/instrument";
import type { KeyName } from "@/shared/music/keyName";
import type { WayMoves } from "@/shared/ways/askedWay";
import type { Way } from "@/shared/ways/way";
import { searchWays } from "./search/waySearch";
import { preferencesOf, type Wishes } from "./wishes/wishes";

/** A song's chords, where they stand, and on what they are to be played. */
export interface Playing {
  /** as written, each once, in order of first appearance */
  chords: readonly string[];
  /** the same as they are played, with repeats */
  sequence?: readonly string[];
  from: KeyName;
  instrument: Instrument;
  wishes: Wishes;
  /** a way that was settled on, to be found whatever the wishes are */
  settled?: WayMoves | null;
}

export const wayQueries = {
  /** The ways into one key, best first. Searched on this device, beside the page. */
  into: (playing: Playing | null, to: KeyName | null) =>
    queryOptions({
      queryKey: ["ways", playing, to],
      queryFn: playing && to && playing.chords.length > 0 ? ({ signal }) => search(playing, to, signal) : skipToken,
      staleTime: Infinity,
      // While other wishes are weighed, the ways that were there stay.
      placeholderData: (ways, before) => (sameBut(before?.queryKey, playing, to) ? ways : undefined),
      retry: false,
    }),
};

/** Whether a search asked for the same, perhaps with other wishes. */
function sameBut(before: readonly unknown[] | undefined, playing: Playing | null, to: KeyName | null): boolean {
  const asked = before?.[1] as Playing | null | undefined;
  if (!asked || !playing) return false;
  const bare = ({ wishes: _wishes, ...rest }: Playing, key: unknown) => JSON.stringify([rest, key]);
  return bare(asked, before?.[2]) === bare(playing, to);
}

function search(playing: Playing, to: KeyName, signal: AbortSignal): Promise<Way[]> {
  const { wishes, ...question } = playing;
  const preferences = preferencesOf(wishes, question.instrument);
  return searchWays({ ...question, to, preferences }, signal);
}

/** The ways into each key, best first: undefined while they are searched, null where there is nothing to search. */
export function useFoundWays(playing: Playing | null, keys: readonly KeyName[]): (readonly Way[] | null | undefined)[] {
  const results = useQueries({ queries: keys.map((key) => wayQueries.into(playing, key)) });
  const idle = playing === null || playing.chords.length === 0;
  return results.map(({ data, error }) => data ?? (idle || error ? null : undefined));
}
