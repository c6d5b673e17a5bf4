import { mkdtempSync, rmSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import { join, resolve } from "node:path";
import { parseArgs } from "node:util";
import { corpus } from "../sound/corpus";
import type { CorpusHalf } from "../sound/corpusClip";
import { writeWav } from "../sound/wavFile";
import { benchTable, type TableRow } from "./benchTable";
import { folderClips, type BenchClip } from "./folderClips";
import { rangeByExtremes, rangeByHeldNotes } from "./heldNotes";
import { aubioYinFft, ours, plainPitchy, praatAutocorrelation, type Tool } from "./plainTools";
import { countFrames, rangeErrors, rangeRight, type Scored } from "./scoring";

const USAGE = "bench:voice [--dev] [--held-out] [--only TAG] [--folder DIR] [--ours] [--failures] [--json FILE]";
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

const { values: options } = parseArgs({
  options: {
    dev: { type: "boolean" },
    "held-out": { type: "boolean" },
    only: { type: "string" },
    folder: { type: "string" },
    ours: { type: "boolean" },
    failures: { type: "boolean" },
    json: { type: "string" },
    help: { type: "boolean" },
  },
});
if (options.help) process.stdout.write(`${USAGE}\n`);
else {
  measure().catch((error: Error) => {
    process.stderr.write(`${error.message}\n`);
    process.exitCode = 1;
  });
}

async function measure(): Promise<void> {
  const clips = (
    options.folder ? await folderClips(resolve(process.env.INIT_CWD ?? ".", options.folder)) : madeClips()
  ).filter(({ name, tags }) => !options.only || tags.includes(options.only) || name === options.only);
  if (clips.length === 0) throw new Error("No clip carries that tag or name.");
  const folder = mkdtempSync(join(tmpdir(), "voice-bench-"));
  try {
    const wavs = clips.map(({ pcm, sampleRate }, k) => {
      const path = join(folder, `${k}.wav`);
      writeWav(path, pcm, sampleRate);
      return path;
    });
    report(clips, runTools(clips, wavs, folder));
  } finally {
    rmSync(folder, { recursive: true });
  }
}

function madeClips(): BenchClip[] {
  const both = !options.dev && !options["held-out"];
  const halves = (["dev", "held-out"] as CorpusHalf[]).filter((half) => both || options[half as "dev" | "held-out"]);
  return halves
    .flatMap(corpus)
    .filter(({ name, tags }) => !options.only || tags.includes(options.only) || name === options.only)
    .flatMap(({ name, half, tags, make }) => {
      const sound = make();
      if (sound === null) process.stderr.write(`${name}: the program that makes it is not installed; left out\n`);
      return sound === null ? [] : [{ name: `${half}/${name}`, tags: [...tags, name], ...sound }];
    });
}

interface ToolScores extends TableRow {
  scored: Scored[];
}

function runTools(clips: readonly BenchClip[], wavs: readonly string[], folder: string): ToolScores[] {
  const seconds = clips.reduce((sum, { pcm, sampleRate }) => sum + pcm.length / sampleRate, 0);
  const tools: [string, Tool][] = [["Larkspan", ours]];
  if (!options.ours)
    tools.push(
      ["Praat ac 60-1200 Hz", praatAutocorrelation],
      ["aubio YIN-FFT", aubioYinFft],
      ["pitchy MPM, clarity 0.9", plainPitchy],
    );
  return tools.flatMap(([tool, run]) => {
    process.stderr.write(`${tool}: ${clips.length} clips, ${seconds.toFixed(0)} s of sound\n`);
    const outcome = run(wavs, folder);
    if (outcome === null) {
      process.stderr.write(`${tool} is not installed; left out\n`);
      return [];
    }
    const score = (range: typeof rangeByExtremes | null): Scored[] =>
      clips.map(({ truth }, k) => {
        const track = outcome.tracks[k]!;
        return { truth, result: { ...track, range: range ? range(track.f0) : track.range } };
      });
    return [
      {
        tool,
        scored: score(tool === "Larkspan" ? null : rangeByHeldNotes),
        byExtremes: score(rangeByExtremes),
        timesRealTime: seconds / outcome.cpuS,
      },
    ];
  });
}

function report(clips: readonly BenchClip[], rows: readonly ToolScores[]): void {
  const say = (text: string): boolean => process.stdout.write(`${text}\n`);
  say(`\n## All ${clips.length} clips\n\n${benchTable(rows)}`);
  for (const tag of [...CONDITIONS, ...VOICES]) {
    const among = clips.map(({ tags, truth }) => tags.includes(tag) && truth.expected.verdict === "ok");
    if (!among.includes(true)) continue;
    const part = rows.map(({ tool, scored, byExtremes }) => ({
      tool,
      scored: scored.filter((_, k) => among[k]),
      byExtremes: byExtremes!.filter((_, k) => among[k]),
    }));
    say(`\n## ${tag}\n\n${benchTable(part)}`);
  }
  const own = rows[0]!.scored;
  if (options.failures)
    say(
      `\n## Where Larkspan falls short, clip by clip\n\n${clips.flatMap((clip, k) => failure(clip, own[k]!)).join("\n")}`,
    );
  if (options.json)
    writeFileSync(
      options.json,
      JSON.stringify(
        rows.map(({ tool, scored }) => ({
          tool,
          clips: scored.map(({ truth, result }, k) => ({
            name: clips[k]!.name,
            ...countFrames(truth, result.f0),
            range: result.range,
            expected: truth.expected,
            verdict: result.verdict,
          })),
        })),
      ),
    );
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
