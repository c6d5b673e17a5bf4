import fc from "fast-check";
import type { Instrument } from "@/shared/instruments/instrument";
import { fretSemitones } from "@/shared/instruments/frets";
import { findPreset, presets } from "@/shared/instruments/presets";
import { stringMidi } from "@/shared/instruments/tension";
import { chordPitchClasses, parseChord } from "@/shared/music/chord";
import { tonicPitchClass } from "@/shared/music/keyName";
import { findShapes } from "@/shared/ways/findShapes";
import type { Shape } from "@/shared/ways/way";

const roots = ["C", "Db", "D", "Eb", "E", "F", "F#", "G", "Ab", "A", "Bb", "B"];
const qualities = [
  "",
  "m",
  "7",
  "maj7",
  "m7",
  "sus4",
  "sus2",
  "dim",
  "aug",
  "dim7",
  "m7b5",
  "6",
  "m6",
  "add9",
  "9",
  "5",
];
const chord = fc
  .tuple(fc.constantFrom(...roots), fc.constantFrom(...qualities))
  .map(([root, quality]) => parseChord(root + quality)!);
const preset = fc.constantFrom(...presets);
const runs = { numRuns: 60 };

/** Pitches that a shape sounds, low string to high; null for silent strings. */
function sounding(shape: Shape, instrument: Instrument, capo = 0): (number | null)[] {
  return shape.frets.map((fret, k) => {
    if (fret === null) return null;
    const string = instrument.strings[k]!;
    // A short string has its own stop, as many frets up as the capo.
    return stringMidi(string) + fretSemitones(instrument, capo + fret)!;
  });
}
const classes = (pitches: readonly (number | null)[]) =>
  new Set(pitches.filter((pitch) => pitch !== null).map((pitch) => pitch % 12));
const named = (text: string, id: string, options = {}) => findShapes(parseChord(text)!, findPreset(id)!, options);
const fretsOf = (shapes: readonly Shape[]) => shapes.map(({ frets }) => frets.map((fret) => fret ?? "x").join(" "));

describe("every shape found", () => {
  test("sounds nothing but the chord, its root and third among it", () => {
    fc.assert(
      fc.property(chord, preset, (target, instrument) => {
        const allowed = new Set(chordPitchClasses(target));
        const root = tonicPitchClass(target.root);
        const third = target.intervals.find((interval) => interval === 3 || interval === 4);
        const heardOf = findShapes(target, instrument).map((shape) => classes(sounding(shape, instrument)));
        for (const heard of heardOf) {
          expect([...heard].every((pc) => allowed.has(pc))).toBe(true);
          if (third !== undefined) expect(heard.has((root + third) % 12)).toBe(true);
        }
        if (target.intervals.length > 3) return;
        // Three strings over a fret map may hold no whole triad: then, and only then, its plain fifth is left out.
        const whole = heardOf.filter((heard) => heard.size === allowed.size).length;
        expect([0, heardOf.length]).toContain(whole);
        if (whole > 0) return;
        const rest = [...allowed].filter((pc) => pc !== (root + 7) % 12).sort();
        for (const heard of heardOf) expect([...heard].sort()).toEqual(rest);
      }),
      runs,
    );
  });

  test("marks the strings that sound the root", () => {
    fc.assert(
      fc.property(chord, preset, (target, instrument) => {
        for (const shape of findShapes(target, instrument)) {
          const pitches = sounding(shape, instrument);
          const expected = pitches.flatMap((pitch, k) =>
            pitch !== null && pitch % 12 === tonicPitchClass(target.root) ? [k] : [],
          );
          expect(shape.roots).toEqual(expected);
        }
      }),
      runs,
    );
  });

  test("has legal fingers: at most four, higher fingers never below lower ones, one finger on several strings only as a barre", () => {
    fc.assert(
      fc.property(chord, preset, (target, instrument) => {
        const illegal = findShapes(target, instrument).filter((shape) => !legal(shape));
        expect(illegal).toEqual([]);
      }),
      runs,
    );
  });

  test("stays within reach, silences no inner string, and comes once", () => {
    const plain = fc
      .tuple(fc.constantFrom(...roots), fc.constantFrom("", "m", "7", "sus4"))
      .map(([root, quality]) => parseChord(root + quality)!);
    const chromatic = fc.constantFrom(...presets.filter(({ fretMap }) => fretMap === undefined));
    fc.assert(
      fc.property(plain, chromatic, (target, instrument) => {
        const shapes = findShapes(target, instrument);
        expect(shapes.length).toBeGreaterThan(0);
        expect(new Set(fretsOf(shapes)).size).toBe(shapes.length);
        expect(Math.max(...shapes.map(({ reachMm }) => reachMm))).toBeLessThanOrEqual(116);
        const gaps = shapes.filter(({ frets }) => {
          const long = frets.filter((_, k) => instrument.strings[k]!.startsAtFret === undefined);
          return !/^x*o+x*$/.test(long.map((fret) => (fret === null ? "x" : "o")).join(""));
        });
        expect(gaps).toEqual([]);
      }),
      runs,
    );
  });

  test("is listed from easy to hard", () => {
    fc.assert(
      fc.property(chord, preset, (target, instrument) => {
        const eases = findShapes(target, instrument).map(({ ease }) => ease);
        expect(eases).toEqual([...eases].sort((a, b) => b - a));
      }),
      runs,
    );
  });

  test("a capo changes neither what the fingers do nor, moved up, what is heard", () => {
    fc.assert(
      fc.property(
        chord,
        fc.constantFrom("box-adf", "guitar", "ukulele", "banjo"),
        fc.integer({ min: 1, max: 5 }),
        (target, id, capo) => {
          const instrument = findPreset(id)!;
          const moved = new Set(chordPitchClasses(target).map((pc) => (pc + capo) % 12));
          const shapes = findShapes(target, instrument, { capo, maxFret: 9 });
          for (const shape of shapes)
            for (const pc of classes(sounding(shape, instrument, capo))) expect(moved.has(pc)).toBe(true);
          // Narrower frets can only add shapes; and what is whole with them makes looser ones needless.
          const loosely = (at: number) => fretsOf(findShapes(target, instrument, { capo: at, maxFret: 9, all: true }));
          const clamped = new Set(loosely(capo));
          expect(loosely(0).filter((frets) => !clamped.has(frets))).toEqual([]);
        },
      ),
      { numRuns: 30 },
    );
  });
});

// Common practice of three strings tuned to a major triad.
describe("three strings tuned to a major triad", () => {
  test.each(roots)("give %s major three closed positions and their repeat an octave up", (root) => {
    const instrument: Instrument = { ...findPreset("box-adf")!, frets: 26 };
    const shapes = findShapes(parseChord(root)!, instrument);
    const closed = shapes
      .map(({ frets }) => frets.map((fret) => fret ?? NaN))
      .filter((frets) => Math.max(...frets) - Math.min(...frets) <= 2);
    const within = closed.filter((frets) => Math.min(...frets) < 12);
    expect(within.length).toBeGreaterThanOrEqual(3);
    const keys = new Set(closed.map(String));
    for (const frets of within) expect(keys.has(String(frets.map((fret) => fret + 12)))).toBe(true);
  });

  test("let the usual shapes come first: one finger or none, a barre at the fifth and seventh", () => {
    expect(fretsOf(named("D", "box-adf"))[0]).toBe("0 0 0");
    expect(fretsOf(named("G", "box-adf"))).toEqual(expect.arrayContaining(["2 0 1", "5 5 5"]));
    expect(fretsOf(named("A", "box-adf"))).toEqual(expect.arrayContaining(["4 2 3", "7 7 7"]));
    expect(fretsOf(named("Bm", "box-adf"))[0]).toBe("2 0 0");
    expect(fretsOf(named("C", "box-adf"))[0]).toBe("3 2 1");
    expect(named("C", "box-adf")[0]!.fingers).toEqual([3, 2, 1]);
    expect(fretsOf(named("Am", "box-adf"))[0]).toBe("3 2 3");
    expect(fretsOf(named("F#m", "box-adf"))[0]).toBe("4 4 3");
  });

  test("sevenths drop the fifth, never the third or the seventh", () => {
    const instrument = findPreset("box-adf")!;
    const shapes = named("G7", "box-adf");
    expect(shapes.length).toBeGreaterThan(0);
    for (const shape of shapes) expect(classes(sounding(shape, instrument))).toEqual(new Set([7, 11, 5]));
  });
});

// Common practice: the shapes that are taught first.
describe("open shapes that everybody learns come first", () => {
  test.each([
    ["guitar", "C", "x 3 2 0 1 0"],
    ["guitar", "A", "x 0 2 2 2 0"],
    ["guitar", "G", "3 2 0 0 0 3"],
    ["guitar", "E", "0 2 2 1 0 0"],
    ["guitar", "D", "x x 0 2 3 2"],
    ["guitar", "Am", "x 0 2 2 1 0"],
    ["guitar", "Em", "0 2 2 0 0 0"],
    ["guitar", "Dm", "x x 0 2 3 1"],
    ["ukulele", "C", "0 0 0 3"],
    ["ukulele", "F", "2 0 1 0"],
    ["ukulele", "G", "0 2 3 2"],
    ["ukulele", "Am", "2 0 0 0"],
    ["ukulele", "G7", "0 2 1 2"],
    ["banjo", "G", "0 0 0 0 0"],
    ["banjo", "C", "0 2 0 1 2"],
  ])("%s %s: %s", (id, text, frets) => {
    expect(fretsOf(named(text, id))[0]).toBe(frets);
  });

  test("full barres are found, with the first finger across", () => {
    const full = named("F", "guitar").find(({ frets }) => frets.join() === "1,3,3,2,1,1")!;
    expect(full).toMatchObject({ fingers: [1, 3, 4, 2, 1, 1], barre: { fret: 1, fromString: 0, toString: 5 } });
    expect(full.reachMm).toBeCloseTo(66.7, 1);
  });

  test("a short banjo string is open where its note belongs to the chord and silent elsewhere", () => {
    for (const text of ["G", "C", "Em", "F", "D7", "A"]) {
      const shapes = named(text, "banjo");
      const belongs = chordPitchClasses(parseChord(text)!).includes(7);
      expect(shapes.length).toBeGreaterThan(0);
      for (const { frets } of shapes) expect(frets[0] === null || (belongs && frets[0] === 0)).toBe(true);
      if (belongs) expect(shapes[0]!.frets[0]).toBe(0);
    }
  });

  test("a bass behind a slash lies lowest when asked for", () => {
    const guitar = findPreset("guitar")!;
    const lowest = (shape: Shape) => Math.min(...sounding(shape, guitar).filter((pitch) => pitch !== null)) % 12;
    const shapes = named("D/F#", "guitar");
    expect(fretsOf(shapes)).toContain("2 0 0 2 3 2");
    for (const shape of shapes) expect(lowest(shape)).toBe(6);
    for (const shape of named("C/B", "guitar")) expect(lowest(shape)).toBe(11);
    expect(named("D/F#", "guitar", { bass: false }).length).toBeGreaterThan(shapes.length);
  });

  test("a capo off the frets is a caller's mistake", () => {
    expect(() => named("C", "guitar", { capo: -1 })).toThrow(RangeError);
    expect(() => named("C", "guitar", { capo: 1.5 })).toThrow(RangeError);
  });
});

function legal({ frets, fingers, barre, ease }: Shape): boolean {
  if (!(ease > 0 && ease <= 1)) return false;
  if (frets.some((fret, k) => fingers[k]! > 0 !== (fret !== null && fret > 0))) return false;
  const placed = frets.flatMap((fret, string) => (fret ? [{ fret, string, finger: fingers[string]! }] : []));
  const underBarre = (string: number) => barre !== null && string >= barre.fromString && string <= barre.toString;
  const pairs = placed.flatMap((a) => placed.map((b) => [a, b] as const));
  return (
    placed.every(({ finger }) => finger >= 1 && finger <= 4) &&
    pairs.every(([a, b]) => a.finger >= b.finger || a.fret <= b.fret) &&
    pairs.every(
      ([a, b]) =>
        a.string === b.string ||
        a.finger !== b.finger ||
        (a.fret === b.fret && barre?.fret === a.fret && underBarre(a.string) && underBarre(b.string)),
    ) &&
    (barre === null || frets.every((fret, string) => !underBarre(string) || fret === null || fret >= barre.fret))
  );
}
