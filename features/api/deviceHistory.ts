import type { Song } from "@/shared/contract/song";
import type { SongVersion } from "@/shared/contract/songVersion";
import type { DeviceItems } from "./deviceStorage";
import { newId } from "./newId";

const mostVersions = 30;

/** While one goes on working, the state before is kept once in this time. */
const pauseMs = 5 * 60_000;

/** Earlier states of one song, newest first, and when its present content was kept. */
interface History {
  changedAt: string;
  versions: (SongVersion & { keptAt: string })[];
}

const keyOf = (songId: string) => `history/${songId}`;

/** Keeps a song as it was, before its content changes; not again while the newest version is young, unless `always`. */
async function keep(items: DeviceItems, song: Song, always: boolean): Promise<void> {
  const now = new Date();
  const known = (await items.get(keyOf(song.id))) as History | undefined;
  const versions = known?.versions ?? [];
  const newest = versions[0];
  const due = always || newest === undefined || now.getTime() - Date.parse(newest.keptAt) >= pauseMs;
  const version = {
    id: newId(),
    savedAt: known?.changedAt ?? song.createdAt,
    keptAt: now.toISOString(),
    by: "",
    song,
  };
  const history: History = {
    changedAt: now.toISOString(),
    versions: due ? [version, ...versions].slice(0, mostVersions) : versions,
  };
  items.set(keyOf(song.id), history);
}

/** Gives a song that comes to this device the states it had before, the oldest first. */
function bring(items: DeviceItems, songId: string, states: readonly Omit<SongVersion, "id">[]): void {
  if (states.length === 0) return;
  const versions = states.map((state) => ({ ...state, id: newId(), keptAt: state.savedAt })).reverse();
  const history: History = { changedAt: new Date().toISOString(), versions };
  items.set(keyOf(songId), history);
}

/** Earlier states of a visitor's songs, on this device. */
export const deviceHistory = {
  keep,
  bring,
  async read(items: Pick<DeviceItems, "get">, songId: string): Promise<SongVersion[]> {
    const known = (await items.get(keyOf(songId))) as History | undefined;
    return (known?.versions ?? []).map(({ keptAt: _keptAt, ...version }) => version);
  },
  forget: (items: DeviceItems, songId: string) => items.delete(keyOf(songId)),
};
