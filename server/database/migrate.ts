import { Client } from "pg";
import { installQueue } from "../jobs/installQueue";
import { createMigrationSource } from "./dataSource";

/** Any constant will do, as long as every start of this server names the same. */
const lockKey = 8_400_001;

/** Brings the database up to date. Several starts at once take turns. */
export async function migrate(url: string): Promise<void> {
  const turn = new Client({ connectionString: url, connectionTimeoutMillis: 3000 });
  turn.on("error", () => undefined);
  await turn.connect();
  try {
    await turn.query("SELECT pg_advisory_lock($1)", [lockKey]);
    const source = await createMigrationSource(url).initialize();
    try {
      await source.runMigrations();
    } finally {
      await source.destroy();
    }
    await installQueue(url);
  } finally {
    // Ending the connection gives the lock back.
    await turn.end();
  }
}
