import { pastedSong } from "./pastedSong";
import { emptyDraft } from "./songDraft";

const chart = "G       C\nLow tide and still\nD       G\nthe gulls go by";

test("a title line over the chart becomes the title, and leaves the chart", () => {
  expect(pastedSong(emptyDraft, `Slack Water\n\n${chart}`)).toEqual({ title: "Slack Water", chart });
});

test("a head gives key, beats and tempo too", () => {
  expect(pastedSong(emptyDraft, `Title: Slack Water\nKey: G\nTime: 3/4\nTempo: 96\n\n${chart}`)).toEqual({
    title: "Slack Water",
    chart,
    key: { tonic: "G", mode: "major" },
    beatsPerBar: "3",
    tempo: "96",
  });
});

test.each([
  ["a chart without a title", emptyDraft, chart],
  ["a form that has a title", { ...emptyDraft, title: "Ebb" }, `Slack Water\n\n${chart}`],
  ["a form that has a chart", { ...emptyDraft, chart: "D" }, `Slack Water\n\n${chart}`],
  ["a line that is typed", emptyDraft, "Slack Water\n"],
])("%s is left as it is", (_, draft, text) => expect(pastedSong(draft, text)).toBeNull());
