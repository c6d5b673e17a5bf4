import fc from "fast-check";
import { keyLaws } from "./keyLaws";
import { sharedKeyLaws } from "./sharedKeyLaws";

// `npm run bench:keys -- --laws` runs the same laws ten thousand times each.
const laws = [
  ...keyLaws.map((each) => ({ ...each, numRuns: 200 })),
  ...sharedKeyLaws.map((each) => ({ ...each, numRuns: 100 })),
];

test.each(laws)("law $name", ({ property, numRuns }) => {
  expect(() => fc.assert(property, { numRuns })).not.toThrow();
});
