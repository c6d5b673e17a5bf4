import { queryOptions, useMutation, useQueryClient } from "@tanstack/react-query";
import { shelf } from "@/features/api/shelf";
import type { Song } from "@/shared/contract/song";
import { seedDemoSongs } from "./demoShelf";

export const songQueries = {
  all: () =>
    queryOptions({
      queryKey: ["songs"],
      queryFn: async () => {
        await seedDemoSongs();
        return byTitle(await shelf.list("songs"));
      },
    }),
  detail: (id: string) => queryOptions({ queryKey: ["songs", id], queryFn: () => shelf.get("songs", id) }),
};

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
