import type { DataSource } from "typeorm";
import type { z } from "zod";
import type { SongListing, SongOrder, SongPage, songPageQuery, SongTag } from "../../shared/contract/songListing";
import { searchWords } from "../../shared/songs/songSearch";
import { tagKey } from "./listingColumns";
import { readCursor, writeCursor } from "./songCursor";

/** What each order sorts by, and which way. Text that begins every list tells that an instant is missing. */
const orders: Record<SongOrder, { key: string; type: string; way: "ASC" | "DESC" }> = {
  title: { key: "title_key", type: "text", way: "ASC" },
  played: { key: "coalesce(played_at, '-infinity')", type: "timestamptz", way: "DESC" },
  saved: { key: "created_at", type: "timestamptz", way: "DESC" },
};

interface Shown {
  total: number;
  id: string;
  title: string;
  written_key: SongListing["writtenKey"];
  beats_per_bar: number | null;
  tempo: number | null;
  demo: string | null;
  tags: string[];
  archived_at: Date | null;
  played_at: Date | null;
  created_at: Date;
  revision: number;
  span: SongListing["span"];
  first_words: string;
  place: string;
}
type Row = Shown | { total: number; id: null };

const columns = `songs.id, title, written_key, beats_per_bar, tempo, demo, tags, archived_at, played_at, created_at, revision,
  span, first_words`;

/** A person's songs as lists show them. */
export class SongPagesService {
  constructor(private readonly dataSource: DataSource) {}

  async page(userId: string, question: z.output<typeof songPageQuery>): Promise<SongPage> {
    const { sort, limit, cursor } = question;
    const { key, type, way } = orders[sort];
    const values: unknown[] = [userId];
    const bind = (value: unknown) => `$${values.push(value)}`;
    const found = conditions(question, bind).join(" AND ");
    const after = cursor === undefined ? null : readCursor(cursor, sort);
    const beyond = after
      ? `WHERE (key, id) ${way === "ASC" ? ">" : "<"} (${bind(after.key)}::${type}, ${bind(after.id)}::uuid)`
      : "";
    const order = `ORDER BY key ${way}, id ${way}`;
    // Looks through the songs once, for their number and for the page; the number is there on an empty page as well.
    const rows: Row[] = await this.dataSource.query(
      `WITH found AS MATERIALIZED (SELECT id, ${key} AS key FROM songs WHERE ${found}),
       page AS (SELECT id, key FROM found ${beyond} ${order} LIMIT ${bind(limit + 1)}),
       shown AS (SELECT ${columns}, key, key::text AS place FROM page JOIN songs USING (id))
       SELECT (SELECT count(*)::int FROM found) AS total, shown.*
       FROM (SELECT) AS always LEFT JOIN shown ON true ${order}`,
      values,
    );
    const total = rows[0]?.total ?? 0;
    const songs = rows.filter((row): row is Shown => row.id !== null);
    const shown = songs.slice(0, limit);
    const last = shown.at(-1);
    return {
      items: shown.map(toListing),
      next: last && songs.length > limit ? writeCursor({ sort, key: last.place, id: last.id }) : null,
      total,
    };
  }

  async tags(userId: string): Promise<SongTag[]> {
    return this.dataSource.query(
      `SELECT mode() WITHIN GROUP (ORDER BY tag COLLATE "C") AS tag, count(*)::int AS count
       FROM songs, unnest(tags, tag_keys) AS named (tag, key)
       WHERE user_id = $1 AND archived_at IS NULL
       GROUP BY key ORDER BY count(*) DESC, key COLLATE "C"`,
      [userId],
    );
  }
}

function conditions({ q, tag, archived }: z.output<typeof songPageQuery>, bind: (value: unknown) => string): string[] {
  const words = searchWords(q).map((word) => `%${word}%`);
  return [
    "user_id = $1",
    ...(archived === "all" ? [] : [`archived_at IS ${archived === "true" ? "NOT NULL" : "NULL"}`]),
    ...(tag === undefined ? [] : [`${bind(tagKey(tag))} = ANY (tag_keys)`]),
    // Folded words hold letters and digits only, nothing that LIKE would read as a sign.
    ...(words.length === 0 ? [] : [`search_text LIKE ALL (${bind(words)}::text[])`]),
  ];
}

function toListing(row: Shown): SongListing {
  return {
    id: row.id,
    title: row.title,
    writtenKey: row.written_key,
    beatsPerBar: row.beats_per_bar,
    tempo: row.tempo,
    demo: row.demo,
    tags: row.tags,
    archivedAt: row.archived_at?.toISOString() ?? null,
    playedAt: row.played_at?.toISOString() ?? null,
    createdAt: row.created_at.toISOString(),
    revision: row.revision,
    span: row.span,
    firstWords: row.first_words,
  };
}
