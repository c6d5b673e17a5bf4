import { randomUUID } from "node:crypto";
import { aDecision, anArrangement, aLineUp, aSong, aTake, aTry, aVoice } from "./belongings";
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

async function saved<Item extends { id: string }>(person: Person, name: string, item: Item): Promise<Item> {
  await person.put(`/api/${name}/${item.id}`, item).expect(201);
  return item;
}

async function refusal(person: Person, name: string, item: { id: string }) {
  const response = await person.put(`/api/${name}/${item.id}`, item).expect(422);
  await person.get(`/api/${name}/${item.id}`).expect(404);
  return response.body as object;
}

const unknown = (path: string) => ({ code: "unknown-reference", fields: [{ path }] });

it("refuses a take of somebody else's voice as it refuses one of no voice", async () => {
  const theirs = await saved(stranger, "voices", aVoice());
  const borrowed = await refusal(owner, "takes", aTake(theirs.id));
  expect(borrowed).toMatchObject(unknown("voiceId"));
  expect(await refusal(owner, "takes", aTake(randomUUID()))).toEqual(borrowed);
});

it("refuses a decision about somebody else's song", async () => {
  const theirs = await saved(stranger, "songs", aSong());
  expect(await refusal(owner, "decisions", aDecision(theirs.id, null))).toMatchObject(unknown("songId"));
});

it("refuses a decision for somebody else's voice", async () => {
  const song = await saved(owner, "songs", aSong());
  const theirs = await saved(stranger, "voices", aVoice());
  expect(await refusal(owner, "decisions", aDecision(song.id, theirs.id))).toMatchObject(unknown("voiceId"));
});

it("refuses to move what exists to somebody else's voice", async () => {
  const mine = await saved(owner, "voices", aVoice());
  const theirs = await saved(stranger, "voices", aVoice());
  const take = await saved(owner, "takes", aTake(mine.id));
  await owner.put(`/api/takes/${take.id}`, { ...take, voiceId: theirs.id }).expect(422);
  expect((await owner.get(`/api/takes/${take.id}`)).body).toEqual(take);
});

it("removes the takes of a voice together with it, and only those", async () => {
  const gone = await saved(owner, "voices", aVoice());
  const kept = await saved(owner, "voices", aVoice());
  const first = await saved(owner, "takes", aTake(gone.id));
  const second = await saved(owner, "takes", aTake(kept.id));
  await owner.delete(`/api/voices/${gone.id}`).expect(204);
  await owner.get(`/api/takes/${first.id}`).expect(404);
  await owner.get(`/api/takes/${second.id}`).expect(200);
});

it("keeps a decision whose voice is removed, without the voice", async () => {
  const voice = await saved(owner, "voices", aVoice());
  const song = await saved(owner, "songs", aSong());
  const decision = await saved(owner, "decisions", aDecision(song.id, voice.id));
  await owner.delete(`/api/voices/${voice.id}`).expect(204);
  expect((await owner.get(`/api/decisions/${decision.id}`).expect(200)).body).toEqual({ ...decision, voiceId: null });
});

it("removes the decision about a song together with the song", async () => {
  const song = await saved(owner, "songs", aSong());
  const decision = await saved(owner, "decisions", aDecision(song.id, null));
  await owner.delete(`/api/songs/${song.id}`).expect(204);
  await owner.get(`/api/decisions/${decision.id}`).expect(404);
});

it("refuses a try of somebody else's song or voice", async () => {
  const song = await saved(owner, "songs", aSong());
  const theirs = { song: await saved(stranger, "songs", aSong()), voice: await saved(stranger, "voices", aVoice()) };
  expect(await refusal(owner, "tries", aTry(theirs.song.id, null))).toMatchObject(unknown("songId"));
  expect(await refusal(owner, "tries", aTry(song.id, theirs.voice.id))).toMatchObject(unknown("voiceId"));
});

it("removes tries together with their song and with their voice", async () => {
  const voice = await saved(owner, "voices", aVoice());
  const [gone, stays] = [await saved(owner, "songs", aSong()), await saved(owner, "songs", aSong())];
  const ofSong = await saved(owner, "tries", aTry(gone.id, null));
  const ofVoice = await saved(owner, "tries", aTry(stays.id, voice.id));
  const kept = await saved(owner, "tries", aTry(stays.id, null));
  await owner.delete(`/api/songs/${gone.id}`).expect(204);
  await owner.delete(`/api/voices/${voice.id}`).expect(204);
  await owner.get(`/api/tries/${ofSong.id}`).expect(404);
  await owner.get(`/api/tries/${ofVoice.id}`).expect(404);
  await owner.get(`/api/tries/${kept.id}`).expect(200);
});

it("keeps one line-up for each song, never one for somebody else's, and lets it go with its song", async () => {
  const [mine, theirs] = [await saved(owner, "songs", aSong()), await saved(stranger, "songs", aSong())];
  expect(await refusal(owner, "line-ups", aLineUp(theirs.id))).toMatchObject(unknown("songId"));
  const first = await saved(owner, "line-ups", aLineUp(mine.id));
  await stranger.get(`/api/line-ups/${first.id}`).expect(404);
  await stranger.put(`/api/line-ups/${first.id}`, { ...first, songId: theirs.id }).expect(404);
  expect((await owner.get(`/api/line-ups/${first.id}`)).body).toEqual(first);
  const second = await saved(owner, "line-ups", aLineUp(mine.id, { players: [] }));
  await owner.get(`/api/line-ups/${first.id}`).expect(404);
  expect((await owner.get(`/api/line-ups/${second.id}`)).body).toEqual(second);
  await owner.delete(`/api/songs/${mine.id}`).expect(204);
  await owner.get(`/api/line-ups/${second.id}`).expect(404);
});

it("refuses an arrangement of somebody else's song, and removes one together with its song", async () => {
  const theirs = await saved(stranger, "songs", aSong());
  expect(await refusal(owner, "arrangements", anArrangement(theirs.id))).toMatchObject(unknown("songId"));
  const song = await saved(owner, "songs", aSong());
  const arrangement = await saved(owner, "arrangements", anArrangement(song.id));
  await owner.delete(`/api/songs/${song.id}`).expect(204);
  await owner.get(`/api/arrangements/${arrangement.id}`).expect(404);
});

it("keeps a decision for each voice and one for whoever sings", async () => {
  const song = await saved(owner, "songs", aSong());
  const voices = [await saved(owner, "voices", aVoice()), await saved(owner, "voices", aVoice())];
  for (const voiceId of [voices[0]!.id, voices[1]!.id, null]) {
    const decision = await saved(owner, "decisions", aDecision(song.id, voiceId));
    await owner.get(`/api/decisions/${decision.id}`).expect(200);
  }
  const of = async () =>
    ((await owner.get("/api/decisions")).body as { songId: string; voiceId: string | null }[])
      .filter(({ songId }) => songId === song.id)
      .map(({ voiceId }) => voiceId);
  expect(await of()).toEqual([voices[0]!.id, voices[1]!.id, null]);
  await owner.delete(`/api/voices/${voices[0]!.id}`).expect(204);
  expect(await of()).toEqual([voices[1]!.id, null]);
});

it("keeps what was decided before when another device decides without knowing of it", async () => {
  const song = await saved(owner, "songs", aSong());
  const first = await saved(owner, "decisions", aDecision(song.id, null));
  const later = aDecision(song.id, null, { tonic: "C", decidedAt: "2026-11-25T08:00:00.000Z" });
  const { id: _id, songId: _songId, voiceId: _voiceId, earlier: _earlier, ...choice } = first;
  const saw = await owner.put(`/api/decisions/${later.id}`, later).expect(201);
  expect(saw.body).toEqual({ ...later, earlier: [choice] });
  const stale = { ...later, tonic: "D", decidedAt: "2026-11-26T08:00:00.000Z" };
  const second = await owner.put(`/api/decisions/${later.id}`, stale).expect(200);
  expect(second.body.earlier.map(({ tonic }: { tonic: string }) => tonic)).toEqual(["C", "Bb"]);
});

it("takes the newest choice back without keeping it", async () => {
  const song = await saved(owner, "songs", aSong());
  const first = await saved(owner, "decisions", aDecision(song.id, null));
  const { id: _id, songId: _songId, voiceId: _voiceId, earlier: _earlier, ...choice } = first;
  const next = { ...first, tonic: "C", decidedAt: "2026-11-25T08:00:00.000Z", earlier: [choice] };
  await owner.put(`/api/decisions/${first.id}`, next).expect(200);
  expect((await owner.put(`/api/decisions/${first.id}`, first).expect(200)).body).toEqual(first);
});

it("keeps one decision for each song: the newest", async () => {
  const song = await saved(owner, "songs", aSong());
  const first = await saved(owner, "decisions", aDecision(song.id, null));
  const second = await saved(owner, "decisions", aDecision(song.id, null, { tonic: "C" }));
  await owner.get(`/api/decisions/${first.id}`).expect(404);
  expect((await owner.get(`/api/decisions/${second.id}`).expect(200)).body).toEqual(second);
});

it("leaves the old decision alone when the new one is refused", async () => {
  const song = await saved(owner, "songs", aSong());
  const first = await saved(owner, "decisions", aDecision(song.id, null));
  await refusal(owner, "decisions", aDecision(song.id, randomUUID()));
  await owner.get(`/api/decisions/${first.id}`).expect(200);
});

it("ends with one decision when two are made at once", async () => {
  const song = await saved(owner, "songs", aSong());
  const answers = await Promise.all(
    Array.from({ length: 4 }, (_, k) => {
      const decision = aDecision(song.id, null, { decidedAt: `2026-11-24T19:20:0${k}.000Z` });
      return owner.put(`/api/decisions/${decision.id}`, decision);
    }),
  );
  for (const { status } of answers) expect([201, 409]).toContain(status);
  const all = (await owner.get("/api/decisions")).body as { songId: string; earlier: object[] }[];
  const left = all.filter(({ songId }) => songId === song.id);
  expect(left).toHaveLength(1);
  expect(left[0]?.earlier).toHaveLength(answers.filter(({ status }) => status === 201).length - 1);
});

it("refuses more items than an account may keep", async () => {
  await server.database.query(
    `INSERT INTO voices (id, user_id, name, created_at)
     SELECT gen_random_uuid(), $1, 'n', now() FROM generate_series(1, 2000 - (SELECT count(*) FROM voices WHERE user_id = $1))`,
    [owner.id],
  );
  const voice = aVoice();
  const response = await owner.put(`/api/voices/${voice.id}`, voice).expect(409);
  expect(response.body.code).toBe("collection-full");
  await owner.get(`/api/voices/${voice.id}`).expect(404);
  await saved(stranger, "voices", aVoice());
});

it("takes everything of a person away when the account goes, and the token is then good for nothing", async () => {
  const leaving = await Person.signUp(server.app);
  const voice = await saved(leaving, "voices", aVoice());
  await saved(leaving, "takes", aTake(voice.id));
  await server.database.query("DELETE FROM users WHERE id = $1", [leaving.id]);
  expect(await server.database.query("SELECT 1 FROM takes WHERE user_id = $1", [leaving.id])).toEqual([]);
  const late = aVoice();
  const response = await leaving.put(`/api/voices/${late.id}`, late).expect(401);
  expect(response.body.code).toBe("no-session");
});
