import { randomUUID } from "node:crypto";
import request from "supertest";
import type { Song } from "../../shared/contract/song";
import { type SongPage, songPage } from "../../shared/contract/songListing";
import { aSong } from "./belongings";
import { Person, startTestServer, type TestServer } from "./testServer";

let server: TestServer;
beforeAll(async () => {
  server = await startTestServer();
});
afterAll(() => server.close());

async function shelfOf(songs: Partial<Song>[]): Promise<Person> {
  const person = await Person.signUp(server.app);
  for (const change of songs) {
    const song = aSong(change);
    await person.put(`/api/songs/${song.id}`, song).expect(201);
  }
  return person;
}

async function page(person: Person, query = ""): Promise<SongPage> {
  return songPage.parse((await person.get(`/api/songs/page${query}`).expect(200)).body);
}
const titles = ({ items }: SongPage) => items.map(({ title }) => title);

it("lists what a list needs of a song, without its chart and notes", async () => {
  const song = aSong({ tags: ["Waltz"], playedAt: "2026-11-24T20:00:00.000Z" });
  const person = await Person.signUp(server.app);
  await person.put(`/api/songs/${song.id}`, song).expect(201);
  const { chart: _chart, tune: _tune, ...facts } = song;
  expect(await page(person)).toEqual({
    items: [{ ...facts, span: { lowMidi: 62, highMidi: 62, home: "G" }, firstWords: "Nets in the loft, ♯ and ♭" }],
    next: null,
    total: 1,
  });
});

it("is up to date with every change of a song", async () => {
  const song = aSong({ title: "Gulls" });
  const person = await Person.signUp(server.app);
  await person.put(`/api/songs/${song.id}`, song).expect(201);
  await person.put(`/api/songs/${song.id}`, { ...song, title: "Terns", chart: "other words", tune: null }).expect(200);
  expect(titles(await page(person, "?q=gulls"))).toEqual([]);
  expect((await page(person, "?q=terns+other")).items[0]).toMatchObject({ span: null, firstWords: "other words" });
});

describe("searching", () => {
  let person: Person;
  beforeAll(async () => {
    person = await shelfOf([
      { title: "L’Étoile du Nord", chart: "Am  Bbmaj9\nsalt in the rope", tags: [] },
      { title: "The Half-Past-Nine Ferry", chart: "G\nStraße am Øresund", tags: ["Waltz"] },
      { title: "100% Rope", chart: "", tags: ["Été", "waltz"] },
      { title: "Put aside", chart: "rope", tags: ["waltz"], archivedAt: "2026-11-24T20:00:00.000Z" },
    ]);
  });
  const found = async (query: string) => titles(await page(person, query)).sort();

  it.each([
    ["part of a word of the title", "half", ["The Half-Past-Nine Ferry"]],
    ["words in any order and place", "rope letoile", ["L’Étoile du Nord"]],
    ["words of the chart", "salt", ["L’Étoile du Nord"]],
    ["tags without their accents", "ete", ["100% Rope"]],
    ["accents where there are none", "nòrd", ["L’Étoile du Nord"]],
    ["letters that are written in two ways", "strasse oresund", ["The Half-Past-Nine Ferry"]],
    ["capitals", "FERRY", ["The Half-Past-Nine Ferry"]],
    ["no chords", "bbmaj9", []],
    ["everything with a sign alone", "%", ["100% Rope", "L’Étoile du Nord", "The Half-Past-Nine Ferry"]],
    ["what is not there", "zzz", []],
  ])("finds %s", async (_what, q, expected) => {
    expect(await found(`?q=${encodeURIComponent(q)}`)).toEqual(expected);
  });

  it("keeps to a tag, whatever its case, and to what is put aside or not", async () => {
    expect(await found("?tag=WALTZ")).toEqual(["100% Rope", "The Half-Past-Nine Ferry"]);
    expect(await found("?archived=true")).toEqual(["Put aside"]);
    expect(await found("?archived=all&tag=waltz&q=rope")).toEqual(["100% Rope", "Put aside"]);
  });

  it("counts tags of what is not put aside, in the usual spelling", async () => {
    const answer = await person.get("/api/songs/tags").expect(200);
    expect(answer.body).toEqual([
      { tag: "Waltz", count: 2 },
      { tag: "Été", count: 1 },
    ]);
  });
});

it("sorts by title without regard to case and accents, by when played, and by when made", async () => {
  const person = await shelfOf([
    { title: "beta", createdAt: "2026-01-02T00:00:00Z", playedAt: "2026-03-01T00:00:00Z" },
    { title: "Álpha", createdAt: "2026-01-03T00:00:00Z", playedAt: null },
    { title: "Gamma", createdAt: "2026-01-01T00:00:00Z", playedAt: "2026-04-01T00:00:00Z" },
  ]);
  expect(titles(await page(person, "?sort=title"))).toEqual(["Álpha", "beta", "Gamma"]);
  expect(titles(await page(person, "?sort=played"))).toEqual(["Gamma", "beta", "Álpha"]);
  expect(titles(await page(person, "?sort=saved"))).toEqual(["Álpha", "beta", "Gamma"]);
});

it.each(["title", "played", "saved"])("leads through all songs by %s once, while others are added", async (sort) => {
  const days = ["2026-01-01T00:00:00Z", "2026-01-01T00:00:00.000001Z", "2026-01-02T00:00:00Z"];
  const songs = Array.from({ length: 23 }, (_, k) => ({
    title: `Same ${k % 3}`,
    createdAt: days[k % 3] ?? "",
    playedAt: k % 4 === 0 ? null : (days[k % 3] ?? ""),
  }));
  const person = await shelfOf(songs);
  const before = new Set((await page(person, "?limit=200")).items.map(({ id }) => id));
  const seen: string[] = [];
  let next: string | null = null;
  do {
    const answer: SongPage = await page(person, `?sort=${sort}&limit=5${next ? `&cursor=${next}` : ""}`);
    expect(answer.items.length).toBeLessThanOrEqual(5);
    seen.push(...answer.items.map(({ id }) => id));
    next = answer.next;
    for (const k of [0, 1, 2]) {
      const late = aSong({ title: `Same ${k}`, createdAt: days[k] ?? "", playedAt: days[k] ?? "" });
      if (seen.length < 20) await person.put(`/api/songs/${late.id}`, late).expect(201);
    }
  } while (next);
  expect(new Set(seen).size).toBe(seen.length);
  expect(seen.filter((id) => before.has(id))).toHaveLength(23);
});

it("takes the longest title of signs that unfold, and leads on behind it", async () => {
  const person = await shelfOf([{ title: "\ufdfa".repeat(200) }, { title: "\ufdfa".repeat(199) }, { title: "z" }]);
  const first = await page(person, "?limit=1");
  const second = await page(person, `?limit=1&cursor=${first.next}`);
  const third = await page(person, `?limit=1&cursor=${second.next}`);
  expect(new Set([first, second, third].flatMap(titles)).size).toBe(3);
  expect(third.next).toBeNull();
});

it("shows a person nothing of somebody else's songs and tags", async () => {
  await shelfOf([{ title: "Theirs", tags: ["theirs"] }]);
  const stranger = await Person.signUp(server.app);
  expect(await page(stranger, "?archived=all")).toEqual({ items: [], next: null, total: 0 });
  expect((await stranger.get("/api/songs/tags").expect(200)).body).toEqual([]);
});

it("asks who is there", async () => {
  for (const path of ["/api/songs/page", "/api/songs/tags"])
    expect((await request(server.app).get(path).expect(401)).body.code).toBe("no-session");
});

const cursorOf = (...parts: unknown[]) => Buffer.from(JSON.stringify(parts)).toString("base64url");

describe("a question that does not fit", () => {
  let person: Person;
  beforeAll(async () => {
    person = await Person.signUp(server.app);
  });
  const refused = async (query: string) => {
    const answer = await person.get(`/api/songs/page?${query}`).expect(422);
    expect(answer.body).toMatchObject({ code: "invalid", message: expect.stringMatching(/\.$/) });
    return answer.body as { fields?: { path: string }[] };
  };

  it.each([
    ["limit", "limit=0"],
    ["limit", "limit=201"],
    ["limit", "limit=many"],
    ["limit", "limit="],
    ["sort", "sort=key"],
    ["archived", "archived=maybe"],
    ["q", `q=${"x".repeat(201)}`],
    ["q", "q=a&q=b"],
    ["tag", `tag=${"x".repeat(41)}`],
    ["other", "other=1"],
  ])("names %s in %s", async (path, query) => {
    expect((await refused(query)).fields).toMatchObject([{ path }]);
  });

  it.each([
    ["no cursor", "title", "nowhere"],
    ["a NUL character", "title", cursorOf("title", "a\u0000", randomUUID())],
    ["no id", "title", cursorOf("title", "a", "1")],
    ["another order", "title", cursorOf("saved", "2026-01-01 00:00:00+00", randomUUID())],
    ["no instant", "saved", cursorOf("saved", "'; DROP TABLE songs; --", randomUUID())],
  ])("names the cursor with %s", async (_what, sort, cursor) => {
    expect((await refused(`sort=${sort}&cursor=${cursor}`)).fields).toMatchObject([{ path: "cursor" }]);
  });

  it("refuses a cursor with an instant that no calendar has", async () => {
    await refused(`sort=saved&cursor=${cursorOf("saved", "2026-99-99 00:00:00+00", randomUUID())}`);
  });
});
