import { randomUUID } from "node:crypto";
import { aSong } from "../belongings";
import { clearTraces } from "../confirmedPerson";
import { Person, type TestServer } from "../testServer";
import { aPart, give, join, pupilIn, studioOf } from "./studioPeople";
import { setStudioStage } from "./studioStage";

let server: TestServer;
let teacher: Person;
let studioId: string;
setStudioStage((stage) => ({ server, teacher, studioId } = stage));
beforeEach(() => clearTraces(server));

const mails = async () => {
  await server.runJobs();
  await server.runJobs();
  return server.smtp.mails.length;
};

describe("what is sent again because its answer was lost", () => {
  it("gives a song once, at the same moment and after it left the teacher's shelf too; the id serves nobody else", async () => {
    const { person, memberId } = await pupilIn(server, studioId);
    const song = aSong();
    await teacher.put(`/api/songs/${song.id}`, song).expect(201);
    const request = { id: randomUUID(), songId: song.id, dueOn: null, note: "", parts: [aPart(memberId)] };
    const send = (by = teacher, to = studioId) => by.post(`/api/studios/${to}/assignments`, request);
    for (const { status, body } of await Promise.all([send(), send()]))
      expect([status, body.id]).toEqual([201, request.id]);
    await teacher.delete(`/api/songs/${song.id}`).expect(204);
    expect((await send().expect(201)).body.parts).toHaveLength(1);
    expect((await person.get("/api/parts").expect(200)).body).toHaveLength(1);
    expect((await person.get("/api/songs").expect(200)).body).toHaveLength(1);
    expect(await mails()).toBe(1);
    const colleague = await Person.put(server, "teacher", true);
    await join(server, studioId, colleague, { role: "co-teacher" });
    expect((await send(colleague).expect(409)).body.code).toBe("conflict");
    const other = await Person.put(server, "teacher", true);
    expect((await send(other, (await studioOf(other)).id).expect(409)).body.code).toBe("conflict");
  });

  it("stands in a thread once, and is nobody else's", async () => {
    const { person, memberId } = await pupilIn(server, studioId);
    const path = `/api/parts/${(await give(teacher, studioId, [memberId])).parts[0]!.id}/comments`;
    const words = { id: randomUUID(), text: "High there." };
    const { body: said } = await person.post(path, words).expect(201);
    expect((await person.post(path, words).expect(201)).body).toEqual(said);
    expect((await teacher.post(path, words).expect(409)).body.code).toBe("conflict");
    expect((await person.get(path).expect(200)).body).toEqual([said]);
  });
});

describe("an answer", () => {
  const handIn = (partId: string, at: string) =>
    server.database.query(
      "UPDATE assignment_parts SET state = 'handed-in', handed_in_at = $2::timestamptz + interval '400 microseconds' WHERE id = $1",
      [partId, at],
    );

  it("counts once for a take: sent again it brings neither a second comment nor a second mail", async () => {
    const { person, memberId } = await pupilIn(server, studioId);
    const path = `/api/parts/${(await give(teacher, studioId, [memberId])).parts[0]!.id}`;
    await clearTraces(server);
    await handIn(path.slice(11), "2026-11-24T19:00:00.123Z");
    const { lastTake } = (await teacher.get(path).expect(200)).body;
    const answer = { state: "returned", message: "Once more.", messageId: randomUUID(), seenTakeAt: lastTake.at };
    for (let k = 0; k < 2; k++) await teacher.put(path, answer).expect(200);
    expect((await person.get(`${path}/comments`).expect(200)).body).toHaveLength(1);
    expect(await mails()).toBe(1);
    await handIn(path.slice(11), "2026-11-25T19:00:00.000Z");
    await teacher.put(path, { state: "returned", seenTakeAt: "2026-11-25T19:00:00.000Z" }).expect(200);
    expect(await mails()).toBe(2);
  });

  it("is not taken for a take that came after the one that was heard", async () => {
    const { person, memberId } = await pupilIn(server, studioId);
    const path = `/api/parts/${(await give(teacher, studioId, [memberId])).parts[0]!.id}`;
    await clearTraces(server);
    await handIn(path.slice(11), "2026-11-25T19:00:00.000Z");
    for (const seen of [{ seenTakeAt: "2026-11-24T19:00:00.000Z" }, { seenTakeAt: null }, {}]) {
      const { body } = await teacher.put(path, { state: "accepted", message: "Well sung.", ...seen }).expect(409);
      expect(body.code).toBe("newer-take");
    }
    expect((await person.get(path).expect(200)).body.state).toBe("handed-in");
    expect((await person.get(`${path}/comments`).expect(200)).body).toEqual([]);
    expect(await mails()).toBe(0);
  });
});
