import { createHash } from "node:crypto";
import { RateLimiterPostgres, RateLimiterRes } from "rate-limiter-flexible";
import type { DataSource } from "typeorm";
import { HttpProblem } from "../http/httpProblem";

const quarterHourS = 900;

/** Limits on guessing. The buckets of an account and of an address fill independently. */
export class TryLimits {
  private readonly account: RateLimiterPostgres;
  private readonly address: RateLimiterPostgres;
  private readonly signUp: RateLimiterPostgres;

  constructor(dataSource: DataSource) {
    const bucket = (keyPrefix: string, points: number) =>
      new RateLimiterPostgres({
        storeClient: dataSource,
        storeType: "typeorm",
        tableName: "tries",
        tableCreated: true,
        clearExpiredByTimeout: true,
        keyPrefix,
        points,
        duration: quarterHourS,
      });
    this.account = bucket("account", 10);
    this.address = bucket("address", 100);
    this.signUp = bucket("sign-up", 50);
  }

  /** Counts a try before its password is looked at, so that many at once do not slip through. */
  async countSignIn(email: string, address: string): Promise<void> {
    await take(this.address, address);
    await take(this.account, keyOf(email));
  }

  /** A right password empties the account's bucket and takes back the address's drop. */
  async forgiveSignIn(email: string, address: string): Promise<void> {
    await Promise.all([this.account.delete(keyOf(email)), this.address.reward(address, 1)]);
  }

  async countSignUp(address: string): Promise<void> {
    await take(this.signUp, address);
  }
}

/** E-mail addresses are not kept where they are of no use. */
const keyOf = (email: string) => createHash("sha256").update(email.toLowerCase()).digest("base64url");

async function take(bucket: RateLimiterPostgres, key: string): Promise<void> {
  try {
    await bucket.consume(key);
  } catch (error) {
    if (!(error instanceof RateLimiterRes)) throw error;
    const minutes = Math.max(1, Math.ceil(error.msBeforeNext / 60_000));
    throw new HttpProblem(
      429,
      "too-many-tries",
      `That was tried too often. Try again in ${minutes === 1 ? "a minute" : `${minutes} minutes`}.`,
      undefined,
      { "Retry-After": String(Math.max(1, Math.ceil(error.msBeforeNext / 1000))) },
    );
  }
}
