import { spawnSync } from "node:child_process";
import { mkdtempSync, rmSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { singPhrase } from "../../__tests__/sound/singer";
import { wavBytes, writeWav } from "../../__tests__/sound/wavFile";
import { takeVerb } from "./takeVerb";
import { linesOf } from "../../__tests__/server/linesOf";
import { BadInput } from "./verb";
import { readWavPcm } from "./wavPcm";

const folder = mkdtempSync(join(tmpdir(), "take-"));
afterAll(() => rmSync(folder, { recursive: true }));
const at = (name: string) => join(folder, name);
const sung = singPhrase({
  notes: [50, 54, 57, 62, 57, 54, 50].map((midi) => ({ midi, durationS: 0.5 })),
  seed: 3,
  sampleRate: 16000,
});

/** A wav of any format code around raw samples. */
function wav(code: number, bits: number, channels: number, data: Buffer, extensible = false): Buffer {
  const format = Buffer.alloc(extensible ? 40 : 16);
  format.writeUInt16LE(extensible ? 0xfffe : code, 0);
  format.writeUInt16LE(channels, 2);
  format.writeUInt32LE(16000, 4);
  format.writeUInt32LE((16000 * channels * bits) / 8, 8);
  format.writeUInt16LE((channels * bits) / 8, 12);
  format.writeUInt16LE(bits, 14);
  if (extensible) format.writeUInt16LE(code, 24);
  const chunk = (name: string, body: Buffer) => {
    const head = Buffer.alloc(8);
    head.write(name);
    head.writeUInt32LE(body.length, 4);
    return Buffer.concat([head, body, Buffer.alloc(body.length % 2)]);
  };
  const body = Buffer.concat([
    Buffer.from("WAVE"),
    chunk("fmt ", format),
    chunk("LIST", Buffer.from("odd")),
    chunk("data", data),
  ]);
  return chunk("RIFF", body);
}

test("prints the range, the comfort and the notes of a recording", async () => {
  writeWav(at("sung.wav"), sung.pcm, 16000);
  const [line] = (await linesOf(takeVerb, [at("sung.wav")])) as Record<string, unknown>[];
  expect(Object.keys(line!)).toEqual([
    "file",
    "verdict",
    "lowMidi",
    "highMidi",
    "comfortLowMidi",
    "comfortHighMidi",
    "certainty",
    "reasons",
    "notes",
  ]);
  expect(line).toMatchObject({ file: at("sung.wav"), verdict: "heard" });
  expect(line!["lowMidi"]).toBeCloseTo(50, 0);
  expect(line!["highMidi"]).toBeCloseTo(62, 0);
  expect(line!["notes"]).toHaveLength(7);
});

test("--frames adds the pitch of every hundredth of a second, null where there is none", async () => {
  writeWav(at("frames.wav"), sung.pcm, 16000);
  const [line] = (await linesOf(takeVerb, [at("frames.wav"), "--frames"])) as {
    f0: { t: number; hz: number | null }[];
  }[];
  expect(line!.f0).toHaveLength(Math.floor(sung.pcm.length / 160));
  expect(line!.f0[0]).toEqual({ t: 0, hz: null });
  expect(line!.f0[60]!.t).toBe(0.6);
  expect(line!.f0[60]!.hz).toBeGreaterThan(140);
});

test("a hundred recordings in one call give a line each, in their order", async () => {
  const low = singPhrase({
    notes: [45, 47, 49, 52].map((midi) => ({ midi, durationS: 0.5 })),
    seed: 4,
    sampleRate: 8000,
    padS: 0.1,
  });
  const high = singPhrase({
    notes: [57, 59, 61, 64].map((midi) => ({ midi, durationS: 0.5 })),
    seed: 5,
    sampleRate: 8000,
    padS: 0.1,
  });
  const files = Array.from({ length: 100 }, (_, k) => at(`class-${k}.wav`));
  // Few of them sing, so that the hundred are soon heard.
  const singing = (k: number) => (k % 10 === 0 ? low : k % 10 === 3 ? high : null);
  files.forEach((file, k) => writeWav(file, singing(k)?.pcm ?? new Float32Array(800), 8000));
  const lines = (await linesOf(takeVerb, files)) as { file: string; verdict: string; lowMidi: number | null }[];
  expect(lines.map(({ file }) => file)).toEqual(files);
  lines.forEach(({ verdict, lowMidi }, k) => {
    if (!singing(k)) expect([verdict, lowMidi]).toEqual(["too-quiet", null]);
    else expect([verdict, Math.round(lowMidi!)]).toEqual(["heard", singing(k) === low ? 45 : 57]);
  });
}, 180_000);

test("silence has a verdict and no numbers", async () => {
  writeWav(at("silence.wav"), new Float32Array(32000), 16000);
  expect(await linesOf(takeVerb, [at("silence.wav")])).toMatchObject([
    { verdict: "too-quiet", lowMidi: null, highMidi: null, comfortLowMidi: null, certainty: 0, notes: [] },
  ]);
});

test("every kind of PCM and float reads alike, several channels as their mean", () => {
  const values = [0, 0.5, -0.5, 0.25];
  const pack = (width: number, put: (data: Buffer, value: number, at: number) => void) => {
    const data = Buffer.alloc(width * values.length);
    values.forEach((value, i) => put(data, value, i * width));
    return data;
  };
  const kinds: Buffer[] = [
    wav(
      1,
      16,
      1,
      pack(2, (d, v, i) => d.writeInt16LE(v * 32768, i)),
    ),
    wav(
      1,
      24,
      1,
      pack(3, (d, v, i) => d.writeIntLE(v * 8388608, i, 3)),
    ),
    wav(
      1,
      24,
      1,
      pack(3, (d, v, i) => d.writeIntLE(v * 8388608, i, 3)),
      true,
    ),
    wav(
      1,
      32,
      1,
      pack(4, (d, v, i) => d.writeInt32LE(v * 2147483648, i)),
    ),
    wav(
      3,
      32,
      1,
      pack(4, (d, v, i) => d.writeFloatLE(v, i)),
    ),
    wav(
      3,
      64,
      1,
      pack(8, (d, v, i) => d.writeDoubleLE(v, i)),
      true,
    ),
  ];
  for (const bytes of kinds) expect([...readWavPcm("a.wav", bytes).pcm]).toEqual(values);
  const stereo = wav(
    3,
    32,
    2,
    pack(4, (d, v, i) => d.writeFloatLE(v, i)),
  );
  expect([...readWavPcm("a.wav", stereo).pcm]).toEqual([0.25, -0.125]);
});

test("bad input is refused with one clear line that names the file", async () => {
  const whole = wavBytes(sung.pcm, 16000);
  writeFileSync(at("empty.wav"), "");
  writeFileSync(at("text.wav"), "not a recording at all");
  writeFileSync(at("cut.wav"), whole.subarray(0, 30));
  writeFileSync(at("alaw.wav"), wav(6, 8, 1, Buffer.alloc(100)));
  writeFileSync(at("text.mp3"), "nor is this");
  for (const name of ["missing.wav", "empty.wav", "text.wav", "cut.wav", "alaw.wav", "text.mp3"]) {
    const error: unknown = await linesOf(takeVerb, [at(name)]).catch((reason: unknown) => reason);
    expect(error).toBeInstanceOf(BadInput);
    expect((error as BadInput).message).toContain(name);
    expect((error as BadInput).message).not.toContain("\n");
  }
  await expect(linesOf(takeVerb, [])).rejects.toThrow(BadInput);
  await expect(linesOf(takeVerb, [folder])).rejects.toThrow(BadInput);
});

test("other formats come through ffmpeg where it is installed, else a line says so", async () => {
  writeWav(at("source.wav"), sung.pcm, 16000);
  const made = spawnSync("ffmpeg", ["-v", "error", "-y", "-i", at("source.wav"), at("sung.flac")]);
  if (made.status !== 0) {
    writeFileSync(at("sung.flac"), "fLaC");
    await expect(linesOf(takeVerb, [at("sung.flac")])).rejects.toThrow(/ffmpeg/);
    return;
  }
  const [line] = (await linesOf(takeVerb, [at("sung.flac")])) as { verdict: string; lowMidi: number }[];
  expect(line!.verdict).toBe("heard");
  expect(line!.lowMidi).toBeCloseTo(50, 0);
});

test("a wav that is cut off says how much of it is there, and one without any sound is refused", async () => {
  const bytes = wavBytes(sung.pcm, 16000);
  writeFileSync(at("cut.wav"), bytes.subarray(0, Math.floor(bytes.length / 2)));
  const [line] = (await linesOf(takeVerb, [at("cut.wav")])) as { reasons: string[] }[];
  const whole = sung.pcm.length / 16000;
  const told = /^The file is cut off: ([\d.]+) of ([\d.]+) s are there\.$/.exec(line!.reasons[0]!);
  expect(Number(told![1])).toBeCloseTo(whole / 2, 0);
  expect(Number(told![2])).toBeCloseTo(whole, 0);
  writeFileSync(at("head.wav"), bytes.subarray(0, 44));
  await expect(linesOf(takeVerb, [at("head.wav")])).rejects.toThrow("head.wav is cut off before its sound.");
});

test("of a file no word is said about standing before a microphone", async () => {
  writeWav(at("mute.wav"), new Float32Array(32000), 16000);
  const [line] = (await linesOf(takeVerb, [at("mute.wav")])) as { reasons: string[] }[];
  expect(line!.reasons).toEqual(["The recording holds hardly any sound."]);
});
