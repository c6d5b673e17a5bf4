import { cutContour, smoothContour } from "./noteContour";

const flat = (midi: number, frames: number) => new Array<number>(frames).fill(midi);
const vibrato = (midi: number, frames: number, hz: number, semitones: number) =>
  Array.from({ length: frames }, (_, i) => midi + semitones * Math.sin((2 * Math.PI * hz * i) / 100));

test.each([5, 5.5, 6, 6.5, 7])("vibrato of %d Hz and a semitone gives way to its centre", (hz) => {
  const smooth = smoothContour(vibrato(60, 120, hz, 1));
  for (const midi of smooth) expect(Math.abs(midi - 60)).toBeLessThan(0.3);
});

test("a step stays a step", () => {
  const smooth = smoothContour([...flat(60, 40), ...flat(64, 40)]);
  expect(smooth.slice(0, 39).every((m) => Math.abs(m - 60) < 0.05)).toBe(true);
  expect(smooth.slice(41).every((m) => Math.abs(m - 64) < 0.05)).toBe(true);
});

test("notes are cut where the pitch steps, and a held note stays whole", () => {
  const contour = smoothContour([...flat(60, 30), ...flat(61, 30), ...vibrato(65, 60, 6, 0.7)]);
  const pieces = cutContour(contour);
  expect(pieces.map((p) => p.to)).toHaveLength(3);
  expect(Math.abs(pieces[0]!.to - 30)).toBeLessThanOrEqual(1);
  expect(Math.abs(pieces[1]!.to - 60)).toBeLessThanOrEqual(1);
  expect(pieces[2]!.to).toBe(120);
});

test("an empty contour has no pieces", () => {
  expect(smoothContour([])).toEqual([]);
  expect(cutContour([])).toEqual([]);
});
