import fc from "fast-check";
import { aSong } from "@/__tests__/client/belongings";
import { song as contract, type Song } from "@/shared/contract/song";
import { readSongsFile, writeSongsFile } from "./songsFile";

const tonic = fc.constantFrom("C", "F#", "Bb", "E");
const instant = fc
  .date({ min: new Date("2020-01-01"), max: new Date("2030-01-01"), noInvalidDate: true })
  .map((date) => date.toISOString());
const note = fc.record(
  {
    start: fc.integer({ min: 0, max: 4000 }).map((eighths) => eighths / 8),
    duration: fc.integer({ min: 1, max: 64 }).map((eighths) => eighths / 8),
    midi: fc.integer({ min: 0, max: 127 }),
    lyric: fc.string({ maxLength: 20 }),
  },
  { requiredKeys: ["start", "duration", "midi"] },
);
const tune = fc.oneof(
  fc.constant(null),
  fc.record({
    kind: fc.constant("melody" as const),
    notes: fc.array(note, { minLength: 1, maxLength: 30 }),
    home: tonic,
  }),
  fc.record({
    kind: fc.constant("span" as const),
    lowMidi: fc.integer({ min: 30, max: 60 }),
    highMidi: fc.integer({ min: 60, max: 90 }),
    home: tonic,
  }),
);
const anySong = fc
  .record({
    title: fc
      .string({ minLength: 1, maxLength: 80, unit: "grapheme" })
      .map((text) => text.trim())
      .filter((text) => text !== "" && text.length <= 200),
    chart: fc.string({ maxLength: 400, unit: "grapheme" }),
    writtenKey: fc.option(
      fc.record({ tonic, mode: fc.constantFrom("major" as const, "minor" as const, "dorian" as const) }),
    ),
    tune,
    beatsPerBar: fc.option(fc.integer({ min: 1, max: 16 })),
    tempo: fc.option(fc.integer({ min: 20, max: 400 })),
    tags: fc.uniqueArray(fc.stringMatching(/^[a-z]{1,12}$/), { maxLength: 20 }),
    archivedAt: fc.option(instant),
    playedAt: fc.option(instant),
    createdAt: instant,
  })
  .map((content) => aSong(content as Partial<Song>));

test("what is exported comes back the same, with tune, tags and dates", () => {
  fc.assert(
    fc.property(fc.array(anySong, { minLength: 1, maxLength: 6 }), (songs) => {
      songs.forEach((song) => contract.parse(song));
      const read = readSongsFile(writeSongsFile(songs));
      const back = read.ok ? read.songs.map((each) => each.ok && each.song) : read.reason;
      expect(back).toEqual(songs.map(({ id: _id, demo: _demo, revision: _revision, ...content }) => content));
    }),
    { numRuns: 200 },
  );
});

test.each([
  ["{ cut", "This is no whole JSON file; it may have been cut off."],
  ["[1, 2]", "This JSON file holds no songs of Larkspan."],
  [
    '{"format":"larkspan-songs","version":2,"songs":[{}]}',
    "This file comes from a newer Larkspan. Reload the page and try again.",
  ],
  ['{"format":"larkspan-songs","version":1,"songs":[]}', "This file holds no songs."],
])("%s is refused with its reason", (text, reason) => {
  expect(readSongsFile(text)).toEqual({ ok: false, reason });
});

test("a bad song does not cost the good one beside it", () => {
  const file = JSON.parse(writeSongsFile([aSong({ title: "Gulls" }), aSong({ title: "Slack Water" })])) as {
    songs: { tempo: unknown }[];
  };
  file.songs[0]!.tempo = "fast";
  const read = readSongsFile(JSON.stringify(file));
  expect(read.ok && read.songs).toEqual([
    { ok: false, title: "Gulls", reason: "It does not hold what a song needs (tempo)." },
    { ok: true, song: expect.objectContaining({ title: "Slack Water" }) as unknown },
  ]);
});
