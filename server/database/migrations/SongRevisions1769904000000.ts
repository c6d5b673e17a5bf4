import type { MigrationInterface, QueryRunner } from "typeorm";

/** Songs kept before have no tags, stand on the shelf, and are in their first revision. */
export class SongRevisions1769904000000 implements MigrationInterface {
  async up(runner: QueryRunner): Promise<void> {
    await runner.query(`
      ALTER TABLE songs
        ADD COLUMN tags text[] NOT NULL DEFAULT '{}',
        ADD COLUMN archived_at timestamptz,
        ADD COLUMN played_at timestamptz,
        ADD COLUMN revision integer NOT NULL DEFAULT 1
    `);
  }

  async down(runner: QueryRunner): Promise<void> {
    await runner.query(
      "ALTER TABLE songs DROP COLUMN tags, DROP COLUMN archived_at, DROP COLUMN played_at, DROP COLUMN revision",
    );
  }
}
