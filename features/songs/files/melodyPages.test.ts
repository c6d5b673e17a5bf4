import { melodyPages, pageWords, placedWords } from "./melodyPages";

const notes = Array.from({ length: 10 }, (_, start) => ({ start, duration: 1, midi: 60 + start, lyric: "la" }));

test("a tune is cut into pages of equal time, each note on one of them", () => {
  const pages = melodyPages(notes, 4);
  expect(pages.map((page) => page.notes.map(({ index }) => index))).toEqual([
    [0, 1, 2, 3],
    [4, 5, 6, 7],
    [8, 9],
  ]);
});

test("pages without notes are left out", () => {
  expect(melodyPages([notes[0]!, { ...notes[1]!, start: 20 }], 4).map((page) => page.from)).toEqual([0, 20]);
});

test("syllables that would cover each other stand in two rows, and no more than fit", () => {
  const [page] = melodyPages(notes, 10);
  const rows = placedWords(page!, (beat) => beat * 10, 6).map(({ row }) => row);
  expect(new Set(rows)).toEqual(new Set([0, 1]));
  expect(placedWords(page!, (beat) => beat * 40, 6).map(({ row }) => row)).toEqual(notes.map(() => 0));
});

test("the picture is told in words", () => {
  const [page] = melodyPages(notes.slice(0, 2), 4);
  expect(pageWords(page!, 1, 1)).toBe("The tune, 2 notes: C4 la, C♯4 la.");
  expect(pageWords(page!, 1, 3)).toMatch(/^Part 1 of 3 of the tune/);
});
