import type { DataSource, EntityManager } from "typeorm";
import type { Song } from "../../shared/contract/song";
import type { SongVersion, SongVersionEntry } from "../../shared/contract/songVersion";
import { notFound } from "../http/httpProblem";

const mostVersions = 100;

/** While one person goes on working, the state before is kept once in this time. */
const pauseS = 300;

interface EntryRow {
  id: string;
  saved_at: Date;
  by: string;
  title: string;
}

/**
 * Keeps a song as it was, before its content changes. While the newest version is young the state before is not kept
 * again, unless `always`.
 */
export async function keepVersion(manager: EntityManager, userId: string, song: Song, always: boolean): Promise<void> {
  await manager.query(
    `INSERT INTO song_versions (user_id, song_id, saved_at, title, song)
     SELECT user_id, id, changed_at, title, $3 FROM songs
     WHERE user_id = $1 AND id = $2 AND ($4 OR NOT EXISTS (
       SELECT FROM song_versions
       WHERE user_id = $1 AND song_id = $2 AND kept_at > clock_timestamp() - make_interval(secs => $5)))`,
    [userId, song.id, song, always, pauseS],
  );
  await manager.query(
    `DELETE FROM song_versions WHERE id IN (
       SELECT id FROM song_versions WHERE user_id = $1 AND song_id = $2 ORDER BY kept_at DESC, id OFFSET $3)`,
    [userId, song.id, mostVersions],
  );
  await manager.query("UPDATE songs SET changed_at = clock_timestamp() WHERE user_id = $1 AND id = $2", [
    userId,
    song.id,
  ]);
}

/** Earlier states of songs. Those of another person's song are as if they did not exist. */
export class SongVersionsService {
  constructor(private readonly dataSource: DataSource) {}

  /** Newest first. */
  async list(userId: string, songId: string): Promise<SongVersionEntry[]> {
    const songs: object[] = await this.dataSource.query("SELECT 1 FROM songs WHERE user_id = $1 AND id = $2", [
      userId,
      songId,
    ]);
    if (songs.length === 0) throw notFound("song");
    const rows: EntryRow[] = await this.dataSource.query(
      `SELECT version.id, version.saved_at, person.email AS by, version.title
       FROM song_versions version JOIN users person ON person.id = version.user_id
       WHERE version.user_id = $1 AND version.song_id = $2 ORDER BY version.kept_at DESC, version.id`,
      [userId, songId],
    );
    return rows.map(({ id, saved_at, by, title }) => ({ id, savedAt: saved_at.toISOString(), by, title }));
  }

  async get(userId: string, songId: string, versionId: string): Promise<SongVersion> {
    const rows: (EntryRow & { song: Song })[] = await this.dataSource.query(
      `SELECT version.id, version.saved_at, person.email AS by, version.song
       FROM song_versions version JOIN users person ON person.id = version.user_id
       WHERE version.user_id = $1 AND version.song_id = $2 AND version.id = $3`,
      [userId, songId, versionId],
    );
    const [row] = rows;
    if (!row) throw notFound("version");
    return { id: row.id, savedAt: row.saved_at.toISOString(), by: row.by, song: row.song };
  }
}
