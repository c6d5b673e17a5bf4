import { another, clearTraces, confirmedPerson, postAuth } from "./confirmedPerson";
import { password, type Person, startTestServer, type TestServer } from "./testServer";

let server: TestServer;
beforeAll(async () => {
  server = await startTestServer();
});
afterAll(() => server.close());
beforeEach(() => clearTraces(server));

const post = (path: string, body: object) => postAuth(server, path, body);
const confirmed = (email?: string) => confirmedPerson(server, email);

describe("administrators", () => {
  async function admin(): Promise<Person> {
    const person = await confirmed();
    await server.database.query("UPDATE users SET role = 'admin' WHERE id = $1", [person.id]);
    expect((await person.get("/api/admin/users").expect(403)).body.code).toBe("second-factor-required");
    await server.database.query(
      "INSERT INTO second_factors (user_id, secret, confirmed_at) VALUES ($1, 'unused', now())",
      [person.id],
    );
    return person;
  }

  it("find people, suspend them and let them in again, at once; it is written down", async () => {
    const [boss, person] = [await admin(), await confirmed("under.score_100@orlow-quay.example")];
    const found = await boss.get("/api/admin/users").query({ q: "SCORE_100" }).expect(200);
    expect(found.body).toMatchObject([{ id: person.id, suspended: false, confirmed: true }]);
    // What means "anything" to the database means itself to people.
    expect((await boss.get("/api/admin/users").query({ q: "%" }).expect(200)).body).toEqual([]);
    expect(JSON.stringify(found.body)).not.toMatch(/hash|argon/i);
    const path = `/api/admin/users/${person.id}/suspension`;
    expect((await boss.put(path, { suspended: true }).expect(200)).body.suspended).toBe(true);
    await person.get("/api/account").expect(401);
    expect((await post("sign-in", { email: person.email, password }).expect(403)).body.code).toBe("suspended");
    await post("sign-in", { email: person.email, password: another }).expect(401);
    await boss.put(path, { suspended: false }).expect(200);
    await post("sign-in", { email: person.email, password }).expect(200);
    const { body } = await boss.get(`/api/admin/audit?userId=${person.id}`).expect(200);
    const events = body as { what: string; byUserId: string | null; addressHash: string }[];
    expect(events.map(({ what }) => what)).toEqual([
      "signed-in",
      "resumed",
      "suspended",
      "email-confirmed",
      "signed-in",
      "signed-up",
    ]);
    expect(events[1]?.byUserId).toBe(boss.id);
    expect(events[0]?.addressHash).toMatch(/^[0-9a-f]{16}$/);
  });

  it("give roles, but not to themselves", async () => {
    const [boss, person] = [await admin(), await confirmed()];
    const changed = await boss.put(`/api/admin/users/${person.id}/role`, { role: "teacher" }).expect(200);
    expect(changed.body.role).toBe("teacher");
    expect((await person.get("/api/account").expect(200)).body.role).toBe("teacher");
    const own = await boss.put(`/api/admin/users/${boss.id}/role`, { role: "singer" }).expect(409);
    expect(own.body.code).toBe("own-account");
    await boss.put(`/api/admin/users/${boss.id}/suspension`, { suspended: true }).expect(409);
  });

  it("see how queue and mail are", async () => {
    const boss = await admin();
    const { body } = await boss.get("/api/admin/health").expect(200);
    expect(body).toMatchObject({
      queue: { failed: 0 },
      mail: { refused: 0 },
      storage: [{ name: "recordings", up: true }],
    });
    expect(body.mail.sent).toBeGreaterThan(0);
  });
});
