import { timeForKey } from "./TrimHandle";

it.each([
  ["ArrowRight", 3.1],
  ["ArrowUp", 3.1],
  ["ArrowLeft", 2.9],
  ["PageUp", 4],
  ["PageDown", 2],
  ["Home", 0],
  ["End", 7],
])("%s moves a handle at 3 s to %d s", (key, seconds) => {
  expect(timeForKey(key, 3, 0, 7)).toBeCloseTo(seconds, 9);
});

it("never leads past the ends, and leaves other keys alone", () => {
  expect(timeForKey("PageUp", 6.5, 0, 7)).toBe(7);
  expect(timeForKey("ArrowLeft", 0, 0, 7)).toBe(0);
  expect(timeForKey("Tab", 3, 0, 7)).toBeNull();
});
