import { partOrder } from "./partOrder";

test("names the parts as they are played, with how often", () => {
  const chart = "G  C\nhumming\n\nVerse 1\nG\nLow tide\n\n[Chorus] x2\nC\nStill\n\n[Tag] 3 times\nG\nAway";
  expect(partOrder(chart)).toBe("Verse 1, chorus twice, tag 3 times.");
});

test("says nothing where there is no order to keep in mind", () => {
  expect(partOrder("Verse\nG\nLow tide")).toBe("");
  expect(partOrder("G\nLow tide")).toBe("");
});
