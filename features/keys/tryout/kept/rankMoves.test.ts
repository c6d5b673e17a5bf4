import type { KeyRow } from "../../keyRows";
import { moveSentence, rankMoves, whatMoved } from "./rankMoves";

const row = (tonic: string, shift: number, score: number) =>
  ({ key: { tonic, mode: "major" }, sign: tonic, shift, score }) as KeyRow;

const before = [row("F", 5, 94), row("C", 0, 90), row("D", 2, 80)];
const after = [row("C", 0, 90), row("D", 2, 80), row("F", 5, 71)];
const moves = rankMoves(before, after);

test("every key stands beside where it stood before", () => {
  expect(
    moves.map(({ row: { sign }, place, placeBefore, scoreBefore }) => [sign, place, placeBefore, scoreBefore]),
  ).toEqual([
    ["C", 1, 2, 90],
    ["D", 2, 3, 80],
    ["F", 3, 1, 94],
  ]);
});

test("the tried key comes first, then who leads now", () => {
  expect(whatMoved(moves, 5)).toEqual([
    "F went from first, 94, to third, 71.",
    "C went from second, 90, to first, 90.",
  ]);
});

test("what stays is said to stay, and other scores are counted", () => {
  const still = rankMoves(before, [row("F", 5, 94), row("C", 0, 88), row("D", 2, 79)]);
  expect(whatMoved(still, 5)).toEqual(["F stays first, 94.", "Scores of C, D changed with it."]);
  expect(moveSentence(still[1]!)).toBe("C stays second; its score went from 90 to 88.");
});
