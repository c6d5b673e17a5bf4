import { existsSync, readdirSync, readFileSync } from "node:fs";
import { join } from "node:path";
import { readRecording } from "../../server/cli/recordingFile";
import type { ClipTruth } from "../sound/corpusLine";

/** A recording to be measured. */
export interface BenchClip {
  name: string;
  tags: string[];
  truth: ClipTruth;
  pcm: Float32Array;
  sampleRate: number;
}

/**
 * Recordings of a folder: each flac or wav that has its truth in a JSON file of the same name, with `hopS`, `f0`, `ignore`,
 * `expected` and `tags` as the corpus has them.
 */
export async function folderClips(folder: string): Promise<BenchClip[]> {
  const out: BenchClip[] = [];
  for (const file of readdirSync(folder)
    .filter((name) => /\.(flac|wav)$/i.test(name))
    .sort()) {
    const name = file.replace(/\.\w+$/, "");
    const truthPath = join(folder, `${name}.json`);
    if (!existsSync(truthPath)) continue;
    const { hopS, f0, ignore, expected, tags } = JSON.parse(readFileSync(truthPath, "utf8")) as ClipTruth & {
      tags: string[];
    };
    const { pcm, sampleRate } = await readRecording(join(folder, file));
    out.push({ name, tags, truth: { hopS, f0: f0.map((hz) => hz || null), ignore, expected }, pcm, sampleRate });
  }
  return out;
}
