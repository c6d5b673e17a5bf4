import { aDecision, aSong } from "@/__tests__/client/belongings";
import { FakeApi } from "@/__tests__/client/fakeApi";
import { kept } from "@/__tests__/client/memoryIdb";
import { deviceShelf } from "./deviceShelf";
import { moveIn } from "./moveIn";
import { session } from "./session";
import { shelf } from "./shelf";
import { songVersions } from "./songVersions";

jest.mock("idb-keyval", () => jest.requireActual<{ memoryIdb: object }>("@/__tests__/client/memoryIdb").memoryIdb);

const minuteMs = 60_000;
let now = Date.UTC(2026, 2, 5, 18);

beforeEach(async () => {
  localStorage.clear();
  kept.clear();
  now = Date.UTC(2026, 2, 5, 18);
  jest.useFakeTimers({ now, doNotFake: ["setTimeout", "nextTick", "queueMicrotask", "setImmediate"] });
  new FakeApi().install();
  await session.settled();
});
afterEach(async () => {
  jest.useRealTimers();
  await session.signOut();
});

const later = (minutes: number) => jest.setSystemTime((now += minutes * minuteMs));
const titles = async (id: string) => (await songVersions.list(id)).map(({ title }) => title);

describe("on a visitor's device", () => {
  it("counts the revision up, and keeps the state before a change", async () => {
    const first = await shelf.put("songs", aSong({ title: "As it was", revision: 0 }));
    expect(first.revision).toBe(1);
    later(10);
    const second = await shelf.put("songs", { ...first, title: "As it is" });
    expect(second.revision).toBe(2);
    const [entry] = await songVersions.list(first.id);
    expect(entry).toEqual({ id: expect.any(String), savedAt: first.createdAt, by: "", title: "As it was" });
    expect((await songVersions.get(first.id, entry?.id ?? "")).song).toEqual(first);
    later(10);
    await shelf.put("songs", { ...second, title: "Third" });
    expect((await songVersions.list(first.id))[0]?.savedAt).toBe("2026-03-05T18:10:00.000Z");
  });

  it("tells the second of two tabs that the song was changed elsewhere; exactly one of five at once gets through", async () => {
    const song = await shelf.put("songs", aSong());
    const tries = await Promise.allSettled(
      [1, 2, 3, 4, 5].map((tab) => deviceShelf.put("songs", { ...song, title: `Tab ${tab}` })),
    );
    const refused = tries.filter(({ status }) => status === "rejected");
    expect(refused).toHaveLength(4);
    for (const one of refused)
      expect(one).toMatchObject({ reason: { status: 409, code: "changed-elsewhere", refused: true } });
    const winner = tries.find((one) => one.status === "fulfilled");
    expect(await shelf.get("songs", song.id)).toEqual(winner?.value);
  });

  it("takes the same content again for done, whichever revision it names", async () => {
    const song = await shelf.put("songs", aSong());
    const changed = await shelf.put("songs", { ...song, title: "Changed" });
    expect(await shelf.put("songs", { ...song, title: "Changed" })).toEqual(changed);
    expect(await titles(song.id)).toEqual([song.title]);
  });

  it("keeps one state of five minutes' work, none of a song that is played, and thirty in all", async () => {
    let song = await shelf.put("songs", aSong({ title: "0" }));
    for (const title of ["1", "2", "3"]) song = await shelf.put("songs", { ...song, title });
    song = await shelf.put("songs", { ...song, playedAt: "2026-03-05T18:30:00.000Z" }, { version: true });
    expect(await titles(song.id)).toEqual(["0"]);
    later(5);
    song = await shelf.put("songs", { ...song, title: "4" });
    expect(await titles(song.id)).toEqual(["3", "0"]);
    for (let k = 5; k < 40; k++) song = await shelf.put("songs", { ...song, title: String(k) }, { version: true });
    const all = await titles(song.id);
    expect([all.length, all[0], all.at(-1)]).toEqual([30, "38", "9"]);
  });

  it("restores an earlier state, and keeps the one before", async () => {
    const first = await shelf.put("songs", aSong({ title: "0" }));
    const second = await shelf.put("songs", { ...first, title: "1", playedAt: "2026-03-05T18:30:00.000Z" });
    const [entry] = await songVersions.list(first.id);
    const restored = await songVersions.restore(second, await songVersions.get(first.id, entry?.id ?? ""));
    expect(restored).toEqual({ ...first, playedAt: second.playedAt, revision: 3 });
    expect(await titles(first.id)).toEqual(["1", "0"]);
    await expect(songVersions.restore(second, { song: { ...first, title: "2" } })).rejects.toMatchObject({
      code: "changed-elsewhere",
    });
  });

  it("lets versions go with their song, whether it is removed or moves into an account", async () => {
    const [gone, moved] = [await shelf.put("songs", aSong()), await shelf.put("songs", aSong())];
    for (const song of [gone, moved]) await shelf.put("songs", { ...song, title: "Changed" });
    await shelf.put("decisions", aDecision(gone.id, null));
    await shelf.remove("songs", gone.id);
    await expect(songVersions.list(gone.id)).rejects.toMatchObject({ status: 404 });
    await expect(songVersions.get(moved.id, gone.id)).rejects.toMatchObject({ status: 404 });
    await session.signUp({ email: "maren@orlow.example", password: "tide tables 1907" });
    await moveIn.afterSignUp();
    expect([...kept.keys()]).toEqual([]);
  });

  it("completes songs that were kept before they had tags and revisions", async () => {
    const { tags: _tags, archivedAt: _aside, playedAt: _played, revision: _revision, ...old } = aSong();
    kept.set(`songs/${old.id}`, old);
    const song = await shelf.get("songs", old.id);
    expect(song).toEqual({ ...old, tags: [], archivedAt: null, playedAt: null, revision: 1 });
    expect(await shelf.list("songs")).toEqual([song]);
    expect((await shelf.put("songs", { ...song, tags: ["Waltz"] })).revision).toBe(2);
    kept.set(`songs/${old.id}`, old);
    expect(await deviceShelf.release("songs", song)).toBe(true);
  });
});

it("asks the server for those of the signed-in, and tells it of a restore", async () => {
  await session.signUp({ email: "maren@orlow.example", password: "tide tables 1907" });
  const first = await shelf.put("songs", aSong({ title: "0" }));
  const second = await shelf.put("songs", { ...first, title: "1" });
  const [entry] = await songVersions.list(first.id);
  expect(entry).toMatchObject({ title: "0", by: "maren@orlow.example" });
  const version = await songVersions.get(first.id, entry?.id ?? "");
  expect((await songVersions.restore(second, version)).title).toBe("0");
  await expect(shelf.put("songs", { ...second, title: "late" })).rejects.toMatchObject({ code: "changed-elsewhere" });
});
