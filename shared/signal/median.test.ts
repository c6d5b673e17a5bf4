import fc from "fast-check";
import { median } from "./median";

test("is the middle one, or half-way between the two middle ones", () => {
  expect(median([3])).toBe(3);
  expect(median([9, 1, 4])).toBe(4);
  expect(median([9, 1, 4, 2])).toBe(3);
});

test("turns with the sign, does not mind the order, and leaves its input as it was", () => {
  fc.assert(
    fc.property(fc.array(fc.integer({ min: -1000, max: 1000 }), { minLength: 1 }), (values) => {
      const before = [...values];
      const middle = median(values);
      expect(values).toEqual(before);
      expect(median([...values].reverse())).toBe(middle);
      expect(median(values.map((value) => 0 - value)) + 0).toBe(0 - middle + 0);
      const below = values.filter((value) => value < middle).length;
      expect(below).toBeLessThanOrEqual(values.length / 2);
    }),
  );
});

test("of nothing is a caller's mistake", () => {
  expect(() => median([])).toThrow(RangeError);
});
