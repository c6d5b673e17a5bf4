import type { MigrationInterface, QueryRunner } from "typeorm";

/** Decisions stand for a song and a voice and know what was decided before; songs that were tried in a key. */
export class KeysPerVoice1775001600000 implements MigrationInterface {
  async up(runner: QueryRunner): Promise<void> {
    await runner.query(`
      ALTER TABLE decisions
        ADD COLUMN earlier jsonb NOT NULL DEFAULT '[]',
        DROP CONSTRAINT decisions_user_id_song_id_key,
        ADD CONSTRAINT decisions_song_and_voice UNIQUE NULLS NOT DISTINCT (user_id, song_id, voice_id);

      CREATE TABLE song_tries (
        id uuid PRIMARY KEY,
        user_id uuid NOT NULL CONSTRAINT song_tries_owner REFERENCES users ON DELETE CASCADE,
        saved_at timestamptz NOT NULL DEFAULT now(),
        song_id uuid NOT NULL,
        voice_id uuid,
        tonic text NOT NULL,
        shift smallint NOT NULL,
        tempo double precision,
        backing boolean NOT NULL,
        sung_at timestamptz NOT NULL,
        effort smallint,
        measures jsonb,
        UNIQUE (user_id, id),
        CONSTRAINT song_tries_song FOREIGN KEY (user_id, song_id) REFERENCES songs (user_id, id) ON DELETE CASCADE,
        CONSTRAINT song_tries_voice FOREIGN KEY (user_id, voice_id) REFERENCES voices (user_id, id) ON DELETE CASCADE
      );
      CREATE INDEX song_tries_song ON song_tries (user_id, song_id);
      CREATE INDEX song_tries_voice ON song_tries (user_id, voice_id);
    `);
  }

  async down(runner: QueryRunner): Promise<void> {
    await runner.query(`
      DROP TABLE song_tries;
      DELETE FROM decisions AS older USING decisions AS newer
        WHERE older.user_id = newer.user_id AND older.song_id = newer.song_id
          AND (older.decided_at, older.id) < (newer.decided_at, newer.id);
      ALTER TABLE decisions
        DROP CONSTRAINT decisions_song_and_voice,
        DROP COLUMN earlier,
        ADD CONSTRAINT decisions_user_id_song_id_key UNIQUE (user_id, song_id);
    `);
  }
}
