import type { DataSource, EntityManager } from "typeorm";
import { enqueue } from "../../jobs/jobs.service";
import type { ObjectStore } from "../../storage/objectStore.service";
import { memberShares } from "../consent/digitalConsent";
import { UploadLocks } from "./uploadLocks";

/** The name of the job that deletes recordings that are to go, from the storage too. */
export const deleteTakesTask = "deleteTakes";

/** Why a recording was deleted; stands in its record. */
export type WhyDeleted = "expired" | "abandoned" | "consent withdrawn" | "taken back" | "refused" | "account erased";

/** An upload that does not come to its end is deleted after a day. */
const unfinishedHours = 24;
const attempts = 50;

/**
 * Has the job look for recordings that are to go, once the transaction is done: whoever withdraws consent, leaves or
 * removes something calls this in the same transaction. Without it they go within five minutes.
 */
export async function wakeDeletion(manager: EntityManager | DataSource): Promise<void> {
  await enqueue(manager, deleteTakesTask, {}, { key: deleteTakesTask, maxAttempts: attempts });
}

/**
 * Takes recordings out of their threads and notes what is to be deleted; the parts go back to the take before. What had
 * not arrived leaves no row, so that its sender can begin anew. How a take felt outlives a recording whose days are over,
 * and nothing else. `condition` speaks of hand_ins as h.
 * @returns the keys of what is to go from the storage
 */
export async function markDeleted(
  source: EntityManager | DataSource,
  why: WhyDeleted,
  condition: string,
  values: unknown[] = [],
): Promise<string[]> {
  return source.transaction(async (manager) => {
    const gone: { key: string; partId: string }[] = await manager.query(
      `WITH never AS (
         DELETE FROM hand_ins h WHERE h.state = 'uploading' AND (${condition}) RETURNING h.storage_key, h.part_id
       ), heard AS (
         UPDATE hand_ins h SET state = 'deleted', picture = NULL, measures = NULL, take_id = NULL,
           effort = CASE WHEN $${values.length + 1}::text = 'expired' THEN h.effort END
         WHERE h.state = 'ready' AND (${condition}) RETURNING h.storage_key, h.part_id
       ), gone AS (
         SELECT * FROM never UNION ALL SELECT * FROM heard
       ), noted AS (
         INSERT INTO deletion_records (storage_key, why) SELECT storage_key, $${values.length + 1}::text FROM gone
         ON CONFLICT (storage_key) DO UPDATE SET deleted_at = NULL, why = excluded.why, asked_at = now()
       )
       SELECT storage_key AS key, part_id AS "partId" FROM gone`,
      [...values, why],
    );
    await backToTakeBefore(manager, [...new Set(gone.map(({ partId }) => partId))]);
    return gone.map(({ key }) => key);
  });
}

/** Condition on a row `h` of hand_ins: it tells how a take felt, also where nothing else is left of it. */
export const tellsHowItFelt = "(h.state = 'ready' OR h.state = 'deleted' AND h.effort IS NOT NULL)";

/** Parts tell of the newest take that is still there. What a teacher has answered stays answered. */
async function backToTakeBefore(manager: EntityManager, partIds: string[]): Promise<void> {
  if (partIds.length === 0) return;
  // Locked first: the next statement then sees a take that arrives at this moment.
  await manager.query("SELECT FROM assignment_parts WHERE id = ANY($1) ORDER BY id FOR NO KEY UPDATE", [partIds]);
  await manager.query(
    `UPDATE assignment_parts p SET
       state = CASE WHEN p.state = 'handed-in' AND newest.id IS NULL THEN 'assigned' ELSE p.state END,
       handed_in_at = coalesce(newest.ready_at, newest.created_at), effort = newest.effort
     FROM unnest($1::uuid[]) touched (id) LEFT JOIN LATERAL (
       SELECT h.* FROM hand_ins h WHERE h.part_id = touched.id AND h.kind = 'pupil-take' AND h.state = 'ready'
       ORDER BY coalesce(h.ready_at, h.created_at) DESC, h.id LIMIT 1
     ) newest ON true
     WHERE p.id = touched.id`,
    [partIds],
  );
}

/** Recordings of whoever does not share any more, whatever stands in the thread. */
const unshared = `h.part_id IN (
  SELECT p.id FROM assignment_parts p JOIN studio_members m ON m.id = p.member_id JOIN users u ON u.id = m.user_id
  WHERE NOT ${memberShares})`;

/** What an account recorded, and what lies in threads that go with it. */
const theirs = `h.author_id IN (SELECT id FROM studio_members WHERE user_id = $1)
  OR h.part_id IN (SELECT p.id FROM assignment_parts p JOIN studio_members m ON m.id = p.member_id WHERE m.user_id = $1)
  OR h.part_id IN (SELECT p.id FROM assignment_parts p JOIN studios s ON s.id = p.studio_id WHERE s.owner_id = $1)`;

export class TakeDeletion {
  private readonly locks: UploadLocks;

  constructor(
    private readonly dataSource: DataSource,
    private readonly objects: ObjectStore,
  ) {
    this.locks = new UploadLocks(dataSource);
  }

  /** Finds what is to go (expired, abandoned, not shared any more) and deletes it. May run at any time, and more than once. */
  async sweep(): Promise<void> {
    await markDeleted(this.dataSource, "expired", "h.expires_at <= now()");
    await markDeleted(
      this.dataSource,
      "abandoned",
      `h.state = 'uploading' AND h.created_at <= now() - interval '${unfinishedHours} hours'`,
    );
    await markDeleted(this.dataSource, "consent withdrawn", unshared);
    await this.deleteMarked();
  }

  /** Everything that somebody recorded, and everything in threads that go with their account. */
  async erase(userId: string): Promise<void> {
    const keys = await markDeleted(this.dataSource, "account erased", theirs, [userId]);
    const earlier: { key: string }[] = await this.dataSource.query(
      `SELECT r.storage_key AS key FROM deletion_records r JOIN hand_ins h ON h.storage_key = r.storage_key
       WHERE r.deleted_at IS NULL AND (${theirs})`,
      [userId],
    );
    await this.deleteKeys(new Set([...keys, ...earlier.map(({ key }) => key)]));
  }

  /** Deletes from the storage what is marked, and records when it was gone. What cannot be deleted now is tried again. */
  async deleteMarked(): Promise<void> {
    const open: { key: string }[] = await this.dataSource.query(
      "SELECT storage_key AS key FROM deletion_records WHERE deleted_at IS NULL ORDER BY asked_at",
    );
    await this.deleteKeys(open.map(({ key }) => key));
  }

  private async deleteKeys(keys: Iterable<string>): Promise<void> {
    let failure: unknown;
    for (const key of keys) {
      try {
        await this.locks.while(key, () => this.objects.remove(key));
        await this.dataSource.query("UPDATE deletion_records SET deleted_at = now() WHERE storage_key = $1", [key]);
      } catch (error) {
        failure = error;
      }
    }
    if (failure) throw failure;
  }
}
