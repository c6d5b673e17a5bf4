import type { MigrationInterface, QueryRunner } from "typeorm";

/** An instrument may have a small photo, kept as it travels: a data address. */
export class InstrumentPhotos1778000000000 implements MigrationInterface {
  async up(runner: QueryRunner): Promise<void> {
    await runner.query("ALTER TABLE instruments ADD COLUMN photo text");
  }

  async down(runner: QueryRunner): Promise<void> {
    await runner.query("ALTER TABLE instruments DROP COLUMN photo");
  }
}
