import { movingEnds } from "./movingEnds";
import type { ProfileTake } from "./voiceProfile";

const start = Date.parse("2026-09-01T10:00:00.000Z");
const take = (day: number, low: number, high: number, more: Partial<ProfileTake> = {}): ProfileTake => ({
  id: `${day}-${low}-${high}`,
  sungAt: new Date(start + day * 86_400_000).toISOString(),
  range: { lowMidi: low, highMidi: high },
  comfort: { lowMidi: low + 1, highMidi: high - 2 },
  estimate: { lowMidi: low, highMidi: high },
  certainty: 0.8,
  effort: null,
  ...more,
});

test("a voice that went down over some weeks is seen, each end by its own move", () => {
  const takes = [take(0, 57, 77), take(3, 58, 76), take(50, 52, 70), take(56, 53, 71)];
  expect(movingEnds(takes)).toEqual([
    { end: "low", by: -4, weeks: 7 },
    { end: "high", by: -5, weeks: 7 },
  ]);
  expect(movingEnds([...takes].reverse())).toEqual(movingEnds(takes));
});

test("a guided hold on each side is enough", () => {
  const takes = [take(0, 57, 77, { hold: true }), take(40, 53, 77, { hold: true })];
  expect(movingEnds(takes)).toEqual([{ end: "low", by: -4, weeks: 6 }]);
});

test.each<[string, ProfileTake[]]>([
  ["no takes", []],
  ["one take", [take(0, 57, 77)]],
  ["one low song among the others", [take(0, 57, 77), take(3, 57, 77), take(50, 50, 77), take(56, 57, 77)]],
  ["one take on each side", [take(0, 57, 77), take(50, 52, 70)]],
  ["the two semitones that days differ by", [take(0, 57, 77), take(3, 57, 77), take(50, 55, 75), take(56, 55, 75)]],
  ["takes of the same weeks", [take(0, 57, 77), take(1, 57, 77), take(10, 52, 70), take(12, 52, 70)]],
  [
    "holds that looked for the other end only",
    [take(0, 57, 77, { hold: true, shows: "high" }), take(40, 50, 77, { hold: true, shows: "high" })],
  ],
])("%s: nothing is said", (_, takes) => {
  expect(movingEnds(takes)).toEqual([]);
});

test("a time that cannot be read is the caller's mistake", () => {
  expect(() => movingEnds([{ ...take(0, 57, 77), sungAt: "yesterday" }])).toThrow(RangeError);
});
