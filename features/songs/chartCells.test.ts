import { chartCells } from "./chartCells";

const line = "Lantern on the slipway, burning low,";
const chords = [
  { column: 0, text: "D" },
  { column: 15, text: "G" },
  { column: 32, text: "D" },
];

test("a line wraps at its words and each chord stays over its syllable", () => {
  const cells = chartCells(line, chords);
  expect(cells.map((cell) => cell.text)).toEqual(["Lantern ", "on ", "the ", "slipway, ", "burning ", "low,"]);
  expect(cells[3]?.chords).toEqual([{ column: 0, text: "G" }]);
  expect(cells[5]?.chords).toEqual([{ column: 0, text: "D" }]);
});

test("cells laid end to end give back every column", () => {
  const cells = chartCells(line, chords);
  let start = 0;
  const back = cells.flatMap((cell) => {
    const placed = cell.chords.map((chord) => ({ column: start + chord.column, text: chord.text }));
    start += cell.width;
    return placed;
  });
  expect(back).toEqual(chords);
  expect(cells.map((cell) => cell.text).join("")).toBe(line);
});

test("a chord in the middle of a word does not cut the word", () => {
  expect(chartCells("harbour", [{ column: 3, text: "Am" }])).toEqual([
    { text: "harbour", width: 7, chords: [{ column: 3, text: "Am" }] },
  ]);
});

test("a chord longer than its word keeps the next word with it", () => {
  const cells = chartCells("I know it", [{ column: 0, text: "F#m7b5" }]);
  expect(cells.map((cell) => cell.text)).toEqual(["I know ", "it"]);
});

test("a chord behind the last word stays beside it", () => {
  const cells = chartCells("from the shore", [
    { column: 0, text: "D" },
    { column: 17, text: "(F#)" },
  ]);
  expect(cells.map((cell) => cell.text)).toEqual(["from ", "the ", "shore       "]);
  expect(cells[2]?.chords).toEqual([{ column: 8, text: "(F#)" }]);
});

test("a chord far behind the last word may wrap, so that no cell is wider than a phone", () => {
  const cells = chartCells("shore", [{ column: 40, text: "A7" }]);
  expect(Math.max(...cells.map((cell) => cell.width))).toBeLessThan(16);
});

test("chords without words wrap between chords", () => {
  const cells = chartCells("", [
    { column: 0, text: "D" },
    { column: 4, text: "G" },
    { column: 8, text: "A" },
  ]);
  expect(cells.map((cell) => cell.chords[0]?.text)).toEqual(["D", "G", "A"]);
});

test("an empty line has no cells", () => {
  expect(chartCells("", [])).toEqual([]);
});

test("a long gap may wrap and still holds its columns", () => {
  const cells = chartCells(" ".repeat(40), [{ column: 30, text: "D" }]);
  expect(Math.max(...cells.map((cell) => cell.width))).toBeLessThan(12);
  expect(cells.reduce((sum, cell) => sum + cell.width, 0)).toBe(40);
  let start = 0;
  const columns = cells.flatMap((cell) => {
    const found = cell.chords.map((chord) => start + chord.column);
    start += cell.width;
    return found;
  });
  expect(columns).toEqual([30]);
});
