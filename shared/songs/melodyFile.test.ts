import { Midi } from "@tonejs/midi";
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
const abc = (body: string, head = "L:1/4\nM:4/4\nK:C") =>
  plain(sung(read("x.abc", `X:1\n${head}\n${body}\n`)).melody.notes);

describe("ABC (standard 2.1)", () => {
  test.each<[string, string, string | undefined, number[][]]>([
    [
      "octaves",
      "C,Cc c'",
      undefined,
      [
        [0, 1, 48],
        [1, 1, 60],
        [2, 1, 72],
        [3, 1, 84],
      ],
    ],
    [
      "accidentals, which hold to the bar line",
      "^FF=F|FGz_B",
      undefined,
      [
        [0, 1, 66],
        [1, 1, 66],
        [2, 1, 65],
        [3, 1, 65],
        [4, 1, 67],
        [6, 1, 70],
      ],
    ],
    [
      "the key's accidentals",
      "FcC",
      "L:1/4\nM:4/4\nK:D",
      [
        [0, 1, 66],
        [1, 1, 73],
        [2, 1, 61],
      ],
    ],
    [
      "broken rhythm and lengths",
      "C>D E/2F3/2",
      undefined,
      [
        [0, 1.5, 60],
        [1.5, 0.5, 62],
        [2, 0.5, 64],
        [2.5, 1.5, 65],
      ],
    ],
    ["ties, joined, over the bar line too", "C2-C-|C2", undefined, [[0, 5, 60]]],
    [
      "repeats, unrolled",
      "|:CD:|E",
      undefined,
      [
        [0, 1, 60],
        [1, 1, 62],
        [2, 1, 60],
        [3, 1, 62],
        [4, 1, 64],
      ],
    ],
    [
      "endings, unrolled",
      "|:C|1 D:|2 E|]",
      undefined,
      [
        [0, 1, 60],
        [1, 1, 62],
        [2, 1, 60],
        [3, 1, 64],
      ],
    ],
    [
      "grace notes, left out",
      "{DE}C2 {F}G2",
      undefined,
      [
        [0, 2, 60],
        [2, 2, 67],
      ],
    ],
    [
      "ornaments and short strokes, sung plain",
      "!trill!C2 .D2 ~E2",
      undefined,
      [
        [0, 2, 60],
        [2, 2, 62],
        [4, 2, 64],
      ],
    ],
    [
      "chords, by their highest note",
      "[CEG]2 [Ac]",
      undefined,
      [
        [0, 2, 67],
        [2, 1, 72],
      ],
    ],
    [
      "chord symbols, which are not sung",
      '"C"C "G7"B',
      undefined,
      [
        [0, 1, 60],
        [1, 1, 71],
      ],
    ],
    [
      "an octave clef",
      "CD",
      "L:1/4\nM:4/4\nK:C clef=treble-8",
      [
        [0, 1, 48],
        [1, 1, 50],
      ],
    ],
    [
      "a change of speed, which changes no beats",
      "CD|[Q:1/4=60]EF",
      "L:1/4\nM:4/4\nQ:1/4=120\nK:C",
      [
        [0, 1, 60],
        [1, 1, 62],
        [2, 1, 64],
        [3, 1, 65],
      ],
    ],
  ])("reads %s", (_, body, head, notes) => expect(abc(body, head)).toEqual(notes));

  test("reads triplets to the exact third", () => {
    const notes = abc("(3CDE F");
    expect(notes.map(([start]) => start! * 3)).toEqual([0, 2, 4, 6].map((thirds) => expect.closeTo(thirds, 9)));
  });

  test("reads the key in every mode, the title and the words", () => {
    const file = read("x.abc", "X:1\nT:Low Tide\nL:1/4\nM:3/4\nK:A dor\nABc|d3|\nw:down by the sea\n");
    expect(file.title).toBe("Low Tide");
    expect(sung(file).melody).toMatchObject({ home: "A", mode: "dorian" });
    expect(sung(file).lyrics).toEqual(["down", "by", "the", "sea"].map((text, start) => ({ start, text })));
    expect(sung(read("x.abc", "X:1\nK:F#m\nFGA\n")).melody).toMatchObject({ home: "F#", mode: "minor" });
    expect(sung(read("x.abc", "X:1\nK:Bb\nBcd\n")).melody).toMatchObject({ home: "Bb", mode: "major" });
  });

  test("lists voices and tunes, and proposes the sung one", () => {
    const text =
      'X:1\nT:Both\nL:1/4\nM:4/4\nK:C\nV:1 name="Bass"\nV:2 name="Voice"\n[V:1] C,,G,,C,,G,,|\n[V:2] EFGA|\nw: one two three four\n';
    const file = read("x.abc", text);
    expect(file.voices.map(({ name }) => name)).toEqual(["Bass", "Voice"]);
    expect(file.proposed).toBe(1);
    const two = read("x.abc", "X:1\nT:One\nK:C\nCDE\n\nX:2\nT:Two\nK:G\nGAB\n");
    expect(two.voices.map(({ name, melody }) => [name, melody.home])).toEqual(
      [
        ["One, Tune", "C"],
        ["Two, Tune", "G"],
      ].map(([name, home]) => [name!.split(",")[0], home]),
    );
  });
});

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

describe("Standard MIDI Files", () => {
  // The bytes of a published worked example: header, 2/4, C major, 90 beats a minute, G4 held for 430 of 480 ticks.
  test("read byte by byte give the length the format's example states", () => {
    const hex =
      "4D546864000000060001000201E0 4D54726B00000019 00FF58040202 1808 00FF590200 00 00FF5103 0A2C2B 00FF2F00 4D54726B0000000D 00904347 832E804324 00FF2F00";
    const bytes = Uint8Array.from(hex.replaceAll(" ", "").match(/../g)!, (pair) => Number.parseInt(pair, 16));
    expect(plain(sung(read("x.mid", bytes)).melody.notes)).toEqual([[0, 430 / 480, 67]]);
  });

  function song(): Midi {
    const midi = new Midi();
    midi.header.setTempo(90);
    const bass = midi.addTrack();
    bass.name = "Bass";
    bass.instrument.number = 33;
    const voice = midi.addTrack();
    voice.name = "Vocal";
    const drums = midi.addTrack();
    drums.channel = 9;
    [62, 64, 66, 67, 69, 66, 64, 62].forEach((pitch, index) => {
      voice.addNote({ midi: pitch, ticks: index * 480, durationTicks: 480 });
      bass.addNote({ midi: 38, ticks: index * 480, durationTicks: 240 });
      drums.addNote({ midi: 36, ticks: index * 480, durationTicks: 60 });
    });
    return midi;
  }

  test("list their tracks, propose the vocal line and find its home note", () => {
    const file = read("x.mid", song().toArray());
    expect(file.voices.map(({ name }) => name)).toEqual(["Bass", "Vocal", "Track 3"]);
    expect(file.proposed).toBe(1);
    expect(sung(file).melody).toMatchObject({ home: "D", mode: "major" });
    expect(plain(sung(file).melody.notes).slice(0, 2)).toEqual([
      [0, 1, 62],
      [1, 1, 64],
    ]);
  });

  /** One track: a key signature event, then the notes of a scale from D. */
  function withSignature(fifths: number, minor: boolean): Uint8Array {
    const notes = [62, 64, 66, 67, 69, 66, 64, 62].flatMap((pitch) => [0, 0x90, pitch, 64, 96, 0x80, pitch, 0]);
    const events = [0, 0xff, 0x59, 2, fifths & 0xff, minor ? 1 : 0, ...notes, 0, 0xff, 0x2f, 0];
    return Uint8Array.of(
      ...strToU8("MThd"),
      0,
      0,
      0,
      6,
      0,
      0,
      0,
      1,
      0,
      96,
      ...strToU8("MTrk"),
      0,
      0,
      0,
      events.length,
      ...events,
    );
  }

  test.each([
    [1, false, "G", "major"],
    [-3, true, "C", "minor"],
    [0, true, "A", "minor"],
    [6, false, "F#", "major"],
  ])("that state a key, %i sharps, minor %s, are believed", (fifths, minor, home, mode) => {
    expect(sung(read("x.mid", withSignature(fifths, minor))).melody).toMatchObject({ home, mode });
  });

  test("with the C major that nobody edited are asked for their notes", () => {
    expect(sung(read("x.mid", withSignature(0, false))).melody).toMatchObject({ home: "D", mode: "major" });
  });

  test("with notes that overlap become a single line", () => {
    const midi = new Midi();
    const track = midi.addTrack();
    for (const [pitch, ticks, durationTicks] of [
      [60, 0, 500],
      [62, 480, 480],
      [67, 960, 960],
      [48, 1080, 480],
      [64, 1920, 480],
    ] as const) {
      track.addNote({ midi: pitch, ticks, durationTicks });
    }
    expect(plain(sung(read("x.mid", midi.toArray())).melody.notes)).toEqual([
      [0, 1, 60],
      [1, 1, 62],
      [2, 2, 67],
      [4, 1, 64],
    ]);
  });
});
