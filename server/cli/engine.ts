import { keysVerb } from "./keysVerb";
import { keyVerb, melodyVerb, transposeVerb } from "./melodyVerbs";
import { takeVerb } from "./takeVerb";
import { BadInput, type Verb } from "./verb";
import { instrumentsVerb, shapesVerb, tensionVerb, waysVerb } from "./waysVerbs";

const verbs: Record<string, Verb> = {
  take: takeVerb,
  melody: melodyVerb,
  key: keyVerb,
  transpose: transposeVerb,
  keys: keysVerb,
  shapes: shapesVerb,
  ways: waysVerb,
  instruments: instrumentsVerb,
  tension: tensionVerb,
};

async function main([name = "", ...args]: string[]): Promise<void> {
  if (name === "--help" || name === "-h" || name === "help") {
    const usages = Object.values(verbs).map(({ usage }) => `${usage}\n`);
    process.stdout.write(usages.join("\n"));
    return;
  }
  const verb = Object.hasOwn(verbs, name) ? verbs[name] : undefined;
  if (!verb)
    throw new BadInput(
      `${name ? `There is no verb "${name}".` : "Name a verb."} Verbs: ${Object.keys(verbs).join(", ")}.`,
    );
  if (args.includes("--help")) {
    process.stdout.write(`${verb.usage}\n`);
    return;
  }
  for await (const line of await verb.run(args)) process.stdout.write(`${JSON.stringify(line)}\n`);
}

main(process.argv.slice(2)).catch((error: unknown) => {
  if (!(error instanceof BadInput)) throw error;
  process.stderr.write(`${error.message.replaceAll("\n", " ")}\n`);
  process.exitCode = 2;
});
