import { QueryFailedError } from "typeorm";
import { HttpProblem, noSession } from "./httpProblem";

interface DriverError {
  code?: string;
  constraint?: string;
  detail?: string;
}

const unreachable = /^(08|57P|3D000|53300|ECONN|ENOTFOUND|ETIMEDOUT|EPIPE)/;
const timeouts = /timeout|Connection terminated|connection is insecure/i;

/** What a refusal by the database means for the person who asked; null if it is a fault of ours. */
export function databaseProblem(error: unknown): HttpProblem | null {
  if (!(error instanceof Error)) return null;
  const cause: DriverError =
    error instanceof QueryFailedError ? (error.driverError as DriverError) : (error as DriverError);
  const code = typeof cause.code === "string" ? cause.code : "";
  if (code === "23503") return brokenReference(cause);
  if (code === "23505")
    return new HttpProblem(409, "conflict", "This was changed in another place at the same time. Try again.");
  // Deadlock, serialization, lock not to be had, statement took too long.
  if (/^(40P01|40001|55P03|57014)$/.test(code))
    return new HttpProblem(503, "busy", "The server is very busy. Nothing was lost; try again in a moment.");
  // Class 22: text or numbers that no column can hold, such as a NUL character.
  if (/^22...$/.test(code))
    return new HttpProblem(422, "invalid", "This holds characters or numbers that cannot be stored.");
  if (unreachable.test(code) || (error.constructor === Error && timeouts.test(error.message))) {
    return new HttpProblem(
      503,
      "unavailable",
      "The server cannot reach its database. Nothing was lost; try again in a moment.",
    );
  }
  return null;
}

function brokenReference({ constraint = "", detail = "" }: DriverError): HttpProblem {
  if (constraint.endsWith("_owner")) return noSession("This account no longer exists.");
  const column = /Key \((?:[a-z_]+, )*([a-z_]+)\)=/.exec(detail)?.[1] ?? "";
  const path = column.replace(/_([a-z])/g, (_, letter: string) => letter.toUpperCase());
  return new HttpProblem(422, "unknown-reference", "This refers to something that is not in your account.", [
    { path, message: "There is no such item in your account." },
  ]);
}
