import { z } from "zod";
import { song } from "./song";

/** What a file says of one song: everything but its place on a shelf. */
export const exportedSong = song.omit({ id: true, demo: true, revision: true });
export type ExportedSong = z.infer<typeof exportedSong>;

/** The frame of a file of songs; its songs are read one by one, so that a bad one does not cost the others. */
export const songExport = z.object({
  format: z.literal("larkspan-songs"),
  version: z.int().min(1),
  songs: z.array(z.unknown()).max(5000, "A file may hold at most 5,000 songs."),
});

/** Files are written in this version; older ones are read too. */
export const songExportVersion = 1;
