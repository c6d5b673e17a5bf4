import { createHash, createHmac, randomUUID } from "node:crypto";
import type { DataSource, EntityManager } from "typeorm";

export interface LinkTokenWish {
  /** what the link is good for; a token of one purpose is worth nothing for another */
  purpose: string;
  /** the address it is sent to */
  email: string;
  lifeS: number;
  /** the account it acts on */
  userId?: string;
  /** any other row it acts on, an invitation for instance */
  subject?: string;
  /** links that went to other addresses stay good */
  onlyOfAddress?: boolean;
}

export interface SpentToken {
  id: string;
  email: string;
  userId: string | null;
  subject: string | null;
}

/** What a mail needs to know of a token to write it into a link. */
export interface LinkToken {
  id: string;
  purpose: string;
}

type Connection = DataSource | EntityManager;

/**
 * Links in mails that are good once and for a while. The database holds only a hash; what a waiting mail holds is the
 * token's id, from which only this server can make the token.
 */
export class LinkTokensService {
  constructor(private readonly secret: string) {}

  /** Makes a token. Earlier ones for the same purpose and the same account or row are worth nothing from now on. */
  async issue(connection: Connection, wish: LinkTokenWish): Promise<LinkToken> {
    const { purpose, email, lifeS, userId = null, subject = null, onlyOfAddress = false } = wish;
    await connection.query(
      `DELETE FROM link_tokens WHERE purpose = $1 AND user_id IS NOT DISTINCT FROM $2 AND subject IS NOT DISTINCT FROM $3
         AND NOT ($2::uuid IS NULL AND $3::uuid IS NULL) AND ($4::text IS NULL OR lower(email) = lower($4))`,
      [purpose, userId, subject, onlyOfAddress ? email : null],
    );
    const id = randomUUID();
    await connection.query(
      `INSERT INTO link_tokens (id, purpose, token_hash, user_id, subject, email, expires_at)
       VALUES ($1, $2, $3, $4, $5, $6, now() + make_interval(secs => $7))`,
      [id, purpose, hashOf(this.written({ id, purpose })), userId, subject, email, lifeS],
    );
    return { id, purpose };
  }

  /** Makes the links about a row worth nothing. */
  async forget(connection: Connection, subject: string, purposes: readonly string[]): Promise<void> {
    await connection.query("DELETE FROM link_tokens WHERE subject = $1 AND purpose = ANY($2)", [subject, purposes]);
  }

  /** The token as it stands in the link. */
  written({ id, purpose }: LinkToken): string {
    return createHmac("sha256", this.secret).update(`link ${purpose} ${id}`).digest("base64url");
  }

  /** Uses a token up; null if it is unknown, used, or too old. Run it in the transaction of what the link does. */
  async spend(connection: Connection, purpose: string, token: string): Promise<SpentToken | null> {
    const [rows]: [SpentToken[], number] = await connection.query(
      `UPDATE link_tokens SET used_at = now()
       WHERE token_hash = $1 AND purpose = $2 AND used_at IS NULL AND expires_at > now()
       RETURNING id, email, user_id AS "userId", subject`,
      [hashOf(token), purpose],
    );
    return rows[0] ?? null;
  }

  /** Links that are long over, and the ledger of mails of more than a year ago. */
  async forgetOld(connection: Connection): Promise<void> {
    await connection.query("DELETE FROM link_tokens WHERE expires_at < now() - interval '30 days'");
    await connection.query("DELETE FROM sent_mails WHERE at < now() - interval '1 year'");
  }

  /** What a token stands for, without using it up. */
  async look(connection: Connection, purpose: string, token: string): Promise<SpentToken | null> {
    const rows: SpentToken[] = await connection.query(
      `SELECT id, email, user_id AS "userId", subject FROM link_tokens
       WHERE token_hash = $1 AND purpose = $2 AND used_at IS NULL AND expires_at > now()`,
      [hashOf(token), purpose],
    );
    return rows[0] ?? null;
  }
}

const hashOf = (token: string) => createHash("sha256").update(token).digest();
