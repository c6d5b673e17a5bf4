import type { DataSource, EntityManager } from "typeorm";
import type { PersonFacts } from "../../../shared/contract/account";
import type { GuardianLook, GuardianState } from "../../../shared/contract/studio/consent";
import { whatTeachersSee } from "../../../shared/contract/studio/whatTeachersSee";
import { listWords } from "../../../shared/music/listWords";
import { HttpProblem } from "../../http/httpProblem";
import type { LinkTokensService } from "../../mail/linkTokens.service";
import { enqueueMail } from "../../mail/mail.service";
import { wakeDeletion } from "../handIns/takeDeletion";
import {
  ageOfDigitalConsent,
  memberShares,
  memberWaitsForGuardian,
  personNeedsGuardian,
  toldNeedsGuardian,
} from "./digitalConsent";
import { keptDaysColumn } from "./memberConsent";

/** To decide, and to change one's mind later. The account's own links end when its address changes; these must not. */
const askPurpose = "guardian-ask";
const keepPurpose = "guardian-keep";
const purposes = [askPurpose, keepPurpose];
const dayS = 24 * 3600;
const askLifeS = 14 * dayS;
const keepLifeS = 20 * 365 * dayS;
const page = "/guardian";

type Connection = DataSource | EntityManager;

/** A link from one of the mails, and whose guardian it went to. */
interface GuardianLink {
  userId: string;
  email: string;
  /** it came with the question; else with the mail that is kept after a yes */
  asks: boolean;
}

interface AskedStudio {
  name: string;
  pupil: string;
  teachers: string[];
  recordingsKeptDays: number;
  waits: boolean;
}

/** Parents and guardians of those who may not agree alone. They have no account: what they do, they do by links from mails. */
export class GuardiansService {
  constructor(
    private readonly dataSource: DataSource,
    private readonly tokens: LinkTokensService,
  ) {}

  async state(userId: string): Promise<GuardianState> {
    const rows: {
      needed: boolean | null;
      country: string | null;
      email: string | null;
      askedAt: Date | null;
      confirmedAt: Date | null;
      withdrawnAt: Date | null;
      refusedAt: Date | null;
      waits: boolean;
    }[] = await this.dataSource.query(
      `SELECT ${personNeedsGuardian} AS needed, u.country, g.email, g.asked_at AS "askedAt",
              g.confirmed_at AS "confirmedAt", g.withdrawn_at AS "withdrawnAt",
              EXISTS (SELECT FROM studio_members m WHERE m.user_id = u.id AND ${memberWaitsForGuardian}) AS waits,
              (SELECT max(m.guardian_refused_at) FROM studio_members m
               WHERE m.user_id = u.id AND ${memberWaitsForGuardian} AND m.guardian_refused_at >= g.asked_at) AS "refusedAt"
       FROM users u LEFT JOIN guardians g ON g.user_id = u.id WHERE u.id = $1`,
      [userId],
    );
    const [row] = rows;
    const instant = (at: Date | null | undefined) => at?.toISOString() ?? null;
    return {
      needed: row?.needed ?? null,
      age: ageOfDigitalConsent(row?.country ?? null),
      email: row?.email ?? null,
      askedAt: instant(row?.askedAt),
      confirmedAt: row?.waits ? null : instant(row?.confirmedAt),
      withdrawnAt: instant(row?.withdrawnAt),
      refusedAt: instant(row?.refusedAt),
    };
  }

  /**
   * Whoever agreed in a studio and was too young to do so alone cannot become old enough by another birth year. A wrong
   * one is mended by leaving and being invited again, so that a teacher knows of it.
   */
  async refuseOlder(userId: string, { birthYear, country }: PersonFacts): Promise<void> {
    const rows: object[] = await this.dataSource.query(
      `SELECT FROM users u, (SELECT $2::smallint AS birth_year, $3::text AS country) told
       WHERE u.id = $1 AND ${personNeedsGuardian} AND NOT coalesce(${toldNeedsGuardian}, false)
         AND EXISTS (SELECT FROM studio_members m
                     WHERE m.user_id = u.id AND m.left_at IS NULL AND m.consent_given_at IS NOT NULL)`,
      [userId, birthYear, country],
    );
    if (rows.length === 0) return;
    const message =
      "In a studio a guardian decides for you. If the year is wrong, leave it and ask to be invited again.";
    throw new HttpProblem(409, "guardian-decides", message, [{ path: "birthYear", message }]);
  }

  /**
   * Names a guardian and writes to them; also to write once more, or to somebody else. Nobody else can be asked where
   * one has said no: as with the birth year, that needs leaving and being invited again.
   */
  async ask(userId: string, email: string): Promise<void> {
    await this.dataSource.transaction(async (manager) => {
      const [person]: { email: string; needed: boolean | null }[] = await manager.query(
        `SELECT u.email, ${personNeedsGuardian} AS needed FROM users u WHERE u.id = $1 FOR NO KEY UPDATE`,
        [userId],
      );
      if (person?.needed !== true)
        throw new HttpProblem(
          409,
          "no-guardian-needed",
          "At your age you agree by yourself, or you have not told your age.",
        );
      if (person.email.toLowerCase() === email.toLowerCase())
        throw new HttpProblem(422, "invalid", "This is your own address.", [
          { path: "email", message: "Write the address of a parent or guardian, not your own." },
        ]);
      await refuseAnother(manager, userId, email);
      await manager.query(
        `INSERT INTO guardians (user_id, email) VALUES ($1, $2)
         ON CONFLICT (user_id) DO UPDATE SET email = $2, asked_at = now(), withdrawn_at = NULL`,
        [userId, email],
      );
      if (!(await this.write(manager, userId, email)))
        throw new HttpProblem(409, "nothing-to-confirm", "Agree in a studio first; then a guardian can confirm it.");
    });
  }

  /** For one more studio; a guardian who took their word back is not written to unless the pupil asks. */
  async askAgain(manager: EntityManager, userId: string): Promise<void> {
    const [rows]: [{ email: string }[], number] = await manager.query(
      "UPDATE guardians SET asked_at = now() WHERE user_id = $1 AND withdrawn_at IS NULL RETURNING email",
      [userId],
    );
    if (rows[0]) await this.write(manager, userId, rows[0].email);
  }

  /** What the link is about; null if it is not one of ours any more. */
  async look(token: string): Promise<GuardianLook | null> {
    const found = await this.linkOf(this.dataSource, token, "look");
    if (!found) return null;
    const studios = await this.studiosOf(this.dataSource, found.userId);
    return {
      pupil: studios[0]?.pupil ?? "",
      studios: studios.map(({ name, teachers, recordingsKeptDays, waits }) => ({
        ...{ name, teachers, recordingsKeptDays },
        confirmed: !waits,
      })),
      sees: whatTeachersSee(Math.max(1, ...studios.map(({ recordingsKeptDays }) => recordingsKeptDays))),
      link: found.asks ? "ask" : "keep",
      confirmed: studios.length > 0 && studios.every(({ waits }) => !waits),
    };
  }

  /** The guardian's word, for every studio that waits for it; a mail brings the link by which it can be taken back. */
  async confirm(token: string): Promise<boolean> {
    return this.dataSource.transaction(async (manager) => {
      const found = await this.linkOf(manager, token, "spend");
      if (!found) return false;
      const { userId, email, asks } = found;
      const studios = (await this.studiosOf(manager, userId)).filter(({ waits }) => waits);
      await manager.query(
        `UPDATE studio_members m SET guardian_agreed_at = now(), guardian_refused_at = NULL,
           recordings_kept_days = least(s.recordings_kept_days, m.recordings_kept_days)
         FROM studios s, users u
         WHERE s.id = m.studio_id AND u.id = m.user_id AND m.user_id = $1 AND ${memberWaitsForGuardian}`,
        [userId],
      );
      await manager.query(
        "UPDATE guardians SET confirmed_at = now(), withdrawn_at = NULL WHERE user_id = $1 AND email = $2",
        [userId, email],
      );
      if (!asks) return true;
      const keep = await this.tokens.issue(manager, {
        ...{ purpose: keepPurpose, email, lifeS: keepLifeS, subject: userId, onlyOfAddress: true },
      });
      await enqueueMail(manager, {
        event: `guardian-kept:${keep.id}`,
        kind: "guardianKept",
        to: email,
        userId,
        data: { pupil: studios[0]?.pupil ?? "", studio: listWords(studios.map(({ name }) => name)) },
        path: page,
        token: keep,
      });
      return true;
    });
  }

  /**
   * By the link that asks, a no to the studios that wait; those agreed to before stay. By the link of the mail that
   * came after a yes, the word for every studio is taken back: at once nothing is shared any more.
   */
  async withdraw(token: string): Promise<boolean> {
    return this.dataSource.transaction(async (manager) => {
      const found = await this.linkOf(manager, token, "spend");
      if (!found) return false;
      const { userId, asks } = found;
      await manager.query(
        `UPDATE studio_members SET guardian_agreed_at = NULL, guardian_refused_at = now()
         WHERE user_id = $1 AND consent_given_at IS NOT NULL AND (guardian_agreed_at IS NULL OR NOT $2)`,
        [userId, asks],
      );
      await manager.query(
        `UPDATE guardians SET withdrawn_at = now() WHERE user_id = $1 AND NOT EXISTS (
           SELECT FROM studio_members WHERE user_id = $1 AND left_at IS NULL AND guardian_agreed_at IS NOT NULL)`,
        [userId],
      );
      await wakeDeletion(manager);
      return true;
    });
  }

  /** Links about a person who goes. */
  async forget(userId: string): Promise<void> {
    await this.tokens.forget(this.dataSource, userId, purposes);
  }

  private async write(manager: EntityManager, userId: string, email: string): Promise<boolean> {
    const studios = (await this.studiosOf(manager, userId)).filter(({ waits }) => waits);
    const [first] = studios;
    if (!first) return false;
    const token = await this.tokens.issue(manager, { purpose: askPurpose, email, lifeS: askLifeS, subject: userId });
    await enqueueMail(manager, {
      event: `guardian:${token.id}`,
      kind: "guardian",
      to: email,
      userId,
      data: {
        pupil: first.pupil,
        studio: listWords(studios.map(({ name }) => name)),
        teacher: listWords([...new Set(studios.flatMap(({ teachers }) => teachers[0] ?? []))]),
      },
      path: page,
      token,
    });
    return true;
  }

  /** Null if it is good no more, or the pupil is not there any more. One that asks can be spent once, one that is kept never. */
  private async linkOf(connection: Connection, token: string, use: "look" | "spend"): Promise<GuardianLink | null> {
    const asking = await this.tokens[use](connection, askPurpose, token);
    const link = asking ?? (await this.tokens.look(connection, keepPurpose, token));
    if (!link?.subject) return null;
    const { subject: userId, email } = link;
    const known: object[] = await connection.query("SELECT FROM guardians WHERE user_id = $1", [userId]);
    return known.length === 0 ? null : { userId, email, asks: asking !== null };
  }

  /** Those in which the pupil agreed, whether or not a guardian has. */
  private async studiosOf(connection: Connection, userId: string): Promise<AskedStudio[]> {
    return connection.query(
      `SELECT s.name, m.name AS pupil, ${keptDaysColumn},
              ${memberWaitsForGuardian} AS waits,
              ARRAY(SELECT t.name FROM studio_members t
                    WHERE t.studio_id = s.id AND t.left_at IS NULL AND t.role <> 'pupil'
                    ORDER BY t.role DESC, t.joined_at, t.id) AS teachers
       FROM studio_members m JOIN users u ON u.id = m.user_id JOIN studios s ON s.id = m.studio_id
       WHERE m.user_id = $1 AND (${memberWaitsForGuardian} OR ${memberShares})
       ORDER BY m.joined_at, m.id`,
      [userId],
    );
  }
}

async function refuseAnother(manager: EntityManager, userId: string, email: string): Promise<void> {
  const rows: object[] = await manager.query(
    `SELECT FROM guardians g JOIN studio_members m ON m.user_id = g.user_id
     WHERE g.user_id = $1 AND lower(g.email) <> lower($2) AND m.left_at IS NULL AND m.guardian_refused_at IS NOT NULL`,
    [userId, email],
  );
  if (rows.length === 0) return;
  const message =
    "The guardian whom you named has said no, and only they can change that. If it was not your guardian, leave the studio and ask to be invited again.";
  throw new HttpProblem(409, "guardian-decides", message, [{ path: "email", message }]);
}
