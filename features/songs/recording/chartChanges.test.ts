import type { Song } from "@/shared/contract/song";
import { reconcileKeys } from "@/shared/songs/reconcileKeys";
import { clearChart, noteCapo, takeForm, takeTransposed } from "./chartChanges";

const song: Song = {
  id: "0b5d9f5e-2a52-4f3e-9f0f-0c9c3e8e6a11",
  title: "Slack Water",
  chart: "G      C\nlow at the quay",
  writtenKey: { tonic: "G", mode: "major" },
  tune: { kind: "melody", home: "G", notes: [{ start: 0, duration: 1, midi: 67 }] },
  beatsPerBar: 4,
  tempo: null,
  demo: null,
  tags: [],
  archivedAt: null,
  playedAt: null,
  createdAt: "2026-03-01T10:00:00.000Z",
  revision: 3,
};

test("the transposed chart takes the written key and the tune along, by the smaller way", () => {
  const { song: taken, said } = takeTransposed(song, { tonic: "D", mode: "major" }, -5);
  expect(taken).toMatchObject({ writtenKey: { tonic: "D" }, tune: { home: "D", notes: [{ midi: 62 }] }, revision: 3 });
  expect(taken.chart).toBe("D      G\nlow at the quay");
  expect(said).toBe("The chart now stands in D, and the tune went with it.");
});

test("a capo is noted once at the head, and the chords stay", () => {
  const capo7 = reconcileKeys({ tonic: "G", mode: "major" }, { tonic: "D", mode: null });
  const noted = noteCapo(song, capo7).song;
  expect(noted.chart).toBe(`Capo 7, as on the recording: shapes of G, sounds in D\n${song.chart}`);
  const capo2 = reconcileKeys({ tonic: "G", mode: "major" }, { tonic: "A", mode: null });
  expect(noteCapo(noted, capo2).song.chart).toBe(
    `Capo 2, as on the recording: shapes of G, sounds in A\n${song.chart}`,
  );
});

test("another chart begins empty, with the tune still there", () => {
  expect(clearChart(song).song).toMatchObject({ chart: "", tune: song.tune, writtenKey: song.writtenKey });
});

test("the form becomes headings and tempo", () => {
  const parts = [{ label: "Verse", atS: 0, seconds: 16, bars: 8 }];
  const { song: formed, said } = takeForm(song, parts, { tempo: 120, beatsPerBar: 4 });
  expect(formed).toMatchObject({ tempo: 120, beatsPerBar: 4 });
  expect(formed.chart).toBe(`Verse (8 bars)\n${song.chart}`);
  expect(said).toBe("The parts are now the headings of your chart. The tempo is 120 beats a minute.");
  expect(takeForm(song, parts, null).song.tempo).toBeNull();
});
