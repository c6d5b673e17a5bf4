import fc from "fast-check";
import { keyLaws } from "./keyLaws";
import { sharedKeyLaws } from "./sharedKeyLaws";

// `npm run bench:keys -- --laws` runs the same laws ten thousand times each.
test.each([...keyLaws, ...sharedKeyLaws].map(({ name, property }) => [name, property] as const))(
  "law %s",
  (_, property) => {
    expect(() => fc.assert(property, { numRuns: 200 })).not.toThrow();
  },
);
