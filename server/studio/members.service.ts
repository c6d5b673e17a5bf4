import type { DataSource, EntityManager } from "typeorm";
import type { MemberChange, StudioRole } from "../../shared/contract/studio/studio";
import { HttpProblem, notFound } from "../http/httpProblem";
import { wakeDeletion } from "./handIns/takeDeletion";
import { type StudioAccessService, teaches } from "./studioAccess.service";
import { becomeTeacher, makeOwner } from "./studios.service";

interface Target {
  memberId: string;
  userId: string;
  role: StudioRole;
}

/** People of a studio: names, roles, leaving. */
export class MembersService {
  constructor(
    private readonly dataSource: DataSource,
    private readonly access: StudioAccessService,
  ) {}

  /** One's own name, and as the owner the role of others. */
  async change(userId: string, studioId: string, memberId: string, { name, role }: MemberChange): Promise<void> {
    await this.dataSource.transaction(async (manager) => {
      const me = await this.access.member(userId, studioId, manager);
      const target = await this.target(manager, me, studioId, memberId);
      const isMe = memberId === me.memberId;
      if (name !== undefined) {
        if (!isMe) throw new HttpProblem(403, "own-name-only", "Everybody chooses their own name.");
        await manager.query("UPDATE studio_members SET name = $2 WHERE id = $1", [memberId, name]);
      }
      if (role === undefined || role === target.role) return;
      await this.access.owner(userId, studioId, manager);
      if (isMe) throw ownerStays();
      if (role === "owner") {
        if (target.role !== "co-teacher")
          throw new HttpProblem(409, "not-a-teacher", "Make them a co-teacher first, then pass the studio on.");
        await makeOwner(manager, studioId, memberId);
      } else {
        await manager.query("UPDATE studio_members SET role = $2 WHERE id = $1", [memberId, role]);
        if (role === "co-teacher") await becomeTeacher(manager, target.userId);
      }
    });
  }

  /** Leaving, or being removed: from that moment the teachers see nothing of the person. */
  async remove(userId: string, studioId: string, memberId: string): Promise<void> {
    await this.dataSource.transaction(async (manager) => {
      const me = await this.access.member(userId, studioId, manager);
      const target = await this.target(manager, me, studioId, memberId);
      if (target.role === "owner") throw ownerStays();
      await manager.query(
        `UPDATE studio_members SET left_at = now(),
           consent_withdrawn_at = CASE WHEN consent_given_at IS NULL THEN NULL ELSE coalesce(consent_withdrawn_at, now()) END
         WHERE id = $1`,
        [memberId],
      );
      await manager.query("DELETE FROM studio_group_members WHERE member_id = $1", [memberId]);
      await wakeDeletion(manager);
    });
  }

  /** Somebody who is there at present; to pupils only they themselves are. */
  private async target(
    manager: EntityManager,
    me: { memberId: string; role: StudioRole },
    studioId: string,
    memberId: string,
  ): Promise<Target> {
    const rows: Target[] = await manager.query(
      `SELECT id AS "memberId", user_id AS "userId", role FROM studio_members
       WHERE studio_id = $1 AND id = $2 AND left_at IS NULL FOR UPDATE`,
      [studioId, memberId],
    );
    const [target] = rows;
    if (!target || (!teaches(me) && memberId !== me.memberId)) throw notFound("member");
    return target;
  }
}

const ownerStays = () =>
  new HttpProblem(409, "owner-stays", "A studio has one owner. Pass it on to a co-teacher first, or delete it.");
