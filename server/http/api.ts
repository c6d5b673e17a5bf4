import { type RequestHandler, Router } from "express";
import type { z } from "zod";
import { HttpProblem } from "./httpProblem";

/** A schema and the name under which the API's description lists it. */
export interface NamedSchema {
  name: string;
  schema: z.ZodType;
}

/** One possible answer of an operation; without a schema or a media type it has no body. */
export interface Answer {
  description: string;
  schema?: NamedSchema;
  list?: boolean;
  /** what is sent instead of JSON */
  mediaType?: string;
}

/** One operation of the API as it is described to others. */
export interface Operation {
  method: "get" | "post" | "put" | "delete";
  /** below /api, in Express' notation */
  path: string;
  tag: string;
  summary: string;
  /** needs an access token */
  signedIn: boolean;
  body?: NamedSchema;
  /** what may stand behind the question mark; the handler reads it through the same schema */
  query?: z.ZodObject;
  answers: Readonly<Record<number, Answer>>;
}

/** Collects routes together with their description, so that neither exists without the other. */
export class Api {
  readonly router = Router();
  readonly operations: Operation[] = [];

  constructor(private readonly authenticate: RequestHandler) {}

  route(operation: Operation, handler: RequestHandler<Record<string, string>>): void {
    this.operations.push(operation);
    const before: RequestHandler[] = [];
    if (operation.signedIn) before.push(this.authenticate);
    if (operation.body) before.push(requireJson);
    this.router[operation.method](operation.path, ...before, handler as RequestHandler);
  }
}

/** A form of another site can send text and form data across origins, but not JSON. */
const requireJson: RequestHandler = (req, _res, next) => {
  if (req.is("application/json") === false) {
    throw new HttpProblem(415, "unsupported-media-type", "Send JSON, with Content-Type: application/json.");
  }
  next();
};
