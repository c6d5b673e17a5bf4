import jwt from "jsonwebtoken";
import { z } from "zod";
import { noSession } from "../http/httpProblem";

export const accessTokenLifeS = 600;
export const challengeLifeS = 300;

const issuer = "larkspan";
/** Whom a token is for; one for the second step opens nothing else. */
const api = "api";
const secondStep = "second-step";
const claims = z.object({ sub: z.uuid(), sid: z.uuid() });
const challengeClaims = z.object({ sub: z.uuid() });

export function signAccessToken(secret: string, userId: string, sessionId: string): string {
  return jwt.sign({ sid: sessionId }, secret, {
    algorithm: "HS256",
    issuer,
    audience: api,
    subject: userId,
    expiresIn: accessTokenLifeS,
  });
}

/** Who asks, by the Authorization header. */
export function readAccessToken(given: string, secret: string): { userId: string; sessionId: string } {
  if (!/^Bearer\b/i.test(given)) throw noSession();
  const token = /^Bearer ([\w-]+\.[\w-]+\.[\w-]+)$/i.exec(given)?.[1];
  if (!token) throw notValid();
  try {
    const { sub, sid } = claims.parse(jwt.verify(token, secret, { algorithms: ["HS256"], issuer, audience: api }));
    return { userId: sub, sessionId: sid };
  } catch (error) {
    throw error instanceof jwt.TokenExpiredError
      ? noSession("Your access has expired. Refresh it, or sign in again.")
      : notValid();
  }
}

const notValid = () => noSession("This access token is not valid.");

/** Says that somebody has given the right password; good only for the second step of signing in. */
export function signChallenge(secret: string, userId: string): string {
  return jwt.sign({}, secret, {
    algorithm: "HS256",
    issuer,
    audience: secondStep,
    subject: userId,
    expiresIn: challengeLifeS,
  });
}

/** Whose challenge it is; null if it is none of ours, or too old. */
export function readChallenge(token: string, secret: string): string | null {
  try {
    return challengeClaims.parse(jwt.verify(token, secret, { algorithms: ["HS256"], issuer, audience: secondStep }))
      .sub;
  } catch {
    return null;
  }
}
