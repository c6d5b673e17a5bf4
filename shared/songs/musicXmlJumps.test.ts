import { strToU8 } from "fflate";
import { readMelodyFile, type MelodyFile } from "./melodyFile";

function read(inside: string, part = '<score-part id="P"><part-name>Voice</part-name></score-part>') {
  const source = `<score-partwise><part-list>${part}</part-list><part id="P">${inside}</part></score-partwise>`;
  const file: MelodyFile = readMelodyFile("x.xml", strToU8(source));
  if (!file.ok) throw new Error(file.reason);
  return file;
}
const note = (step: string, more = "") =>
  `<note><pitch><step>${step}</step><octave>4</octave></pitch><duration>1</duration>${more}</note>`;
const words = (text: string) => `<direction><direction-type><words>${text}</words></direction-type></direction>`;
const sign = (name: string) => `<direction><direction-type><${name}/></direction-type></direction>`;
const bars = (...insides: string[]) => insides.map((inside) => `<measure>${inside}</measure>`).join("");
const letters = "C.D.EF.G.A.B";
const order = (inside: string) =>
  read(inside)
    .voices[0]!.melody.notes.map(({ midi }) => letters[midi - 60])
    .join("");

test.each([
  ["D.C. al Fine", bars(note("C"), note("D") + words("Fine"), note("E") + words("D.C. al Fine")), "CDECD"],
  [
    "D.S. al Fine",
    bars(note("C"), sign("segno") + note("D"), note("E") + words("Fine"), note("F") + words("D.S. al Fine")),
    "CDEFDE",
  ],
  [
    "D.C. al Coda",
    bars(note("C"), note("D") + words("To Coda"), note("E") + words("D.C. al Coda"), sign("coda") + note("F")),
    "CDECDF",
  ],
  [
    "two coda signs",
    bars(note("C"), note("D") + sign("coda"), note("E") + words("D.C. al Coda"), sign("coda") + note("F")),
    "CDECDF",
  ],
  [
    "the sound's own words",
    bars(note("C"), note("D") + '<sound fine="yes"/>', note("E") + '<sound dacapo="yes"/>'),
    "CDECD",
  ],
])("%s, written in words, is followed", (_, inside, expected) => expect(order(inside)).toBe(expected));

test("endings for the first and third time, and the second, are played in turn", () => {
  const ending = (numbers: string, inside: string, back: boolean) =>
    `<barline><ending number="${numbers}" type="start"/></barline>${inside}<barline><ending number="${numbers}" type="stop"/>${back ? '<repeat direction="backward"/>' : ""}</barline>`;
  const inside = bars(
    note("C"),
    ending("1, 3", note("D"), true),
    ending("2", note("E"), true),
    ending("4", note("F"), false),
  );
  expect(order(inside)).toBe("CDCECDCF");
});

const lyric = (number: number, text: string, syllabic: string, more = "") =>
  `<lyric number="${number}"><syllabic>${syllabic}</syllabic><text>${text}</text>${more}</lyric>`;

test("syllables know whether their word goes on, and each verse has its time", () => {
  const inside = bars(
    note("C", lyric(1, "low", "single") + lyric(2, "har", "begin")) +
      note("D", lyric(1, "tide", "single", "<extend/>") + lyric(2, "bour", "end", "<end-line/>")) +
      note("E") +
      '<barline><repeat direction="backward"/></barline>',
    note("F", lyric(1, "sea", "single")),
  );
  expect(read(inside).voices[0]!.lyrics).toEqual([
    { start: 0, text: "low" },
    { start: 1, text: "tide" },
    { start: 3, text: "har-" },
    { start: 4, text: "bour" },
    { start: 6, text: "sea", newLine: true },
  ]);
});

test("speed and metre are told; cue notes pass in silence; a drum channel is known", () => {
  const mark =
    "<direction><direction-type><metronome><beat-unit>eighth</beat-unit><beat-unit-dot/><per-minute>80</per-minute></metronome></direction-type></direction>";
  const time = "<attributes><time><beats>6</beats><beat-type>8</beat-type></time></attributes>";
  const file = read(
    bars(time + mark + note("C") + note("D", "<cue/>") + note("E")),
    '<score-part id="P"><part-name>Kit</part-name><midi-instrument><midi-channel>10</midi-channel></midi-instrument></score-part>',
  );
  expect([file.tempo, file.beatsPerBar]).toEqual([60, 6]);
  expect(file.voices[0]!.melody.notes.map(({ start }) => start)).toEqual([0, 2]);
  expect(file.voices[0]!.reasons[0]).toBe("It is drums.");
});

test("staves and voices stay apart, the time going back and forward", () => {
  const at = (step: string, voice: number, staff: number) =>
    note(step, `<voice>${voice}</voice><staff>${staff}</staff>`);
  const file = read(
    bars(
      at("C", 1, 1) +
        at("D", 1, 1) +
        "<backup><duration>2</duration></backup><forward><duration>1</duration></forward>" +
        at("E", 5, 2),
    ),
  );
  expect(file.voices.map(({ name, melody }) => [name, melody.notes.map(({ start }) => start)])).toEqual([
    ["Voice, voice 1", [0, 1]],
    ["Voice, voice 5 of staff 2", [1]],
  ]);
});
