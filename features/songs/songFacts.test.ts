import type { Song } from "@/shared/contract/song";
import { beatWords, hasChords, headWords, songMoveWords } from "./songFacts";

const song = (title: string, chart: string, change: Partial<Song> = {}): Song => ({
  id: title,
  title,
  chart,
  writtenKey: { tonic: "Bb", mode: "minor" },
  tune: null,
  beatsPerBar: 3,
  tempo: 92,
  demo: null,
  tags: [],
  archivedAt: null,
  playedAt: null,
  createdAt: "2026-03-05T19:00:00.000Z",
  revision: 1,
  ...change,
});
const shelf = [song("Slack Water", "Low tide"), song("Étoile", "the water is wide"), song("Gulls", "over the bar")];

test("a tune without a chart has its home note, and no chart to lie under", () => {
  const tune = { kind: "span", lowMidi: 57, highMidi: 71, home: "Bb" } as const;
  const sung = song("x", "", { writtenKey: null, tune, beatsPerBar: null, tempo: null });
  expect(headWords(sung, null)).toBe("Home note B♭");
  expect(songMoveWords(sung, -14)).toBe("an octave and a whole tone under the tune as you gave it");
  expect(songMoveWords(sung, 0)).toBe("as you gave the tune");
  expect(songMoveWords({ chart: "D  A" }, -2)).toBe("a whole tone under the chart");
});

test("words alone are no chords", () => {
  expect(["Low tide and still", "D   G\nLow tide", ""].map((chart) => hasChords({ chart }))).toEqual([
    false,
    true,
    false,
  ]);
});

test("beat and tempo in words", () => {
  expect(beatWords(shelf[0]!)).toBe("3 beats, 92 a minute");
  expect(beatWords({ beatsPerBar: 1, tempo: null })).toBe("1 beat");
  expect(beatWords({ beatsPerBar: null, tempo: null })).toBeNull();
  expect(headWords(shelf[0]!, null)).toBe("Written in B♭ minor · 3 beats in a bar, 92 a minute");
  expect(headWords(song("x", "", { beatsPerBar: null, tempo: null }), null)).toBe("Written in B♭ minor");
  expect(headWords(song("x", "", { beatsPerBar: null, tempo: null }), "Cm")).toBe("Your key Cm, written in B♭ minor");
});
