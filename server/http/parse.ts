import type { z } from "zod";
import type { Problem } from "../../shared/contract/problem";
import { HttpProblem } from "./httpProblem";

const mostFields = 20;

/** The one gate for everything that comes in: the value as its contract describes it, or a 422 that names what to mend. */
export function parse<Value>(
  schema: z.ZodType<Value>,
  value: unknown,
  refusal = "Some of this cannot be saved as it is.",
): Value {
  const result = schema.safeParse(value, { error: sentence });
  if (result.success) return result.data;
  const fields = result.error.issues.flatMap(toFields).slice(0, mostFields);
  throw new HttpProblem(422, "invalid", refusal, fields);
}

function toFields(issue: z.core.$ZodIssue): NonNullable<Problem["fields"]> {
  const place = (...more: string[]) => [...issue.path.map(String), ...more].join(".");
  if (issue.code !== "unrecognized_keys") return [{ path: place(), message: issue.message }];
  return issue.keys.map((key) => ({ path: place(key), message: "This is not known here." }));
}

/** What to say where the contract has no words of its own. */
function sentence(issue: z.core.$ZodRawIssue): string {
  switch (issue.code) {
    case "invalid_type":
      return issue.input === undefined ? "This is missing." : `This must be of the type ${issue.expected}.`;
    case "too_small":
      return issue.origin === "number" || issue.origin === "int"
        ? `This must be ${issue.inclusive ? "at least" : "more than"} ${issue.minimum}.`
        : `This must have at least ${counted(issue.minimum, issue.origin)}.`;
    case "too_big":
      return issue.origin === "number" || issue.origin === "int"
        ? `This must be ${issue.inclusive ? "at most" : "less than"} ${issue.maximum}.`
        : `This may have at most ${counted(issue.maximum, issue.origin)}.`;
    case "invalid_value":
      return `This must be one of: ${issue.values.map(String).join(", ")}.`;
    case "invalid_format":
      return issue.format === "datetime"
        ? "Give date and time as in 2026-11-24T19:20:00Z."
        : `This is not a valid ${issue.format}.`;
    default:
      return "This has none of the known forms.";
  }
}

function counted(count: number | bigint, origin: string): string {
  const [one, more] = origin === "string" ? ["character", "characters"] : ["entry", "entries"];
  return `${count} ${Number(count) === 1 ? one : more}`;
}
