import type { Request, Response } from "express";
import {
  account,
  challengeResponse,
  type ChallengeResponse,
  secondStepRequest,
  sessionResponse,
  type SessionResponse,
  signInRequest,
  signUpRequest,
} from "../../shared/contract/account";
import { addressOf } from "../http/addressOf";
import type { Api } from "../http/api";
import { currentUserId } from "../http/currentUser";
import { HttpProblem, noSession } from "../http/httpProblem";
import { parse } from "../http/parse";
import { tooMany } from "../http/tryBucket";
import { accessTokenLifeS, challengeLifeS, readChallenge, signAccessToken, signChallenge } from "./accessToken";
import { toAccount } from "./accounts.service";
import { type AuthParts, deviceOf, tellOwner } from "./authParts";
import { cancelErasure } from "./erasure";
import { suspended } from "./guard";
import { refuseCommonPassword } from "./newPassword";
import { sameOrigin } from "./sameOrigin";
import { SessionCookie } from "./sessionCookie";
import type { Begun } from "./sessions.service";

const tag = "account";
const session = { name: "Session", schema: sessionResponse };
const otherOrigin = { description: "The request came from a page of another site (other-origin)." };
const challenge = {
  description: "The password is right; a code is needed as well. Send the challenge with it to /auth/second-step.",
  schema: { name: "Challenge", schema: challengeResponse },
};

type Asked = Request<Record<string, string>>;

/** Opening an account, signing in and out, and keeping a session alive. */
export function authRoutes(api: Api, parts: AuthParts): void {
  const { accounts, sessions, secondFactors, limits, log, dataSource } = parts;
  const { tokenSecret, publicOrigin } = parts.settings;
  const cookie = new SessionCookie(publicOrigin?.startsWith("https:") ?? false);

  const answer = async (res: Response, status: number, { userId, sessionId, token }: Begun) => {
    const person = await accounts.person(userId);
    if (person.suspended) throw suspended();
    cookie.write(res, token);
    const body: SessionResponse = {
      accessToken: signAccessToken(tokenSecret, userId, sessionId),
      expiresInS: accessTokenLifeS,
      account: toAccount(person),
    };
    res.status(status).json(body);
  };

  /** After a right password: a session, or the question for a code. */
  const letIn = async (
    req: Asked,
    res: Response,
    status: number,
    person: Awaited<ReturnType<typeof accounts.person>>,
  ) => {
    if (person.suspended) throw suspended();
    if (person.secondFactor) {
      const body: ChallengeResponse = { challenge: signChallenge(tokenSecret, person.id), expiresInS: challengeLifeS };
      res.status(202).json(body);
      return;
    }
    await beginSession(req, res, status, person.id);
  };

  const beginSession = async (req: Asked, res: Response, status: number, userId: string) => {
    const address = addressOf(req);
    if (await cancelErasure(dataSource, userId)) await log.note("erasure-cancelled", { userId, address });
    await log.note("signed-in", { userId, address });
    // Whoever signs in anew from the same browser leaves no session behind that nobody holds.
    const before = cookie.read(req);
    if (before) await sessions.end(before);
    await answer(res, status, await sessions.begin(userId, deviceOf(req)));
  };

  api.router.use("/auth", sameOrigin(publicOrigin));

  api.route(
    {
      method: "post",
      path: "/auth/sign-up",
      tag,
      summary: "Open an account and begin a session; answers the same whether or not the address is known",
      signedIn: false,
      body: { name: "SignUp", schema: signUpRequest },
      answers: {
        201: { description: "Opened; the refresh token is in a cookie.", schema: session },
        202: challenge,
        403: otherOrigin,
        429: tooMany,
      },
    },
    async (req, res) => {
      const { email, password } = parse(signUpRequest, req.body);
      refuseCommonPassword(password, email);
      await limits.countSignUp(email, addressOf(req));
      const { person, isNew } = await accounts.open(email, password);
      if (isNew) await log.note("signed-up", { userId: person.id, address: addressOf(req) });
      await letIn(req, res, 201, person);
    },
  );

  api.route(
    {
      method: "post",
      path: "/auth/sign-in",
      tag,
      summary: "Begin a session; keeps an account that was to be erased",
      signedIn: false,
      body: { name: "SignIn", schema: signInRequest },
      answers: {
        200: { description: "Signed in; the refresh token is in a cookie.", schema: session },
        202: challenge,
        401: { description: "Address or password is wrong (wrong-credentials)." },
        403: { description: "From another site (other-origin), or the account is suspended (suspended)." },
        429: tooMany,
      },
    },
    async (req, res) => {
      const { email, password } = parse(signInRequest, req.body);
      const address = addressOf(req);
      await limits.countSignIn(email, address);
      const person = await accounts.recognise(email, password);
      if (!person) {
        await log.note("sign-in-refused", { userId: null, address });
        throw new HttpProblem(401, "wrong-credentials", "This e-mail address and password do not belong together.");
      }
      await limits.forgiveSignIn(email, address);
      await letIn(req, res, 200, person);
    },
  );

  api.route(
    {
      method: "post",
      path: "/auth/second-step",
      tag,
      summary: "The second step of signing in: a code of the app, or a recovery code",
      signedIn: false,
      body: { name: "SecondStep", schema: secondStepRequest },
      answers: {
        200: { description: "Signed in; the refresh token is in a cookie.", schema: session },
        401: {
          description: "The challenge is too old (challenge-expired), or the code is wrong or used (wrong-code).",
        },
        403: { description: "From another site (other-origin), or the account is suspended (suspended)." },
        429: tooMany,
      },
    },
    async (req, res) => {
      const asked = parse(secondStepRequest, req.body);
      const address = addressOf(req);
      const userId = readChallenge(asked.challenge, tokenSecret);
      if (!userId) throw new HttpProblem(401, "challenge-expired", "That took too long. Type your password again.");
      await limits.countCode(userId, address);
      const used = await secondFactors.use(userId, asked.code);
      if (!used) {
        await log.note("second-step-refused", { userId, address });
        throw new HttpProblem(401, "wrong-code", "This code is not right, or it was used already.", [
          { path: "code", message: "This code is not right, or it was used already." },
        ]);
      }
      await limits.forgiveCode(userId, address);
      const person = await accounts.person(userId);
      if (person.suspended) throw suspended();
      if (used === "recovery") {
        await log.note("recovery-code-used", { userId, address });
        await tellOwner(dataSource, person, "recovery-code-used");
      }
      await beginSession(req, res, 200, userId);
    },
  );

  api.route(
    {
      method: "post",
      path: "/auth/refresh",
      tag,
      summary: "Exchange the refresh cookie for a new access token and a new cookie",
      signedIn: false,
      answers: {
        200: { description: "Refreshed.", schema: session },
        401: { description: "There is no session, or it has ended (no-session)." },
        403: otherOrigin,
      },
    },
    async (req, res) => {
      const token = cookie.read(req);
      if (!token) throw noSession();
      try {
        await answer(res, 200, await sessions.rotate(token));
      } catch (error) {
        if (error instanceof HttpProblem) cookie.clear(res);
        throw error;
      }
    },
  );

  api.route(
    {
      method: "post",
      path: "/auth/sign-out",
      tag,
      summary: "End the session",
      signedIn: false,
      answers: { 204: { description: "Signed out, or there was no session." }, 403: otherOrigin },
    },
    async (req, res) => {
      const token = cookie.read(req);
      if (token) await sessions.end(token);
      cookie.clear(res);
      res.status(204).end();
    },
  );

  api.route(
    {
      method: "get",
      path: "/account",
      tag,
      summary: "Who is signed in",
      signedIn: true,
      answers: { 200: { description: "The account.", schema: { name: "Account", schema: account } } },
    },
    async (_req, res) => {
      res.json(await accounts.get(currentUserId(res)));
    },
  );
}
