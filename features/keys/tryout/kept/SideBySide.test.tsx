import { fireEvent, render, screen, within } from "@testing-library/react";
import { aSong, aTry } from "@/__tests__/client/belongings";
import { effortWords } from "@/shared/voice/effortWords";
import { rankMoves } from "./rankMoves";
import { SideBySide } from "./SideBySide";
import { sittingOf } from "./sitting";
import { rowsWith } from "./triedRows";

const song = aSong({ tune: { kind: "span", lowMidi: 57, highMidi: 71, home: "D" } });
const singing = { range: { lowMidi: 51, highMidi: 74 }, comfort: { lowMidi: 55, highMidi: 70 } };
const plain = rowsWith(song, singing, [])!.rows;
const nowMs = Date.parse("2026-11-24T20:00:00.000Z");
// The best key is sung last, and is the hardest.
const sung = [3, 2, 1, 0].map((place) => plain[place]!);
const tries = sung.map((row, place) => ({
  ...aTry(song.id, null, {
    tonic: row.key.tonic,
    shift: row.shift,
    effort: place + 2,
    sungAt: `2026-11-24T19:${10 * (place + 1)}:00.000Z`,
  }),
  waiting: place === 3,
}));
const sitting = sittingOf(tries, nowMs);

function show(decided: number | null = null) {
  const taken: string[] = [];
  const moves = rankMoves(plain, rowsWith(song, singing, sitting)!.rows);
  render(
    <SideBySide
      song={song}
      tries={sitting}
      moves={moves}
      decided={decided}
      saving={false}
      onDecide={(row) => taken.push(row.sign)}
    />,
  );
  return { taken, moves };
}

const cellsOf = (name: string) =>
  within(screen.getByRole("rowheader", { name }).closest("tr")!)
    .getAllByRole("cell")
    .map((cell) => cell.textContent);

test("three keys of a sitting stand side by side in the order in which they were sung", () => {
  const { moves } = show();
  const heads = screen.getAllByRole("columnheader").map((head) => head.textContent);
  expect(heads).toEqual(["Key", sung[1]!.sign, sung[2]!.sign, `${sung[3]!.sign}on this device`]);
  expect(screen.getByRole("heading", { name: "Tried in this sitting, side by side" })).toBeTruthy();
  expect(cellsOf("Felt")).toEqual([3, 4, 5].map((effort) => `${effort} of 5, ${effortWords[effort - 1]}`));
  expect(cellsOf("Score")).toEqual(
    sitting.map(({ shift }) => {
      const { row, scoreBefore } = moves.find((move) => move.row.shift === shift)!;
      return row.score === scoreBefore ? `${row.score}, as before` : `${row.score}, was ${scoreBefore}`;
    }),
  );
  // Two of them were hard: that must show in a score.
  expect(cellsOf("Score").filter((words) => words?.includes("was"))).not.toEqual([]);
});

test("one of the three is taken; the decided one is told apart", () => {
  const { taken } = show(sung[2]!.shift);
  expect(cellsOf("Your key")).toEqual([`Take ${sung[1]!.sign}`, `${sung[2]!.sign} is my key`, `Take ${sung[3]!.sign}`]);
  fireEvent.click(screen.getByRole("button", { name: `Take ${sung[3]!.sign} as my key` }));
  expect(taken).toEqual([sung[3]!.sign]);
});

test("a sitting ends after three hours, and a key sung again counts by its newest try", () => {
  expect(sittingOf(tries, nowMs + 4 * 3_600_000)).toEqual([]);
  const again = { ...tries[1]!, id: "again", effort: 1, sungAt: "2026-11-24T19:55:00.000Z" };
  expect(sittingOf([...tries, again], nowMs).map(({ id }) => id)).toEqual([tries[2]!.id, tries[3]!.id, "again"]);
});

test("a key that was tried in another octave than it now sits best in is the same key", () => {
  const low = tries.map((each) => ({ ...each, shift: each.shift - 12 }));
  render(
    <SideBySide
      song={song}
      tries={low}
      moves={rankMoves(plain, plain)}
      decided={sung[2]!.shift + 12}
      saving={false}
      onDecide={() => undefined}
    />,
  );
  expect(screen.getAllByRole("columnheader")).toHaveLength(1 + low.length);
  expect(cellsOf("Your key")[2]).toBe(`${sung[2]!.sign} is my key`);
});
