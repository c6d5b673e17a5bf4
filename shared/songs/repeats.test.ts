import { type MeasureSigns, playingOrder } from "./repeats";

const first: MeasureSigns = { endingStart: [1], endingEnd: true, repeatEnd: 2 };
const second: MeasureSigns = { endingStart: [2], endingEnd: true };

// Common practice.
const table: [string, MeasureSigns[], number[]][] = [
  ["nothing marked", [{}, {}], [0, 1]],
  ["a repeat from the beginning", [{}, { repeatEnd: 2 }, {}], [0, 1, 0, 1, 2]],
  ["a repeat between signs", [{}, { repeatStart: true }, { repeatEnd: 2 }, {}], [0, 1, 2, 1, 2, 3]],
  ["one measure repeated", [{ repeatStart: true, repeatEnd: 2 }], [0, 0]],
  ["three times", [{ repeatStart: true, repeatEnd: 3 }, {}], [0, 0, 0, 1]],
  ["two repeats in a row", [{ repeatEnd: 2 }, { repeatEnd: 2 }], [0, 0, 1, 1]],
  ["first and second ending", [{ repeatStart: true }, first, second, {}], [0, 1, 0, 2, 3]],
  ["endings over two measures", [{}, { endingStart: [1] }, { endingEnd: true, repeatEnd: 2 }, second], [0, 1, 2, 0, 3]],
  [
    "three endings",
    [{}, { endingStart: [1, 2], endingEnd: true, repeatEnd: 2 }, { endingStart: [3], endingEnd: true }],
    [0, 1, 0, 1, 0, 2],
  ],
  ["a repeat after endings", [{}, first, second, { repeatStart: true, repeatEnd: 2 }], [0, 1, 0, 2, 3, 3]],
  ["da capo al fine", [{}, { fine: true }, { jump: "da capo" }], [0, 1, 2, 0, 1]],
  ["da capo without a second repeat", [{ repeatEnd: 2 }, { fine: true }, { jump: "da capo" }], [0, 0, 1, 2, 0, 1]],
  ["da capo takes the last ending", [{}, first, second, { jump: "da capo" }], [0, 1, 0, 2, 3, 0, 2, 3]],
  [
    "dal segno al coda",
    [{}, { segno: true }, { toCoda: true }, { jump: "dal segno" }, { coda: true }],
    [0, 1, 2, 3, 1, 2, 4],
  ],
];

test.each(table)("%s is played in order", (_, signs, order) => expect(playingOrder(signs)).toEqual(order));

test("music without end is refused", () => {
  expect(playingOrder(Array.from({ length: 20_000 }, () => ({ repeatEnd: 20 })))).toBeNull();
});
