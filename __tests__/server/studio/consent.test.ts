import { randomUUID } from "node:crypto";
import request from "supertest";
import { guardianLook, guardianState } from "../../../shared/contract/studio/consent";
import type { RosterRow } from "../../../shared/contract/studio/roster";
import { anInstrument, aTake, aVoice } from "../belongings";
import { clearTraces, mailTo } from "../confirmedPerson";
import { Person, type TestServer } from "../testServer";
import { give, join, pupilIn, studioOf } from "./studioPeople";
import { setStudioStage } from "./studioStage";

let server: TestServer;
let teacher: Person;
let studioId: string;
setStudioStage((stage) => ({ server, teacher, studioId } = stage));
beforeEach(() => clearTraces(server));

const thisYear = new Date().getUTCFullYear();
const agree = (person: Person, yes: boolean, id = studioId) => person.put(`/api/studios/${id}/consent`, { agree: yes });
const rowOf = async (memberId: string): Promise<RosterRow> =>
  ((await teacher.get(`/api/studios/${studioId}/roster`).expect(200)).body as RosterRow[]).find(
    (row) => row.memberId === memberId,
  )!;
const post = (path: string, token: string) => request(server.app).post(`/api/guardian/${path}`).send({ token });

/** A pupil with a voice, an instrument, a part and words in its thread. */
async function aPupil({ born, country = null }: { born: number | null; country?: string | null }) {
  const { person, memberId } = await pupilIn(server, studioId, { name: "Lowri Tate", agrees: false });
  await person.put("/api/account/person", { birthYear: born, country }).expect(200);
  const voice = aVoice();
  await person.put(`/api/voices/${voice.id}`, voice).expect(201);
  const take = aTake(voice.id);
  await person.put(`/api/takes/${take.id}`, take).expect(201);
  const instrument = anInstrument({ favourite: true });
  await person.put(`/api/instruments/${instrument.id}`, instrument).expect(201);
  const [part] = (await give(teacher, studioId, [memberId])).parts;
  await clearTraces(server);
  return { person, memberId, partId: part!.id };
}

const hidden = { voice: null, instrument: null, wishes: null, open: [], openCount: 0, lastTake: null, waiting: 0 };

describe("agreeing", () => {
  it("comes first: until then teachers see a name and that nothing is agreed", async () => {
    const { person, memberId, partId } = await aPupil({ born: 1980 });
    expect(await rowOf(memberId)).toMatchObject({ name: "Lowri Tate", ...hidden, consent: { shares: false } });
    const seen = (await teacher.get(`/api/parts/${partId}`).expect(200)).body;
    expect(seen).toMatchObject({ shares: false, instrument: null, way: null, lastTake: null, songId: null });
    expect((await teacher.get(`/api/parts/${partId}/comments`).expect(403)).body.code).toBe("not-agreed");
    expect((await person.post(`/api/parts/${partId}/comments`, { text: "Hello" }).expect(403)).body.code).toBe(
      "not-agreed",
    );
    await agree(person, true).expect(200);
    const row = await rowOf(memberId);
    expect(row.consent).toMatchObject({ shares: true, waitsForGuardian: false, withdrawnAt: null });
    expect(row).toMatchObject({ voice: { name: "With a cold" }, instrument: { name: "Grandfather's banjo" } });
    expect(row.openCount).toBe(1);
  });

  it("taken back, teachers see nothing at once: no voice, instrument, key by way, thread; and the pupil still all of it", async () => {
    const { person, memberId, partId } = await aPupil({ born: 1980 });
    await agree(person, true).expect(200);
    await person.post(`/api/parts/${partId}/comments`, { text: "The bridge is high." }).expect(201);
    expect((await teacher.get(`/api/parts/${partId}/comments`).expect(200)).body).toHaveLength(1);
    const { me } = (await agree(person, false).expect(200)).body;
    expect(me.consent).toMatchObject({ shares: false, withdrawnAt: expect.stringMatching(/Z$/) });
    expect(await rowOf(memberId)).toMatchObject(hidden);
    await teacher.get(`/api/parts/${partId}/comments`).expect(403);
    await teacher.post(`/api/parts/${partId}/comments`, { text: "Why?" }).expect(403);
    expect((await teacher.put(`/api/parts/${partId}`, { state: "accepted" }).expect(403)).body.code).toBe("not-agreed");
    expect((await teacher.get(`/api/parts/${partId}`).expect(200)).body).toMatchObject({ way: null, instrument: null });
    await server.database.query(
      "UPDATE assignment_parts SET state = 'handed-in', handed_in_at = now(), effort = 5 WHERE id = $1",
      [partId],
    );
    const [given] = (await teacher.get(`/api/studios/${studioId}/assignments`).expect(200)).body;
    expect(given.counts).toEqual({ parts: 1, waiting: 0, accepted: 0 });
    const table = (await teacher.get(`/api/studios/${studioId}/assignments/${given.id}`).expect(200)).body;
    expect(table.parts).toMatchObject([
      { shares: false, state: "assigned", way: null, instrument: null, lastTake: null },
    ]);
    expect((await teacher.get("/api/studios").expect(200)).body[0].counts.waiting).toBe(0);
    const csv = (await teacher.get(`/api/studios/${studioId}/roster.csv`).expect(200)).text;
    expect(csv).toContain('"Lowri Tate"');
    expect(csv).not.toContain("banjo");
    expect((await person.get(`/api/parts/${partId}/comments`).expect(200)).body).toHaveLength(1);
    expect((await person.get(`/api/parts/${partId}`).expect(200)).body.way).not.toBeNull();
    await agree(person, true).expect(200);
    expect((await rowOf(memberId)).voice).not.toBeNull();
  });

  it("in one studio shows nothing in another", async () => {
    const { person } = await aPupil({ born: 1980 });
    const other = await Person.put(server, "teacher", true);
    const elsewhere = await studioOf(other, "Saturday class");
    await server.database.query(
      "INSERT INTO studio_members (studio_id, user_id, role, name) VALUES ($1, $2, 'pupil', 'Lowri')",
      [elsewhere.id, person.id],
    );
    await agree(person, true).expect(200);
    const rows = (await other.get(`/api/studios/${elsewhere.id}/roster`).expect(200)).body as RosterRow[];
    expect(rows.find(({ name }) => name === "Lowri")).toMatchObject(hidden);
    await agree(teacher, true, elsewhere.id).expect(404);
  });

  it("needs the birth year, which everybody is asked", async () => {
    const { person } = await aPupil({ born: null });
    expect((await agree(person, true).expect(409)).body.code).toBe("birth-year-needed");
    expect(guardianState.parse((await person.get("/api/guardian").expect(200)).body).needed).toBeNull();
  });
});

describe("a guardian", () => {
  it.each([
    // 16 where the country is unknown or says nothing else: Regulation (EU) 2016/679, Art. 8 (1); others SWD(2020) 115, p. 17
    [null, 16],
    ["DE", 16],
    ["US", 16],
    ["FR", 15],
    ["AT", 14],
    ["SE", 13],
  ])("in %s is needed under %i, counted by the birthday latest in the year", async (country, age) => {
    const person = await Person.put(server, "singer", true);
    const needed = async (birthYear: number) => {
      await person.put("/api/account/person", { birthYear, country }).expect(200);
      return guardianState.parse((await person.get("/api/guardian").expect(200)).body);
    };
    expect(await needed(thisYear - age)).toMatchObject({ needed: true, age });
    expect(await needed(thisYear - age - 1)).toMatchObject({ needed: false, age });
  });

  const asked = async () => {
    const pupil = await aPupil({ born: thisYear - 12 });
    const { me } = (await agree(pupil.person, true).expect(200)).body;
    expect(me.consent).toMatchObject({ waitsForGuardian: true, shares: false });
    const email = `${randomUUID()}@orlow-quay.example`;
    await pupil.person.post("/api/guardian", { email }).expect(202);
    const { mail, token } = await mailTo(server, email);
    return { ...pupil, email, mail, token };
  };

  it("is asked by mail, reads what is seen, and until the yes nothing is shared or kept", async () => {
    const { person, memberId, partId, mail, token, email } = await asked();
    expect(mail?.subject).toBe("Lowri Tate needs your word");
    expect(mail?.text).toContain("http://larkspan.test/guardian#");
    expect(await rowOf(memberId)).toMatchObject({ ...hidden, consent: { waitsForGuardian: true, shares: false } });
    await person.post(`/api/parts/${partId}/comments`, { text: "Hello" }).expect(403);
    const seen = guardianLook.parse((await post("look", token).expect(200)).body);
    expect(seen).toMatchObject({
      ...{ pupil: "Lowri Tate", confirmed: false },
      studios: [{ name: "Tuesday evening class", teachers: ["Ruth Callow"], recordingsKeptDays: 90, confirmed: false }],
    });
    expect(seen.sees.length).toBeGreaterThan(5);
    await post("confirm", token).expect(204);
    expect(await rowOf(memberId)).toMatchObject({ consent: { waitsForGuardian: false, shares: true } });
    await person.post(`/api/parts/${partId}/comments`, { text: "Hello" }).expect(201);
    const state = guardianState.parse((await person.get("/api/guardian").expect(200)).body);
    expect(state).toMatchObject({ email, confirmedAt: expect.stringMatching(/Z$/), withdrawnAt: null });
    await post("confirm", token).expect(410);
  });

  it("takes the word back by the link in the second mail, at once, even after the pupil's address changed; and may give it again", async () => {
    const { person, memberId, email, token } = await asked();
    await post("confirm", token).expect(204);
    const receipt = await mailTo(server, email);
    expect(receipt.mail?.subject).toBe("You agreed for Lowri Tate");
    await server.database.query("DELETE FROM link_tokens WHERE user_id = $1", [person.id]);
    expect((await post("look", receipt.token).expect(200)).body.confirmed).toBe(true);
    await post("withdraw", receipt.token).expect(204);
    expect(await rowOf(memberId)).toMatchObject({ ...hidden, consent: { shares: false } });
    expect((await person.get("/api/guardian").expect(200)).body.withdrawnAt).not.toBeNull();
    await post("confirm", receipt.token).expect(204);
    expect((await rowOf(memberId)).consent.shares).toBe(true);
  });

  it("says no by the first link, and the pupil's own yes changes nothing about it", async () => {
    const { person, memberId, token } = await asked();
    await post("withdraw", token).expect(204);
    await post("confirm", token).expect(410);
    await agree(person, true).expect(200);
    expect((await rowOf(memberId)).consent.shares).toBe(false);
  });

  /** A guardian who agreed, and the mail that asks them of a second studio. */
  const askedTwice = async () => {
    const pupil = await asked();
    await post("confirm", pupil.token).expect(204);
    const { token: keep } = await mailTo(server, pupil.email);
    await clearTraces(server);
    const elsewhere = await studioOf(await Person.put(server, "teacher", true), "Saturday class");
    const memberId = await join(server, elsewhere.id, pupil.person, { agrees: false, name: "Lowri" });
    const { me } = (await agree(pupil.person, true, elsewhere.id).expect(200)).body;
    expect(me.consent.waitsForGuardian).toBe(true);
    return { ...pupil, keep, elsewhere: { ...elsewhere, memberId }, second: await mailTo(server, pupil.email) };
  };
  const sharesIn = async (person: Person, id: string) =>
    (await person.get(`/api/studios/${id}`).expect(200)).body.me.consent.shares as boolean;

  it("says no to a second studio without undoing the first, and then nobody else can be named for it", async () => {
    const { person, email, keep, elsewhere, second } = await askedTwice();
    expect((await post("look", second.token).expect(200)).body).toMatchObject({ link: "ask", confirmed: false });
    await post("withdraw", second.token).expect(204);
    expect([await sharesIn(person, studioId), await sharesIn(person, elsewhere.id)]).toEqual([true, false]);
    const state = guardianState.parse((await person.get("/api/guardian").expect(200)).body);
    expect(state).toMatchObject({ email, confirmedAt: null, withdrawnAt: null, refusedAt: expect.any(String) });
    const friend = `${randomUUID()}@orlow-quay.example`;
    const another = () => person.post("/api/guardian", { email: friend });
    expect((await another().expect(409)).body).toMatchObject({ code: "guardian-decides", fields: [{ path: "email" }] });
    await person.post("/api/guardian", { email }).expect(202);
    await another().expect(409);
    await person.delete(`/api/studios/${elsewhere.id}/members/${elsewhere.memberId}`).expect(204);
    await join(server, elsewhere.id, person, { agrees: false });
    await agree(person, true, elsewhere.id).expect(200);
    await another().expect(202);
    // Whoever was named first still has the link by which their own word is taken back.
    await post("confirm", (await mailTo(server, friend)).token).expect(204);
    expect((await post("look", keep).expect(200)).body).toMatchObject({ link: "keep", confirmed: true });
    await post("withdraw", keep).expect(204);
    expect([await sharesIn(person, studioId), await sharesIn(person, elsewhere.id)]).toEqual([false, false]);
    await person.post("/api/guardian", { email }).expect(409);
  });

  it("gives the word for a studio, not for the next one: of that one a mail asks anew", async () => {
    const { person, elsewhere, second: mailed } = await askedTwice();
    const { mail, token: second } = mailed;
    expect(mail?.text).toContain("Saturday class");
    expect((await post("look", second).expect(200)).body.studios).toHaveLength(2);
    await post("confirm", second).expect(204);
    expect(await sharesIn(person, elsewhere.id)).toBe(true);
  });

  it("is asked anew by a newer mail only, and never at the pupil's own address", async () => {
    const { person, email, token } = await asked();
    await person.post("/api/guardian", { email }).expect(202);
    await post("look", token).expect(410);
    await post("look", (await mailTo(server, email)).token).expect(200);
    const own = await person.post("/api/guardian", { email: person.email.toUpperCase() }).expect(422);
    expect(own.body.fields[0].path).toBe("email");
  });

  it("is not asked where nobody needs to, or before the pupil agreed; and not more than five times a day", async () => {
    const grown = await aPupil({ born: 1980 });
    const email = `${randomUUID()}@orlow-quay.example`;
    expect((await grown.person.post("/api/guardian", { email }).expect(409)).body.code).toBe("no-guardian-needed");
    const young = await aPupil({ born: thisYear - 12 });
    expect((await young.person.post("/api/guardian", { email }).expect(409)).body.code).toBe("nothing-to-confirm");
    await server.database.query("UPDATE tries SET points = 5 WHERE key LIKE 'guardian%'");
    await young.person.post("/api/guardian", { email }).expect(429);
    await server.runJobs();
    expect(server.smtp.mails).toHaveLength(0);
  });

  it("cannot be got rid of by telling another birth year or country, in two steps neither; by leaving, yes", async () => {
    const { person, memberId, token } = await asked();
    const tell = (birthYear: number | null, country: string | null = null) =>
      person.put("/api/account/person", { birthYear, country });
    for (const told of [1980, null, thisYear - 17])
      expect((await tell(told).expect(409)).body).toMatchObject({
        code: "guardian-decides",
        fields: [{ path: "birthYear" }],
      });
    await clearTraces(server);
    await agree(person, false).expect(200);
    await tell(1980).expect(409);
    await agree(person, true).expect(200);
    await server.runJobs();
    expect(server.smtp.mails).toEqual([]);
    await post("confirm", token).expect(204);
    await tell(1980).expect(409);
    await tell(thisYear - 11, "DE").expect(200);
    await person.delete(`/api/studios/${studioId}/members/${memberId}`).expect(204);
    await tell(1980).expect(200);
  });

  it("is needed no more once the pupil is old enough", async () => {
    const { person, memberId } = await asked();
    await server.database.query("UPDATE users SET birth_year = birth_year - 5 WHERE id = $1", [person.id]);
    expect((await rowOf(memberId)).consent).toMatchObject({ shares: true, waitsForGuardian: false });
  });
});
