import { useState } from "react";
import { readSingers, type Singer } from "./singers";

const keyOf = (songId: string) => `larkspan.together.${songId}`;
const lastKey = "larkspan.together.last";

/** Who sings a song together, as this device remembers it. */
export interface RememberedSingers {
  singers: Singer[];
  /** the group that was put together last, for any song; empty where there was none */
  last: Singer[];
  keep: (singers: Singer[]) => void;
}

export function useRememberedSingers(songId: string): RememberedSingers {
  const [singers, setSingers] = useState(() => readSingers(stored(keyOf(songId))));
  const [last] = useState(() => readSingers(stored(lastKey)));
  return {
    singers,
    last,
    keep: (next) => {
      setSingers(next);
      store(keyOf(songId), next);
      if (next.length > 1) store(lastKey, next);
    },
  };
}

function stored(key: string): string | null {
  try {
    return window.localStorage.getItem(key);
  } catch {
    return null;
  }
}

function store(key: string, singers: readonly Singer[]): void {
  try {
    if (singers.length === 0) window.localStorage.removeItem(key);
    else window.localStorage.setItem(key, JSON.stringify(singers));
  } catch {
    // Storage may be shut off; the group then lasts for this visit.
  }
}
