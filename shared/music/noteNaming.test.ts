import { leadingNote, type NoteNaming, readNote, writeNote } from "./noteNaming";

const notes = ["C", "D", "E", "F", "G", "A", "B"].flatMap((letter) => [letter, `${letter}#`, `${letter}b`]);

// Common practice: the German note names, and fixed do as in Italy, France and Spain.
test.each<[string, NoteNaming, string]>([
  ["H", "german", "B"],
  ["B", "german", "Bb"],
  ["Bb", "german", "Bb"],
  ["B♭", "german", "Bb"],
  ["Fis", "german", "F#"],
  ["F#", "german", "F#"],
  ["Es", "german", "Eb"],
  ["As", "german", "Ab"],
  ["Des", "german", "Db"],
  ["His", "german", "B#"],
  ["Do", "solfege", "C"],
  ["Ré", "solfege", "D"],
  ["SOL", "solfege", "G"],
  ["Sib", "solfege", "Bb"],
  ["Fa♯", "solfege", "F#"],
  ["B♭", "english", "Bb"],
])("%s in %s is %s", (text, naming, note) => expect(readNote(text, naming)).toBe(note));

test.each<[string, NoteNaming]>([
  ["H", "english"],
  ["Fis", "english"],
  ["Do", "english"],
  ["C", "solfege"],
  ["do", "solfege"],
  ["Si bemol", "solfege"],
  ["", "german"],
  ["J", "german"],
])("%s in %s is no note", (text, naming) => expect(readNote(text, naming)).toBeNull());

test("a root ends where the chord begins", () => {
  expect(leadingNote("Asus4", "german")).toEqual({ note: "A", length: 1 });
  expect(leadingNote("Esus2", "german")).toEqual({ note: "E", length: 1 });
  expect(leadingNote("Es7", "german")).toEqual({ note: "Eb", length: 2 });
  expect(leadingNote("Solsus4", "solfege")).toEqual({ note: "G", length: 3 });
  expect(leadingNote("Sibm7", "solfege")).toEqual({ note: "Bb", length: 3 });
});

test("every note comes back as it was written, in every naming", () => {
  for (const note of notes) {
    for (const naming of ["english", "german", "solfege"] as const)
      expect([note, naming, readNote(writeNote(note, naming), naming)]).toEqual([note, naming, note]);
    expect(readNote(writeNote(note, "german", true), "german")).toBe(note);
  }
  expect(["Eb", "Ab", "F#", "Bb", "B"].map((note) => writeNote(note, "german", true))).toEqual([
    "Es",
    "As",
    "Fis",
    "B",
    "H",
  ]);
});

test("what is no note cannot be written", () => {
  expect(() => writeNote("H")).toThrow(RangeError);
});
