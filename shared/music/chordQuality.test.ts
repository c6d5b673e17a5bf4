import { chordPitchClasses, parseChord, transposeChord } from "./chord";
import { type KeyName, scaleSteps, spellInKey, spellTonic, tonicPitchClass } from "./keyName";
import { plainAccidentals } from "./pitch";

/**
 * Every quality the trade writes, by the degrees it sounds above its root. Source of each: common practice of lead
 * sheets and chord charts; degrees as in any textbook of harmony ("b3" is a semitone below the third of a major scale).
 */
const grammar: readonly [degrees: string, symbols: string][] = [
  ["1 3 5", " M maj major Maj"],
  ["1 b3 5", "m min mi - − minor Min MIN"],
  ["1 3 5 b7", "7"],
  ["1 3 5 7", "maj7 M7 Maj7 MAJ7 ma7 Ma7 MA7 Δ Δ7 ∆ △7 7M (maj7)"],
  ["1 b3 5 b7", "m7 min7 mi7 -7 −7 Min7 MI7"],
  ["1 b3 5 7", "m(maj7) mM7 mmaj7 minmaj7 min(maj7) -Δ mΔ7 -maj7 -(maj7)"],
  ["1 b3 b5 b7", "m7b5 m7♭5 m7(b5) ø ø7 Ø -7b5 m7-5 m7−5 min7b5"],
  ["1 b3 b5", "dim ° o º mb5 m(b5)"],
  ["1 b3 b5 6", "dim7 °7 o7"],
  ["1 b3 b5 7", "dim(maj7) °M7 °(maj7)"],
  ["1 3 #5", "aug + (#5) +5 (+5)"],
  ["1 3 #5 b7", "aug7 +7 7#5 7(#5) 7+5 7+"],
  ["1 3 #5 7", "maj7#5 maj7(#5) +M7 aug(maj7) augmaj7 +Δ Δ#5 maj7+5"],
  ["1 3 b5", "(b5)"],
  ["1 3 b5 b7", "7b5 7(b5) 7-5"],
  ["1 3 b5 7", "maj7b5 maj7(b5) Δb5"],
  ["1 b3 #5", "m#5 m+ m(#5)"],
  ["1 b3 #5 b7", "m7#5 m7+5"],
  ["1 4 5", "sus4 sus (sus4) 4"],
  ["1 2 5", "sus2 (sus2)"],
  ["1 2 4 5", "sus2sus4 sus24"],
  ["1 4 5 b7", "7sus4 7sus 7(sus4)"],
  ["1 2 5 b7", "7sus2"],
  ["1 4 5 7", "maj7sus4"],
  ["1 4 5 6", "6sus4"],
  ["1 4 5 b7 9", "9sus4 9sus"],
  ["1 4 5 b7 9 13", "13sus4 13sus"],
  ["1 4 5 b7 b9", "7sus4b9 7b9sus4 7sus(b9)"],
  ["1 3 5 6", "6 M6 maj6 add6"],
  ["1 b3 5 6", "m6 -6 min6 madd6"],
  ["1 3 5 6 9", "6/9 69 6(9) 6add9 maj69"],
  ["1 b3 5 6 9", "m6/9 m69"],
  ["1 3 5 b7 9", "9 7(9) 7/9 7add9"],
  ["1 3 5 7 9", "maj9 M9 Δ9 maj7(9) ma9"],
  ["1 b3 5 b7 9", "m9 -9 min9 m7(9)"],
  ["1 b3 5 7 9", "mM9 m(maj9) mmaj9"],
  ["1 b3 b5 b7 9", "m9b5 ø9 m9(b5)"],
  ["1 3 5 b7 9 11", "11"],
  ["1 3 5 7 9 11", "maj11"],
  ["1 b3 5 b7 9 11", "m11 min11 -11 m9(11)"],
  ["1 b3 5 b7 11", "m7(11) m7add11 m7/11"],
  ["1 3 5 b7 9 13", "13 9(13)"],
  ["1 3 5 7 9 13", "maj13 M13 Δ13 maj9(13)"],
  ["1 b3 5 b7 9 13", "m13"],
  ["1 3 5 b7 13", "7(13) 7add13"],
  ["1 2 3 5", "add2 2"],
  ["1 3 4 5", "add4"],
  ["1 3 5 9", "add9 (add9) majadd9"],
  ["1 3 5 11", "add11 (add11)"],
  ["1 3 5 #11", "add#11 (add#11)"],
  ["1 b3 5 9", "madd9 m(add9)"],
  ["1 2 b3 5", "madd2"],
  ["1 b3 5 11", "madd11 m(add11)"],
  ["1 b3 5 b6", "mb6 m(b6)"],
  ["1 3 5 b7 b9", "7b9 7(b9) 7-9 7♭9"],
  ["1 3 5 b7 #9", "7#9 7(#9) 7+9 7♯9"],
  ["1 3 5 b7 #11", "7#11 7(#11) 7+11"],
  ["1 3 5 b7 b13", "7b13 7(b13)"],
  ["1 3 5 7 #11", "maj7#11 maj7(#11) Δ#11"],
  ["1 3 5 7 9 #11", "maj9#11"],
  ["1 b3 5 b7 b9", "m7b9"],
  ["1 3 5 b7 9 #11", "9#11 9(#11)"],
  ["1 3 b5 b7 9", "9b5"],
  ["1 3 #5 b7 9", "9#5 aug9 +9 9+5"],
  ["1 3 5 b7 b9 13", "13b9 13(b9) 7b9(13)"],
  ["1 3 5 b7 #9 13", "13#9"],
  ["1 3 5 b7 9 #11 13", "13#11 13(#11)"],
  ["1 3 5 b7 b9 #11", "7b9#11 7(b9,#11) 7(b9)(#11)"],
  ["1 3 5 b7 b9 b13", "7b9b13 7(b9,b13)"],
  ["1 3 b5 b7 b9", "7b5b9 7(b5,b9) 7b5(b9)"],
  ["1 3 #5 b7 #9", "7#5#9 7(#9,#5) +7#9 aug7#9"],
  ["1 3 #5 b7 b9", "7#5b9 +7b9"],
  ["1 3 b5 #5 b7 b9 #9", "7alt alt 7(alt)"],
  ["1 5", "5 no3 (no3) omit3"],
  ["1 3", "no5 (no5)"],
  ["1 5 b7", "7no3 7(no3)"],
  ["1 3 b7", "7no5 7omit5"],
  ["1 5 9", "add9no3 add9(no3)"],
];
const natural: Record<string, number> = { 1: 0, 2: 2, 3: 4, 4: 5, 5: 7, 6: 9, 7: 11, 9: 14, 11: 17, 13: 21 };
const semitones = (degree: string) =>
  natural[degree.replace(/^[#b]/, "")]! + (degree.startsWith("#") ? 1 : degree.startsWith("b") ? -1 : 0);
const symbolsOf = grammar.flatMap(([, symbols]) => symbols.split(" "));
const roots = [..."CDEFGAB"].flatMap((letter) => [letter, `${letter}#`, `${letter}b`, `${letter}♯`, `${letter}♭`]);
/** "C" and "b5" side by side would be a flat root. */
const joins = (root: string, quality: string) => !/^[#b♯♭]/.test(quality) || /[#b♯♭]$/.test(root);

test.each(grammar)("%s is %s, on every root and over every bass", (degrees, symbols) => {
  const intervals = degrees.split(" ").map(semitones);
  const wrong: string[] = [];
  for (const quality of symbols.split(" ")) {
    for (const root of roots.filter((each) => joins(each, quality))) {
      const pc = tonicPitchClass(root);
      const sounds = intervals.map((interval) => (pc + interval) % 12);
      for (const [bass, text] of [[null, root + quality] as const, ["Bb", `${root}${quality}/Bb`] as const]) {
        const chord = parseChord(text);
        const pcs = [...new Set(bass === null ? sounds : [...sounds, 10])].sort((x, y) => x - y);
        const right =
          chord?.text === text &&
          chord.quality === quality &&
          chord.bass === bass &&
          chord.intervals.join() === intervals.join() &&
          chordPitchClasses(chord).join() === pcs.join();
        if (!right) wrong.push(text);
      }
    }
  }
  expect(wrong).toEqual([]);
});

test("no symbol means two things", () => {
  expect(new Set(symbolsOf).size).toBe(symbolsOf.length);
  expect(grammar.length).toBeGreaterThan(70);
});

const keys = (["major", "minor"] as const).map((mode) =>
  Array.from({ length: 12 }, (_, pc): KeyName => ({ tonic: spellTonic(pc, mode), mode })),
);

test("every quality on every step of every key moves to every other key, spelled by it, and comes back as it was", () => {
  for (const quality of symbolsOf) {
    for (const from of keys.flat()) {
      for (const step of [0, 4]) {
        const above = scaleSteps(from.mode)[(step * 3 + symbolsOf.indexOf(quality)) % 7]!;
        const text = spellInKey((tonicPitchClass(from.tonic) + above) % 12, from) + quality;
        const chord = parseChord(text);
        if (!chord) throw new Error(`${text} was not read`);
        for (const to of keys.flat().filter(({ mode }) => mode === from.mode)) {
          const distance = tonicPitchClass(to.tonic) - tonicPitchClass(from.tonic);
          const moved = transposeChord(chord, distance, to, from);
          const spelled = spellInKey((tonicPitchClass(to.tonic) + above) % 12, to);
          if (plainAccidentals(moved) !== plainAccidentals(spelled + quality))
            throw new Error(`${text} from ${from.tonic} to ${to.tonic} became ${moved}`);
          const home = transposeChord(parseChord(moved)!, -distance, from, to);
          if (plainAccidentals(home) !== plainAccidentals(text))
            throw new Error(`${moved} went home to ${from.tonic} as ${home}, not ${text}`);
        }
      }
    }
  }
});

test("every quality on every root, also off the scale, sounds the same again after going and coming back", () => {
  for (const quality of symbolsOf) {
    const root = roots[symbolsOf.indexOf(quality) % roots.length]!;
    if (!joins(root, quality)) continue;
    const chord = parseChord(root + quality)!;
    for (const [from, ...others] of keys) {
      for (const to of others) {
        const distance = tonicPitchClass(to.tonic) - tonicPitchClass(from!.tonic);
        const moved = parseChord(transposeChord(chord, distance, to, from!))!;
        expect(moved.intervals).toEqual(chord.intervals);
        const home = parseChord(transposeChord(moved, -distance, from!, to))!;
        expect([home.intervals, chordPitchClasses(home)]).toEqual([chord.intervals, chordPitchClasses(chord)]);
      }
    }
  }
});
