import type { MigrationInterface, QueryRunner } from "typeorm";

/**
 * Recordings that never arrived leave no row. A record of deletion that was done is opened again when sound by the same
 * key is to go once more. The moment of arrival is kept, so that a part can go back to the take before.
 */
export class TakesGone1796400000000 implements MigrationInterface {
  async up(runner: QueryRunner): Promise<void> {
    await runner.query("ALTER TABLE hand_ins ADD COLUMN ready_at timestamptz");
    await runner.query(`
      CREATE OR REPLACE FUNCTION hand_in_gone() RETURNS trigger LANGUAGE plpgsql AS $$
      BEGIN
        INSERT INTO deletion_records (storage_key, why) VALUES (OLD.storage_key, 'removed')
        ON CONFLICT (storage_key) DO UPDATE SET deleted_at = NULL, why = excluded.why, asked_at = now()
          WHERE OLD.state <> 'deleted' AND deletion_records.deleted_at IS NOT NULL;
        RETURN NULL;
      END $$`);
    await runner.query("DELETE FROM hand_ins WHERE state = 'deleted' AND media_type IS NULL");
  }

  async down(runner: QueryRunner): Promise<void> {
    await runner.query(`
      CREATE OR REPLACE FUNCTION hand_in_gone() RETURNS trigger LANGUAGE plpgsql AS $$
      BEGIN
        INSERT INTO deletion_records (storage_key, why) VALUES (OLD.storage_key, 'removed') ON CONFLICT DO NOTHING;
        RETURN NULL;
      END $$`);
    await runner.query("ALTER TABLE hand_ins DROP COLUMN ready_at");
  }
}
