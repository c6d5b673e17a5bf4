import { strToU8, zipSync } from "fflate";
import type { MelodyNote } from "./melody";
import { type MelodyFile, readMelodyFile } from "./melodyFile";

type Read = Extract<MelodyFile, { ok: true }>;
function read(name: string, content: string | Uint8Array): Read {
  const file = readMelodyFile(name, typeof content === "string" ? strToU8(content) : content);
  if (!file.ok) throw new Error(file.reason);
  return file;
}
const sung = (file: Read) => file.voices[file.proposed]!;
/** Notes as [start, duration, midi]. */
const plain = (notes: readonly MelodyNote[]) => notes.map(({ start, duration, midi }) => [start, duration, midi]);

const xml = (inside: string, before = "") =>
  `<?xml version="1.0"?>\n<!DOCTYPE score-partwise PUBLIC "-//Recordare//DTD MusicXML 4.0 Partwise//EN" "http://www.musicxml.org/dtds/partwise.dtd">\n` +
  `<score-partwise version="4.0">${before}<part-list><score-part id="P1"><part-name>Voice</part-name></score-part></part-list><part id="P1">${inside}</part></score-partwise>`;
const measure = (inside: string) => `<measure>${inside}</measure>`;
const attributes = (more = "") => `<attributes><divisions>2</divisions>${more}</attributes>`;
const note = (pitch: string, duration: number, more = "") => {
  const [, step, alter, octave] = /^([A-G])(#|b)?(\d)$/.exec(pitch)!;
  const alteration = alter ? `<alter>${alter === "#" ? 1 : -1}</alter>` : "";
  return `<note>${more.includes("<chord/>") ? "<chord/>" : ""}<pitch><step>${step}</step>${alteration}<octave>${octave}</octave></pitch><duration>${duration}</duration>${more.replace("<chord/>", "")}</note>`;
};
const rest = (duration: number) => `<note><rest/><duration>${duration}</duration></note>`;
const score = (...measures: string[]) => plain(sung(read("x.musicxml", xml(measures.join("")))).melody.notes);

describe("MusicXML (4.0)", () => {
  test.each<[string, string[], number[][]]>([
    [
      "pitches, rests and divisions",
      [measure(attributes() + note("C4", 1) + note("F#4", 3) + rest(2) + note("Bb4", 2))],
      [
        [0, 0.5, 60],
        [0.5, 1.5, 66],
        [3, 1, 70],
      ],
    ],
    [
      "ties, joined",
      [
        measure(attributes() + note("C4", 4, '<tie type="start"/>')),
        measure(note("C4", 2, '<tie type="stop"/>') + note("C4", 2)),
      ],
      [
        [0, 3, 60],
        [3, 1, 60],
      ],
    ],
    [
      "repeats, unrolled",
      [
        measure(attributes() + note("C4", 2)),
        measure(note("D4", 2) + '<barline><repeat direction="backward"/></barline>'),
      ],
      [
        [0, 1, 60],
        [1, 1, 62],
        [2, 1, 60],
        [3, 1, 62],
      ],
    ],
    [
      "endings, unrolled",
      [
        measure(attributes() + '<barline location="left"><repeat direction="forward"/></barline>' + note("C4", 2)),
        measure(
          '<barline><ending number="1" type="start"/></barline>' +
            note("D4", 2) +
            '<barline><ending number="1" type="stop"/><repeat direction="backward"/></barline>',
        ),
        measure(
          '<barline><ending number="2" type="start"/></barline>' +
            note("E4", 2) +
            '<barline><ending number="2" type="discontinue"/></barline>',
        ),
      ],
      [
        [0, 1, 60],
        [1, 1, 62],
        [2, 1, 60],
        [3, 1, 64],
      ],
    ],
    [
      "grace and cue notes, left out",
      [
        measure(
          attributes() +
            "<note><grace/><pitch><step>D</step><octave>4</octave></pitch></note>" +
            note("C4", 2) +
            note("G4", 2, "<cue/>"),
        ),
      ],
      [[0, 1, 60]],
    ],
    [
      "chords, by their highest note",
      [measure(attributes() + note("C4", 2) + note("G4", 2, "<chord/>") + note("D4", 2))],
      [
        [0, 1, 67],
        [1, 1, 62],
      ],
    ],
    [
      "a transposing part, as it sounds",
      [
        measure(
          attributes(
            "<transpose><diatonic>-1</diatonic><chromatic>-2</chromatic><octave-change>-1</octave-change></transpose>",
          ) + note("D4", 2),
        ),
      ],
      [[0, 1, 48]],
    ],
    [
      "an octave clef, whose pitches already sound",
      [
        measure(
          attributes("<clef><sign>G</sign><line>2</line><clef-octave-change>-1</clef-octave-change></clef>") +
            note("C3", 2),
        ),
      ],
      [[0, 1, 48]],
    ],
    [
      "missing divisions as one to a quarter",
      [measure(note("C4", 1) + note("D4", 2))],
      [
        [0, 1, 60],
        [1, 2, 62],
      ],
    ],
  ])("reads %s", (_, measures, notes) => expect(score(...measures)).toEqual(notes));

  test("parts the voices of one staff by backup", () => {
    const two =
      attributes() +
      note("C5", 4, "<voice>1</voice>") +
      "<backup><duration>4</duration></backup>" +
      note("E4", 2, "<voice>2</voice>") +
      note("F4", 2, "<voice>2</voice>");
    const file = read("x.xml", xml(measure(two) + measure(note("D5", 4, "<voice>1</voice>"))));
    expect(file.voices.map(({ name, melody }) => [name, plain(melody.notes)])).toEqual([
      [
        "Voice, voice 1",
        [
          [0, 2, 72],
          [2, 2, 74],
        ],
      ],
      [
        "Voice, voice 2",
        [
          [0, 1, 64],
          [1, 1, 65],
        ],
      ],
    ]);
  });

  test.each([
    ["<fifths>-3</fifths><mode>minor</mode>", "", "C", "minor"],
    ["<fifths>2</fifths><mode>mixolydian</mode>", "", "A", "mixolydian"],
    ["<fifths>1</fifths><mode>ionian</mode>", "", "G", "major"],
    ["<fifths>2</fifths><mode>major</mode>", "<transpose><chromatic>-2</chromatic></transpose>", "C", "major"],
    ["<fifths>-1</fifths><mode>major</mode>", "<transpose><chromatic>-12</chromatic></transpose>", "F", "major"],
  ])("reads the key %s %s as %s %s", (key, transpose, home, mode) => {
    const inside = measure(attributes(`<key>${key}</key>${transpose}`) + note("D4", 2));
    expect(sung(read("x.xml", xml(inside))).melody).toMatchObject({ home, mode });
  });

  test("asks the notes for the mode where only a signature stands", () => {
    const tune = (...pitches: string[]) =>
      measure(attributes("<key><fifths>1</fifths></key>") + pitches.map((pitch) => note(pitch, 2)).join(""));
    expect(sung(read("x.xml", xml(tune("E4", "F#4", "G4", "B4", "A4", "G4", "F#4", "E4")))).melody).toMatchObject({
      home: "E",
      mode: "minor",
    });
    expect(sung(read("x.xml", xml(tune("G4", "A4", "B4", "D5", "C5", "B4", "A4", "G4")))).melody).toMatchObject({
      home: "G",
      mode: "major",
    });
  });

  test("reads words, the title, timewise scores and UTF-16", () => {
    const lyric = "<lyric><syllabic>single</syllabic><text>sea &amp; sand</text></lyric>";
    const source = xml(measure(attributes() + note("C4", 2, lyric)), "<work><work-title>Low Tide</work-title></work>");
    const file = read("x.xml", source);
    expect(file.title).toBe("Low Tide");
    expect(sung(file).lyrics).toEqual([{ start: 0, text: "sea & sand" }]);
    const wide = Uint8Array.of(0xff, 0xfe, ...[...source].flatMap((character) => [character.charCodeAt(0), 0]));
    expect(sung(read("x.xml", wide)).melody.notes).toHaveLength(1);
    const timewise = `<score-timewise><part-list><score-part id="A"><part-name>Song</part-name></score-part></part-list><measure><part id="A">${attributes()}${note("C4", 2)}</part></measure><measure><part id="A">${note("D4", 2)}</part></measure></score-timewise>`;
    expect(plain(sung(read("x.xml", timewise)).melody.notes)).toEqual([
      [0, 1, 60],
      [1, 1, 62],
    ]);
  });

  test("reads a compressed score by its container", () => {
    const container = '<container><rootfiles><rootfile full-path="inner/song.xml"/></rootfiles></container>';
    const zip = zipSync({
      "META-INF/container.xml": strToU8(container),
      "other.xml": strToU8("<nothing/>"),
      "inner/song.xml": strToU8(xml(measure(attributes() + note("E4", 2)))),
    });
    expect(plain(sung(read("x.mxl", zip)).melody.notes)).toEqual([[0, 1, 64]]);
  });
});
