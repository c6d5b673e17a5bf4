import { clippedShare } from "@/shared/signal/level";
import { restoreFlatTops } from "./flatTops";

const rate = 44_100;

/** A voice-like tone with the strengths of its partials, swelling once. */
function tone(hz: number, partials: readonly number[]): Float32Array<ArrayBuffer> {
  return Float32Array.from({ length: rate }, (_, k) => {
    const swell = 0.3 + 0.7 * Math.sin((Math.PI * k) / rate);
    return (
      swell * partials.reduce((sum, gain, n) => sum + gain * Math.sin((2 * Math.PI * hz * (n + 1) * k) / rate + n), 0)
    );
  });
}

function normalised(pcm: Float32Array<ArrayBuffer>): Float32Array<ArrayBuffer> {
  const peak = pcm.reduce((most, x) => Math.max(most, Math.abs(x)), 0);
  return pcm.map((x) => x / peak);
}

const cutOff = (pcm: Float32Array<ArrayBuffer>, gain: number) => pcm.map((x) => Math.max(-1, Math.min(1, gain * x)));

/** What a change of rate does to flat tops: they ring. */
function rippled(pcm: Float32Array<ArrayBuffer>): Float32Array<ArrayBuffer> {
  const kernel = [-0.06, 0.09, -0.14, 0.28, 0.66, 0.28, -0.14, 0.09, -0.06];
  return pcm.map((_, k) => kernel.reduce((sum, weight, n) => sum + weight * (pcm[k + n - 4] ?? 0), 0));
}

const voices = [
  ["a low vowel", 110, [1, 0.8, 0.9, 0.5, 0.3, 0.2]],
  ["a high vowel", 520, [1, 0.5, 0.2]],
  ["nearly a pure tone", 1000, [1, 0.05]],
] as const;

it.each(voices)("%s that was cut off and coded shows flat tops again", (_name, hz, partials) => {
  const coded = rippled(cutOff(normalised(tone(hz, partials)), 6));
  expect(clippedShare(coded)).toBeLessThan(0.05);
  expect(clippedShare(restoreFlatTops(coded))).toBeGreaterThan(0.2);
});

it.each(voices)("%s that fills the whole scale with round tops stays as it is", (_name, hz, partials) => {
  const whole = normalised(tone(hz, partials));
  expect(restoreFlatTops(whole.slice())).toEqual(whole);
});

it("leaves silence alone", () => {
  expect(restoreFlatTops(new Float32Array(100))).toEqual(new Float32Array(100));
});
