import fc from "fast-check";
import { differing, fileStem } from "./fileStem";

test.each([
  ["The Half-Past-Nine Ferry", "The Half-Past-Nine Ferry"],
  ["../../etc/passwd", "etc passwd"],
  ['Who? "Me": <no|yes>*', "Who Me no yes"],
  ["CON", "CON song"],
  ["nul.txt", "nul.txt song"],
  ["  ...  ", "song"],
  ["Étoile ♭", "Étoile ♭"],
  ["left\u202egnp.exe", "left gnp.exe"],
])("%j is kept as %j", (title, stem) => {
  expect(fileStem(title)).toBe(stem);
});

test("any title makes a name that every system takes", () => {
  fc.assert(
    fc.property(fc.string({ unit: "binary", maxLength: 300 }), (title) => {
      const stem = fileStem(title);
      expect(stem).toMatch(/^[^<>:"/\\|?*\p{Cc}\u202e]{1,170}$/u);
      expect(stem).not.toMatch(/^\.|[. ]$/);
    }),
  );
});

test("no file takes the place of another", () => {
  expect(differing(["Gulls", "gulls", "Gulls 2", "Gulls"])).toEqual(["Gulls", "gulls 2", "Gulls 2 2", "Gulls 3"]);
});
