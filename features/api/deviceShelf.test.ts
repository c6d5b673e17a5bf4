import { aDecision, anArrangement, aLineUp, aSong, aTake, aTry, aVoice } from "@/__tests__/client/belongings";
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

it("keeps one line-up for each song, and lets it go with the song", async () => {
  const song = aSong();
  await expect(deviceShelf.put("line-ups", aLineUp(song.id))).rejects.toMatchObject({ code: "unknown-reference" });
  await deviceShelf.put("songs", song);
  await deviceShelf.put("line-ups", aLineUp(song.id));
  const second = await deviceShelf.put("line-ups", aLineUp(song.id, { players: [] }));
  expect(await deviceShelf.list("line-ups")).toEqual([second]);
  await deviceShelf.remove("songs", song.id);
  expect(await deviceShelf.list("line-ups")).toEqual([]);
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

it("keeps tries, refuses those of nothing, and lets them go with their song or their voice", async () => {
  const [voice, song, other] = [aVoice(), aSong(), aSong()];
  await deviceShelf.put("voices", voice);
  await deviceShelf.put("songs", song);
  await deviceShelf.put("songs", other);
  await expect(deviceShelf.put("tries", aTry(aSong().id, null))).rejects.toMatchObject({ code: "unknown-reference" });
  await expect(deviceShelf.put("tries", aTry(song.id, aVoice().id))).rejects.toMatchObject({ status: 422 });
  const [sung, nobody] = [aTry(song.id, voice.id), aTry(other.id, null)];
  await deviceShelf.put("tries", sung);
  await deviceShelf.put("tries", aTry(other.id, voice.id));
  await deviceShelf.put("tries", nobody);
  await deviceShelf.put("tries", { ...sung, effort: 4 });
  expect(await deviceShelf.get("tries", sung.id)).toEqual({ ...sung, effort: 4 });
  await deviceShelf.remove("songs", song.id);
  expect(await deviceShelf.list("tries")).toHaveLength(2);
  await deviceShelf.remove("voices", voice.id);
  expect(await deviceShelf.list("tries")).toEqual([nobody]);
  await deviceShelf.remove("tries", nobody.id);
  expect(await deviceShelf.list("tries")).toEqual([]);
});

describe("decisions", () => {
  const on = (day: number) => ({ decidedAt: `2026-03-0${day}T18:30:00.000Z` });
  const told = async () =>
    (await deviceShelf.list("decisions"))
      .map(({ tonic, voiceId, earlier }) => ({ tonic, voiceId, earlier: earlier.map((each) => each.tonic) }))
      .sort((a, b) => a.tonic.localeCompare(b.tonic));
  const place = async () => {
    const [voice, song] = [aVoice(), aSong()];
    await deviceShelf.put("voices", voice);
    await deviceShelf.put("songs", song);
    return { voice, song };
  };

  it("are one for a song and voice: a new one takes the place and keeps what was before", async () => {
    const { voice, song } = await place();
    await deviceShelf.put("decisions", aDecision(song.id, voice.id, { tonic: "C", ...on(1) }));
    await deviceShelf.put("decisions", aDecision(song.id, null, { tonic: "F", ...on(2) }));
    const put = await deviceShelf.put("decisions", aDecision(song.id, voice.id, { tonic: "D", ...on(3) }));
    expect(put.earlier).toMatchObject([{ tonic: "C", decidedAt: on(1).decidedAt }]);
    expect(await told()).toEqual([
      { tonic: "D", voiceId: voice.id, earlier: ["C"] },
      { tonic: "F", voiceId: null, earlier: [] },
    ]);
  });

  it("keep what another tab decided meanwhile, and go back where they are taken back", async () => {
    const { song } = await place();
    const first = await deviceShelf.put("decisions", aDecision(song.id, null, { tonic: "C", ...on(1) }));
    const { id: _id, songId: _songId, voiceId: _voiceId, earlier: _earlier, ...before } = first;
    await deviceShelf.put("decisions", { ...first, tonic: "D", ...on(2), earlier: [before] });
    await deviceShelf.put("decisions", { ...first, tonic: "E", ...on(3), earlier: [before] });
    expect(await told()).toEqual([{ tonic: "E", voiceId: null, earlier: ["D", "C"] }]);
    await deviceShelf.put("decisions", first);
    expect(await told()).toEqual([{ tonic: "C", voiceId: null, earlier: [] }]);
  });

  it("of two tabs at the same time are both kept, one as the history of the other", async () => {
    const { song } = await place();
    await Promise.all([
      deviceShelf.put("decisions", aDecision(song.id, null, { tonic: "C", ...on(1) })),
      deviceShelf.put("decisions", aDecision(song.id, null, { tonic: "D", ...on(2) })),
    ]);
    expect(await told()).toEqual([{ tonic: "D", voiceId: null, earlier: ["C"] }]);
  });

  it("of a voice that goes become everybody's, except where a song has one for everybody", async () => {
    const { voice, song } = await place();
    const other = aSong();
    await deviceShelf.put("songs", other);
    await deviceShelf.put("decisions", aDecision(song.id, voice.id, { tonic: "C", ...on(1) }));
    await deviceShelf.put("decisions", aDecision(song.id, voice.id, { tonic: "D", ...on(2) }));
    await deviceShelf.put("decisions", aDecision(other.id, null, { tonic: "E", ...on(1) }));
    await deviceShelf.put("decisions", aDecision(other.id, voice.id, { tonic: "F", ...on(2) }));
    await deviceShelf.remove("voices", voice.id);
    expect(await told()).toEqual([
      { tonic: "D", voiceId: null, earlier: ["C"] },
      { tonic: "E", voiceId: null, earlier: [] },
    ]);
  });

  it("kept before there was a history have an empty one", async () => {
    const { song } = await place();
    const { earlier: _earlier, ...old } = aDecision(song.id, null);
    kept.set(`decisions/${old.id}`, old);
    expect(await deviceShelf.get("decisions", old.id)).toEqual({ ...old, earlier: [] });
  });
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

it("keeps arrangements of a song that is here, and lets them go with it", async () => {
  const [song, other] = [aSong(), aSong()];
  await expect(deviceShelf.put("arrangements", anArrangement(song.id))).rejects.toMatchObject({ status: 422 });
  await deviceShelf.put("songs", song);
  await deviceShelf.put("songs", other);
  const stays = anArrangement(other.id);
  await deviceShelf.put("arrangements", anArrangement(song.id));
  await deviceShelf.put("arrangements", stays);
  await deviceShelf.remove("songs", song.id);
  expect(await deviceShelf.list("arrangements")).toEqual([stays]);
});
