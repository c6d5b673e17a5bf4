import type { Counts } from "@/features/api/belongings";
import type { Collection } from "@/features/api/items";
import { listWords } from "@/shared/music/listWords";

const words: Record<Collection, readonly [one: string, many: string]> = {
  voices: ["voice", "voices"],
  takes: ["take", "takes"],
  songs: ["song", "songs"],
  decisions: ["chosen key", "chosen keys"],
  tries: ["tried key", "tried keys"],
  instruments: ["instrument", "instruments"],
  wishes: ["set of wishes", "sets of wishes"],
  "line-ups": ["line-up", "line-ups"],
  arrangements: ["arrangement", "arrangements"],
};

/** "1 voice, 3 takes and 2 songs"; null where there is nothing. */
export function belongingsInWords(counts: Counts): string | null {
  const parts = (Object.keys(words) as Collection[])
    .filter((name) => counts[name] > 0)
    .map((name) => `${counts[name]} ${words[name][counts[name] === 1 ? 0 : 1]}`);
  return parts.length === 0 ? null : listWords(parts);
}
