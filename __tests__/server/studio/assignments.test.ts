import { randomUUID } from "node:crypto";
import {
  assignment as assignmentSchema,
  assignmentListing,
  comment as commentSchema,
  part as partSchema,
  partListing,
} from "../../../shared/contract/studio/assignment";
import type { Decision } from "../../../shared/contract/decision";
import { song as songSchema } from "../../../shared/contract/song";
import { aDecision, aSong, aTake, aVoice } from "../belongings";
import { clearTraces, mailTo } from "../confirmedPerson";
import { Person, type TestServer } from "../testServer";
import { aPart, give, join, pupilIn, studioOf } from "./studioPeople";
import { setStudioStage } from "./studioStage";

let server: TestServer;
let teacher: Person;
let studioId: string;
setStudioStage((stage) => ({ server, teacher, studioId } = stage));
beforeEach(() => clearTraces(server));

const at = () => `/api/studios/${studioId}/assignments`;

describe("giving a song", () => {
  it("gives everybody a copy of their own, their own key decided for it, and one mail each", async () => {
    const [lowri, joss] = [await pupilIn(server, studioId), await pupilIn(server, studioId, { name: "Joss Pell" })];
    const voice = aVoice();
    await lowri.person.put(`/api/voices/${voice.id}`, voice).expect(201);
    const take = aTake(voice.id);
    await lowri.person.put(`/api/takes/${take.id}`, take).expect(201);
    const song = aSong({ tags: ["mine"], playedAt: "2026-11-20T10:00:00.000Z" });
    await teacher.put(`/api/songs/${song.id}`, song).expect(201);
    const parts = [
      aPart(lowri.memberId),
      aPart(joss.memberId, { tonic: "D", shift: -5, way: null, note: "By heart." }),
    ];
    const request = { songId: song.id, dueOn: "2026-12-10", note: "Softly.", parts };
    const made = assignmentSchema.parse((await teacher.post(at(), request).expect(201)).body);
    expect(made).toMatchObject({ title: song.title, dueOn: "2026-12-10", note: "Softly.", assignedBy: "Ruth Callow" });
    expect(made.parts.map(({ pupil, tonic, state }) => [pupil, tonic, state])).toEqual([
      ["Joss Pell", "D", "assigned"],
      ["Lowri Tate", "Bb", "assigned"],
    ]);
    const [copy] = (await lowri.person.get("/api/songs").expect(200)).body.map((each: unknown) =>
      songSchema.parse(each),
    );
    const { title, chart, tune, writtenKey, tempo, beatsPerBar } = song;
    expect(copy).toMatchObject({ title, chart, tune, writtenKey, tempo, beatsPerBar, playedAt: null, revision: 1 });
    expect(copy.id).not.toBe(song.id);
    expect(copy.tags).toEqual(["Tuesday evening class"]);
    const [decided] = (await lowri.person.get("/api/decisions").expect(200)).body as Decision[];
    expect(decided).toMatchObject({ songId: copy.id, voiceId: voice.id, tonic: "Bb", shift: 3, instrument: "box-adf" });
    expect(decided?.way).toEqual({ retune: 0, capo: 1, shapeKey: "A" });
    expect(decided?.reason).toBe("Ruth Callow chose it for you. All of it lies in the comfort band.");
    expect((await joss.person.get("/api/decisions").expect(200)).body).toMatchObject([{ tonic: "D", voiceId: null }]);
    const { mail } = await mailTo(server, lowri.person.email);
    await server.runJobs();
    expect(server.smtp.mails).toHaveLength(2);
    expect(mail?.subject).toBe("A song for you: Nets in the Loft");
    expect(mail?.text).toContain("in B♭ major for your voice. It is due on 10 December");
    const joss$ = server.smtp.mails.find(({ to }) => to === joss.person.email);
    expect(joss$?.text).toMatch(/> Softly\.\n> *\n> By heart\./);
    const [listed] = (await joss.person.get("/api/parts").expect(200)).body;
    expect(partListing.parse(listed)).toMatchObject({ title, tonic: "D", state: "assigned", dueOn: "2026-12-10" });
    expect(joss$?.text).toContain(`/studio/parts/${listed.id}`);
    expect(listed.studio).toEqual({ id: studioId, name: "Tuesday evening class" });
  });

  it("gives to all of them or to nobody: a stranger among them, somebody twice, another's song", async () => {
    const { person, memberId } = await pupilIn(server, studioId);
    const song = aSong();
    await teacher.put(`/api/songs/${song.id}`, song).expect(201);
    const ask = (parts: object[], songId = song.id) => teacher.post(at(), { songId, dueOn: null, note: "", parts });
    const elsewhere = (await studioOf(await Person.put(server, "teacher", true))).me.memberId;
    for (const id of [randomUUID(), elsewhere, memberId])
      expect((await ask([aPart(memberId), aPart(id)]).expect(422)).body.code).toBe("unknown-reference");
    const foreign = aSong();
    await person.put(`/api/songs/${foreign.id}`, foreign).expect(201);
    await ask([aPart(memberId)], foreign.id).expect(404);
    await ask([], song.id).expect(422);
    expect((await person.get("/api/parts").expect(200)).body).toEqual([]);
    expect((await person.get("/api/songs").expect(200)).body).toHaveLength(1);
    await server.runJobs();
    expect(server.smtp.mails).toHaveLength(0);
  });

  it("stops where somebody's shelf is full, and then nobody has got anything", async () => {
    const [full, other] = [await pupilIn(server, studioId), await pupilIn(server, studioId)];
    const song = aSong();
    await full.person.put(`/api/songs/${song.id}`, song).expect(201);
    await server.database.query(
      `INSERT INTO songs SELECT (jsonb_populate_record(s, jsonb_build_object('id', gen_random_uuid()))).*
       FROM songs s, generate_series(2, 5000) WHERE s.id = $1`,
      [song.id],
    );
    const own = aSong();
    await teacher.put(`/api/songs/${own.id}`, own).expect(201);
    const parts = [aPart(other.memberId), aPart(full.memberId)];
    const { body } = await teacher.post(at(), { songId: own.id, dueOn: null, note: "", parts }).expect(409);
    expect(body).toEqual({ code: "collection-full", message: expect.stringContaining("nobody was given") });
    expect((await other.person.get("/api/songs").expect(200)).body).toEqual([]);
    expect((await teacher.get(at()).expect(200)).body).toEqual([]);
  });

  it("is for teachers; a co-teacher gives songs of their own shelf", async () => {
    const { person: pupil, memberId } = await pupilIn(server, studioId);
    const colleague = await Person.put(server, "teacher", true);
    await join(server, studioId, colleague, { role: "co-teacher", name: "Hob Carrow" });
    const outsider = await Person.put(server, "teacher", true);
    expect((await give(colleague, studioId, [memberId])).assignedBy).toBe("Hob Carrow");
    const song = aSong();
    for (const [person, status] of [
      [pupil, 403],
      [outsider, 404],
    ] as const) {
      const own = { ...song, id: randomUUID() };
      await person.put(`/api/songs/${own.id}`, own).expect(201);
      await person.post(at(), { songId: own.id, dueOn: null, note: "", parts: [aPart(memberId)] }).expect(status);
    }
  });

  it("is listed with how far it is, changed, and taken back while the pupils keep their copies", async () => {
    const { person, memberId } = await pupilIn(server, studioId);
    const made = await give(teacher, studioId, [memberId, (await pupilIn(server, studioId)).memberId]);
    await teacher.put(`/api/parts/${made.parts[0]!.id}`, { state: "accepted" }).expect(200);
    const [listed] = (await teacher.get(at()).expect(200)).body;
    expect(assignmentListing.parse(listed).counts).toEqual({ parts: 2, waiting: 0, accepted: 1 });
    const later = { dueOn: "2027-01-15", note: "After the holidays." };
    expect((await teacher.put(`${at()}/${made.id}`, later).expect(200)).body).toMatchObject(later);
    await teacher.put(`${at()}/${made.id}`, { ...later, dueOn: "2027-02-30" }).expect(422);
    const other = await Person.put(server, "teacher", true);
    const elsewhere = (await studioOf(other)).id;
    await other.get(`/api/studios/${elsewhere}/assignments/${made.id}`).expect(404);
    await other.delete(`/api/studios/${elsewhere}/assignments/${made.id}`).expect(404);
    await teacher.delete(`${at()}/${made.id}`).expect(204);
    expect((await person.get("/api/parts").expect(200)).body).toEqual([]);
    expect((await person.get("/api/songs").expect(200)).body).toHaveLength(1);
  });
});

describe("a part", () => {
  it("is seen by its pupil and the teachers, and by no other pupil", async () => {
    const [lowri, joss] = [await pupilIn(server, studioId), await pupilIn(server, studioId, { name: "Joss" })];
    const made = await give(teacher, studioId, [lowri.memberId]);
    const path = `/api/parts/${made.parts[0]!.id}`;
    const mine = partSchema.parse((await lowri.person.get(path).expect(200)).body);
    expect(mine).toMatchObject({ side: "pupil", shares: true, mode: "major", note: "Softly.", recordingsKeptDays: 90 });
    const [copy] = (await lowri.person.get("/api/songs").expect(200)).body;
    expect(mine.songId).toBe(copy.id);
    expect(partSchema.parse((await teacher.get(path).expect(200)).body)).toMatchObject({
      side: "teacher",
      songId: null,
    });
    for (const rest of ["", "/comments"]) await joss.person.get(`${path}${rest}`).expect(404);
    await joss.person.post(`${path}/comments`, { text: "Hm" }).expect(404);
    await joss.person.put(path, { state: "accepted" }).expect(404);
    expect((await lowri.person.put(path, { tonic: "C" }).expect(403)).body.code).toBe("teachers-only");
    await lowri.person.delete(`/api/songs/${copy.id}`).expect(204);
    expect((await lowri.person.get(path).expect(200)).body).toMatchObject({
      songId: null,
      song: { title: made.title },
    });
  });

  it("gets another key from the teacher, which becomes the pupil's decision and keeps the one before", async () => {
    const { person, memberId } = await pupilIn(server, studioId);
    const [part] = (await give(teacher, studioId, [memberId])).parts;
    const wanted = { tonic: "C", shift: 5, way: { retune: -2, capo: 0, shapeKey: "D" }, partNote: "Try this." };
    const { body } = await teacher.put(`/api/parts/${part!.id}`, wanted).expect(200);
    expect(partSchema.parse(body)).toMatchObject(wanted);
    const [decided, ...others] = (await person.get("/api/decisions").expect(200)).body as Decision[];
    expect(others).toEqual([]);
    expect(decided).toMatchObject({ tonic: "C", shift: 5, instrument: "box-adf", earlier: [{ tonic: "Bb" }] });
    await teacher.put(`/api/parts/${part!.id}`, { partNote: "Only words." }).expect(200);
    expect((await person.get("/api/decisions").expect(200)).body[0].earlier).toHaveLength(1);
    // The pupil's own later choice is theirs; the part stays as the teacher gave it.
    await person.put(
      `/api/decisions/${decided!.id}`,
      aDecision(decided!.songId, null, { id: decided!.id, tonic: "D" }),
    );
    expect((await teacher.get(`/api/parts/${part!.id}`).expect(200)).body.tonic).toBe("C");
  });

  it("is answered with words: the pupil reads them in the thread and in one mail for each answer", async () => {
    const { person, memberId } = await pupilIn(server, studioId);
    const [part] = (await give(teacher, studioId, [memberId])).parts;
    await clearTraces(server);
    const path = `/api/parts/${part!.id}`;
    await teacher.put(path, { state: "returned", message: "The bridge once more." }).expect(200);
    await server.runJobs();
    await server.runJobs();
    expect(server.smtp.mails).toHaveLength(1);
    expect(server.smtp.mails[0]).toMatchObject({
      to: person.email,
      subject: "An answer to your take of Nets in the Loft",
    });
    expect(server.smtp.mails[0]?.text).toContain("> The bridge once more.");
    expect((await person.get(path).expect(200)).body.state).toBe("returned");
    expect((await person.get(`${path}/comments`).expect(200)).body).toMatchObject([
      { text: "The bridge once more.", mine: false, author: { name: "Ruth Callow", role: "owner" } },
    ]);
    await teacher.put(path, { state: "accepted" }).expect(200);
    await server.runJobs();
    expect(server.smtp.mails.map(({ subject }) => subject)).toEqual([
      "Nets in the Loft is accepted",
      "An answer to your take of Nets in the Loft",
    ]);
    await teacher.put(path, { state: "handed-in" }).expect(422);
  });
});

describe("a thread", () => {
  it("is written by both sides; everybody takes back only their own words", async () => {
    const { person, memberId } = await pupilIn(server, studioId);
    const [part] = (await give(teacher, studioId, [memberId])).parts;
    const path = `/api/parts/${part!.id}/comments`;
    const said = commentSchema.parse((await person.post(path, { text: " High there. " }).expect(201)).body);
    expect(said).toMatchObject({ text: "High there.", mine: true, atS: null, handInId: null, author: { memberId } });
    await teacher.post(path, { text: "Breathe before it." }).expect(201);
    const seen = (await teacher.get(path).expect(200)).body.map((each: unknown) => commentSchema.parse(each));
    expect(seen.map(({ text, mine }: { text: string; mine: boolean }) => [text, mine])).toEqual([
      ["High there.", false],
      ["Breathe before it.", true],
    ]);
    await teacher.delete(`${path}/${said.id}`).expect(404);
    await person.delete(`${path}/${said.id}`).expect(204);
    expect((await person.get(path).expect(200)).body).toHaveLength(1);
    for (const text of ["", " ", "x".repeat(2001)]) await person.post(path, { text }).expect(422);
  });

  it("speaks only of takes of this part", async () => {
    const { person, memberId } = await pupilIn(server, studioId);
    const [one, two] = [await give(teacher, studioId, [memberId]), await give(teacher, studioId, [memberId])];
    const handInId = randomUUID();
    await server.database.query(
      `INSERT INTO hand_ins (id, part_id, author_id, kind, storage_key, bytes, duration_s, state, expires_at)
       VALUES ($1, $2, $3, 'pupil-take', $4, 1, 9, 'ready', now() + interval '90 days')`,
      [handInId, one.parts[0]!.id, memberId, randomUUID()],
    );
    const at = (partId: string, id: string) =>
      person.post(`/api/parts/${partId}/comments`, { text: "Here.", handInId: id, atS: 3.25 });
    expect((await at(one.parts[0]!.id, handInId).expect(201)).body).toMatchObject({ handInId, atS: 3.25 });
    for (const [partId, id] of [
      [two.parts[0]!.id, handInId],
      [one.parts[0]!.id, randomUUID()],
    ] as const)
      expect((await at(partId, id).expect(422)).body.fields[0].path).toBe("handInId");
  });
});

describe("the week's summary", () => {
  const run = async () => {
    await server.database.query("SELECT larkspan_jobs.add_job('weeklySummary')");
    await server.runJobs();
    return server.smtp.mails.filter(({ subject }) => subject === "Your week at Larkspan");
  };
  const wants = (person: Person) =>
    person
      .put("/api/mail/preferences", { assigned: false, handedIn: false, answered: false, weekly: true })
      .expect(200);

  it("comes once a week to those who asked for it: what is open to pupils, what waits to teachers", async () => {
    const [lowri, joss] = [await pupilIn(server, studioId), await pupilIn(server, studioId, { name: "Joss" })];
    const made = await give(teacher, studioId, [lowri.memberId, joss.memberId]);
    await clearTraces(server);
    expect(await run()).toEqual([]);
    await wants(teacher);
    await wants(lowri.person);
    const ofJoss = made.parts.find(({ memberId }) => memberId === joss.memberId)!;
    await server.database.query("UPDATE assignment_parts SET state = 'handed-in' WHERE id = $1", [ofJoss.id]);
    await run();
    const mails = await run();
    expect(mails.map(({ to }) => to).sort()).toEqual([teacher.email, lowri.person.email].sort());
    const text = (person: Person) => mails.find(({ to }) => to === person.email)?.text;
    expect(text(lowri.person)).toContain("Nets in the Loft: due on 10 December.");
    expect(text(teacher)).toContain("Tuesday evening class: one take waits for your answer.");
  });

  it("tells a teacher nothing of a pupil who took their word back", async () => {
    const { person, memberId } = await pupilIn(server, studioId);
    const [part] = (await give(teacher, studioId, [memberId])).parts;
    await server.database.query("UPDATE assignment_parts SET state = 'handed-in' WHERE id = $1", [part!.id]);
    await person.put(`/api/studios/${studioId}/consent`, { agree: false }).expect(200);
    await clearTraces(server);
    await wants(teacher);
    expect((await run()).filter(({ to }) => to === teacher.email)).toEqual([]);
  });
});
