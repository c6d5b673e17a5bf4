import { randomUUID } from "node:crypto";
import type { DataSource, EntityManager } from "typeorm";
import type { NewStudio, Studio, StudioChange, StudioRole } from "../../shared/contract/studio/studio";
import { HttpProblem, notFound } from "../http/httpProblem";
import { lockAccounts } from "../http/ownedCollection.service";
import { memberShares } from "./consent/digitalConsent";
import { consentColumns, type ConsentRow, consentOf } from "./consent/memberConsent";
import { StudioEntity } from "./studio.entity";
import { wakeDeletion } from "./handIns/takeDeletion";
import type { StudioAccessService } from "./studioAccess.service";
import { StudioMemberEntity } from "./studioMember.entity";

const mostStudios = 50;

interface Row extends ConsentRow {
  id: string;
  name: string;
  event: Studio["event"];
  recordingsKeptDays: number;
  agreedDays: number | null;
  createdAt: Date;
  memberId: string;
  memberName: string;
  role: StudioRole;
  teachers: Studio["teachers"];
  pupils: number;
  waiting: number;
}

/** Studios, and what their members see of them. */
export class StudiosService {
  constructor(
    private readonly dataSource: DataSource,
    private readonly access: StudioAccessService,
  ) {}

  /** Those that a person is in, newest first. */
  async list(userId: string, studioId: string | null = null): Promise<Studio[]> {
    const rows: Row[] = await this.dataSource.query(
      `SELECT s.id, s.name, s.event, s.recordings_kept_days AS "recordingsKeptDays", s.created_at AS "createdAt",
              m.id AS "memberId", m.name AS "memberName", m.role, ${consentColumns},
              m.recordings_kept_days AS "agreedDays",
              (SELECT json_agg(json_build_object('memberId', t.id, 'name', t.name, 'role', t.role)
                               ORDER BY t.role DESC, t.joined_at, t.id)
               FROM studio_members t WHERE t.studio_id = s.id AND t.left_at IS NULL AND t.role <> 'pupil') AS teachers,
              (SELECT count(*)::int FROM studio_members t
               WHERE t.studio_id = s.id AND t.left_at IS NULL AND t.role = 'pupil') AS pupils,
              (SELECT count(*)::int FROM assignment_parts p
               JOIN studio_members m ON m.id = p.member_id JOIN users u ON u.id = m.user_id
               WHERE p.studio_id = s.id AND p.state = 'handed-in' AND ${memberShares}) AS waiting
       FROM studio_members m JOIN studios s ON s.id = m.studio_id JOIN users u ON u.id = m.user_id
       WHERE m.user_id = $1 AND m.left_at IS NULL AND ($2::uuid IS NULL OR s.id = $2)
       ORDER BY s.created_at DESC, s.id`,
      [userId, studioId],
    );
    return rows.map(toStudio);
  }

  async get(userId: string, studioId: string): Promise<Studio> {
    const [found] = await this.list(userId, studioId);
    if (!found) throw notFound("studio");
    return found;
  }

  async make(userId: string, { name, teacherName, event, recordingsKeptDays }: NewStudio): Promise<Studio> {
    const id = randomUUID();
    await this.dataSource.transaction(async (manager) => {
      await lockAccounts(manager, [userId]);
      const owned = await manager.countBy(StudioEntity, { ownerId: userId });
      if (owned >= mostStudios)
        throw new HttpProblem(409, "collection-full", `An account keeps at most ${mostStudios} studios.`);
      await manager.insert(StudioEntity, { id, ownerId: userId, name, event, recordingsKeptDays });
      const member = { id: randomUUID(), studioId: id, userId, role: "owner", name: teacherName } as const;
      await manager.insert(StudioMemberEntity, member);
      await becomeTeacher(manager, userId);
    });
    return this.get(userId, id);
  }

  /** How long recordings are kept is the owner's to say; for those who agreed before, more days change nothing. */
  async change(userId: string, studioId: string, wanted: StudioChange): Promise<Studio> {
    const { role } = await this.access.teacher(userId, studioId);
    const { name, event, recordingsKeptDays } = wanted;
    const [, changed]: [unknown, number] = await this.dataSource.query(
      `UPDATE studios SET name = $2, event = $3::jsonb, recordings_kept_days = $4
       WHERE id = $1 AND ($5 OR recordings_kept_days = $4)`,
      [studioId, name, event && JSON.stringify(event), recordingsKeptDays, role === "owner"],
    );
    if (changed === 0)
      throw new HttpProblem(403, "owner-only", "Only the owner of this studio says how long recordings are kept.", [
        { path: "recordingsKeptDays", message: "Only the owner changes this." },
      ]);
    return this.get(userId, studioId);
  }

  /** With all that was said and handed in there; songs and keys that pupils got stay theirs. */
  async remove(userId: string, studioId: string): Promise<void> {
    await this.access.owner(userId, studioId);
    await this.dataSource.transaction(async (manager) => {
      await manager.query("DELETE FROM studios WHERE id = $1", [studioId]);
      await wakeDeletion(manager);
    });
  }

  /** Before an account goes: its studios pass to the co-teacher who is there longest; the others go with it. */
  async passOn(userId: string): Promise<void> {
    const rows: { studioId: string; memberId: string }[] = await this.dataSource.query(
      `SELECT DISTINCT ON (s.id) s.id AS "studioId", m.id AS "memberId"
       FROM studios s JOIN studio_members m ON m.studio_id = s.id AND m.left_at IS NULL AND m.role = 'co-teacher'
       WHERE s.owner_id = $1 ORDER BY s.id, m.joined_at, m.id`,
      [userId],
    );
    for (const { studioId, memberId } of rows)
      await this.dataSource.transaction((manager) => makeOwner(manager, studioId, memberId));
  }
}

/** Whoever teaches in a studio has a teacher's account. */
export async function becomeTeacher(manager: EntityManager, userId: string): Promise<void> {
  await manager.query("UPDATE users SET role = 'teacher' WHERE id = $1 AND role = 'singer'", [userId]);
}

/** Passes a studio on to one of its teachers; who had it stays as a co-teacher. */
export async function makeOwner(manager: EntityManager, studioId: string, memberId: string): Promise<void> {
  await manager.query(
    "UPDATE studio_members SET role = 'co-teacher' WHERE studio_id = $1 AND role = 'owner' AND left_at IS NULL",
    [studioId],
  );
  await manager.query("UPDATE studio_members SET role = 'owner' WHERE studio_id = $1 AND id = $2", [
    studioId,
    memberId,
  ]);
  await manager.query(
    "UPDATE studios SET owner_id = (SELECT user_id FROM studio_members WHERE id = $2) WHERE id = $1",
    [studioId, memberId],
  );
}

function toStudio(row: Row): Studio {
  const { id, name, event, recordingsKeptDays, agreedDays, createdAt, teachers, memberId, memberName, role } = row;
  return {
    id,
    name,
    me: { memberId, name: memberName, role, consent: consentOf(row) },
    teachers,
    event,
    recordingsKeptDays:
      role === "pupil" ? Math.min(recordingsKeptDays, agreedDays ?? recordingsKeptDays) : recordingsKeptDays,
    counts: role === "pupil" ? null : { pupils: row.pupils, waiting: row.waiting },
    createdAt: createdAt.toISOString(),
  };
}
