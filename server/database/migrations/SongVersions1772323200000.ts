import type { MigrationInterface, QueryRunner } from "typeorm";
import { type KeptColumns, listingColumns } from "../../songs/listingColumns";

const tables = `
ALTER TABLE songs
  ADD COLUMN changed_at timestamptz NOT NULL DEFAULT now(),
  ADD COLUMN title_key text COLLATE "C" NOT NULL DEFAULT '',
  ADD COLUMN tag_keys text[] NOT NULL DEFAULT '{}',
  ADD COLUMN search_text text NOT NULL DEFAULT '',
  ADD COLUMN first_words text NOT NULL DEFAULT '',
  ADD COLUMN span jsonb;
UPDATE songs SET changed_at = saved_at;
-- A search reads this text of every song of a shelf: it stays in the row, where reading it is quickest.
ALTER TABLE songs ALTER COLUMN search_text SET STORAGE MAIN;

CREATE TABLE song_versions (
  id uuid PRIMARY KEY DEFAULT gen_random_uuid(),
  user_id uuid NOT NULL,
  song_id uuid NOT NULL,
  saved_at timestamptz NOT NULL,
  kept_at timestamptz NOT NULL DEFAULT clock_timestamp(),
  title text NOT NULL,
  song jsonb NOT NULL,
  CONSTRAINT song_versions_song FOREIGN KEY (user_id, song_id) REFERENCES songs (user_id, id) ON DELETE CASCADE
);
CREATE INDEX song_versions_newest ON song_versions (user_id, song_id, kept_at DESC, id);
`;

/** Earlier states of songs, and columns for lists: what a song is found, sorted and shown by without its chart. */
export class SongVersions1772323200000 implements MigrationInterface {
  async up(runner: QueryRunner): Promise<void> {
    await runner.query(tables);
    const ids: { id: string }[] = await runner.query("SELECT id FROM songs");
    for (const { id } of ids) {
      const [song]: KeptColumns[] = await runner.query("SELECT title, chart, tune, tags FROM songs WHERE id = $1", [
        id,
      ]);
      if (!song) continue;
      const { titleKey, tagKeys, searchText, firstWords, span } = listingColumns(song);
      await runner.query(
        `UPDATE songs SET title_key = $2, tag_keys = $3, search_text = $4, first_words = $5, span = $6 WHERE id = $1`,
        [id, titleKey, tagKeys, searchText, firstWords, span],
      );
    }
  }

  async down(runner: QueryRunner): Promise<void> {
    await runner.query(`
      DROP TABLE song_versions;
      ALTER TABLE songs
        DROP COLUMN changed_at, DROP COLUMN title_key, DROP COLUMN tag_keys,
        DROP COLUMN search_text, DROP COLUMN first_words, DROP COLUMN span
    `);
  }
}
