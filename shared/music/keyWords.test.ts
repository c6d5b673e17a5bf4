import fc from "fast-check";
import { tonicPitchClass } from "./keyName";
import { keySign, keySignParts, keyWords, movedKey } from "./keyWords";

test.each([
  [{ tonic: "D", mode: "major" }, "D major", "D"],
  [{ tonic: "Bb", mode: "minor" }, "Bb minor", "Bbm"],
  [{ tonic: "A", mode: "dorian" }, "A dorian", "A dorian"],
] as const)("%j in words", (key, words, sign) => {
  expect([keyWords(key), keySign(key)]).toEqual([words, sign]);
});

test.each([
  [{ tonic: "D", mode: "major" }, "D", ""],
  [{ tonic: "F#", mode: "minor" }, "F#m", ""],
  [{ tonic: "D", mode: "dorian" }, "D", "dor."],
  [{ tonic: "E", mode: "phrygian" }, "E", "phr."],
  [{ tonic: "F", mode: "lydian" }, "F", "lyd."],
  [{ tonic: "Eb", mode: "mixolydian" }, "Eb", "mixo."],
  [{ tonic: "B", mode: "locrian" }, "B", "loc."],
] as const)("%j large and small", (key, large, mode) => {
  expect(keySignParts(key)).toEqual({ large, mode });
});

test("a key moved there and back has its tonic again", () => {
  fc.assert(
    fc.property(
      fc.constantFrom("C", "D", "Eb", "F#", "Ab", "B"),
      fc.integer({ min: -24, max: 24 }),
      (tonic, semitones) => {
        const there = movedKey({ tonic, mode: "major" }, semitones);
        expect(tonicPitchClass(movedKey(there, -semitones).tonic)).toBe(tonicPitchClass(tonic));
        expect((tonicPitchClass(tonic) + semitones + 24) % 12).toBe(tonicPitchClass(there.tonic));
      },
    ),
  );
});

test("an octave keeps the name as written, however unusual", () => {
  expect(movedKey({ tonic: "Gb", mode: "major" }, -12)).toEqual({ tonic: "Gb", mode: "major" });
  expect(() => movedKey({ tonic: "C", mode: "major" }, 0.5)).toThrow(RangeError);
});
