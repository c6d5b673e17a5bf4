import { preferencesOf, readWishes, usualWishes, wishWords } from "./wishes";

test("damaged or missing wishes become usual ones", () => {
  expect(readWishes(null)).toEqual(usualWishes);
  expect(readWishes("{")).toEqual(usualWishes);
  expect(readWishes('{"noBarre":true,"highestCapo":40}')).toEqual({ ...usualWishes, noBarre: true, highestCapo: 9 });
});

test("what is to be avoided weighs most", () => {
  const all = preferencesOf({ noBarre: true, noCapo: true, noRetune: true, highestCapo: 5 });
  const none = preferencesOf(usualWishes);
  expect(all).toMatchObject({ barre: 1, capo: 1, retune: 1, highestCapo: 5 });
  expect(none.barre).toBeLessThan(1);
  expect(none.capo).toBeLessThan(1);
  expect(none.retune).toBeLessThan(1);
});

test("wishes in one line", () => {
  expect(wishWords(usualWishes)).toBe("capo 7 or lower");
  expect(wishWords({ ...usualWishes, noBarre: true, noRetune: true })).toBe(
    "no barres, nothing retuned, capo 7 or lower",
  );
});
