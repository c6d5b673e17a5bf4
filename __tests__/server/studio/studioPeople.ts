import { randomUUID } from "node:crypto";
import type { Assignment, AssignmentRequest } from "../../../shared/contract/studio/assignment";
import type { Studio } from "../../../shared/contract/studio/studio";
import { aSong } from "../belongings";
import { Person, type TestServer } from "../testServer";

/** A studio of this person. */
export async function studioOf(person: Person, name = "Tuesday evening class"): Promise<Studio> {
  const { body } = await person.post("/api/studios", { name, teacherName: "Ruth Callow" }).expect(201);
  return body as Studio;
}

interface JoinWishes {
  role?: "pupil" | "co-teacher";
  name?: string;
  /** agreed and old enough */
  agrees?: boolean;
}

/** Puts somebody into a studio as if they had accepted an invitation; the id of their membership. */
export async function join(
  { database }: Pick<TestServer, "database">,
  studioId: string,
  person: { id: string },
  { role = "pupil", name = "Lowri Tate", agrees = true }: JoinWishes = {},
): Promise<string> {
  if (agrees)
    await database.query("UPDATE users SET birth_year = coalesce(birth_year, 1980) WHERE id = $1", [person.id]);
  const [row] = await database.query(
    `INSERT INTO studio_members (studio_id, user_id, role, name, consent_given_at) VALUES ($1, $2, $3, $4, $5) RETURNING id`,
    [studioId, person.id, role, name, agrees ? new Date() : null],
  );
  return String(row?.id);
}

/** A new pupil, their account and their membership. */
export async function pupilIn(server: TestServer, studioId: string, wishes: JoinWishes = {}) {
  const person = await Person.put(server, "singer", true);
  return { person, memberId: await join(server, studioId, person, wishes) };
}

export const aPart = (memberId: string, changes: Partial<AssignmentRequest["parts"][number]> = {}) => ({
  memberId,
  tonic: "Bb",
  shift: 3,
  score: 88,
  reason: "All of it lies in the comfort band.",
  instrument: { id: "box-adf", name: "Box guitar" },
  way: { retune: 0, capo: 1, shapeKey: "A" },
  note: "",
  ...changes,
});

/** Gives these members a new song of the teacher's. */
export async function give(
  teacher: Person,
  studioId: string,
  memberIds: string[],
  changes: Partial<AssignmentRequest> = {},
): Promise<Assignment> {
  const song = aSong();
  await teacher.put(`/api/songs/${song.id}`, song).expect(201);
  const parts = memberIds.map((memberId) => aPart(memberId));
  const request = { songId: song.id, dueOn: "2026-12-10", note: "Softly.", parts, ...changes };
  const { body } = await teacher.post(`/api/studios/${studioId}/assignments`, request).expect(201);
  return body as Assignment;
}

/** An invitation that waits, without its mail. */
export async function openInvite({ database }: TestServer, studioId: string): Promise<string> {
  const [row] = await database.query(
    `INSERT INTO studio_invites (studio_id, email, role, expires_at)
     VALUES ($1, $2, 'pupil', now() + interval '7 days') RETURNING id`,
    [studioId, `${randomUUID()}@orlow-quay.example`],
  );
  return String(row?.id);
}
