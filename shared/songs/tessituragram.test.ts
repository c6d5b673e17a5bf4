import fc from "fast-check";
import type { MelodyNote } from "./melody";
import { cycleDose, tessitura, tessituragram } from "./tessituragram";

function line(pitches: number[], durations: number[]): MelodyNote[] {
  let start = 0;
  return pitches.map((midi, index) => {
    const note = { start, duration: durations[index]!, midi };
    start += note.duration;
    return note;
  });
}

/** Ah! vous dirai-je, maman (French traditional) in C, from middle C; a quarter is 1. */
const phraseA = [60, 60, 67, 67, 69, 69, 67, 65, 65, 64, 64, 62, 62, 60];
const phraseB = [67, 67, 65, 65, 64, 64, 62];
const bar = [1, 1, 1, 1, 1, 1, 2];
const twinkle = line(
  [...phraseA, ...phraseB, ...phraseB, ...phraseA],
  [...bar, ...bar, ...bar, ...bar, ...bar, ...bar],
);

test("the worked example spends its time as counted by hand", () => {
  const shares = tessituragram(twinkle);
  expect(shares.map(({ midi, share }) => [midi, Math.round(share * 48)])).toEqual([
    [60, 8],
    [62, 8],
    [64, 8],
    [65, 8],
    [67, 12],
    [69, 4],
  ]);
  const figures = tessitura(twinkle)!;
  expect(figures.mean).toBeCloseTo(64.3333, 4);
  expect(figures.sd).toBeCloseTo(2.7789, 4);
  expect(figures).toMatchObject({ q1: 62, median: 64, q3: 67, lowMidi: 60, highMidi: 69 });
  expect(cycleDose(twinkle, 1)).toBeCloseTo(16337.11, 2);
  expect(cycleDose(twinkle, 1) / 48).toBeCloseTo(340.357, 3);
});

const note = fc.record({
  start: fc.nat(1000),
  duration: fc.integer({ min: 1, max: 64 }).map((n) => n / 8),
  midi: fc.integer({ min: 36, max: 84 }),
});
const tune = fc.array(note, { minLength: 1, maxLength: 60 });

test("shares add up to one, and the figures lie in order inside the span", () => {
  fc.assert(
    fc.property(tune, (notes) => {
      const total = tessituragram(notes).reduce((sum, { share }) => sum + share, 0);
      expect(total).toBeCloseTo(1, 9);
      const { lowMidi, q1, median, q3, highMidi, mean } = tessitura(notes)!;
      expect([lowMidi, q1, median, q3, highMidi]).toEqual([lowMidi, q1, median, q3, highMidi].sort((a, b) => a - b));
      expect(mean).toBeGreaterThanOrEqual(lowMidi - 1e-9);
      expect(mean).toBeLessThanOrEqual(highMidi + 1e-9);
    }),
  );
});

test("moving a tune moves its figures, and slowing it down changes none but the dose", () => {
  fc.assert(
    fc.property(tune, fc.integer({ min: -12, max: 12 }), (notes, semitones) => {
      const before = tessitura(notes)!;
      const after = tessitura(
        notes.map((each) => ({ ...each, midi: each.midi + semitones, duration: each.duration * 3 })),
      )!;
      expect(after.mean).toBeCloseTo(before.mean + semitones, 6);
      expect(after.sd).toBeCloseTo(before.sd, 6);
      expect(after.median).toBe(before.median + semitones);
      expect(cycleDose(notes, 2)).toBeCloseTo(2 * cycleDose(notes, 1), 4);
    }),
  );
});

test("no notes have no figures, and a note that lasts no time is refused", () => {
  expect(tessituragram([])).toEqual([]);
  expect(tessitura([])).toBeNull();
  expect(cycleDose([], 1)).toBe(0);
  const broken = [{ start: 0, duration: 0, midi: 60 }];
  for (const refuse of [
    () => tessituragram(broken),
    () => tessitura(broken),
    () => cycleDose(broken, 1),
    () => cycleDose(twinkle, 0),
  ]) {
    expect(refuse).toThrow(RangeError);
  }
});
