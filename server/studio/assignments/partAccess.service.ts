import type { DataSource, EntityManager } from "typeorm";
import type { Part } from "../../../shared/contract/studio/assignment";
import type { StudioRole } from "../../../shared/contract/studio/studio";
import { notFound } from "../../http/httpProblem";
import { memberShares } from "../consent/digitalConsent";
import { keptDaysColumn } from "../consent/memberConsent";
import { notAgreed, teaches, teachersOnly } from "../studioAccess.service";

type Connection = DataSource | EntityManager;

/** A part, and how the asker stands to it. */
export interface PartAccess {
  partId: string;
  studioId: string;
  /** whose part it is */
  pupil: { memberId: string; userId: string; name: string; email: string };
  /** the asker */
  me: { memberId: string; name: string; role: StudioRole };
  side: Part["side"];
  /** the asker teaches in this studio; also true of a teacher's own part */
  teaches: boolean;
  /** the pupil agrees at this moment */
  shares: boolean;
  title: string;
  recordingsKeptDays: number;
}

interface Row extends Omit<PartAccess, "pupil" | "me" | "side" | "teaches"> {
  memberId: string;
  userId: string;
  pupil: string;
  email: string;
  myMemberId: string;
  myName: string;
  myRole: StudioRole;
}

/** The one gate to parts and all that hangs on them: threads and takes handed in. */
export class PartAccessService {
  constructor(private readonly dataSource: DataSource) {}

  /** Whoever is neither the pupil nor a teacher of the studio, or has left, is told that there is no such part. */
  async reach(userId: string, partId: string, connection: Connection = this.dataSource): Promise<PartAccess> {
    const rows: Row[] = await connection.query(
      `SELECT p.id AS "partId", p.studio_id AS "studioId",
              m.id AS "memberId", m.user_id AS "userId", m.name AS pupil, u.email, ${memberShares} AS shares,
              me.id AS "myMemberId", me.name AS "myName", me.role AS "myRole",
              a.song->>'title' AS title, ${keptDaysColumn}
       FROM assignment_parts p
       JOIN assignments a ON a.id = p.assignment_id
       JOIN studios s ON s.id = p.studio_id
       JOIN studio_members m ON m.id = p.member_id AND m.left_at IS NULL
       JOIN users u ON u.id = m.user_id
       JOIN studio_members me ON me.studio_id = p.studio_id AND me.user_id = $1 AND me.left_at IS NULL
       WHERE p.id = $2 AND (me.id = m.id OR me.role <> 'pupil')`,
      [userId, partId],
    );
    const [row] = rows;
    if (!row) throw notFound("part");
    const { memberId, userId: pupilId, pupil, email, myMemberId, myName, myRole, ...rest } = row;
    return {
      ...rest,
      pupil: { memberId, userId: pupilId, name: pupil, email },
      me: { memberId: myMemberId, name: myName, role: myRole },
      side: memberId === myMemberId ? "pupil" : "teacher",
      teaches: teaches({ role: myRole }),
    };
  }

  /** The same for those who teach there. */
  async reachAsTeacher(userId: string, partId: string, connection?: Connection): Promise<PartAccess> {
    const access = await this.reach(userId, partId, connection);
    if (!access.teaches) throw teachersOnly();
    return access;
  }
}

/** In front of threads and takes: for the teachers they are closed while the pupil does not agree. */
export function refuseHidden({ side, shares, pupil }: PartAccess): void {
  if (side === "teacher" && !shares)
    throw notAgreed(`${pupil.name} has not agreed that you see this, or has taken it back.`);
}

/** In front of everything that is kept on the server for the teachers to see or hear. */
export function refuseUnshared(access: PartAccess): void {
  refuseHidden(access);
  if (!access.shares)
    throw notAgreed(
      "You have not agreed that your teachers see and hear this, or a guardian has not confirmed it yet.",
    );
}
