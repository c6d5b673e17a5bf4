import type { Problem } from "../../shared/contract/problem";

/** An answer other than success, thrown by services and handlers and written by the error handler. */
export class HttpProblem extends Error {
  constructor(
    readonly status: number,
    readonly code: string,
    message: string,
    readonly fields?: Problem["fields"],
    readonly headers: Readonly<Record<string, string>> = {},
  ) {
    super(message);
  }

  toBody(): Problem {
    return { code: this.code, message: this.message, ...(this.fields ? { fields: this.fields } : {}) };
  }
}

export const notFound = (what: string) => new HttpProblem(404, "not-found", `There is no such ${what}.`);

export const noSession = (message = "You are not signed in.") => new HttpProblem(401, "no-session", message);
