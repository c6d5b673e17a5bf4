import { useSyncExternalStore } from "react";

const storageKey = "larkspan.trial-instruments";
const listeners = new Set<() => void>();
let known: Record<string, string> | null = null;

/** Instruments tried with a song, kept while this tab is open: a try makes nothing one's own. */
function current(): Record<string, string> {
  if (known === null) {
    try {
      known = readTrials(sessionStorage.getItem(storageKey));
    } catch {
      known = {};
    }
  }
  return known;
}

/** Trials as they were kept, by song; none where they cannot be read. */
export function readTrials(text: string | null): Record<string, string> {
  try {
    const kept: unknown = JSON.parse(text ?? "{}");
    if (typeof kept !== "object" || kept === null) return {};
    return Object.fromEntries(
      Object.entries(kept).filter((entry): entry is [string, string] => typeof entry[1] === "string"),
    );
  } catch {
    return {};
  }
}

export function tryInstrument(songId: string, instrumentId: string): void {
  known = { ...current(), [songId]: instrumentId };
  try {
    sessionStorage.setItem(storageKey, JSON.stringify(known));
  } catch {
    // Storage may be shut off; the trial then lasts until the page is loaded anew.
  }
  for (const listener of [...listeners]) listener();
}

/** The instrument tried with a song; null where none is. */
export function useTrial(songId: string): string | null {
  const trials = useSyncExternalStore((listener) => {
    listeners.add(listener);
    return () => void listeners.delete(listener);
  }, current);
  return trials[songId] ?? null;
}
