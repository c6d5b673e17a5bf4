import type { Response } from "express";
import { noSession } from "./httpProblem";

/** Who asks; set by the authentication in front of every route that needs it. */
export function currentUserId(res: Response): string {
  const id: unknown = res.locals.userId;
  if (typeof id !== "string") throw noSession();
  return id;
}

export function setCurrentUserId(res: Response, id: string): void {
  res.locals.userId = id;
}

/** The session by which they ask. */
export function currentSessionId(res: Response): string {
  const id: unknown = res.locals.sessionId;
  if (typeof id !== "string") throw noSession();
  return id;
}

export function setCurrentSessionId(res: Response, id: string): void {
  res.locals.sessionId = id;
}
