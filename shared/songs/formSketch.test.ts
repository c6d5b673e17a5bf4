import fc from "fast-check";
import { parseChart } from "./chart";
import { formLine, formParts, sketchIntoChart, tempoOfTaps, type FormPart } from "./formSketch";

const beat = { tempo: 120, beatsPerBar: 4 };

test("taps give the tempo, with half and double offered", () => {
  expect(tempoOfTaps([0, 0.625, 1.25, 1.875, 2.5])).toMatchObject({ tempo: 96, half: 48, double: 192, beats: 5 });
  expect(tempoOfTaps([0, 0.5, 1])).toBeNull();
  // Half as fast from the middle on: there is no one tempo.
  expect(tempoOfTaps([0, 0.4, 0.8, 1.8, 2.8])).toBeNull();
  expect(tempoOfTaps([0, 0.2, 0.4, 0.6, 0.8])).toMatchObject({ tempo: 300, double: null });
});

test("a beat missed, one tapped twice, and a count begun anew do not spoil it", () => {
  expect(tempoOfTaps([0, 0.5, 1, 2, 2.5, 3, 3.5])?.tempo).toBe(120);
  expect(tempoOfTaps([0, 0.5, 0.6, 1, 1.5, 2, 2.5, 3])?.tempo).toBe(120);
  expect(tempoOfTaps([0, 0.9, 1.8, 20, 20.5, 21, 21.5])?.tempo).toBe(120);
});

test("people who tap unevenly by up to a tenth of a beat get the tempo to within 6 %", () => {
  fc.assert(
    fc.property(
      fc.integer({ min: 50, max: 180 }),
      fc.array(fc.double({ min: -0.1, max: 0.1, noNaN: true }), { minLength: 12, maxLength: 24 }),
      (tempo, errors) => {
        const taps = errors.map((error, k) => ((k + error) * 60) / tempo);
        const found = tempoOfTaps(taps)!.tempo;
        expect(Math.abs(found / tempo - 1)).toBeLessThan(0.06);
      },
    ),
    { numRuns: 200 },
  );
});

test("marks become parts with bars, and verses are counted", () => {
  const marks = [
    { name: "Intro", atS: 0 },
    { name: "Verse", atS: 8.2 },
    { name: "Chorus", atS: 24.1 },
    { name: "Verse", atS: 40 },
  ] as const;
  const parts = formParts(marks, 56.2, beat);
  expect(parts.map(({ label, bars }) => [label, bars])).toEqual([
    ["Intro", 4],
    ["Verse 1", 8],
    ["Chorus", 8],
    ["Verse 2", 8],
  ]);
  expect(formLine(parts)).toBe("Intro (4 bars) · Verse 1 (8 bars) · Chorus (8 bars) · Verse 2 (8 bars)");
  expect(formParts(marks, 56, null)[0]!.bars).toBeNull();
  expect(() => formParts(marks, 10, beat)).toThrow(RangeError);
});

const form: FormPart[] = [
  { label: "Verse 1", atS: 0, seconds: 16, bars: 8 },
  { label: "Chorus", atS: 16, seconds: 16, bars: 8 },
  { label: "Verse 2", atS: 32, seconds: 16, bars: 8 },
  { label: "Chorus", atS: 48, seconds: 16, bars: 8 },
];
const labels = (text: string) => parseChart(text).sections.flatMap(({ label }) => (label === null ? [] : [label]));

test("an empty chart becomes its headings", () => {
  const { text, how } = sketchIntoChart(" \n", form);
  expect(how).toBe("skeleton");
  expect(labels(text)).toHaveLength(4);
  expect(labels(text)[0]).toMatch(/^Verse 1/);
});

test("blocks get the headings where they are as many, also where a chorus is written once", () => {
  const blocks = ["G  D\nout to the light", "C  G\nhome to the quay", "G  D\nback on the tide"];
  const once = sketchIntoChart(blocks.join("\n\n"), form);
  expect(once.how).toBe("headed");
  expect(labels(once.text).map((label) => label.replace(/ \(.*/, ""))).toEqual(["Verse 1", "Chorus", "Verse 2"]);
  expect(once.text).toContain("# Form as heard: Verse 1 (8 bars) · Chorus");
  const all = sketchIntoChart([...blocks, "C  G\nhome to the quay"].join("\n\n"), form);
  expect(all.text).not.toContain("# Form");
  expect(labels(all.text)).toHaveLength(4);
});

test("a chart with its own parts keeps them, and a second sketch takes the place of the first", () => {
  const chart = "Verse\nG  D\nout to the light\n\nChorus\nC  G\nhome";
  const first = sketchIntoChart(chart, form);
  expect(first).toEqual({ how: "noted", text: `# Form as heard: ${formLine(form)}\n${chart}` });
  const second = sketchIntoChart(first.text, form.slice(0, 2));
  expect(second.text).toBe(`# Form as heard: ${formLine(form.slice(0, 2))}\n${chart}`);
});

test("no line of a chart is ever lost", () => {
  const line = fc.stringMatching(/^[A-Ga-z ]{0,12}$/);
  fc.assert(
    fc.property(fc.array(line, { maxLength: 12 }), (lines) => {
      const chart = lines.join("\n");
      const { text } = sketchIntoChart(chart, form);
      const kept = text.split("\n");
      for (const each of lines.filter((word) => word.trim() !== "")) expect(kept).toContain(each);
    }),
    { numRuns: 200 },
  );
});
