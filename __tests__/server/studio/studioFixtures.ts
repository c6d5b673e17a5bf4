import { randomUUID } from "node:crypto";
import type { Comment } from "../../../shared/contract/studio/assignment";
import type { StudioGroup } from "../../../shared/contract/studio/group";
import { aSong } from "../belongings";
import type { FixtureMaker } from "../permissionFixtures";
import type { Person, TestServer } from "../testServer";
import { aPart, give, openInvite, pupilIn, studioOf } from "./studioPeople";

type Make = (person: Person, server: TestServer) => Promise<{ ids: Record<string, string>; body?: object }>;

const noBody = () => undefined;
/** A fixture, and for what is absent the same body with ids that nobody has. */
const maker = (make: Make, absentBody: () => object | undefined = noBody): FixtureMaker => ({
  make,
  async absent() {
    const names = ["id", "memberId", "groupId", "inviteId", "assignmentId", "commentId", "handInId"];
    const body = absentBody();
    return { ids: Object.fromEntries(names.map((name) => [name, randomUUID()])), ...(body ? { body } : {}) };
  },
});

const change = () => ({ name: "Wednesday class", event: null, recordingsKeptDays: 30 });
const groupBody = () => ({ name: "Altos", memberIds: [] });
const keyBody = () => ({
  ...{ songId: randomUUID(), title: "Slack Water", tonic: "E", reason: "Fairest.", pupils: [] },
  decidedAt: "2026-11-24T19:20:00.000Z",
});
const inviteBody = () => ({ emails: [`${randomUUID()}@orlow-quay.example`] });
const dueBody = () => ({ dueOn: null, note: "By heart." });
const wordsBody = () => ({ text: "Breathe before the bridge." });

const groupOf = async (person: Person, studioId: string) =>
  (await person.post(`/api/studios/${studioId}/groups`, groupBody()).expect(201)).body as StudioGroup;

/** A part of the person's own, in their own studio, agreed to. */
async function partOf(person: Person, server: TestServer): Promise<string> {
  const studio = await studioOf(person);
  await server.database.query("UPDATE users SET birth_year = 1980 WHERE id = $1", [person.id]);
  await server.database.query("UPDATE studio_members SET consent_given_at = now() WHERE studio_id = $1", [studio.id]);
  return (await give(person, studio.id, [studio.me.memberId])).parts[0]?.id ?? "";
}

/** What the ids in the paths of studios can name. */
export const studioFixtures: Record<string, FixtureMaker> = {
  "/studios/{id}": maker(async (person) => ({ ids: { id: (await studioOf(person)).id }, body: change() }), change),
  "/studios/{id}/consent": maker(
    async (person) => ({ ids: { id: (await studioOf(person)).id }, body: { agree: false } }),
    () => ({ agree: false }),
  ),
  "/studios/{id}/members/{memberId}": maker(
    async (person, server) => {
      const { id } = await studioOf(person);
      return { ids: { id, memberId: (await pupilIn(server, id)).memberId }, body: {} };
    },
    () => ({}),
  ),
  "/studios/{id}/groups": maker(
    async (person) => ({ ids: { id: (await studioOf(person)).id }, body: groupBody() }),
    groupBody,
  ),
  "/studios/{id}/groups/{groupId}": maker(async (person) => {
    const { id } = await studioOf(person);
    return { ids: { id, groupId: (await groupOf(person, id)).id }, body: groupBody() };
  }, groupBody),
  "/studios/{id}/groups/{groupId}/key": maker(async (person) => {
    const { id } = await studioOf(person);
    return { ids: { id, groupId: (await groupOf(person, id)).id }, body: keyBody() };
  }, keyBody),
  "/studios/{id}/invites": maker(
    async (person) => ({ ids: { id: (await studioOf(person)).id }, body: inviteBody() }),
    inviteBody,
  ),
  "/studios/{id}/invites/{inviteId}": maker(async (person, server) => {
    const { id } = await studioOf(person);
    return { ids: { id, inviteId: await openInvite(server, id) } };
  }),
  "/studios/{id}/assignments": maker(
    async (person) => {
      const { id, me } = await studioOf(person);
      const song = aSong();
      await person.put(`/api/songs/${song.id}`, song).expect(201);
      return { ids: { id }, body: { songId: song.id, dueOn: null, note: "", parts: [aPart(me.memberId)] } };
    },
    () => ({ songId: randomUUID(), dueOn: null, note: "", parts: [aPart(randomUUID())] }),
  ),
  "/studios/{id}/assignments/{assignmentId}": maker(async (person) => {
    const { id, me } = await studioOf(person);
    return { ids: { id, assignmentId: (await give(person, id, [me.memberId])).id }, body: dueBody() };
  }, dueBody),
  "/parts/{id}": maker(
    async (person, server) => ({ ids: { id: await partOf(person, server) }, body: {} }),
    () => ({}),
  ),
  "/parts/{id}/comments": maker(
    async (person, server) => ({ ids: { id: await partOf(person, server) }, body: wordsBody() }),
    wordsBody,
  ),
  "/parts/{id}/comments/{commentId}": maker(async (person, server) => {
    const id = await partOf(person, server);
    const { body } = await person.post(`/api/parts/${id}/comments`, wordsBody()).expect(201);
    return { ids: { id, commentId: (body as Comment).id } };
  }),
};
