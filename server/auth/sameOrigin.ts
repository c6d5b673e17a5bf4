import type { Request, RequestHandler } from "express";
import { HttpProblem } from "../http/httpProblem";

/** Refuses requests that a page of another site made a browser send. Programs that are no browser name no origin. */
export function sameOrigin(publicOrigin: string | null): RequestHandler {
  return (req, _res, next) => {
    if (!cameFromHere(req, publicOrigin)) {
      throw new HttpProblem(403, "other-origin", "This request came from another site.");
    }
    next();
  };
}

function cameFromHere(req: Request, publicOrigin: string | null): boolean {
  const site = req.get("sec-fetch-site");
  if (site !== undefined) return site === "same-origin" || site === "none";
  const origin = req.get("origin");
  if (origin === undefined) return true;
  if (origin === publicOrigin) return true;
  return publicOrigin === null && URL.canParse(origin) && new URL(origin).host === req.get("host");
}
