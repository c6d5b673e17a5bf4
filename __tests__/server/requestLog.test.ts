import { Writable } from "node:stream";
import { pino } from "pino";
import request from "supertest";
import { password, Person, startTestServer, type TestServer } from "./testServer";

let server: TestServer;
let written = "";
beforeAll(async () => {
  const stream = new Writable({
    write(chunk: Buffer, _encoding, done) {
      written += chunk.toString();
      done();
    },
  });
  server = await startTestServer({}, pino({ level: "info" }, stream));
});
afterAll(() => server.close());
beforeEach(() => (written = ""));

const lines = () =>
  written
    .trim()
    .split("\n")
    .map(
      (line) =>
        JSON.parse(line) as { level: number; req: object; res: object; err?: object; user?: string; refusal?: string },
    );

it("writes one line for each request, with what was asked and answered", async () => {
  await request(server.app).get("/api/nothing?token=in-the-address").expect(404);
  expect(lines()).toMatchObject([{ level: 30, req: { method: "GET", path: "/api/nothing" }, res: { status: 404 } }]);
});

it("says which account asked, and why it was refused", async () => {
  const person = await Person.put(server, "singer", true);
  await person.get("/api/account").expect(200);
  await person.get("/api/admin/users").expect(403);
  await request(server.app).get("/api/account").expect(401);
  const said = lines().map(({ user, refusal, res }) => [user, refusal, res]);
  expect(said).toEqual([
    [person.id, undefined, { status: 200 }],
    [person.id, "not-allowed", { status: 403 }],
    [undefined, "no-session", { status: 401 }],
  ]);
});

it("writes no password, token, cookie, address or query, whether all goes well or not", async () => {
  const email = "quiet@orlow-quay.example";
  const person = await Person.signUp(server.app, email);
  await request(server.app).post("/api/auth/refresh").set("Cookie", person.cookie).expect(200);
  await person.get("/api/account?secret=in-the-address").expect(200);
  await request(server.app).post("/api/auth/sign-in").send({ email, password: "a wrong password" }).expect(401);
  await server.database.query("ALTER TABLE users DROP COLUMN role");
  await request(server.app).post("/api/auth/sign-up").send({ email: "loud@orlow-quay.example", password }).expect(500);

  const failed = lines().filter(({ level }) => level >= 50);
  expect(failed).toEqual(
    expect.arrayContaining([
      expect.objectContaining({ err: expect.objectContaining({ message: expect.stringMatching(/role/) }) }),
    ]),
  );
  const token = person.cookie.split("=")[1] ?? "";
  for (const secret of [
    password,
    "wrong password",
    person.token,
    token,
    "quiet@",
    "loud@",
    "argon2id",
    "in-the-address",
  ]) {
    expect(written).not.toContain(secret);
  }
});
