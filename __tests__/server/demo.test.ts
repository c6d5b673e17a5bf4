import request from "supertest";
import type { DataSource } from "typeorm";
import type { z } from "zod";
import { decision } from "../../shared/contract/decision";
import { ownInstrument } from "../../shared/contract/instrument";
import { song } from "../../shared/contract/song";
import { assignmentListing, partListing } from "../../shared/contract/studio/assignment";
import { studioGroup } from "../../shared/contract/studio/group";
import { rosterRow } from "../../shared/contract/studio/roster";
import { studio as studioSchema } from "../../shared/contract/studio/studio";
import { songVersionEntry } from "../../shared/contract/songVersion";
import { take } from "../../shared/contract/take";
import { voice } from "../../shared/contract/voice";
import { demoSongs } from "../../shared/songs/demoSongs";
import { createDataSource } from "../../server/database/dataSource";
import { demoSignIns, loadDemoScenario } from "../../server/database/demoScenario";
import { startTestServer, type TestServer } from "./testServer";

let server: TestServer;
let dataSource: DataSource;
beforeAll(async () => {
  server = await startTestServer();
  dataSource = await createDataSource(server.database.url, () => undefined).initialize();
});
afterAll(async () => {
  await dataSource.destroy();
  await server.close();
});
beforeEach(() => server.database.query("DELETE FROM users"));

const counts = async () => {
  const rows = await server.database.query(
    `SELECT (SELECT count(*)::int FROM users) AS users, (SELECT count(*)::int FROM songs) AS songs, (SELECT count(*)::int FROM takes) AS takes`,
  );
  return rows[0];
};

async function signIn(email: string, password: string) {
  const session = await request(server.app).post("/api/auth/sign-in").send({ email, password }).expect(200);
  return async <Item>(name: string, schema: z.ZodType<Item>): Promise<Item[]> => {
    const items = await request(server.app)
      .get(`/api/${name}`)
      .set("Authorization", `Bearer ${session.body.accessToken}`)
      .expect(200);
    return (items.body as unknown[]).map((item) => schema.parse(item));
  };
}

it("gives everybody of the class a voice, takes, the songs, keys for two of them and an instrument, all as the contracts say", async () => {
  await loadDemoScenario(dataSource);
  const people = await demoSignIns(dataSource);
  expect(people.map(({ role }) => role)).toEqual(["singer", "singer", "teacher"]);
  for (const { email, password } of people) {
    const list = await signIn(email, password);
    const [voices, takes, songs, decisions, instruments] = await Promise.all([
      list("voices", voice),
      list("takes", take),
      list("songs", song),
      list("decisions", decision),
      list("instruments", ownInstrument),
    ]);
    expect(voices).toHaveLength(1);
    expect(takes.length).toBeGreaterThan(0);
    expect(songs.map((one) => one.demo).sort()).toEqual(demoSongs.map(({ id }) => id).sort());
    expect(songs.every(({ tune }) => tune?.kind === "melody")).toBe(true);
    const lantern = songs.find((one) => one.demo === "lantern")!;
    const versions = await list(`songs/${lantern.id}/versions`, songVersionEntry);
    expect(versions.map(({ by }) => by)).toEqual([email, email]);
    expect(decisions).toHaveLength(2);
    expect(instruments).toHaveLength(1);
    for (const { range, comfort } of takes) {
      expect(comfort.lowMidi).toBeGreaterThanOrEqual(range.lowMidi);
      expect(comfort.highMidi).toBeLessThanOrEqual(range.highMidi);
    }
    for (const { instrument, score, way } of decisions) {
      expect(instrument).toBe(instruments[0]?.id);
      expect(score).toBeGreaterThan(50);
      expect(way).not.toBeNull();
    }
  }
});

it("gives the teacher a studio: a roster as the contract says, groups, a shared key, songs given and how takes felt", async () => {
  await loadDemoScenario(dataSource);
  const people = await demoSignIns(dataSource);
  const studiosOf = async (name: string) => {
    const { email, password } = people.find((person) => person.name === name)!;
    const list = await signIn(email, password);
    const [studio] = await list("studios", studioSchema);
    return { list, studio: studio! };
  };
  const { list, studio } = await studiosOf("Ruth Callow");
  expect(studio).toMatchObject({ event: { date: "2026-12-10" }, counts: { pupils: 11, waiting: 0 } });
  const rows = await list(`studios/${studio.id}/roster`, rosterRow);
  const shown = rows.filter(({ voice, instrument }) => voice && instrument).map(({ name }) => name);
  expect(shown).toHaveLength(9);
  expect(rows.filter(({ consent }) => consent.waitsForGuardian).map(({ name }) => name)).toEqual(["Cass Wether"]);
  expect(rows.find(({ name }) => name === "Joss Pell")?.warnings).toContain("voice is changing: measure again");
  expect(rows.find(({ name }) => name === "Ines Mallory")).toMatchObject({
    lastTake: { effort: 5 },
    warnings: ["very hard last time"],
  });
  const groups = await list(`studios/${studio.id}/groups`, studioGroup);
  expect(groups.map(({ name }) => name)).toEqual(["High voices", "Low voices", "Finale"]);
  expect(groups[2]?.keys).toHaveLength(1);
  const given = await list(`studios/${studio.id}/assignments`, assignmentListing);
  expect(given.map(({ counts }) => counts.parts).sort()).toEqual([11, 2]);
  const { list: listOfMaren } = await studiosOf("Maren Oake");
  const [part] = await listOfMaren("parts", partListing);
  expect((await listOfMaren("songs", song)).map(({ id }) => id)).toContain(part?.songId);
});

it("is loaded once, also when three servers start on the same empty database", async () => {
  await Promise.all([1, 2, 3].map(() => loadDemoScenario(dataSource)));
  await loadDemoScenario(dataSource);
  // Three whom one can be, with all songs, and nine pupils with the one that they were given.
  expect(await counts()).toEqual({ users: 12, songs: 3 * demoSongs.length + 9, takes: 5 + 12 });
});

it("stays out of a database that somebody uses", async () => {
  await server.database.query(
    "INSERT INTO users (email, password_hash) VALUES ('somebody@orlow-quay.example', 'none')",
  );
  await loadDemoScenario(dataSource);
  expect(await counts()).toEqual({ users: 1, songs: 0, takes: 0 });
  expect(await demoSignIns(dataSource)).toEqual([]);
});
