import { lyricLines } from "./lyricLines";

const sung = (...texts: string[]) => texts.map((text, start) => ({ start, text }));

test("syllables are joined to words", () => {
  expect(lyricLines(sung("down", "by", "the", "har-", "bour"))).toEqual(["down by the harbour"]);
});

test("lines are those the file tells", () => {
  const [a, b, c, d] = sung("low", "tide", "high", "tide");
  expect(lyricLines([{ ...a!, newLine: true }, b!, { ...c!, newLine: true }, d!])).toEqual(["low tide", "high tide"]);
});

test("where it tells none, a breath ends a line, but not inside a word", () => {
  const [a, b, c] = [
    { start: 0, text: "lanterns in the" },
    { start: 4, text: "har-" },
    { start: 9, text: "bour" },
  ];
  expect(lyricLines([a, b, c])).toEqual(["lanterns in the", "harbour"]);
});

test("no words give no lines", () => {
  expect(lyricLines([])).toEqual([]);
});
