import { strToU8 } from "fflate";
import { readMelodyFile } from "./melodyFile";

const cautions = (text: string, name = "a.abc") => {
  const read = readMelodyFile(name, strToU8(text));
  return read.ok ? read.cautions : read.reason;
};
const tune = "K:D\nDEFA|";
const numbered = (count: number, one: (index: number) => string) =>
  Array.from({ length: count }, (_, k) => one(k)).join("");

test("a file that is read whole needs no caution", () => {
  expect(cautions(`X:1\nM:4/4\nQ:1/4=90\n${tune}\nM:4/4\nQ:1/4=90\nDEFA|`)).toEqual([]);
});

test("a book of more tunes than are read says so", () => {
  expect(cautions(numbered(60, (k) => `X:${k + 1}\n${tune}\n\n`))).toEqual([]);
  expect(cautions(numbered(201, (k) => `X:${k + 1}\n${tune}\n\n`))).toEqual([
    "136 voices are left out: only the first 64 are read.",
    "It has more than 200 tunes; the first 200 were read.",
  ]);
});

test("a tune of more voices than are read says so", () => {
  expect(cautions(`X:1\nK:C\n${numbered(70, (k) => `V:${k}\nCDEF|\n`)}`)).toEqual([
    "A tune has more than 64 voices; the others were not read.",
  ]);
});

test("a voice too long for a melody is named beside one that is read", () => {
  expect(cautions(`X:1\nK:C\nV:1\nCDEF|\nV:2\n${"CDEFGABc|\n".repeat(1300)}`)).toEqual([
    "One voice is left out: more than 10,000 notes are no melody.",
  ]);
});

test("later speeds and metres are named", () => {
  expect(cautions(`X:1\nM:4/4\nQ:1/4=90\n${tune}\nM:3/4\nQ:1/4=120\nDEF|`)).toEqual([
    "Its speed changes later; the first one is taken.",
    "Its metre changes later; the first one is taken.",
  ]);
  const note = "<note><pitch><step>C</step><octave>4</octave></pitch><duration>1</duration></note>";
  const measure = (beats: number, speed: number) =>
    `<measure><attributes><time><beats>${beats}</beats><beat-type>4</beat-type></time></attributes><sound tempo="${speed}"/>${note}</measure>`;
  const score = (measures: string) =>
    `<!DOCTYPE score-partwise PUBLIC "-//Recordare//DTD MusicXML 4.0 Partwise//EN" "http://www.musicxml.org/dtds/partwise.dtd"><score-partwise><part-list/><part id="P">${measures}</part></score-partwise>`;
  expect(cautions(score(measure(4, 90) + measure(4, 90)), "a.xml")).toEqual([]);
  expect(cautions(score(measure(4, 90) + measure(3, 90)), "a.xml")).toEqual([
    "Its metre changes later; the first one is taken.",
  ]);
});
