import { melodyWords } from "./melodyWords";

const note = (start: number, duration: number, lyric?: string) => ({
  start,
  duration,
  midi: 60,
  ...(lyric === undefined ? null : { lyric }),
});

test("syllables become words, and a breath a new line", () => {
  const notes = [
    note(0, 1, "Lan-"),
    note(1, 1, "tern"),
    note(2, 1, "on"),
    note(3, 1),
    note(5, 1, "burn-"),
    note(6, 1, "ing"),
  ];
  expect(melodyWords(notes)).toBe("Lantern on\nburning");
});

test("a word is not torn by a rest, and a tune without words has none", () => {
  expect(melodyWords([note(0, 1, "har-"), note(4, 1, "bour")])).toBe("harbour");
  expect(melodyWords([note(0, 1), note(1, 1, " ")])).toBe("");
});
