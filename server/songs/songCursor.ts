import { z } from "zod";
import { type SongOrder, songOrder } from "../../shared/contract/songListing";
import { HttpProblem } from "../http/httpProblem";

/** The last song of a page: what it was sorted by, as the database writes it, and its id. */
interface Place {
  sort: SongOrder;
  key: string;
  id: string;
}

const instant = /^(-infinity|\d{4,6}-\d\d-\d\d \d\d:\d\d:\d\d(\.\d{1,6})?[+-]\d\d(:\d\d){0,2}( BC)?)$/;
const place = z
  .tuple([
    songOrder,
    z
      .string()
      .max(1000)
      .refine((key) => !key.includes("\u0000")),
    z.uuid(),
  ])
  .refine(([sort, key]) => sort === "title" || instant.test(key));

export function writeCursor({ sort, key, id }: Place): string {
  return Buffer.from(JSON.stringify([sort, key, id])).toString("base64url");
}

/** A place is a position in the order, not a number of songs, so that songs added meanwhile shift nothing. */
export function readCursor(cursor: string, sort: SongOrder): Pick<Place, "key" | "id"> {
  const read = place.safeParse(parseJson(Buffer.from(cursor, "base64url").toString("utf8")));
  if (!read.success || read.data[0] !== sort) {
    throw new HttpProblem(422, "invalid", "This page cannot be found. Begin at the first one.", [
      { path: "cursor", message: "Give the `next` of a page in the same order." },
    ]);
  }
  const [, key, id] = read.data;
  return { key, id };
}

function parseJson(text: string): unknown {
  try {
    return JSON.parse(text);
  } catch {
    return null;
  }
}
