import { randomUUID } from "node:crypto";
import request from "supertest";
import { aDecision, anArrangement, aLineUp, anInstrument, aSong, aTake, aTry, aVoice, someWishes } from "./belongings";
import { Person, startTestServer, type TestServer } from "./testServer";

let server: TestServer;
let owner: Person;
let stranger: Person;
let voiceId: string;
let songId: string;

beforeAll(async () => {
  server = await startTestServer();
  owner = await Person.signUp(server.app);
  stranger = await Person.signUp(server.app);
  const voice = aVoice();
  const song = aSong();
  voiceId = voice.id;
  songId = song.id;
  await owner.put(`/api/voices/${voiceId}`, voice).expect(201);
  await owner.put(`/api/songs/${songId}`, song).expect(201);
});
afterAll(() => server.close());

interface Collection {
  name: string;
  make: () => { id: string };
  change: object;
  spoil: object;
  spoiled: string;
  /** fields with a value of their own where nothing was sent */
  byDefault?: string[];
  /** what the server counts up when an item is changed */
  changed?: object;
}

const collections: Collection[] = [
  { name: "voices", make: aVoice, change: { name: "Morning voice" }, spoil: { name: "  " }, spoiled: "name" },
  {
    name: "takes",
    make: () => aTake(voiceId),
    change: { effort: 5, warmedUp: null },
    spoil: { effort: 6 },
    spoiled: "effort",
    byDefault: ["kind", "shows"],
  },
  {
    name: "songs",
    make: aSong,
    change: { tune: { kind: "span", lowMidi: 62, highMidi: 76, home: "G" }, tempo: null },
    spoil: { tune: { kind: "span", lowMidi: 62, highMidi: 60, home: "G" } },
    spoiled: "tune",
    changed: { revision: 2 },
  },
  {
    name: "decisions",
    make: () => aDecision(songId, voiceId),
    change: { tonic: "C", way: null },
    spoil: { tonic: "H" },
    spoiled: "tonic",
    byDefault: ["earlier"],
  },
  {
    name: "tries",
    make: () => aTry(songId, voiceId),
    change: { effort: null, measures: null },
    spoil: { effort: 0 },
    spoiled: "effort",
    byDefault: ["tempo"],
  },
  {
    name: "instruments",
    make: anInstrument,
    change: { fretMap: [2, 4, 5, 7], favourite: true },
    spoil: { strings: [{ note: "Q4", gaugeIn: null, material: "nylon" }] },
    spoiled: "strings.0.note",
  },
  {
    name: "wishes",
    make: someWishes,
    change: { neverRetune: false, known: [] },
    spoil: { known: [{ tuning: "5 4", shapes: ["two fingers"] }] },
    spoiled: "known.0.shapes.0",
  },
  {
    name: "line-ups",
    make: () => aLineUp(songId),
    change: { players: [] },
    spoil: { players: [{ id: randomUUID(), name: " ", instrument: "banjo", way: null }] },
    spoiled: "players.0.name",
  },
  {
    name: "arrangements",
    make: () => anArrangement(songId),
    change: { name: "For the concert", pattern: { name: "Own", beats: 3, steps: ["bass", "rest", "down", "up"] } },
    spoil: { pattern: { name: "Own", beats: 4, steps: ["slap"] } },
    spoiled: "pattern.steps.0",
  },
];

describe.each(collections)("$name", ({ name, make, change, spoil, spoiled, byDefault = [], changed: counted = {} }) => {
  const at = (id: string) => `/api/${name}/${id}`;

  it("keeps an item exactly as it was sent and gives it back, alone and in the list", async () => {
    const item = make();
    const created = await owner.put(at(item.id), item).expect(201);
    expect(created.body).toEqual(item);
    expect((await owner.get(at(item.id)).expect(200)).body).toEqual(item);
    expect((await owner.get(`/api/${name}`).expect(200)).body).toContainEqual(item);
  });

  it("answers the same request again with 200 and the same item", async () => {
    const item = make();
    await owner.put(at(item.id), item).expect(201);
    const again = await owner.put(at(item.id), item).expect(200);
    expect(again.body).toEqual(item);
    const list = (await owner.get(`/api/${name}`)).body as { id: string }[];
    expect(list.filter(({ id }) => id === item.id)).toHaveLength(1);
  });

  it("replaces an item as a whole and keeps its place in the list", async () => {
    const item = make();
    await owner.put(at(item.id), item).expect(201);
    const place = (await owner.get(`/api/${name}`)).body.findIndex(({ id }: { id: string }) => id === item.id);
    const changed = { ...item, ...change, ...counted };
    const answer = await owner.put(at(item.id), { ...item, ...change }).expect(200);
    expect(answer.body).toEqual(changed);
    expect((await owner.get(`/api/${name}`)).body[place]).toEqual(changed);
  });

  it("creates an item once when the same request comes five times at once", async () => {
    for (let round = 0; round < 20; round++) {
      const item = make();
      const answers = await Promise.all(Array.from({ length: 5 }, () => owner.put(at(item.id), item)));
      const statuses = answers.map(({ status }) => status).sort();
      expect(statuses).toEqual([200, 200, 200, 200, 201]);
    }
  });

  it("removes an item, once", async () => {
    const item = make();
    await owner.put(at(item.id), item).expect(201);
    expect((await owner.delete(at(item.id)).expect(204)).text).toBe("");
    await owner.delete(at(item.id)).expect(404);
    await owner.get(at(item.id)).expect(404);
  });

  it("is as if it did not exist for somebody else, who can neither see, change nor remove it", async () => {
    const item = make();
    await owner.put(at(item.id), item).expect(201);
    const seen = await stranger.get(at(item.id)).expect(404);
    const unknown = await stranger.get(at(randomUUID())).expect(404);
    expect(seen.body).toEqual(unknown.body);
    expect((await stranger.get(`/api/${name}`).expect(200)).body).toEqual([]);
    await stranger.delete(at(item.id)).expect(404);
    await stranger.put(at(item.id), { ...item, ...change }).expect(404);
    expect((await owner.get(at(item.id)).expect(200)).body).toEqual(item);
  });

  it("asks who is there", async () => {
    const item = make();
    const anonymous = request(server.app);
    for (const test of [
      anonymous.get(`/api/${name}`),
      anonymous.get(at(item.id)),
      anonymous.put(at(item.id)).send(item),
      anonymous.delete(at(item.id)),
    ]) {
      const response = await test;
      expect([response.status, response.body.code]).toEqual([401, "no-session"]);
    }
  });

  it("names the field that does not fit, and saves nothing", async () => {
    const item = make();
    const response = await owner.put(at(item.id), { ...item, ...spoil }).expect(422);
    expect(response.body).toMatchObject({
      code: "invalid",
      message: expect.stringMatching(/\.$/),
      fields: [{ path: spoiled }],
    });
    await owner.get(at(item.id)).expect(404);
  });

  it("refuses fields it does not know, such as another owner", async () => {
    const item = make();
    const response = await owner.put(at(item.id), { ...item, userId: stranger.id }).expect(422);
    expect(response.body.fields).toEqual([{ path: "userId", message: expect.any(String) }]);
  });

  it("names every field that is missing", async () => {
    const id = randomUUID();
    const required = Object.keys(make()).filter((key) => key !== "id" && !byDefault.includes(key));
    const response = await owner.put(at(id), { id }).expect(422);
    const named = (response.body.fields as { path: string; message: string }[]).map(({ path }) => path);
    expect(named.sort()).toEqual(required.sort());
  });

  it("refuses an id inside that is not the one in the address", async () => {
    const response = await owner.put(at(randomUUID()), make()).expect(422);
    expect(response.body).toMatchObject({ code: "invalid", fields: [{ path: "id" }] });
  });

  it("has nothing under an address that is no id", async () => {
    await owner.get(at("1")).expect(404);
    await owner.delete(at("%27%20or%201=1")).expect(404);
    await owner.get(at("%E0%A4%A")).expect(400);
  });

  it("takes an id in capitals for the same id", async () => {
    const item = make();
    const id = item.id.toUpperCase();
    await owner.put(at(id), { ...item, id }).expect(201);
    expect((await owner.get(at(item.id)).expect(200)).body).toEqual(item);
  });
});
