import { markSecondVoices } from "./secondVoice";
import type { TrackFrame } from "./trackFrame";

const RATE = 8000;
/** Two seconds of ten harmonics on a pitch. */
const tone = (hz: number, level = 0.1) =>
  Float32Array.from({ length: 2 * RATE }, (_, i) => {
    let sum = 0;
    for (let h = 1; h <= 10 && h * hz < 3500; h++)
      sum += (level / h) * Math.sin((2 * Math.PI * h * hz * i) / RATE + h * h);
    return sum;
  });
const plus = (a: Float32Array, b: Float32Array) => a.map((x, i) => x + b[i]!);
const track = (hz: number, clarity: number) =>
  Array.from({ length: 190 }, (): TrackFrame => ({
    hz,
    clarity,
    levelDb: -20,
    aboveRoomDb: 40,
    mixed: false,
    overtoneDb: null,
  }));
const mixedShare = (frames: readonly TrackFrame[]) => frames.filter((f) => f.mixed).length / frames.length;

test.each([
  [220, 261.6],
  [220, 330],
  [180, 401],
])("of two pitches at once, %d and %d Hz, the other is heard", (hz, other) => {
  expect(mixedShare(markSecondVoices(track(hz, 0.8), plus(tone(hz), tone(other))))).toBeGreaterThan(0.7);
});

test("one pitch alone leaves no other, nor does its own octave", () => {
  expect(mixedShare(markSecondVoices(track(220, 0.8), tone(220)))).toBe(0);
  expect(mixedShare(markSecondVoices(track(220, 0.8), plus(tone(220), tone(440))))).toBe(0);
});

test("a guitar 20 dB under the voice is left alone", () => {
  expect(mixedShare(markSecondVoices(track(220, 0.8), plus(tone(220), tone(261.6, 0.01))))).toBe(0);
});

test("a frame that is clear holds one voice and is not looked at", () => {
  expect(mixedShare(markSecondVoices(track(220, 0.99), plus(tone(220), tone(261.6))))).toBe(0);
});
