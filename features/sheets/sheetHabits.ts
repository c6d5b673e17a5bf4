import { useSyncExternalStore } from "react";
import type { SheetOptions } from "@/shared/sheets/sheet";

const usualHabits: SheetOptions = {
  paper: "A4",
  grids: "side",
  numbers: false,
  letters: "usual",
  shows: "played",
  leftHanded: false,
};
const choices = {
  paper: ["A4", "Letter"],
  grids: ["side", "top", "none"],
  letters: ["small", "usual", "large", "largest"],
  shows: ["played", "sounding"],
} as const;

const storageKey = "larkspan.sheet-habits";
const listeners = new Set<() => void>();
let known: SheetOptions | null = null;

/** How sheets were laid out last on this device, mended where that was damaged. */
export function readHabits(text: string | null): SheetOptions {
  let kept: Record<string, unknown> = {};
  try {
    kept = (JSON.parse(text ?? "null") ?? {}) as Record<string, unknown>;
  } catch {
    // Not ours: the usual layout.
  }
  const one = <Name extends keyof typeof choices>(name: Name) =>
    (choices[name] as readonly unknown[]).includes(kept[name]) ? (kept[name] as SheetOptions[Name]) : usualHabits[name];
  return {
    paper: one("paper"),
    grids: one("grids"),
    letters: one("letters"),
    shows: one("shows"),
    numbers: kept.numbers === true,
    leftHanded: kept.leftHanded === true,
  };
}

function current(): SheetOptions {
  if (known === null) {
    try {
      known = readHabits(localStorage.getItem(storageKey));
    } catch {
      known = usualHabits;
    }
  }
  return known;
}

function keep(options: SheetOptions): void {
  known = options;
  try {
    localStorage.setItem(storageKey, JSON.stringify(options));
  } catch {
    // Storage may be shut off; the layout then lasts for this visit.
  }
  for (const listener of [...listeners]) listener();
}

export function useSheetHabits(): [SheetOptions, (change: Partial<SheetOptions>) => void] {
  const options = useSyncExternalStore((listener) => {
    listeners.add(listener);
    return () => void listeners.delete(listener);
  }, current);
  return [options, (change) => keep({ ...current(), ...change })];
}
