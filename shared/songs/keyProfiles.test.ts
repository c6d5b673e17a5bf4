import {
  aardenEssen,
  albrechtShanahan,
  bellmanBudge,
  correlateProfiles,
  type KeyProfile,
  krumhanslKessler,
  temperley1999,
  temperleyKostkaPayne,
} from "./keyProfiles";

const names = ["C", "C#", "D", "D#", "E", "F", "F#", "G", "G#", "A", "A#", "B"];
const best = (weights: number[], profile: KeyProfile) =>
  correlateProfiles(weights, profile).map(
    ({ tonic, mode, r }) => `${names[tonic]}${mode === "minor" ? "m" : ""} ${r.toFixed(4)}`,
  );

const happyBirthday = [9, 0, 3, 0, 2, 5, 0, 2, 0, 2, 2, 0];
const second = [7, 0, 5, 0, 7, 16, 0, 16, 0, 15, 6, 0];
const twinkle = [8, 0, 8, 0, 8, 8, 0, 12, 0, 4, 0, 0];
const triad = (...pcs: number[]) => names.map((_, pc) => (pcs.includes(pc) ? 1 : 0));
const cMajor = triad(0, 4, 7);
const aMinor = triad(9, 0, 4);
const cScale = triad(0, 2, 4, 5, 7, 9, 11);
const aHarmonicMinor = triad(9, 11, 0, 2, 4, 5, 8);

// Vectors "happyBirthday" and "second": the examples of music21, analysis/discrete.py; the Pearson correlations were
// worked out from the published profiles. "twinkle" is the time of each note of Ah! vous dirai-je, maman.
const table: [string, number[], KeyProfile, string, string | null][] = [
  ["happyBirthday", happyBirthday, krumhanslKessler, "F 0.8242", "C 0.8237"],
  ["happyBirthday", happyBirthday, temperley1999, "F 0.7649", "C 0.6410"],
  ["happyBirthday", happyBirthday, temperleyKostkaPayne, "F 0.8162", "C 0.6650"],
  ["happyBirthday", happyBirthday, albrechtShanahan, "F 0.8859", "C 0.7275"],
  ["happyBirthday", happyBirthday, aardenEssen, "F 0.8161", "A# 0.6274"],
  ["happyBirthday", happyBirthday, bellmanBudge, "F 0.8757", "Fm 0.6905"],
  ["second", second, krumhanslKessler, "F 0.7593", "C 0.6248"],
  ["second", second, temperley1999, "F 0.8342", "Dm 0.6072"],
  ["second", second, temperleyKostkaPayne, "F 0.8721", "Dm 0.7334"],
  ["second", second, albrechtShanahan, "F 0.8050", "Dm 0.6620"],
  ["second", second, aardenEssen, "F 0.8482", "Dm 0.8362"],
  ["second", second, bellmanBudge, "F 0.8139", "Dm 0.6582"],
  ["twinkle", twinkle, krumhanslKessler, "C 0.8576", "G 0.6841"],
  ["twinkle", twinkle, temperley1999, "C 0.8168", "F 0.6861"],
  ["twinkle", twinkle, temperleyKostkaPayne, "C 0.8986", "F 0.7034"],
  ["twinkle", twinkle, albrechtShanahan, "C 0.8757", "F 0.6910"],
  ["twinkle", twinkle, aardenEssen, "C 0.9617", "Dm 0.8050"],
  ["twinkle", twinkle, bellmanBudge, "C 0.9141", "F 0.7353"],
  ["C E G", cMajor, krumhanslKessler, "C 0.8338", "Em 0.7602"],
  ["C E G", cMajor, temperley1999, "C 0.7131", "Em 0.5501"],
  ["C E G", cMajor, temperleyKostkaPayne, "C 0.8014", "Em 0.5335"],
  ["C E G", cMajor, albrechtShanahan, "C 0.8395", "Cm 0.5583"],
  ["C E G", cMajor, aardenEssen, "C 0.8141", "Am 0.4778"],
  ["C E G", cMajor, bellmanBudge, "C 0.7360", "F 0.5411"],
  ["A C E", aMinor, krumhanslKessler, "Am 0.8886", "C 0.6007"],
  ["A C E", aMinor, temperleyKostkaPayne, "Am 0.7993", "F 0.5411"],
  ["A C E", aMinor, albrechtShanahan, "Am 0.8437", "A 0.5151"],
  ["A C E", aMinor, aardenEssen, "Am 0.7692", "F 0.5129"],
  ["A C E", aMinor, bellmanBudge, "Am 0.7642", "F 0.5567"],
  ["C scale", cScale, krumhanslKessler, "C 0.7564", "Am 0.7121"],
  ["C scale", cScale, temperley1999, "C 0.9365", "F 0.6502"],
  ["C scale", cScale, temperleyKostkaPayne, "C 0.9001", "Am 0.7542"],
  ["C scale", cScale, albrechtShanahan, "C 0.8084", "Am 0.7346"],
  ["C scale", cScale, aardenEssen, "Am 0.8424", "C 0.8401"],
  ["C scale", cScale, bellmanBudge, "C 0.9032", "Am 0.6521"],
  ["A harmonic minor", aHarmonicMinor, krumhanslKessler, "Am 0.6872", null],
  ["A harmonic minor", aHarmonicMinor, temperley1999, "Am 0.9365", null],
  ["A harmonic minor", aHarmonicMinor, temperleyKostkaPayne, "Am 0.8883", null],
  ["A harmonic minor", aHarmonicMinor, albrechtShanahan, "Am 0.7129", null],
  ["A harmonic minor", aHarmonicMinor, aardenEssen, "Am 0.7103", null],
  ["A harmonic minor", aHarmonicMinor, bellmanBudge, "Am 0.8783", null],
];

test.each(table)("%s correlates as worked out (row %#)", (_, weights, profile, first, next) => {
  const ranked = best(weights, profile);
  expect(ranked[0]).toBe(first);
  if (next !== null) expect(ranked[1]).toBe(next);
});

test("a tie is a tie: A C E is as near to C as to F in Temperley's profile", () => {
  const ranked = correlateProfiles(aMinor, temperley1999);
  expect(ranked[0]).toMatchObject({ tonic: 9, mode: "minor" });
  expect(
    ranked
      .slice(1, 3)
      .map(({ tonic, r }) => [tonic, r.toFixed(4)])
      .sort(),
  ).toEqual([
    [0, "0.5501"],
    [5, "0.5501"],
  ]);
});

test("moving every weight moves every key with it", () => {
  const up = happyBirthday.map((_, pc) => happyBirthday[(pc + 12 - 3) % 12]!);
  const at = correlateProfiles(happyBirthday, albrechtShanahan);
  const moved = correlateProfiles(up, albrechtShanahan);
  expect(moved.map(({ tonic, mode }) => [tonic, mode])).toEqual(at.map(({ tonic, mode }) => [(tonic + 3) % 12, mode]));
});

test("weights that say nothing correlate with nothing, and half a dozen weights are refused", () => {
  expect(correlateProfiles(new Array<number>(12).fill(1), aardenEssen).every(({ r }) => r === 0)).toBe(true);
  expect(() => correlateProfiles([1, 2, 3], aardenEssen)).toThrow(RangeError);
  expect(() => correlateProfiles(new Array<number>(12).fill(Number.NaN), aardenEssen)).toThrow(RangeError);
});
