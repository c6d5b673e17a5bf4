import { measuredLine } from "./measuredLine";

const measures = {
  ...{ sungShare: 0.98, inTune: 0.814, offCents: 12.4, unsteady: null, octaves: 0, moved: 0, tuningCents: 0 },
  ...{ fellShort: null, ranOutOfLow: null, phrases: [], pitches: [], summary: ["You sang well."] },
};

it("tells pupil and teacher the same in figures, and leaves out what could not be told", () => {
  expect(measuredLine(measures)).toBe("98 % of the tune sung, 81 % of it in tune, 12 cents off on average.");
  expect(measuredLine({ ...measures, inTune: null, offCents: null })).toBe("98 % of the tune sung.");
});

it("names the note that was missed and the low one that did not carry", () => {
  const line = measuredLine({
    ...measures,
    fellShort: { midi: 74, semitones: 1, side: "above" },
    ranOutOfLow: { midi: 54, why: "weak" },
  });
  expect(line).toContain("fell short at D5, the low F♯3 was weak.");
});
