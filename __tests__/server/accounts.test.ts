import request from "supertest";
import type { OpenSession } from "../../shared/contract/account";
import { another, clearTraces, confirmedPerson, mailTo as newestMail, postAuth } from "./confirmedPerson";
import { cookieOf, password, Person, startTestServer, type TestServer } from "./testServer";

let server: TestServer;
beforeAll(async () => {
  server = await startTestServer();
});
afterAll(() => server.close());
beforeEach(() => clearTraces(server));

const post = (path: string, body: object) => postAuth(server, path, body);
const mailTo = (email: string) => newestMail(server, email);
const confirmed = (email?: string) => confirmedPerson(server, email);

describe("signing up", () => {
  it("asks by mail whether the address is one's own; the link is good once, for its account only", async () => {
    const person = await Person.signUp(server.app);
    const stranger = await Person.signUp(server.app);
    const { mail, token } = await mailTo(person.email);
    expect(mail?.subject).toBe("Is this your address?");
    expect(mail?.text).toContain("http://larkspan.test/account/confirm#");
    expect((await stranger.post("/api/account/email/confirm", { token }).expect(410)).body.code).toBe("link-not-valid");
    const done = await person.post("/api/account/email/confirm", { token }).expect(200);
    expect(done.body).toMatchObject({ id: person.id, confirmed: true });
    await person.post("/api/account/email/confirm", { token }).expect(410);
    expect((await person.post("/api/account/email/resend").expect(409)).body.code).toBe("already-confirmed");
  });

  it("sends the link once more on demand, and only the newest is good", async () => {
    const person = await Person.signUp(server.app);
    const first = (await mailTo(person.email)).token;
    server.smtp.mails.length = 0;
    await person.post("/api/account/email/resend").expect(202);
    const second = (await mailTo(person.email)).token;
    await person.post("/api/account/email/confirm", { token: first }).expect(410);
    await person.post("/api/account/email/confirm", { token: second }).expect(200);
  });

  it("answers for a known address as for a new one, keeps the two accounts apart, and tells the owner", async () => {
    const owner = await confirmed();
    const known = await post("sign-up", { email: owner.email, password: another }).expect(201);
    const fresh = await post("sign-up", { email: "fresh@orlow-quay.example", password: another }).expect(201);
    const shape = ({ body }: { body: Record<string, unknown> }) => ({
      ...body,
      accessToken: "…",
      account: { ...(body.account as object), id: "…", email: "…" },
    });
    expect(shape(known)).toEqual(shape(fresh));
    expect(known.body.account.id).not.toBe(owner.id);
    const { mail } = await mailTo(owner.email);
    expect(mail?.subject).toBe("You have an account already");
    expect(mail?.text).not.toContain("#");
    // Each password opens its own account, as if the other did not exist.
    expect((await post("sign-in", { email: owner.email, password: another }).expect(200)).body.account.id).toBe(
      known.body.account.id,
    );
    expect((await post("sign-in", { email: owner.email, password }).expect(200)).body.account.id).toBe(owner.id);
  });

  it("with the right password of an account that exists is signing in", async () => {
    const owner = await confirmed();
    const again = await post("sign-up", { email: owner.email, password }).expect(201);
    expect(again.body.account).toMatchObject({ id: owner.id, confirmed: true });
  });

  it("lets only one of those who claim an address have it confirmed", async () => {
    const email = "claimed@orlow-quay.example";
    const squatter = await Person.signUp(server.app, email);
    const { token } = await mailTo(email);
    server.smtp.mails.length = 0;
    const owner = await post("sign-up", { email, password: another }).expect(201);
    const own = (await mailTo(email)).token;
    await request(server.app)
      .post("/api/account/email/confirm")
      .set("Authorization", `Bearer ${owner.body.accessToken}`)
      .send({ token: own })
      .expect(200);
    const late = await squatter.post("/api/account/email/confirm", { token }).expect(409);
    expect(late.body.code).toBe("address-in-use");
  });

  it.each([
    ["on a list", "qwertyuiop123456"],
    ["on a list, with digits behind", "Password12345678"],
    ["one thing again and again", "abababababababab"],
    ["the address itself", "jonna.reed@orlow-quay.example"],
    ["the product's name", "Larkspan-2026"],
  ])("refuses a password that is easy to guess: %s", async (_what, guessed) => {
    const refused = await post("sign-up", { email: "jonna.reed@orlow-quay.example", password: guessed }).expect(422);
    expect(refused.body.fields).toEqual([{ path: "password", message: expect.stringContaining("easy to guess") }]);
  });
});

describe("a forgotten password", () => {
  it("is replaced by the link, once; every session ends and the owner is told", async () => {
    const person = await confirmed();
    await post("forgotten", { email: person.email.toUpperCase() }).expect(202);
    const { mail, token } = await mailTo(person.email);
    expect(mail?.text).toContain("/account/reset#");
    await post("reset", { token, password: "123456789012" }).expect(422);
    const both = await Promise.all([1, 2].map(() => post("reset", { token, password: another })));
    expect(both.map(({ status }) => status).sort()).toEqual([204, 410]);
    await person.get("/api/account").expect(401);
    await request(server.app).post("/api/auth/refresh").set("Cookie", person.cookie).expect(401);
    await post("sign-in", { email: person.email, password }).expect(401);
    await post("sign-in", { email: person.email, password: another }).expect(200);
    expect((await mailTo(person.email)).mail?.subject).toBe("Your password was changed");
  });

  it("is answered the same for an unknown address, to which nothing is sent", async () => {
    const person = await Person.signUp(server.app);
    const known = await post("forgotten", { email: person.email }).expect(202);
    const unknown = await post("forgotten", { email: "nobody@orlow-quay.example" }).expect(202);
    expect([unknown.text, unknown.status]).toEqual([known.text, known.status]);
    expect((await mailTo("nobody@orlow-quay.example")).mail).toBeUndefined();
  });

  it("has an hour, and is asked for five times an hour at most", async () => {
    const person = await confirmed();
    await post("forgotten", { email: person.email }).expect(202);
    const { token } = await mailTo(person.email);
    await server.database.query("UPDATE link_tokens SET expires_at = expires_at - interval '1 hour'");
    await post("reset", { token, password: another }).expect(410);
    for (let k = 0; k < 4; k++) await post("forgotten", { email: person.email }).expect(202);
    expect((await post("forgotten", { email: person.email }).expect(429)).body.code).toBe("too-many-tries");
  });
});

describe("changing", () => {
  it("the address: the new one is asked, the old one told; until then all stays", async () => {
    const person = await confirmed();
    const email = "moved@orlow-quay.example";
    expect((await person.post("/api/account/email", { email, password: another }).expect(403)).body.code).toBe(
      "wrong-password",
    );
    await person.post("/api/account/email", { email, password }).expect(202);
    const { mail, token } = await mailTo(email);
    expect(mail?.subject).toBe("Use this address from now on?");
    expect((await mailTo(person.email)).mail?.subject).toBe("Your e-mail address is about to change");
    expect((await person.get("/api/account")).body.email).toBe(person.email);
    expect((await person.post("/api/account/email/confirm", { token }).expect(200)).body.email).toBe(email);
    await post("sign-in", { email, password }).expect(200);
    await post("sign-in", { email: person.email, password }).expect(401);
    expect((await mailTo(person.email)).mail?.subject).toBe("Your e-mail address was changed");
  });

  it("to the address of somebody else is answered alike and only tells its owner", async () => {
    const [person, owner] = [await confirmed(), await confirmed()];
    await person.post("/api/account/email", { email: owner.email, password }).expect(202);
    const { mail, token } = await mailTo(owner.email);
    expect([mail?.subject, token]).toEqual(["You have an account already", ""]);
  });

  it("the password: asks the present one and ends all other sessions", async () => {
    const person = await confirmed();
    const elsewhere = cookieOf(await post("sign-in", { email: person.email, password }).expect(200));
    await person.post("/api/account/password", { present: another, next: another }).expect(403);
    await person.post("/api/account/password", { present: password, next: another }).expect(204);
    await person.get("/api/account").expect(200);
    await request(server.app).post("/api/auth/refresh").set("Cookie", elsewhere).expect(401);
    expect((await mailTo(person.email)).mail?.subject).toBe("Your password was changed");
    for (let k = 0; k < 10; k++) await person.post("/api/account/password", { present: "a guess", next: another });
    await person.post("/api/account/password", { present: another, next: password }).expect(429);
  });
});

describe("sessions", () => {
  it("are listed by device and end one by one, at once", async () => {
    const person = await Person.signUp(server.app);
    const other = await post("sign-in", { email: person.email, password })
      .set("User-Agent", "Mozilla/5.0 (X11; Linux x86_64; rv:140.0) Gecko/20100101 Firefox/140.0")
      .expect(200);
    const list = (await person.get("/api/account/sessions").expect(200)).body as OpenSession[];
    expect(list.map(({ device, current }) => [device, current]).sort()).toEqual([
      ["Firefox on Linux", false],
      ["Unknown device", true],
    ]);
    const { id } = list.find(({ current }) => !current)!;
    const stranger = await Person.signUp(server.app);
    await stranger.delete(`/api/account/sessions/${id}`).expect(404);
    await person.delete(`/api/account/sessions/${id}`).expect(204);
    await person.delete(`/api/account/sessions/${id}`).expect(404);
    const asOther = request(server.app).get("/api/account").set("Authorization", `Bearer ${other.body.accessToken}`);
    await asOther.expect(401);
  });

  it("end everywhere else, or everywhere", async () => {
    const person = await Person.signUp(server.app);
    await post("sign-in", { email: person.email, password }).expect(200);
    await person.delete("/api/account/sessions?keepThis=true").expect(204);
    expect((await person.get("/api/account/sessions").expect(200)).body).toHaveLength(1);
    await person.delete("/api/account/sessions").expect(204);
    await person.get("/api/account").expect(401);
  });
});

it("birth year and country are told, changed and taken back", async () => {
  const person = await Person.signUp(server.app);
  expect((await person.get("/api/account/person").expect(200)).body).toEqual({ birthYear: null, country: null });
  await person.put("/api/account/person", { birthYear: 2012, country: "DE" }).expect(200);
  expect((await person.get("/api/account/person").expect(200)).body).toEqual({ birthYear: 2012, country: "DE" });
  await person.put("/api/account/person", { birthYear: 12, country: "Germany" }).expect(422);
});
