import { aSong } from "@/__tests__/client/belongings";
import { scoreKeys } from "@/shared/keys/scoreKeys";
import type { SongListing } from "@/shared/contract/songListing";
import type { Song } from "@/shared/contract/song";
import { fitOf, judgeByNotes } from "./shelfFits";

const voice = { range: { lowMidi: 50, highMidi: 70 }, comfort: { lowMidi: 54, highMidi: 66 } };
const notes = (...midis: number[]) => midis.map((midi, index) => ({ start: index, duration: 1, midi }));
const melody = (...midis: number[]) => ({ kind: "melody" as const, notes: notes(...midis), home: "C" });
const listed = ({ tune, chart: _chart, ...song }: Song): SongListing => {
  const midis = tune?.kind === "melody" ? tune.notes.map(({ midi }) => midi) : [];
  const span = tune && { lowMidi: Math.min(...midis), highMidi: Math.max(...midis), home: tune.home };
  return { ...song, span, firstWords: "" };
};

test("a song without a tune has no fit; a narrow one fits better than a wide one", () => {
  expect(fitOf(listed(aSong()), voice)).toBeNull();
  const narrow = fitOf(listed(aSong({ tune: melody(60, 64, 67) })), voice)!;
  const wide = fitOf(listed(aSong({ tune: melody(50, 64, 81) })), voice)!;
  expect(narrow).toBeGreaterThan(wide);
});

test("once the notes are read the fit is the score of the best key, and is kept", async () => {
  const song = aSong({ tune: melody(57, 57, 59, 74) });
  expect(await judgeByNotes([song, aSong()], voice, new AbortController().signal)).toBe(true);
  expect(fitOf(listed(song), voice)).toBe(Math.round(scoreKeys(song.tune!, voice)[0]!.score));
  expect(fitOf(listed({ ...song, revision: song.revision + 1 }), voice)).toBe(
    fitOf(listed(aSong({ tune: { kind: "melody", notes: notes(50, 67), home: "C" } })), voice),
  );
});

test("it stops when it is told", async () => {
  const stop = new AbortController();
  stop.abort();
  expect(await judgeByNotes([aSong({ tune: melody(60) })], voice, stop.signal)).toBe(false);
});
