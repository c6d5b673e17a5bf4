import { parseChart, printChart, transposeChart } from "./chart";

const parts = (text: string) =>
  parseChart(text).sections.map(({ kind, number, times, recalls }) => [kind, number, times, recalls]);

// Common practice of headings.
test.each([
  ["Verse", "verse", null, 1],
  ["Verse 2", "verse", 2, 1],
  ["[Verse IV]", "verse", 4, 1],
  ["Strophe 3:", "verse", 3, 1],
  ["Chorus x2", "chorus", null, 2],
  ["[Chorus] (x3)", "chorus", null, 3],
  ["Chorus (2x)", "chorus", null, 2],
  ["Chorus twice", "chorus", null, 2],
  ["Chorus, 3 times", "chorus", null, 3],
  ["Refrain:", "chorus", null, 1],
  ["Chorus 2 x3", "chorus", 2, 3],
  ["Pre-Chorus", "pre-chorus", null, 1],
  ["Prechorus 1", "pre-chorus", 1, 1],
  ["Post Chorus", "post-chorus", null, 1],
  ["Bridge", "bridge", null, 1],
  ["Middle eight", "bridge", null, 1],
  ["Solo", "solo", null, 1],
  ["Guitar solo", "solo", null, 1],
  ["Intro", "intro", null, 1],
  ["Outro x4", "outro", null, 4],
  ["Coda", "outro", null, 1],
  ["Ending:", "outro", null, 1],
  ["Tag:", "tag", null, 1],
  ["[Tag 2x]", "tag", null, 2],
  ["Instrumental", "instrumental", null, 1],
  ["Break:", "instrumental", null, 1],
  ["Interlude", "interlude", null, 1],
  ["Turnaround:", "interlude", null, 1],
  ["[Everybody now]", "own", null, 1],
  ["[Part B]", "own", null, 1],
  ["{Gulls} x2", "own", null, 2],
])("'%s' heads a %s", (heading, kind, number, times) => {
  expect(parts(`${heading}\nG  D\nwords`)).toEqual([[kind, number, times, null]]);
});

test("what stands before the first heading has no kind", () => {
  expect(parts("G D\nwords")).toEqual([[null, null, 1, null]]);
});

test("a line that only counts repeats belongs to the part above it", () => {
  const text = "Chorus\nG  D\nla la\n(x2)\n\nVerse\nG\nla";
  expect(parts(text)).toEqual([
    ["chorus", null, 2, null],
    ["verse", null, 1, null],
  ]);
  expect(parseChart(text).sections[0]!.lines.map(({ kind }) => kind)).toEqual(["sung", "comment", "blank"]);
});

test.each([
  ["Chorus", 1, 1],
  ["Chorus x2", 1, 2],
  ["[Chorus]", 1, 1],
  ["Repeat Chorus", 1, 1],
  ["(Repeat chorus x2)", 1, 2],
  ["repeat the last chorus twice", 1, 2],
  ["Chorus again", 1, 1],
  ["Verse 1", 0, 1],
  ["Repeat first verse", 0, 1],
  ["Repeat Verse 1.", 0, 1],
  ["Verse 3", null, 1],
  ["Bridge", null, 1],
])("a heading alone calls an earlier part back: '%s'", (heading, recalls, times) => {
  const text = `Verse 1\nG\nla\n\nChorus\nD\nlo\n\n${heading}\n`;
  expect(parseChart(text).sections.at(-1)).toMatchObject({ recalls, times });
  expect(printChart(parseChart(text))).toBe(text);
});

test.each(["Repeat after me", "Chorus again and again we sing", "Twice", "To the chorus of gulls"])(
  "'%s' is words",
  (line) => expect(parseChart(line).sections).toMatchObject([{ label: null, lines: [{ kind: "lyrics" }] }]),
);

test("keeps all kinds of line breaks, also when it is moved", () => {
  const text = "Verse\r\nG  D\r\nla la\n\rG\r\n";
  expect(printChart(parseChart(text))).toBe(text);
  const [from, to] = [
    { tonic: "G", mode: "major" },
    { tonic: "A", mode: "major" },
  ] as const;
  expect(printChart(transposeChart(parseChart(text), from, to))).toBe("Verse\r\nA  E\r\nla la\n\rA\r\n");
});

describe("a chart in other note names", () => {
  const keys = [
    { tonic: "G", mode: "major" },
    { tonic: "A", mode: "major" },
  ] as const;
  const moved = (text: string, naming: "german" | "solfege") => {
    const chart = parseChart(text, { naming });
    expect(chart.unread).toEqual([]);
    expect(printChart(chart)).toBe(text);
    return printChart(transposeChart(chart, ...keys));
  };

  test("is read and moved in German", () => {
    expect(moved("G  Hm  B  D/Fis  Es7", "german")).toBe("A  C#m C  E/G#   F7");
    expect(moved("A7  Am  G  F♯m", "german")).toBe("H7  Hm  A  G♯m");
    expect(moved("Fism  Cis", "german")).toBe("Gism  Dis");
  });

  test("is read and moved in solfege", () => {
    expect(moved("Sol   Sim   Re/Fa#\nla la la la la", "solfege")).toBe("La    Do#m  Mi/Sol#\nla la la la la");
  });

  test("is another one in English", () => {
    expect(parseChart("G  Hm  B").unread).toEqual([{ line: 1, column: 4, text: "Hm" }]);
  });
});
