import type { SungNote } from "../voice/takeReport";
import { moveToHomeNote, proposeHome, sungMelody } from "./sungMelody";

const sung = (start: number, end: number, midi: number, clear = true): SungNote => ({
  start,
  end,
  midi,
  clear,
  steadinessCents: 8,
  vibrato: null,
  levelDb: -20,
  sustained: end - start >= 0.24,
});

test("notes are named by the singer's own tuning, and lengths follow the song's tempo", () => {
  const notes = [sung(1.2, 1.7, 60.36), sung(1.8, 2.8, 64.42), sung(2.9, 3.4, 62.33)];
  const take = { notes, range: { lowMidi: 60.36, highMidi: 64.42 }, tuningCents: 37 };
  expect(sungMelody(take).map(({ midi }) => midi)).toEqual([60, 64, 62]);
  expect(sungMelody(take)).toEqual([
    { start: 0, duration: 0.5, midi: 60 },
    { start: 0.6, duration: 1, midi: 64 },
    { start: 1.7, duration: 0.5, midi: 62 },
  ]);
  expect(sungMelody(take, 120)[1]).toEqual({ start: 1.2, duration: 2, midi: 64 });
});

test("a crack outside the range that was heard is no note of the tune, a short one inside it is", () => {
  const notes = [sung(0, 0.5, 60), sung(0.5, 0.6, 72, false), sung(0.6, 0.75, 62, false), sung(0.8, 1.5, 64)];
  expect(sungMelody({ notes, range: { lowMidi: 60, highMidi: 64 }, tuningCents: 0 }).map(({ midi }) => midi)).toEqual([
    60, 62, 64,
  ]);
});

test("the home note comes from the notes; from two nothing is told", () => {
  const steps = [62, 64, 66, 67, 69, 71, 69, 66, 64, 62];
  const notes = steps.map((midi, k) => ({ start: k, duration: 1, midi }));
  expect(proposeHome(notes)).toMatchObject({ tonic: "D", mode: "major" });
  expect(proposeHome(notes.slice(0, 2))).toBeNull();
  expect(proposeHome(notes, "mixolydian")).toMatchObject({ tonic: "D", mode: "major" });
  const minor = proposeHome(notes, "minor")!;
  expect(minor.mode).toBe("minor");
  expect(minor.reasons[0]).toMatch(/^Of the minor keys, as the chart is minor, /);
});

test("the smaller move is taken, and of two equal ones the one down", () => {
  for (let from = 0; from < 12; from += 1)
    for (let to = 0; to < 12; to += 1) {
      const move = moveToHomeNote(from, to);
      expect((from + move + 12) % 12).toBe(to);
      expect(move).toBeGreaterThanOrEqual(-6);
      expect(move).toBeLessThanOrEqual(5);
    }
});
