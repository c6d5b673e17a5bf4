import fc from "fast-check";
import type { KeyName, Mode } from "../../music/keyName";
import { scoreKeys } from "../scoreKeys";
import { fittingFirst } from "./fittingFirst";
import { fitSentence, fixedInstruments, keyFit, playableKeys, suited } from "./fixedInstrument";

const scored = fc
  .record({
    low: fc.integer({ min: 48, max: 60 }),
    span: fc.integer({ min: 3, max: 19 }),
    home: fc.constantFrom("C", "D", "Eb", "G", "A"),
    voiceLow: fc.integer({ min: 40, max: 57 }),
    width: fc.integer({ min: 14, max: 30 }),
    mode: fc.constantFrom<Mode>("major", "minor", "dorian", "mixolydian"),
  })
  .map(({ low, span, home, voiceLow, width, mode }) => ({
    mode,
    keys: scoreKeys(
      { kind: "span", lowMidi: low, highMidi: low + span, home },
      {
        range: { lowMidi: voiceLow, highMidi: voiceLow + width },
        comfort: { lowMidi: voiceLow + 3, highMidi: voiceLow + width - 4 },
      },
      { mode },
    ),
  }));
const some = fc.uniqueArray(fc.constantFrom(...fixedInstruments), { maxLength: 3 });

test("without fixed instruments the order of the keys is what it was", () => {
  fc.assert(fc.property(scored, ({ keys, mode }) => expect(fittingFirst(keys, mode, [])).toEqual(keys)));
});

test("keys are only put in another order, and one that leaves the voice stays under every one that does not", () => {
  fc.assert(
    fc.property(scored, some, ({ keys, mode }, instruments) => {
      const order = fittingFirst(keys, mode, instruments);
      expect([...order].sort((a, b) => a.shift - b.shift)).toEqual([...keys].sort((a, b) => a.shift - b.shift));
      const firstBeyond = order.findIndex(({ beyond }) => beyond);
      if (firstBeyond >= 0) expect(order.slice(firstBeyond).every(({ beyond }) => beyond)).toBe(true);
    }),
  );
});

test("at the same score a key that fits all never stands under one that fits none, and equals keep their order", () => {
  fc.assert(
    fc.property(scored, some, ({ keys, mode }, instruments) => {
      const order = fittingFirst(keys, mode, instruments);
      const fits = ({ tonic }: { tonic: string }) =>
        instruments.filter((each) => keyFit(each, { tonic, mode }).fits).length;
      order.forEach((upper, k) => {
        for (const lower of order.slice(k + 1)) {
          if (upper.score === lower.score && upper.beyond === lower.beyond)
            expect(fits(upper) === 0 && fits(lower) === instruments.length && instruments.length > 0).toBe(false);
          if (fits(upper) === fits(lower) && upper.beyond === lower.beyond)
            expect(keys.indexOf(upper)).toBeLessThan(keys.indexOf(lower));
        }
      });
    }),
  );
});

const major = (tonic: string): KeyName => ({ tonic, mode: "major" });
const minor = (tonic: string): KeyName => ({ tonic, mode: "minor" });
const whistle = fixedInstruments.find(({ id }) => id === "whistle-D")!;
const harp = fixedInstruments.find(({ id }) => id === "harp-C")!;

test("common practice: a whistle in D plays D and G, E minor and B minor; a harp in C plays C, G cross, D minor third, A minor", () => {
  expect(playableKeys(whistle, "major").map(({ tonic }) => tonic)).toEqual(["D", "G"]);
  expect(playableKeys(whistle, "minor").map(({ tonic }) => tonic)).toEqual(["E", "B"]);
  expect(playableKeys(harp, "major").map(({ tonic }) => tonic)).toEqual(["C", "G"]);
  expect(playableKeys(harp, "minor").map(({ tonic }) => tonic)).toEqual(["D", "A"]);
  expect(keyFit(harp, major("G")).how).toContain("second position");
  expect(keyFit(harp, { tonic: "D", mode: "dorian" })).toEqual({ fits: true, how: "third position" });
  expect(keyFit(harp, minor("A")).how).toBe("fourth position");
});

test("whatever is suited to a key fits it, and the words say who does not", () => {
  for (const kind of ["harp", "whistle"] as const)
    for (const { id, tonic } of fixedInstruments)
      for (const each of suited(kind, major(tonic))) expect([id, keyFit(each, major(tonic)).fits]).toEqual([id, true]);
  expect(fitSentence(major("D"), [whistle, harp])).toBe("Fits the whistle in D, not the mouth harp in C.");
  expect(fitSentence(major("Bb"), [whistle, harp])).toBe("Does not fit the whistle in D or the mouth harp in C.");
  expect(fitSentence(major("D"), [])).toBeNull();
});
