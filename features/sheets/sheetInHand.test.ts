import { chordsOf } from "./sheetInHand";

const song = { writtenKey: { tonic: "D", mode: "major" as const }, tune: null };

test("a shared song is played by the very chords its owner's ways were found for: each once, and as they follow", () => {
  const chart = "Verse\nD       G     D\nTide in, tide out\n\nChorus\nA    D\nHaul her\n\nVerse\n";
  expect(chordsOf({ ...song, chart })).toEqual({
    chords: ["D", "G", "A"],
    sequence: ["D", "G", "D", "A", "D", "D", "G", "D"],
    from: song.writtenKey,
  });
});

test("a song without chords or without a key has none to play", () => {
  expect(chordsOf({ ...song, chart: "Words alone" })).toBeNull();
  expect(chordsOf({ chart: "D G\nla la", writtenKey: null, tune: null })).toBeNull();
});
