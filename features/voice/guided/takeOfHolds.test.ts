import { take } from "@/shared/contract/take";
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
    comfort: { lowMidi: 52, highMidi: 67 },
    effort: 2,
    warmedUp: true,
  });
  expect(kept.notes).toHaveLength(5);
  expect(kept.certainty).toBeGreaterThan(0.7);
});

it("says for which end it speaks where only one was looked for", () => {
  expect(takeOfHolds(run([57, 53, 50]), findings, voiceId).shows).toBe("low");
  expect(takeOfHolds(run([57, 61, 70]), findings, voiceId).shows).toBe("high");
});

it("refuses a way that led nowhere", () => {
  expect(() => takeOfHolds(run([57]), findings, voiceId)).toThrow(RangeError);
});
