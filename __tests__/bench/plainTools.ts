import { spawnSync } from "node:child_process";
import { existsSync, readFileSync, writeFileSync } from "node:fs";
import { join } from "node:path";
import { PitchDetector } from "pitchy";
import { listenToTake } from "../../shared/voice/listenToTake";
import { readWav } from "../sound/wavFile";
import { resultOf, type ToolResult } from "./scoring";

/** What a tool made of the wav files it was given, in their order, and the processor time that it took. */
export interface ToolRun {
  tracks: (Pick<ToolResult, "f0" | "range" | "verdict"> | null)[];
  cpuS: number;
}

export type Tool = (wavs: readonly string[], folder: string) => ToolRun | null;

/** Larkspan's own engine, from samples to report. */
export const ours: Tool = (wavs) => {
  const warm = readWav(wavs[0]!);
  listenToTake(warm.pcm, warm.sampleRate);
  return timed(wavs, (pcm, sampleRate) => resultOf(listenToTake(pcm, sampleRate)));
};

/** pitchy's McLeod method as it comes: 2048 samples at 44.1 kHz, clarity from 0.9, 60 to 1400 Hz. */
export const plainPitchy: Tool = (wavs) =>
  timed(wavs, (pcm, sampleRate) => {
    const size = 2 ** Math.round(Math.log2(0.0464 * sampleRate));
    const detector = PitchDetector.forFloat32Array(size);
    const window = new Float32Array(size);
    const f0 = Array.from({ length: Math.floor((pcm.length * 100) / sampleRate) }, (_, k) => {
      const from = Math.round((k * sampleRate) / 100) - size / 2;
      for (let i = 0; i < size; i++) window[i] = pcm[from + i] ?? 0;
      const [hz, clarity] = detector.findPitch(window, sampleRate);
      return { t: k / 100, hz: clarity >= 0.9 && hz >= 60 && hz <= 1400 ? hz : null };
    });
    return { f0, range: null, verdict: null };
  });

function timed(
  wavs: readonly string[],
  run: (pcm: Float32Array, sampleRate: number) => Pick<ToolResult, "f0" | "range" | "verdict">,
): ToolRun {
  let cpuUs = 0;
  const tracks = wavs.map((path) => {
    const { pcm, sampleRate } = readWav(path);
    const before = process.cpuUsage();
    const track = run(pcm, sampleRate);
    const { user, system } = process.cpuUsage(before);
    cpuUs += user + system;
    return track;
  });
  return { tracks, cpuS: cpuUs / 1e6 };
}

/** Praat's autocorrelation method with its usual settings, 60 to 1200 Hz; null where Praat is not installed. */
export const praatAutocorrelation: Tool = (wavs, folder) => {
  const script = join(folder, "pitch.praat");
  const lines = wavs.flatMap((path) => [
    `Read from file: "${path}"`,
    `To Pitch (ac): 0.01, 60, 15, "no", 0.03, 0.45, 0.01, 0.35, 0.14, 1200`,
    "Down to PitchTier",
    `Save as headerless spreadsheet file: "${path}.praat"`,
    "select all",
    "Remove",
  ]);
  writeFileSync(script, `${lines.join("\n")}\n`);
  const cpuS = processorTime("praat", ["--run", script]);
  if (cpuS === null) return null;
  return {
    cpuS,
    tracks: wavs.map((path) => (existsSync(`${path}.praat`) ? onGrid(readPairs(`${path}.praat`), 0) : silent())),
  };
};

/** aubio's YIN-FFT with its usual settings at a hop of 10 ms; null where aubio-tools is not installed. */
export const aubioYinFft: Tool = (wavs) => {
  let cpuS = 0;
  const tracks: ToolRun["tracks"] = [];
  for (const path of wavs) {
    const { sampleRate } = wavRate(path);
    const buffer = 2 ** Math.round(Math.log2(0.0464 * sampleRate));
    const hop = Math.round(sampleRate / 100);
    const taken = processorTime(
      "aubiopitch",
      ["-i", path, "-p", "yinfft", "-B", String(buffer), "-H", String(hop), "-u", "hz"],
      `${path}.aubio`,
    );
    if (taken === null) return null;
    cpuS += taken;
    // Each line is stamped with the start of its hop, while the window ends with that hop.
    tracks.push(onGrid(readPairs(`${path}.aubio`), (hop - buffer / 2) / sampleRate));
  }
  return { tracks, cpuS };
};

function wavRate(path: string): { sampleRate: number } {
  return { sampleRate: readFileSync(path).readUInt32LE(24) };
}

/** Runs a program to its end; @returns its user and system time by the shell's own account, null where it cannot be run */
function processorTime(program: string, args: string[], outFile = "/dev/null"): number | null {
  const line = `"$@" > "$OUT"; code=$?; times >&2; exit $code`;
  const run = spawnSync("sh", ["-c", line, "sh", program, ...args], {
    encoding: "utf8",
    env: { ...process.env, OUT: outFile },
  });
  if (run.status !== 0) return null;
  const children = run.stderr.trim().split("\n").at(-1) ?? "";
  const parts = [...children.matchAll(/(\d+)m([\d.]+)s/g)];
  return parts.reduce((sum, [, minutes, seconds]) => sum + 60 * Number(minutes) + Number(seconds), 0);
}

function readPairs(path: string): { t: number; hz: number }[] {
  return readFileSync(path, "utf8")
    .split("\n")
    .flatMap((line) => {
      const [t, hz] = line.trim().split(/\s+/).map(Number);
      return Number.isFinite(t) && Number.isFinite(hz) ? [{ t: t!, hz: hz! }] : [];
    });
}

/** Puts frames onto multiples of 10 ms: each takes the estimate nearest to it, within 6 ms. */
function onGrid(
  pairs: readonly { t: number; hz: number }[],
  shiftS: number,
): Pick<ToolResult, "f0" | "range" | "verdict"> {
  const frames = Math.max(0, Math.ceil(((pairs.at(-1)?.t ?? 0) + shiftS) * 100) + 1);
  const f0: ToolResult["f0"] = Array.from({ length: frames }, (_, k) => ({ t: k / 100, hz: null }));
  const distance = new Float64Array(frames).fill(0.006);
  for (const { t, hz } of pairs) {
    const k = Math.round((t + shiftS) * 100);
    const away = Math.abs(t + shiftS - k / 100);
    if (k < 0 || k >= frames || away >= distance[k]! || hz < 60 || hz > 1400) continue;
    distance[k] = away;
    f0[k] = { t: k / 100, hz };
  }
  return { f0, range: null, verdict: null };
}

function silent(): Pick<ToolResult, "f0" | "range" | "verdict"> {
  return { f0: [], range: null, verdict: null };
}
