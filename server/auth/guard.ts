import type { RequestHandler } from "express";
import type { DataSource } from "typeorm";
import type { Role } from "../../shared/contract/account";
import type { Guard } from "../http/api";
import { setCurrentSessionId, setCurrentUserId } from "../http/currentUser";
import { HttpProblem, noSession } from "../http/httpProblem";
import { readAccessToken } from "./accessToken";
import { type Permission, permissions } from "./permissions";

interface Standing {
  role: Role;
  confirmed: boolean;
  suspended: boolean;
  secondFactor: boolean;
}

/** Stands in front of every route: lets through whom the table of permissions lets through, and notes who asks. */
export function createGuard(dataSource: DataSource, secret: string): Guard {
  return ({ id, signedIn }) => {
    const permission = permissions[id];
    if (!permission) throw new RangeError(`Nobody said who may ask for ${id}: add it to server/auth/permissions.ts.`);
    if ((permission.who === "visitor") === signedIn)
      throw new RangeError(`${id}: signedIn and permissions.ts disagree.`);
    return signedIn ? [inFrontOf(permission, dataSource, secret)] : [];
  };
}

function inFrontOf(permission: Permission, dataSource: DataSource, secret: string): RequestHandler {
  return async (req, res, next) => {
    const { userId, sessionId } = readAccessToken(req.get("authorization") ?? "", secret);
    // Asked anew for every request, so that ending a session, a suspension or another role takes effect at once.
    const rows: Standing[] = await dataSource.query(
      `SELECT u.role, u.confirmed_at IS NOT NULL AS confirmed, u.suspended_at IS NOT NULL AS suspended,
              EXISTS (SELECT FROM second_factors f WHERE f.user_id = u.id AND f.confirmed_at IS NOT NULL) AS "secondFactor"
       FROM sessions s JOIN users u ON u.id = s.user_id
       WHERE s.id = $1 AND s.user_id = $2 AND s.revoked_at IS NULL AND s.expires_at > now()`,
      [sessionId, userId],
    );
    const [standing] = rows;
    if (!standing) throw noSession("Your session has ended. Sign in again.");
    // Before anything is refused, so that the log says to whom.
    setCurrentUserId(res, userId);
    setCurrentSessionId(res, sessionId);
    refuse(permission, standing);
    next();
  };
}

function refuse({ who, confirmed }: Permission, standing: Standing): void {
  if (standing.suspended) throw suspended();
  if (typeof who !== "string" && !who.includes(standing.role))
    throw new HttpProblem(403, "not-allowed", "Your account may not do this.");
  if (typeof who !== "string" && standing.role === "admin" && !standing.secondFactor)
    throw new HttpProblem(
      403,
      "second-factor-required",
      "Set up codes for signing in first: administrators need them.",
    );
  if (confirmed && !standing.confirmed)
    throw new HttpProblem(403, "unconfirmed", "Confirm your e-mail address first, by the link we sent you.");
}

export const suspended = () =>
  new HttpProblem(403, "suspended", "This account is suspended. Write to whoever runs this server.");
