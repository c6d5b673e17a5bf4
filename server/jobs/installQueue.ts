import { Logger, runMigrations } from "graphile-worker";
import { jobsSchema } from "./jobs.service";

/** Installs the queue's tables, or brings them up to date. */
export async function installQueue(connectionString: string): Promise<void> {
  const logger = new Logger(() => () => undefined);
  await runMigrations({ connectionString, schema: jobsSchema, logger, maxPoolSize: 1 });
}
