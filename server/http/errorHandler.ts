import type { ErrorRequestHandler, RequestHandler } from "express";
import type { Api } from "./api";
import { databaseProblem } from "./databaseProblem";
import { HttpProblem } from "./httpProblem";

interface BodyParserError extends Error {
  type: string;
  status: number;
}

/** Every address under /api that no route knows, and every method that a known one does not have. */
export function unknownRoute({ operations }: Pick<Api, "operations">): RequestHandler {
  const patterns = operations.map(({ method, path }) => ({
    method: method.toUpperCase(),
    path: new RegExp(`^${path.replace(/:\w+/g, "[^/]+")}/?$`, "i"),
  }));
  return (req) => {
    const known = patterns.filter(({ path }) => path.test(req.path)).map(({ method }) => method);
    if (known.length === 0)
      throw new HttpProblem(404, "not-found", `There is nothing at ${req.method} ${req.baseUrl}${req.path}.`);
    const allowed = [...new Set(known.flatMap((method) => (method === "GET" ? ["GET", "HEAD"] : [method])))].join(", ");
    throw new HttpProblem(405, "method-not-allowed", `${req.baseUrl}${req.path} takes ${allowed}.`, undefined, {
      Allow: allowed,
    });
  };
}

/** The one place where an error becomes an answer. What it does not know is logged and told as a 500 without details. */
export const errorHandler: ErrorRequestHandler = (error: unknown, req, res, next) => {
  if (res.headersSent) {
    next(error);
    return;
  }
  const problem = error instanceof HttpProblem ? error : (bodyProblem(error) ?? databaseProblem(error));
  if (!problem || problem.status >= 500) req.log.error(error);
  const answer =
    problem ?? new HttpProblem(500, "fault", "Something went wrong on our side. Nothing of yours was changed.");
  if (answer.status === 401) res.set("WWW-Authenticate", "Bearer");
  res.locals.refusal = answer.code;
  res.set(answer.headers).status(answer.status).json(answer.toBody());
};

function bodyProblem(error: unknown): HttpProblem | null {
  if (!isBodyParserError(error)) return null;
  switch (error.type) {
    case "entity.parse.failed":
      return new HttpProblem(400, "malformed-json", "The request is not valid JSON.");
    case "entity.too.large":
      return new HttpProblem(413, "too-large", "This is too large: a request may have at most 2 MB.");
    case "encoding.unsupported":
    case "charset.unsupported":
      return new HttpProblem(415, "unsupported-media-type", "Send JSON in UTF-8.");
    default:
      return new HttpProblem(400, "malformed-request", "The request could not be read.");
  }
}

/** Errors of Express and its body parser carry a 4xx status; a bad percent sign in an address has no type. */
function isBodyParserError(error: unknown): error is BodyParserError {
  return (
    error instanceof Error &&
    "status" in error &&
    typeof error.status === "number" &&
    error.status >= 400 &&
    error.status < 500
  );
}
