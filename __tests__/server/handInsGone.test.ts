import { strFromU8, unzipSync } from "fflate";
import type { HandIn } from "../../shared/contract/studio/handIn";
import { aHandIn, aWav, from, handIn, partInStudio, type PartInStudio } from "./partInStudio";
import { type Person, startTestServer, type TestServer } from "./testServer";

let server: TestServer;
let place: PartInStudio;
beforeAll(async () => {
  server = await startTestServer();
});
afterAll(() => server.close());
beforeEach(async () => {
  server.s3.down = false;
  place = await partInStudio(server);
  server.smtp.mails.length = 0;
});

const listed = async (person: Person): Promise<HandIn[]> =>
  (await person.get(`/api/parts/${place.partId}/hand-ins`).expect(200)).body;
const partState = async () =>
  (await server.database.query("SELECT state, effort FROM assignment_parts WHERE id = $1", [place.partId]))[0];
const withdraw = () => place.pupil.put(`/api/studios/${place.studioId}/consent`, { agree: false }).expect(200);
const sweep = async () => {
  await server.database.query("SELECT larkspan_jobs.add_job('deleteTakes')");
  await server.runJobs();
};
const held = async (id: string) => (await server.s3.keys()).filter((key) => key.startsWith(id));
const recordOf = async (id: string) =>
  (await server.database.query("SELECT why, deleted_at FROM deletion_records WHERE storage_key = $1", [id]))[0];

describe("without consent", () => {
  it("nothing is recorded to the server and the teacher hears nothing, from the moment it is withdrawn", async () => {
    const { pupil, teacher, partId } = place;
    const id = await handIn(pupil, partId);
    const begun = aHandIn(2044);
    await pupil.post(`/api/parts/${partId}/hand-ins`, begun).expect(201);
    await withdraw();
    const code = async (test: Promise<{ body: { code: string } }>) => (await test).body.code;
    expect(await code(pupil.post(`/api/parts/${partId}/hand-ins`, aHandIn(100)).expect(403))).toBe("not-agreed");
    expect(await code(pupil.patch(`/api/uploads/${begun.id}`, aWav()).set(from(0)).expect(403))).toBe("not-agreed");
    for (const path of [`/api/hand-ins/${id}`, `/api/hand-ins/${id}/sound`, `/api/parts/${partId}/hand-ins`])
      expect(await code(teacher.get(path).expect(403))).toBe("not-agreed");
    await server.runJobs();
    expect([...(await held(id)), ...(await held(begun.id))]).toEqual([]);
    expect(await recordOf(id)).toMatchObject({ why: "consent withdrawn", deleted_at: expect.any(Date) });
  });

  it("a pupil too young to agree alone records nothing until a guardian has agreed", async () => {
    const { pupil, partId, pupilMemberId } = place;
    await server.database.query("UPDATE users SET birth_year = extract(year FROM now()) - 12 WHERE id = $1", [
      pupil.id,
    ]);
    await pupil.post(`/api/parts/${partId}/hand-ins`, aHandIn(100)).expect(403);
    await server.database.query("UPDATE studio_members SET guardian_agreed_at = now() WHERE id = $1", [pupilMemberId]);
    await handIn(pupil, partId);
  });
});

describe("going", () => {
  it("a take expires: out of the storage, with a record, and its place in the thread stays", async () => {
    const { pupil, teacher, partId } = place;
    const id = await handIn(pupil, partId);
    await server.database.query("UPDATE hand_ins SET expires_at = now() WHERE id = $1", [id]);
    await teacher.get(`/api/hand-ins/${id}/sound`).expect(410);
    await sweep();
    expect(await held(id)).toEqual([]);
    expect(await recordOf(id)).toMatchObject({ why: "expired", deleted_at: expect.any(Date) });
    expect(await listed(teacher)).toMatchObject([
      { id, state: "deleted", picture: null, measures: null, effort: null },
    ]);
  });

  it("an upload that never ends goes after a day, with every part of it", async () => {
    const asked = aHandIn(9000);
    await place.pupil.post(`/api/parts/${place.partId}/hand-ins`, asked).expect(201);
    await place.pupil.patch(`/api/uploads/${asked.id}`, aWav(9000).subarray(0, 500)).set(from(0)).expect(204);
    expect((await held(asked.id)).length).toBeGreaterThan(1);
    await server.database.query("UPDATE hand_ins SET created_at = now() - interval '25 hours' WHERE id = $1", [
      asked.id,
    ]);
    await sweep();
    expect(await held(asked.id)).toEqual([]);
    expect(await recordOf(asked.id)).toMatchObject({ why: "abandoned" });
  });

  it("whoever recorded it takes it back; the part is open again", async () => {
    const id = await handIn(place.pupil, place.partId);
    await place.pupil.delete(`/api/hand-ins/${id}`).expect(204);
    await place.pupil.delete(`/api/hand-ins/${id}`).expect(204);
    expect(await partState()).toEqual({ state: "assigned", effort: null });
    await place.teacher.get(`/api/hand-ins/${id}/sound`).expect(410);
    await server.runJobs();
    expect(await held(id)).toEqual([]);
  });

  it("is tried again while the storage does not answer, and recorded only when it is done", async () => {
    const id = await handIn(place.pupil, place.partId);
    server.s3.down = true;
    await place.pupil.delete(`/api/hand-ins/${id}`).expect(204);
    await server.runJobs();
    expect(await recordOf(id)).toEqual({ why: "taken back", deleted_at: null });
    server.s3.down = false;
    await sweep();
    expect(await recordOf(id)).toMatchObject({ deleted_at: expect.any(Date) });
    expect(await held(id)).toEqual([]);
  });

  it("whatever takes its row along takes its sound too: a studio that is deleted, a pupil who is removed", async () => {
    const id = await handIn(place.pupil, place.partId);
    const other = await partInStudio(server);
    const left = await handIn(other.pupil, other.partId);
    await place.teacher.delete(`/api/studios/${place.studioId}`).expect(204);
    await other.teacher.delete(`/api/studios/${other.studioId}/members/${other.pupilMemberId}`).expect(204);
    await server.runJobs();
    for (const [key, why] of [
      [id, "removed"],
      [left, "consent withdrawn"],
    ] as const) {
      expect(await held(key)).toEqual([]);
      expect(await recordOf(key)).toMatchObject({ why, deleted_at: expect.any(Date) });
    }
  });

  it("goes with the account, and not with another's", async () => {
    const other = await partInStudio(server, { teacher: place.teacher });
    const [mine, others] = [await handIn(place.pupil, place.partId), await handIn(other.pupil, other.partId)];
    await server.database.query("UPDATE users SET erase_at = now() WHERE id = $1", [place.pupil.id]);
    await server.database.query("SELECT larkspan_jobs.add_job('eraseAccounts')");
    await server.runJobs();
    expect(await held(mine)).toEqual([]);
    expect(await held(others)).toContain(others);
    expect(await recordOf(mine)).toMatchObject({ why: "account erased", deleted_at: expect.any(Date) });
  });

  it("goes along in the export, with its sound and without another's", async () => {
    const other = await partInStudio(server, { teacher: place.teacher });
    const wav = aWav(3000);
    const [mine, others] = [await handIn(place.pupil, place.partId, {}, wav), await handIn(other.pupil, other.partId)];
    const { body } = await place.pupil
      .get("/api/account/export")
      .buffer(true)
      .parse((res, done) => {
        const chunks: Buffer[] = [];
        res.on("data", (chunk: Buffer) => chunks.push(chunk));
        res.on("end", () => done(null, Buffer.concat(chunks)));
      })
      .expect(200);
    const files = unzipSync(new Uint8Array(body as Buffer));
    expect(Buffer.from(files[`handed-in/takes/${mine}.wav`]!).equals(wav)).toBe(true);
    expect(Object.keys(files).join()).not.toContain(others);
    expect(JSON.parse(strFromU8(files["handed-in/hand-ins.json"]!))).toMatchObject([{ id: mine, state: "ready" }]);
  });
});
