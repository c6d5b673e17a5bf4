import { parseArgs } from "node:util";
import { benchStrings, conditions, readPluck, stiffness, type BenchReading } from "./tunerCases";
import { missesOf, summarizeErrors, tunerBars } from "./tunerScores";

const usage = "bench:tuner [--seed N] [--plucks N]   plucks of each string, stiffness and condition, 1 by default";

try {
  const options = { seed: { type: "string" }, plucks: { type: "string" }, help: { type: "boolean" } } as const;
  const { seed = "1", plucks = "1", help } = parseArgs({ options }).values;
  if (help) process.stdout.write(`${usage}\n`);
  else run(whole("--seed", seed), whole("--plucks", plucks));
} catch (error) {
  process.stderr.write(`${(error as Error).message}\n`);
  process.exitCode = 2;
}

function whole(option: string, text: string): number {
  const value = Number(text);
  if (!Number.isInteger(value) || value < 1) throw new Error(`${option} takes a whole number above 0.`);
  return value;
}

function run(seed: number, plucks: number): void {
  const readings: BenchReading[] = [];
  for (const [c, condition] of conditions.entries())
    for (const [s, string] of benchStrings.entries())
      for (const [b, stiff] of stiffness.entries())
        for (let k = 0; k < plucks; k++)
          readings.push(readPluck(string, stiff, condition, seed * 100_003 + k * 1009 + c * 97 + s * 11 + b));
  process.stdout.write(
    `${readings.length} plucks of synthetic strings; cents off the first partial 0.9 s after the pluck, seconds to the first reading\n`,
  );
  say("By string", readings, "string");
  say("By stiffness B", readings, "stiffness");
  say("By what stands in the way", readings, "condition");
  const rows = tunerBars.map((bar) => {
    const missed = missesOf(bar, readings).length;
    if (missed > 0) process.exitCode = 1;
    return `| ${bar.name} | ${bar.mostCents} | ${bar.withinS} | ${missed === 0 ? "reached" : `MISSED by ${missed}`} |`;
  });
  process.stdout.write(`\n## Bars\n\n| | cents at most | s at most | |\n|---|---|---|---|\n${rows.join("\n")}\n`);
}

function say(title: string, readings: readonly BenchReading[], by: "string" | "stiffness" | "condition"): void {
  const head = "| | plucks | median | p95 | most | unread | s median | s most | pitchy median | p95 | most | unread |";
  const names = [...new Set(readings.map((reading) => String(reading[by])))];
  const rows = [...names, "all"].map((name) => {
    const those = readings.filter((reading) => name === "all" || String(reading[by]) === name);
    const ours = summarizeErrors(those.map(({ settledCents }) => settledCents));
    const plain = summarizeErrors(those.map(({ pitchyCents }) => pitchyCents));
    const times = summarizeErrors(those.map(({ first }) => first?.afterS ?? null));
    const errors = ({ median, p95, most, unread }: typeof ours, digits: number) =>
      `${median.toFixed(digits)} | ${p95.toFixed(digits)} | ${most.toFixed(digits)} | ${unread}`;
    return `| ${name} | ${those.length} | ${errors(ours, 2)} | ${times.median.toFixed(2)} | ${times.most.toFixed(2)} | ${errors(plain, 1)} |`;
  });
  process.stdout.write(`\n## ${title}\n\n${head}\n|${"---|".repeat(12)}\n${rows.join("\n")}\n`);
}
