import { keptTune, keptWords } from "./keptTune";

const notes = [
  { start: 0, duration: 1, midi: 57 },
  { start: 1, duration: 1, midi: 64 },
];
const inC = { writtenKey: { tonic: "C", mode: "major" as const } };

test("a tune sung in A for a chart in C is kept three semitones higher, and says so", () => {
  const kept = keptTune(inC, { kind: "melody", notes }, "A")!;
  expect(kept.move).toBe(3);
  expect(kept.tune).toMatchObject({ kind: "melody", home: "C" });
  expect(kept.tune.kind === "melody" && kept.tune.notes.map(({ midi }) => midi)).toEqual([60, 67]);
  expect(keptWords(inC, "A", 3)).toBe(
    "The chart is written in C and this tune is in A. It is kept three semitones higher, in C, so that chart and tune sound together. The chart stays as it is.",
  );
});

test("without a written key, or in the same one, nothing moves", () => {
  expect(keptTune({ writtenKey: null }, { kind: "melody", notes }, "A")).toMatchObject({
    move: 0,
    tune: { home: "A", notes },
  });
  expect(keptTune(inC, { kind: "span", lowMidi: 57, highMidi: 69 }, "C")).toMatchObject({ move: 0 });
  expect(keptWords(inC, "C", 0)).toBeNull();
});

test("there is no tune without notes, and none beyond the MIDI numbers", () => {
  expect(keptTune(inC, { kind: "melody", notes: [] }, "A")).toBeNull();
  expect(keptTune(inC, { kind: "span", lowMidi: 120, highMidi: 127 }, "A")).toBeNull();
});
