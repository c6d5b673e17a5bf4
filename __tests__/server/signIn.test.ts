import argon2 from "argon2";
import request from "supertest";
import { cookieOf, password, Person, startTestServer, type TestServer } from "./testServer";

let server: TestServer;
/** Hashes with as much work as in earnest. */
let earnest: TestServer;
beforeAll(async () => {
  server = await startTestServer();
  earnest = await startTestServer({ hashCost: undefined });
});
beforeEach(() => server.database.query("DELETE FROM tries"));
afterAll(() => Promise.all([server.close(), earnest.close()]));

const post = (path: string, body: object, to = server) => request(to.app).post(`/api/auth/${path}`).send(body);

it("opens an account, says who is in, and keeps no readable password or token", async () => {
  const response = await post("sign-up", { email: "Maren.Oake@orlow-quay.example", password }, earnest).expect(201);
  expect(response.body).toEqual({
    accessToken: expect.stringMatching(/^[\w-]+\.[\w-]+\.[\w-]+$/),
    expiresInS: 600,
    account: {
      id: expect.any(String),
      email: "Maren.Oake@orlow-quay.example",
      role: "singer",
      confirmed: false,
      secondFactor: false,
    },
  });
  const me = await request(earnest.app)
    .get("/api/account")
    .set("Authorization", `Bearer ${response.body.accessToken}`)
    .expect(200);
  expect(me.body).toEqual(response.body.account);

  const [user] = await earnest.database.query("SELECT password_hash FROM users");
  expect(user?.password_hash).toMatch(/^\$argon2id\$v=19\$m=19456,t=2,p=1\$/);
  const token = cookieOf(response).split("=")[1] ?? "";
  const [stored] = await earnest.database.query(
    "SELECT encode(token_hash, 'escape') AS text, length(token_hash) AS bytes FROM refresh_tokens",
  );
  expect(stored?.bytes).toBe(32);
  expect(stored?.text).not.toContain(token);
});

it("knows an e-mail address in any case, at sign-in and at sign-up", async () => {
  const first = await post("sign-up", { email: "nils@orlow-quay.example", password }).expect(201);
  const again = await post("sign-up", { email: "NILS@Orlow-Quay.example", password }).expect(201);
  expect(again.body.account.id).toBe(first.body.account.id);
  const response = await post("sign-in", { email: "Nils@ORLOW-QUAY.example", password }).expect(200);
  expect(response.body.account.email).toBe("nils@orlow-quay.example");
});

it("opens one account when the form is sent twice at once", async () => {
  const twice = await Promise.all([1, 2].map(() => post("sign-up", { email: "twice@orlow-quay.example", password })));
  expect(twice.map(({ status }) => status).sort()).toEqual([201, 201]);
  expect(twice[0]?.body.account.id).toBe(twice[1]?.body.account.id);
});

it("says the same of a wrong password and of an unknown address, after the same work", async () => {
  const { email } = await Person.signUp(earnest.app);
  const verify = jest.spyOn(argon2, "verify");
  const wrong = await post("sign-in", { email, password: "not the password" }, earnest).expect(401);
  expect(wrong.body).toMatchObject({ code: "wrong-credentials" });
  const nobody = { email: "nobody@orlow-quay.example", password: "not the password" };
  const unknown = await post("sign-in", nobody, earnest).expect(401);
  expect(unknown.body).toEqual(wrong.body);
  const cost = /^\$argon2id\$v=19\$m=19456,t=2,p=1\$/;
  const work = [expect.stringMatching(cost), "not the password"];
  expect(verify.mock.calls).toEqual([work, work, work, work]);
  verify.mockRestore();
});

it("takes a password typed in another Unicode form for the same", async () => {
  const email = "wren@orlow-quay.example";
  await post("sign-up", { email, password: "caf\u00e9 by the quay" }).expect(201);
  await post("sign-in", { email, password: "cafe\u0301 by the quay" }).expect(200);
});

it.each([
  ["an address that is none", { email: "maren at the quay", password }, "email"],
  ["a short password", { email: "a@orlow-quay.example", password: "elevenchars" }, "password"],
  ["a long password", { email: "a@orlow-quay.example", password: "x".repeat(129) }, "password"],
  ["a password that is no text", { email: "a@orlow-quay.example", password: { length: 20 } }, "password"],
  ["no password", { email: "a@orlow-quay.example" }, "password"],
  ["a role of one's choice", { email: "a@orlow-quay.example", password, role: "admin" }, "role"],
])("refuses %s at sign-up and names the field", async (_what, body, path) => {
  const response = await post("sign-up", body).expect(422);
  expect(response.body).toMatchObject({ code: "invalid", fields: [{ path, message: expect.stringMatching(/\.$/) }] });
});

it("stops guesses at one account after ten, from any address, even with the right password", async () => {
  const { email } = await Person.signUp(server.app);
  const guesses = await Promise.all(
    Array.from({ length: 12 }, () => post("sign-in", { email: email.toUpperCase(), password: "a guess" })),
  );
  expect(guesses.map(({ status }) => status).sort()).toEqual([...Array(10).fill(401), 429, 429]);
  const refused = await post("sign-in", { email, password }).expect(429);
  expect(refused.body).toMatchObject({ code: "too-many-tries", message: expect.stringMatching(/15 minutes/) });
  expect(Number(refused.headers["retry-after"])).toBeGreaterThan(800);
  const other = await Person.signUp(server.app);
  await post("sign-in", { email: other.email, password }).expect(200);
});

it("stops guesses from one address after a hundred, whatever the account", async () => {
  await post("sign-in", { email: "nobody@orlow-quay.example", password }).expect(401);
  await server.database.query("UPDATE tries SET points = 100 WHERE key LIKE 'address:%'");
  const { email } = await Person.signUp(server.app);
  const refused = await post("sign-in", { email, password }).expect(429);
  expect(refused.body.code).toBe("too-many-tries");
});

it("does not count right passwords", async () => {
  const { email } = await Person.signUp(server.app);
  for (let k = 0; k < 12; k++) await post("sign-in", { email, password }).expect(200);
  const counted = await server.database.query("SELECT key FROM tries WHERE points > 0 AND key NOT LIKE 'sign-up%'");
  expect(counted).toEqual([]);
});

it("stops one address from opening accounts without end", async () => {
  await post("sign-up", { email: "first@orlow-quay.example", password }).expect(201);
  await server.database.query("UPDATE tries SET points = 50 WHERE key LIKE 'sign-up:%'");
  const refused = await post("sign-up", { email: "last@orlow-quay.example", password }).expect(429);
  expect(refused.body.code).toBe("too-many-tries");
});
