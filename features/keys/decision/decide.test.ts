import { decision as decisionContract } from "@/shared/contract/decision";
import { decide, decidedOn, stillFits, takenBack, wayWords, type Choice } from "./decide";

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
  expect(decisionContract.parse(made)).toEqual({ ...choice, id, decidedAt: "2026-03-05T12:30:00.000Z", earlier: [] });
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

test("what was decided before stays known, newest first, twenty at most", () => {
  const keys = ["C", "D", "E", "F", "G"];
  const last = Array.from({ length: 25 }).reduce<ReturnType<typeof decide> | null>(
    (before, _, k) => decide({ ...choice, tonic: keys[k % 5]! }, before, () => id, new Date(Date.UTC(2026, 2, 1 + k))),
    null,
  );
  expect(decisionContract.parse(last).earlier).toHaveLength(20);
  expect(last?.earlier[0]).toMatchObject({ tonic: "F", decidedAt: "2026-03-24T00:00:00.000Z" });
});

test("taking back brings the choice before, and nothing where there was none", () => {
  const first = decide(choice, null, () => id, now);
  const second = decide({ ...choice, tonic: "Bb", way: null }, first, () => "never", new Date("2026-03-06T19:30:00Z"));
  expect(takenBack(second)).toEqual(first);
  expect(takenBack(first)).toBeNull();
});

test("a way in words", () => {
  expect(wayWords(choice)).toBe("capo 3, chords in A");
  expect(wayWords({ way: { retune: -2, capo: 0, shapeKey: "Bb" } })).toBe("strings down 2, no capo, chords in B♭");
  expect(wayWords({ way: null })).toBeNull();
});

test("another voice's key is left alone", () => {
  const before = decide(choice, null, () => id, now);
  const other = decide({ ...choice, voiceId: id }, before, () => "new", now);
  expect(other).toMatchObject({ id: "new", earlier: [] });
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
