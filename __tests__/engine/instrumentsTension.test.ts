import fc from "fast-check";
import { findPreset, presets } from "@/shared/instruments/presets";
import {
  breakingHz,
  breakingLoadLb,
  retuneVerdict,
  stringTensionLb,
  tensionChanges,
  tensionRatio,
  totalTension,
} from "@/shared/instruments/tension";
import type { InstrumentString, StringMaterial } from "@/shared/instruments/instrument";
import { unitWeight, unitWeightTables, weightFits } from "@/shared/instruments/unitWeights";
import { midiToHz, parseNoteName } from "@/shared/music/pitch";

const hz = (note: string) => midiToHz(parseNoteName(note)!);
const tenth = (value: number) => Math.round(value * 10) / 10;
const materials: Record<string, StringMaterial> = {
  p: "plain-steel",
  w: "nickel-wound",
  b: "phosphor-bronze",
  y: "brass-wound",
};
const mandolin: InstrumentString[] = [
  { note: "G3", gaugeIn: 0.04, material: "phosphor-bronze", inCourse: 2 },
  { note: "D4", gaugeIn: 0.026, material: "phosphor-bronze", inCourse: 2 },
  { note: "A4", gaugeIn: 0.015, material: "plain-steel", inCourse: 2 },
  { note: "E5", gaugeIn: 0.011, material: "plain-steel", inCourse: 2 },
];
/** "12p" = .012 in plain steel at the note beside it. */
const tension = (code: string, note: string, scale: number) => {
  const material = materials[code.slice(-1)]!;
  return stringTensionLb(unitWeight(material, Number(code.slice(0, -1)) / 1000)!, scale, hz(note));
};
const standard = ["E4", "B3", "G3", "D3", "A2", "E2"];

describe("tensions of ordinary sets, from D'Addario's unit weights (string tension chart 13934)", () => {
  test.each([
    ["electric 9-42, 25.5 in", "9p 11p 16p 24w 32w 42w", 25.5, standard, [13.1, 11.0, 14.7, 15.8, 15.8, 14.8], 85.1],
    ["electric 10-46, 25.5 in", "10p 13p 17p 26w 36w 46w", 25.5, standard, [16.2, 15.4, 16.6, 18.4, 19.5, 17.5], 103.5],
    [
      "electric 10-46, 24.75 in",
      "10p 13p 17p 26w 36w 46w",
      24.75,
      standard,
      [15.3, 14.5, 15.6, 17.3, 18.4, 16.5],
      97.5,
    ],
    ["electric 11-49, 25.5 in", "11p 14p 18p 28w 38w 49w", 25.5, standard, [19.6, 17.8, 18.6, 21.3, 21.6, 19.7], 118.5],
    // The same printed set that the guitar presets carry.
    ["acoustic PB 12-53", "12p 16p 24b 32b 42b 53b", 25.5, standard, [23.3, 23.3, 30.2, 30.5, 29.9, 26.0], 163.3],
    ["acoustic 80/20 12-53", "12p 16p 24y 32y 42y 53y", 25.5, standard, [23.3, 23.3, 29.4, 29.5, 28.4, 25.1], 158.9],
    ["acoustic PB 13-56", "13p 17p 26b 35b 45b 56b", 25.5, standard, [27.4, 26.3, 35.3, 36.8, 34.0, 29.0], 188.8],
    ["box G2 D3 G3, 25 in", "42b 32b 24b", 25, ["G2", "D3", "G3"], [22.8, 29.3, 29.0], 81.2],
    ["box G3 B3 E4, 25 in", "26b 17p 13p", 25, ["G3", "B3", "E4"], [33.9, 25.3, 26.3], 85.5],
    ["box G3 B3 D4, 25 in", "26b 17p 13p", 25, ["G3", "B3", "D4"], [33.9, 25.3, 20.9], 80.1],
    ["box G2 D3 G3 B3, 25 in", "42b 32b 24b 16p", 25, ["G2", "D3", "G3", "B3"], [22.8, 29.3, 29.0, 22.4], 103.5],
  ])("%s", (_, codes, scale, notes, each, total) => {
    const pounds = codes.split(" ").map((code, k) => tension(code, notes[k]!, scale));
    pounds.forEach((value, k) => expect(Math.abs(value - each[k]!)).toBeLessThanOrEqual(0.1));
    expect(Math.abs(pounds.reduce((sum, value) => sum + value, 0) - total)).toBeLessThanOrEqual(0.1);
  });

  test("a classical set by its printed unit weights: 83.6 lb", () => {
    const weights = [2.092, 2.827, 4.679, 10.754, 18.416, 30.632];
    const pounds = weights.map((weight, k) => stringTensionLb(weight * 1e-5, 25.5, hz(standard[k]!)));
    expect(pounds.map(tenth)).toEqual([15.3, 11.6, 12.1, 15.6, 15.0, 14.0]);
    expect(tenth(pounds.reduce((sum, value) => sum + value, 0))).toBe(83.6);
  });

  test("a five-string banjo set with its short string on its own scale: 56.0 lb", () => {
    // The fourth is round wound in stainless steel, .1950 lb per cubic inch by the fit to the same chart.
    const pounds = [
      tension("9p", "D4", 26.25),
      tension("11p", "B3", 26.25),
      tension("13p", "G3", 26.25),
      stringTensionLb(0.195 * 0.02 ** 2, 26.25, hz("D3")),
      tension("9p", "G4", 19.625),
    ];
    expect(pounds.map(tenth)).toEqual([11.0, 11.7, 10.3, 12.0, 11.0]);
    expect(Math.abs(pounds.reduce((sum, value) => sum + value, 0) - 56)).toBeLessThanOrEqual(0.1);
  });

  test("a mandolin set, one of each pair: 90.9 lb, pairs 181.8", () => {
    const plain = [tension("11p", "E5", 13.875), tension("15p", "A4", 13.875)];
    expect(plain.map(tenth)).toEqual([23.2, 19.2]);
    // The wound ones are loop-end strings with weights of their own, which the chart's tables do not give: by gauge
    // alone they come within 0.15 lb of the printed 23.3 and 25.1.
    const wound = [tension("26b", "D4", 13.875), tension("40b", "G3", 13.875)];
    [23.3, 25.1].forEach((printed, k) => expect(Math.abs(wound[k]! - printed)).toBeLessThan(0.15));
    const total = [...plain, ...wound].reduce((sum, value) => sum + value, 0);
    expect(Math.abs(total - 90.9)).toBeLessThan(0.3);
    const courses = totalTension(tensionChanges({ ...findPreset("mandolin")!, strings: mandolin }, 0));
    expect(Math.abs(courses.beforeLb - 181.8)).toBeLessThan(0.6);
  });
});

describe("unit weights", () => {
  test("every printed gauge gives its printed weight", () => {
    for (const [material, table] of Object.entries(unitWeightTables))
      for (const [thousandths, weight] of table)
        expect(unitWeight(material as StringMaterial, thousandths / 1000)).toBeCloseTo(weight * 1e-5, 12);
  });

  test("weight grows with the gauge, inside the tables and beyond them", () => {
    const material = fc.constantFrom(...(Object.keys(weightFits) as (keyof typeof weightFits)[]));
    const gauge = fc.integer({ min: 80, max: 800 }).map((ten) => ten / 10_000);
    fc.assert(
      fc.property(material, gauge, fc.constantFrom(1.15, 1.4, 2), (of, thin, factor) => {
        expect(unitWeight(of, thin * factor)!).toBeGreaterThan(unitWeight(of, thin)!);
      }),
    );
  });

  test("fits stay within 8 % of the maker's tables", () => {
    for (const [material, table] of Object.entries(unitWeightTables))
      for (const [thousandths, weight] of table) {
        const fitted = weightFits[material as keyof typeof weightFits] * (thousandths / 1000) ** 2;
        expect(Math.abs(fitted / (weight * 1e-5) - 1)).toBeLessThan(0.08);
      }
  });

  test("fluorocarbon is within 6 % of a maker's measurements; unknown material has no weight", () => {
    for (const [gauge, weight] of [
      [0.0205, 2.128],
      [0.0185, 1.783],
      [0.026, 3.439],
      [0.0291, 4.504],
      [0.0319, 5.45],
    ] as const)
      expect(Math.abs(unitWeight("fluorocarbon", gauge)! / (weight * 1e-5) - 1)).toBeLessThan(0.06);
    expect(unitWeight("unknown", 0.03)).toBeNull();
    expect(() => unitWeight("nylon", 0)).toThrow(RangeError);
  });
});

describe("retuning", () => {
  test.each([
    [-1, 0.8909],
    [-2, 0.7937],
    [-3, 0.7071],
    [-4, 0.63],
    [-5, 0.5612],
    [-7, 0.4454],
    [1, 1.1225],
    [2, 1.2599],
    [3, 1.4142],
  ])("%i semitones change the tension by 2^(n/6) = %f", (semitones, ratio) => {
    expect(tensionRatio(semitones)).toBeCloseTo(ratio, 4);
  });

  test("a 10-46 set goes from 103.5 lb to 92.2, 82.1 and 65.2 lb; a 12-53 set two up to 205.7 lb", () => {
    expect([-1, -2, -4].map((n) => tenth(103.5 * tensionRatio(n)))).toEqual([92.2, 82.1, 65.2]);
    const guitar = tensionChanges(findPreset("guitar")!, 2);
    expect(Math.abs(guitar.reduce((sum, { afterLb }) => sum + afterLb!, 0) - 205.7)).toBeLessThan(0.15);
  });

  test("every string's tension follows the ratio, whatever it is made of", () => {
    fc.assert(
      fc.property(fc.constantFrom(...presets), fc.integer({ min: -7, max: 4 }), (instrument, semitones) => {
        for (const { beforeLb, afterLb } of tensionChanges(instrument, semitones)) {
          expect(beforeLb === null).toBe(afterLb === null);
          if (beforeLb !== null) expect(afterLb! / beforeLb).toBeCloseTo(tensionRatio(semitones), 9);
        }
      }),
    );
  });

  test("two down is above the slack limit, three down below it; one up is tight, two up unsafe for wound strings", () => {
    const verdicts = (n: number) => tensionChanges(findPreset("guitar")!, n).map(({ verdict }) => verdict);
    expect(new Set(verdicts(0))).toEqual(new Set(["fine"]));
    expect(new Set(verdicts(-2))).toEqual(new Set(["fine"]));
    expect(new Set(verdicts(-3))).toEqual(new Set(["slack"]));
    expect(new Set(verdicts(1))).toEqual(new Set(["tight"]));
    expect(verdicts(2).slice(0, 4)).toEqual(["unsafe", "unsafe", "unsafe", "unsafe"]);
  });

  test("with an unknown gauge semitones alone decide, and a wound string never goes more than one up", () => {
    const unknown: InstrumentString = { note: "C4", gaugeIn: null, material: "nylon" };
    const wound: InstrumentString = { note: "A2", gaugeIn: 0.042, material: "phosphor-bronze" };
    expect([-4, -3, -2, 0, 1, 2].map((n) => retuneVerdict(unknown, 432, n))).toEqual([
      "slack",
      "slack",
      "fine",
      "fine",
      "tight",
      "unsafe",
    ]);
    expect([1, 2, 3].map((n) => retuneVerdict(wound, 648, n))).toEqual(["tight", "unsafe", "unsafe"]);
  });

  test("a plain string stops at 75 % of the weakest wire: .010 at 25.5 in up to about G4, at 23 in up to about A4", () => {
    const string = (note: string): InstrumentString => ({ note, gaugeIn: 0.01, material: "plain-steel" });
    expect(breakingHz(0.01, 25.5) * Math.sqrt(0.75)).toBeCloseTo(391, 0);
    expect(breakingHz(0.01, 23) * Math.sqrt(0.75)).toBeCloseTo(434, 0);
    expect(retuneVerdict(string("E4"), 25.5 * 25.4, 2)).toBe("tight");
    expect(retuneVerdict(string("E4"), 25.5 * 25.4, 3)).toBe("unsafe");
    expect(retuneVerdict(string("E4"), 23 * 25.4, 4)).toBe("tight");
  });

  test("going further up never makes a verdict milder", () => {
    const order = ["fine", "tight", "unsafe"];
    fc.assert(
      fc.property(fc.constantFrom(...presets), fc.integer({ min: 0, max: 6 }), (instrument, up) => {
        const now = tensionChanges(instrument, up);
        tensionChanges(instrument, up + 1).forEach(({ verdict }, k) =>
          expect(order.indexOf(verdict)).toBeGreaterThanOrEqual(order.indexOf(now[k]!.verdict)),
        );
      }),
    );
  });
});

// ASTM A228/A228M minimum strength of music wire with .2820 lb per cubic inch; frequencies in Hz at snapping.
describe("breaking", () => {
  test.each([
    [0.008, 20.1, [508, 472, 458, 433, 584, 779, 842]],
    [0.009, 25.0, [504, 469, 455, 430, 580, 773, 836]],
    [0.01, 30.4, [501, 465, 451, 426, 576, 767, 830]],
    [0.012, 42.6, [494, 459, 446, 421, 568, 757, 819]],
    [0.016, 72.8, [484, 450, 437, 412, 557, 742, 802]],
    [0.02, 110.0, [476, 442, 429, 405, 547, 730, 789]],
  ])("plain %f in bears %f lb", (gauge, load, frequencies) => {
    expect(tenth(breakingLoadLb(gauge))).toBe(load);
    const scales = [23, 24.75, 25.5, 27, 20, 15, 13.875];
    scales.forEach((scale, k) => expect(Math.abs(breakingHz(gauge, scale) - frequencies[k]!)).toBeLessThanOrEqual(1));
  });

  // The same table's pitches: note and cents of the snap, and the note where 75 % of the strength is reached.
  test.each([
    [0.008, 24.75, "A#4", 23],
    [0.008, 25.5, "A#4", -29],
    [0.008, 27, "A4", -28],
    [0.008, 20, "D5", -9],
    [0.008, 15, "G5", -11],
    [0.008, 13.875, "G#5", 24],
    [0.009, 25.5, "A#4", -42],
    [0.01, 24.75, "A#4", -4],
    [0.01, 25.5, "A4", 44],
    [0.01, 27, "G#4", 45],
    [0.01, 20, "D5", -35],
    [0.012, 23, "B4", 0],
    [0.012, 25.5, "A4", 22],
    [0.016, 25.5, "A4", -13],
    [0.02, 25.5, "A4", -43],
  ])("plain %f in at %f in snaps at %s %i cents", (gauge, scale, note, cents) => {
    expect(Math.abs(1200 * Math.log2(breakingHz(gauge, scale) / hz(note)) - cents)).toBeLessThanOrEqual(2);
  });

  test.each([
    [25.5, 391, "G4", -5],
    [24.75, 403, "G4", 48],
    [23, 434, "A4", -24],
  ])("75 %% of the strength of .010 at %f in is %i Hz", (scale, at, note, cents) => {
    const cap = breakingHz(0.01, scale) * Math.sqrt(0.75);
    expect(Math.round(cap)).toBe(at);
    expect(Math.abs(1200 * Math.log2(cap / hz(note)) - cents)).toBeLessThanOrEqual(2);
  });

  test("the octave string of a twelve-string bears 73 % of the weakest wire, the first of a 10-46 set 53 %", () => {
    const stress = (gauge: number, note: string, scale: number) =>
      tension(`${gauge * 1000}p`, note, scale) / breakingLoadLb(gauge);
    expect(Math.round(stress(0.008, "G4", 25.5) * 100)).toBe(73);
    expect(Math.round(stress(0.01, "E4", 25.5) * 100)).toBe(53);
    expect(Math.round(stress(0.01, "E4", 24.75) * 100)).toBe(50);
    expect(Math.round(stress(0.011, "E5", 13.875) * 100)).toBe(64);
    expect(Math.round(stress(0.009, "G4", 19.625) * 100)).toBe(44);
  });
});
