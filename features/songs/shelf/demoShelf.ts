import { newId } from "@/features/api/newId";
import { session } from "@/features/api/session";
import { shelf } from "@/features/api/shelf";
import type { Song } from "@/shared/contract/song";
import { lazyReaders } from "../files/lazyReaders";

const mark = "larkspan.demo-songs";

/** Which address each demonstration song got on this device, and whether they were put there. */
interface Seeding {
  ids: Record<string, string>;
  done: boolean;
}

let running: Promise<void> | null = null;

/**
 * Puts the two demonstration songs on a visitor's shelf, once for this device: whoever takes them off, has them off.
 * Their ids are remembered before they are put, so that two tabs, or a try that broke off, make no second copies.
 */
export function seedDemoSongs(): Promise<void> {
  running ??= seed().finally(() => {
    running = null;
  });
  return running;
}

async function seed(): Promise<void> {
  const known = readMark();
  if (known === "refused" || known?.done || (await session.settled()).status !== "visitor") return;
  const [{ demoSongs }, { readMelodyFile }] = await Promise.all([lazyReaders.demoSongs(), lazyReaders.melodyFile()]);
  const ids = known?.ids ?? Object.fromEntries(demoSongs.map((song) => [song.id, newId()]));
  writeMark({ ids, done: false });
  for (const demo of demoSongs) {
    const read = readMelodyFile(`${demo.id}.abc`, new TextEncoder().encode(demo.abc));
    const notes = read.ok ? (read.voices[read.proposed]?.melody.notes ?? []) : [];
    const song: Song = {
      id: ids[demo.id] ?? newId(),
      title: demo.title,
      chart: demo.chart,
      writtenKey: demo.writtenKey,
      tune: notes.length > 0 ? { kind: "melody", notes, home: demo.writtenKey.tonic } : null,
      beatsPerBar: demo.beatsPerBar,
      tempo: demo.tempo,
      demo: demo.id,
      tags: [],
      archivedAt: null,
      playedAt: null,
      createdAt: new Date().toISOString(),
      revision: 0,
    };
    await shelf.put("songs", song);
  }
  writeMark({ ids, done: true });
}

function readMark(): Seeding | null | "refused" {
  try {
    return JSON.parse(localStorage.getItem(mark) ?? "null") as Seeding | null;
  } catch {
    return "refused";
  }
}

function writeMark(seeding: Seeding): void {
  localStorage.setItem(mark, JSON.stringify(seeding));
}
