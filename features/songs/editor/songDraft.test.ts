import { song as songContract } from "@/shared/contract/song";
import { draftErrors, draftOf, emptyDraft, newOrigin, songFromDraft, type SongDraft } from "./songDraft";

const origin = newOrigin("7f0b6f0e-6a51-4a8e-9a53-0a3d8f6f3f01", "2026-03-05T19:00:00.000Z");
const typed: SongDraft = {
  ...emptyDraft,
  title: " Slack Water ",
  chart: "D   G\nLow tide",
  tune: "span",
  low: "A3",
  high: "B4",
  tempo: "84",
};
const inD = { tonic: "D", mode: "major" } as const;

test("a filled form becomes a song that the contract accepts", () => {
  const song = songFromDraft(typed, inD, origin);
  expect(songContract.parse(song)).toEqual(song);
  expect(song).toMatchObject({
    title: "Slack Water",
    writtenKey: inD,
    tune: { kind: "span", lowMidi: 57, highMidi: 71, home: "D" },
    beatsPerBar: 4,
    tempo: 84,
  });
});

test("a key chosen by hand wins over the one found", () => {
  const song = songFromDraft({ ...typed, key: { tonic: "B", mode: "minor" } }, inD, origin);
  expect(song.writtenKey).toEqual({ tonic: "B", mode: "minor" });
});

test("a tune with another home note is moved to the chart's key by the shorter way", () => {
  const notes = [{ start: 0, duration: 1, midi: 67 }];
  const song = songFromDraft({ ...typed, tune: "melody", home: "G", melody: { source: "a.abc", notes } }, inD, origin);
  expect(song.tune).toEqual({ kind: "melody", home: "D", notes: [{ start: 0, duration: 1, midi: 62 }] });
});

test("a song opened for change and kept unchanged stays the same", () => {
  const song = songFromDraft(typed, inD, origin);
  expect(songFromDraft(draftOf(song), null, origin)).toEqual(song);
});

test.each<[Partial<SongDraft>, keyof SongDraft]>([
  [{ title: "  " }, "title"],
  [{ title: "x".repeat(201) }, "title"],
  [{ chart: "x".repeat(100_001) }, "chart"],
  [{ low: "G" }, "low"],
  [{ high: "H4" }, "high"],
  [{ low: "C5", high: "A4" }, "low"],
  [{ beatsPerBar: "2.5" }, "beatsPerBar"],
  [{ beatsPerBar: "many" }, "beatsPerBar"],
  [{ tempo: "900" }, "tempo"],
  [{ tune: "melody", melody: null }, "melody"],
])("%j is told at its own field", (change, field) => {
  const draft = { ...typed, ...change };
  expect(Object.keys(draftErrors(draft, inD))).toEqual([field]);
  expect(() => songFromDraft(draft, inD, origin)).toThrow(RangeError);
});

test("a tune without any home note asks for one, once there is a tune", () => {
  expect(Object.keys(draftErrors({ ...typed, tune: "melody", melody: null }, null))).toEqual(["melody"]);
  expect(draftErrors(typed, null)).toEqual({ home: "Choose the home note of the tune." });
});
