import { useCallback, useEffect, useRef, useState } from "react";
import { saveFile } from "@/features/api/saveFile";
import { shelf } from "@/features/api/shelf";
import type { Song } from "@/shared/contract/song";
import { exportSongs, type ExportFormat } from "./exportSongs";

export interface ExportState {
  status: "idle" | "working" | "done" | "failed";
  done: number;
  total: number;
  /** the name of the file, or what went wrong */
  words: string;
}

const idle: ExportState = { status: "idle", done: 0, total: 0, words: "" };

/** Exports songs by their ids and says how far it is. */
export function useExport() {
  const [state, setState] = useState(idle);
  const running = useRef<AbortController | null>(null);
  useEffect(() => () => running.current?.abort(), []);

  const start = useCallback(async (ids: readonly string[], format: ExportFormat) => {
    running.current?.abort();
    const stop = new AbortController();
    running.current = stop;
    const say = (next: ExportState) => {
      if (!stop.signal.aborted) setState(next);
    };
    const total = ids.length;
    say({ status: "working", done: 0, total, words: "" });
    try {
      const songs = await songsOf(ids);
      const file = await exportSongs(songs, format, {
        signal: stop.signal,
        onProgress: (done) => say({ status: "working", done, total, words: "" }),
      });
      stop.signal.throwIfAborted();
      saveFile(file);
      say({ status: "done", done: total, total, words: file.name });
    } catch (error) {
      const words = error instanceof Error ? error.message : "Something went wrong.";
      say({ status: "failed", done: 0, total, words });
    }
  }, []);
  const cancel = useCallback(() => {
    running.current?.abort();
    setState(idle);
  }, []);
  return { state, start, cancel };
}

async function songsOf(ids: readonly string[]): Promise<Song[]> {
  const [only] = ids;
  if (only !== undefined && ids.length === 1) return [await shelf.get("songs", only)];
  const all = new Map((await shelf.list("songs")).map((song) => [song.id, song]));
  return ids.flatMap((id) => all.get(id) ?? []);
}
