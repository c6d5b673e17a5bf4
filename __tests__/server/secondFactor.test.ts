import { Secret, TOTP } from "otpauth";
import request from "supertest";
import { clearTraces, confirmedPerson, postAuth } from "./confirmedPerson";
import { password, Person, startTestServer, type TestServer } from "./testServer";

let server: TestServer;
beforeAll(async () => {
  server = await startTestServer();
});
afterAll(() => server.close());
beforeEach(() => clearTraces(server));

const post = (path: string, body: object) => postAuth(server, path, body);
const confirmed = (email?: string) => confirmedPerson(server, email);

describe("codes as a second step", () => {
  const codeOf = (secret: string, steps = 0) =>
    new TOTP({ secret: Secret.fromBase32(secret) }).generate({ timestamp: Date.now() + steps * 30_000 });

  async function withCodes() {
    const person = await confirmed();
    const setup = (await person.post("/api/account/second-factor", { password }).expect(201)).body;
    const on = await person.post("/api/account/second-factor/confirm", { code: codeOf(setup.secret) }).expect(200);
    return { person, secret: setup.secret as string, setup, codes: on.body.recoveryCodes as string[] };
  }

  it("are shown as a picture, count after a first code, and are then asked for", async () => {
    const { person, setup, secret, codes } = await withCodes();
    expect(setup.qrSvg).toMatch(/^<svg [^>]*>/);
    expect(setup.uri).toMatch(/^otpauth:\/\/totp\/Larkspan:/);
    expect(codes).toHaveLength(10);
    expect(new Set(codes).size).toBe(10);
    const first = await post("sign-in", { email: person.email, password }).expect(202);
    expect(Object.keys(first.body).sort()).toEqual(["challenge", "expiresInS"]);
    expect(first.headers["set-cookie"]).toBeUndefined();
    const { challenge } = first.body;
    const bare = request(server.app).get("/api/account").set("Authorization", `Bearer ${challenge}`);
    await bare.expect(401);
    const next = codeOf(secret, 1);
    const inside = await post("second-step", { challenge, code: next }).expect(200);
    expect(inside.body.account).toMatchObject({ id: person.id, secondFactor: true });
    // The same code a second time, by whoever looked over the shoulder.
    expect((await post("second-step", { challenge, code: next }).expect(401)).body.code).toBe("wrong-code");
    const [row] = await server.database.query("SELECT secret FROM second_factors WHERE user_id = $1", [person.id]);
    expect((row?.secret as Buffer).includes(Buffer.from(Secret.fromBase32(secret).bytes))).toBe(false);
  });

  it("end all other sessions when they are switched on, and when they are switched off", async () => {
    const person = await confirmed();
    const elsewhere = async () => {
      const { body } = await post("sign-in", { email: person.email, password });
      return () => request(server.app).get("/api/account").set("Authorization", `Bearer ${body.accessToken}`);
    };
    const before = await elsewhere();
    await before().expect(200);
    const { secret } = (await person.post("/api/account/second-factor", { password }).expect(201)).body;
    const on = await person.post("/api/account/second-factor/confirm", { code: codeOf(secret) }).expect(200);
    await before().expect(401);
    const { challenge } = (await post("sign-in", { email: person.email, password }).expect(202)).body;
    const code = on.body.recoveryCodes[0];
    const { accessToken } = (await post("second-step", { challenge, code }).expect(200)).body;
    await person.post("/api/account/second-factor/off", { password, code: on.body.recoveryCodes[1] }).expect(204);
    await request(server.app).get("/api/account").set("Authorization", `Bearer ${accessToken}`).expect(401);
    await person.get("/api/account").expect(200);
  });

  it("can be replaced by a recovery code, each once, and the owner is told", async () => {
    const { person, codes } = await withCodes();
    const { challenge } = (await post("sign-in", { email: person.email, password }).expect(202)).body;
    await post("second-step", { challenge, code: codes[0]!.toUpperCase().replace("-", " ") }).expect(200);
    await post("second-step", { challenge, code: codes[0]! }).expect(401);
    expect((await person.get("/api/account/second-factor")).body).toEqual({ on: true, recoveryCodesLeft: 9 });
    await server.runJobs();
    expect(server.smtp.mails.map(({ subject }) => subject)).toContain("A recovery code was used");
  });

  it("cannot be guessed: five tries, then none, even with the right code", async () => {
    const { person, codes } = await withCodes();
    await server.database.query("DELETE FROM tries");
    const { challenge } = (await post("sign-in", { email: person.email, password }).expect(202)).body;
    for (let k = 0; k < 5; k++) await post("second-step", { challenge, code: "000000" }).expect(401);
    await post("second-step", { challenge, code: codes[0]! }).expect(429);
    expect((await post("second-step", { challenge: "x", code: "000000" }).expect(401)).body.code).toBe(
      "challenge-expired",
    );
  });

  it("are switched off with password and code, and not before the address is confirmed switched on", async () => {
    const { person, codes } = await withCodes();
    await person.post("/api/account/second-factor", { password }).expect(409);
    await person.post("/api/account/second-factor/off", { password, code: "000000" }).expect(403);
    const fresh = await person.post("/api/account/second-factor/recovery-codes", { password, code: codes[0] });
    expect(fresh.body.recoveryCodes).toHaveLength(10);
    await person.post("/api/account/second-factor/off", { password, code: codes[1] }).expect(403);
    await person.post("/api/account/second-factor/off", { password, code: fresh.body.recoveryCodes[0] }).expect(204);
    await post("sign-in", { email: person.email, password }).expect(200);
    const unconfirmed = await Person.signUp(server.app);
    expect((await unconfirmed.post("/api/account/second-factor", { password }).expect(403)).body.code).toBe(
      "unconfirmed",
    );
  });
});
