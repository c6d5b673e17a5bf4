import fc from "fast-check";
import {
  accidentalCount,
  keyFifths,
  keyOfFifths,
  letterSteps,
  type Mode,
  parseKeyName,
  scaleSteps,
  spellAbove,
  spellInKey,
  spellTonic,
  tonicPitchClass,
} from "./keyName";

const modes: Mode[] = ["major", "minor", "dorian", "phrygian", "lydian", "mixolydian", "locrian"];
const pitchClasses = Array.from({ length: 12 }, (_, pc) => pc);

describe("tonics", () => {
  // Common practice: the fewest accidentals; of F# and Gb, D# minor and Eb minor, the sharps.
  test.each([
    ["major", "C Db D Eb E F F# G Ab A Bb B"],
    ["minor", "C C# D D# E F F# G G# A Bb B"],
  ] as const)("in %s are spelled with the fewest accidentals", (mode, names) => {
    expect(pitchClasses.map((pc) => spellTonic(pc, mode)).join(" ")).toBe(names);
  });

  test("keep their pitch class in every mode and need at most six accidentals", () => {
    for (const mode of modes) {
      for (const pc of pitchClasses) {
        const tonic = spellTonic(pc, mode);
        expect(tonicPitchClass(tonic)).toBe(pc);
        expect(accidentalCount({ tonic, mode })).toBeLessThanOrEqual(6);
      }
    }
  });

  test("outside 0 to 11, or of no note, are refused", () => {
    expect(() => spellTonic(12, "major")).toThrow(RangeError);
    expect(() => spellTonic(0.5, "major")).toThrow(RangeError);
    expect(() => tonicPitchClass("H")).toThrow(RangeError);
  });
});

describe("signatures", () => {
  // Circle of fifths, common practice; modes as in the ABC standard 2.1, section 3.1.14.
  test.each([
    ["Cb", "major", -7],
    ["Gb", "major", -6],
    ["F", "major", -1],
    ["C#", "major", 7],
    ["E", "minor", 1],
    ["D", "mixolydian", 1],
    ["A", "dorian", 1],
    ["B", "phrygian", 1],
    ["C", "lydian", 1],
    ["F#", "locrian", 1],
    ["C", "dorian", -2],
  ] as const)("%s %s has %i", (tonic, mode, fifths) => {
    expect(keyFifths({ tonic, mode })).toBe(fifths);
    expect(keyOfFifths(fifths, mode)).toEqual({ tonic, mode });
  });

  test("beyond 14 accidentals are refused", () => {
    expect(() => keyOfFifths(15, "major")).toThrow(RangeError);
    expect(() => keyOfFifths(1.5, "major")).toThrow(RangeError);
  });
});

describe("notes in a key", () => {
  // Common practice: consecutive letters on the scale, chromatic notes by function.
  test.each([
    ["D", "major", "D Eb E F F# G G# A Bb B C C#"],
    ["Db", "major", "Db D Eb Fb F Gb G Ab A Bb Cb C"],
    ["C", "major", "C Db D Eb E F F# G Ab A Bb B"],
    ["F#", "major", "F# G G# A A# B B# C# D D# E E#"],
    ["A", "minor", "A Bb B C C# D D# E F F# G G#"],
    ["E", "dorian", "E F F# G G# A A# B C C# D D#"],
  ] as const)("%s %s are spelled %s", (tonic, mode, names) => {
    const from = tonicPitchClass(tonic);
    const spelled = pitchClasses.map((step) => spellInKey((from + step) % 12, { tonic, mode }));
    expect(spelled.join(" ")).toBe(names);
  });

  test("take each letter of the alphabet once on the scale, in every plain key", () => {
    for (const mode of modes) {
      for (const pc of pitchClasses) {
        const key = { tonic: spellTonic(pc, mode), mode };
        const names = scaleSteps(mode).map((step) => spellInKey((pc + step) % 12, key));
        expect(new Set(names.map((name) => name[0])).size).toBe(7);
      }
    }
  });

  test("keep their pitch class and never need two accidentals", () => {
    const tonics = fc.constantFrom("C", "Cb", "C#", "Gb", "F#", "B", "Ab", "E");
    fc.assert(
      fc.property(tonics, fc.constantFrom(...modes), fc.integer({ min: 0, max: 11 }), (tonic, mode, pc) => {
        const name = spellInKey(pc, { tonic, mode });
        expect(tonicPitchClass(name)).toBe(pc);
        expect(name.length).toBeLessThanOrEqual(2);
      }),
    );
  });

  test("are counted in letters above a root", () => {
    expect(spellAbove("E", 2, 4)).toBe("G#");
    expect(spellAbove("Bb", 2, 3)).toBe("Db");
    expect(spellAbove("Gb", 2, 3)).toBe("A");
    expect(letterSteps("D", "C#")).toBe(6);
  });
});

describe("a key's name", () => {
  test.each([
    ["D", "D", "major"],
    [" F♯m ", "F#", "minor"],
    ["B♭ minor", "Bb", "minor"],
    ["e", "E", "minor"],
    ["A Dorian", "A", "dorian"],
    ["Eb major", "Eb", "major"],
    ["c-moll", "C", "minor"],
    ["G mix", "G", "mixolydian"],
    ["C sharp minor", "C#", "minor"],
    ["bb", "Bb", "minor"],
  ])("%s is read", (text, tonic, mode) => {
    expect(parseKeyName(text)).toEqual({ tonic, mode });
  });

  test.each(["", "H", "D flatter", "Dm7", "major", "D#b", "12"])("%s is none", (text) => {
    expect(parseKeyName(text)).toBeNull();
  });
});
