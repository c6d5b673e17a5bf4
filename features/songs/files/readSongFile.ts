import type { MelodyFile } from "@/shared/songs/melodyFile";
import { lazyReaders } from "./lazyReaders";

/** What a melody file holds, or why it is not read. */
export type SongFile = MelodyFile;

export interface ReadingOptions {
  /** ends the reading; the promise is then rejected with the signal's reason */
  signal?: AbortSignal;
  /** how long one file may take */
  patienceMs?: number;
}

const largest = 5_000_000;
const unopened: SongFile = {
  ok: false,
  reason: "The file could not be opened here. What you typed is safe; check your connection and try again.",
};

/**
 * Reads a melody file (MIDI, MusicXML, .mxl or ABC) of at most 5 MB, beside the page, so that the page never waits.
 * Each file has a worker of its own, which is ended when it takes too long or is no longer wanted.
 */
export async function readSongFile(
  file: File,
  { signal, patienceMs = 15_000 }: ReadingOptions = {},
): Promise<SongFile> {
  if (signal?.aborted) throw signal.reason;
  if (file.size > largest)
    return {
      ok: false,
      reason: "This file is larger than 5 MB. A melody is seldom larger than a few kB; choose another file.",
    };
  if (file.size === 0) return { ok: false, reason: "This file is empty. Choose another one." };
  let bytes: ArrayBuffer;
  try {
    bytes = await file.arrayBuffer();
  } catch {
    return unopened;
  }
  if (signal?.aborted) throw signal.reason;
  if (typeof Worker === "undefined") return readHere(file.name, bytes);
  return readBeside(file.name, bytes, patienceMs, signal);
}

async function readHere(name: string, bytes: ArrayBuffer): Promise<SongFile> {
  try {
    const { readMelodyFile } = await lazyReaders.melodyFile();
    return readMelodyFile(name, new Uint8Array(bytes));
  } catch {
    return unopened;
  }
}

function readBeside(
  name: string,
  bytes: ArrayBuffer,
  patienceMs: number,
  signal: AbortSignal | undefined,
): Promise<SongFile> {
  // The worker is bundled apart (metro.config.js), because Metro moves what it shares with a page out of its reach.
  const worker = new Worker("/worklets/songFileWorker.js");
  return new Promise<SongFile>((done, fail) => {
    const close = () => {
      clearTimeout(clock);
      signal?.removeEventListener("abort", giveUp);
      worker.terminate();
    };
    const end = (result: SongFile) => {
      close();
      done(result);
    };
    const giveUp = () => {
      close();
      fail(signal?.reason as Error);
    };
    const clock = setTimeout(() => {
      const seconds = Math.round(patienceMs / 1000);
      end({
        ok: false,
        reason: `Reading took longer than ${seconds} seconds, so it was ended. Choose a smaller file.`,
      });
    }, patienceMs);
    signal?.addEventListener("abort", giveUp);
    worker.onmessage = ({ data }: MessageEvent<SongFile>) => end(data);
    worker.onerror = () => end(unopened);
    worker.postMessage({ name, bytes }, [bytes]);
  });
}
