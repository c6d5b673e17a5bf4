import { queryOptions, useMutation, useQueryClient, type QueryClient } from "@tanstack/react-query";
import { ApiError } from "@/features/api/apiError";
import { queryClient } from "@/features/api/queryClient";
import { shelf } from "@/features/api/shelf";
import type { Song } from "@/shared/contract/song";
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
};

function onShelf(client: QueryClient, id: string): Song | undefined {
  return client.getQueryData<Song[]>(["songs"])?.find((song) => song.id === id);
}

/** Keeps a song. A key that was decided stays with it. */
export function useSaveSong() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (song: Song) => shelf.put("songs", song),
    onSuccess: async (song) => {
      client.setQueryData(songQueries.detail(song.id).queryKey, song);
      await client.invalidateQueries({ queryKey: ["songs"], exact: true });
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
      await client.invalidateQueries({ queryKey: ["songs"], exact: true });
      await client.invalidateQueries({ queryKey: ["decisions"] });
    },
  });
}

function byTitle(songs: Song[]): Song[] {
  return [...songs].sort((a, b) => a.title.localeCompare(b.title, "en") || a.createdAt.localeCompare(b.createdAt));
}
