import { cellAt, cellWords, placeItems, withoutTabs, type PlaceLine } from "./placeLines";

const text = "[Chorus]\nG       C\nLow tide, harbour\n# softly\n| D | A |";

test("a chart as headings, remarks and lines of syllables with their chords", () => {
  const items = placeItems(text);
  expect(items.map((item) => (item.kind === "line" ? item.row : item.text))).toEqual(["Chorus", 2, "# softly", 4]);
  const line = items[1] as PlaceLine;
  expect(line.words.map((word) => word.map((cell) => [cell.text, cell.chord?.text ?? null]))).toEqual([
    [["Low", "G"]],
    [
      ["tide", null],
      [",", "C"],
    ],
    [
      ["har", null],
      ["bour", null],
      ["", null],
    ],
  ]);
});

test("every place says what it is", () => {
  const items = placeItems(text);
  expect(cellWords(cellAt(items, { row: 2, column: 0 })!, 2)).toBe("G over “Low”, line 3");
  expect(cellWords(cellAt(items, { row: 2, column: 10 })!, 2)).toBe("“har” of harbour, line 3");
  expect(cellWords(cellAt(items, { row: 2, column: 18 })!, 2)).toBe("after the words, line 3");
  expect(cellAt(items, { row: 2, column: 1 })).toBeNull();
});

test("tabs are counted out, in every line by itself", () => {
  expect(withoutTabs("a\tb\n\tc")).toBe("a       b\n        c");
});

test("on a line of 100,000 letters there are places as far as chords can be read, and they are found at once", () => {
  const words = "low tide and the harbour ".repeat(4000);
  const start = process.cpuUsage();
  const [line, more] = placeItems(words);
  const { user } = process.cpuUsage(start);
  const columns = (line as PlaceLine).words.flat().map(({ column }) => column);
  expect(Math.max(...columns)).toBeLessThanOrEqual(2001);
  expect(columns.length).toBeGreaterThan(400);
  expect(more).toMatchObject({ kind: "remark", text: expect.stringMatching(/…$/) as string });
  // µs; it took 12 s when each place looked through the whole line.
  expect(user).toBeLessThan(1_500_000);
});
