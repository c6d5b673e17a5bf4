import { syllableStarts } from "./syllables";

const cut = (words: string) =>
  syllableStarts(words)
    .reverse()
    .reduce((text, at) => `${text.slice(0, at)}·${text.slice(at)}`, words);

// Division of these words as a dictionary of English prints it, but for single consonants, which open the next
// syllable as they are sung; from memory.
test.each([
  ["harbour", "·har·bour"],
  ["lantern on the slipway,", "·lan·tern ·on ·the ·slip·way,"],
  ["half-past-nine", "·half-·past-·nine"],
  ["nobody", "·no·bo·dy"],
  ["table", "·ta·ble"],
  ["quiet", "·quiet"],
  ["loved wanted", "·loved ·wan·ted"],
  ["Über", "·Ü·ber"],
  ["", ""],
  ["  ... ", "  ·... "],
])("%s", (words, expected) => expect(cut(words)).toBe(expected));

test("words of other scripts count as one syllable each", () => {
  expect(syllableStarts("море 海 🙂🙂")).toEqual([0, 5, 7]);
});
