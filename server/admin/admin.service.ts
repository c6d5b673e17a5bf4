import type { DataSource } from "typeorm";
import type { AdminUser, SecurityEvent, ServiceHealth } from "../../shared/contract/admin";
import type { Role } from "../../shared/contract/account";
import { notFound } from "../http/httpProblem";
import { queueHealth } from "../jobs/jobs.service";

const pageSize = 50;

/** A store of files that can say whether it answers. */
export interface WatchedStore {
  name: string;
  isUp: () => Promise<boolean>;
}

interface UserRow extends Omit<AdminUser, "eraseAt" | "createdAt" | "lastSeenAt"> {
  eraseAt: Date | null;
  createdAt: Date;
  lastSeenAt: Date | null;
}

/** What administrators see and do. Nothing that a person sang, wrote or recorded is within its reach. */
export class AdminService {
  constructor(
    private readonly dataSource: DataSource,
    private readonly stores: readonly WatchedStore[],
  ) {}

  async users(q: string, after: string | null): Promise<AdminUser[]> {
    const pattern = `%${q.replace(/[\\%_]/g, "\\$&")}%`;
    const rows: UserRow[] = await this.dataSource.query(
      `SELECT ${userColumns} FROM users u
       WHERE u.email ILIKE $1 AND ($2::uuid IS NULL OR
         (lower(u.email), u.id) > (SELECT lower(email), id FROM users WHERE id = $2))
       ORDER BY lower(u.email), u.id LIMIT ${pageSize}`,
      [pattern, after],
    );
    return rows.map(toUser);
  }

  async user(id: string): Promise<AdminUser> {
    const rows: UserRow[] = await this.dataSource.query(`SELECT ${userColumns} FROM users u WHERE u.id = $1`, [id]);
    if (!rows[0]) throw notFound("account");
    return toUser(rows[0]);
  }

  async suspend(id: string, suspended: boolean): Promise<void> {
    await this.dataSource.query(
      "UPDATE users SET suspended_at = CASE WHEN $2 THEN coalesce(suspended_at, now()) END WHERE id = $1",
      [id, suspended],
    );
  }

  async setRole(id: string, role: Role): Promise<void> {
    await this.dataSource.query("UPDATE users SET role = $2 WHERE id = $1", [id, role]);
  }

  async health(): Promise<ServiceHealth> {
    const mail: { state: keyof ServiceHealth["mail"]; count: number }[] = await this.dataSource.query(
      "SELECT state, count(*)::int AS count FROM sent_mails WHERE at > now() - interval '7 days' GROUP BY state",
    );
    const storage = this.stores.map(async ({ name, isUp }) => ({ name, up: await isUp().catch(() => false) }));
    return {
      queue: await queueHealth(this.dataSource),
      mail: {
        sent: 0,
        sending: 0,
        uncertain: 0,
        refused: 0,
        ...Object.fromEntries(mail.map((row) => [row.state, row.count])),
      },
      storage: await Promise.all(storage),
    };
  }

  async audit(userId: string | null, before: string | null): Promise<SecurityEvent[]> {
    const rows: (Omit<SecurityEvent, "at"> & { at: Date })[] = await this.dataSource.query(
      `SELECT id::text AS id, at, what, user_id AS "userId", by_user_id AS "byUserId", address_hash AS "addressHash"
       FROM security_events WHERE ($1::uuid IS NULL OR user_id = $1) AND ($2::bigint IS NULL OR id < $2)
       ORDER BY security_events.id DESC LIMIT ${pageSize}`,
      [userId, before],
    );
    return rows.map((row) => ({ ...row, at: row.at.toISOString() }));
  }
}

const userColumns = `u.id, u.email, u.role, u.confirmed_at IS NOT NULL AS confirmed,
  EXISTS (SELECT FROM second_factors f WHERE f.user_id = u.id AND f.confirmed_at IS NOT NULL) AS "secondFactor",
  u.suspended_at IS NOT NULL AS suspended, u.erase_at AS "eraseAt", u.created_at AS "createdAt",
  (SELECT max(last_used_at) FROM sessions s WHERE s.user_id = u.id) AS "lastSeenAt"`;

function toUser({ eraseAt, createdAt, lastSeenAt, ...rest }: UserRow): AdminUser {
  return {
    ...rest,
    eraseAt: eraseAt?.toISOString() ?? null,
    createdAt: createdAt.toISOString(),
    lastSeenAt: lastSeenAt?.toISOString() ?? null,
  };
}
