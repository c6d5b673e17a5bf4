import { studio as studioSchema } from "../../../shared/contract/studio/studio";
import { Person, startTestServer, type TestServer } from "../testServer";
import { give, join, pupilIn, studioOf } from "./studioPeople";

let server: TestServer;
let owner: Person;
let colleague: Person;
let studioId: string;
let colleagueId: string;
beforeAll(async () => {
  server = await startTestServer();
});
afterAll(() => server.close());
beforeEach(async () => {
  owner = await Person.put(server, "singer", true);
  colleague = await Person.put(server, "teacher", true);
  studioId = (await studioOf(owner)).id;
  colleagueId = await join(server, studioId, colleague, { role: "co-teacher", name: "Hob Carrow" });
});

const at = (rest = "") => `/api/studios/${studioId}${rest}`;
const codeOf = async (asking: Promise<{ status: number; body: { code?: string } }>) => {
  const { status, body } = await asking;
  return [status, body.code];
};

it("opens a studio for anybody, whose account becomes a teacher's", async () => {
  const studio = studioSchema.parse((await owner.get(at()).expect(200)).body);
  expect(studio).toMatchObject({ name: "Tuesday evening class", event: null, recordingsKeptDays: 90 });
  expect(studio.me).toMatchObject({ role: "owner", name: "Ruth Callow" });
  expect(studio.teachers.map(({ name }) => name)).toEqual(["Ruth Callow", "Hob Carrow"]);
  expect((await owner.get("/api/account").expect(200)).body.role).toBe("teacher");
});

it("is changed by its teachers, deleted by its owner, and to others it does not exist", async () => {
  const { person: pupil } = await pupilIn(server, studioId);
  const outsider = await Person.put(server, "teacher", true);
  const wanted = { name: "Concert class", event: { name: "Concert", date: "2026-12-10" }, recordingsKeptDays: 90 };
  expect((await colleague.put(at(), wanted).expect(200)).body).toMatchObject(wanted);
  expect(await codeOf(colleague.put(at(), { ...wanted, recordingsKeptDays: 30 }))).toEqual([403, "owner-only"]);
  expect(await codeOf(pupil.put(at(), wanted))).toEqual([403, "teachers-only"]);
  expect(await codeOf(colleague.delete(at()))).toEqual([403, "owner-only"]);
  for (const asked of [outsider.get(at()), outsider.put(at(), wanted), outsider.delete(at())]) await asked.expect(404);
  expect((await outsider.get("/api/studios").expect(200)).body).toEqual([]);
  await owner.delete(at()).expect(204);
  await owner.get(at()).expect(404);
  await pupil.get(at()).expect(404);
});

it("keeps recordings no longer than was said when the pupil agreed; fewer days hold for everybody, more from a new yes on", async () => {
  const { person, memberId } = await pupilIn(server, studioId, { agrees: false });
  await person.put("/api/account/person", { birthYear: 1980, country: null }).expect(200);
  const [part] = (await give(owner, studioId, [memberId])).parts;
  const agree = (yes: boolean) => person.put(at("/consent"), { agree: yes }).expect(200);
  const keep = (days: number) =>
    owner.put(at(), { name: "Tuesday evening class", event: null, recordingsKeptDays: days }).expect(200);
  const kept = async () =>
    Promise.all(
      [at(), `/api/parts/${part!.id}`].map(
        async (path) => (await person.get(path).expect(200)).body.recordingsKeptDays,
      ),
    );
  await agree(true);
  expect((await keep(365)).body.recordingsKeptDays).toBe(365);
  expect(await kept()).toEqual([90, 90]);
  await agree(true);
  expect(await kept()).toEqual([90, 90]);
  await keep(30);
  expect(await kept()).toEqual([30, 30]);
  await keep(365);
  await agree(false);
  await agree(true);
  expect(await kept()).toEqual([365, 365]);
});

it("shows a pupil the teachers and nothing of other pupils, not even how many there are", async () => {
  const { person: pupil } = await pupilIn(server, studioId, { name: "Lowri Tate" });
  const { memberId: otherId } = await pupilIn(server, studioId, { name: "Joss Pell" });
  const seen = await pupil.get(at()).expect(200);
  expect(seen.body.counts).toBeNull();
  expect(JSON.stringify(seen.body)).not.toContain("Joss");
  for (const rest of ["/roster", "/roster.csv", "/groups", "/invites", "/assignments"])
    expect(await codeOf(pupil.get(at(rest)))).toEqual([403, "teachers-only"]);
  await pupil.put(at(`/members/${otherId}`), { name: "Nobody" }).expect(404);
  await pupil.delete(at(`/members/${otherId}`)).expect(404);
});

it("lets everybody choose their own name, and nobody another's", async () => {
  const { person: pupil, memberId } = await pupilIn(server, studioId);
  const { body } = await pupil.put(at(`/members/${memberId}`), { name: " Lowri T. " }).expect(200);
  expect(body.me.name).toBe("Lowri T.");
  expect(await codeOf(owner.put(at(`/members/${memberId}`), { name: "X" }))).toEqual([403, "own-name-only"]);
  await pupil.put(at(`/members/${memberId}`), { name: "" }).expect(422);
});

it("leaves roles to the owner, who passes the studio on to a co-teacher only", async () => {
  const { person: pupil, memberId } = await pupilIn(server, studioId);
  expect(await codeOf(pupil.put(at(`/members/${memberId}`), { role: "owner" }))).toEqual([403, "owner-only"]);
  expect(await codeOf(colleague.put(at(`/members/${memberId}`), { role: "co-teacher" }))).toEqual([403, "owner-only"]);
  expect(await codeOf(owner.put(at(`/members/${memberId}`), { role: "owner" }))).toEqual([409, "not-a-teacher"]);
  await owner.put(at(`/members/${memberId}`), { role: "co-teacher" }).expect(200);
  expect((await pupil.get(at("/roster")).expect(200)).body).toHaveLength(3);
  const passed = await owner.put(at(`/members/${colleagueId}`), { role: "owner" }).expect(200);
  expect(passed.body.me.role).toBe("co-teacher");
  await owner.delete(at()).expect(403);
  await colleague.delete(at()).expect(204);
});

it("keeps its owner: neither leaving nor being removed nor stepping down", async () => {
  const { memberId } = (await owner.get(at())).body.me;
  expect(await codeOf(owner.delete(at(`/members/${memberId}`)))).toEqual([409, "owner-stays"]);
  expect(await codeOf(colleague.delete(at(`/members/${memberId}`)))).toEqual([409, "owner-stays"]);
  expect(await codeOf(owner.put(at(`/members/${memberId}`), { role: "pupil" }))).toEqual([409, "owner-stays"]);
});

it("whoever leaves is gone at once, with what they shared, and keeps their songs", async () => {
  const { person: pupil, memberId } = await pupilIn(server, studioId);
  const [part] = (await give(owner, studioId, [memberId])).parts;
  const group = (await owner.post(at("/groups"), { name: "Altos", memberIds: [memberId] }).expect(201)).body;
  await pupil.delete(at(`/members/${memberId}`)).expect(204);
  expect((await owner.get(at("/roster")).expect(200)).body).toHaveLength(2);
  expect((await owner.get(at("/groups")).expect(200)).body).toEqual([{ ...group, memberIds: [] }]);
  await owner.get(`/api/parts/${part!.id}`).expect(404);
  await owner.get(`/api/parts/${part!.id}/comments`).expect(404);
  await pupil.get(at()).expect(404);
  expect((await pupil.get("/api/parts").expect(200)).body).toEqual([]);
  expect((await pupil.get("/api/songs").expect(200)).body).toHaveLength(1);
  const [row] = await server.database.query("SELECT consent_withdrawn_at FROM studio_members WHERE id = $1", [
    memberId,
  ]);
  expect(row?.consent_withdrawn_at).not.toBeNull();
});

it("a teacher removes pupils, not of another studio, and a role ends with the membership", async () => {
  const { person: pupil, memberId } = await pupilIn(server, studioId);
  const other = await Person.put(server, "teacher", true);
  const elsewhere = (await studioOf(other)).id;
  await other.delete(`/api/studios/${elsewhere}/members/${memberId}`).expect(404);
  await other.delete(at(`/members/${memberId}`)).expect(404);
  await colleague.delete(at(`/members/${memberId}`)).expect(204);
  await pupil.get(at()).expect(404);
  await owner.delete(at(`/members/${colleagueId}`)).expect(204);
  await colleague.get(at("/roster")).expect(404);
});
