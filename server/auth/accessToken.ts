import type { RequestHandler } from "express";
import jwt from "jsonwebtoken";
import { z } from "zod";
import { setCurrentUserId } from "../http/currentUser";
import { noSession } from "../http/httpProblem";

export const accessTokenLifeS = 600;

const issuer = "larkspan";
const claims = z.object({ sub: z.uuid() });

export function signAccessToken(secret: string, userId: string): string {
  return jwt.sign({}, secret, { algorithm: "HS256", issuer, subject: userId, expiresIn: accessTokenLifeS });
}

/** Lets only requests with a valid access token through, and notes who asks. */
export function authenticate(secret: string): RequestHandler {
  return (req, res, next) => {
    const given = req.get("authorization") ?? "";
    if (!/^Bearer\b/i.test(given)) throw noSession();
    const token = /^Bearer ([\w-]+\.[\w-]+\.[\w-]+)$/i.exec(given)?.[1];
    if (!token) throw notValid();
    setCurrentUserId(res, subjectOf(token, secret));
    next();
  };
}

const notValid = () => noSession("This access token is not valid.");

function subjectOf(token: string, secret: string): string {
  try {
    return claims.parse(jwt.verify(token, secret, { algorithms: ["HS256"], issuer })).sub;
  } catch (error) {
    throw error instanceof jwt.TokenExpiredError
      ? noSession("Your access has expired. Refresh it, or sign in again.")
      : notValid();
  }
}
