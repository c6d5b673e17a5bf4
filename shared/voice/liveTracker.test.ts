import { singPhrase } from "../../__tests__/sound/singer";
import { createLiveTracker } from "./liveTracker";
import { listenToTake } from "./listenToTake";

const { pcm, sampleRate } = singPhrase({
  notes: [0, 4, 7, 12, 7].map((step) => ({ midi: 57 + step, durationS: 0.6 })),
  seed: 3,
  sampleRate: 44_100,
  padS: 0.4,
});
const pieces = (length: number) =>
  Array.from({ length: Math.ceil(pcm.length / length) }, (_, k) => pcm.subarray(k * length, (k + 1) * length));

test("what was measured while it was sung gives the very same report", () => {
  const tracker = createLiveTracker(sampleRate, { remember: true });
  for (const piece of pieces(128)) tracker.push(piece);
  const measured = tracker.measured();
  expect(measured?.lagFrames.length).toBeGreaterThan(300);
  expect(listenToTake(pcm, sampleRate, { measured })).toEqual(listenToTake(pcm, sampleRate));
});

test("a tracker that was not asked to remembers nothing", () => {
  const tracker = createLiveTracker(sampleRate);
  tracker.push(pcm.subarray(0, 8000));
  expect(tracker.measured()).toBeNull();
});

test("ahead follows on the decided frames, at most twelve, and mostly turns out true", () => {
  const tracker = createLiveTracker(sampleRate);
  const decided: (number | null)[] = [];
  const guessed = new Map<number, number | null>();
  for (const piece of pieces(441)) {
    decided.push(...tracker.push(piece).map(({ hz }) => hz));
    const ahead = tracker.ahead();
    expect(ahead.length).toBeLessThanOrEqual(12);
    ahead.forEach(({ t }, k) => expect(Math.round(t * 100)).toBe(decided.length + k));
    const newest = ahead.at(-1);
    if (newest) guessed.set(Math.round(newest.t * 100), newest.hz);
  }
  const judged = [...guessed].filter(([k, hz]) => k < decided.length && hz !== null && (decided[k] ?? null) !== null);
  const true50Cents = judged.filter(([k, hz]) => Math.abs(1200 * Math.log2(hz! / decided[k]!)) < 50);
  expect(judged.length).toBeGreaterThan(200);
  expect(true50Cents.length / judged.length).toBeGreaterThan(0.95);
});
