/** The HTTP client and the session together, against the contract kept in memory. */
import { FakeApi } from "@/__tests__/client/fakeApi";
import type * as Client from "./httpClient";
import type * as Store from "./session";

const email = "maren@orlow.example";
const password = "tide tables 1907";

let api: FakeApi;

/** A freshly loaded page in the same browser. */
function openPage() {
  jest.resetModules();
  const { http } = jest.requireActual<typeof Client>("./httpClient");
  const { session } = jest.requireActual<typeof Store>("./session");
  return { http, session };
}

beforeEach(() => {
  localStorage.clear();
  api = new FakeApi();
  api.install();
});

describe("at the start", () => {
  it("takes a first-time visitor for one without asking the server", async () => {
    const { session } = openPage();
    expect(session.current().status).toBe("unknown");
    expect(await session.settled()).toMatchObject({ status: "visitor", account: null, ended: false });
    expect(api.calls).toEqual([]);
  });

  it("finds the person of an earlier visit again, with one request for all who wait", async () => {
    await openPage().session.signUp({ email, password });
    api.calls.length = 0;
    const { session } = openPage();
    const [one, two] = await Promise.all([session.settled(), session.settled()]);
    expect(one).toMatchObject({ status: "signed-in", account: { email } });
    expect(two).toBe(one);
    expect(api.calls).toEqual(["POST /auth/refresh"]);
  });

  it("says that a session ended, and says so again without asking until somebody signs in or stays out", async () => {
    await openPage().session.signUp({ email, password });
    api.endSessions();
    expect(await openPage().session.settled()).toMatchObject({ status: "visitor", ended: true });
    api.calls.length = 0;
    const again = openPage().session;
    expect(await again.settled()).toMatchObject({ status: "visitor", ended: true });
    expect(api.calls).toEqual([]);
    again.stayOut();
    expect(again.current()).toMatchObject({ status: "visitor", ended: false });
    expect(await openPage().session.settled()).toMatchObject({ ended: false });
    await again.signIn({ email, password });
    expect(await openPage().session.settled()).toMatchObject({ status: "signed-in", ended: false });
  });

  it("does not take a person for a visitor while the server is away, and tries again when asked again", async () => {
    await openPage().session.signUp({ email, password });
    const { session } = openPage();
    api.intercept = () => "down";
    await expect(session.settled()).rejects.toMatchObject({ status: 0, code: "offline" });
    expect(session.current()).toMatchObject({ status: "unknown", problem: { code: "offline" } });
    api.intercept = () => undefined;
    expect(await session.settled()).toMatchObject({ status: "signed-in", problem: null });
  });

  it("keeps no token where a script could read it later", async () => {
    await openPage().session.signUp({ email, password });
    expect(JSON.stringify({ ...localStorage, ...sessionStorage })).not.toMatch(/access-|refresh-/);
  });
});

describe("an access token that ran out", () => {
  it("is renewed once for many requests, and each of them is sent once more", async () => {
    const { http, session } = openPage();
    await session.signUp({ email, password });
    api.expireAccessTokens();
    api.calls.length = 0;
    await Promise.all([http.get("/voices"), http.get("/songs"), http.get("/takes")]);
    expect(api.count("POST /auth/refresh")).toBe(1);
    expect(api.calls.filter((call) => call.startsWith("GET"))).toHaveLength(6);
    expect(session.current().status).toBe("signed-in");
  });

  it("is renewed before it is used, once its time is over", async () => {
    const { http, session } = openPage();
    await session.signUp({ email, password });
    api.calls.length = 0;
    const now = Date.now();
    const clock = jest.spyOn(Date, "now").mockReturnValue(now + 601_000);
    await http.get("/songs");
    clock.mockRestore();
    expect(api.calls).toEqual(["POST /auth/refresh", "GET /songs"]);
  });

  it("leads to one more try only", async () => {
    const { http, session } = openPage();
    await session.signUp({ email, password });
    api.intercept = (method) =>
      method === "GET" ? { status: 401, body: { code: "not-signed-in", message: "Sign in first." } } : undefined;
    api.calls.length = 0;
    await expect(http.get("/songs")).rejects.toMatchObject({ status: 401, code: "not-signed-in" });
    expect(api.calls).toEqual(["GET /songs", "POST /auth/refresh", "GET /songs"]);
  });

  it("ends the session when the server knows it no more", async () => {
    const { http, session } = openPage();
    await session.signUp({ email, password });
    api.endSessions();
    await expect(http.get("/songs")).rejects.toMatchObject({ status: 401 });
    expect(session.current()).toMatchObject({ status: "visitor", account: null, ended: true });
  });

  it("stays a session when only the network failed", async () => {
    const { http, session } = openPage();
    await session.signUp({ email, password });
    api.expireAccessTokens();
    api.intercept = (_, path) => (path === "/auth/refresh" ? "down" : undefined);
    await expect(http.get("/songs")).rejects.toMatchObject({ code: "offline" });
    expect(session.current().status).toBe("signed-in");
  });
});

describe("failures", () => {
  it("carry the server's code, sentence and fields", async () => {
    const { session } = openPage();
    await expect(session.signUp({ email, password: "short" })).rejects.toMatchObject({
      status: 422,
      code: "invalid",
      fields: [{ path: "password", message: "Use at least 12 characters." }],
    });
    await expect(session.signIn({ email, password })).rejects.toMatchObject({ status: 401, code: "wrong-credentials" });
    expect(api.count("POST /auth/refresh")).toBe(0);
  });

  it("read an answer that is not the API's own", async () => {
    const { http } = openPage();
    api.intercept = () => ({ status: 502, body: "Bad gateway" });
    await expect(http.get("/songs")).rejects.toMatchObject({ status: 0, code: "offline" });
    api.intercept = () => ({ status: 500, body: null });
    await expect(http.get("/songs")).rejects.toMatchObject({ status: 500, code: "unexpected" });
  });
});

describe("signing out", () => {
  it("ends the session at the server and forgets the token", async () => {
    const { http, session } = openPage();
    await session.signUp({ email, password });
    await session.signOut();
    expect(session.current()).toMatchObject({ status: "visitor", ended: false });
    await expect(http.get("/songs")).rejects.toMatchObject({ status: 401 });
    api.calls.length = 0;
    await openPage().session.settled();
    expect(api.calls).toEqual([]);
  });

  it("stays signed in where the server could not be told", async () => {
    const { session } = openPage();
    await session.signUp({ email, password });
    api.intercept = () => "down";
    await expect(session.signOut()).rejects.toMatchObject({ code: "offline" });
    expect(session.current().status).toBe("signed-in");
  });

  it("is followed by the other tabs", async () => {
    const first = openPage();
    await first.session.signUp({ email, password });
    const second = openPage();
    await second.session.settled();
    const unfollow = second.session.followOtherTabs();
    await first.session.signOut();
    // A browser tells every tab but the one that wrote.
    window.dispatchEvent(new StorageEvent("storage", { key: "larkspan.has-session", newValue: null }));
    expect(second.session.current()).toMatchObject({ status: "visitor", ended: false });
    unfollow();
  });

  it("is told from a session that ran out in another tab", async () => {
    const { session } = openPage();
    await session.signUp({ email, password });
    const unfollow = session.followOtherTabs();
    window.dispatchEvent(new StorageEvent("storage", { key: "larkspan.has-session", newValue: "ended" }));
    expect(session.current()).toMatchObject({ status: "visitor", ended: true });
    unfollow();
  });
});
