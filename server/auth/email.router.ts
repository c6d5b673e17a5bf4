import { account, changeEmailRequest, confirmEmailRequest } from "../../shared/contract/account";
import { addressOf } from "../http/addressOf";
import type { Api } from "../http/api";
import { currentUserId } from "../http/currentUser";
import { HttpProblem } from "../http/httpProblem";
import { parse } from "../http/parse";
import { tooMany } from "../http/tryBucket";
import { enqueueMail } from "../mail/mail.service";
import { confirmPurpose, lockAddress } from "./accounts.service";
import { type AuthParts, tellOwner } from "./authParts";
import { linkNotValid } from "./recovery.router";

const tag = "account";
const changePurpose = "change-email";
const changeLifeS = 24 * 3600;

/** Showing that an address is one's own, and changing to another. */
export function emailRoutes(api: Api, parts: AuthParts): void {
  const { dataSource, accounts, tokens, limits, log } = parts;

  api.route(
    {
      method: "post",
      path: "/account/email/resend",
      tag,
      summary: "Send the link that confirms the address once more",
      signedIn: true,
      answers: {
        202: { description: "On its way." },
        409: { description: "The address is confirmed already (already-confirmed)." },
        429: tooMany,
      },
    },
    async (req, res) => {
      const person = await accounts.person(currentUserId(res));
      if (person.confirmed) throw new HttpProblem(409, "already-confirmed", "Your address is confirmed already.");
      await limits.countMail(person.email, addressOf(req));
      await dataSource.transaction((manager) => accounts.askToConfirm(manager, person));
      res.status(202).end();
    },
  );

  api.route(
    {
      method: "post",
      path: "/account/email",
      tag,
      summary: "Use another address: it is asked by mail, the present one is told",
      signedIn: true,
      body: { name: "ChangeEmail", schema: changeEmailRequest },
      answers: {
        202: { description: "A link is on its way to the new address; until it is opened the old one stays." },
        403: { description: "The password is wrong (wrong-password)." },
        429: tooMany,
      },
    },
    async (req, res) => {
      const { email, password } = parse(changeEmailRequest, req.body);
      const userId = currentUserId(res);
      const address = addressOf(req);
      await limits.countPassword(userId, address);
      const person = await accounts.check(userId, password);
      await limits.forgivePassword(userId, address);
      await limits.countMail(email, address);
      await dataSource.transaction(async (manager) => {
        const token = await tokens.issue(manager, { purpose: changePurpose, email, lifeS: changeLifeS, userId });
        const taken = await accounts.isConfirmedByAnother(manager, email, userId);
        await enqueueMail(manager, {
          event: `email-change:${token.id}`,
          to: email,
          userId,
          data: {},
          ...(taken
            ? { kind: "knownAddress" as const, path: "/account/forgotten" }
            : { kind: "emailChange" as const, path: "/account/confirm", token }),
        });
        await tellOwner(manager, person, "email-changing");
        await log.note("email-change-asked", { userId, address }, manager);
      });
      res.status(202).end();
    },
  );

  // Only whoever is signed in to the very account: else a stranger could have an address confirmed by its careless owner.
  api.route(
    {
      method: "post",
      path: "/account/email/confirm",
      tag,
      summary: "The address is one's own, by the link from the mail: of the first confirmation or of a change",
      signedIn: true,
      body: { name: "ConfirmEmail", schema: confirmEmailRequest },
      answers: {
        200: { description: "Confirmed.", schema: { name: "Account", schema: account } },
        409: { description: "Another account was confirmed with this address meanwhile (address-in-use)." },
        410: { description: "The link is used up, too old, or of another account (link-not-valid)." },
        429: tooMany,
      },
    },
    async (req, res) => {
      const { token } = parse(confirmEmailRequest, req.body);
      const userId = currentUserId(res);
      const address = addressOf(req);
      await limits.countLink(address);
      const before = await accounts.person(userId);
      await dataSource.transaction(async (manager) => {
        const first = await tokens.look(manager, confirmPurpose, token);
        const meant = first ?? (await tokens.look(manager, changePurpose, token));
        if (meant?.userId !== userId) throw linkNotValid();
        const spent = await tokens.spend(manager, first ? confirmPurpose : changePurpose, token);
        if (!spent || (first && spent.email.toLowerCase() !== before.email.toLowerCase())) throw linkNotValid();
        await lockAddress(manager, spent.email);
        if (await accounts.isConfirmedByAnother(manager, spent.email, userId)) {
          const message = "Another account uses this address. Sign in to that one.";
          throw new HttpProblem(409, "address-in-use", message);
        }
        await manager.query("UPDATE users SET email = $2, confirmed_at = now() WHERE id = $1", [userId, spent.email]);
        await log.note(first ? "email-confirmed" : "email-changed", { userId, address }, manager);
        if (!first) {
          // Links that went to the old address are worth nothing now.
          await manager.query("DELETE FROM link_tokens WHERE user_id = $1 AND used_at IS NULL", [userId]);
          await tellOwner(manager, before, "email-changed");
        }
      });
      res.json(await accounts.get(userId));
    },
  );
}
