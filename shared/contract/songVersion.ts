import { z } from "zod";
import { song } from "./song";

/** An earlier state of a song: when it was saved, and by whom (an e-mail address; "" on a visitor's device). */
export const songVersion = z.strictObject({
  id: z.uuid(),
  savedAt: z.iso.datetime(),
  by: z.string(),
  song,
});
export type SongVersion = z.infer<typeof songVersion>;

/** The same without the song, for lists. */
export const songVersionEntry = z.strictObject({ ...songVersion.omit({ song: true }).shape, title: z.string() });
export type SongVersionEntry = z.infer<typeof songVersionEntry>;
