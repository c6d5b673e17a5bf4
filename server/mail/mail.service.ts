import type { DataSource, EntityManager } from "typeorm";
import { enqueue } from "../jobs/jobs.service";
import type { LinkToken } from "./linkTokens.service";
import type { MailData, MailKind } from "./templates/mailTemplates";

/** The name of the job that sends one mail. */
export const sendMailTask = "sendMail";

/** A mail as it waits in the queue. */
export interface WaitingMail<Kind extends MailKind = MailKind> {
  /** What it reports, such as "assigned:<assignment id>": there is never a second mail for one event. */
  event: string;
  kind: Kind;
  to: string;
  /** whose mail it is, if they have an account; needed for the kinds that can be switched off */
  userId: string | null;
  data: MailData<Kind>;
  /** the page it leads to */
  path: string;
  /** goes into the link behind a #, where no server's log sees it */
  token?: LinkToken;
}

/** Sends a mail if and when the transaction of the given connection is done. */
export async function enqueueMail<Kind extends MailKind>(
  connection: EntityManager | DataSource,
  mail: WaitingMail<Kind>,
): Promise<void> {
  await enqueue(connection, sendMailTask, mail, { key: `mail ${mail.event}` });
}
