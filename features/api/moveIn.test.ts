import { aDecision, anInstrument, aSong, aTake, aVoice } from "@/__tests__/client/belongings";
import { FakeApi } from "@/__tests__/client/fakeApi";
import { kept, refuseStorage } from "@/__tests__/client/memoryIdb";
import { countBelongings } from "./belongings";
import { deviceShelf } from "./deviceShelf";
import { moveIn } from "./moveIn";
import { session } from "./session";
import { shelf } from "./shelf";
import { songVersions } from "./songVersions";

jest.mock("idb-keyval", () => jest.requireActual<{ memoryIdb: object }>("@/__tests__/client/memoryIdb").memoryIdb);

const credentials = { email: "maren@orlow.example", password: "tide tables 1907" };
let api: FakeApi;

beforeEach(async () => {
  localStorage.clear();
  kept.clear();
  refuseStorage(null);
  api = new FakeApi();
  api.install();
  await session.settled();
});

afterEach(async () => {
  api.intercept = () => undefined;
  await session.signOut();
});

async function singAndDecide() {
  const [voice, song, instrument] = [aVoice(), aSong(), anInstrument()];
  const [take, decision] = [aTake(voice.id), aDecision(song.id, voice.id)];
  await shelf.put("voices", voice);
  await shelf.put("songs", song);
  await shelf.put("takes", take);
  await shelf.put("decisions", decision);
  await shelf.put("instruments", instrument);
  return { voice, song, take, decision, instrument };
}

const puts = () => api.calls.filter((call) => call.startsWith("PUT"));
const onDevice = () => [...kept.keys()].filter((key) => !/^(seeded|history)\//.test(key));

it("moves everything in an order in which parents come first, and empties the device", async () => {
  const { voice, song, take, decision, instrument } = await singAndDecide();
  await session.signUp(credentials);
  expect(await moveIn.afterSignUp()).toMatchObject({ status: "done", moved: 5, total: 5, stayed: [] });
  expect(puts()).toEqual([
    `PUT /voices/${voice.id}`,
    `PUT /takes/${take.id}`,
    `PUT /songs/${song.id}`,
    `PUT /decisions/${decision.id}`,
    `PUT /instruments/${instrument.id}`,
  ]);
  expect(onDevice()).toEqual([]);
  expect(await shelf.list("takes")).toEqual([take]);
  expect(await shelf.get("decisions", decision.id)).toEqual(decision);
});

it("keeps on the device what was not acknowledged, and finishes at the next start", async () => {
  const { take, song, decision, instrument } = await singAndDecide();
  await session.signUp(credentials);
  api.intercept = (_, path) => (path.startsWith("/songs") ? "down" : undefined);
  expect(await moveIn.afterSignUp()).toMatchObject({ status: "stopped", moved: 2, total: 5 });
  expect(onDevice().sort()).toEqual(
    [`songs/${song.id}`, `decisions/${decision.id}`, `instruments/${instrument.id}`].sort(),
  );

  api.intercept = () => undefined;
  expect(await moveIn.resume()).toMatchObject({ status: "done", moved: 3, total: 3 });
  expect(onDevice()).toEqual([]);
  expect(api.count(`PUT /takes/${take.id}`)).toBe(1);
});

it("repeats a request whose acknowledgement was lost, and nothing is there twice", async () => {
  const { song } = await singAndDecide();
  await session.signUp(credentials);
  const owner = session.current().account?.id ?? "";
  api.intercept = (method, path) => {
    if (method !== "PUT" || !path.startsWith("/songs")) return undefined;
    api.tables.songs.set(song.id, { owner, item: song });
    return "down";
  };
  await moveIn.afterSignUp();
  expect(onDevice()).toContain(`songs/${song.id}`);
  api.intercept = () => undefined;
  await moveIn.resume();
  expect(await shelf.list("songs")).toEqual([song]);
  expect(onDevice()).toEqual([]);
});

it("leaves a refused item and what belongs to it on the device, says why, and goes on with the rest", async () => {
  const { voice, song, take, decision, instrument } = await singAndDecide();
  await deviceShelf.put("songs", { ...song, title: "   " });
  await session.signUp(credentials);
  const outcome = await moveIn.afterSignUp();
  expect(outcome.stayed).toEqual([
    { name: "songs", id: song.id, title: "   ", reason: "Give the song a title." },
    {
      name: "decisions",
      id: decision.id,
      title: "The key you chose for a song",
      reason: "What it belongs to stayed here.",
    },
  ]);
  expect(outcome).toMatchObject({ status: "done", moved: 3 });
  expect(onDevice().sort()).toEqual([`decisions/${decision.id}`, `songs/${song.id}`]);
  expect(
    api.tables.voices.has(voice.id) && api.tables.takes.has(take.id) && api.tables.instruments.has(instrument.id),
  ).toBe(true);
  expect(puts().some((call) => call.includes("/decisions/"))).toBe(false);
});

it("does not overwrite another account's item of the same id", async () => {
  const { song } = await singAndDecide();
  api.tables.songs.set(song.id, { owner: "somebody else", item: { ...song, title: "Theirs" } });
  await session.signUp(credentials);
  expect((await moveIn.afterSignUp()).stayed[0]).toMatchObject({
    id: song.id,
    reason: "It belongs to another account.",
  });
  expect(api.tables.songs.get(song.id)?.item.title).toBe("Theirs");
});

it("keeps an edit that another tab made while its item was on the way", async () => {
  const { song } = await singAndDecide();
  await session.signUp(credentials);
  api.intercept = (method, path) => {
    if (method === "PUT" && path === `/songs/${song.id}`)
      kept.set(`songs/${song.id}`, { ...song, title: "Edited meanwhile" });
    return undefined;
  };
  await moveIn.afterSignUp();
  expect(kept.get(`songs/${song.id}`)).toMatchObject({ title: "Edited meanwhile" });
  api.intercept = () => undefined;
  await moveIn.resume();
  expect((await shelf.get("songs", song.id)).title).toBe("Edited meanwhile");
});

describe("a song that is in the account already, from a start that broke off", () => {
  /** The song arrived, but its acknowledgement did not. */
  const brokenOff = async () => {
    const song = await shelf.put("songs", aSong({ title: "As it was" }));
    await session.signUp(credentials);
    api.tables.songs.set(song.id, { owner: session.current().account?.id ?? "", item: song });
    return song;
  };

  it("is brought up to date with what was changed on the device", async () => {
    const song = await brokenOff();
    await deviceShelf.put("songs", { ...song, title: "Changed" });
    await deviceShelf.put("songs", { ...song, title: "Changed twice", revision: 2 });
    expect(await moveIn.resume()).toMatchObject({ status: "done", moved: 1, stayed: [] });
    expect(await shelf.get("songs", song.id)).toMatchObject({ title: "Changed twice", revision: 2 });
    expect(onDevice()).toEqual([]);
  });

  it("stays as it was worked on in the account, with the device's state among its versions", async () => {
    const song = await brokenOff();
    await shelf.put("songs", { ...song, title: "Changed in the account" });
    await deviceShelf.put("songs", { ...song, title: "Changed on the device" });
    expect(await moveIn.resume()).toMatchObject({ status: "done", moved: 1, stayed: [] });
    expect((await shelf.get("songs", song.id)).title).toBe("Changed in the account");
    const titles = (await songVersions.list(song.id)).map(({ title }) => title);
    expect(titles).toEqual(["Changed on the device", "Changed in the account", "As it was"]);
    expect(onDevice()).toEqual([]);
  });
});

describe("the demonstration", () => {
  const seed = async () => {
    const [plain, changed, decided] = [aSong({ demo: "a" }), aSong({ demo: "b" }), aSong({ demo: "c" })];
    for (const song of [plain, changed, decided]) await shelf.put("songs", song);
    await shelf.put("songs", { ...changed, tempo: 60 });
    await shelf.put("decisions", aDecision(decided.id, null));
    return { plain, changed, decided };
  };

  it("moves into a new account as a whole", async () => {
    const { plain, changed, decided } = await seed();
    await session.signUp(credentials);
    await moveIn.afterSignUp();
    expect([...api.tables.songs.keys()]).toEqual([plain.id, changed.id, decided.id]);
  });

  it("is dropped where it is untouched and the account existed before", async () => {
    const { changed, decided } = await seed();
    api.addPerson(credentials.email, credentials.password);
    await session.signIn(credentials);
    await moveIn.afterSignIn();
    expect([...api.tables.songs.keys()]).toEqual([changed.id, decided.id]);
    expect(onDevice()).toEqual([]);
  });

  it("is not counted as something the person did", async () => {
    await seed();
    expect(await countBelongings()).toEqual({
      voices: 0,
      takes: 0,
      songs: 2,
      decisions: 1,
      tries: 0,
      instruments: 0,
      wishes: 0,
      "line-ups": 0,
      arrangements: 0,
    });
  });

  it("of an interrupted sign-up still arrives, unless the account has it", async () => {
    const { plain } = await seed();
    await session.signUp(credentials);
    api.intercept = (method) => (method === "PUT" ? "down" : undefined);
    await moveIn.afterSignUp();
    api.intercept = () => undefined;
    await moveIn.resume();
    expect(api.tables.songs.has(plain.id)).toBe(true);
    const again = aSong({ ...plain, id: aSong().id });
    await deviceShelf.put("songs", again);
    await moveIn.resume();
    expect(api.tables.songs.has(again.id)).toBe(false);
    expect(onDevice()).toEqual([]);
  });
});

it("is no obstacle where the browser keeps nothing", async () => {
  refuseStorage(new DOMException("denied", "SecurityError"));
  await session.signUp(credentials);
  expect(await moveIn.afterSignUp()).toMatchObject({ status: "done", total: 0 });
});

it("runs once, however many ask", async () => {
  await singAndDecide();
  await session.signUp(credentials);
  await Promise.all([moveIn.afterSignUp(), moveIn.resume()]);
  expect(puts()).toHaveLength(5);
});

describe("a key decided on the device for a song and voice that the account has decided for too", () => {
  const on = (day: number) => ({ decidedAt: `2026-03-${String(day).padStart(2, "0")}T18:30:00.000Z` });
  const past = (tonic: string, day: number) => {
    const {
      id: _id,
      songId: _songId,
      voiceId: _voiceId,
      earlier: _earlier,
      ...choice
    } = aDecision("", null, { tonic });
    return { ...choice, ...on(day) };
  };
  const told = () =>
    shelf
      .list("decisions")
      .then((all) => all.map(({ id, tonic, earlier }) => ({ id, tonic, earlier: earlier.map((each) => each.tonic) })));

  /** Song and voice arrived, and so did a decision; the device holds another one. */
  const both = async (device: { tonic: string; day: number }, account: { tonic: string; day: number }) => {
    const [voice, song] = [await shelf.put("voices", aVoice()), await shelf.put("songs", aSong())];
    const mine = { ...aDecision(song.id, voice.id, { tonic: device.tonic }), ...on(device.day) };
    await shelf.put("decisions", { ...mine, earlier: [past("A", 2), past("F", 1)] });
    await session.signUp(credentials);
    const owner = session.current().account?.id ?? "";
    api.tables.voices.set(voice.id, { owner, item: { ...voice } });
    api.tables.songs.set(song.id, { owner, item: { ...song } });
    const theirs = { ...aDecision(song.id, voice.id, { tonic: account.tonic }), ...on(account.day) };
    api.tables.decisions.set(theirs.id, { owner, item: { ...theirs, earlier: [past("E", 3), past("F", 1)] } });
    expect(await moveIn.resume()).toMatchObject({ status: "done", stayed: [] });
    expect(onDevice()).toEqual([]);
    return theirs.id;
  };

  it("is the present one where it is the later one, and the account's stands in its history", async () => {
    const id = await both({ tonic: "C", day: 9 }, { tonic: "Bb", day: 6 });
    expect(await told()).toEqual([{ id, tonic: "C", earlier: ["Bb", "E", "A", "F"] }]);
  });

  it("goes into the history where the account decided later", async () => {
    const id = await both({ tonic: "C", day: 6 }, { tonic: "Bb", day: 9 });
    expect(await told()).toEqual([{ id, tonic: "Bb", earlier: ["C", "E", "A", "F"] }]);
  });

  it("does not bring an older state of the same decision back", async () => {
    const [song, day] = [await shelf.put("songs", aSong()), on(5)];
    const first = await shelf.put("decisions", { ...aDecision(song.id, null), ...day });
    await session.signUp(credentials);
    const owner = session.current().account?.id ?? "";
    api.tables.songs.set(song.id, { owner, item: { ...song } });
    const later = { ...first, tonic: "Bb", ...on(6), earlier: [past("C", 5)] };
    api.tables.decisions.set(first.id, { owner, item: later });
    await moveIn.resume();
    expect(await told()).toEqual([{ id: first.id, tonic: "Bb", earlier: ["C"] }]);
  });
});
