import { randomUUID } from "node:crypto";
import { aHandIn, aWav, from, handIn, partInStudio, type PartInStudio } from "./partInStudio";
import { setPartStage } from "./partStage";
import { Person, type TestServer } from "./testServer";

let server: TestServer;
let place: PartInStudio;
const { listed, partState } = setPartStage((stage) => ({ server, place } = stage));

describe("a take that was handed in before, under another id", () => {
  const announce = (changes: object, partId = place.partId) =>
    place.pupil.post(`/api/parts/${partId}/hand-ins`, aHandIn(aWav().length, changes));
  const known = async (person = place.pupil) =>
    (await person.get(`/api/parts/${place.partId}`).expect(200)).body.takesHandedIn;

  it("stays the one recording, also when both arrive at the same moment; another take makes a second", async () => {
    const takeId = randomUUID();
    const answers = await Promise.all([announce({ takeId }), announce({ takeId })]);
    expect(answers.map(({ status }) => status).sort()).toEqual([200, 201]);
    const [id] = new Set(answers.map(({ body }) => body.id));
    expect(answers.map(({ body }) => body.id)).toEqual([id, id]);
    await place.pupil.patch(`/api/uploads/${id}`, aWav()).set(from(0)).expect(204);
    expect((await announce({ takeId: takeId.toUpperCase() }).expect(200)).body).toMatchObject({ id, state: "ready" });
    expect((await listed(place.teacher)).map((take) => take.id)).toEqual([id]);
    expect(await known()).toEqual([takeId]);
    expect(await known(place.teacher)).toEqual([]);
    await server.runJobs();
    expect(server.smtp.mails).toHaveLength(1);
    const other = await handIn(place.pupil, place.partId);
    expect((await listed(place.teacher)).map((take) => take.id)).toEqual([id, other]);
    expect(await known()).toHaveLength(2);
  });

  it("that was given up on its way goes on, and tells how it felt as it is said now", async () => {
    const takeId = randomUUID();
    const { body } = await announce({ takeId, effort: 2 }).expect(201);
    await place.pupil.patch(`/api/uploads/${body.id}`, aWav().subarray(0, 500)).set(from(0)).expect(204);
    expect(await known()).toEqual([]);
    expect((await announce({ takeId, effort: 5 }).expect(200)).body).toMatchObject({
      ...{ id: body.id, state: "uploading", effort: 5 },
    });
    await place.pupil.patch(`/api/uploads/${body.id}`, aWav().subarray(500)).set(from(500)).expect(204);
    expect(await partState()).toEqual({ state: "handed-in", effort: 5 });
  });

  it("can be handed in again once it is taken back, and for another part", async () => {
    const takeId = randomUUID();
    const id = await handIn(place.pupil, place.partId, { takeId });
    await place.pupil.delete(`/api/hand-ins/${id}`).expect(204);
    expect(await known()).toEqual([]);
    await handIn(place.pupil, place.partId, { takeId });
    expect(await known()).toEqual([takeId]);
    const { partId } = await partInStudio(server, { pupil: place.pupil });
    await handIn(place.pupil, partId, { takeId });
  });

  it("is nothing to anybody else: outside there is no such part, and a teacher's answer is a recording of its own", async () => {
    const takeId = randomUUID();
    const id = await handIn(place.pupil, place.partId, { takeId });
    const stranger = await Person.put(server, "singer", true);
    const { body } = await stranger
      .post(`/api/parts/${place.partId}/hand-ins`, aHandIn(aWav().length, { takeId }))
      .expect(404);
    expect(body.code).toBe("not-found");
    const answer = await handIn(place.teacher, place.partId, { takeId, kind: "teacher-answer", effort: null });
    expect(answer).not.toBe(id);
    expect(await known()).toEqual([takeId]);
  });
});
