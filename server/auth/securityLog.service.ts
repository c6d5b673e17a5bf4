import { createHmac } from "node:crypto";
import type { DataSource, EntityManager } from "typeorm";

/** What is written down for the safety of accounts. */
export type SecurityEventName =
  | "signed-up"
  | "signed-in"
  | "sign-in-refused"
  | "second-step-refused"
  | "recovery-code-used"
  | "session-ended"
  | "sessions-ended"
  | "password-changed"
  | "password-reset"
  | "reset-asked"
  | "email-change-asked"
  | "email-confirmed"
  | "email-changed"
  | "second-factor-on"
  | "second-factor-off"
  | "recovery-codes-new"
  | "exported"
  | "erasure-asked"
  | "erasure-cancelled"
  | "erased"
  | "suspended"
  | "resumed"
  | "role-changed";

interface Noted {
  userId: string | null;
  /** who did it, where it was not the person */
  byUserId?: string;
  address?: string | undefined;
}

/** The audit log: who, what, when, and from where as a hash. Never a secret, never an address. */
export class SecurityLogService {
  constructor(
    private readonly dataSource: DataSource,
    private readonly secret: string,
  ) {}

  async note(
    what: SecurityEventName,
    { userId, byUserId, address }: Noted,
    connection: DataSource | EntityManager = this.dataSource,
  ): Promise<void> {
    await connection.query(
      "INSERT INTO security_events (what, user_id, by_user_id, address_hash) VALUES ($1, $2, $3, $4)",
      [what, userId, byUserId ?? null, address ? this.hashOf(address) : null],
    );
  }

  /** Entries are kept for a year. */
  async forgetOld(): Promise<void> {
    await this.dataSource.query("DELETE FROM security_events WHERE at < now() - interval '1 year'");
  }

  private hashOf(address: string): string {
    return createHmac("sha256", this.secret).update(`address ${address}`).digest("hex").slice(0, 16);
  }
}
