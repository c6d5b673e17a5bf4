import fc from "fast-check";
import { partFacts } from "@/shared/keys/partFacts";
import { scoreKeys } from "@/shared/keys/scoreKeys";
import type { KeyParts } from "@/shared/keys/keyScore";
import { whyNotHigher } from "@/shared/keys/whyNotHigher";
import { tonicPitchClass } from "@/shared/music/keyName";
import { parseNoteName } from "@/shared/music/pitch";
import { anyTune, anyVoice } from "./keyCases";

const band = (low: string, high: string) => ({ lowMidi: parseNoteName(low)!, highMidi: parseNoteName(high)! });
const maren = { range: band("Eb3", "D5"), comfort: band("G3", "Bb4") };
const notes = "D4 G4:2 A4 B4:2 A4 G4:2 E4 D4 F#4 G4 A4 B4 C5:2 D5:2 E5 D5:2 B4:2 A4 C5 B4 D5:2 G4:3"
  .split(" ")
  .map((token) => {
    const [name = "", beats = "1"] = token.split(":");
    return { start: 0, duration: Number(beats), midi: parseNoteName(name)! };
  });
const ferry = { kind: "melody" as const, notes, home: "G" };
const keys = scoreKeys(ferry, maren);
const named = (tonic: string, from = keys) => from.find((key) => key.tonic === tonic)!;

test.each([
  ["Db", "D♭ scores 97 where C has 99: long notes lie higher in your voice (2 points less)."],
  ["B", "B scores 96 where C has 99: 6 % of the tune leaves your comfort band instead of none of it (3 points less)."],
  [
    "E",
    "E scores 74 where C has 99: 22 % of the tune leaves your comfort band instead of none of it (14 points less) " +
      "and 1 semitone is left above instead of 5 (6 points less), though low notes carry better (1 point more).",
  ],
  ["G", "G scores 33 where C has 99: D3 lies outside your range, 6 % of the tune."],
  ["C", "C is compared with itself."],
])("what keeps %s from the score of the best is one sentence: what is lost, measured and in points", (tonic, words) => {
  expect(whyNotHigher(named(tonic), named("C"))).toBe(words);
});

test("a span alone gives no shares, and an octave that the name does not tell is said", () => {
  const coarse = scoreKeys({ kind: "span", ...band("D4", "E5"), home: "G" }, maren);
  const [best] = coarse;
  for (const key of coarse.slice(1)) expect(whyNotHigher(key, best!)).not.toContain("%");
  const upper = { ...named("C"), shift: named("C").shift + 12, score: 10, beyond: false };
  expect(whyNotHigher({ ...upper, tonic: "Db", shift: upper.shift + 1 }, named("C"))).toMatch(
    /^D♭, sung an octave higher, scores 10 where C has \d+: /,
  );
});

test("between any two keys there is one sentence, the same from either side, with both scores and no more than 100", () => {
  fc.assert(
    fc.property(anyTune, anyVoice, fc.nat(11), fc.nat(11), (song, singer, a, b) => {
      const judged = scoreKeys(song, singer);
      const [one, two] = [judged[a]!, judged[b]!];
      const words = whyNotHigher(one, two);
      expect(words).toMatch(/^[A-G][♯♭]?[^.]*[a-z)]\.$/);
      expect(words).not.toMatch(/NaN|undefined|-\d|: \.|[#]/);
      if (one.score === two.score) return;
      expect(words).toBe(whyNotHigher(two, one));
      expect(words).toContain(`scores ${Math.min(one.score, two.score)} where`);
      expect(words).toContain(`has ${Math.max(one.score, two.score)}: `);
      for (const [said] of words.matchAll(/\d+ %/g)) expect(Number.parseInt(said, 10)).toBeLessThanOrEqual(100);
    }),
    { numRuns: 200 },
  );
});

test("one higher and one lower are both answered", () => {
  const best = keys[0]!;
  for (const by of [1, -1]) {
    const beside = keys.find(({ tonic }) => (tonicPitchClass(tonic) - tonicPitchClass(best.tonic) - by) % 12 === 0)!;
    expect(whyNotHigher(beside, best)).toMatch(/ scores \d+ where C has \d+: .+ \(\d+ points? less\)/);
  }
});

describe("what stands behind the points", () => {
  test("of a tune worked out by hand", () => {
    // In C an octave down G3 to A4: 32 beats, none over B♭4, none under G3.
    expect(partFacts(ferry, maren, named("C"))).toMatchObject({
      comfort: { points: 50, of: 50, over: 0, under: 0, furthestOver: 0, furthestUnder: 0 },
      roomAbove: { of: 15, semitones: 5 },
      roomBelow: { of: 10, semitones: 4 },
      longHigh: { of: 10, fromMidi: parseNoteName("Ab4"), share: 1 / 32, longShare: 0 },
      lowCarry: { of: 15, toMidi: parseNoteName("A3"), share: 3 / 32 },
    });
    expect(
      partFacts({ kind: "span", ...band("D4", "E5"), home: "G" }, maren, named("C")).longHigh.longShare,
    ).toBeNull();
  });

  test("agrees with the key: shares add up, room is the reserves, points are the parts", () => {
    fc.assert(
      fc.property(anyTune, anyVoice, fc.nat(11), (song, singer, at) => {
        const key = scoreKeys(song, singer)[at]!;
        const facts = partFacts(song, singer, key);
        const { inside, over, under } = facts.comfort;
        expect(inside + over + under).toBeCloseTo(1, 9);
        const comfort = key.marks.reduce((sum, { zone, share }) => (zone === "comfort" ? sum + share : sum), 0);
        expect(inside).toBeCloseTo(comfort, 9);
        expect([facts.roomAbove.semitones, facts.roomBelow.semitones]).toEqual([
          key.reserves.upper,
          key.reserves.lower,
        ]);
        expect(facts.longHigh.longShare).toBeLessThanOrEqual(facts.longHigh.share + 1e-9);
        for (const [part, { points, of }] of Object.entries(facts)) {
          expect(points).toBe(key.parts[part as keyof KeyParts]);
          expect(points).toBeLessThanOrEqual(of);
        }
        if (facts.longHigh.share === 0 && !key.beyond) expect(facts.longHigh.points).toBe(facts.longHigh.of);
        if (facts.lowCarry.share === 0 && !key.beyond) expect(facts.lowCarry.points).toBe(facts.lowCarry.of);
      }),
      { numRuns: 200 },
    );
  });
});
