import fc from "fast-check";
import { voiceOfTakes, type ShownTake } from "./voiceOfTakes";

const take = (id: string, low: number, high: number, more: Partial<ShownTake> = {}): ShownTake => ({
  id,
  sungAt: "2026-01-10T18:00:00.000Z",
  range: { lowMidi: low, highMidi: high },
  comfort: { lowMidi: low + 1.5, highMidi: high - 2.5 },
  estimate: { lowMidi: low - 2, highMidi: high + 2 },
  certainty: 0.8,
  effort: null,
  ...more,
});

const anyTake = fc
  .record({
    id: fc.uuid(),
    low: fc.integer({ min: 38, max: 62 }),
    span: fc.integer({ min: 6, max: 26 }),
    certainty: fc.double({ min: 0, max: 1, noNaN: true }),
    effort: fc.option(fc.integer({ min: 1, max: 5 })),
    day: fc.integer({ min: 1, max: 28 }),
    hold: fc.boolean(),
    shows: fc.constantFrom("both" as const, "low" as const, "high" as const),
  })
  .map(({ low, span, day, ...more }) =>
    take(more.id, low, low + span, { ...more, sungAt: `2026-02-${String(day).padStart(2, "0")}T10:00:00.000Z` }),
  );
const takes = fc.uniqueArray(anyTake, { selector: ({ id }) => id, minLength: 1, maxLength: 8 });
const width = (list: readonly ShownTake[]) => {
  const { comfort } = voiceOfTakes(list)!;
  return comfort.highMidi - comfort.lowMidi;
};

test("a harder rating never widens the comfortable band, whatever was said before and whatever else was sung", () => {
  fc.assert(
    fc.property(takes, fc.nat(), fc.integer({ min: 3, max: 5 }), (list, turn, harder) => {
      const rated = list[turn % list.length]!;
      fc.pre((rated.effort ?? 0) < harder);
      const after = list.map((one) => (one === rated ? { ...one, effort: harder } : one));
      const before = list.map((one) => (one === rated && rated.effort === null ? { ...one, effort: null } : one));
      expect(width(after)).toBeLessThanOrEqual(width(before) + 1e-9);
    }),
    { numRuns: 300, seed: 11 },
  );
});

test("an easier rating never narrows it", () => {
  fc.assert(
    fc.property(takes, fc.nat(), fc.integer({ min: 1, max: 2 }), (list, turn, easier) => {
      const rated = list[turn % list.length]!;
      const after = list.map((one) => (one === rated ? { ...one, effort: easier } : one));
      expect(width(after)).toBeGreaterThanOrEqual(width(list) - 1e-9);
    }),
    { numRuns: 300, seed: 12 },
  );
});

test("taking a rating back restores the profile bit for bit, and so does erasing a take", () => {
  fc.assert(
    fc.property(takes, anyTake, fc.integer({ min: 1, max: 5 }), (list, extra, effort) => {
      const before = voiceOfTakes(list);
      const rated = list.map((one, k) => (k === 0 ? { ...one, effort } : one));
      expect(voiceOfTakes(rated.map((one, k) => (k === 0 ? list[0]! : one)))).toEqual(before);
      expect(voiceOfTakes([...list, extra].filter((one) => one !== extra))).toEqual(before);
    }),
    { numRuns: 60, seed: 13 },
  );
});

test("the order of takes changes not even the last bit", () => {
  fc.assert(
    fc.property(takes, (list) => expect(voiceOfTakes([...list].reverse())).toEqual(voiceOfTakes(list))),
    { numRuns: 100, seed: 14 },
  );
});

test("a profile holds together: comfort inside range inside estimate", () => {
  fc.assert(
    fc.property(takes, (list) => {
      const { range, comfort, estimate } = voiceOfTakes(list)!;
      const steps = [
        estimate.lowMidi,
        range.lowMidi,
        comfort.lowMidi,
        comfort.highMidi,
        range.highMidi,
        estimate.highMidi,
      ];
      steps.forEach((step, k) => k > 0 && expect(step).toBeGreaterThanOrEqual(steps[k - 1]! - 1e-9));
    }),
    { numRuns: 200, seed: 15 },
  );
});

test("a guided hold that looked for the low end only says nothing about the top", () => {
  const phrase = take("a", 45, 66);
  const low = take("h", 40, 55, { hold: true, shows: "low" });
  const { range, comfort, lowFrom, highFrom } = voiceOfTakes([phrase, low])!;
  expect(range).toEqual({ lowMidi: 40, highMidi: 66 });
  expect([lowFrom, highFrom]).toEqual(["h", "a"]);
  expect(comfort.highMidi).toBeCloseTo(voiceOfTakes([phrase])!.comfort.highMidi, 10);
});

test("a guided hold decides an end against a phrase that went a little farther", () => {
  const { range, highFrom } = voiceOfTakes([take("a", 45, 66), take("h", 44, 65, { hold: true })])!;
  expect(range.highMidi).toBe(65);
  expect(highFrom).toBe("h");
});

test("an end that was looked for under guidance is no longer estimated, the other one is", () => {
  const { range, estimate } = voiceOfTakes([take("a", 45, 66), take("h", 43, 57, { hold: true, shows: "low" })])!;
  expect(estimate).toEqual({ lowMidi: range.lowMidi, highMidi: 68 });
});

test("no takes make no voice", () => {
  expect(voiceOfTakes([])).toBeNull();
});
