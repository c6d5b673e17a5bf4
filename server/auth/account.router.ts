import { pipeline } from "node:stream/promises";
import {
  changePasswordRequest,
  endSessionsQuery,
  erasure,
  type Erasure,
  openSession,
  passwordRequest,
  personFacts,
  personFactsChange,
} from "../../shared/contract/account";
import { addressOf } from "../http/addressOf";
import type { Api } from "../http/api";
import { currentSessionId, currentUserId } from "../http/currentUser";
import { notFound } from "../http/httpProblem";
import { idIn } from "../http/ownedCollection.router";
import { parse } from "../http/parse";
import { tooMany } from "../http/tryBucket";
import { refuseEndOfSharing } from "../studio/consent/endOfSharing.service";
import type { GuardiansService } from "../studio/consent/guardians.service";
import { type AuthParts, tellOwner } from "./authParts";
import { askForErasure } from "./erasure";
import { refuseCommonPassword } from "./newPassword";
import { exportArchive, type PersonalDataPart } from "./personalData.service";

const tag = "account";
const facts = { name: "PersonFacts", schema: personFacts };
const wrongPassword = { description: "The password is wrong (wrong-password)." };

type Guardians = Pick<GuardiansService, "refuseOlder">;

/** What one does with one's own account: sessions, password, taking everything along, leaving. */
export function accountRoutes(
  api: Api,
  parts: AuthParts,
  personalData: readonly PersonalDataPart[],
  guardians: Guardians,
): void {
  const { dataSource, accounts, sessions, limits, log } = parts;

  api.route(
    {
      method: "get",
      path: "/account/person",
      tag,
      summary: "Birth year and country, as far as told",
      signedIn: true,
      answers: { 200: { description: "The facts.", schema: facts } },
    },
    async (_req, res) => {
      res.json(await accounts.facts(currentUserId(res)));
    },
  );

  api.route(
    {
      method: "put",
      path: "/account/person",
      tag,
      summary: "Tell birth year and country, or take them back",
      signedIn: true,
      body: { name: "PersonFactsChange", schema: personFactsChange },
      answers: {
        200: { description: "Saved.", schema: facts },
        409: {
          description:
            "A guardian decides in a studio, and this would make them needless (guardian-decides); or sharing in a studio would end and recordings be deleted, and endsSharing is not true (ends-sharing).",
        },
      },
    },
    async (req, res) => {
      const { endsSharing = false, ...told } = parse(personFactsChange, req.body);
      const userId = currentUserId(res);
      await guardians.refuseOlder(userId, told);
      if (!endsSharing) await refuseEndOfSharing(dataSource, userId, told);
      await accounts.setFacts(userId, told);
      res.json(told);
    },
  );

  api.route(
    {
      method: "post",
      path: "/account/password",
      tag,
      summary: "Change the password; ends all other sessions",
      signedIn: true,
      body: { name: "ChangePassword", schema: changePasswordRequest },
      answers: { 204: { description: "Changed." }, 403: wrongPassword, 429: tooMany },
    },
    async (req, res) => {
      const { present, next } = parse(changePasswordRequest, req.body);
      const userId = currentUserId(res);
      const address = addressOf(req);
      await limits.countPassword(userId, address);
      const person = await accounts.check(userId, present);
      await limits.forgivePassword(userId, address);
      refuseCommonPassword(next, person.email, "next");
      await dataSource.transaction(async (manager) => {
        await accounts.setPassword(manager, userId, next);
        await sessions.endAll(userId, { except: currentSessionId(res), connection: manager });
        await log.note("password-changed", { userId, address }, manager);
        await tellOwner(manager, person, "password-changed");
      });
      res.status(204).end();
    },
  );

  api.route(
    {
      method: "get",
      path: "/account/sessions",
      tag,
      summary: "Where one is signed in, last used first",
      signedIn: true,
      answers: {
        200: { description: "The sessions.", schema: { name: "OpenSession", schema: openSession }, list: true },
      },
    },
    async (_req, res) => {
      res.json(await sessions.list(currentUserId(res), currentSessionId(res)));
    },
  );

  api.route(
    {
      method: "delete",
      path: "/account/sessions/:id",
      tag,
      summary: "Sign out of one session",
      signedIn: true,
      answers: { 204: { description: "Ended." }, 404: { description: "There is no such session in this account." } },
    },
    async (req, res) => {
      const userId = currentUserId(res);
      const ended = await sessions.endOne(userId, idIn(req.params, "id", "session"));
      if (!ended) throw notFound("session");
      await log.note("session-ended", { userId, address: addressOf(req) });
      res.status(204).end();
    },
  );

  api.route(
    {
      method: "delete",
      path: "/account/sessions",
      tag,
      summary: "Sign out everywhere; with keepThis=true everywhere else",
      signedIn: true,
      query: endSessionsQuery,
      answers: { 204: { description: "Ended." } },
    },
    async (req, res) => {
      const { keepThis } = parse(endSessionsQuery, req.query, "This cannot be asked for.");
      const userId = currentUserId(res);
      await sessions.endAll(userId, { except: keepThis === "true" ? currentSessionId(res) : null });
      await log.note("sessions-ended", { userId, address: addressOf(req) });
      res.status(204).end();
    },
  );

  api.route(
    {
      method: "post",
      path: "/account/erasure",
      tag,
      summary: "Have the account erased in 14 days, with everything in it; ends all sessions. Signing in keeps it",
      signedIn: true,
      body: { name: "Password", schema: passwordRequest },
      answers: {
        202: { description: "When it will be gone.", schema: { name: "Erasure", schema: erasure } },
        403: wrongPassword,
        429: tooMany,
      },
    },
    async (req, res) => {
      const { password } = parse(passwordRequest, req.body);
      const userId = currentUserId(res);
      const address = addressOf(req);
      await limits.countPassword(userId, address);
      const person = await accounts.check(userId, password);
      await limits.forgivePassword(userId, address);
      const eraseAt = await dataSource.transaction(async (manager) => {
        await sessions.endAll(userId, { connection: manager });
        await log.note("erasure-asked", { userId, address }, manager);
        return askForErasure(manager, person);
      });
      res.status(202).json({ eraseAt: eraseAt.toISOString() } satisfies Erasure);
    },
  );

  api.route(
    {
      method: "get",
      path: "/account/export",
      tag,
      summary: "Everything that is kept of this account, as a zip archive",
      signedIn: true,
      answers: { 200: { description: "The archive.", mediaType: "application/zip" }, 429: tooMany },
    },
    async (req, res) => {
      const userId = currentUserId(res);
      await limits.countCostly(userId);
      const archive = await exportArchive(personalData, userId);
      await log.note("exported", { userId, address: addressOf(req) });
      res.type("application/zip").attachment("larkspan-export.zip");
      await pipeline(archive, res);
    },
  );
}
