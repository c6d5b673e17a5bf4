import fc from "fast-check";
import { fretSemitones } from "../instruments/frets";
import type { Instrument } from "../instruments/instrument";
import { findPreset, presets } from "../instruments/presets";
import { stringMidi } from "../instruments/tension";
import { parseChord, transposeChord } from "../music/chord";
import { type KeyName, type Mode, scaleSteps, spellTonic, tonicPitchClass } from "../music/keyName";
import { parseChart } from "../songs/chart";
import { chordNumber } from "../songs/chordNumbers";
import type { CoachQuestion } from "./coachQuestion";
import { numberedChords } from "./numberedChords";
import { whyWalk, type WhyQuestion } from "./whyWalk";

const keyOf = (pc: number, mode: Mode = "major"): KeyName => ({ tonic: spellTonic(pc, mode), mode });
const modes = fc.constantFrom<Mode>("major", "major", "minor", "dorian", "mixolydian");
const inKey = (names: readonly string[], key: KeyName) =>
  names.map((name) => transposeChord(parseChord(name)!, tonicPitchClass(key.tonic), key)).join("  ");

/** A song in any key, and every combination of retune, capo and shapes that there can be. */
const questions: fc.Arbitrary<WhyQuestion> = fc
  .record({
    names: fc.uniqueArray(fc.constantFrom("C", "F", "G", "Am", "Dm", "Em", "G7", "D7", "Bb", "Fmaj7", "Gsus4", "C/E"), {
      minLength: 1,
      maxLength: 6,
    }),
    from: fc.integer({ min: 0, max: 11 }),
    to: fc.integer({ min: 0, max: 11 }),
    mode: modes,
    retune: fc.integer({ min: -4, max: 1 }),
    capo: fc.integer({ min: 0, max: 9 }),
    instrument: fc.constantFrom(...presets),
    seed: fc.integer({ min: 0, max: 9999 }),
  })
  .map(({ names, from, to, mode, retune, capo, instrument, seed }) => {
    const at = Math.min(capo, instrument.capoTo);
    const raise = fretSemitones(instrument, at) ?? 0;
    const shapeKey = spellTonic((((to - retune - raise) % 12) + 12) % 12, mode);
    return {
      chart: parseChart(`${inKey(names, keyOf(from, mode))}\nlow water at the slip`),
      from: keyOf(from, mode),
      to: keyOf(to, mode),
      instrument,
      way: { retune, capo: at, shapeKey },
      seed,
    };
  });

/** Every answer that can be given, with whether it is taken as right. */
function answers(question: CoachQuestion, instrument: Instrument): { right: boolean; words: string }[] {
  if (question.kind === "keyboard") return Array.from({ length: 12 }, (_, pc) => question.check(pc));
  if (question.kind === "choices") return question.options.map((option) => question.check(option));
  const frets = [0, ...Array.from({ length: question.frets }, (_, k) => question.firstFret + k)];
  const strings = question.whole ? [0] : [...instrument.strings.keys()];
  return strings.flatMap((string) => frets.map((fret) => question.check({ string, fret })));
}

test("in every key and way, each question has a right answer, refuses every other one and says why", () => {
  fc.assert(
    fc.property(questions, (asked) => {
      for (const { question } of whyWalk(asked).steps) {
        const all = answers(question, asked.instrument);
        const right = all.filter((answer) => answer.right);
        expect(right.length).toBe(1);
        for (const { words } of all) {
          expect(words).toMatch(/^\S.*\.$/);
          expect(words).not.toMatch(/!|undefined|NaN|null/);
        }
      }
    }),
    { numRuns: 250 },
  );
});

test("the right note of the scale is the one the scale's own steps lead to", () => {
  fc.assert(
    fc.property(questions, (asked) => {
      const { question } = whyWalk(asked).steps[0]!;
      if (question.kind !== "keyboard") throw new Error("the scale is asked for on a keyboard");
      const degree = Number(/ the (\d)/.exec(question.ask)?.[1]);
      const semitones = scaleSteps(asked.from.mode)[degree - 1]!;
      expect(question.check((tonicPitchClass(asked.from.tonic) + semitones) % 12).right).toBe(true);
    }),
  );
});

test("numbers are the same before and after the song has moved", () => {
  fc.assert(
    fc.property(questions, ({ chart, from, to }) => {
      for (const { sounding, roman, plain } of numberedChords(chart, from, to)) {
        const there = chordNumber(parseChord(sounding)!, to);
        expect([there.roman, there.plain]).toEqual([roman, plain]);
      }
    }),
  );
});

test("the root that is found for a movable shape makes exactly the chord asked for", () => {
  fc.assert(
    fc.property(questions, (asked) => {
      const step = whyWalk(asked).steps.find(({ kind }) => kind === "neck");
      if (step?.picture.kind !== "neck" || step.question.kind !== "neck") return;
      const target = /to make it (\S+)\?$/.exec(step.question.ask)?.[1]?.replace("♯", "#").replace("♭", "b");
      const { instrument } = step.picture;
      const { question } = step;
      const frets = Array.from({ length: question.frets }, (_, k) => question.firstFret + k);
      const places = instrument.strings.flatMap((_, string) => frets.map((fret) => ({ string, fret })));
      const found = places.filter((place) => question.check(place).right);
      const root = tonicPitchClass(parseChord(target!)!.root);
      for (const { string, fret } of found) expect((stringMidi(instrument.strings[string]!) + fret) % 12).toBe(root);
    }),
  );
});

test("what does not apply is left out and said why", () => {
  const chart = parseChart("D  G  A\nlow water");
  const walk = whyWalk({
    chart,
    from: keyOf(2),
    to: keyOf(2),
    instrument: findPreset("box-adf")!,
    way: { retune: 0, capo: 0, shapeKey: "D" },
    seed: 1,
  });
  expect(walk.steps.map(({ kind }) => kind)).toEqual(["scale", "numbers", "neck"]);
  expect(walk.leftOut.map(({ why }) => why)).toEqual([
    "The song stays in D major.",
    "Nothing has to be raised: the song sounds where it is written.",
    "Nothing is retuned in this way.",
  ]);
});

test("common practice: on A D F♯, shapes in A with capo 3 sound in C, and a whole tone down makes G C E", () => {
  const question = { chart: parseChart("D  G  A\nlow water"), from: keyOf(2), to: keyOf(0), seed: 3 };
  const instrument = findPreset("box-adf")!;
  const capo = whyWalk({ ...question, instrument, way: { retune: 0, capo: 3, shapeKey: "A" } });
  const words = capo.steps.find(({ kind }) => kind === "capo")!.words.join(" ");
  expect(words).toContain("every string sounds 3 semitones higher");
  expect(words).toContain("A to C, D to F and F♯ to A");
  expect(words).toContain("A shapes sound in C");
  const down = whyWalk({ ...question, instrument, way: { retune: -2, capo: 0, shapeKey: "D" } });
  expect(down.steps.find(({ kind }) => kind === "retune")!.words.join(" ")).toContain("A to G, D to C and F♯ to E");
});

test("a chromatic chord is told by what it does", () => {
  const chart = parseChart("D  E7  A  C\nlow water");
  const { steps } = whyWalk({
    chart,
    from: keyOf(2),
    to: keyOf(0),
    instrument: findPreset("box-adf")!,
    way: { retune: 0, capo: 3, shapeKey: "A" },
    seed: 1,
  });
  const words = steps.find(({ kind }) => kind === "numbers")!.words.join(" ");
  expect(words).toContain("E7 leads to A: it is V7/V.");
  expect(words).toContain("C stands on the lowered 7th: ♭VII.");
});
