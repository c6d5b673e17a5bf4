import type { DataSource, EntityManager } from "typeorm";
import type { Part, PartChange, PartListing } from "../../../shared/contract/studio/assignment";
import { HttpProblem, notFound } from "../../http/httpProblem";
import { enqueueMail } from "../../mail/mail.service";
import { keptDaysColumn } from "../consent/memberConsent";
import type { CommentsService } from "./comments.service";
import { type PartAccess, type PartAccessService, refuseHidden } from "./partAccess.service";
import { AssignmentPartEntity } from "./assignmentPart.entity";
import type { PupilsCopyService } from "./pupilsCopy.service";

const listed = `p.id, json_build_object('id', s.id, 'name', s.name) AS studio, a.song->>'title' AS title, p.tonic,
  p.song_id AS "songId", p.state, a.due_on::text AS "dueOn", a.created_at AS "assignedAt", b.name AS "assignedBy"`;
const tables = `assignment_parts p JOIN assignments a ON a.id = p.assignment_id JOIN studios s ON s.id = p.studio_id
  JOIN studio_members m ON m.id = p.member_id AND m.left_at IS NULL LEFT JOIN studio_members b ON b.id = a.assigned_by`;

type Listed = Omit<PartListing, "assignedAt"> & { assignedAt: Date };
type Full = Omit<Listed & Part, "assignedAt" | "lastTake" | "side" | "shares" | "mode" | "pupil"> & {
  assignedAt: Date;
  handedInAt: Date | null;
  effort: number | null;
};

/** A pupil's parts, and what teachers do with one. */
export class PartsService {
  constructor(
    private readonly dataSource: DataSource,
    private readonly access: PartAccessService,
    private readonly copies: PupilsCopyService,
    private readonly comments: CommentsService,
  ) {}

  /** All of one's own, of all studios, newest first. */
  async mine(userId: string): Promise<PartListing[]> {
    const rows: Listed[] = await this.dataSource.query(
      `SELECT ${listed} FROM ${tables} WHERE m.user_id = $1 ORDER BY a.created_at DESC, p.id`,
      [userId],
    );
    return rows.map((row) => ({ ...row, assignedAt: row.assignedAt.toISOString() }));
  }

  async get(userId: string, partId: string): Promise<Part> {
    const { side, shares, pupil } = await this.access.reach(userId, partId);
    const rows: Full[] = await this.dataSource.query(
      `SELECT ${listed}, p.assignment_id AS "assignmentId", p.member_id AS "memberId", p.shift, p.instrument, p.way,
              a.song, a.note, p.note AS "partNote", p.handed_in_at AS "handedInAt", p.effort,
              ARRAY(SELECT h.take_id FROM hand_ins h
                    WHERE h.part_id = p.id AND h.author_id = p.member_id AND h.state = 'ready' AND h.take_id IS NOT NULL
                    ORDER BY h.created_at, h.id) AS "takesHandedIn",
              ${keptDaysColumn}
       FROM ${tables} WHERE p.id = $1`,
      [partId],
    );
    const [row] = rows;
    if (!row) throw notFound("part");
    const { handedInAt, effort, assignedAt, ...rest } = row;
    const part: Part = {
      ...rest,
      ...{ pupil: pupil.name, side, shares, assignedAt: assignedAt.toISOString() },
      mode: row.song.writtenKey?.mode ?? "major",
      lastTake: handedInAt && { at: handedInAt.toISOString(), effort },
    };
    if (side === "pupil") return part;
    // The copy stands on the pupil's shelf, the takes on the pupil's device; the teachers have none there.
    const seen = { ...part, songId: null, takesHandedIn: [] };
    return shares ? seen : { ...seen, instrument: null, way: null, state: "assigned", lastTake: null };
  }

  /** Another key or way, which becomes the pupil's decision too; or the answer to what was handed in, once for each take. */
  async change(userId: string, partId: string, wanted: PartChange): Promise<Part> {
    await this.dataSource.transaction(async (manager) => {
      const access = await this.access.reachAsTeacher(userId, partId, manager);
      if (wanted.state !== undefined || wanted.message !== undefined) refuseHidden(access);
      await this.rekey(manager, access, wanted);
      const { state, message, messageId, seenTakeAt } = wanted;
      // The row is locked by now: no take comes in between what is compared here and the answer.
      if (state !== undefined) await refuseUnheard(manager, partId, seenTakeAt ?? null);
      if (message !== undefined)
        await this.comments.write(manager, access, { text: message, ...(messageId ? { id: messageId } : null) });
      if (state !== undefined) await this.answer(manager, access, state, message ?? null);
    });
    return this.get(userId, partId);
  }

  private async rekey(manager: EntityManager, access: PartAccess, wanted: PartChange): Promise<void> {
    const { partId, pupil, me } = access;
    const kept = await manager.findOneOrFail(AssignmentPartEntity, {
      where: { id: partId },
      lock: { mode: "pessimistic_write" },
    });
    const { tonic = kept.tonic, shift = kept.shift, partNote = kept.note } = wanted;
    const instrument = wanted.instrument === undefined ? kept.instrument : wanted.instrument;
    const way = wanted.way === undefined ? kept.way : wanted.way;
    await manager.update(AssignmentPartEntity, { id: partId }, { tonic, shift, instrument, way, note: partNote });
    const moved = ["tonic", "shift", "instrument", "way"].some((name) => Object.hasOwn(wanted, name));
    if (!moved || kept.songId === null) return;
    const reason = `${me.name} chose it for you.`;
    await this.copies.decide(manager, pupil.userId, kept.songId, {
      tonic,
      shift,
      score: null,
      reason,
      instrument,
      way,
    });
  }

  private async answer(
    manager: EntityManager,
    { partId, pupil, me, title }: PartAccess,
    state: "accepted" | "returned",
    note: string | null,
  ): Promise<void> {
    const [rows]: [{ takeAt: Date | null }[], number] = await manager.query(
      `UPDATE assignment_parts SET state = $2, answered_at = clock_timestamp() WHERE id = $1
       RETURNING handed_in_at AS "takeAt"`,
      [partId, state],
    );
    await enqueueMail(manager, {
      event: `answered:${partId}:${rows[0]?.takeAt?.getTime() ?? "none"}:${state}`,
      kind: "answered",
      to: pupil.email,
      userId: pupil.userId,
      data: { teacher: me.name, song: title, accepted: state === "accepted", note },
      path: `/studio/parts/${partId}`,
    });
  }
}

/** Times are told in milliseconds and kept more finely. */
async function refuseUnheard(manager: EntityManager, partId: string, seenTakeAt: string | null): Promise<void> {
  const newer: object[] = await manager.query(
    `SELECT FROM assignment_parts
     WHERE id = $1 AND date_trunc('milliseconds', handed_in_at) > coalesce($2::timestamptz, '-infinity')`,
    [partId, seenTakeAt],
  );
  if (newer.length > 0)
    throw new HttpProblem(409, "newer-take", "A newer take was handed in. Listen to it first, then answer.");
}
