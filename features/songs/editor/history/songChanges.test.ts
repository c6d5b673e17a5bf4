import { aSong } from "@/__tests__/client/belongings";
import { changedLines, changeWords } from "./songChanges";

const song = aSong({ title: "Low", chart: "Verse\nG\nLow tide\n\nChorus\nC\nStill\nand on\nand on" });

test("what was changed is told field by field", () => {
  const now = { ...song, title: "High", tempo: 90, chart: song.chart.replace("Low tide", "High tide") + "\nhome" };
  expect(changeWords({ ...song, tempo: null }, now)).toEqual([
    "Title: Low → High",
    "Chart: 1 line changed, 1 line added",
    "Beats a minute: empty → 90",
  ]);
  expect(changeWords(song, song)).toEqual([]);
});

test("changed lines stand among those around them, the others are left out", () => {
  expect(changedLines(song.chart, song.chart.replace("Low tide", "High tide"))).toEqual([
    { kind: "same", text: "Verse" },
    { kind: "same", text: "G" },
    { kind: "gone", text: "Low tide" },
    { kind: "new", text: "High tide" },
    { kind: "same", text: "" },
    { kind: "same", text: "Chorus" },
    null,
  ]);
  expect(changedLines("a", "a")).toEqual([]);
});
