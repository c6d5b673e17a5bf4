import type { Song } from "@/shared/contract/song";
import { exportedSong, songExport, songExportVersion, type ExportedSong } from "@/shared/contract/songExport";

/** A song of a file, or why it cannot be read. */
export type FileSong = { ok: true; song: ExportedSong } | { ok: false; title: string | null; reason: string };

/** Songs as the text of a Larkspan file. */
export function writeSongsFile(songs: readonly Song[]): string {
  const entries = songs.map((song): ExportedSong => {
    const { title, chart, writtenKey, tune, beatsPerBar, tempo, tags, archivedAt, playedAt, createdAt } = song;
    return { title, chart, writtenKey, tune, beatsPerBar, tempo, tags, archivedAt, playedAt, createdAt };
  });
  return `${JSON.stringify({ format: "larkspan-songs", version: songExportVersion, songs: entries }, null, 1)}\n`;
}

/** Reads a Larkspan file. Its songs are judged one by one, so that a bad one does not cost the others. */
export function readSongsFile(text: string): { ok: true; songs: FileSong[] } | { ok: false; reason: string } {
  let data: unknown;
  try {
    data = JSON.parse(text.replace(/^\uFEFF/, ""));
  } catch {
    return { ok: false, reason: "This is no whole JSON file; it may have been cut off." };
  }
  const frame = songExport.safeParse(data);
  if (!frame.success) return { ok: false, reason: "This JSON file holds no songs of Larkspan." };
  if (frame.data.version > songExportVersion)
    return { ok: false, reason: "This file comes from a newer Larkspan. Reload the page and try again." };
  if (frame.data.songs.length === 0) return { ok: false, reason: "This file holds no songs." };
  return { ok: true, songs: frame.data.songs.map(readSong) };
}

function readSong(entry: unknown): FileSong {
  const read = exportedSong.safeParse(entry);
  if (read.success) return { ok: true, song: read.data };
  const title = (entry as { title?: unknown } | null)?.title;
  const [issue] = read.error.issues;
  const place = issue && issue.path.length > 0 ? ` (${issue.path.join(".")})` : "";
  return {
    ok: false,
    title: typeof title === "string" && title.trim() !== "" ? title.trim().slice(0, 200) : null,
    reason: `It does not hold what a song needs${place}.`,
  };
}
