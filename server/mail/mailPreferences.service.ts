import { createHmac, timingSafeEqual } from "node:crypto";
import type { DataSource } from "typeorm";
import { z } from "zod";
import type { MailPreferences, OptionalMail } from "../../shared/contract/mail";

const columns: Record<OptionalMail, string> = {
  assigned: "assigned",
  handedIn: "handed_in",
  answered: "answered",
  weekly: "weekly",
};
const defaults: MailPreferences = { assigned: true, handedIn: true, answered: true, weekly: false };

export const isOptional = (kind: string): kind is OptionalMail => Object.hasOwn(columns, kind);

/** Who wants which mail, and links that say no to one kind without signing in. */
export class MailPreferencesService {
  constructor(
    private readonly dataSource: DataSource,
    private readonly secret: string,
  ) {}

  async get(userId: string): Promise<MailPreferences> {
    const rows: MailPreferences[] = await this.dataSource.query(
      `SELECT assigned, handed_in AS "handedIn", answered, weekly FROM mail_preferences WHERE user_id = $1`,
      [userId],
    );
    return rows[0] ?? defaults;
  }

  async put(userId: string, wanted: MailPreferences): Promise<void> {
    await this.dataSource.query(
      `INSERT INTO mail_preferences (user_id, assigned, handed_in, answered, weekly) VALUES ($1, $2, $3, $4, $5)
       ON CONFLICT (user_id) DO UPDATE SET assigned = $2, handed_in = $3, answered = $4, weekly = $5`,
      [userId, wanted.assigned, wanted.handedIn, wanted.answered, wanted.weekly],
    );
  }

  /** Never expires: a mail may be opened after years. */
  unsubscribeToken(userId: string, kind: OptionalMail): string {
    return `${userId}.${kind}.${this.mac(userId, kind)}`;
  }

  /** Switches off the kind that a token names; null if this server never wrote it. Nothing is wrong with doing it twice. */
  async unsubscribe(token: string): Promise<OptionalMail | null> {
    const [userId = "", kind = "", mac = ""] = token.split(".");
    if (!z.uuid().safeParse(userId).success || !isOptional(kind)) return null;
    const given = Buffer.from(mac);
    const expected = Buffer.from(this.mac(userId, kind));
    if (given.length !== expected.length || !timingSafeEqual(given, expected)) return null;
    await this.dataSource.query(
      `INSERT INTO mail_preferences (user_id, ${columns[kind]}) SELECT id, false FROM users WHERE id = $1
       ON CONFLICT (user_id) DO UPDATE SET ${columns[kind]} = false`,
      [userId],
    );
    return kind;
  }

  private mac(userId: string, kind: OptionalMail): string {
    return createHmac("sha256", this.secret).update(`unsubscribe ${userId} ${kind}`).digest("base64url");
  }
}
