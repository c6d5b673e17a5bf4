import type { AddressInfo } from "node:net";
import { simpleParser } from "mailparser";
import { SMTPServer } from "smtp-server";

/** A mail as it arrived. */
export interface ArrivedMail {
  to: string;
  from: string;
  subject: string;
  text: string;
  html: string;
  headers: Record<string, string>;
  at: Date;
}

const mostMails = 200;

/** A mail server on loopback that delivers to nobody: what it is given stands in `mails`, newest first. */
export class FakeSmtp {
  readonly mails: ArrivedMail[] = [];
  /** Refuses the next so many mails with this answer, as a mail server in trouble does. */
  refusing: { times: number; code: number } = { times: 0, code: 451 };
  private readonly server: SMTPServer;

  private constructor() {
    this.server = new SMTPServer({
      authOptional: true,
      disabledCommands: ["STARTTLS", "AUTH"],
      onData: (stream, _session, done) => {
        simpleParser(stream).then(
          (parsed) => {
            if (this.refusing.times > 0) {
              this.refusing.times--;
              done(Object.assign(new Error("Not now"), { responseCode: this.refusing.code }));
              return;
            }
            const to = Array.isArray(parsed.to) ? parsed.to : parsed.to ? [parsed.to] : [];
            this.mails.unshift({
              to: to.map(({ text }) => text).join(", "),
              from: parsed.from?.text ?? "",
              subject: parsed.subject ?? "",
              text: parsed.text ?? "",
              html: typeof parsed.html === "string" ? parsed.html : "",
              headers: Object.fromEntries(
                parsed.headerLines.map(({ key, line }) => [key, line.slice(line.indexOf(":") + 1).trim()]),
              ),
              at: new Date(),
            });
            this.mails.splice(mostMails);
            done();
          },
          (error: Error) => done(error),
        );
      },
    });
    // A client that goes away in the middle must not end the process.
    this.server.on("error", () => undefined);
  }

  static async start(): Promise<FakeSmtp> {
    const smtp = new FakeSmtp();
    await new Promise<void>((resolve) => smtp.server.listen(0, "127.0.0.1", resolve));
    return smtp;
  }

  get url(): string {
    return `smtp://127.0.0.1:${(this.server.server.address() as AddressInfo).port}`;
  }

  async stop(): Promise<void> {
    await new Promise<void>((resolve) => this.server.close(resolve));
  }
}
