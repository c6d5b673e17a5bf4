import { request as httpRequest } from "node:http";
import type { AddressInfo } from "node:net";
import { gzipSync } from "node:zlib";
import request from "supertest";
import { aSong, aVoice } from "./belongings";
import { Person, startTestServer, type TestServer } from "./testServer";

let server: TestServer;
let person: Person;
beforeAll(async () => {
  server = await startTestServer();
  person = await Person.signUp(server.app);
});
afterAll(() => server.close());

const put = (path: string, type: string, body: string) =>
  request(server.app).put(path).set("Authorization", `Bearer ${person.token}`).set("Content-Type", type).send(body);

it.each([
  ["half an object", '{"id":'],
  ["a lone text", '"voice"'],
  ["no JSON at all", "id=1"],
])("answers %s with 400 and says that it is not JSON", async (_what, body) => {
  const response = await put(`/api/voices/${aVoice().id}`, "application/json", body).expect(400);
  expect(response.body).toEqual({ code: "malformed-json", message: expect.stringMatching(/JSON/) });
});

it.each([
  ["an array", "[]"],
  ["an empty object", "{}"],
  ["a dangerous key", '{"__proto__":{"role":"admin"}}'],
])("answers %s where an item belongs with 422", async (_what, body) => {
  const response = await put(`/api/voices/${aVoice().id}`, "application/json", body).expect(422);
  expect(response.body.code).toBe("invalid");
});

it("answers a request without a body with 415", async () => {
  const voice = aVoice();
  const response = await request(server.app)
    .put(`/api/voices/${voice.id}`)
    .set("Authorization", `Bearer ${person.token}`)
    .expect(415);
  expect(response.body.code).toBe("unsupported-media-type");
});

it("answers a body of another type with 415", async () => {
  const voice = aVoice();
  const response = await put(`/api/voices/${voice.id}`, "text/plain", JSON.stringify(voice)).expect(415);
  expect(response.body.code).toBe("unsupported-media-type");
});

it("takes the longest chart and the longest tune that the contract allows", async () => {
  const notes = Array.from({ length: 10_000 }, (_, k) => ({
    start: k / 3,
    duration: 1 / 3,
    midi: 60.123456789 + (k % 12),
  }));
  const song = aSong({ chart: "♯".repeat(100_000), tune: { kind: "melody", notes, home: "G" } });
  const response = await person.put(`/api/songs/${song.id}`, song).expect(201);
  expect(response.body).toEqual(song);
});

it("answers a longer chart with 422 and a sentence", async () => {
  const song = aSong({ chart: "x".repeat(100_001) });
  const response = await person.put(`/api/songs/${song.id}`, song).expect(422);
  expect(response.body.fields).toEqual([{ path: "chart", message: "A chart may have at most 100,000 characters." }]);
});

it("answers more than 2 MB with 413, packed or not", async () => {
  const big = JSON.stringify(aSong({ chart: "x".repeat(2_100_000) }));
  const response = await put(`/api/songs/${aSong().id}`, "application/json", big).expect(413);
  expect(response.body).toMatchObject({ code: "too-large", message: expect.stringMatching(/2 MB/) });
  expect(await sendPacked(gzipSync(big))).toBe(413);
});

it.each([
  ["a NUL character", { name: "a\u0000b" }],
  ["half a character", { byHand: null, name: "\ud83c" }],
  ["a time before the calendar", { createdAt: "0000-01-01T00:00:00Z" }],
])("never answers %s with a fault of its own", async (_what, change) => {
  const voice = { ...aVoice(), ...change };
  const response = await person.put(`/api/voices/${voice.id}`, voice);
  expect([201, 422]).toContain(response.status);
  await person.get("/api/voices").expect(200);
});

it("names at most twenty fields", async () => {
  const notes = Array.from({ length: 50 }, () => ({ start: -1, duration: 0, midi: 200 }));
  const song = { ...aSong(), tune: { kind: "melody", notes, home: "G" } };
  const response = await person.put(`/api/songs/${song.id}`, song).expect(422);
  expect(response.body.fields).toHaveLength(20);
  expect(response.body.fields[0].path).toBe("tune.notes.0.start");
});

it.each([
  ["get", "/api"],
  ["get", "/api/nothing"],
  ["patch", "/api/songs/1/2"],
] as const)("answers %s %s with 404 in JSON", async (method, path) => {
  const response = await request(server.app)[method](path).expect(404).expect("Content-Type", /json/);
  expect(response.body).toMatchObject({ code: "not-found" });
});

it.each([
  ["post", "/api/voices", "GET, HEAD"],
  ["delete", "/api/auth/sign-in", "POST"],
  ["patch", "/api/songs/1", "GET, HEAD, PUT, DELETE"],
  ["put", "/api/health/", "GET, HEAD"],
] as const)("answers %s %s with 405 in JSON, and says what it takes", async (method, path, allowed) => {
  const response = await request(server.app)[method](path).expect(405).expect("Content-Type", /json/);
  expect(response.headers.allow).toBe(allowed);
  expect(response.body).toEqual({
    code: "method-not-allowed",
    message: expect.stringContaining(` takes ${allowed}.`),
  });
});

it("tells nothing about a fault of its own", async () => {
  const broken = await startTestServer();
  try {
    const someone = await Person.signUp(broken.app);
    await broken.database.query("ALTER TABLE songs DROP COLUMN title");
    const response = await someone.get("/api/songs").expect(500);
    expect(response.body).toEqual({ code: "fault", message: expect.any(String) });
    expect(response.text).not.toMatch(/title|column|at |node_modules/);
  } finally {
    await broken.close();
  }
});

it("answers 503 while the database is away, in health and elsewhere", async () => {
  const severed = await startTestServer();
  const someone = await Person.signUp(severed.app);
  expect((await request(severed.app).get("/api/health").expect(200)).body).toEqual({ status: "ok", database: "up" });
  await severed.database.drop();
  expect((await request(severed.app).get("/api/health").expect(503)).body).toEqual({
    status: "down",
    database: "down",
  });
  expect((await someone.get("/api/songs").expect(503)).body.code).toBe("unavailable");
  await expect(severed.close()).rejects.toThrow(/does not exist/);
});

/** Supertest does not send a packed body as it is. */
async function sendPacked(body: Buffer): Promise<number | undefined> {
  const listening = server.app.listen(0, "127.0.0.1");
  try {
    await new Promise((resolve) => listening.once("listening", resolve));
    const { port } = listening.address() as AddressInfo;
    return await new Promise((resolve, reject) => {
      const headers = {
        "Content-Type": "application/json",
        "Content-Encoding": "gzip",
        Authorization: `Bearer ${person.token}`,
      };
      const sending = httpRequest(
        { port, host: "127.0.0.1", method: "PUT", path: `/api/songs/${aSong().id}`, headers },
        (response) => {
          response.resume();
          resolve(response.statusCode);
        },
      );
      sending.on("error", reject);
      sending.end(body);
    });
  } finally {
    listening.close();
  }
}
