import { randomUUID } from "node:crypto";
import type { DataSource, EntityManager } from "typeorm";
import type { GroupKey, GroupRequest, StudioGroup } from "../../../shared/contract/studio/group";
import { HttpProblem, notFound } from "../../http/httpProblem";
import { memberShares } from "../consent/digitalConsent";
import type { StudioAccessService } from "../studioAccess.service";
import { StudioGroupEntity } from "./studioGroup.entity";
import { StudioGroupMemberEntity } from "./studioGroupMember.entity";

const mostGroups = 100;
const mostKeys = 100;

interface Row {
  id: string;
  name: string;
  keys: GroupKey[];
  memberIds: string[];
  sharing: string[];
}

/** Groups of a studio's pupils, and the key that each sings a song in. */
export class GroupsService {
  constructor(
    private readonly dataSource: DataSource,
    private readonly access: StudioAccessService,
  ) {}

  async list(userId: string, studioId: string): Promise<StudioGroup[]> {
    await this.access.teacher(userId, studioId);
    return this.read(studioId, null);
  }

  async make(userId: string, studioId: string, { name, memberIds }: GroupRequest): Promise<StudioGroup> {
    await this.access.teacher(userId, studioId);
    const id = randomUUID();
    await this.dataSource.transaction(async (manager) => {
      await manager.query("SELECT FROM studios WHERE id = $1 FOR NO KEY UPDATE", [studioId]);
      if ((await manager.countBy(StudioGroupEntity, { studioId })) >= mostGroups)
        throw new HttpProblem(409, "collection-full", `A studio keeps at most ${mostGroups} groups.`);
      await manager.insert(StudioGroupEntity, { id, studioId, name, keys: [] });
      await fill(manager, studioId, id, memberIds);
    });
    return this.one(studioId, id);
  }

  async change(userId: string, studioId: string, id: string, { name, memberIds }: GroupRequest): Promise<StudioGroup> {
    await this.access.teacher(userId, studioId);
    await this.dataSource.transaction(async (manager) => {
      const { affected } = await manager.update(StudioGroupEntity, { id, studioId }, { name });
      if (!affected) throw notFound("group");
      await manager.delete(StudioGroupMemberEntity, { groupId: id });
      await fill(manager, studioId, id, memberIds);
    });
    return this.one(studioId, id);
  }

  async remove(userId: string, studioId: string, id: string): Promise<void> {
    await this.access.teacher(userId, studioId);
    const { affected } = await this.dataSource.manager.delete(StudioGroupEntity, { id, studioId });
    if (!affected) throw notFound("group");
  }

  /** The key of the group for a song, in place of the one before. */
  async setKey(userId: string, studioId: string, id: string, wanted: GroupKey): Promise<StudioGroup> {
    await this.access.teacher(userId, studioId);
    const pupils = wanted.pupils.map((pupil) => ({ ...pupil, memberId: pupil.memberId.toLowerCase() }));
    const key = { ...wanted, pupils };
    const members = await this.dataSource.query(
      "SELECT id FROM studio_members WHERE studio_id = $1 AND left_at IS NULL AND id = ANY($2)",
      [studioId, key.pupils.map(({ memberId }) => memberId)],
    );
    const known = new Set((members as { id: string }[]).map((each) => each.id));
    if (key.pupils.some(({ memberId }) => !known.has(memberId))) throw notMembers("pupils");
    await this.dataSource.transaction(async (manager) => {
      const group = await manager.findOne(StudioGroupEntity, {
        where: { id, studioId },
        lock: { mode: "pessimistic_write" },
      });
      if (!group) throw notFound("group");
      const others = group.keys.filter(({ songId }) => songId !== key.songId);
      await manager.update(StudioGroupEntity, { id }, { keys: [key, ...others].slice(0, mostKeys) });
    });
    return this.one(studioId, id);
  }

  private async one(studioId: string, id: string): Promise<StudioGroup> {
    const [group] = await this.read(studioId, id);
    if (!group) throw notFound("group");
    return group;
  }

  private async read(studioId: string, id: string | null): Promise<StudioGroup[]> {
    const rows: Row[] = await this.dataSource.query(
      `SELECT g.id, g.name, g.keys,
              ARRAY(SELECT gm.member_id FROM studio_group_members gm JOIN studio_members m ON m.id = gm.member_id
                    WHERE gm.group_id = g.id ORDER BY m.name, m.id) AS "memberIds",
              ARRAY(SELECT m.id FROM studio_members m JOIN users u ON u.id = m.user_id
                    WHERE m.studio_id = g.studio_id AND ${memberShares}) AS sharing
       FROM studio_groups g WHERE g.studio_id = $1 AND ($2::uuid IS NULL OR g.id = $2) ORDER BY g.created_at, g.id`,
      [studioId, id],
    );
    return rows.map(({ sharing, keys, ...group }) => ({ ...group, keys: keys.map((key) => shown(key, sharing)) }));
  }
}

/**
 * Pupils who do not agree at present are not in it. The reason speaks of those who have it hardest, so that it is told
 * only while all of them agree.
 */
function shown(key: GroupKey, sharing: readonly string[]): GroupKey {
  const shares = new Set(sharing);
  const pupils = key.pupils.filter(({ memberId }) => shares.has(memberId));
  return { ...key, pupils, reason: pupils.length === key.pupils.length ? key.reason : "" };
}

async function fill(manager: EntityManager, studioId: string, groupId: string, memberIds: string[]): Promise<void> {
  const distinct = [...new Set(memberIds.map((id) => id.toLowerCase()))];
  const rows: object[] = await manager.query(
    `INSERT INTO studio_group_members (group_id, member_id, studio_id)
     SELECT $1, id, studio_id FROM studio_members WHERE studio_id = $2 AND left_at IS NULL AND id = ANY($3)
     RETURNING member_id`,
    [groupId, studioId, distinct],
  );
  if (rows.length < distinct.length) throw notMembers("memberIds");
}

const notMembers = (path: string) =>
  new HttpProblem(422, "unknown-reference", "Somebody of these is not in this studio any more.", [
    { path, message: "Choose only people who are in this studio." },
  ]);
