import fc from "fast-check";
import { Chord as TonalChord } from "tonal";
import { type Chord, chordPitchClasses, chordThird, parseChord, transposeChord } from "./chord";
import { spellTonic, tonicPitchClass } from "./keyName";

const roots = ["C", "Db", "C#", "D", "Eb", "E", "F", "F#", "Gb", "G", "Ab", "G#", "A", "Bb", "B", "Cb"];

function read(text: string): Chord {
  const chord = parseChord(text);
  if (!chord) throw new Error(`${text} was not read`);
  return chord;
}

// Common practice of lead-sheet symbols; several ways of writing each quality.
const qualities: [string, string, number[]][] = [
  ["major", " M maj", [0, 4, 7]],
  ["minor", "m min - mi", [0, 3, 7]],
  ["dominant seventh", "7", [0, 4, 7, 10]],
  ["major seventh", "maj7 M7 Maj7 Δ Δ7 ma7 7M", [0, 4, 7, 11]],
  ["minor seventh", "m7 -7 min7", [0, 3, 7, 10]],
  ["minor with major seventh", "m(maj7) mM7 mmaj7 -Δ", [0, 3, 7, 11]],
  ["half diminished", "m7b5 ø ø7 -7b5 m7(b5) m7♭5", [0, 3, 6, 10]],
  ["diminished", "dim ° o", [0, 3, 6]],
  ["diminished seventh", "dim7 °7 o7", [0, 3, 6, 9]],
  ["augmented", "aug + (#5) +5", [0, 4, 8]],
  ["augmented seventh", "aug7 +7 7#5 7(#5) 7+5", [0, 4, 8, 10]],
  ["suspended fourth", "sus4 sus (sus4)", [0, 5, 7]],
  ["suspended second", "sus2", [0, 2, 7]],
  ["seventh, suspended", "7sus4 7sus", [0, 5, 7, 10]],
  ["sixth", "6", [0, 4, 7, 9]],
  ["minor sixth", "m6 -6", [0, 3, 7, 9]],
  ["six-nine", "6/9 69 6(9)", [0, 4, 7, 9, 14]],
  ["ninth", "9 7(9)", [0, 4, 7, 10, 14]],
  ["major ninth", "maj9 M9 maj7(9)", [0, 4, 7, 11, 14]],
  ["minor ninth", "m9", [0, 3, 7, 10, 14]],
  ["eleventh", "11", [0, 4, 7, 10, 14, 17]],
  ["thirteenth", "13", [0, 4, 7, 10, 14, 21]],
  ["added ninth", "add9 (add9)", [0, 4, 7, 14]],
  ["minor, added ninth", "madd9 m(add9)", [0, 3, 7, 14]],
  ["flat fifth", "7b5 7-5", [0, 4, 6, 10]],
  ["flat ninth", "7b9 7(b9) 7-9", [0, 4, 7, 10, 13]],
  ["sharp ninth", "7#9 7(#9)", [0, 4, 7, 10, 15]],
  ["sharp eleventh", "7#11 7(#11)", [0, 4, 7, 10, 18]],
  ["flat thirteenth", "7b13", [0, 4, 7, 10, 20]],
  ["several alterations", "7b9#11 7(b9,#11) 7(b9)(#11)", [0, 4, 7, 10, 13, 18]],
  ["no third", "no3 (no3) 5", [0, 7]],
  ["no fifth", "7no5 7(no5)", [0, 4, 10]],
];

describe("a chord symbol", () => {
  test.each(qualities)("of a %s chord is read however it is written", (_, written, intervals) => {
    for (const quality of written.split(" "))
      expect([quality, read(`F${quality}`).intervals]).toEqual([quality, intervals]);
  });

  // tonal 6 knows its own list of symbols: an independent reading of the common ones.
  test.each([
    "",
    "m",
    "7",
    "maj7",
    "m7",
    "m7b5",
    "dim",
    "dim7",
    "aug",
    "sus2",
    "sus4",
    "7sus4",
    "6",
    "m6",
    "9",
    "maj9",
    "m9",
    "7b9",
    "7#9",
    "7#11",
    "5",
    "madd9",
  ])("with the quality '%s' sounds as a theory library says", (quality) => {
    const expected = TonalChord.get(`Eb${quality}`).notes.map(tonicPitchClass);
    expect(chordPitchClasses(read(`Eb${quality}`))).toEqual([...new Set(expected)].sort((a, b) => a - b));
  });

  test("keeps what was written and reads glyphs", () => {
    expect(parseChord("B♭m7♭5/A♭")).toEqual({
      root: "Bb",
      quality: "m7♭5",
      intervals: [0, 3, 6, 10],
      bass: "Ab",
      text: "B♭m7♭5/A♭",
    });
  });

  test.each([
    "Amen",
    "Add",
    "Dad",
    "Bed",
    "Fine",
    "Am I",
    "N.C.",
    "",
    "H7",
    "C(",
    "C)",
    "C()",
    "C/H",
    "Cmaj7/",
    "G-string",
    "Em-bed",
    "am",
    "C((9))",
    "Do-re",
    "Cm7b",
    "Face",
    "E-mail",
    "C77",
  ])("is not '%s'", (word) => expect(parseChord(word)).toBeNull());

  test("tells its third", () => {
    expect(["A", "Am", "A5", "Asus4", "A°", "A7#9"].map((text) => chordThird(read(text)))).toEqual([
      "major",
      "minor",
      null,
      null,
      "minor",
      "major",
    ]);
  });
});

describe("a moved chord", () => {
  // Common practice, spelling by the key and by function.
  test.each([
    ["F#", "E", "D", "E"],
    ["Bb", "C", "D", "C"],
    ["Bb", "C", "Db", "Cb"],
    ["D/F#", "C", "Db", "Eb/G"],
    ["E/G#", "C", "D", "F#/A#"],
    ["E7/G#", "C", "Bb", "D7/F#"],
    ["Am/G#", "C", "D", "Bm/A#"],
    ["C#dim7", "C", "D", "D#dim7"],
    ["Ebdim7", "C", "D", "Fdim7"],
    ["F#m7b5", "C", "D", "G#m7b5"],
    ["F#", "C", "Eb", "A"],
    ["Ab", "C", "E", "C"],
    ["Eb", "C", "A", "C"],
    ["Db", "C", "G", "Ab"],
    ["C7/Bb", "C", "G", "G7/F"],
    ["Bm", "D", "Db", "Bbm"],
    ["Em7", "G", "F#", "D#m7"],
    ["G/B", "C", "F#", "C#/E#"],
  ])("%s from %s to %s is %s", (text, from, to, expected) => {
    const semitones = tonicPitchClass(to) - tonicPitchClass(from);
    const keys = [
      { tonic: to, mode: "major" },
      { tonic: from, mode: "major" },
    ] as const;
    expect(transposeChord(read(text), semitones, ...keys)).toBe(expected);
  });

  test("in a minor key raises the sixth and seventh by their letters", () => {
    const keys = [
      { tonic: "A", mode: "minor" },
      { tonic: "G", mode: "minor" },
    ] as const;
    const move = (text: string) => transposeChord(read(text), 2, ...keys);
    expect(["F#dim", "Gbdim", "Fbm7b5", "G#", "D/Gb"].map(move)).toEqual(["G#dim", "G#dim", "F#m7b5", "Bb", "E/G#"]);
  });

  // Common practice; each of these was once renamed without anything having moved.
  test.each(["F#m", "C#m", "G#m", "F#m(maj7)/E", "Abdim", "A#", "E/Ab", "D♯7", "Gbm7b5"])(
    "that stays in its key stays as it is written: %s",
    (text) => {
      for (const tonic of ["Bb", "F", "C", "A"]) {
        for (const mode of ["major", "minor", "dorian"] as const) {
          const key = { tonic, mode };
          expect([
            transposeChord(read(text), 0, key),
            transposeChord(read(text), 0, key, key),
            transposeChord(read(text), -12, key),
          ]).toEqual([text, text, text]);
        }
      }
    },
  );

  // Common practice: raised roots that lead up are sharps, borrowed chords flats.
  test.each([
    ["F#m", "Bb", "C", "G#m"],
    ["C#m", "F", "G", "D#m"],
    ["G#m", "Bb", "C", "A#m"],
    ["F#m(maj7)/E", "Bb", "C", "G#m(maj7)/F#"],
    ["C#m7", "C", "Bb", "Bm7"],
    ["C#m7", "C", "F", "F#m7"],
    ["F#m7", "C", "D", "G#m7"],
    ["Ebm", "C", "D", "Fm"],
    ["Ebm", "C", "G", "Bbm"],
    ["G#dim7", "C", "B", "Gdim7"],
    ["A#", "C", "F", "Eb"],
    ["D#", "C", "F", "Ab"],
    ["Gb7", "C", "D", "Ab7"],
    ["F#7", "C", "D", "G#7"],
    ["F#5", "C", "Bb", "E5"],
    ["C#m/A#", "F", "G", "D#m/B#"],
  ])("%s from %s to %s keeps its function: %s", (text, from, to, expected) => {
    const semitones = tonicPitchClass(to) - tonicPitchClass(from);
    const keys = [
      { tonic: to, mode: "major" },
      { tonic: from, mode: "major" },
    ] as const;
    expect(transposeChord(read(text), semitones, ...keys)).toBe(expected);
  });

  test("is respelled where the key only changes its name", () => {
    const keys = [
      { tonic: "Gb", mode: "major" },
      { tonic: "F#", mode: "major" },
    ] as const;
    expect(["F#", "C#7/E#", "D#m"].map((text) => transposeChord(read(text), 0, ...keys))).toEqual([
      "Gb",
      "Db7/F",
      "Ebm",
    ]);
  });

  test("has no double accidental in any key", () => {
    for (const root of roots) {
      for (const quality of ["", "m", "dim7", "5"]) {
        for (let semitones = 0; semitones < 12; semitones += 1) {
          for (const mode of ["major", "minor"] as const) {
            const key = { tonic: spellTonic(semitones, mode), mode };
            const moved = transposeChord(read(`${root}${quality}/A`), semitones, key, { tonic: "C", mode });
            if (/##|bb/.test(moved)) throw new Error(`${root}${quality} by ${semitones} became ${moved}`);
          }
        }
      }
    }
  });

  test("keeps the writer's accidental signs", () => {
    expect(transposeChord(read("D♭m7♭5/C♭"), 2, { tonic: "Eb", mode: "major" })).toBe("E♭m7♭5/D♭");
  });

  test("needs whole semitones", () => {
    expect(() => transposeChord(read("C"), 0.5, { tonic: "C", mode: "major" })).toThrow(RangeError);
  });

  test("sounds exactly the interval away, in all keys, roots and qualities, and comes back", () => {
    const everyQuality = qualities.flatMap(([, written]) => written.split(" "));
    for (const quality of everyQuality) {
      for (const root of roots) {
        const chord = read(`${root}${quality}/E`);
        const before = chordPitchClasses(chord);
        for (let semitones = 0; semitones < 12; semitones += 1) {
          const key = { tonic: spellTonic(semitones, "major"), mode: "major" } as const;
          const moved = read(transposeChord(chord, semitones, key));
          const home = read(transposeChord(moved, -semitones, { tonic: "C", mode: "major" }));
          const expected = before.map((pc) => (pc + semitones) % 12).sort((a, b) => a - b);
          if (`${chordPitchClasses(moved)}` !== `${expected}`)
            throw new Error(`${chord.text} by ${semitones} became ${moved.text}`);
          if (`${chordPitchClasses(home)}` !== `${before}`) throw new Error(`${moved.text} went home as ${home.text}`);
          if (home.intervals.join() !== chord.intervals.join()) throw new Error(`${chord.text} lost its quality`);
        }
      }
    }
  });
});

test("any text is read or refused, never more", () => {
  const piece = fc.constantFrom(..."A G# Bb m maj 7 9 sus dim ( ) / b5 #9 add , + - ° 13 no x".split(" "));
  fc.assert(
    fc.property(
      fc.oneof(
        fc.string(),
        fc.array(piece, { maxLength: 8 }).map((pieces) => pieces.join("")),
      ),
      (text) => {
        const chord = parseChord(text);
        if (!chord) return;
        expect(chord.text).toBe(text);
        expect(chord.intervals).toEqual([...new Set(chord.intervals)].sort((a, b) => a - b));
        expect(chord.intervals[0]).toBe(0);
        expect(Math.max(...chord.intervals)).toBeLessThan(24);
      },
    ),
    { numRuns: 3000 },
  );
});
