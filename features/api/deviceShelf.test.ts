import { aDecision, aSong, aTake, aVoice } from "@/__tests__/client/belongings";
import { kept, refuseStorage } from "@/__tests__/client/memoryIdb";
import { deviceShelf } from "./deviceShelf";

jest.mock("idb-keyval", () => jest.requireActual<{ memoryIdb: object }>("@/__tests__/client/memoryIdb").memoryIdb);

beforeEach(() => {
  kept.clear();
  refuseStorage(null);
});

it("gives back what was put, and lists each collection by itself", async () => {
  const voice = aVoice();
  const song = aSong();
  await deviceShelf.put("voices", voice);
  await deviceShelf.put("songs", song);
  expect(await deviceShelf.get("voices", voice.id)).toEqual(voice);
  expect(await deviceShelf.list("songs")).toEqual([song]);
  expect(await deviceShelf.list("takes")).toEqual([]);
});

it("replaces by id, without touching what another tab put meanwhile", async () => {
  const [mine, theirs] = [aSong(), aSong()];
  await deviceShelf.put("songs", mine);
  await Promise.all([deviceShelf.put("songs", { ...mine, title: "Second draft" }), deviceShelf.put("songs", theirs)]);
  expect((await deviceShelf.list("songs")).map((song) => song.title).sort()).toEqual(
    ["Second draft", theirs.title].sort(),
  );
});

it("rejects with not-found for what is not there, and removes it without complaint", async () => {
  await expect(deviceShelf.get("songs", aSong().id)).rejects.toMatchObject({ status: 404, code: "not-found" });
  await expect(deviceShelf.remove("songs", aSong().id)).resolves.toBeUndefined();
});

it("refuses references that lead nowhere, like the server", async () => {
  await expect(deviceShelf.put("takes", aTake(aVoice().id))).rejects.toMatchObject({
    status: 422,
    code: "unknown-reference",
  });
  await expect(deviceShelf.put("decisions", aDecision(aSong().id, null))).rejects.toMatchObject({
    code: "unknown-reference",
  });
});

it("removes takes with their voice and decisions with their song", async () => {
  const [voice, song, other] = [aVoice(), aSong(), aSong()];
  await deviceShelf.put("voices", voice);
  await deviceShelf.put("songs", song);
  await deviceShelf.put("songs", other);
  await deviceShelf.put("takes", aTake(voice.id));
  const stays = aDecision(other.id, voice.id);
  await deviceShelf.put("decisions", aDecision(song.id, voice.id));
  await deviceShelf.put("decisions", stays);
  await deviceShelf.remove("songs", song.id);
  expect(await deviceShelf.list("decisions")).toEqual([stays]);
  await deviceShelf.remove("voices", voice.id);
  expect(await deviceShelf.list("takes")).toEqual([]);
  expect(await deviceShelf.list("decisions")).toEqual([{ ...stays, voiceId: null }]);
});

it("does not let go of an item that was changed since it was read", async () => {
  const song = aSong();
  await deviceShelf.put("songs", song);
  const changed = await deviceShelf.put("songs", { ...song, title: "Changed in another tab" });
  expect(await deviceShelf.release("songs", song)).toBe(false);
  expect(await deviceShelf.list("songs")).toHaveLength(1);
  expect(await deviceShelf.release("songs", changed)).toBe(true);
  expect(await deviceShelf.list("songs")).toEqual([]);
});

it("knows a demonstration song as it came from one that was worked on", async () => {
  const seeded = aSong({ demo: "ferry" });
  await deviceShelf.put("songs", seeded);
  expect(await deviceShelf.isAsSeeded(seeded)).toBe(true);
  expect(await deviceShelf.isAsSeeded({ ...seeded, tempo: 63 })).toBe(false);
  expect(await deviceShelf.isAsSeeded({ ...seeded, playedAt: "2026-03-06T18:30:00.000Z", revision: 2 })).toBe(true);
  const copy = aSong({ demo: "ferry", title: "My ferry" });
  await deviceShelf.put("songs", copy);
  expect(await deviceShelf.isAsSeeded(copy)).toBe(false);
  expect(await deviceShelf.isAsSeeded(aSong())).toBe(false);
});

it("says in words that the browser keeps nothing, and that the device is full", async () => {
  refuseStorage(new DOMException("denied", "SecurityError"));
  await expect(deviceShelf.list("songs")).rejects.toMatchObject({
    code: "no-storage",
    message: expect.stringMatching(/private window/),
  });
  refuseStorage(new DOMException("full", "QuotaExceededError"));
  await expect(deviceShelf.put("voices", aVoice())).rejects.toMatchObject({ code: "device-full" });
});
