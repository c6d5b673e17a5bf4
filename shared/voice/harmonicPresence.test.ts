import { MAX_LAG } from "../signal/lagFrame";
import { harmonicPresence } from "./harmonicPresence";

/** Autocorrelation at 8 kHz of a sum of partials, given as [Hz, power]. */
function autocorrelation(partials: readonly (readonly [number, number])[]): Float32Array {
  return Float32Array.from({ length: MAX_LAG + 1 }, (_, lag) =>
    partials.reduce((sum, [hz, power]) => sum + power * Math.cos((2 * Math.PI * hz * lag) / 8000), 0),
  );
}

const harmonics = (hz: number, count: number) =>
  Array.from({ length: count }, (_, k) => [hz * (k + 1), 1 / (k + 1)] as const);

test("all harmonics of a pitch are there, and of its octave below only every second", () => {
  const r = autocorrelation(harmonics(220, 9));
  expect(harmonicPresence(r, 220)).toBeGreaterThan(0.75);
  expect(harmonicPresence(r, 110)).toBeLessThan(0.4);
  expect(harmonicPresence(r, 110, true)).toBeLessThan(0.4);
});

test("of the common period of two notes most harmonics are missing, enclosed ones too", () => {
  const r = autocorrelation([...harmonics(330, 6), ...harmonics(220, 8)]);
  const whole = autocorrelation(harmonics(110, 18));
  expect(harmonicPresence(r, 110, true)).toBeLessThan(harmonicPresence(whole, 110, true) - 0.1);
});

test("a bass on the telephone, with one harmonic on a formant and no fundamental, is one voice", () => {
  const decibels = [-24, -16, -6, -3, -1, 4, 13, 4, -1, -1, 1, 4];
  const r = autocorrelation(decibels.map((db, k) => [93 * (k + 1), 10 ** (db / 10)] as const));
  expect(harmonicPresence(r, 93, true)).toBeGreaterThan(0.5);
});
