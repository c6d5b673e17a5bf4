import { findPreset } from "../../instruments/presets";
import { parseChord } from "../../music/chord";
import { chordDegrees, degreeNote } from "./chordDegrees";
import { neckPositions } from "./neckPositions";
import { neckWords } from "./neckWords";

const names = (text: string) => chordDegrees(parseChord(text)!).map(({ name }) => name);
const notes = (text: string) =>
  chordDegrees(parseChord(text)!).map((degree) => degreeNote(degree, parseChord(text)!.root));

test.each([
  ["C", ["1", "3", "5"], ["C", "E", "G"]],
  ["Ebm7", ["1", "♭3", "5", "♭7"], ["Eb", "Gb", "Bb", "Db"]],
  ["F#7", ["1", "3", "5", "♭7"], ["F#", "A#", "C#", "E"]],
  ["Bdim7", ["1", "♭3", "♭5", "♭♭7"], ["B", "D", "F", "G#"]],
  ["Gsus4", ["1", "4", "5"], ["G", "C", "D"]],
  ["Aadd9", ["1", "3", "5", "9"], ["A", "C#", "E", "B"]],
  ["D/C", ["1", "3", "5", "♭7"], ["D", "F#", "A", "C"]],
])("the tones of %s are counted from its root and spelled as letters", (chord, degrees, spelled) => {
  expect(names(chord)).toEqual(degrees);
  expect(notes(chord).map((note) => (note === "Ab" ? "G#" : note))).toEqual(spelled);
});

test("every place of G on a box guitar is found, and no other", () => {
  const found = neckPositions(parseChord("G")!, "G", findPreset("box-adf")!, 0);
  const low = found.filter(({ string, fret }) => string === 0 && fret <= 12);
  // A string: B at 2, D at 5, G at 10.
  expect(low.map(({ fret, degree, note, root }) => [fret, degree, note, root])).toEqual([
    [2, "3", "B", false],
    [5, "5", "D", false],
    [10, "1", "G", true],
  ]);
});

test("over a capo places are counted from it and named as they sound", () => {
  const found = neckPositions(parseChord("A")!, "C", findPreset("guitar")!, 3);
  expect(found.find(({ string, fret }) => string === 1 && fret === 0)).toMatchObject({ degree: "1", note: "C" });
});

test("a short string has its open note only, and where frets are diatonic only what is there is shown", () => {
  const banjo = neckPositions(parseChord("G")!, "G", findPreset("banjo")!, 0);
  expect(banjo.filter(({ string }) => string === 0)).toEqual([
    { string: 0, fret: 0, degree: "1", note: "G", root: true },
  ]);
  const dulcimer = findPreset("dulcimer")!;
  const places = neckPositions(parseChord("D")!, "D", dulcimer, 0);
  expect(Math.max(...places.map(({ fret }) => fret))).toBeLessThanOrEqual(dulcimer.frets);
});

test("the map is told string by string, with the names of diatonic frets", () => {
  const dulcimer = findPreset("dulcimer")!;
  const chord = parseChord("D")!;
  const words = neckWords(neckPositions(chord, "D", dulcimer, 0), dulcimer, {
    name: "D",
    capo: 0,
    stringNames: dulcimer.strings.map(({ note }) => note),
    labels: "degrees",
  });
  expect(words).toMatch(/^D on the whole neck\. /);
  expect(words).toMatch(/1 open/);
  const banjo = findPreset("banjo")!;
  const told = neckWords(neckPositions(parseChord("G")!, "A", banjo, 2), banjo, {
    name: "G shapes, sounding A",
    capo: 2,
    stringNames: banjo.strings.map(({ note }) => note),
    labels: "notes",
  });
  expect(told).toContain("Capo at fret 2.");
  expect(told).toContain("short, from fret 7 on");
  expect(told).toContain("A, the root, open");
});
