import { readdirSync, readFileSync } from "node:fs";
import { join } from "node:path";

const root = join(__dirname, "..", "..", "shared");
const files = readdirSync(root, { recursive: true, encoding: "utf8" }).filter((file) => /(?<!\.test)\.ts$/.test(file));
const examples = files.flatMap((file) =>
  [...readFileSync(join(root, file), "utf8").matchAll(/@example (.+?) \/\/ => (.+)/g)].map(
    (match) => [file, match[1] ?? "", match[2] ?? ""] as const,
  ),
);

test.each(examples)("%s: %s is %s", (file, code, value) => {
  const exported = jest.requireActual<Record<string, unknown>>(join(root, file));
  const run = (source: string): unknown =>
    new Function(...Object.keys(exported), `return (${source})`)(...Object.values(exported));
  expect(run(code)).toEqual(run(value));
});
