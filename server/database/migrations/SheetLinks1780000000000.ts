import type { MigrationInterface, QueryRunner } from "typeorm";

/** Links that open a sheet without an account. */
export class SheetLinks1780000000000 implements MigrationInterface {
  async up(runner: QueryRunner): Promise<void> {
    await runner.query(`
      CREATE TABLE sheet_links (
        id uuid PRIMARY KEY,
        user_id uuid NOT NULL CONSTRAINT sheet_links_owner REFERENCES users ON DELETE CASCADE,
        saved_at timestamptz NOT NULL DEFAULT now(),
        song_id uuid NOT NULL,
        label text NOT NULL,
        token_hash bytea NOT NULL UNIQUE,
        view jsonb NOT NULL,
        created_at timestamptz NOT NULL,
        expires_at timestamptz NOT NULL,
        revoked_at timestamptz,
        opened_at timestamptz,
        CONSTRAINT sheet_links_song FOREIGN KEY (user_id, song_id) REFERENCES songs (user_id, id) ON DELETE CASCADE
      );
      CREATE INDEX sheet_links_newest ON sheet_links (user_id, created_at DESC);
      CREATE INDEX sheet_links_song ON sheet_links (user_id, song_id);
    `);
  }

  async down(runner: QueryRunner): Promise<void> {
    await runner.query("DROP TABLE sheet_links");
  }
}
