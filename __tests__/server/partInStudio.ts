import { randomUUID } from "node:crypto";
import type { HandInRequest } from "../../shared/contract/studio/handIn";
import { aSong } from "./belongings";
import { Person, type TestServer } from "./testServer";

/** A studio with one pupil and one part, as the database would hold them; quick, for tests of what hangs on a part. */
export interface PartInStudio {
  studioId: string;
  teacher: Person;
  pupil: Person;
  teacherMemberId: string;
  pupilMemberId: string;
  partId: string;
}

export async function partInStudio(
  server: TestServer,
  people: { teacher?: Person; pupil?: Person } = {},
): Promise<PartInStudio> {
  const teacher = people.teacher ?? (await Person.put(server, "teacher", true));
  const pupil = people.pupil ?? (await Person.put(server, "singer", true));
  const { query } = server.database;
  await query("UPDATE users SET birth_year = 1990, country = 'DE' WHERE id = $1", [pupil.id]);
  const studioId = await made(server, "INSERT INTO studios (owner_id, name) VALUES ($1, 'Tuesday upstairs')", [
    teacher.id,
  ]);
  const member = `INSERT INTO studio_members (studio_id, user_id, role, name, consent_given_at) VALUES ($1, $2, $3, $4, now())`;
  const teacherMemberId = await made(server, member, [studioId, teacher.id, "owner", "Ida Fenn"]);
  const pupilMemberId = await made(server, member, [studioId, pupil.id, "pupil", "Maren Oake"]);
  const { title, chart, writtenKey, tune, beatsPerBar, tempo } = aSong({ title: "Slack Water" });
  const assignmentId = await made(
    server,
    "INSERT INTO assignments (studio_id, assigned_by, song, note) VALUES ($1, $2, $3, '')",
    [studioId, teacherMemberId, JSON.stringify({ title, chart, writtenKey, tune, beatsPerBar, tempo })],
  );
  const partId = await made(
    server,
    `INSERT INTO assignment_parts (studio_id, assignment_id, member_id, tonic, shift, note) VALUES ($1, $2, $3, 'G', 0, '')`,
    [studioId, assignmentId, pupilMemberId],
  );
  return { studioId, teacher, pupil, teacherMemberId, pupilMemberId, partId };
}

async function made({ database }: TestServer, insert: string, values: unknown[]): Promise<string> {
  const [row] = await database.query(`${insert} RETURNING id`, values);
  return String(row?.id);
}

/** So many bytes of silence as a wav file: 8,000 samples a second, 8 bits. */
export function aWav(bytes = 2044): Buffer {
  const wav = Buffer.alloc(bytes, 0x80);
  wav.write("RIFF", 0);
  wav.writeUInt32LE(bytes - 8, 4);
  wav.write("WAVEfmt ", 8);
  wav.writeUInt32LE(16, 16);
  wav.writeUInt16LE(1, 20);
  wav.writeUInt16LE(1, 22);
  wav.writeUInt32LE(8000, 24);
  wav.writeUInt32LE(8000, 28);
  wav.writeUInt16LE(1, 32);
  wav.writeUInt16LE(8, 34);
  wav.write("data", 36);
  wav.writeUInt32LE(bytes - 44, 40);
  return wav;
}

/** What announces a recording of so many bytes. */
export function aHandIn(bytes: number, changes: Partial<HandInRequest> = {}): HandInRequest {
  return {
    id: randomUUID(),
    takeId: randomUUID(),
    kind: "pupil-take",
    bytes,
    durationS: 12.5,
    effort: 2,
    measures: null,
    picture: { waveform: [0, 0.5, 1], trail: [{ t: 0.5, midi: 57.1 }], tune: [] },
    ...changes,
  };
}

/** By what a recording lies in the storage. */
export async function storageKeyOf({ database }: TestServer, handInId: string): Promise<string> {
  const [row] = await database.query("SELECT storage_key FROM hand_ins WHERE id = $1", [handInId]);
  return String(row?.storage_key);
}

export const tus = { "Tus-Resumable": "1.0.0" };

/** The headers with which bytes are sent from an offset on. */
export const from = (offset: number) => ({
  ...tus,
  "Upload-Offset": String(offset),
  "Content-Type": "application/offset+octet-stream",
});

/** Announces a recording and sends all of it in one go. */
export async function handIn(
  by: Person,
  partId: string,
  changes: Partial<HandInRequest> = {},
  bytes: Buffer = aWav(),
): Promise<string> {
  const request = aHandIn(bytes.length, changes);
  await by.post(`/api/parts/${partId}/hand-ins`, request).expect(201);
  await by.patch(`/api/uploads/${request.id}`, bytes).set(from(0)).expect(204);
  return request.id;
}
