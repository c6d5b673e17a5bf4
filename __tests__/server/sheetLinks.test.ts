import request from "supertest";
import type { MadeSheetLink, SheetLinkRequest } from "../../shared/contract/sheetLink";
import { aSong } from "./belongings";
import { Person, startTestServer, type TestServer } from "./testServer";

let server: TestServer;
let owner: Person;
let other: Person;

beforeAll(async () => {
  server = await startTestServer();
  owner = await Person.signUp(server.app);
  other = await Person.signUp(server.app);
});
afterAll(() => server.close());
beforeEach(() => server.database.query("DELETE FROM tries"));

const view = { tonic: "Bb", shift: 3, instrument: "box-adf", way: { retune: 0, capo: 3, shapeKey: "G" } };

async function make(person: Person, songId: string, changes: Partial<SheetLinkRequest> = {}) {
  return request(server.app)
    .post("/api/sheet-links")
    .set("Authorization", `Bearer ${person.token}`)
    .send({ songId, label: "For the band", days: 30, view, ...changes });
}
async function made(changes: Partial<SheetLinkRequest> = {}) {
  const song = aSong({ tags: ["secret tag"] });
  await owner.put(`/api/songs/${song.id}`, song).expect(201);
  const answer = await make(owner, song.id, changes);
  expect(answer.status).toBe(201);
  return { song, ...(answer.body as MadeSheetLink) };
}
const open = (token: string) => request(server.app).get(`/api/shared/${token}`);
const page = (token: string) => request(server.app).get(`/shared/${token}`);

it("opens a sheet to a stranger: title and chart as they are now, and nothing else of the account", async () => {
  const { song, token } = await made();
  expect(token).toMatch(/^[\w-]{32}$/);
  const answer = await open(token).expect(200);
  expect(answer.headers["x-robots-tag"]).toContain("noindex");
  const { title, chart, writtenKey, beatsPerBar, tempo } = song;
  expect(answer.body).toEqual({
    ...{ title, chart, writtenKey, beatsPerBar, tempo, view },
    expiresAt: expect.stringMatching(/Z$/),
  });
  await owner.put(`/api/songs/${song.id}`, { ...song, title: "New nets", revision: 1 }).expect(200);
  expect((await open(token)).body).toMatchObject({ title: "New nets" });
});

it("keeps a hash only: the address is told once and stands nowhere", async () => {
  const { link, token } = await made();
  const listed = await owner.get("/api/sheet-links").expect(200);
  expect(JSON.stringify(listed.body)).not.toContain(token);
  expect(listed.body).toContainEqual(link);
  const rows = await server.database.query("SELECT row_to_json(l)::text AS all FROM sheet_links l");
  expect(JSON.stringify(rows)).not.toContain(token);
});

it("says when a link was last opened, and lists by song", async () => {
  const { song, link, token } = await made();
  await open(token).expect(200);
  const listed = await owner.get(`/api/sheet-links?songId=${song.id}`).expect(200);
  expect(listed.body).toEqual([{ ...link, openedAt: expect.stringMatching(/Z$/) }]);
});

it("answers 404 to what is no link, by API and by page", async () => {
  for (const token of ["x".repeat(32), "short", "..%2f..", "%00", "é".repeat(32)]) {
    const answer = await open(encodeURIComponent(token)).expect(404);
    expect(answer.body.code).toBe("not-found");
    expect((await page(encodeURIComponent(token))).status).toBe(404);
  }
});

it("answers 410 once it is revoked, and revoking again changes nothing", async () => {
  const { link, token } = await made();
  expect((await page(token)).headers["x-robots-tag"]).toContain("noindex");
  await owner.delete(`/api/sheet-links/${link.id}`).expect(204);
  await owner.delete(`/api/sheet-links/${link.id}`).expect(204);
  expect((await open(token).expect(410)).body.code).toBe("link-revoked");
  expect((await page(token)).status).toBe(410);
  expect((await page(`${token}/stage`)).status).toBe(410);
});

it("answers 410 once its time is over", async () => {
  const { link, token } = await made({ days: 7 });
  expect(Date.parse(link.expiresAt) - Date.parse(link.createdAt)).toBe(7 * 86_400_000);
  await server.database.query(
    `UPDATE sheet_links SET expires_at = now() - interval '1 second' WHERE id = '${link.id}'`,
  );
  expect((await open(token).expect(410)).body.code).toBe("link-expired");
  expect((await page(token)).status).toBe(410);
});

it("answers 404 once the song is deleted", async () => {
  const { song, token } = await made();
  await owner.delete(`/api/songs/${song.id}`).expect(204);
  await open(token).expect(404);
});

it("is nobody else's: not to be made for another's song, listed or ended", async () => {
  const { song, link, token } = await made();
  expect((await make(other, song.id)).body).toMatchObject({ code: "unknown-reference", fields: [{ path: "songId" }] });
  expect((await other.get("/api/sheet-links").expect(200)).body).toEqual([]);
  await other.delete(`/api/sheet-links/${link.id}`).expect(404);
  await open(token).expect(200);
  await request(server.app).post("/api/sheet-links").send({ songId: song.id, label: "", days: 7, view }).expect(401);
});

it.each([
  [{ days: 365 as 30 }, "days"],
  [{ label: "x".repeat(61) }, "label"],
  [{ view: { ...view, tonic: "H" } }, "view.tonic"],
])("names what does not fit", async (changes, path) => {
  const answer = await make(owner, aSong().id, changes);
  expect([answer.status, answer.body.fields[0].path]).toEqual([422, path]);
});

it("lets one address open a hundred and twenty in a minute, and then says how long to wait", async () => {
  const { token } = await made();
  await open(token).expect(200);
  await server.database.query("UPDATE tries SET points = 120 WHERE key LIKE 'shared-sheet%'");
  const answer = await open(token).expect(429);
  expect(Number(answer.headers["retry-after"])).toBeGreaterThan(0);
});
