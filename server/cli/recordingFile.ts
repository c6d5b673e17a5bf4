import { spawn } from "node:child_process";
import { basename, resolve } from "node:path";
import { readInput } from "./inputFile";
import { BadInput } from "./verb";
import { readWavPcm, type Recording } from "./wavPcm";

const MOST = { bytes: 500_000_000, words: "500 MB" };
const MOST_SECONDS = 600;
const DECODED_RATE = 44_100;

/**
 * Reads a recording: wav by itself, any other sound through ffmpeg where that is installed.
 *
 * @throws BadInput if the file is missing, broken, empty, longer than ten minutes, or cannot be decoded here
 */
export async function readRecording(path: string): Promise<Recording> {
  const name = basename(path);
  const bytes = await readInput(path, MOST);
  if (bytes.length === 0) throw new BadInput(`${name} is empty.`);
  const isWav = bytes.toString("latin1", 0, 4) === "RIFF" || /\.wav$/i.test(name);
  const recording = isWav ? readWavPcm(name, bytes) : await decode(name, path);
  if (recording.pcm.length === 0)
    throw new BadInput(
      recording.promisedS === null ? `${name} holds no sound.` : `${name} is cut off before its sound.`,
    );
  if (recording.pcm.length / recording.sampleRate > MOST_SECONDS)
    throw new BadInput(`${name} is longer than ten minutes.`);
  return recording;
}

function decode(name: string, path: string): Promise<Recording> {
  const limits = ["-nostdin", "-v", "error", "-protocol_whitelist", "file,pipe"];
  const args = [
    ...limits,
    "-i",
    `file:${resolve(path)}`,
    "-map",
    "0:a:0",
    "-t",
    String(MOST_SECONDS + 1),
    "-ac",
    "1",
    "-ar",
    String(DECODED_RATE),
    "-f",
    "f32le",
    "-",
  ];
  return new Promise((done, fail) => {
    const chunks: Buffer[] = [];
    const child = spawn("ffmpeg", args, { stdio: ["ignore", "pipe", "ignore"] });
    child.stdout.on("data", (chunk: Buffer) => chunks.push(chunk));
    child.on("error", () =>
      fail(new BadInput(`${name} is no wav file; reading other formats needs ffmpeg, which is not installed.`)),
    );
    child.on("close", (code) => {
      const bytes = Buffer.concat(chunks);
      if (code !== 0 || bytes.length < 4) fail(new BadInput(`${name} holds no sound that can be read.`));
      else done({ pcm: floats(bytes), sampleRate: DECODED_RATE, promisedS: null });
    });
  });
}

function floats(bytes: Buffer): Float32Array {
  return Float32Array.from({ length: bytes.length >> 2 }, (_, i) => bytes.readFloatLE(4 * i));
}
