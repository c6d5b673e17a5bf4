/** Bad input on the command line: the message is the one line that goes to stderr; the exit code is 2. */
export class BadInput extends Error {}

/** One verb of the engine's command line. `run` gives the objects to print, one JSON line each; it may give some and then fail. */
export interface Verb {
  usage: string;
  run(args: string[]): Promise<object[]> | AsyncIterable<object>;
}

/**
 * A line for each file that can be used, in their order. Files that cannot be used silence no others: they are told
 * together at the end.
 *
 * @throws BadInput naming the first bad file, and how many there are
 */
export async function* eachFile(
  files: readonly string[],
  read: (file: string) => Promise<object>,
): AsyncGenerator<object> {
  const bad: BadInput[] = [];
  for (const file of files) {
    try {
      yield await read(file);
    } catch (error) {
      if (!(error instanceof BadInput)) throw error;
      bad.push(error);
    }
  }
  const [first] = bad;
  if (!first) return;
  throw files.length === 1
    ? first
    : new BadInput(`${first.message} ${bad.length} of ${files.length} files could not be used.`);
}
