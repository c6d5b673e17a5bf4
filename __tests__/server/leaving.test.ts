import { aSong, aVoice } from "./belongings";
import { another, clearTraces, confirmedPerson, mailTo as newestMail, postAuth } from "./confirmedPerson";
import { exportedTexts } from "./exportOf";
import { password, startTestServer, type TestServer } from "./testServer";

let server: TestServer;
beforeAll(async () => {
  server = await startTestServer();
});
afterAll(() => server.close());
beforeEach(() => clearTraces(server));

const post = (path: string, body: object) => postAuth(server, path, body);
const mailTo = (email: string) => newestMail(server, email);
const confirmed = (email?: string) => confirmedPerson(server, email);

describe("leaving", () => {
  const due = () => server.database.query("UPDATE users SET erase_at = now() WHERE erase_at IS NOT NULL");
  const eraseDue = async () => {
    await server.database.query("SELECT larkspan_jobs.add_job('eraseAccounts')");
    await server.runJobs();
  };

  it("takes 14 days and a password; whoever signs in before stays", async () => {
    const person = await confirmed();
    await person.post("/api/account/erasure", { password: another }).expect(403);
    const { eraseAt } = (await person.post("/api/account/erasure", { password }).expect(202)).body;
    expect((new Date(eraseAt).getTime() - Date.now()) / 86_400_000).toBeCloseTo(14, 1);
    await person.get("/api/account").expect(401);
    expect((await mailTo(person.email)).mail?.subject).toBe("Your account will be erased");
    await post("sign-in", { email: person.email, password }).expect(200);
    await due();
    await eraseDue();
    await post("sign-in", { email: person.email, password }).expect(200);
  });

  it("erases everything of the account and nothing of others", async () => {
    const [person, other] = [await confirmed(), await confirmed()];
    for (const each of [person, other]) {
      const [voice, song] = [aVoice(), aSong()];
      await each.put(`/api/voices/${voice.id}`, voice).expect(201);
      await each.put(`/api/songs/${song.id}`, song).expect(201);
    }
    await person.post("/api/account/erasure", { password }).expect(202);
    await server.runJobs();
    await due();
    await eraseDue();
    const columns = await server.database.query(
      "SELECT table_name FROM information_schema.columns WHERE column_name = 'user_id' AND table_schema = 'public'",
    );
    expect(columns.length).toBeGreaterThan(10);
    for (const { table_name } of columns) {
      const left = await server.database.query(`SELECT FROM ${table_name} WHERE user_id = $1`, [person.id]);
      expect([table_name, left.length]).toEqual([table_name, 0]);
    }
    expect(await server.database.query("SELECT FROM users WHERE id = $1", [person.id])).toEqual([]);
    await post("sign-in", { email: person.email, password }).expect(401);
    expect((await other.get("/api/songs").expect(200)).body).toHaveLength(1);
  });

  it("with everything: one archive, charts as text, no secrets and nothing of others", async () => {
    const [person, other] = [await confirmed(), await confirmed()];
    const song = aSong({ title: "Nets / in: the Loft" });
    await person.put(`/api/songs/${song.id}`, song).expect(201);
    const files = await exportedTexts(person);
    expect(files[`songs/charts/Nets in the Loft ${song.id.slice(0, 8)}.txt`]).toBe(song.chart);
    expect(JSON.parse(files["songs/songs.json"]!)).toMatchObject([{ id: song.id }]);
    expect(files["account/account.json"]).toContain(person.email);
    const all = Object.values(files).join("\n");
    expect(all).not.toMatch(/argon2|password_?hash|token_?hash/i);
    expect(all).not.toContain(other.email);
  });
});
