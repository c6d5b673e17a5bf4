import fc from "fast-check";
import { addPart, chartParts, copyPart, movePart, removePart, renamePart } from "./chartParts";

const song = "Capo 2\n\n[Verse 1]\nG\nLow tide\n\n[Chorus] x2\nC\nStill\n\n\nOutro: G C";

test("parts have names, kinds, times and rows", () => {
  expect(chartParts(song)).toEqual([
    { name: null, kind: "own", times: 1, start: 0, end: 2 },
    { name: "Verse 1", kind: "verse", times: 1, start: 2, end: 6 },
    { name: "Chorus", kind: "chorus", times: 2, start: 6, end: 11 },
    { name: "Outro", kind: "outro", times: 1, start: 11, end: 12 },
  ]);
  expect(chartParts("\n\n")).toEqual([]);
});

test("a renamed part keeps the manner of its heading; a name of one's own gets brackets", () => {
  expect(renamePart(song, 1, "Low water", 1)).toContain("[Low water]\nG");
  expect(renamePart("Verse 1:\nG\nLow tide", 0, "Verse 2", 3)).toBe("Verse 2 x3:\nG\nLow tide");
  expect(renamePart("Verse 1\nG\nLow tide", 0, "By the boats", 1)).toBe("[By the boats]\nG\nLow tide");
  expect(renamePart("G\nLow tide", 0, "Verse", 1)).toBe("Verse\nG\nLow tide");
  expect(renamePart("Intro: G   C\n       low tide", 0, "Solo", 1)).toBe("Solo\n       G   C\n       low tide");
});

test("a name that would be read as a chord, or as no name, is refused", () => {
  expect(renamePart(song, 1, "Am", 1)).toBeNull();
  expect(renamePart(song, 1, "12", 1)).toBeNull();
  expect(renamePart(song, 9, "Verse", 1)).toBeNull();
  expect(addPart(song, "[]")).toBeNull();
});

test("what stands before the first heading stays first", () => {
  expect(movePart(song, 0, 1)).toBeNull();
  expect(movePart(song, 1, 0)).toBeNull();
  expect(chartParts(movePart(song, 3, 1)!).map(({ name }) => name)).toEqual([null, "Outro", "Verse 1", "Chorus"]);
});

test("a copy of a numbered part gets the next free number", () => {
  expect(chartParts(copyPart(song, 1)!).map(({ name }) => name)).toEqual([
    null,
    "Verse 1",
    "Verse 2",
    "Chorus",
    "Outro",
  ]);
  expect(copyPart(song, 0)).toBeNull();
});

test("a part is added at the end and taken out again", () => {
  const added = addPart(song, "Bridge")!;
  expect(chartParts(added).at(-1)).toMatchObject({ name: "Bridge", kind: "bridge" });
  expect(removePart(added, 4)!.trimEnd()).toBe(song);
  expect(removePart("Verse\nLow tide", 0)).toBe("");
});

const names = ["Verse 1", "[Chorus] x2", "Bridge:", "{Solo}", "Outro: G C", "[Own thing]"];
const part = fc.tuple(
  fc.constantFrom(...names),
  fc.array(fc.constantFrom("G   C", "low tide and still", "# softly", ""), { maxLength: 4 }),
);
const text = fc
  .array(part, { minLength: 1, maxLength: 6 })
  .map((parts) => parts.flatMap(([name, rows]) => [name, ...rows]).join("\n"));
const rows = (chart: string) =>
  chart
    .split("\n")
    .filter((row) => row.trim() !== "")
    .sort();

test("moving keeps every row, and moving back gives the same text", () => {
  fc.assert(
    fc.property(text, fc.nat(5), fc.nat(5), (chart, from, to) => {
      const moved = movePart(chart, from, to);
      if (moved === null) return;
      expect(rows(moved)).toEqual(rows(chart));
      expect(movePart(moved, to, from)).toBe(chart);
    }),
    { numRuns: 200 },
  );
});

test("a renamed part says its new name, and no other part changes", () => {
  fc.assert(
    fc.property(
      text,
      fc.nat(5),
      fc.constantFrom("Tag", "Quiet part", "Chorus"),
      fc.integer({ min: 1, max: 9 }),
      (chart, pick, name, times) => {
        const before = chartParts(chart);
        const index = pick % before.length;
        const after = chartParts(renamePart(chart, index, name, times)!);
        expect(after).toHaveLength(before.length);
        after.forEach((each, at) => {
          if (at === index) expect(each).toMatchObject({ name, times });
          else expect(each).toMatchObject({ name: before[at]!.name, times: before[at]!.times });
        });
      },
    ),
    { numRuns: 200 },
  );
});

test("no text makes it fail", () => {
  fc.assert(
    fc.property(fc.string({ maxLength: 200, unit: "grapheme" }), fc.nat(4), (chart, index) => {
      chartParts(chart);
      movePart(chart, index, 0);
      copyPart(chart, index);
      removePart(chart, index);
      renamePart(chart, index, "Verse", 2);
    }),
    { numRuns: 300 },
  );
});
