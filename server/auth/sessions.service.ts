import { createHash, randomBytes } from "node:crypto";
import type { DataSource, EntityManager } from "typeorm";
import type { OpenSession } from "../../shared/contract/account";
import { noSession } from "../http/httpProblem";

/** How long a session may lie unused. */
export const sessionLifeS = 30 * 24 * 3600;

/** However much it is used, it ends after this, and the password is asked again. */
const longestLifeS = 90 * 24 * 3600;

/** Two tabs may send the same token at once; within these seconds the second is no thief. */
const graceS = 10;

interface Held {
  session_id: string;
  user_id: string;
}

/** A session and the refresh token that continues it. */
export interface Begun {
  userId: string;
  sessionId: string;
  token: string;
}

const hashOf = (token: string) => createHash("sha256").update(token).digest();

/** Sessions are families of refresh tokens, each of which may be used once. Only hashes are stored. */
export class SessionsService {
  constructor(private readonly dataSource: DataSource) {}

  /** Begins a session; gives its first refresh token. */
  async begin(userId: string, device: string): Promise<Begun> {
    await this.dataSource.query("DELETE FROM sessions WHERE user_id = $1 AND expires_at < now()", [userId]);
    const rows: { id: string }[] = await this.dataSource.query(
      "INSERT INTO sessions (user_id, device, expires_at) VALUES ($1, $2, now() + make_interval(secs => $3)) RETURNING id",
      [userId, device, sessionLifeS],
    );
    const sessionId = rows[0]?.id ?? "";
    return { userId, sessionId, token: await this.issue(sessionId) };
  }

  /** Where somebody is signed in, last used first. */
  async list(userId: string, current: string): Promise<OpenSession[]> {
    const rows: { id: string; device: string; created_at: Date; last_used_at: Date }[] = await this.dataSource.query(
      `SELECT id, device, created_at, last_used_at FROM sessions
       WHERE user_id = $1 AND revoked_at IS NULL AND expires_at > now() ORDER BY last_used_at DESC, id`,
      [userId],
    );
    return rows.map(({ id, device, created_at, last_used_at }) => ({
      id,
      device,
      begunAt: created_at.toISOString(),
      lastUsedAt: last_used_at.toISOString(),
      current: id === current,
    }));
  }

  /** Ends one session of a person; false if they have no such session. */
  async endOne(userId: string, sessionId: string): Promise<boolean> {
    const [, count]: [unknown, number] = await this.dataSource.query(
      "UPDATE sessions SET revoked_at = now() WHERE user_id = $1 AND id = $2 AND revoked_at IS NULL AND expires_at > now()",
      [userId, sessionId],
    );
    return count > 0;
  }

  /** Ends all sessions of a person, but for one. */
  async endAll(
    userId: string,
    {
      except = null,
      connection = this.dataSource,
    }: { except?: string | null; connection?: DataSource | EntityManager } = {},
  ): Promise<void> {
    await connection.query(
      "UPDATE sessions SET revoked_at = now() WHERE user_id = $1 AND revoked_at IS NULL AND id IS DISTINCT FROM $2::uuid",
      [userId, except],
    );
  }

  /** Takes a refresh token and gives the next. A token that comes back later was copied: its whole session ends. */
  async rotate(token: string): Promise<Begun> {
    const [taken]: [Held[], number] = await this.dataSource.query(
      `UPDATE refresh_tokens t SET used_at = now() FROM sessions s
       WHERE t.token_hash = $1 AND t.used_at IS NULL
         AND s.id = t.session_id AND s.revoked_at IS NULL AND s.expires_at > now()
       RETURNING s.id AS session_id, s.user_id`,
      [hashOf(token)],
    );
    const held = taken[0] ?? (await this.heldInGrace(token));
    if (!held) {
      await this.revokeIfReused(token);
      throw noSession("Your session has ended. Sign in again.");
    }
    await this.dataSource.query(
      `WITH forgotten AS (DELETE FROM refresh_tokens WHERE session_id = $1 AND used_at < now() - interval '7 days')
       UPDATE sessions
       SET expires_at = least(now() + make_interval(secs => $2), created_at + make_interval(secs => $3)),
           last_used_at = now()
       WHERE id = $1`,
      [held.session_id, sessionLifeS, longestLifeS],
    );
    return { userId: held.user_id, sessionId: held.session_id, token: await this.issue(held.session_id) };
  }

  /** Ends the session a token belongs to, whether or not the token was used. */
  async end(token: string): Promise<void> {
    await this.dataSource.query(
      `UPDATE sessions SET revoked_at = now() FROM refresh_tokens t
       WHERE t.token_hash = $1 AND t.session_id = sessions.id AND sessions.revoked_at IS NULL`,
      [hashOf(token)],
    );
  }

  private async heldInGrace(token: string): Promise<Held | undefined> {
    const rows: Held[] = await this.dataSource.query(
      `SELECT s.id AS session_id, s.user_id FROM refresh_tokens t JOIN sessions s ON s.id = t.session_id
       WHERE t.token_hash = $1 AND t.used_at > now() - make_interval(secs => $2)
         AND s.revoked_at IS NULL AND s.expires_at > now()`,
      [hashOf(token), graceS],
    );
    return rows[0];
  }

  private async revokeIfReused(token: string): Promise<void> {
    await this.dataSource.query(
      `UPDATE sessions SET revoked_at = now() FROM refresh_tokens t
       WHERE t.token_hash = $1 AND t.used_at IS NOT NULL AND t.session_id = sessions.id AND sessions.revoked_at IS NULL`,
      [hashOf(token)],
    );
  }

  private async issue(sessionId: string): Promise<string> {
    const token = randomBytes(32).toString("base64url");
    await this.dataSource.query("INSERT INTO refresh_tokens (token_hash, session_id) VALUES ($1, $2)", [
      hashOf(token),
      sessionId,
    ]);
    return token;
  }
}
