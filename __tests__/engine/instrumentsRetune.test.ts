import fc from "fast-check";
import type { Instrument, InstrumentString } from "@/shared/instruments/instrument";
import { findPreset, presets } from "@/shared/instruments/presets";
import { planRetune } from "@/shared/instruments/retunePlan";
import { abovePacket, retuneVerdict, stringMidi } from "@/shared/instruments/tension";
import {
  gaugeNumber,
  gaugeWords,
  lengthNumber,
  lengthWords,
  newtonWords,
  readGauge,
  readLength,
  tensionWords,
} from "@/shared/instruments/units";
import { unitWeightTables } from "@/shared/instruments/unitWeights";

const preset = (id: string) => findPreset(id)!;
const verdicts = (id: string, shift: number) => planRetune(preset(id), shift).changes.map(({ verdict }) => verdict);

describe("the note a string was made for", () => {
  test("a guitar kept a whole step down is at its slack limit already: one more step is slack, a step up is home", () => {
    expect(preset("guitar-whole-down").strings.map(abovePacket)).toEqual([-2, -2, -2, -2, -2, -2]);
    expect(new Set(verdicts("guitar-whole-down", 0))).toEqual(new Set(["fine"]));
    expect(new Set(verdicts("guitar-whole-down", -1))).toEqual(new Set(["slack"]));
    expect(new Set(verdicts("guitar-whole-down", 2))).toEqual(new Set(["fine"]));
    expect(verdicts("guitar-whole-down", 3).slice(0, 4)).toEqual(["tight", "tight", "tight", "tight"]);
    expect(verdicts("guitar-whole-down", 4).slice(0, 4)).toEqual(["unsafe", "unsafe", "unsafe", "unsafe"]);
  });

  test("open E holds a light set above its packet: told as tight, never brought up further", () => {
    expect(verdicts("guitar-open-e", 0)).toEqual(["fine", "tight", "tight", "tight", "fine", "fine"]);
    expect(verdicts("guitar-open-e", 1).slice(1, 3)).toEqual(["unsafe", "unsafe"]);
    expect(verdicts("guitar-open-e", -2)).toEqual(["fine", "fine", "fine", "fine", "fine", "fine"]);
  });

  // ENGINE's limits: wound and unknown strings at most one up, whatever they are kept at; common practice.
  test("no wound string and none of unknown gauge is ever brought more than a semitone above it", () => {
    const string = fc.record({
      at: fc.integer({ min: 40, max: 60 }),
      kept: fc.integer({ min: -4, max: 4 }),
      wound: fc.boolean(),
      up: fc.integer({ min: 1, max: 6 }),
    });
    fc.assert(
      fc.property(string, ({ at, kept, wound, up }) => {
        const name = (midi: number) =>
          ["C", "C#", "D", "D#", "E", "F", "F#", "G", "G#", "A", "A#", "B"][midi % 12]! + (Math.floor(midi / 12) - 1);
        const one: InstrumentString = {
          note: name(at + kept),
          madeFor: name(at),
          gaugeIn: wound ? 0.042 : null,
          material: wound ? "phosphor-bronze" : "nylon",
        };
        expect(retuneVerdict(one, 648, up) === "unsafe").toBe(kept + up > 1);
      }),
    );
  });
});

describe("a retune in full", () => {
  // Common practice: what is let down first, outside to inside; the figures by D'Addario's chart 13934.
  test("a light acoustic set two down: order, totals and reasons", () => {
    const plan = planRetune(preset("guitar"), -2);
    expect(plan.steps.map(({ from, to, direction }) => `${from} ${direction} ${to}`)).toEqual([
      "E2 down D2",
      "E4 down D4",
      "A2 down G2",
      "B3 down A3",
      "D3 down C3",
      "G3 down F3",
    ]);
    expect(plan.total.beforeLb).toBeCloseTo(163.3, 0);
    expect(plan.total.afterLb).toBeCloseTo(163.3 * 0.7937, 0);
    expect(plan.total.unknown).toBe(0);
    expect(plan.safe).toBe(true);
    expect(plan.reasons.join(" ")).toMatch(/evenly.*Then go round again/);
  });

  test("string by string: into drop D one string turns; into open E from open D those let down come first", () => {
    expect(planRetune(preset("guitar"), [-2, 0, 0, 0, 0, 0]).steps).toEqual([
      { string: 0, from: "E2", to: "D2", direction: "down" },
    ]);
    const mixed = planRetune(preset("guitar"), [0, 0, 1, 0, -1, 1]);
    expect(mixed.steps.map(({ direction }) => direction)).toEqual(["down", "up", "up"]);
    expect(mixed.reasons[0]).toMatch(/down first/);
    expect(mixed.cautions.join(" ")).toMatch(/eyes away, bring it up slowly, and check the maker's limits/);
  });

  test("what may not be done is said by name, and why", () => {
    const plan = planRetune(preset("guitar"), 3);
    expect(plan.safe).toBe(false);
    expect(plan.cautions[0]).toMatch(/^Not for E4: above 75 %/);
    expect(plan.cautions[1]).toMatch(/^Not for E2, A2, D3 and G3: more than a semitone above/);
    expect(plan.cautions.join(" ")).toMatch(/heaviest ordinary set/);
  });

  test("unknown gauges are said, and counted out of the total; pairs count twice", () => {
    const uke = planRetune(preset("ukulele"), -2);
    expect(uke.total).toEqual({ beforeLb: 0, afterLb: 0, unknown: 4 });
    expect(uke.cautions.join(" ")).toMatch(/gauge of G4, C4, E4 and A4 is not known, so semitones alone/);
    expect(planRetune(preset("octave-mandolin"), 0).total.unknown).toBe(8);
  });

  test("steps turn exactly what is shifted, each once; nothing shifted turns nothing", () => {
    const shifts = fc.array(fc.integer({ min: -5, max: 2 }), { minLength: 8, maxLength: 8 });
    fc.assert(
      fc.property(fc.constantFrom(...presets), shifts, (instrument: Instrument, by) => {
        const { steps } = planRetune(instrument, by);
        expect(steps.map(({ string }) => string).sort((a, b) => a - b)).toEqual(
          instrument.strings.flatMap((_, k) => (by[k] === 0 ? [] : [k])),
        );
        for (const { string, to } of steps)
          expect(stringMidi({ note: to })).toBe(stringMidi(instrument.strings[string]!) + by[string]!);
      }),
    );
    expect(() => planRetune(preset("guitar"), [0])).toThrow(RangeError);
    expect(() => planRetune(preset("guitar"), 0.5)).toThrow(RangeError);
  });
});

describe("units", () => {
  test("1 lbf is 4.448 N and 0.4536 kg (definition of the pound)", () => {
    expect([newtonWords(100), tensionWords(100, "metric"), tensionWords(22.84, "imperial")]).toEqual([
      "445 N",
      "45.4 kg",
      "22.8 lb",
    ]);
  });

  test("every printed gauge and every preset's scale outlives being shown in either unit", () => {
    for (const table of Object.values(unitWeightTables))
      for (const [thousandths] of table)
        for (const units of ["metric", "imperial"] as const)
          expect(readGauge(gaugeNumber(thousandths / 1000, units), units)).toBeCloseTo(thousandths / 1000, 9);
    for (const { scaleMm } of presets)
      for (const units of ["metric", "imperial"] as const)
        expect(readLength(lengthNumber(scaleMm, units), units)).toBeCloseTo(scaleMm, 9);
    expect(lengthNumber(preset("banjo").strings[0]!.scaleMm!, "imperial")).toBe("19.625");
    expect([lengthWords(352.4, "imperial"), gaugeWords(0.0105, "imperial")]).toEqual(["13.875 in", ".0105 in"]);
  });

  test.each(["", "-3", "0", "wide", "1e3", "1,2,3"])("%j is no length", (text) => {
    expect(readLength(text, "metric")).toBeNull();
  });

  test("a comma is as good as a point", () => {
    expect(readLength("25,5", "imperial")).toBe(647.7);
  });
});

describe("presets", () => {
  // Common practice and makers' pages; scales by D'Addario's chart 13934 and makers' pages.
  test.each([
    ["box-gdg", "G2 D3 G3", 25],
    ["box-aea", "A2 E3 A3", 25],
    ["box-ebe", "E2 B2 E3", 25],
    ["box-dad", "D3 A3 D4", 25],
    ["box-dgb", "D3 G3 B3", 25],
    ["box-gbe", "G3 B3 E4", 25],
    ["box-dgd", "D3 G3 D4", 25],
    ["box-dgbd", "D3 G3 B3 D4", 25],
    ["box-gcea", "G4 C4 E4 A4", 17],
    ["guitar-half-down", "Eb2 Ab2 Db3 Gb3 Bb3 Eb4", 25.5],
    ["guitar-whole-down", "D2 G2 C3 F3 A3 D4", 25.5],
    ["guitar-open-d", "D2 A2 D3 F#3 A3 D4", 25.5],
    ["guitar-open-e", "E2 B2 E3 G#3 B3 E4", 25.5],
    ["guitar-open-a", "E2 A2 E3 A3 C#4 E4", 25.5],
    ["guitar-baritone", "B1 E2 A2 D3 F#3 B3", 27],
    ["ukulele-soprano", "G4 C4 E4 A4", 13],
    ["ukulele-tenor", "G4 C4 E4 A4", 17],
    ["ukulele-tenor-low-g", "G3 C4 E4 A4", 17],
    ["mandolin", "G3 D4 A4 E5", 13.875],
    ["mandola", "C3 G3 D4 A4", 15.875],
    ["octave-mandolin", "G2 D3 A3 E4", 21],
    ["mandocello", "C2 G2 D3 A3", 25],
    ["dulcimer", "D3 A3 D4", 27],
    ["dulcimer-daa", "D3 A3 A3", 27],
  ])("%s is tuned %s on a scale of %f in", (id, notes, inches) => {
    expect(
      preset(id)
        .strings.map(({ note }) => note)
        .join(" "),
    ).toBe(notes);
    expect(preset(id).scaleMm / 25.4).toBeCloseTo(inches, 2);
  });
});
