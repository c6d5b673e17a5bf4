import type { KeyScore } from "@/shared/keys/keyScore";
import { commonScale, keyRows, rowOf, spellingIn, wholeVoice } from "./keyRows";

const score = (
  shift: number,
  points: number,
  reserves: { upper: number; lower: number },
  beyond = false,
): KeyScore => ({
  tonic: "C",
  octave: 0,
  shift,
  lowMidi: 62 + shift,
  highMidi: 76 + shift,
  score: points,
  parts: { comfort: 50, roomAbove: 15, roomBelow: 10, longHigh: 8, lowCarry: points - 83 },
  beyond,
  reserves: { ...reserves, tessituraShift: 0 },
  marks: [],
  reason: "All of it sits in your comfort band.",
  coarse: false,
});
const scores = [
  score(-7, 96, { lower: 4, upper: 5 }),
  score(-6, 94, { lower: 5, upper: 4 }),
  score(-10, 81, { lower: 1, upper: 8 }),
  score(0, 39, { lower: 11, upper: -2 }, true),
];
const inG = { tonic: "G", mode: "major" } as const;
const rows = keyRows(scores, inG, (key) => [key.tonic, "F#m7b5"]);

test("a row names its key from the written one, with glyphs", () => {
  expect(rows.map((row) => [row.sign, row.moved])).toEqual([
    ["C", "7 down"],
    ["D♭", "6 down"],
    ["A", "10 down"],
    ["G", "written"],
  ]);
  expect(rows[1]?.chords).toEqual(["D♭", "F♯m7♭5"]);
  expect(rows[1]?.span).toBe("A♭3 to B♭4");
});

test("the written key in another octave says so", () => {
  const moved = (shift: number) => keyRows([score(shift, 90, { lower: 1, upper: 1 })], inG, () => [])[0]?.moved;
  expect([0, -12, -24].map(moved)).toEqual(["written", "written, an octave down", "written, 2 octaves down"]);
});

test("room shows semitones, a narrow rest and what lies beyond", () => {
  expect(rows[2]?.below).toEqual({ semitones: 1, text: "1", tone: "honey" });
  expect(rows[3]?.above).toEqual({ semitones: -2, text: "▲ 2", tone: "brick" });
  expect(rows[0]?.above).toEqual({ semitones: 5, text: "5", tone: "ink" });
});

test("the whole row can be spoken", () => {
  expect(rows[0]?.spoken).toBe("C, 96 of 100. The tune runs G3 to A4. All of it sits in your comfort band.");
});

test("a key is found by tonic and move, else by tonic under any name", () => {
  expect(rowOf(rows, "C", -7)?.shift).toBe(-7);
  expect(rowOf(rows, "C#", 42)?.sign).toBe("D♭");
  expect(rowOf(rows, "E", 0)).toBeNull();
});

test("one scale holds the voice and every row", () => {
  const voice = { range: { lowMidi: 51.3, highMidi: 74 }, comfort: { lowMidi: 55, highMidi: 70 } };
  expect(commonScale(rows, voice)).toEqual({ low: 49, high: 78 });
});

test("pictures show the voice on whole semitones", () => {
  const voice = { range: { lowMidi: 51.3, highMidi: 73.6 }, comfort: { lowMidi: 54.6, highMidi: 70.3 } };
  expect(wholeVoice(voice)).toEqual({ range: { lowMidi: 51, highMidi: 74 }, comfort: { lowMidi: 55, highMidi: 70 } });
});

test.each([
  ["F", "major", "flats"],
  ["D", "minor", "flats"],
  ["F#", "minor", "sharps"],
  ["C", "major", "sharps"],
] as const)("notes in %s %s are spelled with %s", (tonic, mode, spelling) => {
  expect(spellingIn({ tonic, mode })).toBe(spelling);
});
