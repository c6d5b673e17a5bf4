import { accidentalCount } from "@/shared/music/keyName";
import type { KeyRow } from "../keyRows";
import { bestWay, type FoundWays, type WayNeeds } from "./tableWays";

/** Which keys are shown. */
export interface KeyFilter extends WayNeeds {
  /** at most so many sharps or flats; null = any number */
  accidentals: number | null;
}

export const noFilter: KeyFilter = { noCapo: false, noBarre: false, accidentals: null };

export function isFiltering({ noCapo, noBarre, accidentals }: KeyFilter): boolean {
  return noCapo || noBarre || accidentals !== null;
}

/** The keys that remain. Those whose ways are still searched stay until it is known that they do not fit. */
export function remainingRows(
  rows: readonly KeyRow[],
  filter: KeyFilter,
  waysOf: (row: KeyRow) => FoundWays,
): { rows: KeyRow[]; searching: number } {
  const asksWays = filter.noCapo || filter.noBarre;
  const simple = rows.filter(({ key }) => filter.accidentals === null || accidentalCount(key) <= filter.accidentals);
  const left = asksWays ? simple.filter((row) => bestWay(waysOf(row), filter) !== null) : simple;
  return { rows: left, searching: asksWays ? left.filter((row) => waysOf(row) === undefined).length : 0 };
}

/** How many keys remain, in words; null where all are asked for. */
export function remainingWords(left: number, all: number, searching: number, filter: KeyFilter): string | null {
  if (!isFiltering(filter)) return null;
  const rest = searching === 0 ? "" : `, ways into ${searching} of them still searched`;
  if (left === 0) return `None of the ${all} keys fits.`;
  return `${left} of ${all} keys ${left === 1 ? "remains" : "remain"}${rest}.`;
}

/** What may be asked of the signs at the clef; the most that any of the keys has is no question. */
export function accidentalChoices(rows: readonly KeyRow[]): { value: string; label: string }[] {
  const most = Math.max(0, ...rows.map(({ key }) => accidentalCount(key)));
  const counts = Array.from({ length: most }, (_, count) => count);
  return [
    { value: "any", label: "all twelve keys" },
    ...counts.map((count) => ({
      value: String(count),
      label:
        count === 0
          ? "keys without sharps or flats"
          : `keys with at most ${count} ${count === 1 ? "sharp or flat" : "sharps or flats"}`,
    })),
  ];
}
