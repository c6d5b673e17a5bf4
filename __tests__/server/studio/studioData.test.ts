import { clearTraces, mailTo } from "../confirmedPerson";
import { exportedTexts } from "../exportOf";
import { Person, type TestServer } from "../testServer";
import { give, join, pupilIn } from "./studioPeople";
import { setStudioStage } from "./studioStage";

let server: TestServer;
let teacher: Person;
let studioId: string;
setStudioStage((stage) => ({ server, teacher, studioId } = stage));
beforeEach(() => clearTraces(server));
afterEach(() => server.database.query("DELETE FROM studios"));

async function erase(person: Person): Promise<void> {
  await server.database.query("UPDATE users SET erase_at = now() WHERE id = $1", [person.id]);
  await server.database.query("SELECT larkspan_jobs.add_job('eraseAccounts')");
  await server.runJobs();
}
const rows = async (table: string) => (await server.database.query(`SELECT FROM ${table}`)).length;

it("is in the export: memberships and words of a pupil, what a teacher gave; nothing of anybody else", async () => {
  const [lowri, joss] = [await pupilIn(server, studioId), await pupilIn(server, studioId, { name: "Joss Pell" })];
  const made = await give(teacher, studioId, [lowri.memberId, joss.memberId]);
  const partOf = (memberId: string) => made.parts.find((part) => part.memberId === memberId)!.id;
  await lowri.person.post(`/api/parts/${partOf(lowri.memberId)}/comments`, { text: "High there." }).expect(201);
  await joss.person.post(`/api/parts/${partOf(joss.memberId)}/comments`, { text: "Secret of Joss." }).expect(201);
  const files = await exportedTexts(lowri.person);
  expect(JSON.parse(files["studio/memberships.json"]!)).toMatchObject([
    { studio: "Tuesday evening class", role: "pupil", name: "Lowri Tate" },
  ]);
  expect(JSON.parse(files["studio/parts.json"]!)).toMatchObject([{ title: "Nets in the Loft", tonic: "Bb" }]);
  expect(JSON.parse(files["studio/comments.json"]!)).toMatchObject([{ text: "High there." }]);
  expect(Object.values(files).join("\n")).not.toMatch(/Joss/);
  const ofTeacher = await exportedTexts(teacher);
  expect(JSON.parse(ofTeacher["studio/given.json"]!)).toMatchObject([{ note: "Softly." }]);
  expect(Object.values(ofTeacher).join("\n")).not.toMatch(/Secret|Lowri|Joss/);
});

it("goes with a pupil's account: membership, parts, words, a guardian's address and links", async () => {
  const { person, memberId } = await pupilIn(server, studioId);
  const made = await give(teacher, studioId, [memberId]);
  await person.post(`/api/parts/${made.parts[0]!.id}/comments`, { text: "Secret." }).expect(201);
  const young = { birthYear: new Date().getUTCFullYear() - 12, country: null, endsSharing: true };
  await person.put("/api/account/person", young).expect(200);
  const email = "guardian-of-lowri@orlow-quay.example";
  await person.post("/api/guardian", { email }).expect(202);
  expect((await mailTo(server, email)).token).not.toBe("");
  await erase(person);
  for (const table of ["comments", "assignment_parts", "guardians"])
    expect([table, await rows(table)]).toEqual([table, 0]);
  expect(await server.database.query("SELECT FROM link_tokens WHERE email = $1", [email])).toEqual([]);
  expect((await teacher.get(`/api/studios/${studioId}/roster`).expect(200)).body).toHaveLength(1);
  expect((await teacher.get(`/api/studios/${studioId}/assignments`).expect(200)).body).toHaveLength(1);
});

it("an owner's account passes the studio to the co-teacher who is there longest, and else takes it along", async () => {
  const [first, second] = [await Person.put(server, "teacher", true), await Person.put(server, "teacher", true)];
  await join(server, studioId, first, { role: "co-teacher", name: "Hob" });
  await join(server, studioId, second, { role: "co-teacher", name: "Odile" });
  const { person: pupil } = await pupilIn(server, studioId);
  await erase(teacher);
  const { body } = await first.get(`/api/studios/${studioId}`).expect(200);
  expect(body.me.role).toBe("owner");
  expect(body.teachers.map(({ name }: { name: string }) => name)).toEqual(["Hob", "Odile"]);
  await erase(second);
  await pupil.get(`/api/studios/${studioId}`).expect(200);
  await erase(first);
  await pupil.get(`/api/studios/${studioId}`).expect(404);
  expect(await server.database.query("SELECT FROM studios WHERE id = $1", [studioId])).toEqual([]);
});

it("the words of a colleague who is erased go with them, and what they gave stays", async () => {
  const colleague = await Person.put(server, "teacher", true);
  await join(server, studioId, colleague, { role: "co-teacher", name: "Hob" });
  const { person, memberId } = await pupilIn(server, studioId);
  const [part] = (await give(colleague, studioId, [memberId])).parts;
  await colleague.post(`/api/parts/${part!.id}/comments`, { text: "Breathe." }).expect(201);
  await erase(colleague);
  expect((await person.get(`/api/parts/${part!.id}`).expect(200)).body.assignedBy).toBeNull();
  expect((await person.get(`/api/parts/${part!.id}/comments`).expect(200)).body).toEqual([]);
});
