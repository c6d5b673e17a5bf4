import { render, screen, within } from "@testing-library/react";
import { aSong, aTry } from "@/__tests__/client/belongings";
import type { Try } from "@/shared/contract/try";
import { keyRowsOf } from "../songKeys";
import { TakesTried } from "./TakesTried";
import { takeDay, takeInWords, takesIn, takesSummary } from "./takesWords";

const song = aSong({ tune: { kind: "span", lowMidi: 62, highMidi: 76, home: "D" } });
const singing = { range: { lowMidi: 51, highMidi: 74 }, comfort: { lowMidi: 55, highMidi: 70 } };
const row = (keyRowsOf(song, singing) ?? []).find(({ key }) => key.tonic === "C")!;

const measured = (inTune: number | null, fellShort: NonNullable<Try["measures"]>["fellShort"] = null) => ({
  sungShare: 0.96,
  offCents: inTune === null ? null : 14,
  inTune,
  fellShort,
  unsteady: null,
  ranOutOfLow: null,
  octaves: 0,
  moved: 0,
  tuningCents: 3,
  phrases: [],
  pitches: [],
  summary: ["You sang most of it."],
});
const known = (change: Partial<Try>) => ({
  ...aTry(song.id, null, { shift: row.shift, ...change }),
  waiting: false,
});

test("tries of a key: how many, the best in-tune share, and the newest two with effort and what fell short", () => {
  const takes = [
    known({ effort: 4, sungAt: "2026-11-24T19:10:00.000Z", measures: measured(0.78, short("above", 0.6)) }),
    known({ effort: 1, sungAt: "2026-11-22T19:10:00.000Z", measures: measured(0.92) }),
    known({ effort: 2, sungAt: "2026-11-20T19:10:00.000Z", measures: measured(0.85) }),
  ];
  render(<TakesTried songId={song.id} row={row} takes={takes} fault={null} />);
  expect(screen.getByText("3 tries, best 92 % in tune")).toBeTruthy();
  const told = within(screen.getByRole("list"))
    .getAllByRole("listitem")
    .map((each) => each.textContent);
  expect(told).toEqual(["Tue 24 Novfelt hard work; 78 % in tune, A4 fell short", "Sun 22 Novfelt easy; 92 % in tune"]);
  expect(screen.getByText("and 1 before")).toBeTruthy();
  const link = screen.getByRole("link", { name: "Try it again in C" });
  expect(link.getAttribute("href")).toContain(`/songs/${song.id}/try?key=C&shift=${row.shift}`);
});

test("a key that nobody sang leads to trying it, and paper does not show the way", () => {
  render(<TakesTried songId={song.id} row={row} takes={[]} fault={null} />);
  expect(screen.getByText("Not sung yet.")).toBeTruthy();
  expect(screen.getByRole("link", { name: "Try it in C" }).closest("[data-screen]")).not.toBeNull();
  expect(screen.queryByRole("list")).toBeNull();
});

test("while tries are fetched nothing is claimed, and a failure says why", () => {
  const { rerender } = render(<TakesTried songId={song.id} row={row} takes={undefined} fault={null} />);
  expect(screen.getByText("Looking for your tries")).toBeTruthy();
  rerender(<TakesTried songId={song.id} row={row} takes={undefined} fault={new Error("No connection.")} />);
  expect(screen.getByText("Not known. No connection.")).toBeTruthy();
  expect(screen.queryByText("Not sung yet.")).toBeNull();
});

test("a key's tries are this song's, this voice's, and of every octave", () => {
  const [own, high, otherKey] = [known({ shift: -2 }), known({ shift: 10 }), known({ shift: -1 })];
  const others = [aTry("other", null, { shift: -2 }), aTry(song.id, "other", { shift: -2 })];
  expect(takesIn([own, high, otherKey, ...others], song.id, null, -2)).toEqual([own, high]);
});

test("what is not known is not made up", () => {
  const said = (change: Partial<Try>) => takeInWords(known(change), "flats");
  expect(said({ effort: null, measures: null })).toBe("how it felt is not said; not measured");
  expect(said({ effort: 3, measures: measured(null) })).toBe("felt some work; too little sung to tell");
  expect(said({ effort: 3, measures: measured(0.5, short("below", 1)) })).toMatch(/A4 came out higher$/);
  expect(said({ effort: 3, measures: measured(0.5, short("above", null)) })).toMatch(/A4 left out$/);
  expect(takesSummary([known({ measures: null })])).toBe("1 try");
  expect(takesSummary([known({ measures: measured(0) }), known({ measures: null })])).toBe("2 tries, best 0 % in tune");
  expect(takeDay("2026-11-24T12:00:00.000Z")).toBe("Tue 24 Nov");
});

function short(side: "above" | "below", semitones: number | null) {
  return { midi: 69, semitones, side };
}
