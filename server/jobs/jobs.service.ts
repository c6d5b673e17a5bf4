import type { DataSource, EntityManager } from "typeorm";

/** The queue's own schema in our database. */
export const jobsSchema = "larkspan_jobs";

export interface JobWishes {
  /** Two jobs waiting under one key are one: the later payload replaces the earlier. */
  key?: string;
  /** not before this instant; unset: at once */
  runAt?: Date;
  /** tries until it is given up; each waits longer than the one before, 10 of them about half a day in all */
  maxAttempts?: number;
}

/**
 * Adds a job by SQL on the given connection: within a transaction it is there exactly if the transaction's data are.
 * A job may run more than once; its handler must do no harm then.
 */
export async function enqueue(
  manager: EntityManager | DataSource,
  task: string,
  payload: object,
  { key, runAt, maxAttempts = 12 }: JobWishes = {},
): Promise<void> {
  await manager.query(
    `SELECT FROM ${jobsSchema}.add_job($1, payload => $2::json, job_key => $3, run_at => $4::timestamptz, max_attempts => $5)`,
    [task, JSON.stringify(payload), key ?? null, runAt?.toISOString() ?? null, maxAttempts],
  );
}
