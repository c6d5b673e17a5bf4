import { useSyncExternalStore } from "react";
import type { WayPreferences } from "@/shared/ways/way";

/** What the player would rather do without. Safety is no wish: unsafe ways never come. */
export interface Wishes {
  noBarre: boolean;
  noCapo: boolean;
  noRetune: boolean;
  highestCapo: number;
}

export const usualWishes: Wishes = { noBarre: false, noCapo: false, noRetune: false, highestCapo: 7 };

const storageKey = "larkspan.way-wishes";
const listeners = new Set<() => void>();
let known: Wishes | null = null;

/** Wishes as the engine weighs them. */
export function preferencesOf(wishes: Wishes): WayPreferences {
  return {
    barre: wishes.noBarre ? 1 : 0.2,
    capo: wishes.noCapo ? 1 : 0.2,
    retune: wishes.noRetune ? 1 : 0.1,
    knownShapes: [],
    highestCapo: wishes.highestCapo,
  };
}

/** The wishes in one line, for the head of the fold that holds them. */
export function wishWords(wishes: Wishes): string {
  const avoided = [
    wishes.noBarre && "no barres",
    wishes.noCapo && "no capo",
    wishes.noRetune && "nothing retuned",
  ].filter((word) => word !== false);
  return [...avoided, `capo ${wishes.highestCapo} or lower`].join(", ");
}

/** Wishes kept on this device, mended where they were damaged. */
export function readWishes(text: string | null): Wishes {
  try {
    const kept = (JSON.parse(text ?? "null") ?? {}) as Partial<Wishes>;
    const highest = Number.isInteger(kept.highestCapo)
      ? Math.min(9, Math.max(1, kept.highestCapo ?? 0))
      : usualWishes.highestCapo;
    return {
      noBarre: kept.noBarre === true,
      noCapo: kept.noCapo === true,
      noRetune: kept.noRetune === true,
      highestCapo: highest,
    };
  } catch {
    return usualWishes;
  }
}

function current(): Wishes {
  if (known === null) {
    try {
      known = readWishes(localStorage.getItem(storageKey));
    } catch {
      known = usualWishes;
    }
  }
  return known;
}

function keep(wishes: Wishes): void {
  known = wishes;
  try {
    localStorage.setItem(storageKey, JSON.stringify(wishes));
  } catch {
    // Storage may be shut off; the wishes then last for this visit.
  }
  for (const listener of [...listeners]) listener();
}

export function useWishes(): [Wishes, (wishes: Wishes) => void] {
  const wishes = useSyncExternalStore((listener) => {
    listeners.add(listener);
    return () => void listeners.delete(listener);
  }, current);
  return [wishes, keep];
}
