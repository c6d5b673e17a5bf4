import type { DataSource } from "typeorm";
import { enqueueMail } from "../../mail/mail.service";
import { dayWords } from "../assignments/dayWords";
import { memberShares } from "../consent/digitalConsent";

interface Line {
  userId: string;
  email: string;
  text: string;
  dueOn: string | null;
  count: number;
}

/** Longer mails are not read. */
const mostLines = 20;

/**
 * Writes to everybody who asked for it what is open for them and what waits for their answer; nothing where there is
 * nothing. The week is part of the event, so that a second run on the same Monday sends nothing.
 */
export class WeeklySummaryService {
  constructor(private readonly dataSource: DataSource) {}

  async send(now = new Date()): Promise<void> {
    const lines = [...(await this.waiting()), ...(await this.open())];
    const byPerson = new Map<string, Line[]>();
    for (const line of lines) byPerson.set(line.userId, [...(byPerson.get(line.userId) ?? []), line]);
    const week = mondayOf(now);
    for (const [userId, own] of byPerson) {
      await enqueueMail(this.dataSource, {
        event: `weekly:${userId}:${week}`,
        kind: "weekly",
        to: own[0]?.email ?? "",
        userId,
        data: { lines: own.slice(0, mostLines).map(words) },
        path: "/studio",
      });
    }
  }

  /** What pupils have not finished, soonest due first. */
  private async open(): Promise<Line[]> {
    return this.dataSource.query(
      `SELECT u.id AS "userId", u.email, a.song->>'title' AS text, a.due_on::text AS "dueOn", 0 AS count
       FROM assignment_parts p JOIN assignments a ON a.id = p.assignment_id
       JOIN studio_members m ON m.id = p.member_id AND m.left_at IS NULL
       JOIN users u ON u.id = m.user_id AND u.suspended_at IS NULL
       JOIN mail_preferences f ON f.user_id = u.id AND f.weekly
       WHERE p.state IN ('assigned', 'returned')
       ORDER BY u.id, a.due_on NULLS LAST, a.created_at, p.id`,
    );
  }

  /** What teachers have not answered, by studio. */
  private async waiting(): Promise<Line[]> {
    return this.dataSource.query(
      `SELECT t.id AS "userId", t.email, s.name AS text, NULL AS "dueOn", count(*)::int AS count
       FROM assignment_parts p JOIN studios s ON s.id = p.studio_id
       JOIN studio_members m ON m.id = p.member_id JOIN users u ON u.id = m.user_id
       JOIN studio_members me ON me.studio_id = s.id AND me.left_at IS NULL AND me.role <> 'pupil'
       JOIN users t ON t.id = me.user_id AND t.suspended_at IS NULL
       JOIN mail_preferences f ON f.user_id = t.id AND f.weekly
       WHERE p.state = 'handed-in' AND ${memberShares}
       GROUP BY t.id, t.email, s.id, s.name ORDER BY t.id, s.name`,
    );
  }
}

function words({ text, dueOn, count }: Line): string {
  if (count > 0) return `${text}: ${count === 1 ? "one take waits" : `${count} takes wait`} for your answer.`;
  return dueOn ? `${text}: due on ${dayWords(dueOn)}.` : `${text}: open.`;
}

function mondayOf(now: Date): string {
  const daysSince = (now.getUTCDay() + 6) % 7;
  return new Date(now.getTime() - daysSince * 86_400_000).toISOString().slice(0, 10);
}
