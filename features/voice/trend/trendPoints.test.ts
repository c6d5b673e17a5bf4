import fc from "fast-check";
import { aTake } from "@/__tests__/client/belongings";
import { dayTimeOf, trendPlaces, trendPoints } from "./trendPoints";

const at = (sungAt: string) => aTake("v1", { sungAt, tuningCents: -30, range: { lowMidi: 49.7, highMidi: 61.7 } });

it("puts takes in the order of time, with their notes named by the singer's own tuning", () => {
  const points = trendPoints([at("2026-11-24T19:00:00.000Z"), at("2026-11-12T08:00:00.000Z")]);
  expect(points.map((point) => point.at.getTime())).toEqual(
    ["2026-11-12T08:00:00.000Z", "2026-11-24T19:00:00.000Z"].map((iso) => Date.parse(iso)),
  );
  expect(points[0]?.range).toEqual({ lowMidi: 50, highMidi: 62 });
});

it.each([
  [0, "morning"],
  [11, "morning"],
  [12, "afternoon"],
  [17, "afternoon"],
  [18, "evening"],
  [23, "evening"],
])("hour %i is the %s", (hour, dayTime) => expect(dayTimeOf(hour)).toBe(dayTime));

it("keeps order, edges and, where there is room, distance", () => {
  const days = fc.array(fc.integer({ min: 0, max: 400 }), { minLength: 1, maxLength: 30 });
  fc.assert(
    fc.property(days, fc.integer({ min: 200, max: 900 }), (list, width) => {
      const points = trendPoints(list.map((day) => at(new Date(Date.UTC(2026, 0, 1 + day)).toISOString())));
      const places = trendPlaces(points, 40, 40 + width, 24);
      const fits = (places.length - 1) * 24 <= width;
      places.forEach((place, k) => {
        expect(place).toBeGreaterThanOrEqual(40 - 1e-6);
        expect(place).toBeLessThanOrEqual(40 + width + 1e-6);
        if (k > 0 && fits) expect(place - (places[k - 1] ?? 0)).toBeGreaterThanOrEqual(24 - 1e-6);
        if (k > 0) expect(place).toBeGreaterThanOrEqual(places[k - 1] ?? 0);
      });
    }),
    { numRuns: 100, seed: 3 },
  );
});
