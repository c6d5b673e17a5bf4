import type { MigrationInterface, QueryRunner } from "typeorm";

/** Takes that were kept before guided holds existed are phrases and speak for both ends. */
export class KindOfTake1767225600000 implements MigrationInterface {
  async up(runner: QueryRunner): Promise<void> {
    await runner.query(`
      ALTER TABLE takes
        ADD COLUMN kind text NOT NULL DEFAULT 'phrase' CHECK (kind IN ('phrase', 'hold')),
        ADD COLUMN shows text NOT NULL DEFAULT 'both' CHECK (shows IN ('both', 'low', 'high'))
    `);
  }

  async down(runner: QueryRunner): Promise<void> {
    await runner.query("ALTER TABLE takes DROP COLUMN kind, DROP COLUMN shows");
  }
}
