import { chordPitchClasses } from "../music/chord";
import { noteName, pitchClass } from "../music/pitch";
import { type ChartLine, chartTokens, parseChart, printChart } from "./chart";
import type { DemoSong } from "./demo/demoSong";
import { demoSongs } from "./demoSongs";
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
    for (const evidence of [{ chart: parseChart(song.chart) }, { notes }, { chart: parseChart(song.chart), notes }])
      expect(findKey(evidence)).toMatchObject({ key: song.writtenKey });
    expect(melody).toMatchObject({ home: song.writtenKey.tonic, mode: song.writtenKey.mode });
    expect(noteName(notes.at(-1)!.midi, "flats").slice(0, -1)).toBe(song.writtenKey.tonic);
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

  test("fills whole bars of its metre at its tempo", () => {
    const end = melody.notes.at(-1)!;
    expect(Math.ceil((end.start + end.duration) / song.barLength) % 8).toBe(0);
    expect(readMelodyFile("a.abc", new TextEncoder().encode(song.abc))).toMatchObject({
      tempo: song.tempo,
      beatsPerBar: song.beatsPerBar,
    });
  });

  test("sings a tone of the chord wherever a chord enters, and on nearly every strong beat", () => {
    let offset = 0;
    const syllables = lyrics.map(({ text }, index) => {
      offset += words(text).length;
      return { end: offset, note: melody.notes[index]! };
    });
    const changes: { at: number; tones: number[] }[] = [];
    let lineStart = 0;
    for (const line of sung(song).filter(({ label }) => label === "Verse 1" || label === "Chorus")) {
      for (const { column, chord } of line.chords) {
        const letter = lineStart + words(line.lyrics.slice(0, column)).length;
        const { note } = syllables.find(({ end }) => end > letter)!;
        changes.push({ at: note.start, tones: chordPitchClasses(chord!) });
        expect([line.lyrics, column, chordPitchClasses(chord!)]).toEqual([
          line.lyrics,
          column,
          expect.arrayContaining([pitchClass(note.midi)]),
        ]);
      }
      lineStart += words(line.lyrics).length;
    }
    expect(lineStart).toBe(offset);
    const half = song.barLength === 4 ? 2 : song.beatsPerBar === 6 ? 1.5 : song.barLength;
    const strong = melody.notes.filter(({ start }) => Number.isInteger(start / half));
    const fitting = strong.filter(({ start, midi }) =>
      changes.findLast(({ at }) => at <= start)?.tones.includes(pitchClass(midi)),
    );
    expect(fitting.length / strong.length).toBeGreaterThan(0.85);
  });
});

test("there are a dozen, in many keys, modes and metres, and each has three verses or two and a chorus", () => {
  const facts = (fact: (song: DemoSong) => unknown) => new Set(demoSongs.map(fact));
  expect(facts(({ id }) => id).size).toBe(12);
  expect(facts(({ title }) => title).size).toBe(12);
  expect(facts(({ writtenKey }) => `${writtenKey.tonic} ${writtenKey.mode}`).size).toBe(12);
  expect(facts(({ writtenKey }) => writtenKey.mode)).toEqual(new Set(["major", "minor", "dorian", "mixolydian"]));
  expect(facts(({ beatsPerBar }) => beatsPerBar)).toEqual(new Set([3, 4, 6]));
  expect(facts(({ notes }) => notes.length).size).toBeGreaterThan(6);
  for (const song of demoSongs)
    expect(parseChart(song.chart).sections.filter(({ recalls }) => recalls === null).length).toBeGreaterThan(2);
});

test.each(demoSongs.map((song) => [song.title, song] as const))("%s can be sung by an ordinary voice", (_, song) => {
  const { lowMidi, highMidi } = tessitura(song.notes)!;
  expect(highMidi - lowMidi).toBeGreaterThanOrEqual(7);
  expect(highMidi - lowMidi).toBeLessThanOrEqual(16);
  const leaps = song.notes.map(({ midi }, index) => Math.abs(midi - (song.notes[index - 1]?.midi ?? midi)));
  expect(Math.max(...leaps)).toBeLessThanOrEqual(12);
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
