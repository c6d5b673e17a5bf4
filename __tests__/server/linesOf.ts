import type { Verb } from "../../server/cli/verb";

/** All lines that a verb gives; rejects where it ends with bad input. */
export async function linesOf(verb: Verb, args: string[]): Promise<object[]> {
  const lines: object[] = [];
  for await (const line of await verb.run(args)) lines.push(line);
  return lines;
}
