import type { GuidedRun, GuidedState } from "./guidedSteps";
import { dropUnkeptRun, readUnkeptRun, saveUnkeptRun } from "./unkeptRun";

const startedAt = "2026-11-28T09:40:00.000Z";
const now = Date.parse("2026-11-28T10:00:00.000Z");
const run = (count: number): GuidedRun => ({
  ...{ id: "g1", startedAt, under16: false, home: 57, end: "low", target: 53, stride: 2, tries: 1 },
  misses: { low: 1, high: 0 },
  held: Array.from({ length: count }, (_, k) => ({ midi: 57 - 2 * k, heldS: 1.5, steadinessCents: 9 })),
});

beforeEach(() => sessionStorage.clear());

it("keeps a way with a held note at whatever step, and where it goes on", () => {
  saveUnkeptRun({ step: "listening", run: run(2) });
  expect(readUnkeptRun(now)).toEqual({ step: "way", run: run(2), next: "low" });
  saveUnkeptRun({ step: "turn", run: run(3) });
  expect(readUnkeptRun(now)).toEqual({ step: "way", run: run(3), next: "high" });
});

it("keeps the result with what the singer said of it", () => {
  const findings = { lowMidi: 53, highMidi: 57, singLow: 55, singHigh: 57, warmedUp: true, effort: 2 };
  const done: GuidedState = { step: "done", run: run(3), findings, brokenOff: null };
  saveUnkeptRun(done);
  expect(readUnkeptRun(now)).toEqual({ step: "done", run: run(3), findings });
});

it("keeps nothing without a held note, forgets on request, after a day, and what it cannot read", () => {
  saveUnkeptRun({ step: "listening", run: run(0) });
  expect(readUnkeptRun(now)).toBeNull();
  saveUnkeptRun({ step: "listening", run: run(1) });
  expect(readUnkeptRun(now + 90_000_000)).toBeNull();
  dropUnkeptRun();
  expect(readUnkeptRun(now)).toBeNull();
  for (const text of ["{", "3", JSON.stringify({ form: 0 })]) {
    sessionStorage.setItem("larkspan.guided", text);
    expect(readUnkeptRun(now)).toBeNull();
  }
});
