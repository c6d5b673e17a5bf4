import { parseChart } from "@/shared/songs/chart";
import { firstLines, shownPlace } from "./shownLines";

const chart = parseChart("\nVerse\n\nG   C\nlow tide\n# softly\n\nChorus\nD\nstill");

test("a row of the text is found in what is drawn", () => {
  const { sections } = firstLines(chart, 100);
  expect(sections.map(({ label }) => label)).toEqual(["Verse", "Chorus"]);
  expect(shownPlace(chart, 3)).toEqual({ section: 0, line: 0 });
  expect(shownPlace(chart, 4)).toEqual({ section: 0, line: 0 });
  expect(shownPlace(chart, 5)).toEqual({ section: 0, line: 1 });
  expect(shownPlace(chart, 9)).toEqual({ section: 1, line: 0 });
});

test("headings, blank rows at an end and rows behind the end are nowhere", () => {
  for (const row of [0, 1, 2, 6, 7, 40]) expect(shownPlace(chart, row)).toBeNull();
});

test("a very long line takes up the room of many, a bare heading that of one, and there is always a line", () => {
  const words = "low tide ".repeat(100);
  const long = firstLines(parseChart(`Verse\n${words}\n${words}\nstill\nthe gulls`), 20);
  expect([long.sections[0]?.lines.length, long.shown, long.rest]).toEqual([2, 2, 2]);
  expect(firstLines(parseChart(words.repeat(100)), 20)).toMatchObject({ shown: 1, rest: 0 });
  const bare = firstLines(parseChart("Verse\n".repeat(1000)), 20);
  expect(bare.sections).toHaveLength(20);
  expect(firstLines(chart, 2)).toMatchObject({ shown: 2, rest: 2 });
});
