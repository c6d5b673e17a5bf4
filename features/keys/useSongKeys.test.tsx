import { QueryClientProvider } from "@tanstack/react-query";
import { act, renderHook, waitFor } from "@testing-library/react";
import { aDecision, aLineUp, aSong, aVoice } from "@/__tests__/client/belongings";
import { kept, refuseStorage } from "@/__tests__/client/memoryIdb";
import { queryClient } from "@/features/api/queryClient";
import { shelf } from "@/features/api/shelf";
import { decidedHere, decidedWords, keyInView, useSongKeys } from "./useSongKeys";

jest.mock("idb-keyval", () => jest.requireActual<{ memoryIdb: object }>("@/__tests__/client/memoryIdb").memoryIdb);

const song = aSong({ tune: { kind: "span", lowMidi: 57, highMidi: 71, home: "D" } });
const voice = aVoice();
const other = aVoice({ name: "Mornings" });
const singing = { range: { lowMidi: 51, highMidi: 74 }, comfort: { lowMidi: 55, highMidi: 70 } };

const evenings = { voice, voices: [voice, other], forKeys: singing };

beforeEach(async () => {
  kept.clear();
  localStorage.clear();
  refuseStorage(null);
  queryClient.clear();
  await shelf.put("songs", song);
  await shelf.put("voices", voice);
});

function open(singer: Parameters<typeof useSongKeys>[1]) {
  const wrapper = ({ children }: { children: React.ReactNode }) => (
    <QueryClientProvider client={queryClient}>{children}</QueryClientProvider>
  );
  return renderHook(() => useSongKeys(song, singer), { wrapper }).result;
}

test("a taken key is kept with why and by which voice; the next one takes its place", async () => {
  const keys = open(evenings);
  act(() => keys.current.take({ tonic: "C", shift: -2, instrument: "guitar", way: null }));
  await waitFor(() => expect(keys.current.decision?.tonic).toBe("C"));
  const first = keys.current.decision!;
  const row = keys.current.rows?.find((each) => each.shift === -2);
  expect(first).toMatchObject({ songId: song.id, voiceId: voice.id, score: row?.score });
  expect(first.reason).toBe(`${row?.reason} Judged by the span alone.`);
  act(() =>
    keys.current.take({ tonic: "Bb", shift: -4, instrument: "guitar", way: { retune: 0, capo: 3, shapeKey: "G" } }),
  );
  await waitFor(() => expect(keys.current.decision?.tonic).toBe("Bb"));
  expect(await shelf.list("decisions")).toHaveLength(1);
  expect(keys.current.decision?.id).toBe(first.id);
  expect(keyInView(keys.current, null)).toMatchObject({ shift: -4, key: { tonic: "Bb", mode: "major" } });
});

test("undo takes the decision away, and the best key is in hand again", async () => {
  const keys = open(evenings);
  act(() => keys.current.take({ tonic: "G", shift: 5, instrument: null, way: null }));
  await waitFor(() => expect(keys.current.inHand?.because).toBe("decided"));
  act(() => keys.current.undo());
  await waitFor(() => expect(keys.current.inHand?.because).toBe("best"));
  expect(await shelf.list("decisions")).toEqual([]);
});

test("a key may be taken without a voice, and says that nobody judged it", async () => {
  const keys = open({ voice: null, voices: [], forKeys: null });
  act(() => keys.current.take({ tonic: "C", shift: -2, instrument: null, way: null }));
  await waitFor(() => expect(keys.current.decision).not.toBeNull());
  expect(keys.current.decision).toMatchObject({ voiceId: null, score: null });
  expect(keys.current.decision?.reason).toMatch(/without a voice/);
});

test("a key that cannot be kept is told, and nothing is taken", async () => {
  const keys = open(evenings);
  refuseStorage(new DOMException("full", "QuotaExceededError"));
  act(() => keys.current.take({ tonic: "C", shift: -2, instrument: null, way: null }));
  await waitFor(() => expect(keys.current.error?.message).toMatch(/no room left/));
  expect(keys.current.decision).toBeNull();
});

test("what was decided with another voice is shown as that voice's, and the best for this one is in hand", async () => {
  const mine = open(evenings);
  const { shift, key, sign } = mine.current.rows![3]!;
  act(() => mine.current.take({ tonic: key.tonic, shift, instrument: null, way: null }));
  await waitFor(() => expect(mine.current.decided).toEqual({ sign, otherVoice: null }));
  expect(decidedWords(mine.current, shift)).toBe("my key");
  const theirs = open({ ...evenings, voice: other });
  await waitFor(() => expect(theirs.current.decision).not.toBeNull());
  expect(theirs.current.decided).toEqual({ sign, otherVoice: "Maren" });
  expect(theirs.current.inHand).toMatchObject({ because: "best", shift: theirs.current.rows?.[0]?.shift });
  expect(decidedHere(theirs.current, shift)).toBeNull();
  expect(decidedWords(theirs.current, shift)).toBe("decided for Maren");
  expect(decidedWords(theirs.current, shift + 1)).toBeNull();
  expect(keyInView(theirs.current, shift).decision).toBeNull();
});

test("a decision made without a voice holds for every voice", async () => {
  const nobody = open({ voice: null, voices: [], forKeys: null });
  act(() => nobody.current.take({ tonic: "G", shift: 5, instrument: null, way: null }));
  await waitFor(() => expect(nobody.current.decision).not.toBeNull());
  const mine = open(evenings);
  await waitFor(() => expect(mine.current.inHand?.because).toBe("decided"));
});

test("a group's key in another octave is the same key", async () => {
  await shelf.put("decisions", aDecision(song.id, null, { tonic: "C", shift: 10 }));
  const keys = open(evenings);
  await waitFor(() => expect(keys.current.inHand?.because).toBe("decided"));
  const row = keys.current.rows!.find(({ key }) => key.tonic === "C")!;
  expect(row.shift).toBe(-2);
  expect(decidedWords(keys.current, row.shift)).toBe("my key");
  expect(keyInView(keys.current, null).decision).toMatchObject({ tonic: "C", voiceId: null });
  expect(decidedHere(keys.current, row.shift + 6)).toBeNull();
});

test("a voice's own key is added to the group's, and does not take its place", async () => {
  const group = await shelf.put("decisions", aDecision(song.id, null, { tonic: "G", shift: 5 }));
  const keys = open(evenings);
  await waitFor(() => expect(keys.current.decision).toEqual(group));
  act(() => keys.current.take({ tonic: "C", shift: -2, instrument: null, way: null }));
  await waitFor(() => expect(keys.current.decision).toMatchObject({ tonic: "C", voiceId: voice.id, earlier: [] }));
  expect(await shelf.list("decisions")).toHaveLength(2);
  expect(keys.current.history?.others).toMatchObject([{ key: { tonic: "G" }, voice: null }]);
});

test("where no key holds the tune that is said, and none is called the best", () => {
  const narrow = { range: { lowMidi: 57, highMidi: 64 }, comfort: { lowMidi: 58, highMidi: 62 } };
  const keys = open({ ...evenings, forKeys: narrow });
  expect(keys.current.noFit).toMatch(/^No key holds the whole tune; /);
  expect(keys.current.inHand?.because).toBe("nearest");
  expect(open(evenings).current.noFit).toBeNull();
});

test("a whistle in the line-up brings the keys that it plays to the front, and each row says whether it fits", async () => {
  const keys = open(evenings);
  await waitFor(() => expect(keys.current.rows).not.toBeNull());
  const before = keys.current.rows!;
  expect(before.some(({ reason }) => reason.includes("whistle"))).toBe(false);
  await shelf.put("line-ups", aLineUp(song.id));
  await act(() => queryClient.invalidateQueries({ queryKey: ["line-ups"] }));
  await waitFor(() => expect(keys.current.fixed).toHaveLength(1));
  const rows = keys.current.rows!;
  const inside = rows.filter(({ beyond }) => !beyond);
  const fitting = inside.filter(({ key }) => ["D", "G"].includes(key.tonic)).length;
  expect(fitting).toBeGreaterThan(0);
  inside.forEach(({ key, reason }, place) => {
    expect([key.tonic, ["D", "G"].includes(key.tonic)]).toEqual([key.tonic, place < fitting]);
    expect(reason).toMatch(place < fitting ? /^Fits the whistle in D\. / : /^Does not fit the whistle in D\. /);
  });
  expect(keys.current.inHand?.row).toBe(rows[0]);
});
