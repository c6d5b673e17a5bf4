import { lengthSign, lengthWords, nextLength } from "./lengthWords";

test("usual lengths have their names and signs, sung ones their figures", () => {
  expect([0.5, 1, 1.5, 4, 0.83, 2.31].map(lengthSign)).toEqual(["½", "1", "1½", "4", "0.83", "2.3"]);
  expect([0.5, 1.5, 0.83].map(lengthWords)).toEqual(["eighth", "dotted quarter", "0.83 beats"]);
});

test("longer and shorter walk along the usual lengths and stop at the ends", () => {
  expect(nextLength(1, 1)).toBe(1.5);
  expect(nextLength(0.83, 1)).toBe(1);
  expect(nextLength(0.83, -1)).toBe(0.75);
  expect(nextLength(0.25, -1)).toBe(0.25);
  expect(nextLength(8, 1)).toBe(8);
});
