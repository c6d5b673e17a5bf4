import { once } from "node:events";
import { createServer, request as openRequest } from "node:http";
import type { AddressInfo } from "node:net";
import request from "supertest";
import { createApp } from "../../server/createApp";
import { createDataSource } from "../../server/database/dataSource";
import { createLogger } from "../../server/http/requestLog";
import { ObjectStore } from "../../server/storage/objectStore.service";
import type { HandIn, SoundLink } from "../../shared/contract/studio/handIn";
import { aHandIn, aWav, from, handIn, type PartInStudio, storageKeyOf, tus } from "./partInStudio";
import { setPartStage } from "./partStage";
import { Person, type TestServer, tokenSecret } from "./testServer";

let server: TestServer;
let place: PartInStudio;
const { listed, partState, held, recordOf } = setPartStage((stage) => ({ server, place } = stage));

async function until(done: () => Promise<boolean>): Promise<void> {
  for (const end = Date.now() + 15_000; !(await done());) {
    if (Date.now() > end) throw new Error("It did not come about in 15 seconds.");
  }
}

/** One more server of the same product, on the same database and storage. */
async function anotherServer() {
  const dataSource = await createDataSource(server.database.url, () => undefined).initialize();
  const { app } = createApp(dataSource, createLogger("silent"), {
    ...{ tokenSecret, publicOrigin: null, trustProxy: false, staticDir: "/nonexistent" },
    objects: new ObjectStore(server.s3.settings),
  });
  return { app, dataSource, ask: (asked: request.Test) => asked.set("Authorization", `Bearer ${place.pupil.token}`) };
}

describe("handing in", () => {
  it("puts the take into the thread of both sides, moves the part on and writes to the teachers once", async () => {
    const { pupil, teacher, partId } = place;
    const id = await handIn(pupil, partId);
    expect(await partState()).toEqual({ state: "handed-in", effort: 2 });
    for (const person of [pupil, teacher]) {
      expect(await listed(person)).toMatchObject([
        { id, partId, kind: "pupil-take", state: "ready", mine: person === pupil, author: { name: "Maren Oake" } },
      ]);
    }
    const [take] = await listed(teacher);
    expect(take?.picture?.waveform).toEqual([0, 0.5, 1]);
    expect((Date.parse(take!.expiresAt) - Date.now()) / 86_400_000).toBeCloseTo(90, 1);
    await server.runJobs();
    expect(server.smtp.mails.map(({ to, subject }) => [to, subject])).toEqual([
      [teacher.email, "Maren Oake handed in Slack Water"],
    ]);
    expect(server.smtp.mails[0]?.text).toContain(`/studio/parts/${partId}`);
  });

  it("plays to the teacher by a signed link that holds the very bytes", async () => {
    const wav = aWav(3000);
    const id = await handIn(place.pupil, place.partId, {}, wav);
    const { url } = (await place.teacher.get(`/api/hand-ins/${id}/sound`).expect(200)).body as SoundLink;
    const sound = await fetch(url);
    expect(sound.headers.get("content-type")).toBe("audio/wav");
    expect(Buffer.from(await sound.arrayBuffer()).equals(wav)).toBe(true);
  });

  it("a teacher's recorded answer reaches the pupil, and leaves the part as it is", async () => {
    const { pupil, teacher, partId } = place;
    await handIn(pupil, partId);
    await server.runJobs();
    server.smtp.mails.length = 0;
    const id = await handIn(teacher, partId, { kind: "teacher-answer", effort: null });
    expect((await listed(pupil)).map((take) => [take.id === id, take.kind, take.mine])).toEqual([
      [false, "pupil-take", true],
      [true, "teacher-answer", false],
    ]);
    expect((await partState())?.state).toBe("handed-in");
    await server.runJobs();
    expect(server.smtp.mails.map(({ to, text }) => [to, text.includes("recorded an answer")])).toEqual([
      [pupil.email, true],
    ]);
    await pupil.get(`/api/hand-ins/${id}/sound`).expect(200);
  });

  it("refuses a take by the teacher and an answer by the pupil", async () => {
    const { pupil, teacher, partId } = place;
    const post = (person: Person, kind: HandIn["kind"]) =>
      person.post(`/api/parts/${partId}/hand-ins`, aHandIn(100, { kind })).expect(403);
    expect((await post(teacher, "pupil-take")).body.code).toBe("wrong-side");
    expect((await post(pupil, "teacher-answer")).body.code).toBe("wrong-side");
  });

  it("takes no more than 20 MB, ten minutes and a picture of its size", async () => {
    for (const [changes, path] of [
      [{ bytes: 20_000_001 }, "bytes"],
      [{ durationS: 601 }, "durationS"],
      [{ picture: { waveform: Array<number>(401).fill(0), trail: [], tune: [] } }, "picture.waveform"],
    ] as const) {
      const { body } = await place.pupil
        .post(`/api/parts/${place.partId}/hand-ins`, aHandIn(100, changes as object))
        .expect(422);
      expect(body.fields[0].path).toBe(path);
    }
  });
});

describe("sending", () => {
  const announced = async (bytes: number) => {
    const asked = aHandIn(bytes);
    await place.pupil.post(`/api/parts/${place.partId}/hand-ins`, asked).expect(201);
    return asked;
  };
  const offset = async (id: string) =>
    Number((await place.pupil.head(`/api/uploads/${id}`).set(tus).expect(200)).headers["upload-offset"]);

  it("goes on where it was cut, also at another server, and an announcement may be repeated", async () => {
    const other = await anotherServer();
    const wav = aWav(9000);
    const asked = await announced(wav.length);
    const at = `/api/uploads/${asked.id}`;
    await place.pupil.patch(at, wav.subarray(0, 4000)).set(from(0)).expect(204);
    expect(await listed(place.teacher)).toEqual([]);
    await place.pupil.post(`/api/parts/${place.partId}/hand-ins`, asked).expect(201);
    expect(await offset(asked.id)).toBe(4000);
    await place.pupil.patch(at, wav.subarray(0, 100)).set(from(0)).expect(409);
    await other.ask(request(other.app).patch(at).set(from(4000)).send(wav.subarray(4000))).expect(204);
    await other.dataSource.destroy();
    expect(await offset(asked.id)).toBe(9000);
    expect(await listed(place.teacher)).toMatchObject([{ id: asked.id, state: "ready" }]);
    const { url } = (await place.teacher.get(`/api/hand-ins/${asked.id}/sound`).expect(200)).body as SoundLink;
    expect(Buffer.from(await (await fetch(url)).arrayBuffer()).equals(wav)).toBe(true);
  });

  it("goes on at once after a connection was cut in the middle of a request, and nothing acknowledged is lost", async () => {
    const wav = aWav(9000);
    const asked = await announced(wav.length);
    await place.pupil.patch(`/api/uploads/${asked.id}`, wav.subarray(0, 3000)).set(from(0)).expect(204);
    const listening = createServer(server.app).listen(0, "127.0.0.1");
    try {
      await once(listening, "listening");
      const sending = openRequest({
        port: (listening.address() as AddressInfo).port,
        method: "PATCH",
        path: `/api/uploads/${asked.id}`,
        headers: { ...from(3000), "Content-Length": 6000, Authorization: `Bearer ${place.pupil.token}` },
      });
      sending.on("error", () => undefined);
      sending.write(wav.subarray(3000, 5000));
      // It is being written: somebody holds the upload's lock.
      await until(async () => (await server.database.query("SELECT FROM upload_locks")).length > 0);
      sending.destroy();
      const kept = await offset(asked.id);
      expect([kept >= 3000, kept <= 5000]).toEqual([true, true]);
      await place.pupil.patch(`/api/uploads/${asked.id}`, wav.subarray(kept)).set(from(kept)).expect(204);
    } finally {
      listening.closeAllConnections();
      listening.close();
    }
    const { url } = (await place.teacher.get(`/api/hand-ins/${asked.id}/sound`).expect(200)).body as SoundLink;
    expect(Buffer.from(await (await fetch(url)).arrayBuffer()).equals(wav)).toBe(true);
  });

  it("finishes by a repeated announcement what a lost last answer left open, and writes one mail", async () => {
    const wav = aWav();
    const asked = await announced(wav.length);
    await place.pupil.patch(`/api/uploads/${asked.id}`, wav).set(from(0)).expect(204);
    // As if the server had ended between the storage's answer and its own.
    await server.database.query("UPDATE hand_ins SET state = 'uploading' WHERE id = $1", [asked.id]);
    const { body } = await place.pupil.post(`/api/parts/${place.partId}/hand-ins`, asked).expect(201);
    expect(body.state).toBe("ready");
    await server.runJobs();
    expect(server.smtp.mails.filter(({ to }) => to === place.teacher.email)).toHaveLength(1);
  });

  it.each([
    ["a page", Buffer.from("<!doctype html><script>alert(1)</script>".padEnd(2000))],
    ["a recording's head over nothing that sounds", Buffer.from("fLaC".padEnd(2000))],
  ])("looks at the bytes and deletes %s, whatever it was called", async (_what, page) => {
    const asked = await announced(page.length);
    const key = await storageKeyOf(server, asked.id);
    const { body } = await place.pupil.patch(`/api/uploads/${asked.id}`, page).set(from(0)).buffer(true).expect(422);
    expect(body.code).toBe("not-a-recording");
    await server.runJobs();
    expect(await held(key)).toEqual([]);
    expect(await recordOf(key)).toMatchObject({ why: "refused", deleted_at: expect.any(Date) });
    expect((await partState())?.state).toBe("assigned");
    expect(await listed(place.pupil)).toEqual([]);
    await place.pupil.patch(`/api/uploads/${asked.id}`, page).set(from(0)).expect(404);
  });

  it("deletes what lasts longer than ten minutes by its own bytes, however short it was announced", async () => {
    const ofLength = (seconds: number) => aWav(44 + 8000 * seconds);
    const asked = aHandIn(ofLength(660).length, { durationS: 60 });
    await place.pupil.post(`/api/parts/${place.partId}/hand-ins`, asked).expect(201);
    const key = await storageKeyOf(server, asked.id);
    const { body } = await place.pupil
      .patch(`/api/uploads/${asked.id}`, ofLength(660))
      .set(from(0))
      .buffer(true)
      .expect(422);
    expect(body).toMatchObject({ code: "invalid", fields: [{ path: "durationS" }] });
    await server.runJobs();
    expect(await held(key)).toEqual([]);
    expect(await listed(place.pupil)).toEqual([]);
    expect((await partState())?.state).toBe("assigned");
    await handIn(place.pupil, place.partId, { durationS: 600 }, ofLength(600));
  });

  it("refuses more bytes than were announced, and what is not sent as bytes", async () => {
    const { id } = await announced(1000);
    await place.pupil.patch(`/api/uploads/${id}`, aWav(1001)).set(from(0)).expect(413);
    const { body } = await place.pupil
      .patch(`/api/uploads/${id}`, aWav())
      .set({ ...from(0), "Content-Type": "text/plain" });
    expect(body.code).toBe("unsupported-media-type");
    expect(await offset(id)).toBe(0);
  });

  it("nobody else sends, hears or deletes it", async () => {
    const wav = aWav();
    const asked = await announced(wav.length);
    const stranger = await Person.put(server, "teacher", true);
    for (const person of [stranger, place.teacher]) {
      await person.head(`/api/uploads/${asked.id}`).set(tus).expect(404);
      await person.patch(`/api/uploads/${asked.id}`, wav).set(from(0)).expect(404);
    }
    await place.pupil.patch(`/api/uploads/${asked.id}`, wav).set(from(0)).expect(204);
    await stranger.get(`/api/hand-ins/${asked.id}/sound`).expect(404);
    await stranger.delete(`/api/hand-ins/${asked.id}`).expect(404);
    await place.teacher.delete(`/api/hand-ins/${asked.id}`).expect(403);
  });

  it("says in its own words that the storage does not answer, and goes on when it does", async () => {
    const wav = aWav();
    const asked = await announced(wav.length);
    server.s3.down = true;
    const { body } = await place.pupil.patch(`/api/uploads/${asked.id}`, wav).set(from(0)).buffer(true).expect(503);
    expect(body.code).toBe("storage-down");
    server.s3.down = false;
    await place.pupil.patch(`/api/uploads/${asked.id}`, wav).set(from(0)).expect(204);
  });

  it("says the same of a recording that is announced again while the storage is down, also of one that has arrived", async () => {
    const wav = aWav();
    const asked = await announced(wav.length);
    await place.pupil.patch(`/api/uploads/${asked.id}`, wav).set(from(0)).expect(204);
    await server.database.query("UPDATE hand_ins SET state = 'uploading' WHERE id = $1", [asked.id]);
    const repeated = () => place.pupil.post(`/api/parts/${place.partId}/hand-ins`, asked);
    server.s3.down = true;
    expect((await repeated().expect(503)).body.code).toBe("storage-down");
    // The upload was found, and the sound itself could not be read any more.
    server.s3.down = false;
    server.s3.refuses = (what) => /^GET \/takes\/[0-9a-f-]+\?x-id=GetObject/.test(what);
    expect((await repeated().expect(503)).body.code).toBe("storage-down");
    server.s3.refuses = () => false;
    expect((await repeated().expect(201)).body.state).toBe("ready");
  });

  it("a short fault of the storage is not taken for an upload that is not there", async () => {
    const wav = aWav(9000);
    const asked = await announced(wav.length);
    await place.pupil.patch(`/api/uploads/${asked.id}`, wav.subarray(0, 4000)).set(from(0)).expect(204);
    // Another server, which remembers nothing of it, and reads what is known of it from the storage.
    const other = await anotherServer();
    server.s3.refuses = (what) => /^GET .*\.info/.test(what);
    await other.ask(request(other.app).head(`/api/uploads/${asked.id}`).set(tus)).expect(503);
    const again = request(other.app).post(`/api/parts/${place.partId}/hand-ins`).send(asked);
    expect((await other.ask(again).expect(503)).body.code).toBe("storage-down");
    server.s3.refuses = () => false;
    await other.dataSource.destroy();
    expect(await offset(asked.id)).toBe(4000);
  });

  it("lies in the storage by a key of the server's own, not by the id that its sender made", async () => {
    const { id } = await announced(1000);
    const keys = (await server.s3.keys()).join();
    expect(keys).toContain(await storageKeyOf(server, id));
    expect(keys).not.toContain(id);
  });

  it("tells pages of other sites nothing that would let them send", async () => {
    const { id } = await announced(1000);
    const { headers } = await place.pupil
      .head(`/api/uploads/${id}`)
      .set({ ...tus, Origin: "https://elsewhere.example" });
    expect(headers).not.toHaveProperty("access-control-allow-origin");
  });
});
