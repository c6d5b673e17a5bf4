import { differing, fileStem } from "@/features/api/fileStem";
import { printedPdf } from "@/features/api/printedPdf";
import type { Song } from "@/shared/contract/song";
import { songText } from "@/shared/songs/songExport";
import { writeSongsFile } from "./songsFile";

export type ExportFormat = "text" | "pdf" | "json";

export const exportFormats: readonly { value: ExportFormat; label: string; hint: string }[] = [
  { value: "text", label: "Text", hint: "Chords over words, for any program." },
  { value: "pdf", label: "PDF", hint: "To print, on A4." },
  { value: "json", label: "Larkspan file", hint: "Everything, with tune and tags, to bring back or hand on." },
];

/** A file ready to be saved. */
export interface ExportedFile {
  name: string;
  blob: Blob;
}

export interface ExportOptions {
  signal: AbortSignal;
  /** how many songs are done */
  onProgress?: (done: number) => void;
}

function chartPage({ title, chart, writtenKey }: Song, signal: AbortSignal): Promise<Blob> {
  const key = writtenKey ? { key: writtenKey } : null;
  return printedPdf("/charts/pdf", { title, chart, ...key, paper: "A4" }, signal);
}

const extensions = { text: "txt", pdf: "pdf" } as const;

/**
 * Makes one file of songs: the song itself where it is one, an archive of one file a song where they are several, and
 * always a single file where it is Larkspan's own.
 */
export async function exportSongs(
  songs: readonly Song[],
  format: ExportFormat,
  { signal, onProgress }: ExportOptions,
): Promise<ExportedFile> {
  const [first] = songs;
  if (!first) throw new RangeError("There is no song to export.");
  const stem = songs.length === 1 ? fileStem(first.title) : `Larkspan, ${songs.length} songs`;
  if (format === "json")
    return { name: `${stem}.larkspan.json`, blob: new Blob([writeSongsFile(songs)], { type: "application/json" }) };
  const files: Blob[] = [];
  for (const song of songs) {
    signal.throwIfAborted();
    files.push(format === "text" ? textOf(song) : await chartPage(song, signal));
    onProgress?.(files.length);
  }
  const extension = extensions[format];
  const [only] = files;
  if (only && files.length === 1) return { name: `${stem}.${extension}`, blob: only };
  const names = differing(songs.map((song) => fileStem(song.title))).map((name) => `${name}.${extension}`);
  return { name: `${stem}.zip`, blob: await archive(names, files) };
}

function textOf(song: Song): Blob {
  return new Blob([songText(song)], { type: "text/plain;charset=utf-8" });
}

async function archive(names: readonly string[], files: readonly Blob[]): Promise<Blob> {
  const { zip } = await import("fflate");
  const bytes = await Promise.all(files.map(async (file) => new Uint8Array(await file.arrayBuffer())));
  const entries = Object.fromEntries(names.map((name, index) => [name, bytes[index] ?? new Uint8Array()]));
  return new Promise((done, fail) => {
    zip(entries, { level: 6 }, (error, packed) => {
      if (error) fail(error);
      else done(new Blob([packed as Uint8Array<ArrayBuffer>], { type: "application/zip" }));
    });
  });
}
