import { clippedShare, levelDbfs } from "./level";

const sine = Float32Array.from({ length: 4410 }, (_, i) => Math.sin((2 * Math.PI * 100 * i) / 44100));

test("a full-scale sine stands at 0 dBFS (AES17), half of it at -6", () => {
  expect(levelDbfs(sine)).toBeCloseTo(0, 3);
  expect(levelDbfs(sine.map((x) => x / 2))).toBeCloseTo(-6.0206, 3);
  expect(levelDbfs(new Float32Array(10))).toBe(-Infinity);
});

test("an empty stretch is the caller's mistake", () => {
  expect(() => levelDbfs(new Float32Array(0))).toThrow(RangeError);
  expect(() => levelDbfs(sine, 5, 5)).toThrow(RangeError);
});

test("flat tops count as clipped, round ones do not", () => {
  expect(clippedShare(sine.map((x) => Math.max(-0.5, Math.min(0.5, x))))).toBeGreaterThan(0.5);
  expect(clippedShare(Float32Array.from({ length: 1000 }, (_, i) => Math.sin(i)))).toBeLessThan(0.01);
  expect(clippedShare(new Float32Array(0))).toBe(0);
});
