import type { MigrationInterface, QueryRunner } from "typeorm";

/** Arrangements: a shape for each chord of a song in one key, and what the right hand does. They go with their song. */
export class Arrangements1784000000000 implements MigrationInterface {
  async up(runner: QueryRunner): Promise<void> {
    await runner.query(`
      CREATE TABLE arrangements (
        id uuid PRIMARY KEY,
        user_id uuid NOT NULL CONSTRAINT arrangements_owner REFERENCES users ON DELETE CASCADE,
        saved_at timestamptz NOT NULL DEFAULT now(),
        song_id uuid NOT NULL,
        name text NOT NULL,
        tonic text NOT NULL,
        shift smallint NOT NULL,
        instrument text NOT NULL,
        way jsonb NOT NULL,
        chords jsonb NOT NULL,
        pattern jsonb NOT NULL,
        created_at timestamptz NOT NULL,
        UNIQUE (user_id, id),
        CONSTRAINT arrangements_song FOREIGN KEY (user_id, song_id) REFERENCES songs (user_id, id) ON DELETE CASCADE
      );
      CREATE INDEX arrangements_song ON arrangements (user_id, song_id);
    `);
  }

  async down(runner: QueryRunner): Promise<void> {
    await runner.query("DROP TABLE arrangements");
  }
}
