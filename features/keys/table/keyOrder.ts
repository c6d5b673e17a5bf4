import { accidentalCount } from "@/shared/music/keyName";
import type { KeyRow } from "../keyRows";
import type { TableWay } from "./tableWays";

/** The columns by which the table can be put in order. */
export type SortColumn = "pinned" | "move" | "score" | "span" | "below" | "above" | "chords" | "way";

/** In which order the keys stand. */
export interface KeyOrder {
  by: SortColumn;
  /** the other way round than one first wants it */
  reversed: boolean;
}

export const bestFirst: KeyOrder = { by: "score", reversed: false };

interface Column {
  by: SortColumn;
  /** how the order is called as one first wants it, and the other way round */
  words: readonly [string, string];
  /** whether its values grow down the table as one first wants it */
  grows: boolean;
}

const columns: readonly Column[] = [
  { by: "score", words: ["best score first", "lowest score first"], grows: false },
  { by: "move", words: ["nearest to the chart first", "farthest from the chart first"], grows: true },
  { by: "span", words: ["lowest key first", "highest key first"], grows: true },
  { by: "below", words: ["most room below first", "least room below first"], grows: false },
  { by: "above", words: ["most room above first", "least room above first"], grows: false },
  { by: "chords", words: ["fewest sharps or flats first", "most sharps or flats first"], grows: true },
  { by: "way", words: ["easiest way first", "hardest way first"], grows: true },
  { by: "pinned", words: ["pinned keys first", "pinned keys last"], grows: false },
];

/** What is known of a row besides itself. */
export interface RowFacts {
  pinned: (row: KeyRow) => boolean;
  wayOf: (row: KeyRow) => TableWay | null | undefined;
}

/** The rows in the order asked for. Rows that are equal in it stay best first; those without a way come last. */
export function sortedRows(rows: readonly KeyRow[], { by, reversed }: KeyOrder, facts: RowFacts): KeyRow[] {
  const cost: Record<SortColumn, (row: KeyRow, place: number) => number | null> = {
    score: (_, place) => place,
    move: (row) => Math.abs(row.shift),
    span: (row) => row.lowMidi,
    below: (row) => -row.below.semitones,
    above: (row) => -row.above.semitones,
    chords: (row) => accidentalCount(row.key),
    way: (row) => facts.wayOf(row)?.difficulty ?? null,
    pinned: (row) => (facts.pinned(row) ? 0 : 1),
  };
  const sign = reversed ? -1 : 1;
  return rows
    .map((row, place) => ({ row, place, cost: cost[by](row, place) }))
    .sort((a, b) =>
      a.cost === null || b.cost === null
        ? Number(a.cost === null) - Number(b.cost === null) || a.place - b.place
        : sign * (a.cost - b.cost) || a.place - b.place,
    )
    .map(({ row }) => row);
}

/** The order after a press on a column's head: that column, or the other way round where it was it already. */
export function pressed(order: KeyOrder, by: SortColumn): KeyOrder {
  return { by, reversed: order.by === by && !order.reversed };
}

/** What a column's head says of the order to those who do not see it. */
export function ariaSort(order: KeyOrder, by: SortColumn): "ascending" | "descending" | "none" {
  if (order.by !== by) return "none";
  return (columns.find((column) => column.by === by)?.grows ?? true) === order.reversed ? "descending" : "ascending";
}

/** Every order by its words, for a list: each column as one first wants it, and the present one. */
export function orderChoices(order: KeyOrder, withWays: boolean): { value: string; label: string }[] {
  return columns
    .filter(({ by }) => withWays || by !== "way")
    .flatMap(({ by, words }) => [
      { value: orderValue({ by, reversed: false }), label: words[0] },
      ...(order.by === by && order.reversed ? [{ value: orderValue(order), label: words[1] }] : []),
    ]);
}

export function orderValue({ by, reversed }: KeyOrder): string {
  return reversed ? `${by} reversed` : by;
}

export function orderOf(value: string): KeyOrder {
  const by = columns.find((column) => value.startsWith(column.by))?.by ?? "score";
  return { by, reversed: value.endsWith(" reversed") };
}
