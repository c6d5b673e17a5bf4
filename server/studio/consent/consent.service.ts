import type { DataSource, EntityManager } from "typeorm";
import { HttpProblem } from "../../http/httpProblem";
import { wakeDeletion } from "../handIns/takeDeletion";
import { memberWaitsForGuardian } from "./digitalConsent";
import type { GuardiansService } from "./guardians.service";

/** Agreeing that the teachers of a studio see and hear, and taking it back. */
export class ConsentService {
  constructor(
    private readonly dataSource: DataSource,
    private readonly guardians: GuardiansService,
  ) {}

  async set(memberId: string, userId: string, agree: boolean): Promise<void> {
    await this.dataSource.transaction((manager) =>
      agree ? this.give(manager, memberId, userId) : this.withdraw(manager, memberId),
    );
  }

  /** A guardian who is known already is asked at once, by one mail for each studio however often a pupil changes their mind. */
  async give(manager: EntityManager, memberId: string, userId: string): Promise<void> {
    const [before]: { told: boolean; firstTime: boolean }[] = await manager.query(
      `SELECT u.birth_year IS NOT NULL AS told, m.consent_given_at IS NULL AS "firstTime"
       FROM studio_members m JOIN users u ON u.id = m.user_id WHERE m.id = $1 FOR UPDATE OF m`,
      [memberId],
    );
    if (!before?.told)
      throw new HttpProblem(
        409,
        "birth-year-needed",
        "Say first in which year you were born: it decides who must agree.",
      );
    await manager.query(
      `UPDATE studio_members m SET consent_withdrawn_at = NULL, consent_given_at = now(),
         recordings_kept_days = s.recordings_kept_days
       FROM studios s
       WHERE m.id = $1 AND s.id = m.studio_id AND (m.consent_given_at IS NULL OR m.consent_withdrawn_at IS NOT NULL)`,
      [memberId],
    );
    const [waiting]: object[] = await manager.query(
      `SELECT FROM studio_members m JOIN users u ON u.id = m.user_id WHERE m.id = $1 AND ${memberWaitsForGuardian}`,
      [memberId],
    );
    if (waiting && before.firstTime) await this.guardians.askAgain(manager, userId);
  }

  private async withdraw(manager: EntityManager, memberId: string): Promise<void> {
    await manager.query(
      `UPDATE studio_members SET consent_withdrawn_at = now(), recordings_kept_days = NULL
       WHERE id = $1 AND consent_given_at IS NOT NULL AND consent_withdrawn_at IS NULL`,
      [memberId],
    );
    await wakeDeletion(manager);
  }
}
