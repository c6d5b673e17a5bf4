import { aSong } from "@/__tests__/client/belongings";
import { forWords, songWords, voiceWords } from "./songWords";

test.each([
  [null, "your voice"],
  ["My voice", "your voice"],
  ["Evenings", "your voice Evenings"],
])("a voice called %s in a sentence", (name, words) => {
  expect(voiceWords(name)).toBe(words);
});

test.each([
  ["My voice", "for your voice"],
  ["Evenings", "for Evenings"],
])("keys for %s", (name, words) => {
  expect(forWords(name)).toBe(words);
});

test("what was heard stands apart from what is probable", () => {
  const voice = { range: { lowMidi: 53, highMidi: 71 }, comfort: { lowMidi: 57, highMidi: 65 } };
  const heard = { lowMidi: 55, highMidi: 69 };
  expect(songWords(aSong(), "My voice", { ...voice, heard }, "A D F♯")).toBe(
    "Written in D · your voice, sung so far G3 to A4, probably F3 to B4 · strings A D F♯",
  );
  expect(songWords(aSong(), "Evenings", voice, "A D F♯")).toContain("your voice Evenings, F3 to B4");
});
