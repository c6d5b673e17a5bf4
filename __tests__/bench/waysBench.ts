import { findPreset } from "../../shared/instruments/presets";
import type { KeyName } from "../../shared/music/keyName";
import { findWays } from "../../shared/ways/findWays";
import { forgetShapes } from "../../shared/ways/shapeLibrary";
import { wayCandidates } from "../../shared/ways/wayCandidates";

/** What the ways of a song of twelve chords on a six-string may take, in milliseconds. */
const mostMs = 50;
const runs = { cold: 30, warm: 120 };

/** Twelve chords of an invented song in C, and the order in which they are played. */
const chords = ["C", "F", "G", "Am", "Dm", "Em", "G7", "D7", "Bb", "Fmaj7", "Gsus4", "E7"];
const order = [0, 1, 0, 2, 3, 1, 4, 6, 0, 5, 3, 9, 10, 2, 0, 8, 1, 0, 7, 6, 0, 11, 3, 4, 2, 0];
const sequence = Array.from({ length: 4 }, () => order.map((k) => chords[k]!)).flat();
const inC: KeyName = { tonic: "C", mode: "major" };
const tonics = ["Eb", "A", "F", "B", "D", "Ab"];
const instruments = ["guitar", "guitar-open-g", "ukulele", "banjo", "mandolin", "box-adf"];

// A first search by another instrument lets the program itself warm up, so that cold means no shape known, not no code read.
for (let k = 0; k < 30; k++) ask("guitar-dadgad", k, k < 6);
const yardstick = median(times(40, () => void sorted()));

const rows = instruments.map((id) => {
  const cold = times(runs.cold, (k) => ask(id, k, true));
  const warm = times(runs.warm, (k) => ask(id, k, false));
  return {
    id,
    cold,
    warm,
    weighed: wayCandidates({ chords, sequence, from: inC, to: inC, instrument: findPreset(id)! }).length,
  };
});

const cell = (sample: readonly number[]) => `${median(sample).toFixed(1)} | ${share(sample, 0.95).toFixed(1)}`;
const lines = rows.map(({ id, cold, warm, weighed }) => {
  return `| ${id} | ${weighed} | ${cell(cold)} | ${cell(warm)} | ${(median(warm) / yardstick).toFixed(2)} |`;
});
process.stdout.write(`
## All ways of a song of ${chords.length} chords, ${sequence.length} played, milliseconds of processor time

Cold: no shape of the instrument is known yet. Warm: the same instrument again, another key each time. The ratio compares
the warm median with sorting 100,000 numbers on this machine (${yardstick.toFixed(1)} ms).

| instrument | ways weighed | cold p50 | cold p95 | warm p50 | warm p95 | ratio |
|---|---|---|---|---|---|---|
${lines.join("\n")}
`);
const { cold, warm } = rows[0]!;
const met = median(cold) <= mostMs && share(warm, 0.95) <= mostMs;
process.stdout.write(
  `\nSix-string in standard tuning, cold p50 and warm p95 in ${mostMs} ms: ${met ? "reached" : "NOT REACHED"}\n`,
);
if (!met) process.exitCode = 1;

function ask(id: string, k: number, forget: boolean): void {
  if (forget) forgetShapes();
  const to: KeyName = { tonic: tonics[k % tonics.length]!, mode: "major" };
  findWays({ chords, sequence, from: inC, to, instrument: findPreset(id)! });
}

function sorted(): Float64Array {
  let state = 7;
  return Float64Array.from({ length: 100_000 }, () => (state = (state * 48271) % 2147483647)).sort();
}

function times(count: number, run: (k: number) => void): number[] {
  return Array.from({ length: count }, (_, k) => {
    // Processor time, so that other work on the machine does not count; a machine at rest needs no longer by the clock.
    const from = process.cpuUsage();
    run(k);
    const { user, system } = process.cpuUsage(from);
    return (user + system) / 1000;
  }).sort((a, b) => a - b);
}

function share(ordered: readonly number[], part: number): number {
  return ordered[Math.min(ordered.length - 1, Math.floor(part * ordered.length))]!;
}

function median(ordered: readonly number[]): number {
  return share(ordered, 0.5);
}
