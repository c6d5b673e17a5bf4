import { take } from "@/shared/contract/take";
import { inTune } from "@/shared/voice/shownTake";
import type { GuidedFindings, GuidedRun } from "./guidedSteps";
import { takeOfHolds } from "./takeOfHolds";

const voiceId = "5c8d1c1e-8f55-4b7e-8d0a-6a6f4b1f2d22";
const run = (midis: number[]): GuidedRun => ({
  id: "0b2e6f5e-6f0d-4c8e-9a51-3f2f7a1f7c11",
  startedAt: "2026-11-28T09:40:00.000Z",
  under16: false,
  home: 57,
  end: "high",
  target: null,
  stride: 2,
  tries: 0,
  misses: { low: 3, high: 3 },
  held: midis.map((midi) => ({ midi, heldS: 1.5, steadinessCents: 9 })),
});
const findings: GuidedFindings = { lowMidi: 50, highMidi: 70, singLow: 52, singHigh: 67, warmedUp: true, effort: 2 };

it("keeps held notes and notes for singing apart, as the contract wants them", () => {
  const kept = takeOfHolds(run([57, 53.1, 49.8, 62, 70.2]), findings, voiceId);
  expect(take.parse(kept)).toEqual(kept);
  expect(kept).toMatchObject({
    kind: "hold",
    shows: "both",
    range: { lowMidi: 49.8, highMidi: 70.2 },
    effort: 2,
    warmedUp: true,
  });
  expect(kept.notes).toHaveLength(5);
  expect(inTune(kept.comfort, kept.tuningCents).lowMidi).toBeCloseTo(52, 6);
  expect(inTune(kept.comfort, kept.tuningCents).highMidi).toBeCloseTo(67, 6);
  expect(kept.reasons.join(" ")).toContain("Beyond your lowest note 3 more tries did not hold.");
});

it("says for which end it speaks where only one was looked for", () => {
  expect(takeOfHolds(run([57, 53, 50]), findings, voiceId).shows).toBe("low");
  expect(takeOfHolds(run([57, 61, 70]), findings, voiceId).shows).toBe("high");
});

it("refuses a way that led nowhere", () => {
  expect(() => takeOfHolds(run([57]), findings, voiceId)).toThrow(RangeError);
});

it("takes the singer's own offset off the names, and keeps the notes as sung", () => {
  const flat = [57, 53, 50, 62, 70].map((midi) => midi - 0.35);
  const kept = takeOfHolds(run(flat), findings, voiceId);
  expect(kept.tuningCents).toBeCloseTo(-35, 6);
  expect(kept.range).toEqual({ lowMidi: 49.65, highMidi: 69.65 });
  expect(inTune(kept.range, kept.tuningCents).lowMidi).toBeCloseTo(50, 6);
  expect(inTune(kept.comfort, kept.tuningCents).highMidi).toBeCloseTo(67, 6);
});

it("says of whom it was, where the range will move", () => {
  const kept = takeOfHolds({ ...run([57, 53, 50]), under16: true }, findings, voiceId);
  expect(kept.reasons.at(-1)).toMatch(/range of that week/);
});
