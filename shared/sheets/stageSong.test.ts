import { demoSongs } from "../songs/demoSongs";
import { playedChart, scrollSpeed, songLength } from "./stageSong";

test("what is played again stands again, with its chords, and as often as it is played", () => {
  const chart = "Verse\nG    D\nLow tide\n\nChorus x2\nC    G\nStill water\n\nChorus";
  expect(playedChart(chart).match(/Still water/g)).toHaveLength(3);
  expect(playedChart(chart).match(/^C {4}G$/gm)).toHaveLength(3);
  expect(playedChart("")).toBe("");
});

test("a song of sixteen bars of four at 96 takes forty seconds, and the words pass in just that time", () => {
  const chart = Array.from({ length: 4 }, () => "| G | C | D | G |").join("\n");
  const length = songLength({ chart, notes: [], beatsPerBar: 4, tempo: 96 });
  expect(length).toEqual({ quarters: 64, beats: 4, barQuarters: 4, tempo: 96 });
  expect(1000 / scrollSpeed(1000, length.quarters, length.tempo)).toBeCloseTo(40, 9);
  expect(scrollSpeed(1000, 64, 48)).toBe(scrollSpeed(1000, 64, 96) / 2);
  expect(scrollSpeed(1000, 0, 96)).toBe(0);
  expect(() => scrollSpeed(1000, 64, 0)).toThrow(RangeError);
});

test("every song of the demonstration has a length between half a minute and six", () => {
  for (const { title, chart, notes, beatsPerBar, tempo } of demoSongs) {
    const length = songLength({ chart, notes, beatsPerBar, tempo });
    const seconds = (length.quarters * 60) / length.tempo;
    expect([title, seconds > 30 && seconds < 360]).toEqual([title, true]);
  }
});
