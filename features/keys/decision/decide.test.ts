import { decision as decisionContract } from "@/shared/contract/decision";
import { decide, decidedOn, stillFits, type Choice } from "./decide";

const choice: Choice = {
  songId: "7f0b6f0e-6a51-4a8e-9a53-0a3d8f6f3f01",
  tonic: "C",
  shift: -2,
  score: 92,
  reason: "All of it sits in your comfort band.",
  voiceId: null,
  instrument: "box-adf",
  way: { retune: 0, capo: 3, shapeKey: "A" },
};
const id = "0c7c2c75-25bf-4ac9-9b28-1b8a37a4b1a0";
const now = new Date("2026-03-05T12:30:00Z");

test("a choice becomes a decision that the contract accepts", () => {
  const made = decide(choice, null, () => id, now);
  expect(decisionContract.parse(made)).toEqual({ ...choice, id, decidedAt: "2026-03-05T12:30:00.000Z" });
});

test("a new choice takes the place of the one before", () => {
  const before = decide(choice, null, () => id, now);
  const after = decide(
    { ...choice, tonic: "Bb", shift: -4, way: null },
    before,
    () => "never",
    new Date("2026-03-06T19:30:00Z"),
  );
  expect(after).toMatchObject({ id, tonic: "Bb", shift: -4, way: null, decidedAt: "2026-03-06T19:30:00.000Z" });
});

test("only what is kept of a way goes along, and a long reason is cut", () => {
  const way = { retune: -2, capo: 0, shapeKey: "D", title: "Strings down a whole tone" };
  const made = decide({ ...choice, way, reason: "x".repeat(400) }, null, () => id, now);
  expect(decisionContract.parse(made).way).toEqual({ retune: -2, capo: 0, shapeKey: "D" });
  expect(made.reason).toHaveLength(300);
});

test("a key without a score is kept without one", () => {
  expect(decide({ ...choice, score: null }, null, () => id, now).score).toBeNull();
});

test("a decision fits only the chart it was made for", () => {
  const made = decide(choice, null, () => id, now);
  expect(stillFits(made, { tonic: "D", mode: "major" })).toBe(true);
  expect(stillFits(made, { tonic: "G", mode: "major" })).toBe(false);
  expect(stillFits(made, null)).toBe(true);
});

test("the day of a decision in words", () => {
  expect(decidedOn(decide(choice, null, () => id, now))).toBe("5 March 2026");
});
