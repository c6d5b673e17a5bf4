import { argon2id, hash, verify } from "argon2";

/** How much work a hash is: KiB of memory, and passes over them. */
export interface HashCost {
  memoryCost: number;
  timeCost: number;
}

/** OWASP's Password Storage Cheat Sheet: argon2id with 19 MiB, two passes, one lane. */
const ownCost: HashCost = { memoryCost: 19 * 1024, timeCost: 2 };

/** The same password typed on different systems may arrive in different Unicode forms (RFC 8265). */
const canonical = (password: string) => password.normalize("NFKC");

/** Hashes passwords and compares them. No setting of a server changes the cost; tests give a small one. */
export class Passwords {
  /** What the password of an unknown address is compared with; begun here, so that no request waits for it. */
  private readonly unknownAddress: Promise<string>;

  constructor(private readonly cost = ownCost) {
    this.unknownAddress = this.hash("no account has this password");
  }

  hash(password: string): Promise<string> {
    return hash(canonical(password), { ...this.cost, type: argon2id, parallelism: 1 });
  }

  /**
   * A hash that a short secret can be found by: the same for the same text, salt and key, as 32 bytes.
   *
   * @param salt at least 8 bytes, another one for each person
   * @param key without it nobody who has the database can try texts
   */
  keyed(text: string, { salt, key }: { salt: Buffer; key: string }): Promise<Buffer> {
    return hash(text, { ...this.cost, type: argon2id, parallelism: 1, raw: true, salt, secret: Buffer.from(key) });
  }

  async matches(storedHash: string | null, password: string): Promise<boolean> {
    // An unknown address must take as long as a wrong password, or the time would tell who has an account.
    const matches = await verify(storedHash ?? (await this.unknownAddress), canonical(password));
    return matches && storedHash !== null;
  }
}
