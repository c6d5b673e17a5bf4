import type { SongListing } from "@/shared/contract/songListing";
import { inFitOrder, inKeyOrder, listingWords, playedWords, shownKey, spanWords, sungSpan } from "./shelfRow";

const listing = (change: Partial<SongListing> = {}): SongListing => ({
  id: "1",
  title: "Gulls",
  writtenKey: { tonic: "D", mode: "major" },
  beatsPerBar: 4,
  tempo: null,
  demo: null,
  tags: [],
  archivedAt: null,
  playedAt: null,
  createdAt: "2026-03-05T19:00:00.000Z",
  revision: 1,
  span: { lowMidi: 57, highMidi: 71, home: "D" },
  firstWords: "",
  ...change,
});
const voice = { range: { lowMidi: 52, highMidi: 70 }, comfort: { lowMidi: 55, highMidi: 66 } };
const mine = { key: { tonic: "C", mode: "major" } as const, shift: -2, words: "My key", elsewhere: false };

test("a span is shown in the key decided with this voice, else as written", () => {
  const written = sungSpan(listing(), null, voice)!;
  expect(spanWords(written, { tonic: "D", mode: "major" })).toBe("A3 to B4, goes above your range");
  const moved = sungSpan(listing(), mine, voice)!;
  expect(spanWords(moved, mine.key)).toBe("G3 to A4, within your reach");
  expect(sungSpan(listing(), { ...mine, elsewhere: true }, voice)).toEqual(written);
  expect(sungSpan(listing({ span: null }), mine, voice)).toBeNull();
});

test("ends beyond, at either side and at both", () => {
  const words = (lowMidi: number, highMidi: number) =>
    spanWords(sungSpan(listing({ span: { lowMidi, highMidi, home: "F" } }), null, voice)!, {
      tonic: "F",
      mode: "major",
    });
  expect(words(50, 60)).toBe("D3 to C4, goes below your range");
  expect(words(46, 75)).toBe("B♭2 to E♭5, leaves your range at both ends");
  expect(words(57, 65)).toBe("A3 to F4, all of it comfortable");
});

test("the key shown: decided, written, or the home note of the tune", () => {
  expect(shownKey(listing(), mine)?.tonic).toBe("C");
  expect(shownKey(listing(), null)?.tonic).toBe("D");
  expect(shownKey(listing({ writtenKey: null }), null)).toEqual({ tonic: "D", mode: "major" });
  expect(shownKey(listing({ writtenKey: null, span: null }), null)).toBeNull();
});

test("what a row says", () => {
  expect(listingWords(listing({ writtenKey: { tonic: "Bb", mode: "minor" }, span: null }))).toBe(
    "Written in B♭m, no melody yet.",
  );
  expect(listingWords(listing({ writtenKey: null, demo: "ferry" }))).toBe("Home note D, a song to try Larkspan with.");
});

test("when it was played, as one says it", () => {
  const now = new Date(2026, 5, 10, 9);
  const at = (...date: [number, number, number, number]) => new Date(...date).toISOString();
  expect(playedWords(null, now)).toBe("");
  expect(playedWords(at(2026, 5, 10, 0), now)).toBe("today");
  expect(playedWords(at(2026, 5, 9, 23), now)).toBe("yesterday");
  expect(playedWords(at(2026, 4, 3, 12), now)).toBe("3 May");
  expect(playedWords(at(2024, 4, 3, 12), now)).toBe("3 May 2024");
});

test("by key from A upwards, major first, and songs without a key last", () => {
  const keyed = (tonic: string, mode: "major" | "minor" = "major") => listing({ writtenKey: { tonic, mode } });
  const songs = [listing({ writtenKey: null }), keyed("G#"), keyed("C", "minor"), keyed("C"), keyed("A"), keyed("Bb")];
  const keys = inKeyOrder(songs, (song) => song.writtenKey).map(
    ({ writtenKey: key }) => key && key.tonic + key.mode[1],
  );
  expect(keys).toEqual(["Aa", "Bba", "Ca", "Ci", "G#a", null]);
});

test("by fit the best first, and songs without a tune last", () => {
  const songs = ["60", "none", "80"].map((id) => listing({ id }));
  expect(inFitOrder(songs, ({ id }) => (id === "none" ? null : Number(id))).map(({ id }) => id)).toEqual([
    "80",
    "60",
    "none",
  ]);
});
