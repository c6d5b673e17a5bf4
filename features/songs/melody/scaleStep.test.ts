import { homeUnder, noteAndStep, readNoteOrStep, stepName, stepSpoken } from "./scaleStep";

test("steps count from the home note, with a sign for each octave", () => {
  expect([62, 57, 74, 65, 50].map((midi) => stepName(midi, 62))).toEqual(["1", "5,", "1'", "♭3", "1,"]);
  expect(noteAndStep(57, 62)).toBe("A3, step 5,");
});

test("a screen reader hears an octave in words, not a comma", () =>
  expect([62, 57, 74, 47, 88].map((midi) => stepSpoken(midi, 62))).toEqual([
    "1",
    "5 below home",
    "1, an octave up",
    "6, 2 octaves down",
    "2, 2 octaves up",
  ]));

test.each([
  ["A3", 57],
  ["5,", 57],
  ["5 below home", 57],
  ["5 below", 57],
  ["1'", 74],
  ["1 above home", 74],
  ["♭3", 65],
  ["b7,", 60],
  ["3", 66],
])("%s is read over D4 as %i", (text, midi) => expect(readNoteOrStep(text, 62)).toBe(midi));

test.each(["", "8", "H", "A", "5 miles", "1''''''''''"])("%j is no note", (text) =>
  expect(readNoteOrStep(text, 62)).toBeNull(),
);

test("a step needs a home note, a name does not", () => {
  expect(readNoteOrStep("5,", null)).toBeNull();
  expect(readNoteOrStep("D4", null)).toBe(62);
});

test("every note of four octaves is read back from its step", () => {
  for (let midi = 38; midi <= 86; midi += 1) expect(readNoteOrStep(stepName(midi, 62), 62)).toBe(midi);
});

test("steps are counted from the home note with most of the tune over it", () => {
  expect(homeUnder([57, 62, 64, 66, 69, 71], 2)).toBe(62);
  expect(homeUnder([62, 74], 2)).toBe(62);
  expect(homeUnder([], 2)).toBe(62);
});
