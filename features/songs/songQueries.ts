import {
  infiniteQueryOptions,
  keepPreviousData,
  queryOptions,
  useMutation,
  useQueryClient,
  type InfiniteData,
  type QueryClient,
} from "@tanstack/react-query";
import { useRef } from "react";
import { ApiError } from "@/features/api/apiError";
import { queryClient } from "@/features/api/queryClient";
import { shelf } from "@/features/api/shelf";
import { songPages } from "@/features/api/songPages";
import type { SongQuestion } from "@/features/api/songQuestion";
import type { Song } from "@/shared/contract/song";
import type { SongPage } from "@/shared/contract/songListing";
import { seedDemoSongs } from "./shelf/demoShelf";

export const songQueries = {
  all: () =>
    queryOptions({
      queryKey: ["songs"],
      queryFn: async () => {
        await seedDemoSongs();
        return byTitle(await shelf.list("songs"));
      },
    }),
  detail: (id: string) =>
    queryOptions<Song>({
      queryKey: ["songs", id],
      queryFn: async ({ client }) => {
        try {
          return await shelf.get("songs", id);
        } catch (error) {
          // Without a connection the shelf as it was last seen still holds the whole song.
          const known = error instanceof ApiError && error.code === "offline" ? onShelf(client, id) : undefined;
          if (known) return known;
          throw error;
        }
      },
      placeholderData: () => onShelf(queryClient, id),
    }),
  /** The shelf page by page, without charts and notes; what was shown before stays while another view is fetched. */
  pages: (question: Omit<SongQuestion, "cursor">) =>
    infiniteQueryOptions({
      queryKey: ["song-pages", question],
      queryFn: async ({ pageParam }): Promise<SongPage> => {
        await seedDemoSongs();
        return songPages.get({ ...question, cursor: pageParam });
      },
      initialPageParam: null as string | null,
      getNextPageParam: (page) => page.next,
      placeholderData: keepPreviousData,
    }),
  tags: () => queryOptions({ queryKey: ["song-tags"], queryFn: () => songPages.tags() }),
};

function onShelf(client: QueryClient, id: string): Song | undefined {
  return client.getQueryData<Song[]>(["songs"])?.find((song) => song.id === id);
}

/** Every list of songs is asked for anew; what is on screen stays until the answer is here. */
export async function refreshShelf(client: QueryClient): Promise<void> {
  await Promise.all([
    client.invalidateQueries({ queryKey: ["songs"], exact: true }),
    client.invalidateQueries({ queryKey: ["song-pages"] }),
    client.invalidateQueries({ queryKey: ["song-tags"] }),
  ]);
}

/** Whether something was not kept because the song was changed elsewhere meanwhile. */
export function isClash(error: unknown): boolean {
  return error instanceof ApiError && error.code === "changed-elsewhere";
}

/**
 * Keeps a song. A key that was decided stays with it. Where it was changed elsewhere meanwhile, what stands there now is
 * fetched: the next try is a change of that, and that stays in the earlier versions.
 */
export function useSaveSong() {
  const client = useQueryClient();
  const clashed = useRef(false);
  return useMutation({
    mutationFn: (song: Song) => shelf.put("songs", song, { version: clashed.current }),
    onSuccess: async (song) => {
      clashed.current = false;
      client.setQueryData(songQueries.detail(song.id).queryKey, song);
      await refreshShelf(client);
    },
    onError: async (error, { id }) => {
      if (!isClash(error)) return;
      clashed.current = true;
      await client.invalidateQueries({ queryKey: songQueries.detail(id).queryKey });
    },
  });
}

/** A change of something that stands beside the chart: tags, when it was played, whether it is put aside. */
export type SongChange = Partial<Pick<Song, "tags" | "playedAt" | "archivedAt">>;

/** Changes a song as it is kept now; where somebody changed it at the same moment, theirs stays and this comes on top. */
export function useChangeSong() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: async ({ id, change }: { id: string; change: SongChange }) => {
      const put = async () => shelf.put("songs", { ...(await shelf.get("songs", id)), ...change });
      try {
        return await put();
      } catch (error) {
        if (isClash(error)) return put();
        throw error;
      }
    },
    onSuccess: async (song) => {
      client.setQueryData(songQueries.detail(song.id).queryKey, song);
      showChanged(client, song);
      await refreshShelf(client);
    },
  });
}

/** Takes a song and the key decided for it off the shelf. */
export function useRemoveSong() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (id: string) => shelf.remove("songs", id),
    onSuccess: async (_, id) => {
      client.setQueryData<Song[]>(songQueries.all().queryKey, (songs) => songs?.filter((song) => song.id !== id));
      eachPage(client, (items) => items.filter((item) => item.id !== id));
      await refreshShelf(client);
      await client.invalidateQueries({ queryKey: ["decisions"] });
    },
  });
}

/** The lists on screen say at once what was changed. */
function showChanged(client: QueryClient, { id, tags, playedAt, archivedAt, revision }: Song): void {
  eachPage(client, (items) =>
    items.flatMap((item) => {
      if (item.id !== id) return [item];
      const moved = (item.archivedAt === null) !== (archivedAt === null);
      return moved ? [] : [{ ...item, tags, playedAt, archivedAt, revision }];
    }),
  );
}

function eachPage(client: QueryClient, change: (items: SongPage["items"]) => SongPage["items"]): void {
  client.setQueriesData<InfiniteData<SongPage, string | null>>(
    { queryKey: ["song-pages"] },
    (data) =>
      data && {
        ...data,
        pages: data.pages.map((page) => ({ ...page, items: change(page.items) })),
      },
  );
}

function byTitle(songs: Song[]): Song[] {
  return [...songs].sort((a, b) => a.title.localeCompare(b.title, "en") || a.createdAt.localeCompare(b.createdAt));
}
