import { aSong } from "@/__tests__/client/belongings";
import { accidentalCount } from "@/shared/music/keyName";
import type { KeyRow } from "../keyRows";
import { keyRowsOf } from "../songKeys";
import {
  ariaSort,
  bestFirst,
  orderChoices,
  orderOf,
  orderValue,
  pressed,
  sortedRows,
  type SortColumn,
} from "./keyOrder";

const song = aSong({ tune: { kind: "span", lowMidi: 62, highMidi: 76, home: "D" } });
const rows = keyRowsOf(song, { range: { lowMidi: 51, highMidi: 74 }, comfort: { lowMidi: 55, highMidi: 70 } }) ?? [];
const facts = {
  pinned: (row: KeyRow) => row === rows[5],
  wayOf: (row: KeyRow) =>
    rows.indexOf(row) % 3 === 0
      ? null
      : { title: "", cost: "", capo: 0, barres: 0, difficulty: ((rows.indexOf(row) * 7) % 12) / 12 },
};
const every: SortColumn[] = ["pinned", "move", "score", "span", "below", "above", "chords", "way"];

const values: Record<SortColumn, (row: KeyRow) => number> = {
  pinned: (row) => (facts.pinned(row) ? 1 : 0),
  move: (row) => Math.abs(row.shift),
  score: (row) => row.score,
  span: (row) => row.lowMidi,
  below: (row) => row.below.semitones,
  above: (row) => row.above.semitones,
  chords: (row) => accidentalCount(row.key),
  way: (row) => facts.wayOf(row)?.difficulty ?? Infinity,
};

test.each(every)("rows by %s run as the head says, both ways round, and none is lost", (by) => {
  for (const order of [
    { by, reversed: false },
    { by, reversed: true },
  ]) {
    const sorted = sortedRows(rows, order, facts);
    expect(new Set(sorted)).toEqual(new Set(rows));
    const run = sorted.map(values[by]).filter(Number.isFinite);
    // Keys beyond the range stand under all others, whatever their points.
    if (by === "score") continue;
    const wanted = [...run].sort((a, b) => (ariaSort(order, by) === "ascending" ? a - b : b - a));
    expect(run).toEqual(wanted);
  }
});

test("by score the engine's own order counts, and its reverse", () => {
  expect(sortedRows(rows, bestFirst, facts)).toEqual(rows);
  expect(sortedRows(rows, { by: "score", reversed: true }, facts)).toEqual([...rows].reverse());
});

test("keys without a way come last, in either direction", () => {
  for (const reversed of [false, true])
    expect(sortedRows(rows, { by: "way", reversed }, facts).slice(-4).map(facts.wayOf)).toEqual([
      null,
      null,
      null,
      null,
    ]);
});

test("equal rows stay best first", () => {
  const sorted = sortedRows(rows, { by: "pinned", reversed: false }, facts);
  expect(sorted[0]).toBe(rows[5]);
  expect(sorted.slice(1)).toEqual(rows.filter((row) => row !== rows[5]));
});

test("a press takes a column, a second one turns it round", () => {
  const once = pressed(bestFirst, "above");
  expect(once).toEqual({ by: "above", reversed: false });
  expect(pressed(once, "above")).toEqual({ by: "above", reversed: true });
  expect(pressed({ by: "above", reversed: true }, "above")).toEqual(once);
});

test("the list of orders names each once, and the present one where it is turned round", () => {
  expect(orderChoices(bestFirst, true)).toHaveLength(8);
  expect(orderChoices(bestFirst, false).map(({ label }) => label)).not.toContain("easiest way first");
  const turned = { by: "way", reversed: true } as const;
  const labels = orderChoices(turned, true);
  expect(labels).toContainEqual({ value: orderValue(turned), label: "hardest way first" });
  for (const { value } of labels) expect(orderValue(orderOf(value))).toBe(value);
});
