import { keyToBegin } from "./keyToBegin";

const rows = [
  { shift: -12, score: 34 },
  { shift: -8, score: 98 },
  { shift: -5, score: 83 },
];

test("of the keys side by side the best stands out, not the one that was pinned first", () => {
  expect(keyToBegin(rows, null, null)).toBe(rows[1]);
  expect(keyToBegin([], null, null)).toBeNull();
});

test("a decided key comes before the best, a pressed one before both", () => {
  expect(keyToBegin(rows, null, -5)).toBe(rows[2]);
  expect(keyToBegin(rows, -12, -5)).toBe(rows[0]);
  expect(keyToBegin(rows, null, 3)).toBe(rows[1]);
});
