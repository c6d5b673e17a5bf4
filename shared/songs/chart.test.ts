import fc from "fast-check";
import { chordPitchClasses } from "../music/chord";
import { spellTonic } from "../music/keyName";
import { type Chart, type ChartLine, chartChords, chartTokens, parseChart, printChart, transposeChart } from "./chart";

const major = (tonic: string) => ({ tonic, mode: "major" }) as const;
const lines = (chart: Chart): ChartLine[] => chart.sections.flatMap((section) => section.lines);
const kinds = (text: string): string[] => lines(parseChart(text)).map((line) => line.kind);
const moved = (text: string, from: string, to: string): string =>
  printChart(transposeChart(parseChart(text), major(from), major(to)));

describe("a line", () => {
  test.each([
    ["A              D", "chords"],
    ["A ship came in at seven", "lyrics"],
    ["Am I the one", "lyrics"],
    ["A", "chords"],
    ["Go", "lyrics"],
    ["A!", "lyrics"],
    ["Amen, Amen", "lyrics"],
    ["Am  Amen", "lyrics"],
    ["A Bad Day", "lyrics"],
    ["Em7 (let it ring)  A7sus4", "chords"],
    ["| G . . . | % | C / D / |", "chords"],
    ["||: G | D :|| x2", "chords"],
    ["|G|D7|", "chords"],
    ["N.C.", "chords"],
    ["G  N.C.  D", "chords"],
    ["G - D - Em", "chords"],
    ["G-D-Em, C", "chords"],
    ["(G  D)  Em*", "chords"],
    ["[Am]  [F]", "chords"],
    ["G   Hm7   D", "chords"],
    ["C Bxyz9 D", "chords"],
    ["H7  X&7 D", "chords"],
    ["X&7     D", "chords"],
    ["A day", "lyrics"],
    ["A     day", "lyrics"],
    ["Oh    Am    I", "lyrics"],
    ["A T-shirt", "lyrics"],
    ["Am Route 66", "lyrics"],
    ["Dad has A B&B", "lyrics"],
    ["# remember the key change", "comment"],
    ["Capo 2", "comment"],
    ["Tempo: 84", "comment"],
    ["E|---0-2-3---|", "comment"],
    ["   ", "blank"],
  ])("'%s' is %s", (line, kind) => expect(kinds(line)).toEqual([kind]));

  test.each([
    ["Verse 1", "Verse 1"],
    ["[Chorus]", "Chorus"],
    ["Chorus:", "Chorus"],
    ["CHORUS (x2)", "CHORUS (x2)"],
    ["  Pre-Chorus  ", "Pre-Chorus"],
    ["Middle eight:", "Middle eight"],
    ["[Everybody now]", "Everybody now"],
    ["(Bridge)", "Bridge"],
    ["Outro x3", "Outro x3"],
    ["Tag:", "Tag"],
  ])("'%s' heads a section", (line, label) => {
    expect(parseChart(`${line}\nwords`).sections).toMatchObject([
      { label, heading: line, lines: [{ kind: "lyrics" }] },
    ]);
  });

  test.each(["Chorus of angels", "Bridge over the water", "Tag", "(softly)", "He said:"])("'%s' heads none", (line) => {
    expect(parseChart(line).sections).toMatchObject([{ label: null, heading: null }]);
  });

  test("may hold a heading in front of its chords", () => {
    const { sections } = parseChart("Intro: | G  D |\n[Outro] G");
    expect(sections.map(({ label, heading }) => [label, heading])).toEqual([
      ["Intro", null],
      ["Outro", null],
    ]);
    expect(chartTokens(parseChart("Intro: | G  D |")).map(({ text, column }) => [text, column])).toEqual([
      ["|", 7],
      ["G", 9],
      ["D", 12],
      ["|", 14],
    ]);
  });
});

describe("a chart", () => {
  const text = "Verse 1\nD              G\nLantern on the slipway\n\nChorus\nG  Hm7x (D)  x2\nla la\nBm | %";

  test("is read into sections, sung lines and chords over their columns", () => {
    const chart = parseChart(text);
    expect(chart.sections.map(({ label }) => label)).toEqual(["Verse 1", "Chorus"]);
    expect(lines(chart).map((line) => line.kind)).toEqual(["sung", "blank", "sung", "chords"]);
    expect(lines(chart)[0]).toMatchObject({
      lyrics: "Lantern on the slipway",
      chords: [
        { column: 0, text: "D" },
        { column: 15, text: "G" },
      ],
    });
    expect(chartChords(chart)).toEqual(["D", "G", "Bm"]);
  });

  test("lists what cannot be read with line and column, counted from 1", () => {
    expect(parseChart(text).unread).toEqual([{ line: 6, column: 4, text: "Hm7x" }]);
    expect(parseChart("Intro: G  Hm\r\n\r\nG H D").unread).toEqual([
      { line: 1, column: 11, text: "Hm" },
      { line: 3, column: 3, text: "H" },
    ]);
    expect(parseChart("H7  X&7 D\nlow tide").unread).toEqual([
      { line: 1, column: 1, text: "H7" },
      { line: 1, column: 5, text: "X&7" },
    ]);
  });

  test("prints back character by character, whatever the text", () => {
    const piece = fc.constantFrom(
      "A",
      "Am",
      " ",
      "  ",
      "\n",
      "\r\n",
      "\r",
      "\t",
      "|",
      "(",
      ")",
      "[",
      "]",
      "G7",
      "x2",
      "%",
      "la",
      "Verse 1",
      "N.C.",
      ":",
      "-",
      "♭",
      "#",
      "/",
      ",",
      "H",
      "Bb/D",
      "…",
      "é",
      "😀",
    );
    const chartLike = fc.array(piece, { maxLength: 40 }).map((pieces) => pieces.join(""));
    fc.assert(
      fc.property(fc.oneof(fc.string({ unit: "binary", maxLength: 200 }), chartLike), (any) => {
        const chart = parseChart(any);
        expect(printChart(chart)).toBe(any);
        for (const sign of chart.unread) {
          expect(any.split(/\r\n?|\n/)[sign.line - 1]!.startsWith(sign.text, sign.column - 1)).toBe(true);
        }
        for (const line of lines(chart)) {
          if (line.kind !== "sung" && line.kind !== "chords") continue;
          for (const token of line.chords) expect(line.written.startsWith(token.text, token.column)).toBe(true);
        }
      }),
      { numRuns: 4000 },
    );
  });

  test("of a hundred thousand characters is read in a moment", () => {
    const long = [
      "(".repeat(100_000),
      "!".repeat(100_000),
      `${"A ".repeat(900)}\n`.repeat(55),
      `${"E|".repeat(900)}\n`.repeat(55),
      "[A".repeat(50_000),
      `${"!".repeat(1990)}x\n`.repeat(50),
      `C${"(".repeat(1990)}\n`.repeat(50),
      `Verse ${" ".repeat(100)}1 ${" ".repeat(100)}x\n`.repeat(450),
    ];
    for (const hostile of long) {
      const begun = process.cpuUsage();
      expect(printChart(parseChart(hostile))).toBe(hostile);
      expect(process.cpuUsage(begun).user / 1000).toBeLessThan(1000);
    }
  });
});

describe("a moved chart", () => {
  test("keeps each chord over its syllable", () => {
    expect(moved("D              G\nLantern on the slipway", "D", "C")).toBe(
      "C              F\nLantern on the slipway",
    );
    expect(moved("D    A/C#  Bm\nSo   far   off", "D", "Db")).toBe("Db   Ab/C  Bbm\nSo   far   off");
  });

  test("puts blanks between words where two chords would run into each other", () => {
    expect(moved("D A Bm7 G\nO I see you", "D", "Db")).toBe("Db Ab Bbm7 Gb\nO  I  see  you");
  });

  test("never breaks a word: inside one, the second chord makes way", () => {
    expect(moved("  D A   G\nslipway by", "D", "Db")).toBe("  Db Ab Gb\nslipway by");
  });

  test("moves chords in brackets, bars and runs, and leaves the rest as it is", () => {
    expect(moved("Intro: | G (D) | % | N.C. :| x2\n[Em]-[C] Hm7 (slow)\nE|--0--2--|", "G", "A")).toBe(
      "Intro: | A (E) | % | N.C. :| x2\n[F#m]-[D] Hm7 (slow)\nE|--0--2--|",
    );
  });

  test("still lists what it could not read, where it stands now", () => {
    const chart = transposeChart(parseChart("D D Hx D\nO my dear one"), major("D"), major("Db"));
    expect(printChart(chart)).toBe("Db Db Hx Db\nO  my dear one");
    expect(chart.unread).toEqual([{ line: 1, column: 7, text: "Hx" }]);
  });

  test("counts a tab to the next multiple of eight", () => {
    expect(moved("D\tA\tG\nOne\ttwo\tthree", "D", "Db")).toBe("Db      Ab      Gb\nOne     two     three");
  });

  const word = fc.constantFrom("la", "slipway", "a", "o", "harbour,", "I", "low");
  const symbol = fc.constantFrom("D", "Bm7", "F#m", "Gmaj7", "A/C#", "E7(b9)", "Bb", "Hq7", "(G)", "N.C.", "|");
  /** A sung line: every word may carry a sign over its first letter, where there is room. */
  const sungLine = fc.array(fc.tuple(word, fc.option(symbol)), { minLength: 3, maxLength: 12 }).map((pairs) => {
    let above = "D";
    let below = "oh";
    for (const [text, sign] of pairs) {
      below += " ";
      if (sign !== null && (above === "" || above.length < below.length)) above = above.padEnd(below.length) + sign;
      below += text;
    }
    return `${above}\n${below}`;
  });

  test("holds every chord over the word it was written over, and gives the same words", () => {
    fc.assert(
      fc.property(sungLine, fc.integer({ min: 1, max: 11 }), (text, semitones) => {
        const before = parseChart(text);
        const after = transposeChart(before, major("C"), major(spellTonic(semitones, "major")));
        const [one, two] = [lines(before)[0]!, lines(after)[0]!];
        if (one.kind !== "sung" || two.kind !== "sung") throw new Error(`${text} is no sung line`);
        expect(two.lyrics.split(/ +/)).toEqual(one.lyrics.split(/ +/));
        const letters = (lyrics: string, column: number) => lyrics.slice(0, column).replaceAll(" ", "").length;
        expect(two.chords.map((token) => letters(two.lyrics, token.column))).toEqual(
          one.chords.map((token) => letters(one.lyrics, token.column)),
        );
        expect(printChart(parseChart(printChart(after)))).toBe(printChart(after));
        expect(parseChart(printChart(after))).toEqual(after);
      }),
      { numRuns: 1500 },
    );
  });

  test("sounds exactly the interval away and comes back, whatever the text", () => {
    const piece = fc.constantFrom(
      "A",
      "Am7",
      "Db/F",
      "F#m7b5",
      " ",
      "   ",
      "\n",
      "\t",
      "|",
      "(G)",
      "x2",
      "Verse\n",
      "la la",
      "Hm",
      "E7#9",
      "N.C.",
    );
    const text = fc.array(piece, { maxLength: 30 }).map((pieces) => pieces.join(""));
    const tonic = fc.constantFrom("C", "Db", "D", "Eb", "E", "F", "F#", "G", "Ab", "A", "Bb", "B");
    const sounding = (chart: Chart) =>
      chartTokens(chart).map((token) => (token.chord ? chordPitchClasses(token.chord) : [token.kind, token.text]));
    fc.assert(
      fc.property(text, tonic, fc.integer({ min: 0, max: 11 }), (any, from, semitones) => {
        const to = spellTonic(
          (["C", "Db", "D", "Eb", "E", "F", "F#", "G", "Ab", "A", "Bb", "B"].indexOf(from) + semitones) % 12,
          "major",
        );
        const chart = parseChart(any);
        const up = transposeChart(chart, major(from), major(to));
        const back = transposeChart(up, major(to), major(from));
        expect(sounding(back)).toEqual(sounding(chart));
        expect(sounding(up)).toEqual(
          sounding(chart)
            .map((pcs) =>
              pcs
                .map((pc) => (typeof pc === "number" ? (pc + semitones) % 12 : pc))
                .sort((a, b) => (a < b ? -1 : a > b ? 1 : 0)),
            )
            .map((pcs, index) =>
              typeof sounding(chart)[index]![0] === "number"
                ? pcs.sort((a, b) => Number(a) - Number(b))
                : sounding(chart)[index]!,
            ),
        );
      }),
      { numRuns: 1500 },
    );
  });
});
