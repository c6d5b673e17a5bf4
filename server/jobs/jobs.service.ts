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
/** How the queue is, in numbers. */
export interface QueueHealth {
  waiting: number;
  /** failed at least once and to be tried again */
  retrying: number;
  /** given up */
  failed: number;
  /** how long the job that waits longest has been due */
  oldestDueS: number;
}

export async function queueHealth(dataSource: DataSource): Promise<QueueHealth> {
  const rows: QueueHealth[] = await dataSource.query(
    `SELECT count(*) FILTER (WHERE attempts = 0)::int AS waiting,
            count(*) FILTER (WHERE attempts > 0 AND attempts < max_attempts)::int AS retrying,
            count(*) FILTER (WHERE attempts >= max_attempts)::int AS failed,
            coalesce(extract(epoch FROM now() - min(run_at) FILTER (WHERE attempts < max_attempts AND run_at <= now())), 0)::float8 AS "oldestDueS"
     FROM ${jobsSchema}.jobs`,
  );
  return rows[0] ?? { waiting: 0, retrying: 0, failed: 0, oldestDueS: 0 };
}
