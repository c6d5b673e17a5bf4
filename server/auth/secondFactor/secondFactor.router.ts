import {
  codeRequest,
  passwordAndCodeRequest,
  passwordRequest,
  recoveryCodes,
  type RecoveryCodes,
  secondFactor,
  secondFactorSetup,
} from "../../../shared/contract/account";
import { addressOf } from "../../http/addressOf";
import type { Api } from "../../http/api";
import { currentSessionId, currentUserId } from "../../http/currentUser";
import { HttpProblem } from "../../http/httpProblem";
import { parse } from "../../http/parse";
import { tooMany } from "../../http/tryBucket";
import { type AuthParts, tellOwner } from "../authParts";
import { wrongCode } from "./secondFactor.service";

const tag = "second factor";
const codes = { name: "RecoveryCodes", schema: recoveryCodes };
const both = { name: "PasswordAndCode", schema: passwordAndCodeRequest };
const wrong = { description: "The password (wrong-password) or the code (wrong-code) is wrong." };

/** Codes of an authenticator app as a second step of signing in. */
export function secondFactorRoutes(api: Api, parts: AuthParts): void {
  const { dataSource, accounts, secondFactors, sessions, limits, log } = parts;

  const checkPassword = async (userId: string, password: string, address: string) => {
    await limits.countPassword(userId, address);
    const person = await accounts.check(userId, password);
    await limits.forgivePassword(userId, address);
    return person;
  };

  api.route(
    {
      method: "get",
      path: "/account/second-factor",
      tag,
      summary: "Whether signing in takes a code, and how many recovery codes are left",
      signedIn: true,
      answers: { 200: { description: "How it is.", schema: { name: "SecondFactor", schema: secondFactor } } },
    },
    async (_req, res) => {
      res.json(await secondFactors.get(currentUserId(res)));
    },
  );

  api.route(
    {
      method: "post",
      path: "/account/second-factor",
      tag,
      summary: "Get a secret for an authenticator app; it counts when a code of it was shown",
      signedIn: true,
      body: { name: "Password", schema: passwordRequest },
      answers: {
        201: {
          description: "The secret, this once.",
          schema: { name: "SecondFactorSetup", schema: secondFactorSetup },
        },
        403: { description: "The password is wrong (wrong-password), or the address is unconfirmed (unconfirmed)." },
        409: { description: "Codes are on already (second-factor-on)." },
        429: tooMany,
      },
    },
    async (req, res) => {
      const { password } = parse(passwordRequest, req.body);
      const userId = currentUserId(res);
      const person = await checkPassword(userId, password, addressOf(req));
      res.status(201).json(await secondFactors.begin(userId, person.email));
    },
  );

  api.route(
    {
      method: "post",
      path: "/account/second-factor/confirm",
      tag,
      summary: "Switch codes on, by a first one; ends all other sessions",
      signedIn: true,
      body: { name: "Code", schema: codeRequest },
      answers: { 200: { description: "On. The recovery codes, this once.", schema: codes }, 403: wrong, 429: tooMany },
    },
    async (req, res) => {
      const { code } = parse(codeRequest, req.body);
      const userId = currentUserId(res);
      const address = addressOf(req);
      await limits.countCode(userId, address);
      const made = await secondFactors.confirm(userId, code);
      await limits.forgiveCode(userId, address);
      await sessions.endAll(userId, { except: currentSessionId(res) });
      await log.note("second-factor-on", { userId, address });
      await tellOwner(dataSource, await accounts.person(userId), "second-factor-on");
      res.json({ recoveryCodes: made } satisfies RecoveryCodes);
    },
  );

  api.route(
    {
      method: "post",
      path: "/account/second-factor/off",
      tag,
      summary: "Sign in without codes again; ends all other sessions",
      signedIn: true,
      body: both,
      answers: {
        204: { description: "Off." },
        403: wrong,
        409: { description: "Administrators keep it (second-factor-required)." },
        429: tooMany,
      },
    },
    async (req, res) => {
      const { password, code } = parse(passwordAndCodeRequest, req.body);
      const userId = currentUserId(res);
      const address = addressOf(req);
      const person = await checkPassword(userId, password, address);
      if (person.role === "admin")
        throw new HttpProblem(409, "second-factor-required", "Administrators need codes for signing in.");
      await limits.countCode(userId, address);
      await dataSource.transaction(async (manager) => {
        if (!(await secondFactors.use(userId, code, manager))) throw wrongCode();
        await secondFactors.off(manager, userId);
        await sessions.endAll(userId, { except: currentSessionId(res), connection: manager });
        await log.note("second-factor-off", { userId, address }, manager);
        await tellOwner(manager, person, "second-factor-off");
      });
      await limits.forgiveCode(userId, address);
      res.status(204).end();
    },
  );

  api.route(
    {
      method: "post",
      path: "/account/second-factor/recovery-codes",
      tag,
      summary: "New recovery codes in place of the old ones",
      signedIn: true,
      body: both,
      answers: { 200: { description: "The codes, this once.", schema: codes }, 403: wrong, 429: tooMany },
    },
    async (req, res) => {
      const { password, code } = parse(passwordAndCodeRequest, req.body);
      const userId = currentUserId(res);
      const address = addressOf(req);
      const person = await checkPassword(userId, password, address);
      await limits.countCode(userId, address);
      const made = await dataSource.transaction(async (manager) => {
        if (!(await secondFactors.use(userId, code, manager))) throw wrongCode();
        await log.note("recovery-codes-new", { userId, address }, manager);
        await tellOwner(manager, person, "recovery-codes-new");
        return secondFactors.newRecoveryCodes(manager, userId);
      });
      await limits.forgiveCode(userId, address);
      res.json({ recoveryCodes: made } satisfies RecoveryCodes);
    },
  );
}
