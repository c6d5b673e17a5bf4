import type { MigrationInterface, QueryRunner } from "typeorm";

/** Who plays a song, and on what. */
export class LineUps1785000000000 implements MigrationInterface {
  async up(runner: QueryRunner): Promise<void> {
    await runner.query(`
      CREATE TABLE line_ups (
        id uuid PRIMARY KEY,
        user_id uuid NOT NULL CONSTRAINT line_ups_owner REFERENCES users ON DELETE CASCADE,
        saved_at timestamptz NOT NULL DEFAULT now(),
        song_id uuid NOT NULL,
        players jsonb NOT NULL,
        changed_at timestamptz NOT NULL,
        UNIQUE (user_id, id),
        CONSTRAINT line_ups_one_for_each_song UNIQUE (user_id, song_id),
        CONSTRAINT line_ups_song FOREIGN KEY (user_id, song_id) REFERENCES songs (user_id, id) ON DELETE CASCADE
      );
    `);
  }

  async down(runner: QueryRunner): Promise<void> {
    await runner.query("DROP TABLE line_ups;");
  }
}
