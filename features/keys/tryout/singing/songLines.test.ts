import { timedLines } from "./songLines";
import { tryPlan, usualWishes } from "../setup/tryWishes";
import { aSong } from "@/__tests__/client/belongings";

const chart = ["Verse 1", "C       G", "Rope on the quay,", "F      C", "bell on the bay."].join("\n");
const notes = [0, 1, 2, 3, 4, 5, 6, 7].map((k) => ({ start: 2 * k, duration: 2, midi: 60 + (k % 4) }));
const written = { tonic: "C", mode: "major" } as const;
const song = {
  ...aSong(),
  ...{ chart, writtenKey: written, beatsPerBar: 4, tempo: 120 },
  tune: { kind: "melody" as const, home: "C", notes },
};
const key = { tonic: "D", shift: 2 };

test("the lines of the chart come in time and in the key", () => {
  const plan = tryPlan(song, key, usualWishes(song))!;
  const lines = timedLines(song, { tonic: "D", mode: "major" }, plan);
  expect(lines.map(({ line }) => "lyrics" in line && line.lyrics.trim())).toEqual([
    "Rope on the quay,",
    "bell on the bay.",
  ]);
  expect(lines.map(({ line }) => "chords" in line && line.chords.map(({ text }) => text))).toEqual([
    ["D", "A"],
    ["G", "D"],
  ]);
  expect(lines[0]!.at).toBeCloseTo(plan.countInS);
  expect(lines[1]!.at).toBeGreaterThanOrEqual(lines[0]!.end - 1e-6);
});

test("without a tune the lines of a part share its time", () => {
  const plain = { ...song, tune: null };
  const plan = tryPlan(plain, key, usualWishes(plain))!;
  const lines = timedLines(plain, { tonic: "D", mode: "major" }, plan);
  expect(lines).toHaveLength(2);
  expect(lines[1]!.end).toBeCloseTo(plan.durationS);
});
