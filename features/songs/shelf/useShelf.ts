import { useInfiniteQuery, useQueryClient } from "@tanstack/react-query";
import { useEffect, useMemo, useState } from "react";
import type { SongListing } from "@/shared/contract/songListing";
import type { SingingVoice } from "@/shared/keys/keyScore";
import { songQueries } from "../songQueries";
import { fitOf, judgeByNotes } from "./shelfFits";
import { inFitOrder, inKeyOrder, shownKey, type ShelfKey } from "./shelfRow";
import type { ShelfView } from "./shelfView";

/** The songs of a view, as far as they are here. */
export interface Shelf {
  /** undefined until the first answer */
  songs: readonly SongListing[] | undefined;
  total: number;
  /** asks for the next page; does nothing where there is none, or one is on its way */
  more: () => void;
  /** more are on their way */
  coming: boolean;
  /** what is shown is still the view before */
  stale: boolean;
  /** the fit is judged by spans until the notes are read */
  judging: boolean;
  /** how often scores by notes were made ready */
  judged: number;
  error: Error | null;
  retry: () => void;
}

/** A shelf up to this size is fetched with its charts when there is time, so that its songs open without a connection. */
const wholeUpTo = 300;

export function useShelf(
  view: ShelfView,
  voice: SingingVoice | null,
  mineOf: (song: SongListing) => ShelfKey | null,
): Shelf {
  const { sort, q, tag, archived } = view;
  // The server knows neither voices nor decided keys: these two orders need every song here.
  const whole = sort === "key" || (sort === "fit" && voice !== null);
  const query = useInfiniteQuery(
    songQueries.pages({
      q,
      tag,
      archived,
      sort: sort === "played" ? "played" : sort === "newest" ? "saved" : "title",
      limit: whole ? 200 : 60,
    }),
  );
  const { data, hasNextPage, isFetchingNextPage, fetchNextPage, isPlaceholderData, isFetchNextPageError } = query;
  const wanting = whole && hasNextPage && !isFetchingNextPage && !isFetchNextPageError && !isPlaceholderData;
  useEffect(() => {
    if (wanting) void fetchNextPage();
  }, [wanting, fetchNextPage, data]);
  const total = data?.pages[0]?.total ?? 0;
  const complete = data !== undefined && !hasNextPage;
  const judged = useJudged(sort === "fit" && complete && !isPlaceholderData ? voice : null);
  useWholeShelf(data !== undefined && q === "" && tag === null && !archived && total <= wholeUpTo);

  const songs = useMemo(() => {
    const seen = new Set<string>();
    // A song that was renamed between two pages may come twice.
    const all = data?.pages.flatMap((page) => page.items.filter(({ id }) => !seen.has(id) && seen.add(id)));
    if (all === undefined || !whole) return all;
    if (sort === "key") return inKeyOrder(all, (song) => shownKey(song, mineOf(song)));
    return voice && judged >= 0 ? inFitOrder(all, (song) => fitOf(song, voice)) : all;
  }, [data, whole, sort, voice, mineOf, judged]);

  return {
    songs,
    total,
    more: () => {
      if (hasNextPage && !isFetchingNextPage && !isFetchNextPageError) void fetchNextPage();
    },
    coming: isFetchingNextPage,
    stale: isPlaceholderData,
    judging: sort === "fit" && voice !== null && judged === 0 && songs !== undefined && songs.some(({ span }) => span),
    judged,
    error: query.error,
    retry: () => void (isFetchNextPageError ? fetchNextPage() : query.refetch()),
  };
}

/** Reads the notes of all songs beside the work of the page; counts up when scores by notes are there. */
function useJudged(voice: SingingVoice | null): number {
  const client = useQueryClient();
  const [judged, setJudged] = useState<{ voice: SingingVoice | null; times: number }>({ voice: null, times: 0 });
  useEffect(() => {
    if (!voice) return;
    const stop = new AbortController();
    void client
      .fetchQuery(songQueries.all())
      .then((songs) => judgeByNotes(songs, voice, stop.signal))
      .then(
        (done) => {
          if (done) setJudged((before) => ({ voice, times: before.times + 1 }));
        },
        // Without the notes the spans have to do.
        () => undefined,
      );
    return () => stop.abort();
  }, [client, voice]);
  return judged.voice === voice ? judged.times : 0;
}

function useWholeShelf(wanted: boolean): void {
  const client = useQueryClient();
  useEffect(() => {
    if (!wanted) return;
    const timer = setTimeout(() => void client.prefetchQuery(songQueries.all()), 1500);
    return () => clearTimeout(timer);
  }, [client, wanted]);
}
