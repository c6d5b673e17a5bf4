import fc from "fast-check";
import { levelDbfs } from "./level";
import { createResampler } from "./resampler";

const tone = (hz: number, rate: number, seconds = 0.5) =>
  Float32Array.from({ length: Math.round(rate * seconds) }, (_, i) => Math.sin((2 * Math.PI * hz * i) / rate));

test.each([8000, 11025, 16000, 22050, 44100, 48000, 96000, 192000])(
  "a voice's tones pass at %i Hz, at their own time",
  (rate) => {
    const out = createResampler(rate).push(tone(440, rate));
    expect(out.length).toBeGreaterThan(3950);
    let worst = 0;
    for (let i = 1600; i < 3900; i++)
      worst = Math.max(worst, Math.abs(out[i]! - Math.sin((2 * Math.PI * 440 * i) / 8000)));
    expect(worst).toBeLessThan(0.15);
    expect(levelDbfs(out, 1600, 3900)).toBeCloseTo(0, 1);
  },
);

test("what would fold into the voice's band is taken out", () => {
  for (const hz of [5000, 7600, 8400, 15000]) {
    const out = createResampler(44100).push(tone(hz, 44100));
    expect(levelDbfs(out, 1600, 3900)).toBeLessThan(-50);
  }
});

test("rumble is taken out", () => {
  expect(levelDbfs(createResampler(16000).push(tone(8, 16000, 2)), 8000, 15000)).toBeLessThan(-25);
});

test("pieces give the same samples as the whole", () => {
  const whole = tone(330, 44100, 0.2);
  const expected = createResampler(44100).push(whole);
  fc.assert(
    fc.property(fc.array(fc.integer({ min: 1, max: 3000 }), { minLength: 1, maxLength: 12 }), (cuts) => {
      const resampler = createResampler(44100);
      const out: number[] = [];
      let from = 0;
      for (const cut of cuts) {
        out.push(...resampler.push(whole.subarray(from, from + cut)));
        from = Math.min(whole.length, from + cut);
      }
      out.push(...resampler.push(whole.subarray(from)));
      expect(out).toEqual([...expected]);
    }),
    { numRuns: 15, seed: 1 },
  );
});

test("a rate outside 8 to 192 kHz is the caller's mistake", () => {
  expect(() => createResampler(4000)).toThrow(RangeError);
  expect(() => createResampler(Number.NaN)).toThrow(RangeError);
});
