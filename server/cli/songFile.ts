import { chartTokens, parseChart, type Chart } from "../../shared/songs/chart";
import { type MelodyVoice } from "../../shared/songs/melodyVoice";
import { readMelodyFile } from "../../shared/songs/melodyFile";
import { decodeText } from "../../shared/songs/textBytes";
import { readInput, songSize } from "./inputFile";
import { BadInput } from "./verb";

const melodyNames = /\.(?:midi?|musicxml|xml|mxl|abc)$/i;
const recordingNames = /\.(?:wav|flac|mp3|m4a|aac|ogg|oga|opus|webm|aiff?)$/i;

/** Whether a file's name says that it is a recording. */
export function isRecording(path: string): boolean {
  return recordingNames.test(path);
}

/** Whether a file's name says that it is a melody file. */
export function isMelodyFile(path: string): boolean {
  return melodyNames.test(path);
}

/** The voice of a melody file that is most likely sung. */
export async function melodyFromFile(path: string): Promise<MelodyVoice> {
  const read = readMelodyFile(path, await readInput(path, songSize));
  if (!read.ok) throw new BadInput(`${path}: ${read.reason}`);
  return read.voices[read.proposed]!;
}

/** A chart with at least one chord. */
export async function chartFromFile(path: string): Promise<Chart> {
  if (isMelodyFile(path) || isRecording(path))
    throw new BadInput(`${path}: This is no chart; a text file with chords over words is wanted.`);
  const bytes = await readInput(path, songSize);
  if (bytes.length === 0) throw new BadInput(`${path}: This file is empty.`);
  const text = decodeText(bytes);
  if (/[\0-\x08\x0e-\x1a\x1c-\x1f]/.test(text)) throw new BadInput(`${path}: This is no chart; it is not a text file.`);
  const chart = parseChart(text);
  if (!chartTokens(chart).some((token) => token.chord))
    throw new BadInput(`${path}: There are no chords in this file.`);
  return chart;
}
