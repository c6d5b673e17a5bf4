import { readHabits } from "./sheetHabits";

it("lays sheets out as usual where nothing or nonsense is kept, and keeps what can be read", () => {
  const usual = readHabits(null);
  expect(usual).toMatchObject({ paper: "A4", grids: "side", numbers: false, shows: "played" });
  for (const damaged of ["{", "7", '"x"', "[]", '{"paper":"A5","grids":3,"numbers":"yes"}'])
    expect(readHabits(damaged)).toEqual(usual);
  expect(readHabits('{"paper":"Letter","numbers":true}')).toEqual({ ...usual, paper: "Letter", numbers: true });
});
