import type { Song } from "../../shared/contract/song";
import type { SongListing } from "../../shared/contract/songListing";
import { firstWords, foldText, searchText } from "../../shared/songs/songSearch";
import { tuneSpan } from "../../shared/songs/tuneSpan";

export type KeptColumns = Pick<Song, "title" | "chart" | "tune" | "tags">;

/** What lists find, sort and show a song by, worked out when it is kept. */
export interface ListingColumns {
  titleKey: string;
  tagKeys: string[];
  searchText: string;
  firstWords: string;
  span: SongListing["span"];
}

/** Tags are the same whatever their case. */
export const tagKey = (tag: string) => tag.toLowerCase();

export function listingColumns({ title, chart, tune, tags }: KeptColumns): ListingColumns {
  return {
    // Cursors carry it, and some signs unfold into many letters.
    titleKey: foldText(title).slice(0, 200),
    tagKeys: tags.map(tagKey),
    searchText: searchText({ title, tags, chart }),
    firstWords: firstWords(chart),
    span: tuneSpan(tune),
  };
}
