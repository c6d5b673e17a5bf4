import { z } from "zod";
import { ownInstrument } from "../../shared/contract/instrument";
import { song } from "../../shared/contract/song";
import { HttpProblem } from "./httpProblem";
import { parse } from "./parse";

function fieldsOf(schema: z.ZodType, value: unknown) {
  try {
    parse(schema, value);
  } catch (error) {
    if (error instanceof HttpProblem) return error.fields;
    throw error;
  }
  return null;
}

it("returns what fits, trimmed as the contract says", () => {
  expect(parse(z.strictObject({ title: z.string().trim() }), { title: " Ferry " })).toEqual({ title: "Ferry" });
});

it.each([
  [z.string(), 1, "This must be of the type string."],
  [z.string(), undefined, "This is missing."],
  [z.number().min(0), -1, "This must be at least 0."],
  [z.number().positive(), 0, "This must be more than 0."],
  [z.int().max(5), 6, "This must be at most 5."],
  [z.number().max(5), Number.NaN, "This must be of the type number."],
  [z.string().max(2), "abc", "This may have at most 2 characters."],
  [z.array(z.int()).min(1), [], "This must have at least 1 entry."],
  [z.enum(["brass", "nylon"]), "hair", "This must be one of: brass, nylon."],
  [z.uuid(), "1", "This is not a valid uuid."],
  [z.iso.datetime(), "tomorrow", "Give date and time as in 2026-11-24T19:20:00Z."],
  [z.string().min(12, "Use at least 12 characters."), "short", "Use at least 12 characters."],
])("says in a sentence what is wrong, in the contract's own words where it has some (%#)", (schema, value, message) => {
  expect(fieldsOf(schema, value)).toEqual([{ path: "", message }]);
});

it("names the place of each fault", () => {
  const fields = fieldsOf(ownInstrument.pick({ strings: true }), {
    strings: [{ note: "A3", gaugeIn: 1, material: "nylon", colour: "red" }],
  });
  expect(fields).toEqual([
    { path: "strings.0.gaugeIn", message: "This must be at most 0.3." },
    { path: "strings.0.colour", message: "This is not known here." },
  ]);
});

it("names the kind of tune that it does not know", () => {
  const fields = fieldsOf(song.pick({ tune: true }), { tune: { kind: "whistled" } });
  expect(fields).toMatchObject([{ path: expect.stringMatching(/^tune/), message: expect.stringMatching(/\.$/) }]);
});
