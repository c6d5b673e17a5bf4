import { readFileSync, writeFileSync } from "node:fs";

/** Writes mono samples in [-1, 1] as a 16-bit wav. */
export function writeWav(path: string, pcm: Float32Array, sampleRate: number): void {
  writeFileSync(path, wavBytes(pcm, sampleRate));
}

/** The bytes of a mono 16-bit wav. */
export function wavBytes(pcm: Float32Array, sampleRate: number): Buffer {
  const bytes = Buffer.alloc(44 + pcm.length * 2);
  bytes.write("RIFF", 0);
  bytes.writeUInt32LE(36 + pcm.length * 2, 4);
  bytes.write("WAVEfmt ", 8);
  bytes.writeUInt32LE(16, 16);
  bytes.writeUInt16LE(1, 20);
  bytes.writeUInt16LE(1, 22);
  bytes.writeUInt32LE(sampleRate, 24);
  bytes.writeUInt32LE(sampleRate * 2, 28);
  bytes.writeUInt16LE(2, 32);
  bytes.writeUInt16LE(16, 34);
  bytes.write("data", 36);
  bytes.writeUInt32LE(pcm.length * 2, 40);
  pcm.forEach((x, i) => bytes.writeInt16LE(Math.round(Math.max(-1, Math.min(1, x)) * 32767), 44 + 2 * i));
  return bytes;
}

/** Reads a mono 16-bit wav as `writeWav`, sox or fluidsynth (first channel) write it. */
export function readWav(path: string): { pcm: Float32Array; sampleRate: number } {
  const bytes = readFileSync(path);
  const channels = bytes.readUInt16LE(22);
  let at = 12;
  while (bytes.toString("latin1", at, at + 4) !== "data") at += 8 + bytes.readUInt32LE(at + 4);
  const size = Math.min(bytes.readUInt32LE(at + 4), bytes.length - at - 8);
  const pcm = Float32Array.from(
    { length: Math.floor(size / (2 * channels)) },
    (_, i) => bytes.readInt16LE(at + 8 + 2 * channels * i) / 32768,
  );
  return { pcm, sampleRate: bytes.readUInt32LE(24) };
}
