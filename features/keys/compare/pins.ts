import { useCallback, useSyncExternalStore } from "react";
import type { KeyRow } from "../keyRows";
import { sameKey } from "../sameKey";

/** No more than so many keys stand side by side. */
export const mostPins = 4;

const storageKey = "larkspan.pinned-keys";
const listeners = new Set<() => void>();
const none: readonly number[] = [];
let known: Record<string, readonly number[]> | null = null;

/** Pins as they were kept, by song; none where they cannot be read. */
export function readPins(text: string | null): Record<string, readonly number[]> {
  try {
    const kept: unknown = JSON.parse(text ?? "{}");
    if (typeof kept !== "object" || kept === null) return {};
    return Object.fromEntries(
      Object.entries(kept).filter((entry): entry is [string, number[]] => {
        const value: unknown = entry[1];
        return Array.isArray(value) && value.length <= mostPins && value.every((shift) => Number.isInteger(shift));
      }),
    );
  } catch {
    return {};
  }
}

/** Pinned moves with one more, or without it where it is among them; the same where there is no room. */
export function turnPin(pins: readonly number[], shift: number): readonly number[] {
  if (pins.includes(shift)) return pins.filter((pin) => pin !== shift);
  return pins.length < mostPins ? [...pins, shift] : pins;
}

/** The rows of pinned moves, in the order they were pinned. A voice in another octave sings the same key elsewhere. */
export function pinnedRows(rows: readonly KeyRow[], pins: readonly number[]): KeyRow[] {
  const found = pins.flatMap((pin) => {
    const same = rows.filter(({ shift }) => sameKey(shift, pin));
    return same.find(({ shift }) => shift === pin) ?? same[0] ?? [];
  });
  return [...new Set(found)].slice(0, mostPins);
}

/** The moves that an address asks for: "-7,-8,2". */
export function askedPins(text: string | undefined): number[] {
  const shifts = (text ?? "").split(",").filter((part) => /^-?\d{1,2}$/.test(part.trim()));
  return [...new Set(shifts.map(Number))].slice(0, mostPins);
}

function current(): Record<string, readonly number[]> {
  if (known === null) {
    try {
      known = readPins(sessionStorage.getItem(storageKey));
    } catch {
      known = {};
    }
  }
  return known;
}

function keep(songId: string, pins: readonly number[]): void {
  known = { ...current(), [songId]: pins };
  try {
    sessionStorage.setItem(storageKey, JSON.stringify(known));
  } catch {
    // Storage may be shut off; the pins then last until the page is loaded anew.
  }
  for (const listener of [...listeners]) listener();
}

/** The pinned keys of a song, kept while this tab is open. */
export function usePins(songId: string): { pins: readonly number[]; setPins: (pins: readonly number[]) => void } {
  const all = useSyncExternalStore((listener) => {
    listeners.add(listener);
    return () => void listeners.delete(listener);
  }, current);
  const setPins = useCallback((pins: readonly number[]) => keep(songId, pins), [songId]);
  return { pins: all[songId] ?? none, setPins };
}

/** The pins of one page with its rows at hand. */
export interface Pinning {
  rows: readonly KeyRow[];
  has: (row: KeyRow) => boolean;
  /** whether there is room for one more */
  room: boolean;
  turn: (row: KeyRow) => void;
  clear: () => void;
}

/** Pins and unpins rows of this song. */
export function usePinning(songId: string, rows: readonly KeyRow[] | null): Pinning {
  const { pins, setPins } = usePins(songId);
  const pinned = pinnedRows(rows ?? [], pins);
  const shifts = pinned.map(({ shift }) => shift);
  return {
    rows: pinned,
    has: (row) => pinned.includes(row),
    room: pinned.length < mostPins,
    turn: (row) => setPins(turnPin(shifts, row.shift)),
    clear: () => setPins([]),
  };
}
