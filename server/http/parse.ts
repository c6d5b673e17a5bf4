import type { z } from "zod";
import type { Problem } from "../../shared/contract/problem";
import { HttpProblem } from "./httpProblem";

const mostFields = 20;

/** The one gate for everything that comes in: the value as its contract describes it, or a 422 that names what to mend. */
export function parse<Value>(schema: z.ZodType<Value>, value: unknown): Value {
  const result = schema.safeParse(value, { reportInput: true });
  if (result.success) return result.data;
  const fields = result.error.issues.flatMap(toFields).slice(0, mostFields);
  throw new HttpProblem(422, "invalid", "Some of this cannot be saved as it is.", fields);
}

function toFields(issue: z.core.$ZodIssue): NonNullable<Problem["fields"]> {
  const place = (...more: string[]) => [...issue.path.map(String), ...more].join(".");
  if (issue.code === "unrecognized_keys") {
    return issue.keys.map((key) => ({ path: place(key), message: "This is not known here." }));
  }
  const missing = issue.code === "invalid_type" && issue.input === undefined;
  return [{ path: place(), message: missing ? "This is missing." : issue.message }];
}
