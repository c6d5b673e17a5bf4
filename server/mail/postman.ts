import { createHash } from "node:crypto";
import type { Transporter } from "nodemailer";
import type { DataSource } from "typeorm";
import { z } from "zod";
import type { LinkTokensService } from "./linkTokens.service";
import type { WaitingMail } from "./mail.service";
import { isOptional, type MailPreferencesService } from "./mailPreferences.service";
import { type MailKind, mailTemplates } from "./templates/mailTemplates";
import type { Mail } from "./templates/mailLayout";

interface PostmanSettings {
  dataSource: DataSource;
  transport: Pick<Transporter, "sendMail" | "verify">;
  from: string;
  /** where the links lead */
  origin: string;
  tokens: LinkTokensService;
  preferences: MailPreferencesService;
}

const waitingMail = z.object({
  event: z.string().min(1),
  kind: z.string().refine((kind): kind is MailKind => Object.hasOwn(mailTemplates, kind)),
  to: z.string(),
  userId: z.uuid().nullable(),
  data: z.looseObject({}),
  path: z.string().startsWith("/"),
  token: z.object({ id: z.uuid(), purpose: z.string() }).optional(),
});

type SmtpError = Error & { responseCode?: number; syscall?: string };

/** Sends waiting mails. An event's row in the ledger is taken before its mail leaves, so it never leaves twice. */
export class Postman {
  constructor(private readonly settings: PostmanSettings) {}

  async deliver(payload: unknown): Promise<void> {
    const mail = waitingMail.parse(payload) as WaitingMail;
    if (!(await this.isWanted(mail))) return;
    // A mail server that is away or takes no password is told apart here, while it is certain that nothing has left.
    await this.settings.transport.verify();
    if (!(await this.claim(mail))) return;
    try {
      await this.settings.transport.sendMail(this.message(mail));
    } catch (error) {
      await this.failed(mail.event, error as SmtpError);
      return;
    }
    await this.note(mail.event, "sent");
  }

  private async isWanted({ kind, userId }: WaitingMail): Promise<boolean> {
    if (userId === null) return true;
    const { dataSource, preferences } = this.settings;
    const [user]: object[] = await dataSource.query("SELECT FROM users WHERE id = $1", [userId]);
    if (!user) return false;
    return !isOptional(kind) || (await preferences.get(userId))[kind];
  }

  private async claim({ event, kind, userId }: WaitingMail): Promise<boolean> {
    const rows: object[] = await this.settings.dataSource.query(
      `INSERT INTO sent_mails (event, kind, user_id, state) VALUES ($1, $2, $3, 'sending')
       ON CONFLICT (event) DO NOTHING RETURNING event`,
      [event, kind, userId],
    );
    return rows.length > 0;
  }

  private async note(event: string, state: "sent" | "uncertain" | "refused"): Promise<void> {
    await this.settings.dataSource.query("UPDATE sent_mails SET state = $2, at = now() WHERE event = $1", [
      event,
      state,
    ]);
  }

  /** Only what certainly did not leave is tried again. */
  private async failed(event: string, error: SmtpError): Promise<void> {
    const { responseCode: answer, syscall } = error;
    if (answer !== undefined && answer >= 500) {
      await this.note(event, "refused");
    } else if (answer === undefined && syscall !== "connect") {
      // A connection that broke may have broken after the mail was taken.
      await this.note(event, "uncertain");
    } else {
      await this.settings.dataSource.query("DELETE FROM sent_mails WHERE event = $1", [event]);
      throw error;
    }
  }

  private message({ event, kind, to, userId, data, path, token }: WaitingMail) {
    const { origin, from, tokens, preferences } = this.settings;
    const link = `${origin}${path}${token ? `#${tokens.written(token)}` : ""}`;
    const template = mailTemplates[kind] as (data: object, link: string) => Mail;
    const mail = template(data, link);
    const host = new URL(origin).hostname;
    // The same event has the same name, should it ever arrive twice after all.
    const messageId = `<${createHash("sha256").update(event).digest("hex").slice(0, 32)}@${host}>`;
    const common = { from, to: { name: "", address: to }, messageId, subject: mail.subject };
    // Nobody's holiday notice needs to answer a machine (RFC 3834).
    const headers = { "Auto-Submitted": "auto-generated" };
    if (userId === null || !isOptional(kind)) return { ...common, headers, text: mail.text, html: mail.html };
    const unsubscribe = preferences.unsubscribeToken(userId, kind);
    const oneClick = `${origin}/api/mail/unsubscribe?token=${unsubscribe}`;
    const page = `${origin}/account/unsubscribe#${unsubscribe}`;
    return {
      ...common,
      // RFC 8058, one click
      headers: {
        ...headers,
        "List-Unsubscribe": `<${oneClick}>`,
        "List-Unsubscribe-Post": "List-Unsubscribe=One-Click",
      },
      text: `${mail.text}No more mails of this kind:\n${page}\n`,
      html: mail.html.replace(
        '<div class="foot">',
        `<div class="foot"><p><a href="${page}">No more mails of this kind</a></p>`,
      ),
    };
  }
}
