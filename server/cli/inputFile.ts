import { readFile, stat } from "node:fs/promises";
import { BadInput } from "./verb";

/**
 * Reads a file that was named on the command line.
 *
 * @param most bytes, and the same in words for the message
 * @throws BadInput if it is missing, no file, larger than that, or not to be read
 */
export async function readInput(path: string, most: { bytes: number; words: string }): Promise<Buffer> {
  const facts = await stat(path).catch(() => null);
  if (!facts) throw new BadInput(`${path}: there is no such file.`);
  if (!facts.isFile()) throw new BadInput(`${path}: this is no file.`);
  if (facts.size > most.bytes) throw new BadInput(`${path}: this file is larger than ${most.words}.`);
  return readFile(path).catch(() => {
    throw new BadInput(`${path}: this file cannot be read.`);
  });
}

/** No chart and no melody is larger. */
export const songSize = { bytes: 5_000_000, words: "5 MB" };
