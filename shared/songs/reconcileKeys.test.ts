import { type KeyName, keyFifths, parseKeyName, scaleSteps, spellTonic, tonicPitchClass } from "../music/keyName";
import { reconcileKeys } from "./reconcileKeys";

const key = (text: string): KeyName => parseKeyName(text)!;
const modes = ["major", "minor", "dorian", "mixolydian"] as const;

// Common practice: shapes of a key with the capo at a fret, and what sounds.
test.each([
  ["G", "D", 7],
  ["C", "Eb", 3],
  ["G", "A", 2],
  ["G", "Bb", 3],
  ["D", "G", 5],
  ["E", "F", 1],
  ["A", "B", 2],
  ["Am", "Cm", 3],
])("a chart in %s sounding %s is capo %i, with the capo left out", (chart, sounding, capo) => {
  const home = key(sounding);
  const found = reconcileKeys(key(chart), home);
  expect(found).toMatchObject({ kind: "apart", capo, up: capo, shapesWritten: true });
  expect(found.words.join(" ")).toContain(`Capo ${capo} does it`);
  expect(found.words.join(" ")).toContain("shapes with the capo left out");
});

test("a capo only raises: what sounds lower is transposed", () => {
  const found = reconcileKeys(key("D"), { tonic: "C", mode: null });
  expect(found).toMatchObject({ up: 10, nearest: -2, capo: null, shapesWritten: false, moveTo: key("C") });
  expect(found.words).toEqual([
    "Its home note is C, and the chart is written in D major.",
    "The recording sounds a whole tone lower than the chart.",
    "No capo brings them together: a capo only raises, and this one would stand at fret 10. Transpose the chart instead.",
  ]);
});

test("an instrument without a capo, or with a short neck, has none offered", () => {
  expect(reconcileKeys(key("G"), key("D"), 0).capo).toBeNull();
  expect(reconcileKeys(key("G"), key("D"), 5).capo).toBeNull();
  expect(reconcileKeys(key("G"), key("D"), 7).capo).toBe(7);
});

test("all twelve by twelve, in four modes: the way up is the fret, and the moved chart is the recording's key", () => {
  for (const mode of modes)
    for (let from = 0; from < 12; from += 1)
      for (let to = 0; to < 12; to += 1) {
        const chart = { tonic: spellTonic(from, mode), mode };
        const heard = { tonic: spellTonic(to, mode), mode };
        const up = (to - from + 12) % 12;
        for (const home of [heard, { ...heard, mode: null }]) {
          const found = reconcileKeys(chart, home);
          expect(found.up).toBe(up);
          expect(found.kind).toBe(up === 0 ? "same" : "apart");
          expect(found.capo).toBe(up >= 1 && up <= 9 ? up : null);
          expect(found.moveTo).toEqual(up === 0 ? null : heard);
          expect((found.nearest + 12) % 12).toBe(up);
          expect(Math.abs(found.nearest)).toBeLessThanOrEqual(6);
        }
      }
});

test("major and minor of one signature are relatives, whichever of them is the chart", () => {
  for (let pc = 0; pc < 12; pc += 1) {
    const major = { tonic: spellTonic(pc, "major"), mode: "major" } as const;
    const minor = { tonic: spellTonic((pc + 9) % 12, "minor"), mode: "minor" } as const;
    expect((keyFifths(major) - keyFifths(minor)) % 12).toBeCloseTo(0);
    expect(reconcileKeys(major, minor).kind).toBe("relative");
    expect(reconcileKeys(minor, major).kind).toBe("relative");
    expect(reconcileKeys(major, { tonic: major.tonic, mode: "minor" }).kind).toBe("mode");
  }
});

test("the home note A against a chart in C is explained by its relative, but moved if it stays major", () => {
  const found = reconcileKeys(key("C"), { tonic: "A", mode: null });
  expect(found).toMatchObject({ kind: "apart", up: 9, nearest: -3, capo: 9, shapesWritten: false });
  expect(found.words.at(-1)).toBe(
    "But listen again: A minor has the same notes as C major. If the recording sounds dark and rests on Am, the chart already fits and nothing needs to move.",
  );
});

test("across the modes the chart moves so that its notes are those of the recording", () => {
  for (let from = 0; from < 12; from += 1)
    for (let to = 0; to < 12; to += 1) {
      const chart = { tonic: spellTonic(from, "major"), mode: "major" } as const;
      const home = { tonic: spellTonic(to, "minor"), mode: "minor" } as const;
      const found = reconcileKeys(chart, home);
      if (found.kind !== "apart") continue;
      const notes = (tonic: string, mode: "major" | "minor") =>
        scaleSteps(mode)
          .map((step) => (tonicPitchClass(tonic) + step) % 12)
          .sort((a, b) => a - b);
      expect(notes(found.moveTo!.tonic, "major")).toEqual(notes(home.tonic, "minor"));
    }
});

test("a dorian chart goes with a recording that sounds minor", () => {
  expect(reconcileKeys({ tonic: "D", mode: "dorian" }, { tonic: "D", mode: "minor" }).kind).toBe("same");
  expect(reconcileKeys({ tonic: "D", mode: "dorian" }, { tonic: "E", mode: "minor" }).moveTo).toEqual({
    tonic: "E",
    mode: "dorian",
  });
});
