import type { MigrationInterface, QueryRunner } from "typeorm";

/** The take that a recording was made from, as its sender's device knows it: nobody hands the same one in twice for a part. */
export class TakeOfHandIn1796500000000 implements MigrationInterface {
  async up(runner: QueryRunner): Promise<void> {
    await runner.query("ALTER TABLE hand_ins ADD COLUMN take_id uuid");
    await runner.query("CREATE UNIQUE INDEX hand_ins_take ON hand_ins (part_id, author_id, take_id)");
  }

  async down(runner: QueryRunner): Promise<void> {
    await runner.query("ALTER TABLE hand_ins DROP COLUMN take_id");
  }
}
