import { strFromU8 } from "fflate";
import { exportOf } from "./exportOf";
import { aHandIn, aWav, from, handIn, partInStudio, type PartInStudio, storageKeyOf } from "./partInStudio";
import { setPartStage } from "./partStage";
import type { TestServer } from "./testServer";

let server: TestServer;
let place: PartInStudio;
const { listed, partState, held, recordOf } = setPartStage((stage) => ({ server, place } = stage));

const withdraw = () => place.pupil.put(`/api/studios/${place.studioId}/consent`, { agree: false }).expect(200);
const sweep = async () => {
  await server.database.query("SELECT larkspan_jobs.add_job('deleteTakes')");
  await server.runJobs();
};
const keyOf = (id: string) => storageKeyOf(server, id);

describe("without consent", () => {
  it("nothing is recorded to the server and the teacher hears nothing, from the moment it is withdrawn", async () => {
    const { pupil, teacher, partId } = place;
    const id = await handIn(pupil, partId);
    const begun = aHandIn(2044);
    await pupil.post(`/api/parts/${partId}/hand-ins`, begun).expect(201);
    const [key, begunKey] = [await keyOf(id), await keyOf(begun.id)];
    await withdraw();
    const code = async (test: Promise<{ body: { code: string } }>) => (await test).body.code;
    expect(await code(pupil.post(`/api/parts/${partId}/hand-ins`, aHandIn(100)).expect(403))).toBe("not-agreed");
    expect(await code(pupil.patch(`/api/uploads/${begun.id}`, aWav()).set(from(0)).expect(403))).toBe("not-agreed");
    for (const path of [`/api/hand-ins/${id}`, `/api/hand-ins/${id}/sound`, `/api/parts/${partId}/hand-ins`])
      expect(await code(teacher.get(path).expect(403))).toBe("not-agreed");
    await server.runJobs();
    expect([...(await held(key)), ...(await held(begunKey))]).toEqual([]);
    expect(await recordOf(key)).toMatchObject({ why: "consent withdrawn", deleted_at: expect.any(Date) });
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

describe("another birth year", () => {
  it("that would end sharing is refused until it is said that recordings go; then they go", async () => {
    const { pupil, partId } = place;
    const key = await keyOf(await handIn(pupil, partId));
    const born = { birthYear: new Date().getUTCFullYear() - 12, country: "DE" };
    const { body } = await pupil.put("/api/account/person", born).expect(409);
    expect([body.code, body.message]).toEqual(["ends-sharing", expect.stringContaining("Tuesday upstairs")]);
    expect((await pupil.get("/api/account/person").expect(200)).body.birthYear).toBe(1990);
    await pupil.put("/api/account/person", { birthYear: null, country: "DE" }).expect(409);
    await sweep();
    expect(await held(key)).toContain(key);
    await pupil.put("/api/account/person", { ...born, endsSharing: true }).expect(200, born);
    await sweep();
    expect(await held(key)).toEqual([]);
  });

  it("that ends nothing is not asked about: an older one, or where nothing is shared", async () => {
    await place.pupil.put("/api/account/person", { birthYear: 1960, country: "FR" }).expect(200);
    await withdraw();
    await place.pupil.put("/api/account/person", { birthYear: 2018, country: "FR" }).expect(200);
  });
});

describe("going", () => {
  it("a take expires: out of the storage, with a record, and its place in the thread stays", async () => {
    const { pupil, teacher, partId } = place;
    const id = await handIn(pupil, partId);
    await server.database.query("UPDATE hand_ins SET expires_at = now() WHERE id = $1", [id]);
    await teacher.get(`/api/hand-ins/${id}/sound`).expect(410);
    await sweep();
    const key = await keyOf(id);
    expect(await held(key)).toEqual([]);
    expect(await recordOf(key)).toMatchObject({ why: "expired", deleted_at: expect.any(Date) });
    expect(await listed(teacher)).toMatchObject([{ id, state: "deleted", picture: null, measures: null, effort: 2 }]);
  });

  it("an upload that never ends goes after a day, with every part of it", async () => {
    const asked = aHandIn(9000);
    await place.pupil.post(`/api/parts/${place.partId}/hand-ins`, asked).expect(201);
    await place.pupil.patch(`/api/uploads/${asked.id}`, aWav(9000).subarray(0, 500)).set(from(0)).expect(204);
    const key = await keyOf(asked.id);
    expect((await held(key)).length).toBeGreaterThan(1);
    await server.database.query("UPDATE hand_ins SET created_at = now() - interval '25 hours' WHERE id = $1", [
      asked.id,
    ]);
    await sweep();
    expect(await held(key)).toEqual([]);
    expect(await recordOf(key)).toMatchObject({ why: "abandoned" });
  });

  it("an upload that paused for over a day is announced again by the same id, arrives, and goes again in its time", async () => {
    const { pupil, partId } = place;
    const wav = aWav(9000);
    const asked = aHandIn(wav.length);
    const announce = () => pupil.post(`/api/parts/${partId}/hand-ins`, asked).expect(201);
    await announce();
    await pupil.patch(`/api/uploads/${asked.id}`, wav.subarray(0, 500)).set(from(0)).expect(204);
    await server.database.query("UPDATE hand_ins SET created_at = now() - interval '25 hours' WHERE id = $1", [
      asked.id,
    ]);
    await sweep();
    expect(await listed(pupil)).toEqual([]);
    await announce();
    await pupil.patch(`/api/uploads/${asked.id}`, wav).set(from(0)).expect(204);
    expect(await listed(place.teacher)).toMatchObject([{ id: asked.id, state: "ready" }]);
    const key = await keyOf(asked.id);
    expect(await held(key)).toContain(key);
    await pupil.delete(`/api/hand-ins/${asked.id}`).expect(204);
    await server.runJobs();
    expect(await held(key)).toEqual([]);
  });

  it("takes with it what the part tells of it: the part goes back to the take before, and is open without one", async () => {
    const { pupil, partId } = place;
    await handIn(pupil, partId, { effort: 1 });
    const newer = await handIn(pupil, partId, { effort: 5 });
    await pupil.delete(`/api/hand-ins/${newer}`).expect(204);
    expect(await partState()).toEqual({ state: "handed-in", effort: 1 });
    await server.database.query("UPDATE hand_ins SET expires_at = now() WHERE part_id = $1", [partId]);
    await sweep();
    expect(await partState()).toEqual({ state: "assigned", effort: null });
    const [row] = await server.database.query("SELECT handed_in_at FROM assignment_parts WHERE id = $1", [partId]);
    expect(row?.handed_in_at).toBeNull();
    const { body: roster } = await place.teacher.get(`/api/studios/${place.studioId}/roster`).expect(200);
    const told = roster.find(({ memberId }: { memberId: string }) => memberId === place.pupilMemberId);
    // Its days are over, and only how it felt is left.
    expect(told).toMatchObject({ lastTake: { effort: 1 }, waiting: 0 });
  });

  it("leaves an answer of the teacher as it is when its take goes, without how it felt", async () => {
    const { pupil, partId } = place;
    const id = await handIn(pupil, partId, { effort: 4 });
    await server.database.query("UPDATE assignment_parts SET state = 'accepted' WHERE id = $1", [partId]);
    await pupil.delete(`/api/hand-ins/${id}`).expect(204);
    expect(await partState()).toEqual({ state: "accepted", effort: null });
  });

  it("whoever recorded it takes it back; the part is open again", async () => {
    const id = await handIn(place.pupil, place.partId);
    await place.pupil.delete(`/api/hand-ins/${id}`).expect(204);
    await place.pupil.delete(`/api/hand-ins/${id}`).expect(204);
    expect(await partState()).toEqual({ state: "assigned", effort: null });
    await place.teacher.get(`/api/hand-ins/${id}/sound`).expect(410);
    await server.runJobs();
    expect(await held(await keyOf(id))).toEqual([]);
  });

  it("is tried again while the storage does not answer, and recorded only when it is done", async () => {
    const id = await handIn(place.pupil, place.partId);
    const key = await keyOf(id);
    server.s3.down = true;
    await place.pupil.delete(`/api/hand-ins/${id}`).expect(204);
    await server.runJobs();
    expect(await recordOf(key)).toEqual({ why: "taken back", deleted_at: null });
    server.s3.down = false;
    await sweep();
    expect(await recordOf(key)).toMatchObject({ deleted_at: expect.any(Date) });
    expect(await held(key)).toEqual([]);
  });

  it("whatever takes its row along takes its sound too: an assignment, a studio, a pupil who is removed", async () => {
    const other = await partInStudio(server);
    const third = await partInStudio(server);
    const id = await keyOf(await handIn(place.pupil, place.partId));
    const left = await keyOf(await handIn(other.pupil, other.partId));
    const given = await keyOf(await handIn(third.pupil, third.partId));
    const [assignment] = await server.database.query("SELECT id FROM assignments WHERE studio_id = $1", [
      third.studioId,
    ]);
    await third.teacher.delete(`/api/studios/${third.studioId}/assignments/${assignment?.id}`).expect(204);
    await server.runJobs();
    expect(await held(given)).toEqual([]);
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
    const [mine, others] = [
      await keyOf(await handIn(place.pupil, place.partId)),
      await keyOf(await handIn(other.pupil, other.partId)),
    ];
    await server.database.query("UPDATE users SET erase_at = now() WHERE id = $1", [place.pupil.id]);
    await server.database.query("SELECT larkspan_jobs.add_job('eraseAccounts')");
    await server.runJobs();
    expect(await held(mine)).toEqual([]);
    expect(await held(others)).toContain(others);
    expect(await recordOf(mine)).toMatchObject({ why: "account erased", deleted_at: expect.any(Date) });
  });

  it("holds up no other account when it cannot be deleted now", async () => {
    const other = await partInStudio(server, { teacher: place.teacher });
    const stuck = await keyOf(await handIn(place.pupil, place.partId));
    const others = await keyOf(await handIn(other.pupil, other.partId));
    const accounts = [place.pupil.id, other.pupil.id];
    await server.database.query("UPDATE users SET erase_at = now() WHERE id = ANY($1)", [accounts]);
    // Somebody writes to it, as it seems, for a while longer than anybody waits.
    await server.database.query("INSERT INTO upload_locks VALUES ($1, gen_random_uuid(), now() + interval '1 hour')", [
      stuck,
    ]);
    const erase = async () => {
      await server.database.query("SELECT larkspan_jobs.add_job('eraseAccounts')");
      await server.runJobs();
    };
    const left = async () =>
      (await server.database.query("SELECT id FROM users WHERE id = ANY($1)", [accounts])).map(({ id }) => id);
    await erase();
    expect(await left()).toEqual([place.pupil.id]);
    expect(await held(others)).toEqual([]);
    await server.database.query("DELETE FROM upload_locks");
    await erase();
    expect(await left()).toEqual([]);
    expect(await held(stuck)).toEqual([]);
  }, 60_000);

  it("goes along in the export, with its sound and without another's", async () => {
    const other = await partInStudio(server, { teacher: place.teacher });
    const wav = aWav(3000);
    const [mine, others] = [await handIn(place.pupil, place.partId, {}, wav), await handIn(other.pupil, other.partId)];
    const files = await exportOf(place.pupil);
    expect(Buffer.from(files[`handed-in/takes/${mine}.wav`]!).equals(wav)).toBe(true);
    expect(Object.keys(files).join()).not.toContain(others);
    expect(JSON.parse(strFromU8(files["handed-in/hand-ins.json"]!))).toMatchObject([{ id: mine, state: "ready" }]);
  });

  it("the export comes also while the storage does not answer, and says which sounds are missing", async () => {
    const id = await handIn(place.pupil, place.partId);
    server.s3.down = true;
    const files = await exportOf(place.pupil);
    expect(strFromU8(files["handed-in/not-read.txt"]!)).toContain(id);
    expect(JSON.parse(strFromU8(files["handed-in/hand-ins.json"]!))).toMatchObject([{ id, state: "ready" }]);
  });
});
