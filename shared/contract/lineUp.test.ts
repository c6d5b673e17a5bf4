import { aLineUp } from "@/__tests__/client/belongings";
import { joinedLineUps, mostPlayers } from "./lineUp";

test("two line-ups of one song become the later one, and behind it whoever only the earlier one has", () => {
  const here = aLineUp("10000000-0000-4000-8000-00000000aaaa");
  const both = { ...here.players[0]!, name: "Tede Brack" };
  const there = aLineUp(here.songId, { players: [both], changedAt: "2026-03-06T09:00:00.000Z" });
  const more = { ...both, id: "10000000-0000-4000-8000-00000000bbbb", name: "Ilse" };
  expect(joinedLineUps(here, there)).toEqual(there);
  expect(joinedLineUps({ ...here, players: [...here.players, more] }, there)).toEqual({
    ...there,
    players: [both, more],
  });
  const crowd = Array.from({ length: mostPlayers }, (_, k) => ({ ...both, id: `${both.id.slice(0, -4)}${1000 + k}` }));
  expect(joinedLineUps({ ...here, players: crowd }, there).players).toHaveLength(mostPlayers);
});
