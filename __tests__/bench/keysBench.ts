import { performance } from "node:perf_hooks";
import { parseArgs } from "node:util";
import fc from "fast-check";
import type { SingingVoice, Tune } from "../../shared/keys/keyScore";
import { scoreKeys } from "../../shared/keys/scoreKeys";
import { scoreSharedKeys } from "../../shared/keys/sharedKey";
import { voiceTypes } from "../../shared/keys/voiceTypes";
import { keyLaws } from "../engine/keyLaws";
import { amongBestTwo, otherBands, printedKeyHits, type UnisonBand, usualBand } from "../engine/printedKeyHits";
import { sharedKeyLaws } from "../engine/sharedKeyLaws";
import { voicePairMoves } from "../engine/voicePairMoves";

const usage = "bench:keys [--laws [--runs N]]";
/** What ranking 24 keys of a tune of a thousand notes may take, in milliseconds. */
const mostMs = 5;

try {
  const options = { laws: { type: "boolean" }, runs: { type: "string" }, help: { type: "boolean" } } as const;
  const { laws, runs, help } = parseArgs({ options }).values;
  if (help) process.stdout.write(`${usage}\n`);
  else if (laws) runLaws(Number(runs ?? 10_000));
  else {
    if (runs !== undefined) throw new Error("--runs goes with --laws.");
    speed();
    printed();
    pairs();
  }
} catch (error) {
  process.stderr.write(`${(error as Error).message}\n`);
  process.exitCode = 2;
}

function speed(): void {
  const maren = voiceTypes.find(({ id }) => id === "alto")!.voice;
  const tom = voiceTypes.find(({ id }) => id === "baritone")!.voice;
  const tune = longTune(1000);
  const both = (voice: SingingVoice) => [
    scoreKeys(tune, voice, { mode: "major" }),
    scoreKeys(tune, voice, { mode: "minor" }),
  ];
  const rows = [
    ["24 keys: 12 tonics, major and minor, one voice", timesOf(() => both(maren))],
    ["24 keys: 12 tonics, two voices", timesOf(() => [scoreKeys(tune, maren), scoreKeys(tune, tom)])],
    ["12 shared keys, nine voices", timesOf(() => scoreSharedKeys(tune, voiceTypes))],
  ] as const;
  const lines = rows.map(([name, times]) => `| ${name} | ${at(times, 0.5)} | ${at(times, 0.95)} | ${at(times, 1)} |`);
  const met = rows.slice(0, 2).every(([, times]) => Number(at(times, 0.95)) <= mostMs);
  say(
    "Ranking keys of a tune of 1,000 notes, milliseconds",
    ["| | p50 | p95 | most |", "|---|---|---|---|", ...lines].join("\n") +
      `\n\n24 keys in ${mostMs} ms at the 95th percentile: ${met ? "reached" : "NOT REACHED"}`,
  );
  if (!met) process.exitCode = 1;
}

/** Made notes of a fixed seed, spread over an octave and a half as tunes are. */
function longTune(count: number): Tune {
  let state = 7;
  const next = (below: number) => (state = (state * 48271) % 2147483647) % below;
  const notes = Array.from({ length: count }, (_, start) => {
    return { start, duration: [0.25, 0.5, 1, 1.5, 2, 4][next(6)]!, midi: 55 + next(19) };
  });
  return { kind: "melody", notes, home: "G" };
}

function timesOf(run: () => unknown): number[] {
  for (let k = 0; k < 50; k++) run();
  const times = Array.from({ length: 500 }, () => {
    const from = performance.now();
    run();
    return performance.now() - from;
  });
  return times.sort((a, b) => a - b);
}

function at(sorted: readonly number[], share: number): string {
  return sorted[Math.min(sorted.length - 1, Math.floor(share * sorted.length))]!.toFixed(2);
}

function printed(): void {
  const hits = printedKeyHits(usualBand);
  const rate = amongBestTwo(hits);
  const rows = hits.map(
    ({ name, printed: tonics, place, first, printedIn }) =>
      `| ${name} | ${tonics.join(", ")} | ${place} | ${first.join(" ")} | ${printedIn} |`,
  );
  say(
    `Keys that books print (from memory), for the usual unison band: ${usualBand.name}`,
    `${usualBand.source}\n\n| tune | printed in | place of ours | our first three | book |\n|---|---|---|---|---|\n${rows.join("\n")}\n\n` +
      `Among our best two: ${shareOf(usualBand)}, at least 80 %: ${rate >= 0.8 ? "reached" : "NOT REACHED"}`,
  );
  if (rate < 0.8) process.exitCode = 1;
  const bands = [usualBand, ...otherBands].map((band) => `| ${band.name} | ${shareOf(band)} | ${shareOf(band, 4)} |`);
  say(
    "How much hangs on the band",
    `| band | of all twelve keys | of keys with at most 4 accidentals |\n|---|---|---|\n${bands.join("\n")}`,
  );
}

function shareOf(band: UnisonBand, mostAccidentals?: number): string {
  const hits = printedKeyHits(band, mostAccidentals);
  const share = amongBestTwo(hits);
  return `${Math.round(share * hits.length)} of ${hits.length} (${(100 * share).toFixed(0)} %)`;
}

function pairs(): void {
  const moves = voicePairMoves();
  const near = (of: "offBy" | "firstOffBy") => `${moves.filter((move) => move[of] <= 1).length} of ${moves.length}`;
  say(
    "Two voices of the published table: the best key moves by their difference, give or take a semitone",
    `By best score: ${near("offBy")}. By first place, where equal scores are told apart by accidentals: ${near("firstOffBy")}.`,
  );
}

function runLaws(runs: number): void {
  if (!Number.isInteger(runs) || runs < 1) throw new Error("--runs takes a whole number above 0.");
  say(`The laws of the keys, ${runs} cases each`, "| law | cases | seconds | |\n|---|---|---|---|");
  for (const { name, property } of [...keyLaws, ...sharedKeyLaws]) {
    const from = performance.now();
    const { failed, numRuns, seed, counterexample } = fc.check(property, { numRuns: runs });
    const seconds = ((performance.now() - from) / 1000).toFixed(1);
    const verdict = failed ? `BROKEN, seed ${seed}: ${JSON.stringify(counterexample)}` : "kept";
    process.stdout.write(`| ${name} | ${numRuns} | ${seconds} | ${verdict} |\n`);
    if (failed) process.exitCode = 1;
  }
}

function say(title: string, text: string): void {
  process.stdout.write(`\n## ${title}\n\n${text}\n`);
}
