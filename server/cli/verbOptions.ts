import { parseArgs, type ParseArgsConfig } from "node:util";
import { parseKeyName, type KeyName } from "../../shared/music/keyName";
import { parseNoteName } from "../../shared/music/pitch";
import { BadInput } from "./verb";

interface Options {
  values: Record<string, string | undefined>;
  flags: ReadonlySet<string>;
  rest: string[];
}

/** Splits arguments into named values, flags and the rest; what is not known is bad input. A value may begin with "-". */
export function readOptions(args: readonly string[], names: readonly string[], flags: readonly string[] = []): Options {
  const options: NonNullable<ParseArgsConfig["options"]> = {};
  for (const name of names) options[name] = { type: "string" };
  for (const flag of flags) options[flag] = { type: "boolean" };
  const joined = joinValues(args, names);
  try {
    const { values, positionals } = parseArgs({ args: joined, options, allowPositionals: true });
    const strings = Object.entries(values).filter((entry): entry is [string, string] => typeof entry[1] === "string");
    return {
      values: Object.fromEntries(strings),
      flags: new Set(flags.filter((flag) => values[flag] === true)),
      rest: positionals,
    };
  } catch (error) {
    throw new BadInput(error instanceof Error ? error.message.split(". ")[0]! + "." : "The options cannot be read.");
  }
}

/**
 * "--shift -2" as "--shift=-2": otherwise the value would be taken for an option.
 *
 * @throws BadInput where a value is missing
 */
function joinValues(args: readonly string[], names: readonly string[]): string[] {
  const joined: string[] = [];
  for (let k = 0; k < args.length; k++) {
    const next = args[k + 1];
    if (names.some((name) => args[k] === `--${name}`) && next !== undefined && !next.startsWith("--")) {
      joined.push(`${args[k]}=${next}`);
      k++;
    } else if (names.some((name) => args[k] === `--${name}`)) throw new BadInput(`${args[k]} wants a value.`);
    else joined.push(args[k]!);
  }
  return joined;
}

export function required(value: string | undefined, name: string): string {
  if (value === undefined || value === "") throw new BadInput(`--${name} is missing.`);
  return value;
}

/** "E2-E4" as two MIDI numbers, low to high. */
export function readBand(text: string, name: string): { lowMidi: number; highMidi: number } {
  const match = /^(.*\d)\s*[-–—]\s*(.*\d)$/.exec(text.trim());
  const lowMidi = match ? parseNoteName(match[1]!) : null;
  const highMidi = match ? parseNoteName(match[2]!) : null;
  if (lowMidi === null || highMidi === null)
    throw new BadInput(`--${name} wants two notes such as E2-E4, not "${text}".`);
  if (lowMidi > highMidi) throw new BadInput(`--${name} runs from low to high, not "${text}".`);
  if (lowMidi < 0 || highMidi > 127) throw new BadInput(`--${name} lies outside the notes C-1 to G9.`);
  return { lowMidi, highMidi };
}

export function readKey(text: string, name: string): KeyName {
  const key = parseKeyName(text);
  if (!key) throw new BadInput(`--${name} wants a key such as D, Bb or F#m, not "${text}".`);
  return key;
}

export function readWhole(text: string, name: string, least: number, most: number): number {
  const value = Number(text);
  if (text.trim() === "" || !Number.isInteger(value) || value < least || value > most)
    throw new BadInput(`--${name} wants a whole number from ${least} to ${most}, not "${text}".`);
  return value;
}
