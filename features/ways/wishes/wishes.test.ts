import { findPreset } from "@/shared/instruments/presets";
import { knownOn, merged, preferencesOf, usualWishes, wishWords, withShape } from "./wishes";

const guitar = findPreset("guitar")!;
const box = findPreset("box-adf")!;

test("what is to be avoided weighs most", () => {
  const all = preferencesOf(
    { ...usualWishes, noBarre: true, noCapo: true, neverRetune: true, keepRinging: true, highestCapo: 5 },
    guitar,
  );
  const none = preferencesOf(usualWishes, guitar);
  expect(all).toMatchObject({ barre: 1, capo: 1, retune: 1, ringing: 1, highestCapo: 5 });
  for (const wish of ["barre", "capo", "retune"] as const) expect(none[wish]).toBeLessThan(1);
  expect(none.ringing).toBe(0);
});

test("a known shape counts on instruments whose strings stand alike, and on no other", () => {
  const wishes = withShape(usualWishes, guitar, "x 3 2 0 1 0", true);
  const down = {
    ...guitar,
    strings: guitar.strings.map((string, k) => ({ ...string, note: "D2 G2 C3 F3 A3 D4".split(" ")[k]! })),
  };
  expect(knownOn(wishes, down)).toEqual(["x 3 2 0 1 0"]);
  expect(preferencesOf(wishes, guitar).knownMarks).toEqual(["x 3 2 0 1 0"]);
  expect(knownOn(wishes, box)).toEqual([]);
  expect(withShape(wishes, guitar, "x 3 2 0 1 0", false)).toEqual(usualWishes);
});

test("sets of several devices become one: the newest switches, and all shapes", () => {
  const old = { ...withShape(usualWishes, box, "0 0 0", true), id: "a", changedAt: "2026-11-01T10:00:00.000Z" };
  const recent = {
    ...withShape({ ...usualWishes, noBarre: true }, box, "2 0 1", true),
    id: "b",
    changedAt: "2026-11-02T10:00:00.000Z",
  };
  expect(merged([recent, old])).toEqual({
    ...usualWishes,
    noBarre: true,
    known: [{ tuning: "5 4", shapes: ["2 0 1", "0 0 0"] }],
  });
  expect(merged([])).toEqual(usualWishes);
});

test("wishes in one line", () => {
  expect(wishWords(usualWishes, guitar)).toBe("capo 7 or lower");
  expect(
    wishWords(withShape({ ...usualWishes, noBarre: true, neverRetune: true }, guitar, "0 2 2 1 0 0", true), guitar),
  ).toBe("no barre, never retune on stage, 1 shape you know, capo 7 or lower");
});
