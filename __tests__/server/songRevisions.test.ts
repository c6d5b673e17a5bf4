import type { Song } from "../../shared/contract/song";
import { aDecision, aSong } from "./belongings";
import { Person, startTestServer, type TestServer } from "./testServer";

let server: TestServer;
let owner: Person;
beforeAll(async () => {
  server = await startTestServer();
  owner = await Person.signUp(server.app);
});
afterAll(() => server.close());

const save = (song: Song) => owner.put(`/api/songs/${song.id}`, song);
const kept = async (id: string) => (await owner.get(`/api/songs/${id}`).expect(200)).body as Song;

it("keeps a new song in its first revision, whichever it names", async () => {
  for (const revision of [0, 1, 7]) {
    const created = await save(aSong({ revision })).expect(201);
    expect(created.body.revision).toBe(1);
  }
});

it("counts the revision up at each change, whatever changes", async () => {
  const song = aSong();
  await save(song).expect(201);
  const changes: Partial<Song>[] = [
    { chart: "D  A\nlow water" },
    { tags: ["Waltz", "harbour"] },
    { playedAt: "2026-11-24T20:00:00.000Z" },
    { archivedAt: "2026-11-25T20:00:00.000Z" },
  ];
  for (const [k, change] of changes.entries()) {
    const answer = await save({ ...(await kept(song.id)), ...change }).expect(200);
    expect(answer.body).toMatchObject({ ...change, revision: k + 2 });
  }
});

it("tells the second of two tabs that the song was changed elsewhere, and loses nothing of the first", async () => {
  const song = aSong();
  await save(song).expect(201);
  const first = await save({ ...song, title: "First tab" }).expect(200);
  const second = await save({ ...song, title: "Second tab" }).expect(409);
  expect(second.body).toEqual({
    code: "changed-elsewhere",
    message: expect.stringMatching(/changed in another place/),
  });
  expect(await kept(song.id)).toEqual(first.body);
  const merged = await save({ ...first.body, title: "Both tabs" }).expect(200);
  expect(merged.body).toMatchObject({ title: "Both tabs", revision: 3 });
});

it("answers the same content sent again with 200 and what is kept, in whichever revision and form of its instants", async () => {
  const song = aSong();
  await save(song).expect(201);
  const changed = { ...song, title: "Sent twice", createdAt: "2026-11-24T19:20:00Z" };
  const once = await save(changed).expect(200);
  const again = await save(changed).expect(200);
  expect(again.body).toEqual(once.body);
  expect((await save({ ...changed, revision: 40 }).expect(200)).body).toEqual(once.body);
});

it("lets exactly one of five different changes at once through", async () => {
  for (let round = 0; round < 10; round++) {
    const song = aSong();
    await save(song).expect(201);
    const answers = await Promise.all([1, 2, 3, 4, 5].map((tab) => save({ ...song, title: `Tab ${tab}` })));
    expect(answers.map(({ status }) => status).sort()).toEqual([200, 409, 409, 409, 409]);
    const winner = answers.find(({ status }) => status === 200);
    expect(await kept(song.id)).toEqual(winner?.body);
  }
});

it("lets songs be removed while their keys are decided, without a fault", async () => {
  for (let round = 0; round < 15; round++) {
    const song = aSong();
    await save(song).expect(201);
    const [first, second] = [aDecision(song.id, null), aDecision(song.id, null)];
    await owner.put(`/api/decisions/${first.id}`, first).expect(201);
    const [decided, removed] = await Promise.all([
      owner.put(`/api/decisions/${second.id}`, second),
      owner.delete(`/api/songs/${song.id}`),
    ]);
    expect([201, 422]).toContain(decided.status);
    expect(removed.status).toBe(204);
    await owner.get(`/api/decisions/${second.id}`).expect(404);
  }
});

it("survives that an account goes while its songs are saved", async () => {
  for (let round = 0; round < 5; round++) {
    const leaving = await Person.signUp(server.app);
    const songs = Array.from({ length: 6 }, () => aSong());
    const saves = songs.map((song) => leaving.put(`/api/songs/${song.id}`, song));
    const [answers] = await Promise.all([
      Promise.all(saves),
      server.database.query("DELETE FROM users WHERE id = $1", [leaving.id]),
    ]);
    for (const { status } of answers) expect([201, 401]).toContain(status);
    expect(await server.database.query("SELECT 1 FROM songs WHERE user_id = $1", [leaving.id])).toEqual([]);
  }
});

it.each([
  ["revision", { revision: -1 }],
  ["revision", { revision: 1.5 }],
  ["tags.0", { tags: [" "] }],
  ["tags.0", { tags: ["x".repeat(41)] }],
  ["tags", { tags: ["Waltz", "waltz"] }],
  ["tags", { tags: Array.from({ length: 21 }, (_, k) => `tag ${k}`) }],
  ["archivedAt", { archivedAt: "yesterday" }],
  [
    "tune.notes.0.lyric",
    { tune: { kind: "melody", home: "G", notes: [{ start: 0, duration: 1, midi: 60, lyric: "x".repeat(101) }] } },
  ],
])("names %s where it does not fit", async (path, change) => {
  const song = { ...aSong(), ...change };
  const answer = await owner.put(`/api/songs/${song.id}`, song).expect(422);
  expect(answer.body).toMatchObject({ code: "invalid", fields: [{ path }] });
});

it("keeps tags trimmed, and the syllables of a melody", async () => {
  const notes = [{ start: 0, duration: 1, midi: 60, lyric: "lan-" }];
  const song = aSong({ tags: [" Waltz "], tune: { kind: "melody", home: "G", notes } });
  const answer = await save(song).expect(201);
  expect(answer.body).toEqual({ ...song, tags: ["Waltz"] });
});

it("keeps at most 5,000 songs", async () => {
  const full = await Person.signUp(server.app);
  await server.database.query(
    `INSERT INTO songs (id, user_id, title, chart, created_at)
     SELECT gen_random_uuid(), $1, 'n', '', now() FROM generate_series(1, 4999)`,
    [full.id],
  );
  const [last, tooMany] = [aSong(), aSong()];
  await full.put(`/api/songs/${last.id}`, last).expect(201);
  const answer = await full.put(`/api/songs/${tooMany.id}`, tooMany).expect(409);
  expect(answer.body).toEqual({ code: "collection-full", message: expect.stringMatching(/5000|5,000/) });
  await full.put(`/api/songs/${last.id}`, { ...last, title: "Changed in a full account" }).expect(200);
});
