import { createDataSource, createMigrationSource } from "../../server/database/dataSource";
import { migrate } from "../../server/database/migrate";
import { createTestDatabase, type TestDatabase } from "./testDatabase";

let database: TestDatabase;
/** One that every migration has run on, copied from the one that was brought up to date before. */
beforeEach(async () => {
  database = await createTestDatabase();
});
afterEach(() => database.drop());

const names = [
  "FirstTables1764547200000",
  "KindOfTake1767225600000",
  "SongRevisions1769904000000",
  "SongVersions1772323200000",
  "KeysPerVoice1775001600000",
  "InstrumentPhotos1778000000000",
  "PlayerWishes1779000000000",
  "SheetLinks1780000000000",
  "MailAndJobs1782000000000",
  "Accounts1782100000000",
  "Arrangements1784000000000",
  "LineUps1785000000000",
  "Studios1796100000000",
  "HandIns1796200000000",
  "MembersGone1796300000000",
  "ConsentKept1796310000000",
  "TakesGone1796400000000",
  "TakeOfHandIn1796500000000",
];
const applied = () => database.query("SELECT name FROM migrations ORDER BY id");
const tables = async (where = database) => {
  const rows = await where.query("SELECT table_name FROM information_schema.tables WHERE table_schema = 'public'");
  return rows.map(({ table_name }) => table_name).sort();
};

it("runs every migration once, also when four servers start at the same moment", async () => {
  const empty = await createTestDatabase({ migrated: false });
  await Promise.all([1, 2, 3, 4].map(() => migrate(empty.url)));
  const rows = await empty.query("SELECT name FROM migrations ORDER BY id");
  expect(rows.map(({ name }) => name)).toEqual(names);
  expect(await tables(empty)).toContain("songs");
  await empty.drop();
});

it("leaves data alone when it runs again", async () => {
  await database.query("INSERT INTO users (email, password_hash) VALUES ('a@orlow-quay.example', 'none')");
  await migrate(database.url);
  expect(await database.query("SELECT email FROM users")).toEqual([{ email: "a@orlow-quay.example" }]);
});

/** Takes migrations back until the named one is the newest, does something with the database of that time, and comes forward. */
async function asItWasAfter(name: string, work: () => Promise<unknown>): Promise<void> {
  const source = await createMigrationSource(database.url).initialize();
  try {
    while ((await applied()).at(-1)?.name !== name) await source.undoLastMigration();
    await work();
    await source.runMigrations();
  } finally {
    await source.destroy();
  }
}

it("makes phrases of the takes that were kept before guided holds existed", async () => {
  await asItWasAfter("FirstTables1764547200000", () =>
    database.query(`
      WITH person AS (INSERT INTO users (email, password_hash) VALUES ('a@orlow-quay.example', 'none') RETURNING id),
      voice AS (INSERT INTO voices (id, user_id, name, created_at) SELECT gen_random_uuid(), id, 'My voice', now() FROM person RETURNING id, user_id)
      INSERT INTO takes (id, user_id, voice_id, sung_at, duration_s, range, comfort, estimate, tuning_cents, certainty, reasons, notes)
      SELECT gen_random_uuid(), user_id, id, now(), 9, '{}', '{}', '{}', 0, 0.8, '[]', '[]' FROM voice`),
  );
  expect(await database.query("SELECT kind, shows FROM takes")).toEqual([{ kind: "phrase", shows: "both" }]);
});

it("gives songs that were kept before they had revisions their first, and no tags", async () => {
  await asItWasAfter("KindOfTake1767225600000", () =>
    database.query(`
      WITH person AS (INSERT INTO users (email, password_hash) VALUES ('a@orlow-quay.example', 'none') RETURNING id)
      INSERT INTO songs (id, user_id, title, chart, created_at)
      SELECT gen_random_uuid(), id, 'Slack Water', 'D  A' || chr(10) || 'Low tide', now() FROM person`),
  );
  expect(await database.query("SELECT title, tags, archived_at, played_at, revision FROM songs")).toEqual([
    { title: "Slack Water", tags: [], archived_at: null, played_at: null, revision: 1 },
  ]);
  expect(await database.query("SELECT title_key, search_text, first_words, span FROM songs")).toEqual([
    { title_key: "slack water", search_text: "slack water\nlow tide", first_words: "Low tide", span: null },
  ]);
  expect(await database.query("SELECT changed_at = saved_at AS same FROM songs")).toEqual([{ same: true }]);
});

it("keeps decisions made when there was one for each song, for their voice and without a history", async () => {
  await asItWasAfter("SongVersions1772323200000", () =>
    database.query(`
      WITH person AS (INSERT INTO users (email, password_hash) VALUES ('a@orlow-quay.example', 'none') RETURNING id),
      song AS (INSERT INTO songs (id, user_id, title, chart, created_at) SELECT gen_random_uuid(), id, 'Slack Water', '', now() FROM person RETURNING id, user_id)
      INSERT INTO decisions (id, user_id, song_id, tonic, shift, reason, decided_at)
      SELECT gen_random_uuid(), user_id, id, 'C', -2, 'Sits well.', now() FROM song`),
  );
  expect(await database.query("SELECT tonic, shift, voice_id, earlier FROM decisions")).toEqual([
    { tonic: "C", shift: -2, voice_id: null, earlier: [] },
  ]);
});

it("can be taken back, one after the other", async () => {
  const source = await createMigrationSource(database.url).initialize();
  try {
    for (const [k] of names.entries()) {
      expect(await tables()).toContain("takes");
      await source.undoLastMigration();
      expect(await applied()).toHaveLength(names.length - k - 1);
    }
  } finally {
    await source.destroy();
  }
  expect(await tables()).toEqual(["migrations"]);
});

it("makes the very columns that the entities describe", async () => {
  const source = await createDataSource(database.url, () => undefined).initialize();
  try {
    for (const { tableName, columns } of source.entityMetadatas) {
      const described = columns.map((column) => [
        column.databaseName,
        column.isArray ? "ARRAY" : source.driver.normalizeType(column),
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
