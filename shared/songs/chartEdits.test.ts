import fc from "fast-check";
import { parseChart } from "./chart";
import { nudgeChord, placeChord, removeChord, rowedLines } from "./chartEdits";
import { syllableStarts } from "./syllables";

const verse = "Verse\nG       C\nLow tide and still\n\nthe gulls go by";

test("a chord goes on a line that has none, and over a line that has some", () => {
  expect(placeChord(verse, { row: 4, column: 4 }, "Em")).toBe(
    "Verse\nG       C\nLow tide and still\n\n    Em\nthe gulls go by",
  );
  expect(placeChord(verse, { row: 2, column: 4 }, "D")).toBe("Verse\nG   D   C\nLow tide and still\n\nthe gulls go by");
});

test("a chord at the very place is replaced, its brackets stay", () => {
  expect(placeChord("(Am)  C\nLow tide", { row: 1, column: 0 }, "Em7")).toBe("(Em7) C\nLow tide");
});

test("where a longer chord needs room, blanks go in between two words", () => {
  expect(placeChord("G   C\nLow tide", { row: 1, column: 0 }, "Gmaj7")).toBe("Gmaj7 C\nLow   tide");
});

test("no chord is put where another would leave its syllable, nor on a heading, nor as two words", () => {
  expect(placeChord("G  C\nharbour", { row: 1, column: 0 }, "Gmaj7")).toBeNull();
  expect(placeChord(verse, { row: 0, column: 0 }, "G")).toBeNull();
  expect(placeChord(verse, { row: 2, column: 4 }, "G C")).toBeNull();
  expect(placeChord(verse, { row: 2, column: 4 }, " ")).toBeNull();
});

test("a line of bars takes a chord behind its last sign", () => {
  expect(placeChord("| G | C |", { row: 0, column: 10 }, "D")).toBe("| G | C | D");
});

test("a chord is taken away, and the line with the last one", () => {
  expect(removeChord(verse, { row: 2, column: 8 })).toBe("Verse\nG\nLow tide and still\n\nthe gulls go by");
  expect(removeChord("G\nLow tide", { row: 1, column: 0 })).toBe("Low tide");
  expect(removeChord(verse, { row: 2, column: 3 })).toBeNull();
});

test("a nudged chord stops beside its neighbour and at the start of the line", () => {
  expect(nudgeChord("G C\nLow tide", { row: 1, column: 0 }, 1)).toBeNull();
  expect(nudgeChord("G C\nLow tide", { row: 1, column: 2 }, 2)).toEqual({ text: "G   C\nLow tide", column: 4 });
  expect(nudgeChord("G C\nLow tide", { row: 1, column: 0 }, -1)).toBeNull();
});

const chords = ["G", "C", "Am7", "F#m7b5", "Bb/D", "D"];
const words = ["low", "tide", "and", "harbour", "the", "lantern", "homecoming", "I"];
const line = fc.array(fc.constantFrom(...words), { minLength: 2, maxLength: 7 }).chain((each) => {
  const lyrics = each.join(" ");
  return fc
    .uniqueArray(fc.tuple(fc.constantFrom(...syllableStarts(lyrics)), fc.constantFrom(...chords)), {
      selector: ([column]) => column,
      maxLength: 4,
    })
    .map((placed) => ({ lyrics, placed }));
});

/** A chart made of placed chords alone, and what was put where. */
const chart = fc.array(line, { minLength: 1, maxLength: 4 }).map((lines) =>
  lines.reduce((text, { lyrics, placed }) => {
    let now = text === "" ? lyrics : `${text}\n\n${lyrics}`;
    for (const [column, symbol] of placed) {
      const row = now.split("\n").length - 1;
      now = placeChord(now, { row, column: nth(now.split("\n")[row]!, lyrics, column) }, symbol) ?? now;
    }
    return now;
  }, ""),
);

/** Where the character of the plain words stands now that blanks were put in. */
function nth(now: string, plain: string, column: number): number {
  const place = plain.slice(0, column + 1).replaceAll(" ", "").length;
  let seen = 0;
  for (let at = 0; at < now.length; at += 1) {
    if (now[at] !== " ") seen += 1;
    if (seen === place) return at;
  }
  return -1;
}

/** Each chord with the words from its syllable on: what must not change when another chord does. */
function over(text: string, row: number): string[] {
  const { line: found } = rowedLines(parseChart(text)).find(({ wordRow }) => wordRow === row)!;
  if (found.kind !== "sung") return [];
  return found.chords.map(({ column, text: sign }) => `${sign}>${found.lyrics.slice(column).replace(/\s+/g, "")}`);
}
const plainWords = (text: string) =>
  rowedLines(parseChart(text)).flatMap(({ line: each }) =>
    "lyrics" in each ? [each.lyrics.replace(/\s+/g, " ")] : [],
  );

test("placing changes no word and moves no other chord off its syllable; taking away again leaves the rest", () => {
  fc.assert(
    fc.property(chart, fc.nat(), fc.nat(), fc.constantFrom(...chords), (text, pickLine, pickSpot, symbol) => {
      const sung = rowedLines(parseChart(text)).filter(({ wordRow }) => wordRow !== null);
      const { wordRow, chordRow, line: picked } = sung[pickLine % sung.length]!;
      const starts = syllableStarts((picked as { lyrics: string }).lyrics);
      const spot = { row: wordRow!, column: starts[pickSpot % starts.length]! };
      const placed = placeChord(text, spot, symbol);
      if (placed === null) return;
      const rowNow = chordRow === null ? spot.row + 1 : spot.row;
      expect(plainWords(placed)).toEqual(plainWords(text));
      const replaced = "chords" in picked ? picked.chords.find(({ column }) => column === spot.column) : undefined;
      const before = over(text, spot.row);
      const now = over(placed, rowNow);
      expect(now).toHaveLength(before.length + (replaced ? 0 : 1));
      const rest = [...now];
      const mine = rest.findIndex((each) => each.startsWith(`${symbol}>`));
      expect(mine).toBeGreaterThanOrEqual(0);
      const stayed = before.filter((each) => !(replaced && each.endsWith(`>${syllable(picked, spot.column)}`)));
      for (const each of stayed) expect(now).toContain(each);
      const column = columnOf(placed, rowNow, symbol, syllable(picked, spot.column));
      const taken = removeChord(placed, { row: rowNow, column })!;
      expect(plainWords(taken)).toEqual(plainWords(text));
    }),
    { numRuns: 300 },
  );
});

function syllable(picked: object, column: number): string {
  return (picked as { lyrics: string }).lyrics.slice(column).replace(/\s+/g, "");
}

function columnOf(text: string, row: number, symbol: string, from: string): number {
  const { line: found } = rowedLines(parseChart(text)).find(({ wordRow }) => wordRow === row)!;
  if (found.kind !== "sung") return -1;
  const token = found.chords.find(
    ({ column, text: sign }) => sign === symbol && found.lyrics.slice(column).replace(/\s+/g, "") === from,
  );
  expect(token).toBeDefined();
  return token!.column;
}

test("nudging there and back is as if nothing had been done", () => {
  fc.assert(
    fc.property(chart, fc.nat(), fc.integer({ min: -4, max: 4 }), (text, pick, by) => {
      const tokens = rowedLines(parseChart(text)).flatMap(({ line: each, wordRow }) =>
        "chords" in each ? each.chords.map(({ column }) => ({ row: wordRow!, column })) : [],
      );
      if (tokens.length === 0) return;
      const spot = tokens[pick % tokens.length]!;
      const there = nudgeChord(text, spot, by);
      if (!there) return;
      expect(nudgeChord(there.text, { ...spot, column: there.column }, -by)?.text).toBe(text);
    }),
    { numRuns: 300 },
  );
});

test("no text and no place makes it fail", () => {
  fc.assert(
    fc.property(fc.string({ maxLength: 200, unit: "grapheme" }), fc.nat(8), fc.nat(30), (text, row, column) => {
      placeChord(text, { row, column }, "G");
      removeChord(text, { row, column });
      nudgeChord(text, { row, column }, 1);
    }),
    { numRuns: 300 },
  );
});
