import type { Song } from "@/shared/contract/song";
import type { SongListing, SongOrder, SongPage, SongTag } from "@/shared/contract/songListing";
import { firstWords, foldText, searchText, searchWords } from "@/shared/songs/songSearch";
import { tuneSpan } from "@/shared/songs/tuneSpan";
import { ApiError } from "./apiError";
import { deviceShelf } from "./deviceShelf";
import type { SongQuestion } from "./songQuestion";

/** A listing with what it is found and sorted by. */
interface Listed {
  song: Song;
  listing: SongListing;
  text: string;
  title: string;
  tags: string[];
}

const tagKey = (tag: string) => tag.toLowerCase();

type Place = [key: string, id: string];

/** What was worked out of each song when it was last read; charts are slow to read, and most stay as they are. */
let known = new Map<string, Listed>();

function listed(song: Song): Listed {
  const before = known.get(song.id);
  if (before?.song.revision === song.revision && before.song.chart === song.chart) return before;
  const { tune, chart, ...facts } = song;
  return {
    song,
    listing: { ...facts, span: tuneSpan(tune), firstWords: firstWords(chart) },
    text: searchText(song),
    title: foldText(song.title),
    tags: song.tags.map(tagKey),
  };
}

/** What a song is sorted by, as the server does it: titles upwards, instants downwards. */
function keyOf({ listing, title }: Listed, sort: SongOrder): string {
  if (sort === "title") return title;
  const instant = sort === "saved" ? listing.createdAt : listing.playedAt;
  return instant === null ? "" : new Date(instant).toISOString();
}

function inOrder(sort: SongOrder): (a: Place, b: Place) => number {
  const compare = (x: string, y: string) => (x < y ? -1 : x > y ? 1 : 0);
  const along = ([a, idA]: Place, [b, idB]: Place) => compare(a, b) || compare(idA, idB);
  return sort === "title" ? along : (a, b) => along(b, a);
}

function readCursor(cursor: string, sort: SongOrder): Place {
  try {
    const [order, key, id] = JSON.parse(cursor) as unknown[];
    if (order === sort && typeof key === "string" && typeof id === "string") return [key, id];
  } catch {
    // Told below, like any other cursor that leads nowhere.
  }
  throw new ApiError(422, "invalid", "This list has changed. Begin at its top again.");
}

function listAll(songs: readonly Song[]): Listed[] {
  const entries = songs.map(listed);
  known = new Map(entries.map((entry) => [entry.song.id, entry]));
  return entries;
}

/** One page of these songs, found and sorted as the server does it. */
export function pageOfSongs(
  songs: readonly Song[],
  { q = "", tag, archived = false, sort = "title", limit = 50, cursor }: SongQuestion,
): SongPage {
  const words = searchWords(q);
  const wanted = tag ? tagKey(tag) : null;
  const order = inOrder(sort);
  const found = listAll(songs)
    .filter(({ listing }) => archived === "all" || (listing.archivedAt !== null) === archived)
    .filter(({ tags }) => wanted === null || tags.includes(wanted))
    .filter(({ text }) => words.every((word) => text.includes(word)))
    .map((entry) => ({ entry, place: [keyOf(entry, sort), entry.listing.id] as Place }))
    .sort((a, b) => order(a.place, b.place));
  const after = cursor ? readCursor(cursor, sort) : null;
  const rest = after ? found.filter(({ place }) => order(place, after) > 0) : found;
  const items = rest.slice(0, limit);
  const last = items.at(-1);
  return {
    items: items.map(({ entry }) => entry.listing),
    next: last && rest.length > items.length ? JSON.stringify([sort, ...last.place]) : null,
    total: found.length,
  };
}

/** The tags of these songs, the most frequent first. */
export function tagsOfSongs(songs: readonly Song[]): SongTag[] {
  const spellings = new Map<string, Map<string, number>>();
  for (const { listing } of listAll(songs))
    for (const tag of listing.archivedAt === null ? listing.tags : []) {
      const counts = spellings.get(tagKey(tag)) ?? new Map<string, number>();
      spellings.set(tagKey(tag), counts.set(tag, (counts.get(tag) ?? 0) + 1));
    }
  return [...spellings]
    .map(([key, counts]) => {
      const [usual] = [...counts].sort(([a, x], [b, y]) => y - x || (a < b ? -1 : 1));
      return { key, tag: usual?.[0] ?? key, count: [...counts.values()].reduce((sum, count) => sum + count, 0) };
    })
    .sort((a, b) => b.count - a.count || (a.key < b.key ? -1 : 1))
    .map(({ tag, count }) => ({ tag, count }));
}

/** The songs of a visitor in pages: the same answers as the server gives, worked out on this device. */
export const deviceSongs = {
  page: async (question: SongQuestion) => pageOfSongs(await deviceShelf.list("songs"), question),
  tags: async () => tagsOfSongs(await deviceShelf.list("songs")),
};
