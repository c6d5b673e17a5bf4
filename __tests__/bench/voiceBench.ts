import { mkdtempSync, rmSync } from "node:fs";
import { tmpdir } from "node:os";
import { join, resolve } from "node:path";
import { parseArgs } from "node:util";
import { corpus } from "../sound/corpus";
import { reseedCorpus, type Clip } from "../sound/corpusClip";
import { writeWav } from "../sound/wavFile";
import { barsTable, comparisonTable, measuresTable, type TableRow } from "./benchTable";
import { folderClips, type BenchClip } from "./folderClips";
import { rangeByExtremes, rangeByHeldNotes } from "./heldNotes";
import { aubioYinFft, ours, plainPitchy, praatAutocorrelation, type Tool } from "./plainTools";
import { countFrames, rangeErrors, rangeRight, type Scored } from "./scoring";

const USAGE = "bench:voice [--dev] [--held-out] [--seed N] [--only TAG] [--folder DIR] [--ours] [--failures]";
const CONDITIONS = [
  "clean",
  "noise20",
  "noise10",
  "hum",
  "bleed",
  "weakfund",
  "vibrato",
  "scoops",
  "fry",
  "breathy",
  "rough",
  "belted",
  "awkward",
  "reverb",
  "everyday",
  "blips",
  "flips",
  "clipped",
  "quiet",
  "gated",
  "sampled",
  "real",
  "psola",
];
const VOICES = ["bass", "baritone", "tenor", "alto", "mezzo", "soprano", "child"];

const options = readOptions();
if (options === null || options.help) process.stdout.write(`${USAGE}\n`);
else {
  measure(options).catch((error: Error) => {
    process.stderr.write(`${error.message}\n`);
    process.exitCode = 1;
  });
}

interface Options {
  dev?: boolean;
  "held-out"?: boolean;
  seed?: string;
  only?: string;
  folder?: string;
  ours?: boolean;
  failures?: boolean;
  help?: boolean;
}

function readOptions(): Options | null {
  const flag = { type: "boolean" } as const;
  const text = { type: "string" } as const;
  try {
    const known = {
      dev: flag,
      "held-out": flag,
      seed: text,
      only: text,
      folder: text,
      ours: flag,
      failures: flag,
      help: flag,
    };
    const options: Options = parseArgs({ options: known }).values;
    if (options.seed !== undefined && !/^\d{1,15}$/.test(options.seed)) throw new Error("--seed takes a whole number.");
    return options;
  } catch (error) {
    process.stderr.write(`${(error as Error).message}\n`);
    process.exitCode = 2;
    return null;
  }
}

async function measure(options: Options): Promise<void> {
  const { folder: from, only, seed } = options;
  if (seed !== undefined) reseedCorpus(Number(seed));
  const wanted = ({ name, tags }: { name: string; tags: string[] }): boolean =>
    !only || tags.includes(only) || name === only;
  const clips = from
    ? (await folderClips(resolve(process.env.INIT_CWD ?? ".", from))).filter(wanted)
    : madeClips(options, wanted);
  if (clips.length === 0) throw new Error("No clip carries that tag or name.");
  const folder = mkdtempSync(join(tmpdir(), "voice-bench-"));
  try {
    const wavs = clips.map(({ pcm, sampleRate }, k) => {
      const path = join(folder, `${k}.wav`);
      writeWav(path, pcm, sampleRate);
      return path;
    });
    report(clips, runTools(clips, wavs, folder, options), options);
  } finally {
    rmSync(folder, { recursive: true });
  }
}

function madeClips(options: Options, wanted: (clip: Clip) => boolean): BenchClip[] {
  const both = !options.dev && !options["held-out"];
  const halves = (["dev", "held-out"] as const).filter((half) => both || options[half]);
  const clips = halves.flatMap(corpus).filter(wanted);
  return clips.flatMap(({ name, half, tags, make }) => {
    const sound = make();
    if (sound === null) process.stderr.write(`${name}: the program that makes it is not installed; left out\n`);
    return sound === null ? [] : [{ name: `${half}/${name}`, tags, ...sound }];
  });
}

type ToolScores = TableRow & { scored: Scored[]; byExtremes: Scored[] };

function runTools(
  clips: readonly BenchClip[],
  wavs: readonly string[],
  folder: string,
  options: Options,
): ToolScores[] {
  const seconds = clips.reduce((sum, { pcm, sampleRate }) => sum + pcm.length / sampleRate, 0);
  const tools: [string, Tool][] = [["Larkspan", ours]];
  if (!options.ours) {
    tools.push(
      ["Praat ac 60-1200 Hz", praatAutocorrelation],
      ["aubio YIN-FFT", aubioYinFft],
      ["pitchy MPM, clarity 0.9", plainPitchy],
    );
  }
  return tools.flatMap(([name, run]) => {
    process.stderr.write(`${name}: ${clips.length} clips, ${seconds.toFixed(0)} s of sound\n`);
    const outcome = run(wavs, folder);
    if (outcome === null) {
      process.stderr.write(`${name} is not installed; left out\n`);
      return [];
    }
    const score = (range: typeof rangeByExtremes | null): Scored[] =>
      clips.map(({ truth }, k) => {
        const track = outcome.tracks[k]!;
        return { truth, result: { ...track, range: range ? range(track.f0) : track.range } };
      });
    const scored = score(name === "Larkspan" ? null : rangeByHeldNotes);
    return [{ name, scored, byExtremes: score(rangeByExtremes), timesRealTime: seconds / outcome.cpuS }];
  });
}

function report(clips: readonly BenchClip[], rows: readonly ToolScores[], options: Options): void {
  const say = (title: string, text: string): boolean => process.stdout.write(`\n## ${title}\n\n${text}\n`);
  const own = rows[0]!;
  say(`All ${clips.length} clips`, measuresTable("tool", rows));
  const singingWith = (tag: string) => (_: unknown, k: number) =>
    clips[k]!.tags.includes(tag) && clips[k]!.truth.expected.verdict === "ok";
  const conditions = [...CONDITIONS, ...VOICES].filter((tag) => own.scored.some(singingWith(tag)));
  const part = (row: ToolScores, tag: string): TableRow => ({
    name: tag,
    scored: row.scored.filter(singingWith(tag)),
    byExtremes: row.byExtremes.filter(singingWith(tag)),
  });
  say(
    "Larkspan by condition",
    measuresTable(
      "condition",
      conditions.map((tag) => part(own, tag)),
    ),
  );
  if (rows.length > 1) {
    const names = rows.map(({ name }) => name);
    const byCondition = conditions.map((tag) => ({ name: tag, byTool: rows.map((row) => part(row, tag).scored) }));
    say("RPA % by condition", comparisonTable("rpa", names, byCondition));
    say("Octave errors % by condition", comparisonTable("octaveErrors", names, byCondition));
    say("Both ends of the range within a semitone, by notes, %", comparisonTable("bothEnds", names, byCondition));
  }
  say("The bars", barsTable(own.scored.map((score, k) => ({ ...score, tags: clips[k]!.tags }))));
  const failures = clips.flatMap((clip, k) => failure(clip, own.scored[k]!));
  if (options.failures) say("Where Larkspan falls short, clip by clip", failures.join("\n") || "Nowhere.");
}

function failure(clip: BenchClip, { truth, result }: Scored): string[] {
  const counts = countFrames(truth, result.f0);
  const faults: string[] = [];
  const ratio = (part: number, whole: number): string => `${((100 * part) / Math.max(1, whole)).toFixed(1)} %`;
  if (result.verdict !== null && !truth.expected.accept.includes(result.verdict))
    faults.push(`verdict ${result.verdict} instead of ${truth.expected.verdict}`);
  if (rangeRight(truth, result.range) === false) {
    const errors = rangeErrors(truth, result.range);
    faults.push(errors ? `range off by ${errors.low.toFixed(2)} low, ${errors.high.toFixed(2)} high` : "no range");
  }
  if (truth.expected.verdict === "ok" && counts.pitch < 0.96 * counts.voiced)
    faults.push(`RPA ${ratio(counts.pitch, counts.voiced)} (voicing recall ${ratio(counts.hitVoiced, counts.voiced)})`);
  if (counts.octaveUp + counts.octaveDown > 0.005 * counts.hitVoiced)
    faults.push(
      `octave errors ${ratio(counts.octaveUp, counts.hitVoiced)} up, ${ratio(counts.octaveDown, counts.hitVoiced)} down`,
    );
  if (truth.expected.verdict === "ok" && counts.falseAlarm > 0.3 * counts.unvoiced)
    faults.push(`false alarm ${ratio(counts.falseAlarm, counts.unvoiced)}`);
  return faults.length > 0 ? [`- ${clip.name}: ${faults.join("; ")}`] : [];
}
