import type { Request } from "express";
import type { DataSource, EntityManager } from "typeorm";
import { enqueueMail, type WaitingMail } from "../mail/mail.service";
import { LinkTokensService } from "../mail/linkTokens.service";
import { randomUUID } from "node:crypto";
import { AccountsService } from "./accounts.service";
import { deviceWords } from "./deviceWords";
import { type HashCost, Passwords } from "./passwords";
import { SecondFactorService } from "./secondFactor/secondFactor.service";
import { SecurityLogService } from "./securityLog.service";
import { SessionsService } from "./sessions.service";
import { TryLimits } from "./tryLimits";

export interface AuthSettings {
  tokenSecret: string;
  publicOrigin: string | null;
  /** for tests, which hash often; no variable of the environment leads here */
  hashCost?: HashCost | undefined;
}

/** What the routes of accounts work with. */
export interface AuthParts {
  dataSource: DataSource;
  settings: AuthSettings;
  accounts: AccountsService;
  sessions: SessionsService;
  secondFactors: SecondFactorService;
  tokens: LinkTokensService;
  limits: TryLimits;
  log: SecurityLogService;
}

export function authParts(dataSource: DataSource, settings: AuthSettings): AuthParts {
  const { tokenSecret, hashCost } = settings;
  const tokens = new LinkTokensService(tokenSecret);
  const passwords = new Passwords(hashCost);
  return {
    dataSource,
    settings,
    tokens,
    accounts: new AccountsService(dataSource, tokens, passwords),
    sessions: new SessionsService(dataSource),
    secondFactors: new SecondFactorService(dataSource, tokenSecret, passwords),
    limits: new TryLimits(dataSource),
    log: new SecurityLogService(dataSource, tokenSecret),
  };
}

export const deviceOf = (req: Request<Record<string, string>>) => deviceWords(req.get("user-agent"));

/** Tells the owner of an account that something about its safety has changed. */
export function tellOwner(
  connection: EntityManager | DataSource,
  { id, email }: { id: string; email: string },
  what: WaitingMail<"security">["data"]["what"],
): Promise<void> {
  const event = `security:${randomUUID()}`;
  return enqueueMail(connection, { event, kind: "security", to: email, userId: id, data: { what }, path: "/account" });
}
