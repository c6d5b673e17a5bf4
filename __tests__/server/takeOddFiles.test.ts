import { mkdtempSync, rmSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { singPhrase } from "../sound/singer";
import { wavBytes } from "../sound/wavFile";
import { linesOf } from "./linesOf";
import { takeVerb } from "../../server/cli/takeVerb";
import { BadInput } from "../../server/cli/verb";

const folder = mkdtempSync(join(tmpdir(), "odd-"));
afterAll(() => rmSync(folder, { recursive: true }));

interface Kind {
  code?: number;
  bits: number;
  channels?: number;
  rate: number;
  extensible?: boolean;
  put: (data: Buffer, value: number, at: number) => void;
}

/** A wav of any kind: all channels alike, an odd chunk with its padding before the samples and another after them. */
function wav(pcm: Float32Array, { code = 1, bits, channels = 1, rate, extensible = false, put }: Kind): Buffer {
  const width = bits / 8;
  const data = Buffer.alloc(pcm.length * width * channels);
  pcm.forEach((x, i) => {
    for (let c = 0; c < channels; c++) put(data, x, (i * channels + c) * width);
  });
  const format = Buffer.alloc(extensible ? 40 : 16);
  format.writeUInt16LE(extensible ? 0xfffe : code, 0);
  format.writeUInt16LE(channels, 2);
  format.writeUInt32LE(rate, 4);
  format.writeUInt32LE(rate * channels * width, 8);
  format.writeUInt16LE(channels * width, 12);
  format.writeUInt16LE(bits, 14);
  if (extensible) format.writeUInt16LE(code, 24);
  const chunk = (name: string, body: Buffer) => {
    const head = Buffer.alloc(8);
    head.write(name);
    head.writeUInt32LE(body.length, 4);
    return Buffer.concat([head, body, Buffer.alloc(body.length % 2)]);
  };
  const odd = chunk("LIST", Buffer.from("odd"));
  return chunk("RIFF", Buffer.concat([Buffer.from("WAVE"), odd, chunk("fmt ", format), odd, chunk("data", data), odd]));
}

const sixteen: Kind["put"] = (d, v, at) => d.writeInt16LE(Math.round(v * 32767), at);
const kinds: Record<string, Kind> = {
  "8 bits": { bits: 8, rate: 16000, put: (d, v, at) => d.writeUInt8(Math.round(v * 127) + 128, at) },
  "24 bits, stereo": {
    bits: 24,
    channels: 2,
    rate: 16000,
    put: (d, v, at) => d.writeIntLE(Math.round(v * 8388607), at, 3),
  },
  "float, extensible": { code: 3, bits: 32, rate: 16000, extensible: true, put: (d, v, at) => d.writeFloatLE(v, at) },
  "five channels": { bits: 16, channels: 5, rate: 16000, put: sixteen },
  "8 kHz": { bits: 16, rate: 8000, put: sixteen },
  "192 kHz": { bits: 16, rate: 192000, put: sixteen },
};

test.each(Object.entries(kinds))("%s: the same song has the same range", async (name, kind) => {
  const { pcm } = singPhrase({
    notes: [50, 54, 57, 62, 54].map((midi) => ({ midi, durationS: 0.5 })),
    seed: 3,
    consonants: 0,
    sampleRate: kind.rate,
  });
  const file = join(folder, `${name}.wav`);
  writeFileSync(file, wav(pcm, kind));
  const [line] = (await linesOf(takeVerb, [file])) as { verdict: string; lowMidi: number; highMidi: number }[];
  expect(line!.verdict).toBe("heard");
  expect(Math.abs(line!.lowMidi - 50)).toBeLessThan(0.2);
  expect(Math.abs(line!.highMidi - 62)).toBeLessThan(0.2);
});

test.each([
  ["no samples at all", wav(new Float32Array(0), { bits: 16, rate: 16000, put: sixteen }), /holds no sound/],
  ["a rate of 4 kHz", wav(new Float32Array(4000), { bits: 16, rate: 4000, put: sixteen }), /4000 Hz/],
  [
    "12 bits",
    wav(new Float32Array(4000), { bits: 16, rate: 16000, put: sixteen }).fill(12, 46, 47),
    /not supported|broken/,
  ],
  ["over ten minutes", wavBytes(new Float32Array(8000 * 601), 8000), /longer than ten minutes/],
])("%s: one clear line", async (name, bytes, words) => {
  const file = join(folder, `${name}.wav`);
  writeFileSync(file, bytes);
  const error: unknown = await linesOf(takeVerb, [file]).catch((reason: unknown) => reason);
  expect(error).toBeInstanceOf(BadInput);
  expect((error as BadInput).message).toMatch(words);
  expect((error as BadInput).message).not.toContain("\n");
});

test("samples that end in the middle of one, or after one, are read as far as they go", async () => {
  const { pcm } = singPhrase({
    notes: [50, 54, 57, 62, 54].map((midi) => ({ midi, durationS: 0.5 })),
    seed: 3,
    sampleRate: 16000,
  });
  const bytes = wavBytes(pcm, 16000);
  const [most, one] = [join(folder, "most.wav"), join(folder, "one.wav")];
  writeFileSync(most, bytes.subarray(0, bytes.length - 8001));
  writeFileSync(one, bytes.subarray(0, 47));
  const lines = (await linesOf(takeVerb, [most, one])) as { verdict: string; reasons: string[] }[];
  expect(lines.map(({ verdict }) => verdict)).toEqual(["heard", "too-quiet"]);
  for (const { reasons } of lines) expect(reasons[0]).toMatch(/^The file is cut off/);
});

test("a minute and a half is heard at more than ten times the speed it was sung at", async () => {
  const { pcm } = singPhrase({
    notes: [50, 54, 57, 62, 54, 50].map((midi) => ({ midi, durationS: 0.6 })),
    seed: 3,
    sampleRate: 8000,
  });
  const long = new Float32Array(8000 * 90);
  for (let at = 0; at + pcm.length <= long.length; at += pcm.length) long.set(pcm, at);
  const file = join(folder, "long.wav");
  writeFileSync(file, wavBytes(long, 8000));
  const before = process.cpuUsage();
  const [line] = (await linesOf(takeVerb, [file])) as { verdict: string; lowMidi: number; highMidi: number }[];
  const { user, system } = process.cpuUsage(before);
  expect([line!.verdict, Math.round(line!.lowMidi), Math.round(line!.highMidi)]).toEqual(["heard", 50, 62]);
  expect((user + system) / 1e6).toBeLessThan(9);
}, 120_000);
