import { deviceShelf } from "./deviceShelf";
import type { Collection, Items } from "./items";

/** How many of each. */
export type Counts = Record<Collection, number>;

/** Everything this device keeps. `untouched` are the demonstration songs nobody changed, decided a key for, tried, gave players or arranged. */
export interface Belongings {
  items: { [C in Collection]: Items[C][] };
  untouched: ReadonlySet<string>;
}

/** Reads the whole device shelf. */
export async function readBelongings(): Promise<Belongings> {
  const [voices, takes, songs, decisions, tries, instruments, wishes, lineUps, arrangements] = await Promise.all([
    deviceShelf.list("voices"),
    deviceShelf.list("takes"),
    deviceShelf.list("songs"),
    deviceShelf.list("decisions"),
    deviceShelf.list("tries"),
    deviceShelf.list("instruments"),
    deviceShelf.list("wishes"),
    deviceShelf.list("line-ups"),
    deviceShelf.list("arrangements"),
  ]);
  const decided = new Set([...decisions, ...tries, ...lineUps, ...arrangements].map(({ songId }) => songId));
  const untouched = new Set<string>();
  for (const song of songs) if (!decided.has(song.id) && (await deviceShelf.isAsSeeded(song))) untouched.add(song.id);
  return {
    items: { voices, takes, songs, decisions, tries, instruments, wishes, "line-ups": lineUps, arrangements },
    untouched,
  };
}

/** What the person did on this device, without the demonstration as it came. */
export async function countBelongings(): Promise<Counts> {
  const { items, untouched } = await readBelongings();
  return {
    voices: items.voices.length,
    takes: items.takes.length,
    songs: items.songs.length - untouched.size,
    decisions: items.decisions.length,
    tries: items.tries.length,
    instruments: items.instruments.length,
    wishes: items.wishes.length,
    "line-ups": items["line-ups"].length,
    arrangements: items.arrangements.length,
  };
}
