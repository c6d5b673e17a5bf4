import { mkdtemp, rm, writeFile } from "node:fs/promises";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { linesOf } from "../../__tests__/server/linesOf";
import { keysVerb } from "./keysVerb";
import { BadInput } from "./verb";

interface Line {
  tonic: string;
  octave: number;
  lowMidi: number;
  highMidi: number;
  score: number;
  parts: Record<string, number>;
  beyond: boolean;
  reason: string;
}

let folder: string;
const keys = async (...args: string[]) =>
  (await linesOf(
    keysVerb,
    args.map((arg) => arg.replace("DIR", folder)),
  )) as Line[];

beforeAll(async () => {
  folder = await mkdtemp(join(tmpdir(), "larkspan-"));
  await writeFile(join(folder, "slip.abc"), "X:1\nT:Slip\nM:3/4\nL:1/4\nK:G\nD G2|A B2|d c A|G3|\n");
  await writeFile(join(folder, "rests.abc"), "X:1\nT:Rests\nM:3/4\nL:1/4\nK:C\nz3|z3|\n");
  await writeFile(join(folder, "empty.mid"), "");
  await writeFile(join(folder, "junk.mid"), "no MIDI at all");
  await writeFile(join(folder, "words.txt"), "Lamps on the harbour");
  await writeFile(join(folder, "silence.wav"), silence());
});

afterAll(() => rm(folder, { recursive: true }));

test("a line a key, best first, each with span, parts and reason, as octaves away from the melody as written", async () => {
  const lines = await keys("--melody", "DIR/slip.abc", "--voice", "A2-E4", "--comfort", "C3-C4");
  expect(lines).toHaveLength(12);
  expect(new Set(lines.map(({ tonic }) => tonic)).size).toBe(12);
  for (const { parts, score, lowMidi, highMidi, reason } of lines) {
    expect(Object.keys(parts)).toEqual(["comfort", "roomAbove", "roomBelow", "longHigh", "lowCarry"]);
    expect(Object.values(parts).reduce((sum, points) => sum + points)).toBe(score);
    expect(highMidi - lowMidi).toBe(12);
    expect(reason).toMatch(/\.$/);
  }
  expect(lines.map(({ beyond }) => beyond)).toEqual([...lines.map(({ beyond }) => beyond)].sort());
  expect(lines.find(({ tonic }) => tonic === "G")).toMatchObject({ octave: -1, lowMidi: 50, highMidi: 62 });
});

test("a span says that it is coarser; a melody of the same span does not", async () => {
  const coarse = await keys("--span", "D4-D5", "--home", "G", "--voice", "A2-E4");
  for (const { reason } of coarse) expect(reason).toContain("Judged by the span alone.");
  for (const { reason } of await keys("--melody", "DIR/slip.abc", "--voice", "A2-E4"))
    expect(reason).not.toContain("span alone");
});

test("--home says which note the tune is at home on, and its mode how keys are spelled", async () => {
  const asD = await keys("--melody", "DIR/slip.abc", "--home", "D", "--voice", "A2-E4");
  const asG = await keys("--melody", "DIR/slip.abc", "--voice", "A2-E4");
  const inD = asD.find(({ tonic }) => tonic === "D")!;
  const inG = asG.find(({ tonic }) => tonic === "G")!;
  expect([inD.lowMidi, inD.score]).toEqual([inG.lowMidi, inG.score]);
  const minor = await keys("--span", "C4-C5", "--home", "Am", "--voice", "A2-E4");
  expect(minor.map(({ tonic }) => tonic)).toEqual(expect.arrayContaining(["C#", "G#", "F#"]));
});

test("a wider comfort band lowers no score", async () => {
  const narrow = await keys("--melody", "DIR/slip.abc", "--voice", "A2-E4", "--comfort", "E3-A3");
  const wide = await keys("--melody", "DIR/slip.abc", "--voice", "A2-E4", "--comfort", "A2-E4");
  for (const key of narrow)
    expect(wide.find(({ tonic }) => tonic === key.tonic)!.score).toBeGreaterThanOrEqual(key.score);
});

test.each([["E2–E4"], ["E2 - E4"], ["e2-e4"], ["E2-Fb4"]])("the voice %s is read as E2-E4", async (voice) => {
  const args = ["--span", "C4-C5", "--home", "C", "--voice"];
  expect(await keys(...args, voice)).toEqual(await keys(...args, "E2-E4"));
});

test.each([
  ["one note", ["--span", "C4-C4", "--home", "C", "--voice", "E2-E4"]],
  ["a voice of one note", ["--span", "C4-C5", "--home", "C", "--voice", "E4-E4"]],
  ["a span lower than any voice", ["--span", "C-1-C1", "--home", "C", "--voice", "E2-E4"]],
  ["a span higher than any voice", ["--span", "C8-G9", "--home", "C", "--voice", "E2-E4"]],
  ["a span of nine octaves", ["--span", "C0-C9", "--home", "C", "--voice", "E2-E4"]],
])("%s is judged in twelve keys", async (_, args) => {
  const lines = await keys(...args);
  expect(lines).toHaveLength(12);
  for (const { lowMidi, highMidi } of lines) expect(lowMidi >= 0 && highMidi <= 127).toBe(true);
});

test.each<[string, string[]]>([
  ["nothing", []],
  ["a voice alone", ["--voice", "E2-E4"]],
  ["no voice", ["--span", "C4-C5", "--home", "C"]],
  ["an empty voice", ["--span", "C4-C5", "--home", "C", "--voice", ""]],
  ["numbers for notes", ["--span", "60-72", "--home", "C", "--voice", "E2-E4"]],
  ["a band upside down", ["--span", "C5-C4", "--home", "C", "--voice", "E2-E4"]],
  ["a span without home", ["--span", "C4-C5", "--voice", "E2-E4"]],
  ["a home that is none", ["--span", "C4-C5", "--home", "H", "--voice", "E2-E4"]],
  ["a comfort band outside the voice", ["--span", "C4-C5", "--home", "C", "--voice", "E2-E4", "--comfort", "A3-C5"]],
  ["half a comfort band", ["--span", "C4-C5", "--home", "C", "--voice", "E2-E4", "--comfort", "A2"]],
  ["both a melody and a span", ["--melody", "DIR/slip.abc", "--span", "C4-C5", "--voice", "E2-E4"]],
  ["a file without --melody", ["DIR/slip.abc", "--voice", "E2-E4"]],
  ["a melody without a file", ["--melody", "--voice", "E2-E4"]],
  ["a file that is not there", ["--melody", "DIR/none.mid", "--voice", "E2-E4"]],
  ["a folder", ["--melody", "DIR", "--voice", "E2-E4"]],
  ["an empty file", ["--melody", "DIR/empty.mid", "--voice", "E2-E4"]],
  ["what is no MIDI", ["--melody", "DIR/junk.mid", "--voice", "E2-E4"]],
  ["rests alone", ["--melody", "DIR/rests.abc", "--voice", "E2-E4"]],
  ["plain words", ["--melody", "DIR/words.txt", "--voice", "E2-E4"]],
  ["a recording of silence", ["--melody", "DIR/silence.wav", "--voice", "E2-E4"]],
  ["a span of all notes", ["--span", "C-1-G9", "--home", "C", "--voice", "E2-E4"]],
  ["an unknown option", ["--span", "C4-C5", "--home", "C", "--voice", "E2-E4", "--mode", "major"]],
])("%s is bad input, said in one line", async (_, args) => {
  const refused = keys(...args);
  await expect(refused).rejects.toBeInstanceOf(BadInput);
  await expect(refused).rejects.toThrow(/^[^\n]{10,}[^.]\.$/);
});

/** A second of 16-bit silence at 8 kHz. */
function silence(): Uint8Array {
  const bytes = Buffer.alloc(44 + 16_000);
  bytes.write("RIFF", 0);
  bytes.writeUInt32LE(bytes.length - 8, 4);
  bytes.write("WAVEfmt ", 8);
  bytes.writeUInt32LE(16, 16);
  bytes.writeUInt16LE(1, 20);
  bytes.writeUInt16LE(1, 22);
  bytes.writeUInt32LE(8000, 24);
  bytes.writeUInt32LE(16_000, 28);
  bytes.writeUInt16LE(2, 32);
  bytes.writeUInt16LE(16, 34);
  bytes.write("data", 36);
  bytes.writeUInt32LE(16_000, 40);
  return bytes;
}
