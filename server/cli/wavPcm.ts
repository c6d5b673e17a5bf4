import { BadInput } from "./verb";

/** Mono samples in [-1, 1] with their rate. */
export interface Recording {
  pcm: Float32Array;
  sampleRate: number;
  /** seconds that the file says it holds, where it is cut off before that; else null */
  promisedS: number | null;
}

/** A size that recorders write while they do not know it yet; it promises nothing. */
const UNKNOWN_SIZE = 0x7ffff000;

const PCM = 1;
const FLOAT = 3;
const EXTENSIBLE = 0xfffe;

interface Format {
  code: number;
  channels: number;
  sampleRate: number;
  bits: number;
}

/**
 * Reads a RIFF wav of 8, 16, 24 or 32 bit PCM or 32 or 64 bit float, WAVE_FORMAT_EXTENSIBLE included; channels are averaged.
 * A file cut off in its samples gives what is there, and says so.
 *
 * @param name what to call the file in a message
 * @throws BadInput if it is broken or of another kind
 */
export function readWavPcm(name: string, bytes: Buffer): Recording {
  if (bytes.length < 12 || bytes.toString("latin1", 0, 4) !== "RIFF" || bytes.toString("latin1", 8, 12) !== "WAVE")
    throw new BadInput(`${name} is not a wav file.`);
  let format: Format | null = null;
  for (let at = 12; at + 8 <= bytes.length;) {
    const kind = bytes.toString("latin1", at, at + 4);
    const size = bytes.readUInt32LE(at + 4);
    const from = at + 8;
    if (kind === "fmt ") format = readFormat(name, bytes.subarray(from, from + size));
    if (kind === "data") {
      if (!format) break;
      const pcm = mixDown(bytes.subarray(from, Math.min(bytes.length, from + size)), format);
      const cutOff = from + size > bytes.length && size < UNKNOWN_SIZE;
      const promisedS = cutOff ? size / ((format.bits / 8) * format.channels * format.sampleRate) : null;
      return { pcm, sampleRate: format.sampleRate, promisedS };
    }
    at = from + size + (size % 2);
  }
  throw new BadInput(`${name} is a broken wav file: it has no ${format ? "samples" : "format"}.`);
}

function readFormat(name: string, chunk: Buffer): Format {
  if (chunk.length < 16) throw new BadInput(`${name} is a broken wav file: its format is cut off.`);
  const tag = chunk.readUInt16LE(0);
  const code = tag === EXTENSIBLE && chunk.length >= 26 ? chunk.readUInt16LE(24) : tag;
  const format = {
    code,
    channels: chunk.readUInt16LE(2),
    sampleRate: chunk.readUInt32LE(4),
    bits: chunk.readUInt16LE(14),
  };
  const known =
    (code === PCM && [8, 16, 24, 32].includes(format.bits)) || (code === FLOAT && [32, 64].includes(format.bits));
  if (!known)
    throw new BadInput(`${name} is a wav of a kind that is not supported (format ${code}, ${format.bits} bits).`);
  if (format.channels < 1) throw new BadInput(`${name} is a broken wav file: it has no channels.`);
  if (format.sampleRate < 8000 || format.sampleRate > 192000)
    throw new BadInput(`${name} has a sample rate of ${format.sampleRate} Hz; 8000 to 192000 Hz are supported.`);
  return format;
}

function mixDown(data: Buffer, { code, channels, bits }: Format): Float32Array {
  const width = bits / 8;
  const frames = Math.floor(data.length / (width * channels));
  const sample = sampleReader(data, code, bits);
  const pcm = new Float32Array(frames);
  for (let i = 0; i < frames; i++) {
    let sum = 0;
    for (let channel = 0; channel < channels; channel++) sum += sample((i * channels + channel) * width);
    pcm[i] = Number.isFinite(sum) ? sum / channels : 0;
  }
  return pcm;
}

function sampleReader(data: Buffer, code: number, bits: number): (at: number) => number {
  if (code === FLOAT) return bits === 32 ? (at) => data.readFloatLE(at) : (at) => data.readDoubleLE(at);
  if (bits === 8) return (at) => (data.readUInt8(at) - 128) / 128;
  if (bits === 16) return (at) => data.readInt16LE(at) / 32768;
  if (bits === 24) return (at) => data.readIntLE(at, 3) / 8388608;
  return (at) => data.readInt32LE(at) / 2147483648;
}
