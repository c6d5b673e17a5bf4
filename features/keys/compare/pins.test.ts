import { act, renderHook } from "@testing-library/react";
import { aSong } from "@/__tests__/client/belongings";
import { keyRowsOf } from "../songKeys";
import { askedPins, pinnedRows, readPins, turnPin, usePinning } from "./pins";

const song = aSong({ tune: { kind: "span", lowMidi: 62, highMidi: 76, home: "D" } });
const rows = keyRowsOf(song, { range: { lowMidi: 51, highMidi: 74 }, comfort: { lowMidi: 55, highMidi: 70 } }) ?? [];

test("a pin goes in and out, and a fifth has no room", () => {
  expect(turnPin([1, 2], 3)).toEqual([1, 2, 3]);
  expect(turnPin([1, 2], 1)).toEqual([2]);
  expect(turnPin([1, 2, 3, 4], 5)).toEqual([1, 2, 3, 4]);
});

test("pinned keys are found for a voice that sings them in another octave, each once", () => {
  const first = rows[0]!;
  expect(pinnedRows(rows, [first.shift + 12, first.shift, rows[3]!.shift])).toEqual([first, rows[3]]);
  expect(pinnedRows([], [1])).toEqual([]);
});

test.each([
  ["-7,-8,2", [-7, -8, 2]],
  ["-7,-7, 2", [-7, 2]],
  ["1,2,3,4,5", [1, 2, 3, 4]],
  ["x,,1e3,200", []],
  [undefined, []],
])("an address asking for %s", (text, pins) => {
  expect(askedPins(text)).toEqual(pins);
});

test.each([
  [null, {}],
  ["{", {}],
  ["[]", {}],
  ['{"a":[1,2],"b":"x","c":[1,2,3,4,5],"d":[0.5]}', { a: [1, 2] }],
])("pins kept as %s", (text, pins) => {
  expect(readPins(text)).toEqual(pins);
});

test("two places on a page see the same pins, song by song", () => {
  const here = renderHook(() => usePinning(song.id, rows)).result;
  const there = renderHook(() => usePinning(song.id, rows)).result;
  const other = renderHook(() => usePinning(aSong().id, rows)).result;
  act(() => here.current.turn(rows[1]!));
  act(() => there.current.turn(rows[2]!));
  expect(here.current.rows).toEqual([rows[1], rows[2]]);
  expect(there.current.has(rows[1]!)).toBe(true);
  expect(other.current.rows).toEqual([]);
  expect(readPins(sessionStorage.getItem("larkspan.pinned-keys"))[song.id]).toEqual([rows[1]!.shift, rows[2]!.shift]);
  act(() => here.current.clear());
  expect(there.current.rows).toEqual([]);
  expect(here.current.room).toBe(true);
});
