import { randomUUID } from "node:crypto";
import type { DataSource, EntityManager } from "typeorm";
import type {
  Assignment,
  AssignmentChange,
  AssignmentListing,
  AssignmentRequest,
  GivenSong,
  PartRow,
} from "../../../shared/contract/studio/assignment";
import { glyphs } from "../../../shared/music/pitch";
import { HttpProblem, notFound } from "../../http/httpProblem";
import { enqueueMail } from "../../mail/mail.service";
import { songsOf } from "../../songs/songs.service";
import { memberShares } from "../consent/digitalConsent";
import { wakeDeletion } from "../handIns/takeDeletion";
import { idTaken } from "../studioAnswers";
import type { StudioAccessService } from "../studioAccess.service";
import { AssignmentEntity } from "./assignment.entity";
import { AssignmentPartEntity } from "./assignmentPart.entity";
import { dayWords } from "./dayWords";
import type { PupilsCopyService } from "./pupilsCopy.service";

const mostAssignments = 1000;

const columns = `a.id, a.studio_id AS "studioId", a.song->>'title' AS title, a.due_on::text AS "dueOn", a.note,
  a.created_at AS "assignedAt", b.name AS "assignedBy"`;
const tables = `assignments a LEFT JOIN studio_members b ON b.id = a.assigned_by`;

type Dated<Item extends { assignedAt: string }> = Omit<Item, "assignedAt"> & { assignedAt: Date };
type PartColumns = Omit<PartRow, "lastTake"> & { handedInAt: Date | null; effort: number | null };

interface Pupil {
  memberId: string;
  userId: string;
  email: string;
}

/** Songs given to many at once, to each in their own key. */
export class AssignmentsService {
  private readonly songs;

  constructor(
    private readonly dataSource: DataSource,
    private readonly access: StudioAccessService,
    private readonly copies: PupilsCopyService,
  ) {
    this.songs = songsOf(dataSource);
  }

  /** Newest first. */
  async list(userId: string, studioId: string): Promise<AssignmentListing[]> {
    await this.access.teacher(userId, studioId);
    const rows: (Omit<Dated<AssignmentListing>, "counts"> & AssignmentListing["counts"])[] =
      await this.dataSource.query(
        `SELECT ${columns}, count(p.id)::int AS parts,
                count(p.id) FILTER (WHERE p.state = 'handed-in' AND ${memberShares})::int AS waiting,
                count(p.id) FILTER (WHERE p.state = 'accepted' AND ${memberShares})::int AS accepted
         FROM ${tables}
         LEFT JOIN (assignment_parts p JOIN studio_members m ON m.id = p.member_id AND m.left_at IS NULL
                    JOIN users u ON u.id = m.user_id) ON p.assignment_id = a.id
         WHERE a.studio_id = $1 GROUP BY a.id, b.name ORDER BY a.created_at DESC, a.id`,
        [studioId],
      );
    return rows.map(({ parts, waiting, accepted, assignedAt, ...row }) => ({
      ...row,
      assignedAt: assignedAt.toISOString(),
      counts: { parts, waiting, accepted },
    }));
  }

  async get(userId: string, studioId: string, id: string): Promise<Assignment> {
    await this.access.teacher(userId, studioId);
    const rows: Omit<Dated<Assignment>, "parts">[] = await this.dataSource.query(
      `SELECT ${columns}, a.song FROM ${tables} WHERE a.studio_id = $1 AND a.id = $2`,
      [studioId, id],
    );
    const [row] = rows;
    if (!row) throw notFound("assignment");
    const parts: PartColumns[] = await this.dataSource.query(
      `SELECT p.id, m.id AS "memberId", m.name AS pupil, ${memberShares} AS shares, p.tonic, p.shift, p.instrument, p.way,
              p.state, p.handed_in_at AS "handedInAt", p.effort
       FROM assignment_parts p JOIN studio_members m ON m.id = p.member_id AND m.left_at IS NULL
       JOIN users u ON u.id = m.user_id
       WHERE p.assignment_id = $1 ORDER BY lower(m.name), m.id`,
      [id],
    );
    return { ...row, assignedAt: row.assignedAt.toISOString(), parts: parts.map(shownPart) };
  }

  /** Each gets a copy, a decided key and a mail, all of them or nobody; once, however often it is sent by the same id. */
  async give(userId: string, studioId: string, request: AssignmentRequest): Promise<Assignment> {
    const { memberId: assignedBy, name: teacher } = await this.access.teacher(userId, studioId);
    const id = request.id ?? randomUUID();
    const given = { id, studioId, assignedBy };
    if (await isGiven(this.dataSource.manager, given)) return this.get(userId, studioId, id);
    const { title, chart, writtenKey, tune, beatsPerBar, tempo } = await this.songs.get(userId, request.songId);
    const song: GivenSong = { title, chart, writtenKey, tune, beatsPerBar, tempo };
    await this.dataSource.transaction(async (manager) => {
      const [studio]: { name: string }[] = await manager.query(
        "SELECT name FROM studios WHERE id = $1 FOR NO KEY UPDATE",
        [studioId],
      );
      if (await isGiven(manager, given)) return;
      if ((await manager.countBy(AssignmentEntity, { studioId })) >= mostAssignments)
        throw new HttpProblem(409, "collection-full", `A studio keeps at most ${mostAssignments} assignments.`);
      const { dueOn, note } = request;
      await manager.insert(AssignmentEntity, { ...given, song, dueOn, note });
      const studioName = studio?.name ?? "";
      const pupils = await pupilsOf(manager, studioId, request);
      const keys = pupils.map(({ userId: person, part }) => {
        const reason = `${teacher} chose it for you. ${part.reason}`.trim();
        return { userId: person, key: { ...part, reason } };
      });
      const copies = await this.copies.give(manager, song, studioName, keys);
      const parts = pupils.map((pupil) => ({ ...pupil, id: randomUUID() }));
      await manager.insert(
        AssignmentPartEntity,
        parts.map(({ id: partId, memberId, userId: person, part }) => ({
          ...{ id: partId, studioId, assignmentId: id, memberId, songId: copies.get(person) ?? null },
          ...{
            tonic: part.tonic,
            shift: part.shift,
            instrument: part.instrument,
            way: part.way,
            note: part.note,
            state: "assigned" as const,
          },
        })),
      );
      for (const { id: partId, userId: person, email, part } of parts)
        await enqueueMail(manager, {
          event: `assigned:${partId}`,
          kind: "assigned",
          to: email,
          userId: person,
          data: {
            studio: studioName,
            song: title,
            key: `${glyphs(part.tonic)} ${writtenKey?.mode ?? "major"}`,
            due: dueOn && dayWords(dueOn),
            note: [note, part.note].filter(Boolean).join("\n\n") || null,
          },
          path: `/studio/parts/${partId}`,
        });
    });
    return this.get(userId, studioId, id);
  }

  async change(userId: string, studioId: string, id: string, { dueOn, note }: AssignmentChange): Promise<Assignment> {
    await this.access.teacher(userId, studioId);
    const { affected } = await this.dataSource.manager.update(AssignmentEntity, { id, studioId }, { dueOn, note });
    if (!affected) throw notFound("assignment");
    return this.get(userId, studioId, id);
  }

  /** With its parts, threads and takes; the pupils keep their copies. */
  async remove(userId: string, studioId: string, id: string): Promise<void> {
    await this.access.teacher(userId, studioId);
    await this.dataSource.transaction(async (manager) => {
      const { affected } = await manager.delete(AssignmentEntity, { id, studioId });
      if (!affected) throw notFound("assignment");
      await wakeDeletion(manager);
    });
  }
}

/** The same was given before; of somebody else's the id is taken. */
async function isGiven(
  manager: EntityManager,
  { id, ...given }: Pick<AssignmentEntity, "id" | "studioId" | "assignedBy">,
): Promise<boolean> {
  const kept = await manager.findOneBy(AssignmentEntity, { id });
  if (kept && (kept.studioId !== given.studioId || kept.assignedBy !== given.assignedBy)) throw idTaken();
  return kept !== null;
}

/** Those who are to get it, ordered by account: two assignments at once lock people in the same order. */
async function pupilsOf(manager: EntityManager, studioId: string, { parts }: AssignmentRequest) {
  const wanted = new Map(parts.map((part) => [part.memberId.toLowerCase(), part]));
  const rows: Pupil[] = await manager.query(
    `SELECT m.id AS "memberId", m.user_id AS "userId", u.email
     FROM studio_members m JOIN users u ON u.id = m.user_id
     WHERE m.studio_id = $1 AND m.left_at IS NULL AND m.id = ANY($2) ORDER BY m.user_id`,
    [studioId, [...wanted.keys()]],
  );
  const found = rows.flatMap((row) => {
    const part = wanted.get(row.memberId);
    return part ? [{ ...row, part }] : [];
  });
  if (found.length < parts.length)
    throw new HttpProblem(
      422,
      "unknown-reference",
      "Somebody of these is not in this studio any more, or stands here twice.",
      [{ path: "parts", message: "Choose only people who are in this studio, each once." }],
    );
  return found;
}

/** Of a pupil who does not agree at present, the row tells that there is a part, and nothing else. */
function shownPart({ handedInAt, effort, ...part }: PartColumns): PartRow {
  if (!part.shares) return { ...part, instrument: null, way: null, state: "assigned", lastTake: null };
  return { ...part, lastTake: handedInAt && { at: handedInAt.toISOString(), effort } };
}
