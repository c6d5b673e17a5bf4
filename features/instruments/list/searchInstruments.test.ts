import { presets } from "@/shared/instruments/presets";
import { makeFavourite, ownFirst } from "../myInstruments";
import { searchInstruments } from "./searchInstruments";

const found = (typed: string, owned: Parameters<typeof ownFirst>[0] = []) => {
  const { mine, others } = ownFirst(owned);
  return searchInstruments(mine, others, typed).map(({ name, instruments }) => [
    name,
    instruments.map(({ instrument }) => instrument.id),
  ]);
};

test("without a word every preset is there once, by kind", () => {
  const all = found("").flatMap(([, ids]) => ids as string[]);
  expect(all.sort()).toEqual(presets.map(({ id }) => id).sort());
});

test.each([
  ["open g", ["guitar-open-g"]],
  ["tenor low", ["ukulele-tenor-low-g"]],
  ["3 strings dulcimer", ["dulcimer", "dulcimer-daa"]],
  ["G-D-G-B", ["box-gdgb", "guitar-open-g", "banjo"]],
  ["lute", []],
])("%s finds %j and nothing else", (typed, ids) => {
  expect(found(typed).flatMap(([, each]) => each as string[])).toEqual(ids);
});

test.each(["dgb", "d g b", "D-G-B"])("a tuning typed as %s is found, also inside a longer one", (typed) => {
  const hits = found(typed).flatMap(([, each]) => each as string[]);
  expect(hits).toEqual(expect.arrayContaining(["box-dgb", "box-dgbd", "guitar"]));
  expect(found("a d f♯").flatMap(([, each]) => each as string[])).toContain("box-adf");
});

test("what is one's own stands first, and no more among its kind", () => {
  const owned = makeFavourite([], "banjo", () => "7f0b6f0e-6a51-4a8e-9a53-0a3d8f6f3f01");
  expect(found("", owned)[0]).toEqual(["Yours", ["banjo"]]);
  expect(found("banjo", owned)).toEqual([["Yours", ["banjo"]]]);
});
