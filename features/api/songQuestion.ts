import type { SongOrder } from "@/shared/contract/songListing";

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
