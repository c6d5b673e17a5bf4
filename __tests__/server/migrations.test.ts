import { createDataSource, createMigrationSource } from "../../server/database/dataSource";
import { migrate } from "../../server/database/migrate";
import { createTestDatabase, type TestDatabase } from "./testDatabase";

let database: TestDatabase;
beforeEach(async () => {
  database = await createTestDatabase({ migrated: false });
});
afterEach(() => database.drop());

const applied = () => database.query("SELECT name FROM migrations ORDER BY id");
const tables = async () => {
  const rows = await database.query("SELECT table_name FROM information_schema.tables WHERE table_schema = 'public'");
  return rows.map(({ table_name }) => table_name).sort();
};

it("runs every migration once, also when four servers start at the same moment", async () => {
  await Promise.all([1, 2, 3, 4].map(() => migrate(database.url)));
  expect(await applied()).toEqual([{ name: "FirstTables1764547200000" }, { name: "KindOfTake1767225600000" }]);
  expect(await tables()).toContain("songs");
});

it("leaves data alone when it runs again", async () => {
  await migrate(database.url);
  await database.query("INSERT INTO users (email, password_hash) VALUES ('a@orlow-quay.example', 'none')");
  await migrate(database.url);
  expect(await database.query("SELECT email FROM users")).toEqual([{ email: "a@orlow-quay.example" }]);
});

it("makes phrases of the takes that were kept before guided holds existed", async () => {
  await migrate(database.url);
  const source = await createMigrationSource(database.url).initialize();
  try {
    await source.undoLastMigration();
    await database.query(`
      WITH person AS (INSERT INTO users (email, password_hash) VALUES ('a@orlow-quay.example', 'none') RETURNING id),
      voice AS (INSERT INTO voices (id, user_id, name, created_at) SELECT gen_random_uuid(), id, 'My voice', now() FROM person RETURNING id, user_id)
      INSERT INTO takes (id, user_id, voice_id, sung_at, duration_s, range, comfort, estimate, tuning_cents, certainty, reasons, notes)
      SELECT gen_random_uuid(), user_id, id, now(), 9, '{}', '{}', '{}', 0, 0.8, '[]', '[]' FROM voice`);
    await source.runMigrations();
  } finally {
    await source.destroy();
  }
  expect(await database.query("SELECT kind, shows FROM takes")).toEqual([{ kind: "phrase", shows: "both" }]);
});

it("can be taken back, one after the other", async () => {
  await migrate(database.url);
  const source = await createMigrationSource(database.url).initialize();
  try {
    await source.undoLastMigration();
    expect(await tables()).toContain("takes");
    await source.undoLastMigration();
  } finally {
    await source.destroy();
  }
  expect(await tables()).toEqual(["migrations"]);
});

it("makes the very columns that the entities describe", async () => {
  await migrate(database.url);
  const source = await createDataSource(database.url, () => undefined).initialize();
  try {
    for (const { tableName, columns } of source.entityMetadatas) {
      const described = columns.map((column) => [
        column.databaseName,
        source.driver.normalizeType(column),
        column.isNullable,
      ]);
      const rows = await database.query(
        "SELECT column_name, data_type, is_nullable FROM information_schema.columns WHERE table_name = $1",
        [tableName],
      );
      const made = rows.map((row) => [row.column_name, row.data_type, row.is_nullable === "YES"]);
      expect([tableName, made.sort()]).toEqual([tableName, described.sort()]);
    }
  } finally {
    await source.destroy();
  }
});
