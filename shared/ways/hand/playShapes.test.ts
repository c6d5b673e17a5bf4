import { findPreset } from "../../instruments/presets";
import { parseChord } from "../../music/chord";
import { metreOf } from "../../songs/backing/metre";
import { planBacking } from "../../songs/backing/planBacking";
import { sheetStrokes } from "../../sheets/sheetStrokes";
import { findShapes } from "../findShapes";
import { playShapes } from "./playShapes";
import { commonPatterns, fitsMetre, stepsOf, type Step, type StrokePattern } from "./strokePattern";

const song = { chart: "| D | G | D |", writtenKey: null, notes: [], beatsPerBar: 4, tempo: 120 };
const key = { tonic: "D", shift: 0 };

function plan(id: string, steps: Step[], setting = { retune: 0, capo: 0 }) {
  const instrument = findPreset(id)!;
  const chords = ["D", "G"].map((written) => {
    return { written, shape: findShapes(parseChord(written)!, instrument)[0] ?? null };
  });
  const pattern: StrokePattern = { name: "own", beats: 4, steps };
  const hand = playShapes({ chords, instrument, setting, pattern });
  const found = planBacking(song, key, { hand })!;
  return { ...found, strokes: found.events.filter(({ kind }) => kind !== "click") };
}

const eighth = 0.25;

test("strokes sound the very strings of the shape, at the song's tempo, down and up as the pattern says", () => {
  const { strokes, countInS } = plan("box-adf", ["down", "rest", "down", "up", "rest", "up", "rest", "rest"]);
  const bar = strokes.filter(({ at }) => at < countInS + 2 - 1e-9);
  expect(bar.map(({ kind, at }) => [kind, Math.round((at - countInS) / eighth)])).toEqual([
    ["strum-down", 0],
    ["strum-down", 2],
    ["strum-up", 3],
    ["strum-up", 5],
  ]);
  // Open A D F♯ is D: A3 D4 F♯4.
  expect(bar.every(({ midis }) => midis.join() === "57,62,66")).toBe(true);
});

test("retune and capo are heard", () => {
  const [first] = plan("box-adf", ["down", ...Array<Step>(7).fill("rest")], { retune: -2, capo: 5 }).strokes;
  expect(first!.midis).toEqual([60, 65, 69]);
});

test("a high string on the bass side is struck first by a down stroke, though it is not the lowest", () => {
  const [first] = plan("ukulele", ["down", ...Array<Step>(7).fill("rest")]).strokes;
  // G4 C4 E4 A4 with D at 2 2 2 0.
  expect(first!.midis).toEqual([69, 62, 66, 69]);
});

test("the bass takes the lowest root and the next string by turns, plucks go through the rest and back", () => {
  const steps: Step[] = ["bass", "pluck", "pluck", "pluck", "bass", "pluck", "rest", "rest"];
  const { strokes, countInS } = plan("ukulele-baritone", steps);
  const bar = strokes.filter(({ at }) => at < countInS + 2 - 1e-9);
  // D G B E with D at 0 2 3 2: D3 A3 D4 F♯4.
  expect(bar.map(({ kind, midis }) => [kind, midis[0]])).toEqual([
    ["bass", 50],
    ["pluck", 57],
    ["pluck", 62],
    ["pluck", 66],
    ["bass", 57],
    ["pluck", 62],
  ]);
});

test("a change of chord is heard where the pattern rests, and the last bar is struck once", () => {
  const { strokes, countInS } = plan("box-adf", ["rest", "rest", "down", "rest", "rest", "rest", "rest", "rest"]);
  expect(strokes.map(({ at }) => Math.round((at - countInS) / eighth))).toEqual([0, 2, 8, 10, 16]);
});

test.each([3, 4, 6])("the usual patterns with %s in the bar fill it, differ, and begin on the first beat", (beats) => {
  const metre = metreOf(beats);
  const patterns = commonPatterns(metre);
  expect(patterns.length).toBeGreaterThanOrEqual(5);
  expect(new Set(patterns.map(({ steps }) => steps.join())).size).toBe(patterns.length);
  for (const pattern of patterns) {
    expect(fitsMetre(pattern, metre)).toBe(true);
    expect(pattern.steps[0]).not.toBe("rest");
  }
});

test("metres without patterns of their own get a stroke on every beat", () => {
  for (const beats of [1, 2, 5, 7, 9, 12, 16]) {
    const metre = metreOf(beats);
    const [pattern] = commonPatterns(metre);
    expect(pattern!.steps).toHaveLength(stepsOf(metre));
  }
  expect(commonPatterns(metreOf(5))[0]!.steps.filter((step) => step === "down")).toHaveLength(5);
});

test("on the sheet the strokes stand at their quarters, stressed beats strong", () => {
  const six = metreOf(6);
  const { strokes, words, quarters } = sheetStrokes(commonPatterns(six)[2]!, six);
  expect([words, quarters]).toEqual(["Alternating bass", 3]);
  expect(strokes.map(({ at, kind, strong }) => `${at} ${kind}${strong ? "!" : ""}`)).toEqual([
    "0 bass!",
    "0.5 down",
    "1 up",
    "1.5 bass!",
    "2 down",
    "2.5 up",
  ]);
});
