import { performance } from "node:perf_hooks";
import { parseArgs } from "node:util";
import fc from "fast-check";
import type { SingingVoice, Tune } from "../../shared/keys/keyScore";
import { scoreKeys } from "../../shared/keys/scoreKeys";
import { scoreSharedKeys } from "../../shared/keys/sharedKey";
import { voiceTypes } from "../../shared/keys/voiceTypes";
import { keyLaws } from "../engine/keyLaws";
import { amongBestTwo, printedKeyHits } from "../engine/printedKeyHits";
import { sharedKeyLaws } from "../engine/sharedKeyLaws";
import { middleRanges, unisonBand, unisonReadings, usualBand } from "../engine/unisonBands";
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
  const hits = printedKeyHits(usualBand.voice);
  const rate = amongBestTwo(hits);
  const rows = hits.map(
    ({ name, printed: tonics, place, behind, first, printedIn }) =>
      `| ${name} | ${tonics.join(", ")} | ${place} | ${behind} | ${first.join(" ")} | ${printedIn} |`,
  );
  say(
    `Keys that books print (books and keys from memory), for the usual unison band: ${usualBand.name}`,
    `${usualBand.source}\n\n| tune | printed in | place of ours | points behind | our first three | book |\n|---|---|---|---|---|---|\n${rows.join("\n")}\n\n` +
      `Among our best two: ${shareOf(usualBand.voice)}, at least 80 %: ${rate >= 0.8 ? "reached" : "NOT REACHED"}`,
  );
  if (rate < 0.8) process.exitCode = 1;
  readings();
  voices();
}

/** How much hangs on what one takes for the usual band. */
function readings(): void {
  const cells = unisonReadings.map((reading) => {
    const shares = middleRanges.map((range) => {
      const band = unisonBand(reading, range);
      return band ? `${shareOf(band.voice)}; ${shareOf(band.voice, 4)}` : "does not hold it";
    });
    return `| ${reading.edges.join("–")} | ${reading.source} | ${shares.join(" | ")} |`;
  });
  const heads = middleRanges.map(({ edges }) => `within ${edges.join("–")}`);
  say(
    "Every reading of the usual unison band: printed keys among our best two, of all twelve keys; of those with at most 4 accidentals",
    `${middleRanges.map(({ edges, source }) => `${edges.join("–")}: ${source}`).join("\n")}\n\n` +
      `| comfort | who says | ${heads.join(" | ")} |\n|---|---|${"---|".repeat(heads.length)}\n${cells.join("\n")}`,
  );
}

/** The published table: books print for everybody, so the middle voices agree with them most. */
function voices(): void {
  const rows = voiceTypes.map(({ name, voice }) => {
    const hits = printedKeyHits(voice);
    const sung = hits.filter(({ beyond }) => !beyond).length;
    const behind = hits.map((hit) => hit.behind).sort((a, b) => a - b);
    return `| ${name} | ${sung} of ${hits.length} | ${shareOf(voice)} | ${shareOf(voice, 4)} | ${at(behind, 0.5)} |`;
  });
  say(
    "The printed keys, voice type by voice type",
    `| voice | can sing it | among our best two | of keys with at most 4 accidentals | points behind, median |\n|---|---|---|---|---|\n${rows.join("\n")}`,
  );
}

function shareOf(voice: SingingVoice, mostAccidentals?: number): string {
  const hits = printedKeyHits(voice, mostAccidentals);
  const share = amongBestTwo(hits);
  return `${Math.round(share * hits.length)} of ${hits.length} (${(100 * share).toFixed(0)} %)`;
}

function pairs(): void {
  const moves = voicePairMoves();
  const near = (some: typeof moves, of: "offBy" | "firstOffBy") =>
    `${some.filter((move) => move[of] <= 1).length} of ${some.length}`;
  const [alone, shared] = [moves.filter((move) => move.alone), moves.filter((move) => !move.alone)];
  say(
    "Two voices of the published table: the best key moves by their difference, give or take a semitone",
    [
      "What counts is the middle of the keys that share the best score: which of them stands first is chosen by accidentals,",
      "and these know nothing of voices.",
      "",
      "| | kept |",
      "|---|---|",
      `| middle of the best keys | ${near(moves, "offBy")} |`,
      `| first place, where one key alone is best for both | ${near(alone, "firstOffBy")} |`,
      `| first place, where several share the best score | ${near(shared, "firstOffBy")} |`,
    ].join("\n"),
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
