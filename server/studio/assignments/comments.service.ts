import { randomUUID } from "node:crypto";
import type { DataSource, EntityManager } from "typeorm";
import type { Comment, CommentRequest } from "../../../shared/contract/studio/assignment";
import { HttpProblem, notFound } from "../../http/httpProblem";
import { idTaken } from "../studioAnswers";
import { CommentEntity } from "./comment.entity";
import { type PartAccess, type PartAccessService, refuseHidden, refuseUnshared } from "./partAccess.service";

const mostComments = 1000;

type Row = Omit<Comment, "author" | "mine" | "createdAt"> & Comment["author"] & { createdAt: Date };

/** The thread of a part: what pupil and teachers write to each other. */
export class CommentsService {
  constructor(
    private readonly dataSource: DataSource,
    private readonly access: PartAccessService,
  ) {}

  /** Oldest first. */
  async list(userId: string, partId: string): Promise<Comment[]> {
    const access = await this.access.reach(userId, partId);
    refuseHidden(access);
    const rows: Row[] = await this.dataSource.query(
      `SELECT c.id, c.hand_in_id AS "handInId", c.at_s AS "atS", c.text, c.created_at AS "createdAt",
              m.id AS "memberId", m.name, m.role
       FROM comments c JOIN studio_members m ON m.id = c.author_id
       WHERE c.part_id = $1 ORDER BY c.created_at, c.id`,
      [partId],
    );
    return rows.map(({ memberId, name, role, createdAt, ...row }) => ({
      ...row,
      author: { memberId, name, role },
      mine: memberId === access.me.memberId,
      createdAt: createdAt.toISOString(),
    }));
  }

  async add(userId: string, partId: string, wanted: CommentRequest): Promise<Comment> {
    return this.dataSource.transaction(async (manager) => {
      const access = await this.access.reach(userId, partId, manager);
      refuseUnshared(access);
      return this.write(manager, access, wanted);
    });
  }

  /** Once, however often it is sent by the same id. */
  async write(
    manager: EntityManager,
    { partId, me }: PartAccess,
    { id = randomUUID(), text, handInId = null, atS = null }: Pick<CommentRequest, "text"> & Partial<CommentRequest>,
  ): Promise<Comment> {
    const kept = await manager.findOneBy(CommentEntity, { id });
    if (kept && (kept.partId !== partId || kept.authorId !== me.memberId)) throw idTaken();
    if (kept) return { ...commentOf(kept), author: me, mine: true };
    if (handInId !== null) {
      const takes: object[] = await manager.query("SELECT FROM hand_ins WHERE id = $1 AND part_id = $2", [
        handInId,
        partId,
      ]);
      if (takes.length === 0)
        throw new HttpProblem(422, "unknown-reference", "There is no such take in this thread.", [
          { path: "handInId", message: "Choose a take of this thread." },
        ]);
    }
    if ((await manager.countBy(CommentEntity, { partId })) >= mostComments)
      throw new HttpProblem(409, "collection-full", `A thread holds at most ${mostComments} comments.`);
    const createdAt = new Date();
    await manager.insert(CommentEntity, { id, partId, authorId: me.memberId, handInId, atS, text, createdAt });
    return { ...commentOf({ id, handInId, atS, text, createdAt }), author: me, mine: true };
  }

  /** Only what one wrote oneself. */
  async remove(userId: string, partId: string, id: string): Promise<void> {
    const { me } = await this.access.reach(userId, partId);
    const { affected } = await this.dataSource.manager.delete(CommentEntity, { id, partId, authorId: me.memberId });
    if (!affected) throw notFound("comment");
  }
}

type Written = Pick<CommentEntity, "id" | "handInId" | "atS" | "text" | "createdAt">;

const commentOf = ({ id, handInId, atS, text, createdAt }: Written) => ({
  ...{ id, handInId, atS, text },
  createdAt: createdAt.toISOString(),
});
