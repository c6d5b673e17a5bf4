import { isDeepStrictEqual } from "node:util";
import type { DataSource } from "typeorm";
import type { Song } from "../../shared/contract/song";
import { HttpProblem } from "../http/httpProblem";
import { OwnedCollection, type Saving } from "../http/ownedCollection.service";
import { listingColumns } from "./listingColumns";
import { SongEntity } from "./song.entity";
import { keepVersion } from "./songVersions.service";

/** What may be asked for when a song is saved. */
export interface SongWishes {
  /** "1": the state before is kept as a version however young the newest one is */
  version?: "0" | "1";
}

export function songsOf(dataSource: DataSource) {
  return new OwnedCollection<Song, SongEntity, SongWishes>(dataSource, SongEntity, {
    noun: "song",
    mostItems: 5000,
    beforeSave: countUp,
  });
}

/** Counts the revision up, keeps the state before, and refuses a change of anything but the kept revision. */
async function countUp({ manager, userId, item, kept, wishes }: Saving<Song, SongWishes>): Promise<Song | null> {
  if (kept === null) return { ...item, ...listingColumns(item), revision: 1 };
  if (same(kept, item)) return null;
  if (item.revision !== kept.revision) {
    throw new HttpProblem(
      409,
      "changed-elsewhere",
      "This song was changed in another place meanwhile. Nothing was overwritten.",
    );
  }
  if (!same(contentOf(kept), contentOf(item))) await keepVersion(manager, userId, kept, wishes.version === "1");
  return { ...item, ...listingColumns(item), revision: kept.revision + 1 };
}

/** What a person wrote. That a song was played or put aside makes no version. */
const contentOf = (song: Song): Song => ({ ...song, playedAt: null, archivedAt: null });

function same(a: Song, b: Song): boolean {
  return isDeepStrictEqual(asKept(a), asKept(b));
}

/** As it comes back from the database: instants in one form, and JSON's one zero. */
function asKept(song: Song): unknown {
  const instant = (text: string | null) => text && new Date(text).toISOString();
  return JSON.parse(
    JSON.stringify({
      ...song,
      createdAt: instant(song.createdAt),
      archivedAt: instant(song.archivedAt),
      playedAt: instant(song.playedAt),
      revision: null,
    }),
  );
}
