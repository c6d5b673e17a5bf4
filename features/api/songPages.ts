import type { SongOrder, SongPage, SongTag } from "@/shared/contract/songListing";
import { deviceSongs } from "./deviceSongs";
import { http } from "./httpClient";
import { session } from "./session";

/** Which songs to list. Left out: all that stand on the shelf, by title, 50 to a page. */
export interface SongQuestion {
  /** words that must all be found in title, tags or words of the chart */
  q?: string;
  tag?: string | null;
  /** true: those put aside; "all": both */
  archived?: boolean | "all";
  sort?: SongOrder;
  /** 1 to 200 */
  limit?: number;
  /** `next` of the page before */
  cursor?: string | null;
}

const isSignedIn = async () => (await session.settled()).status === "signed-in";

function addressOf({ q, tag, archived, sort, limit, cursor }: SongQuestion): string {
  const search = new URLSearchParams();
  if (q !== undefined && q.trim() !== "") search.set("q", q.trim());
  if (tag) search.set("tag", tag);
  if (archived !== undefined) search.set("archived", String(archived));
  if (sort !== undefined) search.set("sort", sort);
  if (limit !== undefined) search.set("limit", String(limit));
  if (cursor) search.set("cursor", cursor);
  return search.size > 0 ? `/songs/page?${search}` : "/songs/page";
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
