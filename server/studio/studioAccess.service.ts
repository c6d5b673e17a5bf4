import type { DataSource, EntityManager } from "typeorm";
import type { StudioRole } from "../../shared/contract/studio/studio";
import { HttpProblem, notFound } from "../http/httpProblem";

type Connection = DataSource | EntityManager;

/** Somebody's present place in a studio. */
interface Membership {
  memberId: string;
  studioId: string;
  name: string;
  role: StudioRole;
}

export const teaches = ({ role }: { role: StudioRole }) => role !== "pupil";

export const teachersOnly = () =>
  new HttpProblem(403, "teachers-only", "Only the teachers of this studio may do this.");

export const notAgreed = (message: string) => new HttpProblem(403, "not-agreed", message);

/** Who may what in a studio. For whoever is not in it, it does not exist. */
export class StudioAccessService {
  constructor(private readonly dataSource: DataSource) {}

  async member(userId: string, studioId: string, connection: Connection = this.dataSource): Promise<Membership> {
    const rows: Membership[] = await connection.query(
      `SELECT id AS "memberId", studio_id AS "studioId", name, role FROM studio_members
       WHERE studio_id = $1 AND user_id = $2 AND left_at IS NULL`,
      [studioId, userId],
    );
    if (!rows[0]) throw notFound("studio");
    return rows[0];
  }

  async teacher(userId: string, studioId: string, connection?: Connection): Promise<Membership> {
    const member = await this.member(userId, studioId, connection);
    if (!teaches(member)) throw teachersOnly();
    return member;
  }

  async owner(userId: string, studioId: string, connection?: Connection): Promise<Membership> {
    const member = await this.member(userId, studioId, connection);
    if (member.role !== "owner") throw new HttpProblem(403, "owner-only", "Only the owner of this studio may do this.");
    return member;
  }

  /** The teachers to whom one writes, owner first. */
  async teachersOf(studioId: string, connection: Connection = this.dataSource) {
    const rows: { memberId: string; userId: string; email: string }[] = await connection.query(
      `SELECT m.id AS "memberId", u.id AS "userId", u.email
       FROM studio_members m JOIN users u ON u.id = m.user_id
       WHERE m.studio_id = $1 AND m.left_at IS NULL AND m.role <> 'pupil' AND u.suspended_at IS NULL
       ORDER BY m.role DESC, m.joined_at, m.id`,
      [studioId],
    );
    return rows;
  }
}
