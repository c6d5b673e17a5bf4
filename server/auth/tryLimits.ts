import { createHash } from "node:crypto";
import type { DataSource } from "typeorm";
import { TryBucket } from "../http/tryBucket";

/** Limits on guessing. The buckets of an account and of an address fill independently. */
export class TryLimits {
  private readonly account: TryBucket;
  private readonly address: TryBucket;
  private readonly signUp: TryBucket;

  constructor(dataSource: DataSource) {
    this.account = new TryBucket(dataSource, "account", 10);
    this.address = new TryBucket(dataSource, "address", 100);
    this.signUp = new TryBucket(dataSource, "sign-up", 50);
  }

  /** Counts a try before its password is looked at, so that many at once do not slip through. */
  async countSignIn(email: string, address: string): Promise<void> {
    await this.address.take(address);
    await this.account.take(keyOf(email));
  }

  /** A right password empties the account's bucket and takes back the address's drop. */
  async forgiveSignIn(email: string, address: string): Promise<void> {
    await Promise.all([this.account.forgive(keyOf(email)), this.address.giveBack(address)]);
  }

  async countSignUp(address: string): Promise<void> {
    await this.signUp.take(address);
  }
}

/** E-mail addresses are not kept where they are of no use. */
const keyOf = (email: string) => createHash("sha256").update(email.toLowerCase()).digest("base64url");
