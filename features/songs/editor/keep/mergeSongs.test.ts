import fc from "fast-check";
import { contentOf, mergeSongs, sameContent } from "./mergeSongs";

const base = contentOf({
  title: "Slack Water",
  chart: "Verse\nG\nLow tide\n\nChorus\nC\nStill\n\nOutro\nG",
  writtenKey: { tonic: "G", mode: "major" },
  tune: null,
  beatsPerBar: 4,
  tempo: null,
});
const chart = (from: string, to: string) => base.chart.replace(from, to);

test("changes at different places go together by themselves", () => {
  const mine = { ...base, chart: chart("Low tide", "Low tide, low"), title: "Slack" };
  const theirs = { ...base, chart: chart("Outro\nG", "Outro\nC G"), tempo: 90 };
  const { clashes, resolve } = mergeSongs(base, mine, theirs);
  expect(clashes).toEqual([]);
  expect(resolve([])).toEqual({
    ...base,
    title: "Slack",
    tempo: 90,
    chart: chart("Low tide", "Low tide, low").replace("Outro\nG", "Outro\nC G"),
  });
});

test("the same place changed in two ways is a clash, and each side can be had, or both", () => {
  const mine = { ...base, title: "Mine", chart: chart("Still", "Still here") };
  const theirs = { ...base, title: "Theirs", chart: chart("Still", "Still there") };
  const { clashes, resolve } = mergeSongs(base, mine, theirs);
  expect(clashes).toEqual([
    { name: "title", lines: null },
    { name: "chart", lines: { mine: ["Still here"], theirs: ["Still there"] } },
  ]);
  expect(resolve(["mine", "mine"])).toEqual(mine);
  expect(resolve(["theirs", "theirs"])).toEqual(theirs);
  expect(resolve(["theirs", "both"]).chart).toBe(chart("Still", "Still here\nStill there"));
});

test("both doing the same is no clash", () => {
  const same = { ...base, chart: chart("Still", "Still here") };
  expect(mergeSongs(base, same, { ...same }).clashes).toEqual([]);
});

test("fields in another order are the same content", () => {
  expect(sameContent(base, { ...base, writtenKey: { mode: "major", tonic: "G" } })).toBe(true);
  expect(sameContent(base, { ...base, writtenKey: { mode: "minor", tonic: "G" } })).toBe(false);
});

const rows = fc.array(fc.constantFrom("G", "C", "low", "tide", ""), { maxLength: 8 }).map((each) => each.join("\n"));

test("taking one side everywhere never loses a line of it, and an unchanged side gives the other", () => {
  fc.assert(
    fc.property(rows, rows, rows, (from, here, there) => {
      const began = { ...base, chart: from };
      const mine = { ...base, chart: here };
      const theirs = { ...base, chart: there };
      expect(mergeSongs(began, mine, began).resolve([])).toEqual(mine);
      expect(mergeSongs(began, began, theirs).resolve([])).toEqual(theirs);
      const { clashes, resolve } = mergeSongs(began, mine, theirs);
      const both = resolve(clashes.map(() => "both" as const)).chart.split("\n");
      const added = (text: string) => text.split("\n").filter((row) => !from.split("\n").includes(row));
      for (const row of [...added(here), ...added(there)]) expect(both).toContain(row);
    }),
  );
});
