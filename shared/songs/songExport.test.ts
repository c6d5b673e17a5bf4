import fc from "fast-check";
import { parseKeyName } from "../music/keyName";
import { readSongText, songText, titleOfFile, type TextSong } from "./songExport";

const song: TextSong = {
  title: "Lantern on the Slipway",
  chart: "Verse 1\nD     G    D\nLantern on the slipway\n\nChorus\nG   D\nHold up",
  writtenKey: { tonic: "D", mode: "major" },
  beatsPerBar: 4,
  tempo: 84,
};

test("a song written as text reads as it was", () => {
  expect(readSongText(songText(song), "x.txt")).toEqual(song);
});

test("so does any song, whatever its chart holds", () => {
  const keys = ["C", "F#m", "Bb", "Ebm", "D dorian"].map((text) => parseKeyName(text));
  fc.assert(
    fc.property(
      fc.record({
        title: fc.string({ minLength: 1, maxLength: 60, unit: "grapheme" }).filter((text) => text.trim() !== ""),
        chart: fc
          .array(fc.constantFrom("", "D  A", "Key: D", "low water", "  Em", "Title: x", "Chorus"))
          .map((lines) => lines.join("\n")),
        writtenKey: fc.constantFrom(null, ...keys),
        beatsPerBar: fc.option(fc.integer({ min: 1, max: 16 })),
        tempo: fc.option(fc.integer({ min: 20, max: 400 })),
      }),
      (any) => {
        const title = any.title.replace(/\s+/g, " ").trim();
        expect(readSongText(songText(any), "x.txt")).toEqual({ ...any, title });
      },
    ),
    { numRuns: 300 },
  );
});

test.each([
  ["a first line that stands alone", "Slack Water\n\nD  A\nlow tide", "Slack Water", "D  A\nlow tide"],
  ["an underlined one", "Slack Water\n===========\nD  A\nlow tide", "Slack Water", "D  A\nlow tide"],
  ["one before the heading of a part", "Slack Water\nVerse\nD  A\nlow tide", "Slack Water", "Verse\nD  A\nlow tide"],
  ["the name of the file, where chords come first", "D  A\nlow tide", "old net", "D  A\nlow tide"],
  ["the name of the file, where the words begin at once", "low tide\nhigh tide", "old net", "low tide\nhigh tide"],
  ["the name of the file, where there is one line only", "low tide", "old net", "low tide"],
  ["nothing at all", "\n \n", "old net", ""],
])("title from %s", (_, text, title, chart) => {
  expect(readSongText(text, "old_net.txt")).toMatchObject({ title, chart });
});

test("a head that cannot be read stays in the chart", () => {
  const read = readSongText("Title: Gulls\nKey: as you like\nD A", "x.txt");
  expect(read).toMatchObject({ title: "Gulls", writtenKey: null, chart: "Key: as you like\nD A" });
});

test("titles from names of files", () => {
  expect(titleOfFile("songs/old/Bell_Buoy  Waltz.musicxml")).toBe("Bell Buoy Waltz");
  expect(titleOfFile(".txt")).toBe("A song without a name");
});
