import { readByHand, usualComfort } from "./byHand";

const fields = (lowest: string, highest: string, comfortLow = "", comfortTop = "") => ({
  lowest,
  highest,
  comfortLow,
  comfortTop,
});

it("reads notes as people write them and assumes a comfort band inside", () => {
  expect(readByHand(fields(" f3 ", "B♭4"))).toEqual({
    ok: true,
    voice: { range: { lowMidi: 53, highMidi: 70 }, comfort: { lowMidi: 55, highMidi: 67 } },
  });
});

it("keeps a comfort band that was given", () => {
  expect(readByHand(fields("F3", "C5", "G3", "A4"))).toMatchObject({
    voice: { comfort: { lowMidi: 55, highMidi: 69 } },
  });
});

it("leaves a narrow range without reserves", () => {
  expect(usualComfort(60, 65)).toEqual({ lowMidi: 60, highMidi: 65 });
});

it("holds to the one end that was given, however far it lies", () => {
  expect(readByHand(fields("C3", "C5", "B4"))).toMatchObject({
    ok: true,
    voice: { comfort: { lowMidi: 71, highMidi: 72 } },
  });
  expect(readByHand(fields("C3", "C5", "", "C#3"))).toMatchObject({
    ok: true,
    voice: { comfort: { lowMidi: 48, highMidi: 49 } },
  });
});

it.each([
  [fields("", "C5"), "lowest", "Give your lowest note, such as G3."],
  [fields("G3", ""), "highest", "Give your highest note, such as C5."],
  [fields("X4", "C5"), "lowest", "There is no X4. Try a letter and an octave, such as A4 or B♭3."],
  [fields("G", "C5"), "lowest", "Which G? Add the octave, such as G3 or G4."],
  [fields("H3", "C5"), "lowest", "There is no H3 in this naming. Try B."],
  [fields("C0", "C5"), "lowest", "Voices lie between C1 and C7."],
  [fields("C5", "G3"), "highest", "The highest note must be above C5."],
  [fields("C4", "C4"), "highest", "The highest note must be above C4."],
  [fields("F3", "C5", "E3"), "comfortLow", "Comfort lies inside the range: F3 to C5."],
  [fields("F3", "C5", "A4", "G3"), "comfortTop", "This must not be below A4."],
])("tells a fault at its own field: %j", (typed, field, message) => {
  expect(readByHand(typed)).toEqual({ ok: false, errors: { [field]: message } });
});
