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
  method: "get" | "post" | "put" | "delete" | "head" | "patch";
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

/** What stands in front of an operation: whom it lets through. */
export type Guard = (operation: { id: string; signedIn: boolean }) => RequestHandler[];

/** The name of an operation: its method and the words of its path, such as "putSongsId". */
export function operationId({ method, path }: Pick<Operation, "method" | "path">): string {
  return `${method}${path.replace(/[/:.-]+(\w)/g, (_, letter: string) => letter.toUpperCase())}`;
}

/** Collects routes together with their description, so that neither exists without the other. */
export class Api {
  readonly router = Router();
  readonly operations: Operation[] = [];

  constructor(private readonly guard: Guard) {}

  route(operation: Operation, handler: RequestHandler<Record<string, string>>): void {
    this.operations.push(operation);
    const before = this.guard({ id: operationId(operation), signedIn: operation.signedIn });
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
