import { z } from "zod";
import { decision } from "./decision";
import { song, tonicName } from "./song";

/** What a link opens with: the sounding key, and the way of playing it where that is on a preset instrument. */
const sheetView = z.strictObject({
  tonic: tonicName,
  /** semitones from the tune as written, octave included */
  shift: decision.shape.shift,
  /** id of a preset; an own instrument is nobody else's business */
  instrument: z.string().max(80).nullable(),
  way: decision.shape.way,
});

const label = z.string().trim().max(60, "A label may have at most 60 characters.");

/** What a link is made from. */
export const sheetLinkRequest = z.strictObject({
  songId: z.uuid(),
  /** for its owner only: "for the band" */
  label,
  days: z.union([z.literal(7), z.literal(30), z.literal(90)]),
  view: sheetView,
});
export type SheetLinkRequest = z.infer<typeof sheetLinkRequest>;

/** A link as its owner sees it. Its address is told once, when it is made; only a hash of it is kept. */
export const sheetLink = z.strictObject({
  id: z.uuid(),
  songId: z.uuid(),
  label,
  view: sheetView,
  createdAt: z.iso.datetime(),
  expiresAt: z.iso.datetime(),
  revokedAt: z.iso.datetime().nullable(),
  /** when it was last opened; null for never */
  openedAt: z.iso.datetime().nullable(),
});
export type SheetLink = z.infer<typeof sheetLink>;

/** The answer to making one: the link, and the secret part of its address. */
export const madeSheetLink = z.strictObject({ link: sheetLink, token: z.string() });
export type MadeSheetLink = z.infer<typeof madeSheetLink>;

/** Which links are asked for. */
export const sheetLinkQuery = z.strictObject({
  songId: z.uuid().describe("Only the links of this song.").exactOptional(),
});

/** What anybody sees who has the link: the song as it is now, and nothing else of the account. */
export const sharedSheet = z.strictObject({
  title: song.shape.title,
  chart: song.shape.chart,
  writtenKey: song.shape.writtenKey,
  beatsPerBar: song.shape.beatsPerBar,
  tempo: song.shape.tempo,
  view: sheetView,
  expiresAt: z.iso.datetime(),
});
export type SharedSheet = z.infer<typeof sharedSheet>;
