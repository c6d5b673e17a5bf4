import type { MigrationInterface, QueryRunner } from "typeorm";

/**
 * How long recordings are kept is fixed with each pupil's consent; a guardian's no stands with the membership it was
 * said about, so that no other guardian can be named for it.
 */
const columns = `
ALTER TABLE studio_members
  ADD COLUMN recordings_kept_days smallint CHECK (recordings_kept_days BETWEEN 1 AND 365),
  ADD COLUMN guardian_refused_at timestamptz;
UPDATE studio_members m SET recordings_kept_days = s.recordings_kept_days
FROM studios s WHERE s.id = m.studio_id AND m.consent_given_at IS NOT NULL AND m.consent_withdrawn_at IS NULL;
UPDATE studio_members m SET guardian_refused_at = g.withdrawn_at
FROM guardians g WHERE g.user_id = m.user_id AND g.withdrawn_at IS NOT NULL AND m.guardian_agreed_at IS NULL
  AND m.consent_given_at <= g.withdrawn_at;
`;

export class ConsentKept1796310000000 implements MigrationInterface {
  async up(runner: QueryRunner): Promise<void> {
    await runner.query(columns);
  }

  async down(runner: QueryRunner): Promise<void> {
    await runner.query("ALTER TABLE studio_members DROP COLUMN recordings_kept_days, DROP COLUMN guardian_refused_at");
  }
}
