import { midiToHz } from "./pitch";
import { pluckString } from "./pluckedString";

const sampleRate = 48_000;
const sound = { decayS: 2.6, bright: 0.55, lengthS: 1 };

/** Frequency of a steady tone near an expected one, by the best of many fine lags. */
function heardHz(pcm: Float32Array, expected: number): number {
  const from = Math.round(0.1 * sampleRate);
  const likeness = (lag: number) => {
    let sum = 0;
    for (let i = from; i < from + 12_000; i += 1) sum += pcm[i]! * pcm[i + lag]!;
    return sum;
  };
  // Ten periods on: a sample more or less is a tenth of its size in one.
  const middle = Math.round((10 * sampleRate) / expected);
  const lags = Array.from({ length: 21 }, (_, k) => middle - 10 + k);
  const values = lags.map(likeness);
  const best = values.indexOf(Math.max(...values));
  const [a, b, c] = [values[best - 1] ?? 0, values[best]!, values[best + 1] ?? 0];
  return (10 * sampleRate) / (lags[best]! + (0.5 * (a - c)) / (a - 2 * b + c));
}

test.each([40, 45, 52, 57, 60, 64, 69, 71])("the string of note %d is in tune within 3 cents", (midi) => {
  const hz = midiToHz(midi);
  const heard = heardHz(pluckString(midi, sampleRate, sound), hz);
  expect(Math.abs(1200 * Math.log2(heard / hz))).toBeLessThan(3);
});

test("it starts at once, dies away, ends in silence, and never leaves full scale", () => {
  const pcm = pluckString(52, sampleRate, { ...sound, lengthS: 3 });
  const loudest = (from: number, to: number) =>
    pcm.slice(from * sampleRate, to * sampleRate).reduce((most, x) => Math.max(most, Math.abs(x)), 0);
  expect(loudest(0, 0.01)).toBeGreaterThan(0.5);
  expect(loudest(0, 3)).toBeLessThanOrEqual(1);
  expect(loudest(2, 2.1)).toBeLessThan(0.1 * loudest(0, 0.1));
  expect(Math.abs(pcm[pcm.length - 1]!)).toBeLessThan(1e-4);
});

test("the same note sounds the same each time", () => {
  expect(pluckString(60, sampleRate, sound)).toEqual(pluckString(60, sampleRate, sound));
});

/** Energy at one frequency. */
function energyAt(pcm: Float32Array, hz: number): number {
  const step = (2 * Math.PI * hz) / sampleRate;
  const sums = pcm.reduce(([re, im], x, k) => [re! + x * Math.cos(step * k), im! + x * Math.sin(step * k)], [0, 0]);
  return sums[0]! ** 2 + sums[1]! ** 2;
}

test.each([
  ["bass", 0.12, [28, 31, 35, 40, 43, 47, 48, 50]],
  ["guitar", 0.55, [45, 47, 48, 52, 56, 63, 68]],
] as const)(
  "every %s string is heard as its own note: no partial is stronger than its fundamental",
  (_, bright, notes) => {
    for (const midi of notes) {
      const pcm = pluckString(midi, sampleRate, { decayS: 2.4, bright, lengthS: 0.6 });
      const [first = 0, ...above] = [1, 2, 3, 4].map((k) => energyAt(pcm, k * midiToHz(midi)));
      expect(Math.max(...above)).toBeLessThan(1.5 * first);
    }
  },
);
