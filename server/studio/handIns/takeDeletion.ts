import type { DataSource, EntityManager } from "typeorm";
import { enqueue } from "../../jobs/jobs.service";
import type { ObjectStore } from "../../storage/objectStore.service";
import { memberShares } from "../consent/digitalConsent";
import type { UploadLocks } from "./uploadLocks";

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

/** Takes recordings out of their threads and notes what is to be deleted. `condition` speaks of hand_ins as h. */
export async function markDeleted(
  manager: EntityManager | DataSource,
  why: WhyDeleted,
  condition: string,
  values: unknown[] = [],
): Promise<void> {
  await manager.query(
    `WITH gone AS (
       UPDATE hand_ins h SET state = 'deleted', picture = NULL, measures = NULL, effort = NULL
       WHERE h.state <> 'deleted' AND (${condition}) RETURNING h.storage_key
     )
     INSERT INTO deletion_records (storage_key, why) SELECT storage_key, $${values.length + 1} FROM gone
     ON CONFLICT DO NOTHING`,
    [...values, why],
  );
}

/** Recordings of whoever does not share any more, whatever stands in the thread. */
const unshared = `h.part_id IN (
  SELECT p.id FROM assignment_parts p JOIN studio_members m ON m.id = p.member_id JOIN users u ON u.id = m.user_id
  WHERE NOT ${memberShares})`;

export class TakeDeletion {
  constructor(
    private readonly dataSource: DataSource,
    private readonly objects: ObjectStore,
    private readonly locks: UploadLocks,
  ) {}

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
    await markDeleted(
      this.dataSource,
      "account erased",
      `h.author_id IN (SELECT id FROM studio_members WHERE user_id = $1)
       OR h.part_id IN (SELECT p.id FROM assignment_parts p JOIN studio_members m ON m.id = p.member_id WHERE m.user_id = $1)
       OR h.part_id IN (SELECT p.id FROM assignment_parts p JOIN studios s ON s.id = p.studio_id WHERE s.owner_id = $1)`,
      [userId],
    );
    await this.deleteMarked();
  }

  /** Deletes from the storage what is marked, and records when it was gone. What cannot be deleted now is tried again. */
  async deleteMarked(): Promise<void> {
    const open: { id: string; key: string }[] = await this.dataSource.query(
      "SELECT id::text, storage_key AS key FROM deletion_records WHERE deleted_at IS NULL ORDER BY asked_at",
    );
    let failure: unknown;
    for (const { id, key } of open) {
      try {
        await this.locks.while(key, () => this.objects.remove(key));
        await this.dataSource.query("UPDATE deletion_records SET deleted_at = now() WHERE id = $1", [id]);
      } catch (error) {
        failure = error;
      }
    }
    if (failure) throw failure;
  }
}
