import { ApiError } from "@/features/api/apiError";
import { newId } from "@/features/api/newId";
import { shelf } from "@/features/api/shelf";
import type { Song } from "@/shared/contract/song";
import { readIncoming, type Incoming } from "./incoming";
import { contentSign } from "./sameSong";

/** What became of one song of a file. */
export type ImportResult = { file: string; title: string | null } & (
  | { outcome: "imported"; id: string; cautions: readonly string[] }
  | { outcome: "known"; id: string; as: string }
  | { outcome: "refused"; reason: string }
);

export interface ImportProgress {
  status: "reading" | "keeping" | "done" | "cancelled";
  /** files read, and songs kept, of how many */
  done: number;
  total: number;
  /** the file or song that is being worked on */
  at: string;
  results: readonly ImportResult[];
}

/** A song that is read and not kept yet; `at` is its place among the results. */
interface Waiting {
  at: number;
  song: Song;
}

/**
 * Imports files: reads all of them first, then keeps their songs one by one. A song with the words, chords and tune of
 * one that is there already is not kept twice. When it is ended, what it kept is taken off again.
 *
 * @returns the last progress; never rejects
 */
export async function importFiles(
  files: readonly File[],
  signal: AbortSignal,
  onProgress: (progress: ImportProgress) => void,
): Promise<ImportProgress> {
  const results: ImportResult[] = [];
  const kept: string[] = [];
  const say = (status: ImportProgress["status"], done: number, total: number, at: string): ImportProgress => {
    const progress = { status, done, total, at, results: [...results] };
    onProgress(progress);
    return progress;
  };
  try {
    say("reading", 0, files.length, files[0]?.name ?? "");
    const signs = await knownSigns();
    const waiting: Waiting[] = [];
    for (const [index, file] of files.entries()) {
      say("reading", index, files.length, file.name);
      for (const incoming of await readIncoming(file, signal, new Date())) {
        if (incoming.ok) sort(file.name, incoming, signs, results, waiting);
        else results.push({ file: file.name, title: incoming.title, outcome: "refused", reason: incoming.reason });
      }
      await turn();
      signal.throwIfAborted();
    }
    for (const [index, { at, song }] of waiting.entries()) {
      say("keeping", index, waiting.length, song.title);
      signal.throwIfAborted();
      try {
        await shelf.put("songs", song);
        kept.push(song.id);
      } catch (error) {
        const reason =
          error instanceof ApiError ? (error.fields[0]?.message ?? error.message) : "It could not be kept.";
        results[at] = { file: results[at]?.file ?? "", title: song.title, outcome: "refused", reason };
      }
      signal.throwIfAborted();
    }
    return say("done", files.length, files.length, "");
  } catch (error) {
    if (!signal.aborted) {
      const reason = error instanceof ApiError ? error.message : "It could not be read here.";
      for (const file of files.slice(new Set(results.map((each) => each.file)).size))
        results.push({ file: file.name, title: null, outcome: "refused", reason });
      return say("done", files.length, files.length, "");
    }
    for (const id of kept) await shelf.remove("songs", id).catch(() => undefined);
    results.length = 0;
    return say("cancelled", 0, files.length, "");
  }
}

/** What stands on the shelf already, and what is put aside, by its content. */
async function knownSigns(): Promise<Map<string, { id: string; title: string }>> {
  return new Map(
    (await shelf.list("songs")).map(({ id, title, ...song }) => [contentSign({ title, ...song }), { id, title }]),
  );
}

function sort(
  file: string,
  { song: content, cautions = [] }: Extract<Incoming, { ok: true }>,
  signs: Map<string, { id: string; title: string }>,
  results: ImportResult[],
  waiting: Waiting[],
): void {
  const sign = contentSign(content);
  const same = signs.get(sign);
  if (same) {
    results.push({ file, title: content.title, outcome: "known", id: same.id, as: same.title });
    return;
  }
  const song: Song = { ...content, id: newId(), demo: null, revision: 0 };
  signs.set(sign, { id: song.id, title: song.title });
  results.push({ file, title: song.title, outcome: "imported", id: song.id, cautions });
  waiting.push({ at: results.length - 1, song });
}

/** Lets the page draw and hear a press on Cancel. */
function turn(): Promise<void> {
  return new Promise((done) => setTimeout(done, 0));
}
