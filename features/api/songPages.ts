import type { SongPage, SongTag } from "@/shared/contract/songListing";
import { deviceSongs } from "./deviceSongs";
import { http } from "./httpClient";
import { session } from "./session";
import type { SongQuestion } from "./songQuestion";

const isSignedIn = async () => (await session.settled()).status === "signed-in";

function addressOf({ q, tag, archived, sort, limit, cursor }: SongQuestion): string {
  const search = new URLSearchParams();
  if (q !== undefined && q.trim() !== "") search.set("q", q.trim());
  if (tag) search.set("tag", tag);
  if (archived !== undefined) search.set("archived", String(archived));
  if (sort !== undefined) search.set("sort", sort);
  if (limit !== undefined) search.set("limit", String(limit));
  if (cursor) search.set("cursor", cursor);
  const query = search.toString();
  return query === "" ? "/songs/page" : `/songs/page?${query}`;
}

/** Songs in pages, without their charts and notes, from the account of the signed-in or from this device. */
export const songPages = {
  async get(question: SongQuestion = {}): Promise<SongPage> {
    return (await isSignedIn()) ? http.get(addressOf(question)) : deviceSongs.page(question);
  },
  /** The tags of the songs that are not put aside, the most frequent first. */
  async tags(): Promise<SongTag[]> {
    return (await isSignedIn()) ? http.get("/songs/tags") : deviceSongs.tags();
  },
};
