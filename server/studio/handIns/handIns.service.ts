import { randomUUID } from "node:crypto";
import { type DataSource, type EntityManager, Not } from "typeorm";
import type { HandIn, HandInRequest, SoundLink } from "../../../shared/contract/studio/handIn";
import { mostTakeBytes, mostTakeS, tooLong } from "../../../shared/contract/studio/takeLimits";
import { HttpProblem, notFound } from "../../http/httpProblem";
import type { ObjectStore } from "../../storage/objectStore.service";
import { type PartAccess, PartAccessService, refuseHidden, refuseUnshared } from "../assignments/partAccess.service";
import { StudioAccessService } from "../studioAccess.service";
import { HandInEntity } from "./handIn.entity";
import { tellPupil, tellTeachers } from "./handInMails";
import { soundDuration } from "./soundDuration";
import { soundType, tellingBytes } from "./soundType";
import { markDeleted, wakeDeletion } from "./takeDeletion";
import { UploadLocks } from "./uploadLocks";
import { Uploads } from "./uploads";

/** So many recordings one thread holds at a time. */
const mostInThread = 100;
/** So much silence encoders may add to what was recorded. */
const paddedS = 1;
const dayMs = 86_400_000;

type Row = HandInEntity & { authorName: string; authorUserId: string };

/** Recordings in the threads of parts: announced, sent, heard, and deleted again. */
export class HandInsService {
  readonly uploads: Uploads;
  private readonly locks: UploadLocks;
  private readonly parts: PartAccessService;
  private readonly studios: StudioAccessService;

  constructor(
    private readonly dataSource: DataSource,
    private readonly objects: ObjectStore,
  ) {
    this.locks = new UploadLocks(dataSource);
    this.parts = new PartAccessService(dataSource);
    this.studios = new StudioAccessService(dataSource);
    this.uploads = new Uploads({ objects, locks: this.locks, onComplete: (key) => this.finish(key) });
  }

  /**
   * Makes room for a recording. Said again it changes nothing, but ends what an interrupted answer left unfinished. Of a take
   * that was handed in for this part it makes no second one: it tells of the first.
   */
  async announce(userId: string, partId: string, request: HandInRequest): Promise<HandIn> {
    const asked = { ...request, id: request.id.toLowerCase() };
    const { id, storageKey } = await this.dataSource.transaction(async (manager) => {
      await manager.query("SELECT FROM assignment_parts WHERE id = $1 FOR NO KEY UPDATE", [partId]);
      const access = await this.parts.reach(userId, partId, manager);
      refuseUnshared(access);
      if ((request.kind === "teacher-answer") !== (access.side === "teacher"))
        throw new HttpProblem(403, "wrong-side", "Pupils hand in takes, and teachers answer them.");
      const kept = await manager.findOneBy(HandInEntity, { id: asked.id });
      if (kept) refuseOther(kept, access, asked);
      return kept ?? (await ofSameTake(manager, access, asked)) ?? put(manager, access, asked);
    });
    await this.begin(storageKey, request.bytes);
    return this.get(userId, id);
  }

  /** What lies in a thread, oldest first. What is still on its way only its sender sees. */
  async list(userId: string, partId: string): Promise<HandIn[]> {
    const access = await this.parts.reach(userId, partId);
    refuseHidden(access);
    const rows = await this.found("h.part_id = $1 AND (h.state <> 'uploading' OR h.author_id = $2)", [
      partId,
      access.me.memberId,
    ]);
    return rows.map((row) => toHandIn(row, access));
  }

  async get(userId: string, id: string): Promise<HandIn> {
    const { row, access } = await this.reach(userId, id);
    return toHandIn(row, access);
  }

  /** A link by which the asker may play it for a few minutes. */
  async sound(userId: string, id: string): Promise<SoundLink> {
    const { row } = await this.reach(userId, id);
    if (row.state === "deleted" || row.expiresAt.getTime() <= Date.now())
      throw new HttpProblem(410, "recording-deleted", "This recording was deleted.");
    if (row.state !== "ready" || row.mediaType === null)
      throw new HttpProblem(409, "still-uploading", "This recording is still on its way.");
    return this.objects.signedLink(row.storageKey, row.mediaType);
  }

  /** Its author takes it back: out of the thread at once, out of the storage in a moment. */
  async remove(userId: string, id: string): Promise<void> {
    const { row, access } = await this.reach(userId, id);
    refuseOthers(row, access);
    await this.dataSource.transaction(async (manager) => {
      await markDeleted(manager, "taken back", "h.id = $1", [id]);
      await wakeDeletion(manager);
    });
  }

  /** Lets only its author send an announced recording, and only while the pupil agrees; tells where it lies. */
  async uploadKey(userId: string, id: string): Promise<string> {
    const { row, access } = await this.reach(userId, id);
    refuseOthers(row, access);
    refuseUnshared(access);
    if (row.state === "deleted") throw new HttpProblem(410, "recording-deleted", "This recording was deleted.");
    return row.storageKey;
  }

  /** Begins the upload, or ends one whose last answer was lost. */
  private async begin(key: string, bytes: number): Promise<void> {
    const complete = await this.locks.while(key, async () => {
      const awaited = await this.dataSource.manager.existsBy(HandInEntity, { storageKey: key, state: "uploading" });
      return awaited && this.uploads.begin(key, bytes);
    });
    if (complete) await this.finish(key);
  }

  /** All bytes are there: looks at them, puts the recording into the thread and tells the other side. */
  private async finish(key: string): Promise<void> {
    const size = await this.objects.size(key);
    const sound = size === null || size > mostTakeBytes ? null : await this.objects.read(key);
    const mediaType = sound && (await soundType(sound.subarray(0, tellingBytes)));
    const durationS = sound && mediaType && (await soundDuration(sound));
    if (!durationS) throw await this.refused(key, notSound());
    if (durationS > mostTakeS + paddedS) throw await this.refused(key, lastsTooLong());
    await this.dataSource.transaction(async (manager) => {
      const [rows]: [{ id: string; partId: string; kind: string; userId: string }[], number] = await manager.query(
        `UPDATE hand_ins h SET state = 'ready', ready_at = now(), media_type = $2, bytes = $3 FROM studio_members m
         WHERE h.storage_key = $1 AND h.state = 'uploading' AND m.id = h.author_id
         RETURNING h.id, h.part_id AS "partId", h.kind, m.user_id AS "userId"`,
        [key, mediaType, sound.length],
      );
      const [row] = rows;
      if (!row) return;
      const access = await this.parts.reach(row.userId, row.partId, manager);
      // Consent may have gone while the sound was on its way: then it does not arrive.
      refuseUnshared(access);
      if (row.kind === "teacher-answer") return tellPupil(manager, access, row.id);
      await manager.query(
        `UPDATE assignment_parts p SET state = 'handed-in', handed_in_at = now(), effort = h.effort
         FROM hand_ins h WHERE h.id = $1 AND p.id = h.part_id`,
        [row.id],
      );
      await tellTeachers(manager, this.studios, access, row.id);
    });
  }

  /** Has it deleted, and gives back what is to be said. */
  private async refused(key: string, problem: HttpProblem): Promise<HttpProblem> {
    await markDeleted(this.dataSource, "refused", "h.storage_key = $1", [key]);
    await wakeDeletion(this.dataSource);
    return problem;
  }

  /** A recording and how the asker stands to its part; for whoever has nothing to do with it there is none. */
  private async reach(userId: string, id: string): Promise<{ row: Row; access: PartAccess }> {
    const [row] = await this.found("h.id = $1", [id]);
    if (!row || (row.state === "uploading" && row.authorUserId !== userId)) throw notFound("recording");
    const access = await this.parts.reach(userId, row.partId).catch((error: unknown) => {
      throw error instanceof HttpProblem && error.status === 404 ? notFound("recording") : error;
    });
    refuseHidden(access);
    return { row, access };
  }

  private found(condition: string, values: unknown[]): Promise<Row[]> {
    return this.dataSource.query(
      `SELECT h.id, h.part_id AS "partId", h.author_id AS "authorId", h.kind, h.storage_key AS "storageKey",
              h.media_type AS "mediaType", h.bytes, h.duration_s AS "durationS", h.effort, h.measures, h.picture,
              h.state, h.created_at AS "createdAt", h.expires_at AS "expiresAt",
              m.name AS "authorName", m.user_id AS "authorUserId"
       FROM hand_ins h JOIN studio_members m ON m.id = h.author_id
       WHERE ${condition} ORDER BY h.created_at, h.id`,
      values,
    );
  }
}

type Begun = Pick<HandInEntity, "id" | "storageKey">;

/**
 * What was made from the same take before, under another id; null for an answer and for a new take. One that was given up
 * on its way goes on, and tells how the take felt as it is said now.
 */
async function ofSameTake(
  manager: EntityManager,
  access: PartAccess,
  { takeId, bytes, effort, measures, picture }: HandInRequest,
): Promise<Begun | null> {
  if (takeId === null) return null;
  const kept = await manager.findOneBy(HandInEntity, { partId: access.partId, authorId: access.me.memberId, takeId });
  if (kept?.state !== "uploading") return kept;
  refuseOther(kept, access, { bytes });
  await manager.update(HandInEntity, { id: kept.id, state: "uploading" }, { effort, measures, picture });
  return kept;
}

/** Makes its row. */
async function put(manager: EntityManager, access: PartAccess, request: HandInRequest): Promise<Begun> {
  const { partId, me, recordingsKeptDays } = access;
  if ((await manager.countBy(HandInEntity, { partId, state: Not("deleted") })) >= mostInThread)
    throw new HttpProblem(409, "collection-full", `A thread holds at most ${mostInThread} recordings at a time.`);
  const storageKey = randomUUID();
  const expiresAt = new Date(Date.now() + recordingsKeptDays * dayMs);
  const row = { ...request, partId, authorId: me.memberId, storageKey, state: "uploading" as const, expiresAt };
  await manager.insert(HandInEntity, row);
  return row;
}

const notSound = () =>
  new HttpProblem(
    422,
    "not-a-recording",
    "This is not sound that can be played here: wav, mp3, m4a, ogg, webm or flac. It was deleted.",
  );

/** As an announcement is refused that says so itself. */
const lastsTooLong = () =>
  new HttpProblem(422, "invalid", `${tooLong} It was deleted.`, [{ path: "durationS", message: tooLong }]);

function refuseOthers(row: HandInEntity, { me }: PartAccess): void {
  if (row.authorId !== me.memberId) throw new HttpProblem(403, "not-yours", "Only whoever recorded this may do that.");
}

/** The id is taken; that is well if it is by this very recording. */
function refuseOther(kept: HandInEntity, { partId, me }: PartAccess, { bytes }: Pick<HandInRequest, "bytes">): void {
  if (kept.state === "deleted" && kept.authorId === me.memberId)
    throw new HttpProblem(410, "recording-deleted", "This recording was deleted.");
  if (kept.partId !== partId || kept.authorId !== me.memberId || kept.bytes !== bytes)
    throw new HttpProblem(409, "conflict", "There is another recording by this id.");
}

function toHandIn(row: Row, { me }: PartAccess): HandIn {
  const { id, partId, kind, bytes, durationS, effort, measures, picture, state } = row;
  return {
    ...{ id, partId, kind, bytes, durationS, effort, measures, picture, state },
    mine: row.authorId === me.memberId,
    author: { memberId: row.authorId, name: row.authorName },
    createdAt: row.createdAt.toISOString(),
    expiresAt: row.expiresAt.toISOString(),
  };
}
