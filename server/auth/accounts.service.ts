import type { DataSource, EntityManager } from "typeorm";
import type { Account, PersonFacts, Role } from "../../shared/contract/account";
import { HttpProblem, noSession } from "../http/httpProblem";
import { enqueueMail } from "../mail/mail.service";
import type { LinkTokensService } from "../mail/linkTokens.service";
import type { Passwords } from "./passwords";

/** What the server knows of a person beyond what it tells them. */
interface KnownPerson {
  id: string;
  email: string;
  role: Role;
  confirmed: boolean;
  secondFactor: boolean;
  suspended: boolean;
  passwordHash: string;
}

/** How many accounts of one address a password is tried on, and so how much work every try makes. */
const tried = 2;
export const confirmPurpose = "confirm-email";
const confirmLifeS = 3 * 24 * 3600;

const columns = `u.id, u.email, u.role, u.confirmed_at IS NOT NULL AS confirmed, u.suspended_at IS NOT NULL AS suspended,
  u.password_hash AS "passwordHash",
  EXISTS (SELECT FROM second_factors f WHERE f.user_id = u.id AND f.confirmed_at IS NOT NULL) AS "secondFactor"`;

type Connection = DataSource | EntityManager;

/** People and their passwords. */
export class AccountsService {
  constructor(
    private readonly dataSource: DataSource,
    private readonly tokens: LinkTokensService,
    private readonly passwords: Passwords,
  ) {}

  /**
   * Opens an account and asks by mail whether the address is theirs. Where the address belongs to somebody, all is done
   * and answered in the same way, only the mail is another: so nobody learns from it who has an account. Whoever gives
   * the right password of an account that exists gets that one.
   */
  async open(email: string, password: string): Promise<{ person: KnownPerson; isNew: boolean }> {
    const passwordHash = await this.passwords.hash(password);
    return this.dataSource.transaction(async (manager) => {
      // The same form sent twice at once opens one account.
      await lockAddress(manager, email);
      const known = await this.recognise(email, password, manager);
      if (known) return { person: known, isNew: false };
      const rows: { id: string }[] = await manager.query(
        "INSERT INTO users (email, password_hash) VALUES ($1, $2) RETURNING id",
        [email, passwordHash],
      );
      const person = await this.find(manager, rows[0]?.id ?? "");
      if (!person) throw noSession("This account no longer exists.");
      await this.askToConfirm(manager, person);
      return { person, isNew: true };
    });
  }

  /** Sends the link that confirms; to an address that is taken, the news that it is. */
  async askToConfirm(manager: EntityManager, { id, email }: Pick<KnownPerson, "id" | "email">): Promise<void> {
    const token = await this.tokens.issue(manager, { purpose: confirmPurpose, email, lifeS: confirmLifeS, userId: id });
    const taken = await this.isConfirmedByAnother(manager, email, id);
    await enqueueMail(manager, {
      event: `confirm:${token.id}`,
      to: email,
      userId: id,
      data: {},
      ...(taken
        ? { kind: "knownAddress" as const, path: "/account/forgotten" }
        : { kind: "confirm" as const, path: "/account/confirm", token }),
    });
  }

  /** Null if the address or the password is wrong; which of them is nobody's business. */
  async recognise(
    email: string,
    password: string,
    connection: Connection = this.dataSource,
  ): Promise<KnownPerson | null> {
    const people = await this.claiming(connection, email);
    let found: KnownPerson | null = null;
    for (let k = 0; k < tried; k++) {
      const person = people[k];
      if ((await this.passwords.matches(person?.passwordHash ?? null, password)) && person) found ??= person;
    }
    return found;
  }

  /** Those who may mean this address: its confirmed owner, then the latest who claim it. */
  private async claiming(connection: Connection, email: string): Promise<KnownPerson[]> {
    return connection.query(
      `SELECT ${columns} FROM users u WHERE lower(u.email) = lower($1)
       ORDER BY u.confirmed_at IS NULL, u.created_at DESC LIMIT $2`,
      [email, tried],
    );
  }

  /** Whose password a mail to this address may change: its confirmed owner, else who claimed it first. */
  async ownerOf(email: string): Promise<KnownPerson | null> {
    const rows: KnownPerson[] = await this.dataSource.query(
      `SELECT ${columns} FROM users u WHERE lower(u.email) = lower($1) AND u.suspended_at IS NULL
       ORDER BY u.confirmed_at IS NULL, u.created_at LIMIT 1`,
      [email],
    );
    return rows[0] ?? null;
  }

  async isConfirmedByAnother(connection: Connection, email: string, id: string): Promise<boolean> {
    const rows: object[] = await connection.query(
      "SELECT FROM users WHERE lower(email) = lower($1) AND confirmed_at IS NOT NULL AND id <> $2",
      [email, id],
    );
    return rows.length > 0;
  }

  async get(id: string): Promise<Account> {
    return toAccount(await this.person(id));
  }

  async person(id: string): Promise<KnownPerson> {
    const person = await this.find(this.dataSource, id);
    if (!person) throw noSession("This account no longer exists.");
    return person;
  }

  /** Refuses a wrong password of somebody who is signed in. */
  async check(id: string, password: string): Promise<KnownPerson> {
    const person = await this.person(id);
    if (await this.passwords.matches(person.passwordHash, password)) return person;
    throw new HttpProblem(403, "wrong-password", "This is not your password.", [
      { path: "password", message: "This is not your password." },
    ]);
  }

  async setPassword(connection: Connection, id: string, password: string): Promise<void> {
    await connection.query("UPDATE users SET password_hash = $2 WHERE id = $1", [
      id,
      await this.passwords.hash(password),
    ]);
  }

  async facts(id: string): Promise<PersonFacts> {
    const rows: PersonFacts[] = await this.dataSource.query(
      `SELECT birth_year AS "birthYear", country FROM users WHERE id = $1`,
      [id],
    );
    return rows[0] ?? { birthYear: null, country: null };
  }

  async setFacts(id: string, { birthYear, country }: PersonFacts): Promise<void> {
    await this.dataSource.query("UPDATE users SET birth_year = $2, country = $3 WHERE id = $1", [
      id,
      birthYear,
      country,
    ]);
  }

  private async find(connection: Connection, id: string): Promise<KnownPerson | null> {
    const rows: KnownPerson[] = await connection.query(`SELECT ${columns} FROM users u WHERE u.id = $1`, [id]);
    return rows[0] ?? null;
  }
}

/** One at a time decides whose an address is, until the transaction is done. */
export async function lockAddress(manager: EntityManager, email: string): Promise<void> {
  await manager.query("SELECT pg_advisory_xact_lock(8400003, hashtext(lower($1)))", [email]);
}

/** Confirms an address that the account has, unless it is confirmed or another account has confirmed it. */
export async function confirmAddress(manager: EntityManager, userId: string, email: string): Promise<void> {
  await lockAddress(manager, email);
  await manager.query(
    `UPDATE users SET confirmed_at = now() WHERE id = $1 AND lower(email) = lower($2) AND confirmed_at IS NULL
       AND NOT EXISTS (SELECT FROM users WHERE lower(email) = lower($2) AND confirmed_at IS NOT NULL)`,
    [userId, email],
  );
}

export function toAccount({ id, email, role, confirmed, secondFactor }: KnownPerson): Account {
  return { id, email, role, confirmed, secondFactor };
}
