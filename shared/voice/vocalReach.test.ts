import fc from "fast-check";
import { comfortBand, probableReach } from "./vocalReach";

const order = fc
  .tuple(
    fc.double({ min: 36, max: 84, noNaN: true }),
    fc.array(fc.double({ min: 0, max: 1, noNaN: true }), { minLength: 5, maxLength: 5 }),
    fc.double({ min: 0, max: 36, noNaN: true }),
  )
  .map(([lowMidi, shares, span]) => {
    const [p5, q1, median, q3, p95] = shares.sort((a, b) => a - b).map((x) => lowMidi + x * span) as [
      number,
      number,
      number,
      number,
      number,
    ];
    return { range: { lowMidi, highMidi: lowMidi + span }, spread: { p5, q1, median, q3, p95 } };
  });

test("the comfortable band lies inside the range and is never upside down", () => {
  fc.assert(
    fc.property(order, ({ range, spread }) => {
      const comfort = comfortBand(range, spread);
      expect(comfort.lowMidi).toBeGreaterThanOrEqual(range.lowMidi);
      expect(comfort.highMidi).toBeLessThanOrEqual(range.highMidi + 1e-9);
      expect(comfort.highMidi).toBeGreaterThanOrEqual(comfort.lowMidi);
      expect(comfort.lowMidi).toBeLessThanOrEqual(Math.max(range.lowMidi, spread.q1) + 1e-9);
      expect(comfort.highMidi).toBeGreaterThanOrEqual(Math.min(range.highMidi, spread.q3) - 1e-9);
    }),
    { numRuns: 200, seed: 3 },
  );
});

test("an ordinary take keeps two and a half semitones at the top and one and a half at the bottom", () => {
  const spread = { p5: 46, q1: 50, median: 53, q3: 56, p95: 61 };
  expect(comfortBand({ lowMidi: 45, highMidi: 62 }, spread)).toEqual({ lowMidi: 46.5, highMidi: 59.5 });
});

test("the reach is never inside what was heard, and the less was heard the more is added", () => {
  const reach = (span: number) => 50 - probableReach({ lowMidi: 50, highMidi: 50 + span }).lowMidi;
  const steps = [0, 5, 10, 14, 17, 20, 30].map(reach);
  expect(steps.every((step, i) => step > 0 && (i === 0 || step <= steps[i - 1]!))).toBe(true);
  expect(reach(30)).toBe(0.5);
});
