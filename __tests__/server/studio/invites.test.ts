import { randomUUID } from "node:crypto";
import request from "supertest";
import { type Invite, inviteLook, invite as inviteSchema } from "../../../shared/contract/studio/invite";
import { studio as studioSchema } from "../../../shared/contract/studio/studio";
import { clearTraces, confirmedPerson, mailTo } from "../confirmedPerson";
import { Person, startTestServer, type TestServer } from "../testServer";
import { join, pupilIn, studioOf } from "./studioPeople";

let server: TestServer;
let teacher: Person;
let studioId: string;
beforeAll(async () => {
  server = await startTestServer();
  teacher = await Person.put(server, "singer", true);
});
afterAll(() => server.close());
beforeEach(async () => {
  await clearTraces(server);
  studioId = (await studioOf(teacher)).id;
});

const anAddress = () => `${randomUUID()}@orlow-quay.example`;
const look = (token: string) => request(server.app).post("/api/invites/look").send({ token });
const accept = (person: Person, token: string, changes: object = {}) =>
  person.post("/api/invites/accept", { token, name: "Jonna Reed", agree: false, ...changes });

async function invited(email = anAddress(), changes: object = {}) {
  const { body } = await teacher.post(`/api/studios/${studioId}/invites`, { emails: [email], ...changes }).expect(201);
  const [invite] = (body as Invite[]).map((each) => inviteSchema.parse(each));
  const { mail, token } = await mailTo(server, email);
  return { email, id: invite?.id ?? "", invite, mail, token };
}
const again = (id: string) => `/api/studios/${studioId}/invites/${id}`;

it("goes by mail to each address once, also where one is written twice in other letters", async () => {
  const [one, two] = [anAddress(), anAddress()];
  const emails = [one, two, one.toUpperCase()];
  const { body } = await teacher.post(`/api/studios/${studioId}/invites`, { emails }).expect(201);
  expect(body).toHaveLength(2);
  await server.runJobs();
  await server.runJobs();
  expect(server.smtp.mails.map(({ to }) => to.toLowerCase()).sort()).toEqual([one, two].sort());
  const [mail] = server.smtp.mails;
  expect(mail?.subject).toBe("Ruth Callow invites you to Tuesday evening class");
  expect(mail?.text).toMatch(/http:\/\/larkspan\.test\/invite#[\w-]{43}/);
});

it("tells a stranger the studio, who teaches there and what they would see, and holds no token in the database", async () => {
  const { email, token } = await invited();
  const seen = inviteLook.parse((await look(token).expect(200)).body);
  expect(seen).toMatchObject({
    studio: "Tuesday evening class",
    teacher: "Ruth Callow",
    teachers: ["Ruth Callow"],
    email,
  });
  expect(seen.sees.join(" ")).toMatch(/comfort band.*favourite instrument.*hand in.*90 days.*take your word back/);
  await look(token).expect(200);
  const rows = await server.database.query("SELECT l::text AS all FROM link_tokens l");
  expect(JSON.stringify(rows)).not.toContain(token);
  expect((await look("x".repeat(43)).expect(410)).body.code).toBe("link-not-valid");
});

it("is accepted once, by whoever is signed in with any account", async () => {
  const { token } = await invited();
  const [person, other] = [await Person.put(server, "singer", true), await Person.put(server, "singer", true)];
  await request(server.app).post("/api/invites/accept").send({ token, name: "Jonna", agree: false }).expect(401);
  const joined = studioSchema.parse((await accept(person, token).expect(201)).body);
  expect(joined).toMatchObject({ id: studioId, counts: null, me: { role: "pupil", name: "Jonna Reed" } });
  expect(joined.me.consent.shares).toBe(false);
  expect((await accept(other, token).expect(410)).body.code).toBe("link-not-valid");
  await look(token).expect(410);
  expect((await person.get("/api/studios").expect(200)).body).toHaveLength(1);
  const [{ state }] = (await teacher.get(`/api/studios/${studioId}/invites`).expect(200)).body;
  expect(state).toBe("accepted");
});

it("confirms the address of a new account that has it, and of no other", async () => {
  const { email, token } = await invited();
  const person = await Person.signUp(server.app, email);
  const stranger = await Person.signUp(server.app);
  expect((await person.get("/api/account").expect(200)).body.confirmed).toBe(false);
  await accept(person, token).expect(201);
  expect((await person.get("/api/account").expect(200)).body.confirmed).toBe(true);
  await accept(stranger, (await invited()).token).expect(201);
  expect((await stranger.get("/api/account").expect(200)).body.confirmed).toBe(false);
});

it("two who accept at the same moment: one of them is in", async () => {
  const { token } = await invited();
  const people = await Promise.all([1, 2].map(() => Person.put(server, "singer", true)));
  const statuses = await Promise.all(people.map(async (person) => (await accept(person, token)).status));
  expect(statuses.sort()).toEqual([201, 410]);
});

it("lasts seven days", async () => {
  const { id, invite, token } = await invited();
  expect(Date.parse(invite!.expiresAt) - Date.parse(invite!.sentAt)).toBe(7 * 86_400_000);
  const [row] = await server.database.query(
    "SELECT extract(epoch FROM expires_at - now()) / 86400 AS days FROM link_tokens WHERE subject = $1",
    [id],
  );
  expect(Number(row?.days)).toBeCloseTo(7, 2);
  await server.database.query("UPDATE link_tokens SET expires_at = now() WHERE subject = $1", [id]);
  await server.database.query("UPDATE studio_invites SET expires_at = now() WHERE id = $1", [id]);
  await look(token).expect(410);
  await accept(await Person.put(server, "singer", true), token).expect(410);
  expect((await teacher.get(`/api/studios/${studioId}/invites`).expect(200)).body[0].state).toBe("expired");
});

it("sent again, it brings a new link, and the old one is worth nothing; an expired one lives again", async () => {
  const { id, email, token: old } = await invited();
  await server.database.query("UPDATE studio_invites SET expires_at = now() WHERE id = $1", [id]);
  server.smtp.mails.length = 0;
  expect((await teacher.post(`${again(id)}/resend`).expect(200)).body.state).toBe("open");
  const { token } = await mailTo(server, email);
  expect(server.smtp.mails).toHaveLength(1);
  await look(old).expect(410);
  await look(token).expect(200);
});

it("invited anew, the same address keeps one open invitation, with the newest link", async () => {
  const first = await invited();
  const second = await invited(first.email.toUpperCase());
  expect(second.id).toBe(first.id);
  await look(first.token).expect(410);
  const { token } = await mailTo(server, first.email);
  await look(token).expect(200);
});

it("taken back, it opens nothing, and cannot be sent again", async () => {
  const { id, token } = await invited();
  await teacher.delete(again(id)).expect(204);
  await teacher.delete(again(id)).expect(204);
  await look(token).expect(410);
  await accept(await Person.put(server, "singer", true), token).expect(410);
  expect((await teacher.post(`${again(id)}/resend`).expect(409)).body.code).toBe("invite-over");
});

it("leaves whoever is in the studio already where they are, and the link unused", async () => {
  const { person } = await pupilIn(server, studioId);
  const { token } = await invited();
  expect((await accept(person, token).expect(409)).body.code).toBe("already-member");
  await look(token).expect(200);
});

it("accepted with the word that teachers may see needs the birth year first, and is not used up by the asking", async () => {
  const { token } = await invited();
  const person = await Person.put(server, "singer", true);
  expect((await accept(person, token, { agree: true }).expect(409)).body.code).toBe("birth-year-needed");
  await person.put("/api/account/person", { birthYear: 1980, country: "DE" }).expect(200);
  expect((await accept(person, token, { agree: true }).expect(201)).body.me.consent.shares).toBe(true);
});

it("puts a pupil into the group it names, and only into one of the same studio", async () => {
  const group = (await teacher.post(`/api/studios/${studioId}/groups`, { name: "Altos", memberIds: [] })).body;
  const { token } = await invited(anAddress(), { groupId: group.id });
  const { me } = (await accept(await Person.put(server, "singer", true), token).expect(201)).body;
  const [kept] = (await teacher.get(`/api/studios/${studioId}/groups`).expect(200)).body;
  expect(kept.memberIds).toEqual([me.memberId]);
  const elsewhere = (await studioOf(teacher)).id;
  const foreign = { emails: [anAddress()], groupId: group.id };
  await teacher.post(`/api/studios/${elsewhere}/invites`, foreign).expect(422);
});

it("is the teachers' business: co-teachers invite pupils, the owner co-teachers, pupils and outsiders nobody", async () => {
  const { person: pupil } = await pupilIn(server, studioId);
  const colleague = await confirmedPerson(server);
  await join(server, studioId, colleague, { role: "co-teacher", name: "Hob Carrow" });
  const outsider = await Person.put(server, "teacher", true);
  const { id } = await invited();
  const invites = `/api/studios/${studioId}/invites`;
  const ask = (person: Person, role: string) => person.post(invites, { emails: [anAddress()], role });
  await ask(colleague, "pupil").expect(201);
  expect((await ask(colleague, "co-teacher").expect(403)).body.code).toBe("owner-only");
  await ask(teacher, "co-teacher").expect(201);
  expect((await ask(pupil, "pupil").expect(403)).body.code).toBe("teachers-only");
  await ask(outsider, "pupil").expect(404);
  await pupil.get(invites).expect(403);
  await outsider.get(invites).expect(404);
  await outsider.post(`${again(id)}/resend`).expect(404);
  await outsider.delete(again(id)).expect(404);
  const elsewhere = (await studioOf(outsider)).id;
  await outsider.delete(`/api/studios/${elsewhere}/invites/${id}`).expect(404);
  await outsider.post(`/api/studios/${elsewhere}/invites/${id}/resend`).expect(404);
});

it("leaves an invitation to teach to the owner: a colleague neither sends it again, takes it back nor makes it a pupil's", async () => {
  const colleague = await confirmedPerson(server);
  await join(server, studioId, colleague, { role: "co-teacher", name: "Hob Carrow" });
  const { id, email, token } = await invited(anAddress(), { role: "co-teacher" });
  const refused = [
    colleague.post(`${again(id)}/resend`),
    colleague.delete(again(id)),
    colleague.post(`/api/studios/${studioId}/invites`, { emails: [anAddress(), email.toUpperCase()] }),
  ];
  for (const asked of refused) expect((await asked.expect(403)).body.code).toBe("owner-only");
  expect((await look(token).expect(200)).body.role).toBe("co-teacher");
  expect((await teacher.get(`/api/studios/${studioId}/invites`).expect(200)).body).toHaveLength(1);
  await teacher.delete(again(id)).expect(204);
});

it("once expired, it fills no place of those that are open, and can be taken back", async () => {
  await server.database.query(
    `INSERT INTO studio_invites (studio_id, email, role, expires_at)
     SELECT $1, n || '@orlow-quay.example', 'pupil', now() - interval '1 minute' FROM generate_series(1, 500) n`,
    [studioId],
  );
  const { id } = await invited();
  const [open, ...expired] = (await teacher.get(`/api/studios/${studioId}/invites`).expect(200)).body as Invite[];
  expect([open?.id, expired.length, expired[0]?.state]).toEqual([id, 500, "expired"]);
  await teacher.delete(again(expired[0]!.id)).expect(204);
  await server.database.query(
    "UPDATE studio_invites SET expires_at = now() + interval '1 day' WHERE studio_id = $1 AND revoked_at IS NULL",
    [studioId],
  );
  const more = { emails: [anAddress()] };
  expect((await teacher.post(`/api/studios/${studioId}/invites`, more).expect(409)).body.code).toBe("collection-full");
});

it("makes a co-teacher's account a teacher's", async () => {
  const { token } = await invited(anAddress(), { role: "co-teacher" });
  const person = await Person.put(server, "singer", true);
  const joined = (await accept(person, token).expect(201)).body;
  expect(joined.me.role).toBe("co-teacher");
  expect(joined.counts).toEqual({ pupils: 0, waiting: 0 });
  expect((await person.get("/api/account").expect(200)).body.role).toBe("teacher");
});

it("writes to at most four hundred addresses a day for one teacher", async () => {
  await invited();
  await server.database.query("UPDATE tries SET points = 400 WHERE key LIKE 'invited%'");
  await teacher.post(`/api/studios/${studioId}/invites`, { emails: [anAddress()] }).expect(429);
});
