import { useSyncExternalStore } from "react";

const storageKey = "larkspan-voice";
const listeners = new Set<() => void>();
let chosen: string | null | undefined;

function current(): string | null {
  if (chosen === undefined) {
    try {
      chosen = window.localStorage.getItem(storageKey);
    } catch {
      chosen = null;
    }
  }
  return chosen;
}

/** Makes a voice the one that pages speak of, on this device. */
export function chooseVoice(id: string): void {
  chosen = id;
  try {
    window.localStorage.setItem(storageKey, id);
  } catch {
    // Storage may be shut off; the choice then lasts for this visit.
  }
  for (const listener of listeners) listener();
}

export function useChosenVoiceId(): string | null {
  return useSyncExternalStore((listener) => {
    listeners.add(listener);
    return () => void listeners.delete(listener);
  }, current);
}
