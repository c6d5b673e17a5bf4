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
