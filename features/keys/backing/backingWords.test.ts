import { placeWords } from "./backingWords";

const parts = [
  { at: 2, end: 18, label: "Verse 1" },
  { at: 18, end: 34, label: null },
];

test.each([
  [{ at: 0, bar: -1 }, "Count-in"],
  [{ at: 2, bar: 0 }, "Verse 1, bar 1"],
  [{ at: 7.5, bar: 2 }, "Verse 1, bar 3"],
  [{ at: 18, bar: 8 }, "Bar 9"],
])("the place of %j is %s", (beat, words) => {
  expect(placeWords(parts, beat, 2)).toBe(words);
});
