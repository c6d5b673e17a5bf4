import { aSong } from "@/__tests__/client/belongings";
import { FakeApi } from "@/__tests__/client/fakeApi";
import { kept } from "@/__tests__/client/memoryIdb";
import type { Song } from "@/shared/contract/song";
import { songPage } from "@/shared/contract/songListing";
import { session } from "./session";
import { shelf } from "./shelf";
import { songPages } from "./songPages";
import type { SongQuestion } from "./songQuestion";

jest.mock("idb-keyval", () => jest.requireActual<{ memoryIdb: object }>("@/__tests__/client/memoryIdb").memoryIdb);

let api: FakeApi;
beforeEach(async () => {
  localStorage.clear();
  kept.clear();
  api = new FakeApi();
  api.install();
  await session.settled();
});
afterEach(() => session.signOut());

const fill = async (...songs: Partial<Song>[]) => {
  for (const song of songs) await shelf.put("songs", aSong(song));
};
const titles = async (question: SongQuestion) => (await songPages.get(question)).items.map(({ title }) => title);

const shelfful = () =>
  fill(
    { title: "beta", chart: "Am  G\nSalt in the røpe", tags: ["Waltz"], createdAt: "2026-01-02T00:00:00Z" },
    { title: "Álpha", tags: ["waltz", "Été"], createdAt: "2026-01-03T00:00:00Z", playedAt: "2026-02-01T00:00:00Z" },
    { title: "Gamma", createdAt: "2026-01-01T00:00:00.500Z", playedAt: "2026-03-01T00:00:00Z", tags: ["Waltz"] },
    { title: "Aside", tags: ["Waltz"], archivedAt: "2026-02-01T00:00:00Z" },
  );

it("works pages of a visitor's songs out on the device, as the contract has them", async () => {
  const song = aSong({ tune: { kind: "span", lowMidi: 57, highMidi: 69, home: "D" } });
  await shelf.put("songs", song);
  const { chart: _chart, tune: _tune, ...facts } = song;
  const page = await songPages.get();
  expect(songPage.parse(page)).toEqual({
    items: [{ ...facts, span: { lowMidi: 57, highMidi: 69, home: "D" }, firstWords: "low water" }],
    next: null,
    total: 1,
  });
});

it("sorts, searches and keeps to a tag as the server does", async () => {
  await shelfful();
  expect(await titles({})).toEqual(["Álpha", "beta", "Gamma"]);
  expect(await titles({ sort: "played" })).toEqual(["Gamma", "Álpha", "beta"]);
  expect(await titles({ sort: "saved" })).toEqual(["Álpha", "beta", "Gamma"]);
  expect(await titles({ q: "ROPE sal" })).toEqual(["beta"]);
  expect(await titles({ q: "ete" })).toEqual(["Álpha"]);
  expect(await titles({ q: "Am" })).toEqual(["Gamma"]);
  expect(await titles({ tag: "waltz" })).toEqual(["Álpha", "beta", "Gamma"]);
  expect(await titles({ archived: true })).toEqual(["Aside"]);
  expect(await titles({ archived: "all", tag: "WALTZ", q: "as" })).toEqual(["Aside"]);
  expect(await songPages.tags()).toEqual([
    { tag: "Waltz", count: 3 },
    { tag: "Été", count: 1 },
  ]);
});

it("shows a change at once, also one of tags only", async () => {
  const song = await shelf.put("songs", aSong({ title: "Gulls" }));
  expect(await titles({ q: "gulls" })).toEqual(["Gulls"]);
  const tagged = await shelf.put("songs", { ...song, tags: ["Reel"] });
  expect(await titles({ tag: "reel" })).toEqual(["Gulls"]);
  await shelf.put("songs", { ...tagged, chart: "other words" });
  expect(await titles({ q: "other" })).toEqual(["Gulls"]);
});

it.each(["title", "played", "saved"] as const)("leads through all by %s once, while others are added", async (sort) => {
  await fill(...Array.from({ length: 23 }, (_, k) => ({ title: `Same ${k % 3}` })));
  const before = new Set((await songPages.get({ limit: 200 })).items.map(({ id }) => id));
  const seen: string[] = [];
  let cursor: string | null = null;
  do {
    const page: Awaited<ReturnType<typeof songPages.get>> = await songPages.get({ sort, limit: 5, cursor });
    seen.push(...page.items.map(({ id }) => id));
    if (seen.length < 20) await fill({ title: "Same 0" }, { title: "Same 2", createdAt: "2027-01-01T00:00:00Z" });
    cursor = page.next;
  } while (cursor !== null);
  expect(new Set(seen).size).toBe(seen.length);
  expect(seen.filter((id) => before.has(id))).toHaveLength(23);
});

it("tells that a cursor of another order leads nowhere", async () => {
  await fill({}, {});
  const { next } = await songPages.get({ limit: 1 });
  for (const cursor of [next, "nowhere", "{}"])
    await expect(songPages.get({ sort: "saved", cursor })).rejects.toMatchObject({ status: 422, code: "invalid" });
});

it("asks the server for the songs of the signed-in", async () => {
  await session.signUp({ email: "maren@orlow.example", password: "tide tables 1907" });
  await shelfful();
  const first = await songPages.get({ q: " a ", sort: "saved", archived: "all", limit: 2 });
  expect(first).toMatchObject({ total: 4, next: expect.any(String) });
  await songPages.get({ tag: "R&B #1", sort: "saved", cursor: first.next });
  expect(api.calls.slice(-2)).toEqual([
    "GET /songs/page?q=a&archived=all&sort=saved&limit=2",
    `GET /songs/page?tag=R%26B+%231&sort=saved&cursor=${new URLSearchParams({ c: first.next ?? "" }).toString().slice(2)}`,
  ]);
  expect(await songPages.tags()).toEqual([
    { tag: "Waltz", count: 3 },
    { tag: "Été", count: 1 },
  ]);
});
