import { useSyncExternalStore } from "react";
import type { Units } from "@/shared/instruments/units";

const storageKey = "larkspan-units";
const listeners = new Set<() => void>();
let known: Units | null = null;

function current(): Units {
  if (known === null) {
    try {
      known = localStorage.getItem(storageKey) === "imperial" ? "imperial" : "metric";
    } catch {
      known = "metric";
    }
  }
  return known;
}

function choose(units: Units): void {
  known = units;
  try {
    localStorage.setItem(storageKey, units);
  } catch {
    // Storage may be shut off; the choice then lasts for this visit.
  }
  for (const listener of [...listeners]) listener();
}

/** How lengths and tensions are told on this device, and how to change it. */
export function useUnits(): [Units, (units: Units) => void] {
  const units = useSyncExternalStore((listener) => {
    listeners.add(listener);
    return () => void listeners.delete(listener);
  }, current);
  return [units, choose];
}
