import { foundWords, readView, viewParams, type ShelfView } from "./shelfView";

const plain: ShelfView = { q: "", tag: null, sort: "title", archived: false };

test("an address keeps the view, and the plain shelf has a plain address", () => {
  const view: ShelfView = { q: "low tide", tag: "set one", sort: "fit", archived: true };
  expect(readView(viewParams(view))).toEqual(view);
  expect(readView({})).toEqual(plain);
  expect(Object.values(viewParams(plain)).every((value) => value === undefined)).toBe(true);
});

test("what an address says and nobody knows is left aside", () => {
  expect(readView({ sort: "colour", q: ["first", "second"], shelf: "attic" })).toEqual({ ...plain, q: "first" });
});

test("what was found, in words", () => {
  expect(foundWords({ ...plain, q: "tide" }, 1)).toBe("1 song found");
  expect(foundWords({ ...plain, tag: "choir" }, 12)).toBe("12 songs with the tag choir");
  expect(foundWords({ ...plain, archived: true }, 0)).toBe("0 songs put aside");
  expect(foundWords(plain, 2000)).toBe("2000 songs");
});
