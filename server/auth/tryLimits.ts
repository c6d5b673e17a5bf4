import { createHash } from "node:crypto";
import type { DataSource } from "typeorm";
import { TryBucket } from "../http/tryBucket";

const hourS = 3600;

/** Limits on guessing and on sending mail. The buckets of an account and of an address fill independently. */
export class TryLimits {
  private readonly account: TryBucket;
  private readonly address: TryBucket;
  private readonly signUp: TryBucket;
  private readonly signUpAccount: TryBucket;
  private readonly password: TryBucket;
  private readonly code: TryBucket;
  private readonly link: TryBucket;
  private readonly mail: TryBucket;
  private readonly mailAddress: TryBucket;
  private readonly costly: TryBucket;

  constructor(dataSource: DataSource) {
    this.account = new TryBucket(dataSource, "account", 10);
    this.address = new TryBucket(dataSource, "address", 100);
    this.signUp = new TryBucket(dataSource, "sign-up", 50);
    this.signUpAccount = new TryBucket(dataSource, "sign-up-account", 5);
    this.password = new TryBucket(dataSource, "password", 10);
    this.code = new TryBucket(dataSource, "code", 5);
    this.link = new TryBucket(dataSource, "link", 60);
    this.mail = new TryBucket(dataSource, "mail", 5, hourS);
    this.mailAddress = new TryBucket(dataSource, "mail-address", 50, hourS);
    this.costly = new TryBucket(dataSource, "costly", 10);
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

  /** Opening an account tries a password too, where the address is known. */
  async countSignUp(email: string, address: string): Promise<void> {
    await this.signUp.take(address);
    await this.signUpAccount.take(keyOf(email));
  }

  /** The password once more, of somebody who is signed in. */
  async countPassword(userId: string, address: string): Promise<void> {
    await this.address.take(address);
    await this.password.take(userId);
  }

  async forgivePassword(userId: string, address: string): Promise<void> {
    await Promise.all([this.password.forgive(userId), this.address.giveBack(address)]);
  }

  /** A code of six digits: five tries in a quarter of an hour. */
  async countCode(userId: string, address: string): Promise<void> {
    await this.address.take(address);
    await this.code.take(userId);
  }

  async forgiveCode(userId: string, address: string): Promise<void> {
    await Promise.all([this.code.forgive(userId), this.address.giveBack(address)]);
  }

  /** A link from a mail; its token cannot be guessed, but nobody needs to try often. */
  async countLink(address: string): Promise<void> {
    await this.link.take(address);
  }

  /** A mail that somebody asks for, to this e-mail address. */
  async countMail(email: string, address: string): Promise<void> {
    await this.mailAddress.take(address);
    await this.mail.take(keyOf(email));
  }

  /** What costs the server much. */
  async countCostly(userId: string): Promise<void> {
    await this.costly.take(userId);
  }
}

/** E-mail addresses are not kept where they are of no use. */
const keyOf = (email: string) => createHash("sha256").update(email.toLowerCase()).digest("base64url");
