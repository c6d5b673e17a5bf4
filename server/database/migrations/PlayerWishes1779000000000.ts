import type { MigrationInterface, QueryRunner } from "typeorm";

/** What players would rather do without, and the shapes they know. */
export class PlayerWishes1779000000000 implements MigrationInterface {
  async up(runner: QueryRunner): Promise<void> {
    await runner.query(`
      CREATE TABLE player_wishes (
        id uuid PRIMARY KEY,
        user_id uuid NOT NULL CONSTRAINT player_wishes_owner REFERENCES users ON DELETE CASCADE,
        saved_at timestamptz NOT NULL DEFAULT now(),
        no_barre boolean NOT NULL,
        no_capo boolean NOT NULL,
        never_retune boolean NOT NULL,
        keep_ringing boolean NOT NULL,
        highest_capo smallint NOT NULL,
        known jsonb NOT NULL,
        changed_at timestamptz NOT NULL,
        UNIQUE (user_id, id)
      )
    `);
  }

  async down(runner: QueryRunner): Promise<void> {
    await runner.query("DROP TABLE player_wishes");
  }
}
