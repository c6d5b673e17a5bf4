import type { EntityManager } from "typeorm";
import type { Song } from "../../shared/contract/song";
import { demoSongs } from "../../shared/songs/demoSongs";
import { earlierCharts } from "../../shared/songs/demo/earlierCharts";

/** Gives a person's copies of the demonstration songs the states that they had before. */
export async function bringDemoVersions(manager: EntityManager, userId: string, songs: readonly Song[]): Promise<void> {
  for (const song of songs) {
    const demo = demoSongs.find(({ id }) => id === song.demo);
    for (const { chart, savedAt } of demo ? earlierCharts(demo, Date.parse(song.createdAt)) : [])
      await manager.query(
        `INSERT INTO song_versions (user_id, song_id, saved_at, kept_at, title, song) VALUES ($1, $2, $3, $3, $4, $5)`,
        [userId, song.id, savedAt, song.title, { ...song, chart }],
      );
  }
}
