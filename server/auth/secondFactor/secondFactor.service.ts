import { createHash, randomBytes } from "node:crypto";
import { Secret, TOTP } from "otpauth";
import { toString as qrPicture } from "qrcode";
import type { DataSource, EntityManager } from "typeorm";
import type { SecondFactor, SecondFactorSetup } from "../../../shared/contract/account";
import { HttpProblem } from "../../http/httpProblem";
import type { Passwords } from "../passwords";
import { seal, unseal } from "./sealedSecret";

const stepS = 30;
const codesAtOnce = 10;
/** without letters and digits that look alike */
const letters = "23456789abcdefghjkmnpqrstuvwxyz";

/** One-time codes by time (RFC 6238) and recovery codes. A code is good once, also within its half minute. */
export class SecondFactorService {
  constructor(
    private readonly dataSource: DataSource,
    private readonly secret: string,
    private readonly passwords: Passwords,
  ) {}

  async get(userId: string): Promise<SecondFactor> {
    const rows: SecondFactor[] = await this.dataSource.query(
      `SELECT EXISTS (SELECT FROM second_factors WHERE user_id = $1 AND confirmed_at IS NOT NULL) AS "on",
              (SELECT count(*)::int FROM recovery_codes WHERE user_id = $1) AS "recoveryCodesLeft"`,
      [userId],
    );
    return rows[0] ?? { on: false, recoveryCodesLeft: 0 };
  }

  /** Makes a secret that counts only after a code of it was shown. */
  async begin(userId: string, email: string): Promise<SecondFactorSetup> {
    const secret = new Secret({ size: 20 });
    const rows: object[] = await this.dataSource.query(
      `INSERT INTO second_factors AS f (user_id, secret) VALUES ($1, $2)
       ON CONFLICT (user_id) DO UPDATE SET secret = $2, last_step = 0 WHERE f.confirmed_at IS NULL RETURNING user_id`,
      [userId, seal(this.secret, secret.bytes)],
    );
    if (rows.length === 0)
      throw new HttpProblem(409, "second-factor-on", "Codes are on already. Switch them off first.");
    const uri = totp(secret, email).toString();
    return { uri, secret: secret.base32, qrSvg: await qrPicture(uri, { type: "svg", margin: 2 }) };
  }

  /** Switches codes on. Gives the recovery codes, this once. */
  async confirm(userId: string, code: string): Promise<string[]> {
    return this.dataSource.transaction(async (manager) => {
      if (!(await this.passes(manager, userId, code, false))) throw wrongCode();
      const [, changed]: [unknown, number] = await manager.query(
        "UPDATE second_factors SET confirmed_at = now() WHERE user_id = $1 AND confirmed_at IS NULL",
        [userId],
      );
      if (changed === 0) throw wrongCode();
      return this.newRecoveryCodes(manager, userId);
    });
  }

  /** What a code was: of the app, a recovery code, or wrong. A right one is used up. */
  async use(
    userId: string,
    code: string,
    connection: DataSource | EntityManager = this.dataSource,
  ): Promise<"app" | "recovery" | null> {
    if (await this.passes(connection, userId, code, true)) return "app";
    if (isOfApp(code)) return null;
    const [used]: [object[], number] = await connection.query(
      "DELETE FROM recovery_codes WHERE user_id = $1 AND code_hash = $2 RETURNING user_id",
      [userId, await this.hashOf(userId, code)],
    );
    return used.length > 0 ? "recovery" : null;
  }

  async off(manager: EntityManager, userId: string): Promise<void> {
    await manager.query("DELETE FROM recovery_codes WHERE user_id = $1", [userId]);
    await manager.query("DELETE FROM second_factors WHERE user_id = $1", [userId]);
  }

  async newRecoveryCodes(manager: EntityManager, userId: string): Promise<string[]> {
    const codes = Array.from({ length: codesAtOnce }, newCode);
    await manager.query("DELETE FROM recovery_codes WHERE user_id = $1", [userId]);
    await manager.query("INSERT INTO recovery_codes (user_id, code_hash) SELECT $1, unnest($2::bytea[])", [
      userId,
      await Promise.all(codes.map((code) => this.hashOf(userId, code))),
    ]);
    return codes;
  }

  private async passes(
    connection: DataSource | EntityManager,
    userId: string,
    code: string,
    confirmed: boolean,
  ): Promise<boolean> {
    if (!isOfApp(code)) return false;
    const token = code.replace(/\s/g, "");
    const rows: { secret: Buffer }[] = await connection.query(
      "SELECT secret FROM second_factors WHERE user_id = $1 AND (confirmed_at IS NOT NULL) = $2",
      [userId, confirmed],
    );
    const [row] = rows;
    if (!row) return false;
    const bytes = unseal(this.secret, row.secret);
    const timestamp = Date.now();
    // One step either way, for clocks that are a little off.
    const delta = totp(new Secret({ buffer: new Uint8Array(bytes).buffer }), "").validate({
      token,
      timestamp,
      window: 1,
    });
    if (delta === null) return false;
    const step = Math.floor(timestamp / 1000 / stepS) + delta;
    const [, used]: [unknown, number] = await connection.query(
      "UPDATE second_factors SET last_step = $2 WHERE user_id = $1 AND last_step < $2",
      [userId, step],
    );
    return used > 0;
  }

  /** A recovery code has fewer bits than a hash of little work would be enough for. */
  private hashOf(userId: string, code: string): Promise<Buffer> {
    const bare = code.toLowerCase().replace(/[^a-z0-9]/g, "");
    const salt = createHash("sha256").update(`recovery ${userId}`).digest().subarray(0, 16);
    return this.passwords.keyed(bare, { salt, key: this.secret });
  }
}

/** Six digits, however they are spaced. */
const isOfApp = (code: string) => /^(\s*\d){6}\s*$/.test(code);

export const wrongCode = () =>
  new HttpProblem(403, "wrong-code", "This code is not right, or it was used already. Wait for the next one.", [
    { path: "code", message: "This code is not right, or it was used already." },
  ]);

function totp(secret: Secret, label: string): TOTP {
  return new TOTP({ issuer: "Larkspan", label, secret, algorithm: "SHA1", digits: 6, period: stepS });
}

/** Two groups of six, some 59 bits. */
function newCode(): string {
  let code = "";
  while (code.length < 12) {
    for (const byte of randomBytes(16)) if (byte < 248 && code.length < 12) code += letters[byte % letters.length];
  }
  return `${code.slice(0, 6)}-${code.slice(6)}`;
}
