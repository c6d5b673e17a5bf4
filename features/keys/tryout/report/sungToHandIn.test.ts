import type { MeasuredTry } from "../useTry";
import { sungToHandIn } from "./sungToHandIn";

const note = (at: number, midi: number, phrase: number) => ({ at, duration: 1, midi, phrase });
const aTry = (startS: number | null, starts: (number | null)[]): MeasuredTry =>
  ({
    take: { id: "take", report: { f0: Array.from({ length: 9000 }, (_, k) => (k < 100 ? null : 220)) } },
    key: { tonic: "C", shift: 0 },
    startS,
    plan: { notes: [note(2, 60, 0), note(3, 62, 0), note(6, 64, 1)] },
    measures: {
      octaves: -1,
      phrases: starts.map((start, phrase) => ({ phrase, start, end: start === null ? null : start + 3 - phrase })),
    },
  }) as unknown as MeasuredTry;

it("lays the tune where it was sung: moved as a whole, in its own rhythm and in the singer's octave", () => {
  expect(sungToHandIn(aTry(1, [3.5, 7.5]), 2).tune).toEqual([
    { t: 3.5, durationS: 1, midi: 48 },
    { t: 4.5, durationS: 1, midi: 50 },
    { t: 7.5, durationS: 1, midi: 52 },
  ]);
});

it("without a backing lays each phrase where it was sung, and leaves out what was not", () => {
  expect(sungToHandIn(aTry(null, [10, null]), 2).tune).toEqual([
    { t: 10, durationS: 1.5, midi: 48 },
    { t: 11.5, durationS: 1.5, midi: 50 },
  ]);
});

it("thins the trail out to 4,000 points at most, and leaves silence out", () => {
  const { trail } = sungToHandIn(aTry(1, [3.5, 7.5]), null);
  expect(trail.length).toBeLessThanOrEqual(4000);
  expect(trail[0]).toEqual({ t: 1.02, midi: 57 });
});
