import { deviceShelf } from "@/features/api/deviceShelf";
import { newId } from "@/features/api/newId";
import { session } from "@/features/api/session";

import type { Song } from "@/shared/contract/song";
import type { DemoSong } from "@/shared/songs/demo/demoSong";
import { earlierCharts } from "@/shared/songs/demo/earlierCharts";
import { lazyReaders } from "../files/lazyReaders";

const mark = "larkspan.demo-songs";

/** Which address each demonstration song got on this device, and which of them are still to be put there. */
interface Seeding {
  ids: Record<string, string>;
  done: boolean;
  /** absent in marks from the time of the first two songs: all of `ids`, unless done */
  left?: string[];
}

let running: Promise<void> | null = null;

/**
 * Puts the demonstration songs on a visitor's shelf, each once for this device: whoever takes one off, has it off, and
 * a song that joins the demonstration later comes alone. Their ids are remembered before they are put, so that two
 * tabs, or a try that broke off, make no second copies.
 */
export function seedDemoSongs(): Promise<void> {
  running ??= seed().finally(() => {
    running = null;
  });
  return running;
}

async function seed(): Promise<void> {
  const known = readMark();
  if (known === "refused" || (await session.settled()).status !== "visitor") return;
  const { demoSongs } = await lazyReaders.demoSongs();
  const fresh = demoSongs.filter(({ id }) => known?.ids[id] === undefined).map(({ id }) => id);
  const before = known?.done === false ? (known.left ?? Object.keys(known.ids)) : [];
  let left: string[] = [...before, ...fresh];
  if (left.length === 0) return;
  const ids = { ...known?.ids, ...Object.fromEntries(fresh.map((id) => [id, newId()])) };
  writeMark({ ids, done: false, left });
  for (const demo of demoSongs) {
    const id = ids[demo.id];
    if (id === undefined || !left.includes(demo.id)) continue;
    const song = songOf(demo, id);
    const states = earlierCharts(demo, Date.now()).map(({ chart, savedAt }) => ({
      savedAt,
      by: "the evening class",
      song: { ...song, chart },
    }));
    await deviceShelf.seed(song, states);
    left = left.filter((each) => each !== demo.id);
    writeMark({ ids, done: left.length === 0, left });
  }
}

function songOf(demo: DemoSong, id: string): Song {
  const notes = demo.notes.map((note) => ({ ...note }));
  return {
    id,
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
