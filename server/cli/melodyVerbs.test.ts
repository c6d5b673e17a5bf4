import { mkdtemp, rm, writeFile } from "node:fs/promises";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { singPhrase } from "../../__tests__/sound/singer";
import { writeWav } from "../../__tests__/sound/wavFile";
import { demoSongs } from "../../shared/songs/demoSongs";
import { keyVerb, melodyVerb, transposeVerb } from "./melodyVerbs";
import { linesOf } from "../../__tests__/server/linesOf";
import { BadInput, type Verb } from "./verb";

const [lantern, ferry] = demoSongs as [(typeof demoSongs)[number], (typeof demoSongs)[number]];
let folder: string;
const at = (name: string) => join(folder, name);
const one = async (verb: Verb, ...args: string[]) => (await linesOf(verb, args))[0] as Record<string, unknown>;

beforeAll(async () => {
  folder = await mkdtemp(join(tmpdir(), "larkspan-"));
  const files: Record<string, string> = {
    "lantern.abc": lantern.abc,
    "lantern.txt": lantern.chart,
    "ferry.txt": ferry.chart,
    "minor.txt": "Em Am B7 Em\nEm Am B7 Em",
    "dorian.txt": "Dm C Dm G",
    "unread.txt": "D  Hx9  A\nla la la",
    "prose.txt": "Not a chord in here.",
    "broken.abc": "no tune",
    "other.xyz": "hello",
  };
  for (const [name, content] of Object.entries(files)) await writeFile(at(name), content);
  await writeFile(at("bytes.txt"), Uint8Array.of(0, 1, 2));
  await writeFile(at("empty.txt"), "");
  await writeFile(at("bom.txt"), "\ufeffG  D\nla la\n");
  await writeFile(at("crlf.txt"), "G  D\r\nla la\r\n");
  await writeFile(at("sixteen.txt"), Buffer.from("\ufeffG  D\nla la\n", "utf16le"));
  await writeFile(at("western.txt"), Buffer.from("G  D\ncafé au quai\n", "latin1"));
  await writeFile(at("tabs.txt"), "G\tD\nla\tla\n");
  const doReMiFaSo = [50, 52, 54, 55, 57, 54, 50].map((midi) => ({ midi: midi - 0.3, durationS: 0.7 }));
  const { pcm, sampleRate } = singPhrase({ notes: doReMiFaSo, seed: 3, consonants: 0 });
  writeWav(at("sung.wav"), pcm, sampleRate);
  writeWav(at("silent.wav"), new Float32Array(44_100 * 3), 44_100);
});
afterAll(() => rm(folder, { recursive: true }));

describe("melody", () => {
  test("prints the agreed fields of a file in quarter notes", async () => {
    const line = await one(melodyVerb, at("lantern.abc"));
    expect(Object.keys(line)).toEqual(
      "file notes home mode lowMidi highMidi tessituragram mean sd q1 median q3".split(" "),
    );
    expect(line).toMatchObject({
      file: at("lantern.abc"),
      home: "D",
      mode: "major",
      lowMidi: 57,
      highMidi: 71,
      median: 66,
    });
    expect((line["notes"] as unknown[])[0]).toEqual({ start: 0, duration: 0.5, midi: 66 });
  });

  test("prints what was sung in a recording, in seconds, and names the home note of an evenly flat singer", async () => {
    const line = await one(melodyVerb, at("sung.wav"));
    expect(line).toMatchObject({ home: "D", mode: "major" });
    const notes = line["notes"] as { start: number; duration: number; midi: number }[];
    expect(notes.map(({ midi }) => Math.round(midi + 0.3))).toEqual([50, 52, 54, 55, 57, 54, 50]);
    for (const { duration } of notes) expect(duration).toBeGreaterThan(0.4);
  });

  test("prints a line a file", async () => {
    expect(await linesOf(melodyVerb, [at("lantern.abc"), at("lantern.abc")])).toHaveLength(2);
  });
});

describe("key", () => {
  test("prints the agreed fields for charts, melody files and recordings", async () => {
    const lines = (await linesOf(keyVerb, [
      at("lantern.txt"),
      at("ferry.txt"),
      at("lantern.abc"),
      at("sung.wav"),
    ])) as Record<string, unknown>[];
    expect(lines.map(({ tonic, mode }) => `${String(tonic)} ${String(mode)}`)).toEqual([
      "D major",
      "G major",
      "D major",
      "D major",
    ]);
    for (const line of lines) {
      expect(Object.keys(line)).toEqual(["file", "tonic", "mode", "confidence", "runnerUp", "reasons"]);
      expect(Object.keys(line["runnerUp"] as object)).toEqual(["tonic", "mode"]);
    }
  });
});

describe("transpose", () => {
  test("finds the key it comes from, or takes it", async () => {
    const found = await one(transposeVerb, at("lantern.txt"), "--to", "E♭");
    expect(Object.keys(found)).toEqual(["file", "from", "to", "text"]);
    expect(found).toMatchObject({ from: "D", to: "Eb" });
    expect(String(found["text"]).split("\n").slice(0, 3)).toEqual([
      "Verse 1",
      "Eb             Ab               Eb",
      "Lantern on the slipway, burning low,",
    ]);
    expect(await one(transposeVerb, at("lantern.txt"), "--to=Eb", "--from=D")).toEqual(found);
  });

  test("keeps the mode of the song", async () => {
    expect(await one(transposeVerb, at("minor.txt"), "--to", "Am")).toMatchObject({
      from: "Em",
      to: "Am",
      text: "Am Dm E7 Am\nAm Dm E7 Am",
    });
    expect(await one(transposeVerb, at("minor.txt"), "--to", "A")).toMatchObject({ from: "Em", to: "Am" });
  });

  test("says the key as it was asked for, where the song has such a third", async () => {
    expect(await one(transposeVerb, at("dorian.txt"), "--to", "E dorian")).toMatchObject({
      from: "D dorian",
      to: "E dorian",
      text: "Em D Em A",
    });
    expect(await one(transposeVerb, at("minor.txt"), "--to", "A", "--from", "Em")).toMatchObject({ to: "Am" });
    await expect(one(transposeVerb, at("minor.txt"), "--to", "A mixolydian", "--from", "Em")).rejects.toThrow(
      /stays minor when it is moved; name a minor key/,
    );
  });

  test("a tonic alone takes the mode along, a key that is named in full must have the song's third", async () => {
    expect(await one(transposeVerb, at("minor.txt"), "--to", "F#")).toMatchObject({ from: "Em", to: "F#m" });
    expect(await one(transposeVerb, at("minor.txt"), "--to", "F# minor")).toMatchObject({ from: "Em", to: "F#m" });
    expect(await one(transposeVerb, at("lantern.txt"), "--to", "E major")).toMatchObject({ from: "D", to: "E" });
    expect(await one(transposeVerb, at("dorian.txt"), "--to", "E")).toMatchObject({ from: "D dorian", to: "E dorian" });
    await expect(one(transposeVerb, at("minor.txt"), "--to", "E major")).rejects.toThrow(
      "A song in Em stays minor when it is moved; name a minor key.",
    );
  });

  test.each([
    ["bom.txt", "A  E\nla la\n"],
    ["crlf.txt", "A  E\r\nla la\r\n"],
    ["sixteen.txt", "A  E\nla la\n"],
    ["western.txt", "A  E\ncafé au quai\n"],
    ["tabs.txt", "A       E\nla      la\n"],
  ])("reads %s as its writer's program wrote it", async (name, text) => {
    expect(await one(transposeVerb, at(name), "--to", "A", "--from", "G")).toMatchObject({ text });
  });

  test("leaves what it cannot read", async () => {
    expect(await one(transposeVerb, at("unread.txt"), "--to", "G", "--from", "D")).toMatchObject({
      text: "G  Hx9  D\nla la la",
    });
  });
});

test("a bad file silences no other: a line each, and one line about the bad ones at the end", async () => {
  const lines: object[] = [];
  const read = async () => {
    for await (const line of await keyVerb.run([at("gone.txt"), at("lantern.txt"), at("prose.txt"), at("minor.txt")]))
      lines.push(line);
  };
  await expect(read()).rejects.toThrow(`${at("gone.txt")}: there is no such file. 2 of 4 files could not be used.`);
  expect(lines).toMatchObject([{ file: at("lantern.txt") }, { file: at("minor.txt") }]);
});

test.each<[string, Verb, string[], RegExp]>([
  ["no file", melodyVerb, [], /Name a file/],
  ["a file that is missing", keyVerb, ["nowhere.txt"], /no such file/],
  ["a folder", keyVerb, ["."], /no file/],
  ["a chart without chords", keyVerb, ["prose.txt"], /no chords/],
  ["an empty chart", keyVerb, ["empty.txt"], /is empty/],
  ["a melody where a chart is wanted", transposeVerb, ["lantern.abc", "--to", "D"], /no chart/],
  ["bytes for a chart", transposeVerb, ["bytes.txt", "--to", "D"], /not a text file/],
  ["a broken melody", melodyVerb, ["broken.abc"], /K: line/],
  ["a kind that is not known", melodyVerb, ["other.xyz"], /not known/],
  ["a silent recording", melodyVerb, ["silent.wav"], /\.$/],
  ["no target", transposeVerb, ["lantern.txt"], /--to/],
  ["a target that is no key", transposeVerb, ["lantern.txt", "--to", "H"], /"H"/],
  ["a source that is no key", transposeVerb, ["lantern.txt", "--to", "D", "--from", "X"], /"X"/],
  ["a minor target for a major song", transposeVerb, ["lantern.txt", "--to", "Bm"], /stays major/],
  ["an option that is not known", keyVerb, ["lantern.txt", "--loud"], /option/i],
])("%s is bad input, told in one line", async (_, verb, args, message) => {
  const placed = args.map((argument) => (/\.\w+$|^\.$/.test(argument) ? at(argument) : argument));
  const failure = linesOf(verb, placed);
  await expect(failure).rejects.toThrow(BadInput);
  await expect(failure).rejects.toThrow(message);
  await failure.catch((error: Error) => expect(error.message).not.toContain("\n"));
});
