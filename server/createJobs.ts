import { createTransport } from "nodemailer";
import type { DataSource } from "typeorm";
import { authParts } from "./auth/authParts";
import { eraseAccounts, eraseAccountsTask } from "./auth/erasure";
import { sendReset, sendResetTask } from "./auth/recovery.router";
import { createPersonalData } from "./createPersonalData";
import type { JobHandler, Jobs } from "./jobs/jobWorker";
import { LinkTokensService } from "./mail/linkTokens.service";
import { sendMailTask } from "./mail/mail.service";
import { MailPreferencesService } from "./mail/mailPreferences.service";
import { Postman } from "./mail/postman";
import type { ObjectStore } from "./storage/objectStore.service";
import { deleteTakesTask, TakeDeletion } from "./studio/handIns/takeDeletion";
import { WeeklySummaryService } from "./studio/weekly/weeklySummary.service";

/** Writes the summaries of the week. */
const weeklySummaryTask = "weeklySummary";

/** Forgets what nobody needs any more. */
const tidyUpTask = "tidyUp";

interface JobSettings {
  tokenSecret: string;
  smtpUrl: string;
  mailFrom: string;
  /** where the links in mails lead */
  origin: string;
  objects: ObjectStore;
}

/** Puts together everything that is done by jobs; the only place that knows all of it. */
export function createJobs(dataSource: DataSource, settings: JobSettings): Jobs & { close: () => void } {
  const { tokenSecret, smtpUrl, mailFrom, origin, objects } = settings;
  const transport = createTransport({
    url: smtpUrl,
    connectionTimeout: 10_000,
    greetingTimeout: 10_000,
    socketTimeout: 30_000,
    disableFileAccess: true,
    disableUrlAccess: true,
  });
  const postman = new Postman({
    dataSource,
    transport,
    from: mailFrom,
    origin,
    tokens: new LinkTokensService(tokenSecret),
    preferences: new MailPreferencesService(dataSource, tokenSecret),
  });
  const parts = authParts(dataSource, { tokenSecret, publicOrigin: origin });
  const personalData = createPersonalData(dataSource, { tokenSecret, objects });
  const takes = new TakeDeletion(dataSource, objects);
  const handlers: Record<string, JobHandler> = {
    [sendMailTask]: (payload) => postman.deliver(payload),
    [sendResetTask]: (payload) => sendReset(parts, payload),
    [eraseAccountsTask]: () => eraseAccounts(dataSource, personalData, parts.log),
    [deleteTakesTask]: () => takes.sweep(),
    [weeklySummaryTask]: () => new WeeklySummaryService(dataSource).send(),
    [tidyUpTask]: async () => {
      await parts.log.forgetOld();
      await parts.tokens.forgetOld(dataSource);
    },
  };
  const recurring = [
    { task: deleteTakesTask, match: "*/5 * * * *" },
    { task: eraseAccountsTask, match: "7 * * * *" },
    { task: weeklySummaryTask, match: "12 6 * * 1" },
    { task: tidyUpTask, match: "37 3 * * *" },
  ];
  return { handlers, recurring, close: () => transport.close() };
}
