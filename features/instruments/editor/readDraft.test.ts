import { ownInstrument } from "@/shared/contract/instrument";
import { presets } from "@/shared/instruments/presets";
import { draftOf, emptyDraft, inUnits, isOther, newString, type InstrumentDraft } from "./instrumentDraft";
import { readDraft, readNote, sketchOf } from "./readDraft";

const id = "7f0b6f0e-6a51-4a8e-9a53-0a3d8f6f3f01";
const errorsOf = (draft: InstrumentDraft) => {
  const read = readDraft(draft);
  return "errors" in read ? read.errors : {};
};
const draft = draftOf(presets[0]!, null, "metric");

test.each(presets.map((preset) => [preset.id, preset] as const))(
  "%s is the same after it was shown in the fields, in either units, and may be kept",
  (_, preset) => {
    const { id: _id, ...unnamed } = preset;
    for (const units of ["metric", "imperial"] as const)
      expect(readDraft(draftOf(preset, null, units))).toEqual({ instrument: unnamed });
    const turned = inUnits(inUnits(draftOf(preset, null, "metric"), "imperial"), "metric");
    expect(readDraft(turned)).toEqual({ instrument: unnamed });
    expect(ownInstrument.safeParse({ ...unnamed, id, presetId: null, favourite: false }).success).toBe(true);
  },
);

test("every field that does not fit is named, in words", () => {
  const string = {
    ...draft.strings[0]!,
    note: "H9",
    gauge: "thick",
    madeFor: "low",
    short: true,
    length: "900",
    startsAt: "0",
  };
  const wrong = errorsOf({ ...draft, name: " ", scale: "6", frets: "0", capoTo: "-1", strings: [string] });
  expect(Object.keys(wrong).sort()).toEqual(
    [
      "capoTo",
      "frets",
      "name",
      "scale",
      "string 1 gauge",
      "string 1 madeFor",
      "string 1 note",
      "string 1 length",
      "string 1 startsAt",
    ].sort(),
  );
  for (const words of Object.values(wrong)) expect(words).toMatch(/\.$/);
  expect(errorsOf({ ...draft, strings: [] }).strings).toMatch(/at least one string/);
  expect(errorsOf({ ...draft, frets: "7", capoTo: "7" }).capoTo).toMatch(/frets left/);
});

test.each([
  ["2 4 5 7 9 10 12", true],
  ["2, 4, 5", true],
  ["2 2 5", false],
  ["0 2", false],
  ["two", false],
  ["", false],
])("a fret map of %j is taken: %s", (fretMap, taken) => {
  expect(errorsOf({ ...draft, fretKind: "custom", fretMap, capoTo: "0" }).fretMap === undefined).toBe(taken);
});

test.each([
  ["f♯4", "F#4"],
  [" bb3 ", "Bb3"],
  ["C", null],
  ["B#9", null],
  ["E##3", null],
])("the note %j is read as %j", (typed, note) => {
  expect(readNote(typed)).toBe(note);
});

test("an unfinished instrument is drawn as far as it is known", () => {
  const empty = emptyDraft("metric");
  expect(sketchOf(empty)).toBeNull();
  const one = { ...empty, strings: [{ ...newString([]), note: "G3", gauge: "thick" }, newString([])] };
  expect(sketchOf(one)?.strings.map(({ note }) => note)).toEqual(["G3"]);
});

test("another name, hand or photo leaves it what it was; other strings make another instrument of it", () => {
  const { fretMap, ...preset } = presets[0]!;
  const own = { ...preset, ...(fretMap && { fretMap }), id, presetId: preset.id, favourite: true };
  expect(isOther(own, { ...own, name: "Mine", leftHanded: true, capoTo: 3 })).toBe(false);
  expect(isOther(own, { ...own, strings: own.strings.map((each) => ({ ...each, gaugeIn: null })) })).toBe(true);
  expect(isOther(own, { ...own, scaleMm: 600 })).toBe(true);
});
