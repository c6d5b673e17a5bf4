import type { Song } from "@/shared/contract/song";
import { ApiError } from "./apiError";
import { sameData } from "./sameData";

/** What songs had not when this device kept them first. */
const added = { tags: [], archivedAt: null, playedAt: null, revision: 1 };

/** A song as this device keeps it, with the fields that came later. */
export function completeSong(kept: unknown): Song {
  return { ...added, ...(kept as Song) };
}

const instant = (text: string | null) => text && new Date(text).toISOString();

/** Everything but the count of changes, instants in one form. */
const stateOf = (song: Song): Song => ({
  ...song,
  createdAt: instant(song.createdAt) ?? "",
  archivedAt: instant(song.archivedAt),
  playedAt: instant(song.playedAt),
  revision: 0,
});

/** Whether two states of a song are the same but for the count of changes. */
export function sameSong(a: Song, b: Song): boolean {
  return sameData(stateOf(a), stateOf(b));
}

/** Whether what a person wrote is the same: that a song was played or put aside makes no version. */
export function sameContent(a: Song, b: Song): boolean {
  return sameSong({ ...a, playedAt: null, archivedAt: null }, { ...b, playedAt: null, archivedAt: null });
}

export const changedElsewhere = () =>
  new ApiError(409, "changed-elsewhere", "This song was changed in another place meanwhile. Nothing was overwritten.");
