import { strToU8 } from "fflate";
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
    expect(sung(file).lyrics).toEqual([
      { start: 0, text: "down", newLine: true },
      { start: 1, text: "by" },
      { start: 2, text: "the" },
      { start: 3, text: "sea" },
    ]);
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

describe("ABC tunes in full", () => {
  const voiceOf = (body: string, head = "L:1/4\nM:4/4\nK:C") => sung(read("x.abc", `X:1\n${head}\n${body}\n`));
  const pitches = (body: string, head?: string) => voiceOf(body, head).melody.notes.map(({ midi }) => midi);

  test.each([
    ["a second time through two endings", "|:C|1,3 D:|2 E:|4 F|]", [60, 62, 60, 64, 60, 62, 60, 65]],
    ["three times", "|::C|D::|E|]", [60, 62, 60, 62, 60, 62, 64]],
    ["from the latest double bar, where no beginning stands", "C|D||E|F:|G|]", [60, 62, 64, 65, 64, 65, 67]],
  ])("repeats %s", (_, body, expected) => expect(pitches(body)).toEqual(expected));

  test.each([
    ["D.C.", "C|D|E!D.C.!|]", "CDECDE"],
    ["D.C. al Fine in words", 'C|"^Fine"D|E"^D.C. al Fine"|]', "CDECD"],
    ["D.S. al Fine", "C|!segno!D|!fine!E|F!D.S.!|]", "CDEFDE"],
    ["a segno on the bar line before", "C!segno!|D!fine!|E!D.S.!|]", "CDED"],
    ["D.S. al Coda by two coda signs", "C|!segno!D!coda!|E!D.S.alcoda!|!coda!F|]", "CDEDF"],
    ["da coda by its words", "C|D!dacoda!|E!D.C.!|!coda!F|]", "CDECDF"],
    ["the letters S and O", "C|SDO|E+D.S.+|OF|]", "CDEDF"],
    ["letters of one's own", "C|TD|E!fine!|F!D.S.!|]", "CDEFDE", "U:T=!segno!\nL:1/4\nK:C"],
    ["D.C. behind the last bar line", "C|D!fine!|E|] !D.C.!", "CDECD"],
    ["no repeat a second time", "|:C!fine!|1D:|2E|F!D.C.!|]", "CDCEFC"],
    ["not where P: gives the order", "P:A\nC|D!D.C.!|\nP:B\nE|", "CDECD", "P:ABA\nL:1/4\nK:C"],
  ])("follows %s", (_, body, expected, head = "L:1/4\nK:C") => {
    const letters = "C.D.EF";
    expect(
      pitches(body, head)
        .map((midi) => letters[midi - 60])
        .join(""),
    ).toBe(expected);
  });

  test("jumps written into the first voice only are made by all, each with its own notes", () => {
    const file = read("x.abc", "X:1\nL:1/4\nK:C\nV:1\nC|D!fine!|E!D.C.!|\nV:2\nE|F|G|\n");
    expect(file.voices.map(({ melody }) => melody.notes.map(({ midi }) => midi))).toEqual([
      [60, 62, 64, 60, 62],
      [64, 65, 67, 64, 65],
    ]);
  });

  test.each([
    ["M:2", "two halves", 4],
    ["M:3", "three quarters", 3],
  ])("a bar's rest under %s lasts %s (common practice for a lone figure)", (metre, _, quarters) =>
    expect(voiceOf("Z|C|", `${metre}\nL:1/4\nK:C`).melody.notes[0]!.start).toBe(quarters),
  );

  test("parts are played in the order of the head", () => {
    expect(pitches("P:A\nC|\nP:B\nD|", "P:(AB)2A\nL:1/4\nK:C")).toEqual([60, 62, 60, 62, 60]);
  });

  test.each([
    ["octave=-1", "K:C octave=-1", 48],
    ["transpose=-2", "K:C transpose=-2", 58],
    ["a bass clef, which moves nothing", "K:C bass", 60],
    ["clef=treble+8", "K:C clef=treble+8", 72],
    ["V: with an octave of its own", "K:C\nV:1 octave=1", 72],
  ])("%s is heard as it sounds", (_, key, expected) => expect(pitches("C", `L:1/4\n${key}`)).toEqual([expected]));

  test.each([
    ["K:D phr ^F", [65 + 1, 59 + 12 - 1, 63]],
    ["K:C exp _B", [65, 70, 64]],
    ["K:HP", [66, 71, 64]],
    ["K:E dor", [66, 71, 64]],
    ["K:none", [65, 71, 64]],
  ])("the signature of %s", (key, expected) => expect(pitches("FBE", `L:1/4\n${key}`)).toEqual(expected));

  test("words: melisma, skipped notes, joined words, bars passed over, verses in turn", () => {
    const { lyrics } = voiceOf("|:CDEF|G2 A2:|\nw:low_ * tide~and | har-bour\nw:high * * moon | far lights");
    expect(lyrics?.map(({ start, text }) => [start, text])).toEqual([
      [0, "low"],
      [3, "tide and"],
      [4, "har-"],
      [6, "bour"],
      [8, "high"],
      [11, "moon"],
      [12, "far"],
      [14, "lights"],
    ]);
    expect(lyrics?.filter(({ newLine }) => newLine).map(({ text }) => text)).toEqual(["low", "high"]);
  });

  test("speed, metre, and the default length that follows from it", () => {
    const file = read("x.abc", "X:1\nM:2/4\nQ:3/8=60\nK:C\nCD\n");
    expect([file.tempo, file.beatsPerBar]).toEqual([90, 2]);
    expect(sung(file).melody.notes[0]!.duration).toBe(0.25);
  });

  test("blocks of text and comments are no music", () => {
    expect(pitches("C % D\n%%begintext\nEFG\n%%endtext\n% A\nB")).toEqual([60, 71]);
  });
});
