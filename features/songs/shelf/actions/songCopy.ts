import type { Song } from "@/shared/contract/song";

const longest = 200;

/** A song of its own beside the one it was copied from; the copy was never played and is nobody's demonstration. */
export function copyOf(song: Song, id: string, now: Date): Song {
  const title = `Copy of ${song.title}`;
  return {
    ...song,
    id,
    title: [...title].length > longest ? `${[...title].slice(0, longest - 1).join("")}…` : title,
    demo: null,
    archivedAt: null,
    playedAt: null,
    createdAt: now.toISOString(),
    revision: 0,
  };
}
