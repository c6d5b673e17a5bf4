import { z } from "zod";
import { song, tonicName } from "./song";

/**
 * What a list needs to know of a song: everything to show, sort and judge it by, without its chart and notes.
 * Cheap enough to fetch all of a large shelf, page by page, and sort it by key or by fit for a voice.
 */
const songListing = z.strictObject({
  ...song.pick({ id: true, title: true, writtenKey: true, beatsPerBar: true, tempo: true, demo: true, tags: true })
    .shape,
  ...song.pick({ archivedAt: true, playedAt: true, createdAt: true, revision: true }).shape,
  /** lowest and highest note of the tune and its home note; null without a tune */
  span: z.strictObject({ lowMidi: z.number(), highMidi: z.number(), home: tonicName }).nullable(),
  /** how the words of the chart begin, at most 80 characters; "" without words */
  firstWords: z.string(),
});
export type SongListing = z.infer<typeof songListing>;

/** How a shelf is ordered: by title; by when a song was last played, latest first; by when it was made, newest first. */
export const songOrder = z.enum(["title", "played", "saved"]);
export type SongOrder = z.infer<typeof songOrder>;

/** Which songs to list. As in an address, everything is text. */
export const songPageQuery = z.strictObject({
  /** words that must all be found, each anywhere in title, tags or words of the chart, whatever the case and accents */
  q: z.string().max(200, "Search for at most 200 characters.").default(""),
  /** only songs with this tag, whatever the case */
  tag: z.string().max(40).exactOptional(),
  /** "false": those on the shelf, "true": those put aside */
  archived: z.enum(["false", "true", "all"]).default("false"),
  sort: songOrder.default("title"),
  limit: z.coerce.number("Give a whole number from 1 to 200.").int().min(1).max(200).default(50),
  /** `next` of the page before; good only with the same order */
  cursor: z.string().max(2000).exactOptional(),
});

/** A part of a list. `total` counts all that were found; `next` leads on, and is null on the last page. */
export const songPage = z.strictObject({
  items: z.array(songListing),
  next: z.string().nullable(),
  total: z.int().min(0),
});
export type SongPage = z.infer<typeof songPage>;

/** A tag, in its most frequent spelling, and how many songs on the shelf have it. */
export const songTag = z.strictObject({ tag: z.string(), count: z.int().min(1) });
export type SongTag = z.infer<typeof songTag>;
