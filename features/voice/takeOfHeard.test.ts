import { take as takeSchema } from "@/shared/contract/take";
import type { TakeReport } from "@/shared/voice/takeReport";
import type { HeardTake } from "./recorder/recorder";
import { inTune } from "@/shared/voice/shownTake";
import { takeOfHeard } from "./takeOfHeard";

const report: TakeReport = {
  verdict: "heard",
  sentence: "You sang from F3 to C5.",
  nextStep: "Try it in a song.",
  advice: "go-on",
  durationS: 9.4,
  f0: [null, 220],
  notes: [
    {
      start: 0.5,
      end: 1.5,
      midi: 59.8,
      steadinessCents: 12,
      vibrato: { rateHz: 5.5, extentCents: 40 },
      levelDb: -20,
      sustained: true,
      clear: true,
    },
  ],
  range: { lowMidi: 52.8, highMidi: 71.8 },
  comfort: { lowMidi: 54.3, highMidi: 69.3 },
  estimate: { lowMidi: 51, highMidi: 74 },
  tessitura: { q1: 58, median: 60, q3: 64, p5: 53, p95: 71 },
  tuningCents: -20,
  certainty: 0.7,
  reasons: Array.from({ length: 25 }, (_, k) => `Reason ${k}. ${"x".repeat(400)}`),
};
const heard: HeardTake = {
  id: "0b2e6f5e-6f0d-4c8e-9a51-3f2f7a1f7c11",
  sungAt: "2026-11-05T19:20:00.000Z",
  report,
  pcm: new Float32Array(4),
  sampleRate: 48_000,
  processed: [],
  stoppedBy: "singer",
  warmedUp: false,
  effort: 2,
};
const voiceId = "5c8d1c1e-8f55-4b7e-8d0a-6a6f4b1f2d22";

it("keeps the numbers of a take as the contract wants them, and nothing of its sound", () => {
  const kept = takeOfHeard(heard, voiceId);
  expect(takeSchema.parse(kept)).toEqual(kept);
  expect(kept).toMatchObject({
    id: heard.id,
    voiceId,
    effort: 2,
    warmedUp: false,
    range: report.range,
    durationS: 9.4,
  });
  expect(Object.keys(kept)).not.toContain("pcm");
  expect(kept.reasons).toHaveLength(20);
});

it("refuses to keep a take without singing in it", () => {
  const nothing = { ...heard, report: { ...report, range: null } };
  expect(() => takeOfHeard(nothing, voiceId)).toThrow(RangeError);
});

it("names the ends of a band after taking the singer's own tuning off", () => {
  const band = inTune({ lowMidi: 52.6, highMidi: 71.6 }, -40);
  expect(band.lowMidi).toBeCloseTo(53, 10);
  expect(band.highMidi).toBeCloseTo(72, 10);
});
