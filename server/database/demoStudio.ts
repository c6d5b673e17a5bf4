import { randomUUID } from "node:crypto";
import type { EntityManager } from "typeorm";
import type { Decision } from "../../shared/contract/decision";
import type { OwnInstrument } from "../../shared/contract/instrument";
import type { Song } from "../../shared/contract/song";
import type { GivenSong } from "../../shared/contract/studio/assignment";
import { scoreSharedKeys } from "../../shared/keys/sharedKey";
import type { SingingVoice } from "../../shared/keys/keyScore";
import { AssignmentEntity } from "../studio/assignments/assignment.entity";
import { AssignmentPartEntity } from "../studio/assignments/assignmentPart.entity";
import { CommentEntity } from "../studio/assignments/comment.entity";
import { StudioGroupEntity } from "../studio/groups/studioGroup.entity";
import { StudioGroupMemberEntity } from "../studio/groups/studioGroupMember.entity";
import { HandInEntity } from "../studio/handIns/handIn.entity";
import { StudioEntity } from "../studio/studio.entity";
import { StudioMemberEntity } from "../studio/studioMember.entity";
import type { DemoPupil } from "./demoPupils";

/** Somebody of the class, with what they brought. */
export interface InClass {
  userId: string;
  name: string;
  voice: SingingVoice;
  instrument: OwnInstrument;
  songs: Song[];
  decisions: Decision[];
  pupil: Pick<DemoPupil, "agrees" | "lastTake">;
}

const begun = new Date("2026-09-15T18:00:00.000Z");
const given = new Date("2026-11-17T20:15:00.000Z");

/** The studio of the evening class at Orlow Quay, which works towards its concert. */
export async function openDemoStudio(
  manager: EntityManager,
  teacher: InClass,
  pupils: readonly InClass[],
): Promise<void> {
  const studioId = randomUUID();
  await manager.insert(StudioEntity, {
    ...{ id: studioId, ownerId: teacher.userId, name: "Tuesday evening class, Orlow Quay", recordingsKeptDays: 90 },
    ...{ event: { name: "End-of-term concert", date: "2026-12-10" }, createdAt: begun },
  });
  const place = { studioId, joinedAt: begun };
  const teacherId = randomUUID();
  const owner = { id: teacherId, userId: teacher.userId, role: "owner", name: teacher.name } as const;
  await manager.insert(StudioMemberEntity, { ...place, ...owner });
  const members = pupils.map((each) => ({ ...each, memberId: randomUUID() }));
  await manager.insert(
    StudioMemberEntity,
    members.map(({ memberId, userId, name, pupil }) => ({
      ...{ ...place, id: memberId, userId, name, role: "pupil" as const },
      consentGivenAt: pupil.agrees ? begun : null,
    })),
  );
  await groupUp(manager, studioId, members);
  // The two songs that the class has decided keys for.
  for (const [k, dueOn] of ["2026-12-03", "2026-12-10"].entries())
    await give(manager, { studioId, teacherId, dueOn, song: teacher.songs[k]!, members });
}

type Member = InClass & { memberId: string };

/** High and low voices apart, and one key for all who agreed in the song that they end the concert with. */
async function groupUp(manager: EntityManager, studioId: string, members: readonly Member[]): Promise<void> {
  const agreed = members.filter(({ pupil }) => pupil.agrees);
  const low = agreed.filter(({ voice }) => voice.comfort.lowMidi < 52);
  const high = agreed.filter((each) => !low.includes(each));
  const groups = [
    ["High voices", high],
    ["Low voices", low],
    ["Finale", agreed],
  ] as const;
  for (const [k, [name, people]] of groups.entries()) {
    const id = randomUUID();
    const createdAt = new Date(begun.getTime() + k);
    const keys = name === "Finale" ? [sharedKey(people)].flatMap((key) => key ?? []) : [];
    await manager.insert(StudioGroupEntity, { id, studioId, name, keys, createdAt });
    await manager.insert(
      StudioGroupMemberEntity,
      people.map(({ memberId }) => ({ groupId: id, memberId, studioId })),
    );
  }
}

function sharedKey(people: readonly Member[]) {
  const [song] = people[0]?.songs ?? [];
  if (!song?.tune || !song.writtenKey) return null;
  const { mode, tonic: presentKey } = song.writtenKey;
  const [best] = scoreSharedKeys(song.tune, people, { mode, presentKey });
  if (!best) return null;
  const pupils = people.map(({ memberId, instrument: { id, name } }, k) => {
    const { shift = 0, score = 0 } = best.singers[k] ?? {};
    return { memberId, shift, score, instrument: { id, name }, way: null };
  });
  const { id: songId, title } = song;
  return { songId, title, tonic: best.tonic, reason: best.reason, pupils, decidedAt: given.toISOString() };
}

interface Giving {
  studioId: string;
  teacherId: string;
  dueOn: string;
  song: Song;
  members: readonly Member[];
}

/** To everybody who has the song on the shelf and a key decided for it. */
async function give(manager: EntityManager, { studioId, teacherId, dueOn, song, members }: Giving): Promise<void> {
  const { title, chart, writtenKey, tune, beatsPerBar, tempo } = song;
  const assignmentId = randomUUID();
  const kept: GivenSong = { title, chart, writtenKey, tune, beatsPerBar, tempo };
  const note = "For the concert. Sing it through once a day, softly.";
  await manager.insert(AssignmentEntity, {
    ...{ id: assignmentId, studioId, assignedBy: teacherId, song: kept, dueOn, note, createdAt: given },
  });
  for (const { memberId, songs, decisions, instrument, pupil } of members) {
    const own = songs.find(({ demo }) => demo === song.demo);
    const decided = decisions.find(({ songId }) => songId === own?.id);
    if (!own || !decided) continue;
    const { tonic, shift, way } = decided;
    const { lastTake } = pupil;
    const partId = randomUUID();
    await manager.insert(AssignmentPartEntity, {
      ...{ id: partId, studioId, assignmentId, memberId, songId: own.id, tonic, shift, way, note: "" },
      ...{ instrument: { id: instrument.id, name: instrument.name }, state: lastTake?.state ?? "assigned" },
      ...{ handedInAt: lastTake && new Date(lastTake.at), effort: lastTake?.effort ?? null },
    });
    if (!lastTake) continue;
    const sungAt = new Date(lastTake.at);
    await manager.insert(HandInEntity, {
      ...{ id: randomUUID(), partId, authorId: memberId, kind: "pupil-take", storageKey: `demo/${partId}`, bytes: 1 },
      ...{ durationS: 74, effort: lastTake.effort, state: "deleted", createdAt: sungAt, expiresAt: sungAt },
    });
    if (lastTake.state !== "returned") continue;
    const text = "The high notes at the end pull. Breathe before the last line, and let them be light.";
    const createdAt = new Date(sungAt.getTime() + 86_400_000);
    await manager.insert(CommentEntity, { id: randomUUID(), partId, authorId: teacherId, text, createdAt });
  }
}
