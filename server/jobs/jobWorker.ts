import { Logger as QueueLogger, parseCronItems, run, runOnce } from "graphile-worker";
import type { Pool } from "pg";
import type { Logger } from "pino";
import { jobsSchema } from "./jobs.service";

/** Does one kind of job. Whatever it throws is logged and the job tried again later. */
export type JobHandler = (payload: unknown) => Promise<void>;

/** Everything that can be done by jobs; assembled in `createJobs`. */
export interface Jobs {
  handlers: Readonly<Record<string, JobHandler>>;
  /** tasks that come by themselves; `match` is a cron pattern in UTC */
  recurring: readonly { task: string; match: string }[];
}

export interface JobWorker {
  /** Takes no more jobs and ends when those at hand are done. */
  stop: () => Promise<void>;
}

/** Works off the queue within this process; any number of processes share one queue. */
export async function startWorker(connectionString: string, jobs: Jobs, logger: Logger): Promise<JobWorker> {
  const runner = await run({
    connectionString,
    schema: jobsSchema,
    taskList: taskList(jobs),
    parsedCronItems: parseCronItems(jobs.recurring.map(({ task, match }) => ({ task, match }))),
    concurrency: 3,
    maxPoolSize: 4,
    pollInterval: 2000,
    noHandleSignals: true,
    logger: queueLogger(logger),
  });
  let stopping: Promise<void> | undefined;
  runner.promise.catch((error: unknown) => logger.error(error, "The queue stopped."));
  return { stop: () => (stopping ??= runner.stop().catch((error: unknown) => logger.warn(error))) };
}

/**
 * Does what is due now, and returns when how each job ended is noted. That is noted in batches, for which the library waits;
 * one by one it would not.
 */
export async function workOffQueue(pgPool: Pool, jobs: Jobs): Promise<void> {
  await runOnce({
    pgPool,
    schema: jobsSchema,
    taskList: taskList(jobs),
    noHandleSignals: true,
    logger: silent,
    preset: { worker: { completeJobBatchDelay: 0, failJobBatchDelay: 0 } },
  });
}

function taskList({ handlers }: Jobs) {
  return Object.fromEntries(
    Object.entries(handlers).map(([task, handle]) => [task, (payload: unknown) => handle(payload)]),
  );
}

const silent = new QueueLogger(() => () => undefined);

/** Payloads hold addresses: of a job only its kind and what went wrong are logged. */
function queueLogger(logger: Logger): QueueLogger {
  return new QueueLogger(() => (level, message) => {
    if (level === "error") logger.error({ queue: message });
    else if (level === "warning") logger.warn({ queue: message });
    else logger.debug({ queue: message });
  });
}
