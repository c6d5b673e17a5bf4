import { partMaxima } from "@/shared/keys/keyParts";
import { partNames, partWords } from "./partWords";

test("the five parts are named in their order and make up a hundred", () => {
  expect(partNames.map(({ part }) => partMaxima[part])).toEqual([50, 15, 10, 10, 15]);
});

test("what makes a score, in one sentence", () => {
  expect(partWords({ comfort: 50, roomAbove: 15, roomBelow: 10, longHigh: 8, lowCarry: 13 })).toBe(
    "50 of 50 for time in comfort, 15 of 15 for room above, 10 of 10 for room below, 8 of 10 for long high notes, 13 of 15 for low notes.",
  );
});
