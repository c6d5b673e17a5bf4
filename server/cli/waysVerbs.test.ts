import { mkdtemp, writeFile } from "node:fs/promises";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { keysVerb } from "./keysVerb";
import { linesOf } from "../../__tests__/server/linesOf";
import { BadInput, type Verb } from "./verb";
import { instrumentsVerb, shapesVerb, tensionVerb, waysVerb } from "./waysVerbs";

const words = (line: string) => line.split(" ").filter(Boolean);
let folder: string;

beforeAll(async () => {
  folder = await mkdtemp(join(tmpdir(), "larkspan-"));
  await writeFile(join(folder, "slip.txt"), "D          G\nLamps on the harbour\nA     D\nburning\n");
  await writeFile(join(folder, "slip.abc"), "X:1\nT:Slip\nM:3/4\nL:1/4\nK:G\nD G2|A B2|d c A|G3|\n");
  await writeFile(join(folder, "prose.txt"), "No chords in here at all.\n");
});

test("keys prints a line a key with the agreed fields, best first", async () => {
  const fields = ["tonic", "octave", "lowMidi", "highMidi", "score", "parts", "beyond", "reason"];
  for (const input of [`--melody ${join(folder, "slip.abc")}`, "--span D4-D5 --home G"]) {
    const lines = await linesOf(keysVerb, words(`${input} --voice A2-E4 --comfort C3-C4`));
    expect(lines).toHaveLength(12);
    for (const line of lines) expect(Object.keys(line)).toEqual(fields);
    expect(lines[0]).toMatchObject({ beyond: false, parts: { comfort: 50 } });
  }
});

test("without a comfort band two semitones above and one below are kept", async () => {
  const given = await linesOf(keysVerb, words("--span C4-C5 --home C --voice E2-E4 --comfort F2-D4"));
  expect(await linesOf(keysVerb, words("--span C4-C5 --home C --voice E2-E4"))).toEqual(given);
});

test("shapes prints a line a shape, easiest first", async () => {
  const lines = await linesOf(shapesVerb, words("C --tuning A3,D4,F#4"));
  expect(lines[0]).toMatchObject({ frets: [3, 2, 1], fingers: [3, 2, 1], barre: null });
  expect(Object.keys(lines[0]!)).toEqual(["frets", "fingers", "barre", "reachMm", "ease"]);
  expect((await linesOf(shapesVerb, words("C --tuning A3,D4,F♯4 --frets 9"))).length).toBeLessThan(lines.length);
  const all = await linesOf(shapesVerb, words("C --tuning G4,C4,E4,A4 --scale 432 --all"));
  expect(all.length).toBeGreaterThan((await linesOf(shapesVerb, words("C --tuning G4,C4,E4,A4 --scale 432"))).length);
});

test("ways finds the key of the chart, and takes another when told", async () => {
  const lines = await linesOf(waysVerb, words(`${join(folder, "slip.txt")} --to C --instrument box-adf`));
  const fields = ["retune", "capo", "shapeKey", "soundingKey", "chords", "difficulty", "cautions", "why"];
  for (const line of lines) expect(Object.keys(line)).toEqual(fields);
  expect(lines).toContainEqual(expect.objectContaining({ retune: -2, capo: 0, shapeKey: "D", soundingKey: "C" }));
  const told = await linesOf(waysVerb, words(`${join(folder, "slip.txt")} --to C --instrument box-adf --from G`));
  const asIs = told.find((line) => "retune" in line && line.retune === 0 && "capo" in line && line.capo === 0);
  expect(asIs).toMatchObject({
    chords: expect.arrayContaining([expect.objectContaining({ written: "D", played: "G" })]),
  });
});

test("instruments and tension print a line each, strings low to high", async () => {
  expect(await linesOf(instrumentsVerb, [])).toContainEqual({
    id: "box-adf",
    name: "Box guitar, A-D-F♯",
    strings: ["A3", "D4", "F#4"],
    scaleMm: 635,
    frets: 20,
  });
  // D'Addario's chart 13934: a 10-46 set, nickel-plated there, so the plain strings are compared.
  const lines = await linesOf(
    tensionVerb,
    words("--instrument guitar --shift -2 --gauges .046,.036,.026,.017,.013,.010"),
  );
  expect(lines).toHaveLength(6);
  expect(lines[5]).toEqual({ string: "E4", gauge: 0.01, beforeLb: 16.2, afterLb: 12.86, verdict: "fine" });
});

test("tension judges from the note a set was made for, and says by null what it does not know", async () => {
  const down = await linesOf(tensionVerb, words("--instrument guitar-whole-down --shift -1"));
  expect(down.map((line) => "verdict" in line && line.verdict)).toEqual(Array.from({ length: 6 }, () => "slack"));
  const [uke] = await linesOf(tensionVerb, words("--instrument ukulele --shift +2"));
  expect(uke).toEqual({ string: "G4", gauge: null, beforeLb: null, afterLb: null, verdict: "unsafe" });
  // D'Addario's chart 13934, clear nylon .028: 2.216e-5 lb/in.
  const nylon = await linesOf(tensionVerb, words("--instrument ukulele --shift 0 --gauges .024,.032,.034,.028"));
  expect(nylon[3]).toMatchObject({ string: "A4", gauge: 0.028, beforeLb: 9.99 });
  const aea = await linesOf(tensionVerb, words("--instrument box-aea --shift 0 --gauges .042,.032,.024"));
  for (const line of aea) expect(line).toMatchObject({ beforeLb: expect.any(Number), verdict: "fine" });
});

test("instruments lists every preset with the agreed fields, the banjo's short string among the others", async () => {
  const lines = await linesOf(instrumentsVerb, []);
  expect(lines.length).toBeGreaterThanOrEqual(30);
  for (const line of lines) expect(Object.keys(line)).toEqual(["id", "name", "strings", "scaleMm", "frets"]);
  expect(lines).toContainEqual(expect.objectContaining({ id: "banjo", strings: ["G4", "D3", "G3", "B3", "D4"] }));
});

const cases: [string, Verb, string][] = [
  ["a band upside down", keysVerb, "--span C4-C5 --home C --voice E4-E2"],
  ["a band that is none", keysVerb, "--span C4 --home C --voice E2-E4"],
  ["comfort outside the voice", keysVerb, "--span C4-C5 --home C --voice E2-E4 --comfort C2-C4"],
  ["no voice", keysVerb, "--span C4-C5 --home C"],
  ["no home for a span", keysVerb, "--span C4-C5 --voice E2-E4"],
  ["a file that is not there", keysVerb, "--melody nowhere.mid --voice E2-E4"],
  ["an unknown option", keysVerb, "--loud"],
  ["no chord", shapesVerb, "--tuning A3,D4"],
  ["what is no chord", shapesVerb, "Amen --tuning A3,D4,F#4"],
  ["what is no note", shapesVerb, "C --tuning A3,loud"],
  ["frets below zero", shapesVerb, "C --tuning A3,D4,F#4 --frets -1"],
  ["a scale of words", shapesVerb, "C --tuning A3,D4,F#4 --scale long"],
  ["an unknown instrument", tensionVerb, "--instrument lute --shift 1"],
  ["an argument for a list", instrumentsVerb, "all"],
  ["no shift", tensionVerb, "--instrument guitar"],
  ["a shift of words", tensionVerb, "--instrument guitar --shift down"],
  ["a shift out of all reach", tensionVerb, "--instrument guitar --shift 40"],
  ["gauges of words", tensionVerb, "--instrument box-gdg --shift 1 --gauges thick,thin,thin"],
  ["half a semitone", tensionVerb, "--instrument guitar --shift 0.5"],
  ["too few gauges", tensionVerb, "--instrument guitar --shift 1 --gauges .012,.016"],
  ["no file", waysVerb, "--to C --instrument guitar"],
];
test.each(cases)("%s is bad input, said in one line", async (_, verb, line) => {
  const refused = linesOf(verb, words(line));
  await expect(refused).rejects.toBeInstanceOf(BadInput);
  await expect(refused).rejects.toThrow(/^[^\n]{10,}\.$/);
});

test("keys without a tune says both ways to give one", async () => {
  await expect(linesOf(keysVerb, words("--voice E2-E4"))).rejects.toThrow(/--melody FILE, or --span LOW-HIGH --home/);
});

test("a chart without chords and a key that is none are bad input", async () => {
  const run = (file: string, rest: string) => linesOf(waysVerb, words(`${join(folder, file)} ${rest}`));
  await expect(run("prose.txt", "--to C --instrument guitar")).rejects.toThrow("prose.txt holds no chords.");
  await expect(run("slip.txt", "--to Q --instrument guitar")).rejects.toThrow('not "Q".');
});
