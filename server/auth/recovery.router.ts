import { forgottenRequest, resetRequest } from "../../shared/contract/account";
import { addressOf } from "../http/addressOf";
import type { Api } from "../http/api";
import { HttpProblem } from "../http/httpProblem";
import { parse } from "../http/parse";
import { tooMany } from "../http/tryBucket";
import { enqueue } from "../jobs/jobs.service";
import { enqueueMail } from "../mail/mail.service";
import { type AuthParts, tellOwner } from "./authParts";
import { refuseCommonPassword } from "./newPassword";

const tag = "account";
const resetPurpose = "reset-password";
const resetLifeS = 3600;

/** The name of the job that looks whether there is somebody to send a link to. */
export const sendResetTask = "sendReset";

export const linkNotValid = () =>
  new HttpProblem(410, "link-not-valid", "This link is used up, too old, or not complete. Ask for a new one.");

/** The way back for whoever forgot the password. */
export function recoveryRoutes(api: Api, parts: AuthParts): void {
  const { dataSource, accounts, sessions, tokens, limits, log } = parts;
  const otherOrigin = { description: "The request came from a page of another site (other-origin)." };

  api.route(
    {
      method: "post",
      path: "/auth/forgotten",
      tag,
      summary: "Ask for a link to choose a new password; answers the same whether or not the address is known",
      signedIn: false,
      body: { name: "Forgotten", schema: forgottenRequest },
      answers: {
        202: { description: "If there is an account with this address, a link is on its way to it." },
        403: otherOrigin,
        429: tooMany,
      },
    },
    async (req, res) => {
      const { email } = parse(forgottenRequest, req.body);
      await limits.countMail(email, addressOf(req));
      // Whether there is an account is found out later, by the job: here everybody waits equally long.
      await enqueue(dataSource, sendResetTask, { email });
      res.status(202).end();
    },
  );

  api.route(
    {
      method: "post",
      path: "/auth/reset",
      tag,
      summary: "Choose a new password by the link; ends all sessions, and shows that the address is one's own",
      signedIn: false,
      body: { name: "Reset", schema: resetRequest },
      answers: {
        204: { description: "Changed. Sign in with it." },
        403: otherOrigin,
        410: { description: "The link is used up, too old, or not one of ours (link-not-valid)." },
        429: tooMany,
      },
    },
    async (req, res) => {
      const { token, password } = parse(resetRequest, req.body);
      await limits.countLink(addressOf(req));
      const meant = await tokens.look(dataSource, resetPurpose, token);
      if (!meant?.userId) throw linkNotValid();
      refuseCommonPassword(password, meant.email);
      await dataSource.transaction(async (manager) => {
        const spent = await tokens.spend(manager, resetPurpose, token);
        if (!spent?.userId) throw linkNotValid();
        const { userId, email } = spent;
        await accounts.setPassword(manager, userId, password);
        // Whoever else holds a session, or claimed the address before its owner came, is out now.
        await sessions.endAll(userId, { connection: manager });
        if (!(await accounts.isConfirmedByAnother(manager, email, userId))) {
          await manager.query(
            "UPDATE users SET confirmed_at = coalesce(confirmed_at, now()) WHERE id = $1 AND lower(email) = lower($2)",
            [userId, email],
          );
        }
        await log.note("password-reset", { userId, address: addressOf(req) }, manager);
        await tellOwner(manager, { id: userId, email }, "password-changed");
      });
      res.status(204).end();
    },
  );
}

/** The job behind `/auth/forgotten`. */
export async function sendReset({ dataSource, accounts, tokens, log }: AuthParts, payload: unknown): Promise<void> {
  const { email } = forgottenRequest.parse(payload);
  const owner = await accounts.ownerOf(email);
  if (!owner) return;
  await dataSource.transaction(async (manager) => {
    const wish = { purpose: resetPurpose, email: owner.email, lifeS: resetLifeS, userId: owner.id };
    const token = await tokens.issue(manager, wish);
    await log.note("reset-asked", { userId: owner.id }, manager);
    await enqueueMail(manager, {
      event: `reset:${token.id}`,
      kind: "reset",
      to: owner.email,
      userId: owner.id,
      data: {},
      path: "/account/reset",
      token,
    });
  });
}
