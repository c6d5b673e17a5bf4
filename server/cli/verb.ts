/** Bad input on the command line: the message is the one line that goes to stderr; the exit code is 2. */
export class BadInput extends Error {}

/** One verb of the engine's command line. `run` gives the objects to print, one JSON line each. */
export interface Verb {
  usage: string;
  run(args: string[]): Promise<object[]>;
}
