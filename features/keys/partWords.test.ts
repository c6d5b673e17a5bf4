import { partMaxima } from "@/shared/keys/keyParts";
import { partNames, partWords, roomWords } from "./partWords";

test("the five parts are named in their order and make up a hundred", () => {
  expect(partNames.map(({ part }) => partMaxima[part])).toEqual([50, 15, 10, 10, 15]);
});

test("what makes a score, in one sentence", () => {
  const rooms = { above: { semitones: 0 }, below: { semitones: 5 } };
  expect(partWords({ comfort: 50, roomAbove: 6, roomBelow: 10, longHigh: 8, lowCarry: 13 }, rooms)).toBe(
    "50 of 50 for time in comfort, 6 of 15 for room above (0 semitones to the top of your range), 10 of 10 for room below (5 semitones to its bottom), 8 of 10 for long high notes, 13 of 15 for low notes.",
  );
});

test("room is said to count to the range, past its end too", () => {
  expect(roomWords({ above: { semitones: -2 }, below: { semitones: 1 } })).toMatch(
    /to the ends of your range, not of the comfort band: 2 semitones past the top, 1 semitone to the bottom\./,
  );
});
