import fc from "fast-check";
import { mergeTakes, MOST_BY_ONE_TAKE, type ProfileTake } from "./voiceProfile";

const take = (id: string, low: number, high: number, more: Partial<ProfileTake> = {}): ProfileTake => ({
  id,
  sungAt: "2026-01-10T18:00:00.000Z",
  range: { lowMidi: low, highMidi: high },
  comfort: { lowMidi: low + 1.5, highMidi: high - 2.5 },
  estimate: { lowMidi: low - 2, highMidi: high + 2 },
  certainty: 0.7,
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
const takes = fc.uniqueArray(anyTake, { selector: (t) => t.id, minLength: 1, maxLength: 8 });

test("the order of takes does not matter", () => {
  fc.assert(
    fc.property(takes, fc.integer(), (list, turn) => {
      const k = Math.abs(turn) % list.length;
      const turned = [...list.slice(k), ...list.slice(0, k)].reverse();
      expect(mergeTakes(turned)).toEqual(mergeTakes(list));
    }),
    { numRuns: 100, seed: 5 },
  );
});

test("erasing a take restores exactly what was before it", () => {
  fc.assert(
    fc.property(takes, anyTake, (list, extra) => {
      const before = mergeTakes(list);
      const together = [...list, extra];
      mergeTakes(together);
      expect(mergeTakes(together.filter((t) => t !== extra))).toEqual(before);
    }),
    { numRuns: 60, seed: 6 },
  );
});

test("a profile holds together: comfort inside range inside estimate, certainty from 0 to 1", () => {
  fc.assert(
    fc.property(takes, (list) => {
      const { range, comfort, estimate, certainty } = mergeTakes(list)!;
      const steps = [
        estimate.lowMidi,
        range.lowMidi,
        comfort.lowMidi,
        comfort.highMidi,
        range.highMidi,
        estimate.highMidi,
      ];
      steps.forEach((step, i) => i > 0 && expect(step).toBeGreaterThanOrEqual(steps[i - 1]! - 1e-9));
      expect(certainty).toBeGreaterThanOrEqual(0);
      expect(certainty).toBeLessThanOrEqual(1);
    }),
    { numRuns: 100, seed: 7 },
  );
});

test("one outlying phrase moves an end by no more than stated, and says so", () => {
  const usual = [take("a", 45, 62), take("b", 46, 62), take("c", 45, 61)];
  const profile = mergeTakes([...usual, take("d", 45, 79)])!;
  expect(profile.range.highMidi).toBe(62 + MOST_BY_ONE_TAKE);
  expect(profile.highFrom).toBe("d");
  expect(profile.reasons.join(" ")).toMatch(/only in part/);
});

test("a guided hold is believed where a phrase is not, and decides against a phrase that went a little farther", () => {
  const usual = [take("a", 45, 62), take("b", 46, 61)];
  expect(mergeTakes([...usual, take("h", 60, 70, { hold: true })])!.range.highMidi).toBe(70);
  const decided = mergeTakes([take("a", 45, 66), take("b", 45, 66), take("h", 60, 65, { hold: true })])!;
  expect(decided.range.highMidi).toBe(65);
  expect(decided.highFrom).toBe("h");
});

test("ease and strain shape the comfortable band", () => {
  const top = (effort: number | null) => mergeTakes([take("a", 45, 65, { effort })])!.comfort.highMidi;
  expect(top(1)).toBeGreaterThan(top(null));
  expect(top(5)).toBeLessThan(top(null));
});

test("newer takes count more than old ones", () => {
  const old = take("a", 45, 60, { sungAt: "2024-01-01T00:00:00.000Z" });
  const now = take("b", 45, 66);
  const comfort = mergeTakes([old, now])!.comfort.highMidi;
  expect(comfort).toBeGreaterThan(63);
  expect(comfort).toBeLessThan(63.5);
});

test("no takes make no profile, and a time that cannot be read is the caller's mistake", () => {
  expect(mergeTakes([])).toBeNull();
  expect(() => mergeTakes([take("a", 45, 60, { sungAt: "yesterday" })])).toThrow(RangeError);
});

const width = (list: readonly ProfileTake[]) => {
  const { comfort } = mergeTakes(list)!;
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
      const before = mergeTakes(list);
      const rated = list.map((one, k) => (k === 0 ? { ...one, effort } : one));
      expect(mergeTakes(rated.map((one, k) => (k === 0 ? list[0]! : one)))).toEqual(before);
      expect(mergeTakes([...list, extra].filter((one) => one !== extra))).toEqual(before);
    }),
    { numRuns: 60, seed: 13 },
  );
});

test("a guided hold that looked for the low end only says nothing about the top", () => {
  const phrase = take("a", 45, 66);
  const low = take("h", 40, 55, { hold: true, shows: "low" });
  const { range, comfort, lowFrom, highFrom } = mergeTakes([phrase, low])!;
  expect(range).toEqual({ lowMidi: 40, highMidi: 66 });
  expect([lowFrom, highFrom]).toEqual(["h", "a"]);
  expect(comfort.highMidi).toBeCloseTo(mergeTakes([phrase])!.comfort.highMidi, 10);
});

test("an end that was looked for under guidance is no longer estimated, the other one is", () => {
  const { range, estimate } = mergeTakes([take("a", 45, 66), take("h", 43, 57, { hold: true, shows: "low" })])!;
  expect(estimate).toEqual({ lowMidi: range.lowMidi, highMidi: 68 });
});
