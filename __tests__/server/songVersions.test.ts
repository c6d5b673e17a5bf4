import { randomUUID } from "node:crypto";
import request from "supertest";
import type { Song } from "../../shared/contract/song";
import { songVersion, songVersionEntry, type SongVersionEntry } from "../../shared/contract/songVersion";
import { aSong } from "./belongings";
import { Person, startTestServer, type TestServer } from "./testServer";

let server: TestServer;
let owner: Person;
let stranger: Person;
beforeAll(async () => {
  server = await startTestServer();
  owner = await Person.signUp(server.app);
  stranger = await Person.signUp(server.app);
});
afterAll(() => server.close());

const save = async (song: Song, query = "") =>
  (await owner.put(`/api/songs/${song.id}${query}`, song).expect((answer) => expect(answer.status).toBeLessThan(300)))
    .body as Song;
const listed = async (id: string) => {
  const answer = await owner.get(`/api/songs/${id}/versions`).expect(200);
  return (answer.body as unknown[]).map((entry) => songVersionEntry.parse(entry));
};
const titles = (entries: SongVersionEntry[]) => entries.map(({ title }) => title);

/** Lets time pass for the versions of a song. */
const later = (id: string, minutes: number) =>
  server.database.query("UPDATE song_versions SET kept_at = kept_at - make_interval(mins => $2) WHERE song_id = $1", [
    id,
    minutes,
  ]);

it("has no earlier states of a new song", async () => {
  const song = await save(aSong());
  expect(await listed(song.id)).toEqual([]);
});

it("keeps the state before a change, with when it was saved and by whom", async () => {
  const song = await save(aSong({ title: "As it was", tags: ["Waltz"] }));
  await save({ ...song, title: "As it is", chart: "D\nother words" });
  const [entry, ...others] = await listed(song.id);
  expect(others).toEqual([]);
  expect(entry).toMatchObject({ title: "As it was", by: owner.email });
  const answer = await owner.get(`/api/songs/${song.id}/versions/${entry?.id}`).expect(200);
  expect(songVersion.parse(answer.body)).toEqual({
    id: entry?.id,
    savedAt: entry?.savedAt,
    by: owner.email,
    song,
  });
});

it("keeps one state of five minutes' work, and the next one after that", async () => {
  let song = await save(aSong({ title: "0" }));
  for (const title of ["1", "2", "3"]) song = await save({ ...song, title });
  expect(titles(await listed(song.id))).toEqual(["0"]);
  await later(song.id, 5);
  song = await save({ ...song, title: "4" });
  expect(titles(await listed(song.id))).toEqual(["3", "0"]);
  await later(song.id, 4);
  await save({ ...song, title: "5" });
  expect(titles(await listed(song.id))).toEqual(["3", "0"]);
});

it("keeps the state before at once where it is asked to, as a restore does", async () => {
  const song = await save(aSong({ title: "0" }));
  const second = await save({ ...song, title: "1" });
  const restored = await save({ ...song, revision: second.revision }, "?version=1");
  expect(restored).toEqual({ ...song, revision: 3 });
  expect(titles(await listed(song.id))).toEqual(["1", "0"]);
});

it("makes no version of a song that is played, put aside, or sent again as it is", async () => {
  const song = await save(aSong());
  const played = await save({ ...song, playedAt: "2026-11-24T20:00:00.000Z" }, "?version=1");
  const aside = await save({ ...played, archivedAt: "2026-11-24T20:00:00.000Z" }, "?version=1");
  await save(aside, "?version=1");
  expect(await listed(song.id)).toEqual([]);
});

it("keeps a hundred of a song, the newest", async () => {
  const song = await save(aSong({ title: "0" }));
  await server.database.query(
    `INSERT INTO song_versions (user_id, song_id, saved_at, kept_at, title, song)
     SELECT $1, $2, now(), now() - make_interval(hours => n), 'old ' || n, '{}' FROM generate_series(1, 100) n`,
    [owner.id, song.id],
  );
  await save({ ...song, title: "1" });
  const kept = titles(await listed(song.id));
  expect(kept).toHaveLength(100);
  expect([kept[0], kept[1], kept.at(-1)]).toEqual(["0", "old 1", "old 99"]);
});

it("lets versions go with their song", async () => {
  const song = await save(aSong());
  await save({ ...song, title: "Changed" });
  const [entry] = await listed(song.id);
  await owner.delete(`/api/songs/${song.id}`).expect(204);
  await owner.get(`/api/songs/${song.id}/versions`).expect(404);
  await owner.get(`/api/songs/${song.id}/versions/${entry?.id}`).expect(404);
  expect(await server.database.query("SELECT 1 FROM song_versions WHERE song_id = $1", [song.id])).toEqual([]);
});

it("is as if it did not exist for somebody else, also under a song of their own", async () => {
  const song = await save(aSong());
  await save({ ...song, title: "Changed" });
  const [entry] = await listed(song.id);
  const own = aSong();
  await stranger.put(`/api/songs/${own.id}`, own).expect(201);
  for (const path of [
    `/api/songs/${song.id}/versions`,
    `/api/songs/${song.id}/versions/${entry?.id}`,
    `/api/songs/${own.id}/versions/${entry?.id}`,
    `/api/songs/${randomUUID()}/versions`,
  ]) {
    const answer = await stranger.get(path).expect(404);
    expect(answer.body.code).toBe("not-found");
  }
});

it("asks who is there, and finds nothing under what is no id", async () => {
  const song = await save(aSong());
  for (const path of [`/api/songs/${song.id}/versions`, `/api/songs/${song.id}/versions/${randomUUID()}`])
    expect((await request(server.app).get(path).expect(401)).body.code).toBe("no-session");
  for (const path of [`/api/songs/1/versions`, `/api/songs/${song.id}/versions/1`])
    expect((await owner.get(path).expect(404)).body.code).toBe("not-found");
});

it.each(["?version=2", "?version=1&version=0", "?other=1"])("refuses %s when a song is saved", async (query) => {
  const song = aSong();
  const answer = await owner.put(`/api/songs/${song.id}${query}`, song).expect(422);
  expect(answer.body).toMatchObject({
    code: "invalid",
    fields: [{ path: expect.stringMatching(/^(version|other)$/) }],
  });
});
