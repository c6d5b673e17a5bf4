import type { Song } from "@/shared/contract/song";
import type { SongVersion, SongVersionEntry } from "@/shared/contract/songVersion";
import { ApiError } from "./apiError";
import { deviceShelf } from "./deviceShelf";
import { http } from "./httpClient";
import { session } from "./session";
import { shelf } from "./shelf";

const isSignedIn = async () => (await session.settled()).status === "signed-in";
const addressOf = (songId: string) => `/songs/${encodeURIComponent(songId)}/versions`;

/** Earlier states of songs, from the account of the signed-in or from this device. */
export const songVersions = {
  /** Newest first. Rejects with 404 "not-found" where there is no such song. */
  async list(songId: string): Promise<SongVersionEntry[]> {
    if (await isSignedIn()) return http.get(addressOf(songId));
    const versions = await deviceShelf.versions(songId);
    return versions.map(({ id, savedAt, by, song }) => ({ id, savedAt, by, title: song.title }));
  },
  async get(songId: string, versionId: string): Promise<SongVersion> {
    if (await isSignedIn()) return http.get(`${addressOf(songId)}/${encodeURIComponent(versionId)}`);
    const version = (await deviceShelf.versions(songId)).find(({ id }) => id === versionId);
    if (!version) throw ApiError.notFound();
    return version;
  },
  /** Makes an earlier state the present one again; the present state is kept as a version. Rejects with 409 "changed-elsewhere". */
  restore(present: Song, { song }: Pick<SongVersion, "song">): Promise<Song> {
    const { playedAt, archivedAt, revision } = present;
    return shelf.put("songs", { ...song, playedAt, archivedAt, revision }, { version: true });
  },
};
