import { holdsEvidence } from "./holdsEvidence";

const note = (midi: number, steadinessCents = 9, heldS = 1.5) => ({ midi, heldS, steadinessCents });
const way = [57, 55, 53, 51, 50, 59, 61, 63, 65, 67].map((midi) => note(midi));
const evidence = (change: Partial<Parameters<typeof holdsEvidence>[0]>) =>
  holdsEvidence({ home: 57, misses: { low: 2, high: 2 }, held: way, ...change });

it("is sure of a long, steady way whose ends were tried again", () => {
  const { certainty, tuningCents } = evidence({});
  expect(certainty).toBeGreaterThan(0.85);
  expect(certainty).toBeLessThanOrEqual(0.98);
  expect(tuningCents).toBeCloseTo(0, 6);
});

it("is less sure where nothing was tried beyond the ends, notes waver, disagree or were short", () => {
  const best = evidence({}).certainty;
  const worse = {
    untried: { misses: { low: 0, high: 0 } },
    wavering: { held: way.map(({ midi }) => note(midi, 55)) },
    scattered: { held: way.map(({ midi }, k) => note(midi + [0, 0.3, -0.3, 0.45][k % 4]!)) },
    short: { held: way.map(({ midi }) => note(midi, 9, 0.5)) },
    few: { held: way.slice(0, 3) },
  };
  for (const [name, change] of Object.entries(worse))
    expect([name, evidence(change).certainty < best - 0.04]).toEqual([name, true]);
  // All of it together is no longer sure enough to overrule what was sung in phrases.
  const weak = { misses: { low: 0, high: 0 }, held: [57, 55.4, 53.2].map((midi) => note(midi, 55, 0.6)) };
  expect(evidence(weak).certainty).toBeLessThan(0.6);
});

it("reads the offset around the circle: notes a quarter tone off either way do not cancel out", () => {
  expect(evidence({ held: [57.45, 55.48, 53.55].map((midi) => note(midi)) }).tuningCents).toBeCloseTo(49.3, 0);
});
