import type { Song } from "@/shared/contract/song";
import { askedKey, chordsIn, keyInHand, keyRowsOf, writtenKeyOf } from "./songKeys";
import { decide } from "./decision/decide";

const song: Song = {
  id: "7f0b6f0e-6a51-4a8e-9a53-0a3d8f6f3f01",
  title: "Slack Water",
  chart: "G    C   D  Em  Am\nLow tide and still the gulls",
  writtenKey: { tonic: "G", mode: "major" },
  tune: { kind: "span", lowMidi: 62, highMidi: 76, home: "G" },
  beatsPerBar: null,
  tempo: null,
  demo: null,
  tags: [],
  archivedAt: null,
  playedAt: null,
  createdAt: "2026-03-05T19:00:00.000Z",
  revision: 1,
};
const singing = { range: { lowMidi: 51, highMidi: 74 }, comfort: { lowMidi: 55, highMidi: 70 } };
const choice = {
  songId: song.id,
  tonic: "D",
  shift: -5,
  score: null,
  reason: "Mine.",
  voiceId: null,
  instrument: null,
  way: null,
};
const decision = decide(choice, null, () => song.id, new Date(0));

test("all twelve keys come with their chords, the coarse ones saying so", () => {
  const rows = keyRowsOf(song, singing);
  expect(rows).toHaveLength(12);
  const inC = rows?.find((row) => row.sign === "C");
  expect(inC).toMatchObject({ moved: "7 down", span: "G3 to A4", coarse: true, chords: ["C", "F", "G", "Am"] });
});

test("without a voice or without a tune there are no rows", () => {
  expect(keyRowsOf(song, null)).toBeNull();
  expect(keyRowsOf({ ...song, tune: null }, singing)).toBeNull();
});

test("chords are spelled by the key they arrive in, and what is no chord stays away", () => {
  const from = { tonic: "G", mode: "major" } as const;
  expect(chordsIn(["G", "D/F#", "?"], from, { tonic: "Db", mode: "major" })).toEqual(["Db", "Ab/C"]);
});

test("the decided key comes first, then the best, then the written one", () => {
  const rows = keyRowsOf(song, singing);
  expect(keyInHand(song, rows, decision)).toMatchObject({ key: { tonic: "D" }, shift: -5, because: "decided" });
  expect(keyInHand(song, rows, null)).toMatchObject({ shift: rows?.[0]?.shift, because: "best" });
  expect(keyInHand(song, null, null)).toMatchObject({ key: { tonic: "G" }, shift: 0, row: null, because: "written" });
});

test("a decision made for another chart no longer counts", () => {
  expect(keyInHand({ ...song, writtenKey: { tonic: "A", mode: "major" } }, null, decision)?.because).toBe("written");
});

test("a tune without a chart's key stands in its home note", () => {
  expect(writtenKeyOf({ ...song, writtenKey: null })).toEqual({ tonic: "G", mode: "major" });
  expect(writtenKeyOf({ writtenKey: null, tune: null })).toBeNull();
  expect(keyInHand({ ...song, writtenKey: null, tune: null }, null, null)).toBeNull();
});

test.each([
  ["C", "-7", "C", -7],
  ["C#", "-6", "C#", -6],
  ["E", "-7", "C", -7],
  [undefined, "-6", "Db", -6],
  ["C", undefined, "D", -5],
  ["C", "far", "D", -5],
  ["C", "99", "D", -5],
])("an address asking for key %s and move %s gets %s", (tonic, shift, key, move) => {
  const inHand = keyInHand(song, null, decision);
  expect(askedKey(song, inHand, tonic, shift)).toEqual({ key: { tonic: key, mode: "major" }, shift: move });
});
