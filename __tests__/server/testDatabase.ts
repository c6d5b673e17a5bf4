import { execFileSync } from "node:child_process";
import { createHash, randomUUID } from "node:crypto";
import { readdirSync, readFileSync } from "node:fs";
import path from "node:path";
import { Client } from "pg";
import { migrate } from "../../server/database/migrate";

const root = path.resolve(__dirname, "../..");
const migrations = path.join(root, "server/database/migrations");

/** Any number, the same in every test process: the template is made once. */
const templateLock = 8_400_002;

export interface TestDatabase {
  url: string;
  /** on one connection, which is kept until the end */
  query: (sql: string, values?: unknown[]) => Promise<Record<string, unknown>[]>;
  drop: () => Promise<void>;
}

/** A migrated database of one's own on the test cluster. */
export async function createTestDatabase({ migrated = true } = {}): Promise<TestDatabase> {
  const admin = clusterUrl();
  const name = `larkspan_test_${randomUUID().replaceAll("-", "")}`;
  await withClient(admin, async (client) => {
    const template = migrated ? await ensureTemplate(client, admin) : "template0";
    await client.query(`CREATE DATABASE ${name} TEMPLATE ${template} STRATEGY file_copy`);
  });
  const url = databaseUrl(admin, name);
  let own: Promise<Client> | undefined;
  return {
    url,
    query: async (sql, values) => {
      own ??= connect(url);
      return (await (await own).query<Record<string, unknown>>(sql, values)).rows;
    },
    drop: async () => {
      await (await own)?.end();
      await withClient(admin, (client) => client.query(`DROP DATABASE ${name} WITH (FORCE)`));
    },
  };
}

let ownCluster: string | undefined;

/** The cluster that the test run started, or for a single file the one that we start ourselves. */
function clusterUrl(): string {
  if (process.env.TEST_DATABASE_URL) return process.env.TEST_DATABASE_URL;
  if (!ownCluster) {
    const printed = execFileSync(process.execPath, [path.join(root, "server/setup/postgres.mjs"), "ensure", "test"], {
      encoding: "utf8",
    });
    ownCluster = (JSON.parse(printed) as { url: string }).url;
  }
  return ownCluster;
}

async function ensureTemplate(client: Client, admin: string): Promise<string> {
  const hash = createHash("sha256");
  for (const file of readdirSync(migrations).sort()) hash.update(readFileSync(path.join(migrations, file)));
  const name = `larkspan_template_${hash.digest("hex").slice(0, 16)}`;
  await client.query("SELECT pg_advisory_lock($1)", [templateLock]);
  try {
    const { rowCount } = await client.query("SELECT 1 FROM pg_database WHERE datname = $1", [name]);
    if (!rowCount) {
      const draft = `larkspan_draft_${randomUUID().replaceAll("-", "")}`;
      await client.query(`CREATE DATABASE ${draft} TEMPLATE template0 STRATEGY file_copy`);
      await migrate(databaseUrl(admin, draft));
      await client.query(`ALTER DATABASE ${draft} RENAME TO ${name}`);
    }
  } finally {
    await client.query("SELECT pg_advisory_unlock($1)", [templateLock]);
  }
  return name;
}

function databaseUrl(admin: string, name: string): string {
  const url = new URL(admin);
  url.pathname = `/${name}`;
  return url.href;
}

async function connect(url: string): Promise<Client> {
  const client = new Client({ connectionString: url });
  client.on("error", () => undefined);
  await client.connect();
  return client;
}

async function withClient<Result>(url: string, work: (client: Client) => Promise<Result>): Promise<Result> {
  const client = await connect(url);
  try {
    return await work(client);
  } finally {
    await client.end();
  }
}
