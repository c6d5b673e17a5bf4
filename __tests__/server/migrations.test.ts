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
  expect(await applied()).toEqual([{ name: "FirstTables1764547200000" }]);
  expect(await tables()).toContain("songs");
});

it("leaves data alone when it runs again", async () => {
  await migrate(database.url);
  await database.query("INSERT INTO users (email, password_hash) VALUES ('a@orlow-quay.example', 'none')");
  await migrate(database.url);
  expect(await database.query("SELECT email FROM users")).toEqual([{ email: "a@orlow-quay.example" }]);
});

it("can be taken back", async () => {
  await migrate(database.url);
  const source = await createMigrationSource(database.url).initialize();
  try {
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
