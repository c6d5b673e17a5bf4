import type { Response } from "express";
import type { DataSource } from "typeorm";
import {
  account,
  type Account,
  sessionResponse,
  type SessionResponse,
  signInRequest,
  signUpRequest,
} from "../../shared/contract/account";
import type { Api } from "../http/api";
import { currentUserId } from "../http/currentUser";
import { HttpProblem, noSession } from "../http/httpProblem";
import { parse } from "../http/parse";
import { accessTokenLifeS, signAccessToken } from "./accessToken";
import { AccountsService } from "./accounts.service";
import { sameOrigin } from "./sameOrigin";
import { SessionCookie } from "./sessionCookie";
import { SessionsService } from "./sessions.service";
import { TryLimits } from "./tryLimits";

interface AuthSettings {
  tokenSecret: string;
  publicOrigin: string | null;
}

const tag = "account";
const session = { name: "Session", schema: sessionResponse };
const isTaken = { description: "There is an account with this address (email-taken)." };
const tooMany = { description: "Tried too often (too-many-tries); Retry-After tells the seconds to wait." };
const otherOrigin = { description: "The request came from a page of another site (other-origin)." };

/** Opening an account, signing in and out, and keeping a session alive. */
export function authRoutes(api: Api, dataSource: DataSource, { tokenSecret, publicOrigin }: AuthSettings): void {
  const accounts = new AccountsService(dataSource);
  const sessions = new SessionsService(dataSource);
  const limits = new TryLimits(dataSource);
  const cookie = new SessionCookie(publicOrigin?.startsWith("https:") ?? false);

  const answer = (res: Response, status: number, person: Account, refreshToken: string) => {
    cookie.write(res, refreshToken);
    const body: SessionResponse = {
      accessToken: signAccessToken(tokenSecret, person.id),
      expiresInS: accessTokenLifeS,
      account: person,
    };
    res.status(status).json(body);
  };

  api.router.use("/auth", sameOrigin(publicOrigin));

  api.route(
    {
      method: "post",
      path: "/auth/sign-up",
      tag,
      summary: "Open an account and begin a session",
      signedIn: false,
      body: { name: "SignUp", schema: signUpRequest },
      answers: {
        201: { description: "Opened; the refresh token is in a cookie.", schema: session },
        403: otherOrigin,
        409: isTaken,
        429: tooMany,
      },
    },
    async (req, res) => {
      const { email, password } = parse(signUpRequest, req.body);
      await limits.countSignUp(req.ip ?? "");
      const person = await accounts.open(email, password);
      answer(res, 201, person, await sessions.begin(person.id));
    },
  );

  api.route(
    {
      method: "post",
      path: "/auth/sign-in",
      tag,
      summary: "Begin a session",
      signedIn: false,
      body: { name: "SignIn", schema: signInRequest },
      answers: {
        200: { description: "Signed in; the refresh token is in a cookie.", schema: session },
        401: { description: "Address or password is wrong (wrong-credentials)." },
        403: otherOrigin,
        429: tooMany,
      },
    },
    async (req, res) => {
      const { email, password } = parse(signInRequest, req.body);
      const address = req.ip ?? "";
      await limits.countSignIn(email, address);
      const person = await accounts.recognise(email, password);
      if (!person)
        throw new HttpProblem(401, "wrong-credentials", "This e-mail address and password do not belong together.");
      await limits.forgiveSignIn(email, address);
      answer(res, 200, person, await sessions.begin(person.id));
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
        const next = await sessions.rotate(token);
        answer(res, 200, await accounts.get(next.userId), next.token);
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
