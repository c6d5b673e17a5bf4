import { createLiveTracker, type LiveFrame } from "./liveTracker";
import { createNoteGlimpse } from "./noteGlimpse";

const rate = 48_000;
const block = 128;

/** A tone of seven partials whose pitch steps from one note to the other at `stepS`; null is silence. */
function stepping(from: number | null, to: number | null, stepS: number, endS: number): Float32Array {
  let phase = 0;
  return Float32Array.from({ length: endS * rate }, (_, k) => {
    const midi = k / rate < stepS ? from : to;
    if (midi === null) return 0;
    phase += (2 * Math.PI * 440 * 2 ** ((midi - 69) / 12)) / rate;
    return [1, 0.7, 0.5, 0.35, 0.25, 0.15, 0.1].reduce(
      (sum, gain, n) => sum + 0.1 * gain * Math.sin((n + 1) * phase),
      0,
    );
  });
}

/** When the newest two of the frames first hold the note, in ms after the step; with the glimpse and without. */
function msToSee(from: number | null, to: number, stepS = 0.6) {
  const tracker = createLiveTracker(rate);
  const glimpse = createNoteGlimpse(rate);
  const pcm = stepping(from, to, stepS, 1);
  const ms = { tracker: Infinity, glimpse: Infinity };
  const holds = (frames: readonly LiveFrame[]) =>
    frames.length > 1 &&
    frames.slice(-2).every(({ hz }) => hz !== null && Math.abs(69 + 12 * Math.log2(hz / 440) - to) < 0.5);
  for (let at = 0; at + block <= pcm.length; at += block) {
    const piece = pcm.subarray(at, at + block);
    tracker.push(piece);
    glimpse.push(piece);
    const now = (1000 * (at + block)) / rate - 1000 * stepS;
    if (holds(tracker.ahead())) ms.tracker = Math.min(ms.tracker, now);
    if (holds(glimpse.beyond(tracker.ahead()))) ms.glimpse = Math.min(ms.glimpse, now);
  }
  return ms;
}

it.each([
  [57, 64],
  [64, 60],
  [60, 67],
  [52, 53],
  [69, 50],
  [null, 57],
] as const)("sees the step from %p to %p within 48 ms, before the tracker", (from, to) => {
  const { tracker, glimpse } = msToSee(from, to);
  expect(glimpse).toBeLessThanOrEqual(48);
  expect(glimpse).toBeLessThanOrEqual(tracker);
});

it("adds nothing to a steady note, to silence, and where an octave would be the news", () => {
  for (const [from, to] of [
    [57, 57],
    [null, null],
    [57, 69],
    [69, 57],
  ] as const) {
    const tracker = createLiveTracker(rate);
    const glimpse = createNoteGlimpse(rate);
    const pcm = stepping(from, to, 0.4, 0.8);
    for (let at = 0; at + block <= pcm.length; at += block) {
      tracker.push(pcm.subarray(at, at + block));
      glimpse.push(pcm.subarray(at, at + block));
      const ahead = tracker.ahead();
      const started = at / rate > 0.1;
      const voiced = ahead.at(-1)?.hz !== null;
      if (started && voiced) expect(glimpse.beyond(ahead)).toBe(ahead);
    }
  }
});

it("refuses a rate that is none", () => {
  expect(() => createNoteGlimpse(1000)).toThrow(RangeError);
});
