import { aTake } from "@/__tests__/client/belongings";
import type { Take } from "@/shared/contract/take";
import { profileOf } from "@/shared/voice/shownTake";
import { whyComfort, whyEnd, withoutTake } from "./whyEnd";

const voiceId = "5c8d1c1e-8f55-4b7e-8d0a-6a6f4b1f2d22";
const sung = (low: number, high: number, change: Partial<Take> = {}) => {
  const band = { lowMidi: low, highMidi: high };
  const note = (midi: number, start: number, end: number) => ({
    ...{ start, end, midi, steadinessCents: 10, sustained: true, clear: true },
  });
  return aTake(voiceId, {
    ...{ range: band, comfort: band, estimate: band, tuningCents: 0, effort: null },
    notes: [note(low, 0, 1.2), note(high, 2, 2.5), note(high, 3, 5.1)],
    sungAt: "2026-11-05T12:00:00.000Z",
    ...change,
  });
};
const why = (takes: Take[], end: "low" | "high") => whyEnd(profileOf({ id: voiceId }, takes)!, takes, end).join(" ");

it("names the take, the seconds the note was held, and what would be without it", () => {
  const takes = [sung(50, 62), sung(52, 60, { sungAt: "2026-11-01T12:00:00.000Z" })];
  expect(why(takes, "high")).toMatch(
    /^You held D4 for 2\.1 s in the phrase of Thursday,? 5 November, \d\d:\d\d\. Without that take it would be C4\.$/,
  );
  expect(why(takes, "low")).toMatch(/^You held D3 for 1\.2 s /);
});

it("says that a guided hold decides against a phrase that went a little farther", () => {
  const takes = [sung(50, 64), sung(50, 63, { kind: "hold", certainty: 0.9 })];
  expect(why(takes, "high")).toMatch(
    /^You held E♭4 for 2\.1 s in the guided hold of .* A phrase of .* went up to E4; .* the guided hold decides\./,
  );
});

it("says that a far outlier counts only in part", () => {
  const takes = [sung(50, 62), sung(50, 62), sung(50, 75)];
  expect(why(takes, "high")).toMatch(
    /^You held E♭5 for 2\.1 s .* counts only in part, as F♯4, until another one confirms it\./,
  );
});

it("takes the singer's own tuning off before it names a note", () => {
  expect(why([sung(49.7, 61.7, { tuningCents: -30 })], "high")).toMatch(/^You held D4 /);
});

it("agrees with what is left when a take is really erased", () => {
  const [first, second] = [sung(50, 62), sung(48, 66)];
  expect(withoutTake([first, second], second)).toEqual(profileOf({ id: voiceId }, [first]));
  expect(withoutTake([first], first)).toBeNull();
});

it("explains the comfortable notes by effort", () => {
  expect(whyComfort([sung(50, 62)]).join(" ")).toMatch(/have not said how the singing felt/);
  const rated = whyComfort([
    sung(50, 62, { effort: 1 }),
    sung(50, 62, { effort: 5 }),
    sung(50, 62, { effort: 4 }),
  ]).join(" ");
  expect(rated).toMatch(/One take felt easy/);
  expect(rated).toMatch(/2 takes felt hard/);
});
