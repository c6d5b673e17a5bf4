import jwt from "jsonwebtoken";
import request from "supertest";
import { signChallenge } from "../../server/auth/accessToken";
import { cookieOf, password, Person, setCookies, startTestServer, type TestServer, tokenSecret } from "./testServer";

let server: TestServer;
beforeAll(async () => {
  server = await startTestServer();
});
afterAll(() => server.close());

const post = (path: string, cookie?: string) => {
  const asking = request(server.app).post(`/api/auth/${path}`);
  return cookie ? asking.set("Cookie", cookie) : asking;
};

/** As if the tokens used so far had been used long before the grace of two tabs. */
const letGracePass = () => server.database.query("UPDATE refresh_tokens SET used_at = used_at - interval '11 seconds'");

describe("the refresh token", () => {
  it("is exchanged for a new one, again and again", async () => {
    const person = await Person.signUp(server.app);
    let cookie = person.cookie;
    const seen = new Set([cookie]);
    for (let k = 0; k < 3; k++) {
      const response = await post("refresh", cookie).expect(200);
      expect(response.body).toMatchObject({ expiresInS: 600, account: { id: person.id, email: person.email } });
      cookie = cookieOf(response);
      expect(seen).not.toContain(cookie);
      seen.add(cookie);
      await request(server.app)
        .get("/api/account")
        .set("Authorization", `Bearer ${response.body.accessToken}`)
        .expect(200);
    }
  });

  it("ends the whole session when it comes back after its use: it was copied", async () => {
    const { cookie: stolen } = await Person.signUp(server.app);
    const next = cookieOf(await post("refresh", stolen).expect(200));
    await letGracePass();
    const refused = await post("refresh", stolen).expect(401);
    expect(refused.body.code).toBe("no-session");
    expect(setCookies(refused)[0]).toMatch(/^larkspan=;.*Expires=Thu, 01 Jan 1970/);
    await post("refresh", next).expect(401);
  });

  it("leaves the person's other sessions alone when one ends by reuse", async () => {
    const person = await Person.signUp(server.app);
    const elsewhere = cookieOf(await post("sign-in").send({ email: person.email, password }).expect(200));
    await post("refresh", person.cookie).expect(200);
    await letGracePass();
    await post("refresh", person.cookie).expect(401);
    await post("refresh", elsewhere).expect(200);
  });

  it("serves two tabs that send it at once, and both can go on", async () => {
    const { cookie } = await Person.signUp(server.app);
    const tabs = await Promise.all([post("refresh", cookie), post("refresh", cookie), post("refresh", cookie)]);
    expect(tabs.map(({ status }) => status)).toEqual([200, 200, 200]);
    const next = tabs.map(cookieOf);
    expect(new Set(next).size).toBe(3);
    await letGracePass();
    for (const token of next) await post("refresh", token).expect(200);
  });

  it("is of no use after signing out, not even within the grace", async () => {
    const { cookie } = await Person.signUp(server.app);
    const next = cookieOf(await post("refresh", cookie).expect(200));
    const out = await post("sign-out", next).expect(204);
    expect(setCookies(out)[0]).toMatch(/^larkspan=;/);
    await post("refresh", next).expect(401);
    await post("refresh", cookie).expect(401);
  });

  it("ends with its thirty days", async () => {
    const person = await Person.signUp(server.app);
    await server.database.query("UPDATE sessions SET expires_at = now() - interval '1 second' WHERE user_id = $1", [
      person.id,
    ]);
    await post("refresh", person.cookie).expect(401);
  });

  it("ends after ninety days however often it was used", async () => {
    const person = await Person.signUp(server.app);
    const begun = (days: number) =>
      server.database.query("UPDATE sessions SET created_at = now() - make_interval(days => $2) WHERE user_id = $1", [
        person.id,
        days,
      ]);
    await begun(89);
    const used = await post("refresh", person.cookie).expect(200);
    const [row] = await server.database.query(
      "SELECT expires_at < now() + interval '2 days' AS soon FROM sessions WHERE user_id = $1",
      [person.id],
    );
    expect(row?.soon).toBe(true);
    await begun(91);
    const last = await post("refresh", cookieOf(used));
    await post("refresh", cookieOf(last)).expect(401);
  });

  it("ends where the same browser signs in anew", async () => {
    const person = await Person.signUp(server.app);
    await post("sign-in", person.cookie).send({ email: person.email, password }).expect(200);
    await person.get("/api/account").expect(401);
  });

  it("is asked for: without one, or with an invented one, there is no session", async () => {
    for (const cookie of [undefined, "larkspan=", "larkspan=invented", "other=1"]) {
      expect((await post("refresh", cookie).expect(401)).body.code).toBe("no-session");
    }
    await post("sign-out").expect(204);
    await post("sign-out", "larkspan=invented").expect(204);
  });
});

describe("the access token", () => {
  const ask = (token: string) => request(server.app).get("/api/account").set("Authorization", token);
  const claims = (id: string) => ({ sub: id, sid: id, iss: "larkspan", aud: "api" });
  const encode = (part: object) => Buffer.from(JSON.stringify(part)).toString("base64url");

  it("is believed only when this server signed it, by the one algorithm, and it has not expired", async () => {
    const { id, token } = await Person.signUp(server.app);
    await ask(`Bearer ${token}`).expect(200);
    await ask(`bearer ${token}`).expect(200);
    const soon = Math.floor(Date.now() / 1000) + 60;
    const bad = {
      expired: `Bearer ${jwt.sign(claims(id), tokenSecret, { expiresIn: -1 })}`,
      "of another key": `Bearer ${jwt.sign(claims(id), "another secret of the same length, at least")}`,
      "of another issuer": `Bearer ${jwt.sign({ ...claims(id), iss: "somebody" }, tokenSecret)}`,
      "of another algorithm": `Bearer ${jwt.sign(claims(id), tokenSecret, { algorithm: "HS512" })}`,
      unsigned: `Bearer ${encode({ alg: "none", typ: "JWT" })}.${encode({ ...claims(id), exp: soon })}.`,
      "for somebody else": `Bearer ${jwt.sign({ ...claims(id), aud: "elsewhere" }, tokenSecret)}`,
      "without a session": `Bearer ${jwt.sign({ sub: id, iss: "larkspan", aud: "api" }, tokenSecret)}`,
      "of a first step only": `Bearer ${signChallenge(tokenSecret, id)}`,
      "for nobody": `Bearer ${jwt.sign({ iss: "larkspan", aud: "api" }, tokenSecret)}`,
      "for no id": `Bearer ${jwt.sign(claims("1 OR 1=1"), tokenSecret)}`,
      "not a token": "Bearer nonsense",
      "of another scheme": `Basic ${token}`,
      empty: "",
    };
    const told: Record<string, string> = {
      expired: "Your access has expired. Refresh it, or sign in again.",
      "of another scheme": "You are not signed in.",
      empty: "You are not signed in.",
    };
    for (const [what, header] of Object.entries(bad)) {
      const response = await ask(header);
      expect([what, response.status, response.body.code]).toEqual([what, 401, "no-session"]);
      expect(response.headers["www-authenticate"]).toBe("Bearer");
      expect(response.body.message).toBe(told[what] ?? "This access token is not valid.");
    }
  });
});

describe("the cookie", () => {
  it("is out of reach for scripts and other sites; on plain http it has a plain name", async () => {
    const response = await post("sign-up").send({ email: "cookie@orlow-quay.example", password }).expect(201);
    const [cookie = ""] = setCookies(response);
    expect(cookie).toMatch(/^larkspan=[\w-]{43}; Max-Age=2592000; Path=\/; Expires=[^;]+; HttpOnly; SameSite=Strict$/);
  });

  it("is Secure and bound to the host behind TLS, and is cleared with the same flags", async () => {
    const behindTls = await startTestServer({ publicOrigin: "https://larkspan.example", trustProxy: 1 });
    try {
      const signUp = await request(behindTls.app)
        .post("/api/auth/sign-up")
        .set("Origin", "https://larkspan.example")
        .send({ email: "a@orlow-quay.example", password })
        .expect(201);
      const [cookie = ""] = setCookies(signUp);
      expect(cookie).toMatch(
        /^__Host-larkspan=[\w-]{43}; Max-Age=2592000; Path=\/; Expires=[^;]+; HttpOnly; Secure; SameSite=Strict$/,
      );
      expect(signUp.headers["strict-transport-security"]).toMatch(/^max-age=31536000/);
      const refresh = request(behindTls.app).post("/api/auth/refresh");
      await refresh.set("Cookie", cookieOf(signUp).replace("__Host-", "")).expect(401);
      const out = await request(behindTls.app).post("/api/auth/sign-out").set("Cookie", cookieOf(signUp)).expect(204);
      expect(setCookies(out)[0]).toMatch(
        /^__Host-larkspan=; Path=\/; Expires=Thu, 01 Jan 1970 00:00:00 GMT; HttpOnly; Secure; SameSite=Strict$/,
      );
    } finally {
      await behindTls.close();
    }
  });
});

describe("pages of other sites", () => {
  it.each([
    ["Sec-Fetch-Site", "cross-site", 403],
    ["Sec-Fetch-Site", "same-site", 403],
    ["Sec-Fetch-Site", "same-origin", 200],
    ["Origin", "https://elsewhere.example", 403],
    ["Origin", "null", 403],
    ["Origin", "http://larkspan.test:8400", 200],
  ])("%s: %s is answered with %i", async (header, value, status) => {
    const { cookie } = await Person.signUp(server.app);
    const response = await post("refresh", cookie).set("Host", "larkspan.test:8400").set(header, value).expect(status);
    if (status === 403) {
      expect(response.body.code).toBe("other-origin");
      await post("refresh", cookie).expect(200);
    }
  });

  it("cannot sign anybody in by a form", async () => {
    const { email } = await Person.signUp(server.app);
    for (const type of ["application/x-www-form-urlencoded", "text/plain", "multipart/form-data; boundary=x"]) {
      const response = await post("sign-in")
        .set("Content-Type", type)
        .send(JSON.stringify({ email, password }))
        .expect(415);
      expect(response.body.code).toBe("unsupported-media-type");
    }
  });
});
