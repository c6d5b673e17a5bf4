import { fretPosition, fretSemitones, fretSpanMm } from "@/shared/instruments/frets";
import { findPreset, presets } from "@/shared/instruments/presets";
import { stringMidi, tensionChanges } from "@/shared/instruments/tension";

const tenth = (value: number) => Math.round(value * 10) / 10;

// Equal temperament: x = L - L / 2^(n/12), in inches.
describe("frets", () => {
  test.each([
    [25.5, [1.4312, 2.7821, 4.0571, 5.2606, 6.3966, 8.4808, 12.75]],
    [24.75, [1.3891, 2.7003, 3.9378, 5.1059, 6.2084, 8.2314, 12.375]],
    [26.25, [1.4733, 2.8639, 4.1765, 5.4154, 6.5847, 8.7302, 13.125]],
    [17, [0.9541, 1.8547, 2.7048, 3.5071, 4.2644, 5.6539, 8.5]],
    [13, [0.7296, 1.4183, 2.0683, 2.6819, 3.261, 4.3235, 6.5]],
  ])("stand where the rule puts them on a scale of %f in", (scale, positions) => {
    [1, 2, 3, 4, 5, 7, 12].forEach((fret, k) => expect(fretPosition(scale, fret)).toBeCloseTo(positions[k]!, 4));
  });

  test.each([
    [25.5, [97.3, 126.1, 86.7, 77.2, 68.8]],
    [24.75, [94.4, 122.4, 84.1, 74.9, 66.8]],
    [26.25, [100.1, 129.8, 89.2, 79.5, 70.8]],
    [17, [64.8, 84.1, 57.8, 51.5, 45.9]],
    [13, [49.6, 64.3, 44.2, 39.4, 35.1]],
    [13.875, [52.9, 68.6, 47.2, 42.0, 37.4]],
  ])("span the printed millimetres on a scale of %f in", (scale, spans) => {
    const pairs = [
      [1, 4],
      [1, 5],
      [3, 6],
      [5, 8],
      [7, 10],
    ] as const;
    pairs.forEach(([low, high], k) => expect(tenth(fretSpanMm(scale * 25.4, low, high))).toBe(spans[k]));
  });

  test("a fret lies 1/17.817 of what is left beyond the one before", () => {
    for (let fret = 0; fret < 20; fret++) {
      const left = 25.5 - fretPosition(25.5, fret);
      expect(left / (fretPosition(25.5, fret + 1) - fretPosition(25.5, fret))).toBeCloseTo(17.81715, 4);
    }
  });

  test("a diatonic fretboard follows its map", () => {
    const dulcimer = findPreset("dulcimer")!;
    expect([0, 1, 2, 3, 4, 5, 6, 7, 8].map((fret) => fretSemitones(dulcimer, fret))).toEqual([
      0, 2, 4, 5, 7, 9, 10, 11, 12,
    ]);
    expect(fretSemitones(dulcimer, 17)).toBeNull();
    expect(fretSemitones(findPreset("guitar")!, 7)).toBe(7);
  });
});

describe("presets", () => {
  test("are distinct, playable and strung with readable notes", () => {
    expect(new Set(presets.map(({ id }) => id)).size).toBe(presets.length);
    for (const { strings, scaleMm, frets, capoTo, fretMap } of presets) {
      for (const string of strings) expect(stringMidi(string)).toBeGreaterThan(30);
      expect(scaleMm).toBeGreaterThan(300);
      expect(capoTo).toBeLessThan(frets);
      if (fretMap) expect(fretMap).toHaveLength(frets);
    }
  });

  // Common practice; scales as makers print them.
  test.each([
    ["box-gdg", "G2 D3 G3", 25],
    ["box-adf", "A3 D4 F#4", 25],
    ["box-gbd", "G3 B3 D4", 25],
    ["guitar", "E2 A2 D3 G3 B3 E4", 25.5],
    ["guitar-drop-d", "D2 A2 D3 G3 B3 E4", 25.5],
    ["guitar-dadgad", "D2 A2 D3 G3 A3 D4", 25.5],
    ["guitar-open-g", "D2 G2 D3 G3 B3 D4", 25.5],
    ["ukulele", "G4 C4 E4 A4", 15],
    ["ukulele-baritone", "D3 G3 B3 E4", 19],
    ["banjo", "G4 D3 G3 B3 D4", 26.25],
  ])("%s is tuned %s on a scale of %f in", (id, notes, inches) => {
    const instrument = findPreset(id)!;
    expect(instrument.strings.map(({ note }) => note).join(" ")).toBe(notes);
    expect(instrument.scaleMm / 25.4).toBeCloseTo(inches, 2);
  });

  test("the banjo's short string starts at the fifth fret, on its own scale", () => {
    expect(findPreset("banjo")!.strings[0]).toMatchObject({ note: "G4", startsAtFret: 5 });
    expect(findPreset("banjo")!.strings[0]!.scaleMm! / 25.4).toBeCloseTo(19.625, 2);
  });

  test("strings let down a whole tone turn A-D-F♯ into G-C-E, at 79 % of the tension", () => {
    const changes = tensionChanges(findPreset("box-adf")!, -2);
    expect(changes.map(({ to }) => to)).toEqual(["G3", "C4", "E4"]);
    for (const { beforeLb, afterLb } of changes) expect(afterLb! / beforeLb!).toBeCloseTo(0.7937, 4);
  });
});
