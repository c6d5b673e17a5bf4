import type { MeasuredTry } from "../useTry";
import { sungToHandIn } from "./sungToHandIn";

const note = (at: number, midi: number, phrase: number) => ({ at, duration: 1, midi, phrase });
const longTake = Array.from({ length: 9000 }, (_, k) => (k < 100 ? null : 220));
const aTry = (startS: number | null, starts: (number | null)[], f0: (number | null)[] = longTake): MeasuredTry =>
  ({
    take: { id: "take", report: { f0 } },
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

it("leaves clicks out of the trail, alone and in the middle of singing, but no short sung note", () => {
  const sung = (hz: number | null, frames: number) => Array.from({ length: frames }, () => hz);
  const f0 = [
    ...sung(1046, 2),
    ...sung(null, 20),
    ...sung(220, 30),
    ...sung(1046, 3),
    ...sung(220, 30),
    ...sung(330, 8),
  ];
  const { trail } = sungToHandIn(aTry(1, [3.5, 7.5], f0), null);
  expect(trail).toHaveLength(68);
  expect(new Set(trail.map(({ midi }) => midi))).toEqual(new Set([57, 64.02]));
});
