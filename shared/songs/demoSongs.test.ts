import { chordPitchClasses } from "../music/chord";
import { noteName, pitchClass } from "../music/pitch";
import { type ChartLine, chartTokens, parseChart, printChart } from "./chart";
import { demoSongs, type DemoSong } from "./demoSongs";
import { findKey } from "./findKey";
import { readMelodyFile } from "./melodyFile";
import { tessitura, tessituragram } from "./tessituragram";

function tuneOf(song: DemoSong) {
  const file = readMelodyFile(`${song.id}.abc`, new TextEncoder().encode(song.abc));
  if (!file.ok) throw new Error(file.reason);
  return file.voices[file.proposed]!;
}
const sung = (song: DemoSong) =>
  parseChart(song.chart).sections.flatMap(({ label, lines }) =>
    lines.flatMap((line: ChartLine) => (line.kind === "sung" ? [{ label, ...line }] : [])),
  );
const words = (text: string) => text.toLowerCase().replace(/[^a-z]/g, "");

describe.each(demoSongs.map((song) => [song.title, song] as const))("%s", (_, song) => {
  const { melody, lyrics = [] } = tuneOf(song);

  test("has a chart without an unread sign, each chord over the start of a word", () => {
    const chart = parseChart(song.chart);
    expect(chart.unread).toEqual([]);
    expect(printChart(chart)).toBe(song.chart);
    for (const line of sung(song)) {
      for (const { column } of line.chords) expect(` ${line.lyrics}`.slice(column, column + 2)).toMatch(/^[ -]\w/);
    }
  });

  test("is in its written key by its chords, by its tune and by both", () => {
    const notes = melody.notes;
    for (const evidence of [{ chart: parseChart(song.chart) }, { notes }, { chart: parseChart(song.chart), notes }]) {
      expect(findKey(evidence)).toMatchObject({ key: song.writtenKey });
      expect(findKey(evidence)!.margin).toBeGreaterThan(0.2);
    }
    expect(melody).toMatchObject({ home: song.writtenKey.tonic, mode: "major" });
    expect(noteName(notes.at(-1)!.midi).slice(0, -1)).toBe(song.writtenKey.tonic);
  });

  test("has the same notes at hand without a reader", () => {
    expect(song.notes).toEqual(
      melody.notes.map(({ start, duration, midi }) => ({
        start: expect.closeTo(start, 6),
        duration: expect.closeTo(duration, 6),
        midi,
      })),
    );
  });

  test("sings every syllable of its first verse and chorus on a note", () => {
    expect(lyrics).toHaveLength(melody.notes.length);
    const verseAndChorus = sung(song).filter(({ label }) => label === "Verse 1" || label === "Chorus");
    expect(words(lyrics.map(({ text }) => text).join(""))).toBe(
      words(verseAndChorus.map((line) => line.lyrics).join("")),
    );
  });

  test("fills whole bars and sings a tone of the chord wherever a chord enters", () => {
    const end = melody.notes.at(-1)!;
    expect(Math.ceil((end.start + end.duration) / song.beatsPerBar) % 8).toBe(0);
    let offset = 0;
    const syllables = lyrics.map(({ text }, index) => {
      offset += words(text).length;
      return { end: offset, midi: melody.notes[index]!.midi };
    });
    let lineStart = 0;
    for (const line of sung(song).filter(({ label }) => label === "Verse 1" || label === "Chorus")) {
      for (const { column, chord } of line.chords) {
        const letter = lineStart + words(line.lyrics.slice(0, column)).length;
        const { midi } = syllables.find(({ end }) => end > letter)!;
        expect(chordPitchClasses(chord!)).toContain(pitchClass(midi));
      }
      lineStart += words(line.lyrics).length;
    }
    expect(lineStart).toBe(offset);
  });
});

test.each([
  ["lantern", "A3", "B4", "D G Bm A"],
  ["ferry", "D4", "E5", "G C Em D"],
] as const)("%s runs from %s to %s", (id, low, high, chords) => {
  const song = demoSongs.find((each) => each.id === id)!;
  const { lowMidi, highMidi } = tessitura(tuneOf(song).melody.notes)!;
  expect([noteName(lowMidi), noteName(highMidi)]).toEqual([low, high]);
  const used = new Set(chartTokens(parseChart(song.chart)).map((token) => token.text));
  expect([...used].sort()).toEqual(chords.split(" ").sort());
});

test("Lantern dwells, a whole tone lower, on E, C and G", () => {
  const notes = tuneOf(demoSongs[0]!).melody.notes;
  const longest = tessituragram(notes)
    .sort((a, b) => b.share - a.share)
    .slice(0, 3);
  expect(longest.map(({ midi }) => noteName(midi - 2)).sort()).toEqual(["C4", "E4", "G4"]);
});
