import fc from "fast-check";
import { parseKeyName, spellTonic, tonicPitchClass } from "../../shared/music/keyName";
import { parseChart, printChart, transposeChart } from "../../shared/songs/chart";
import { findKey, type KeyFinding } from "../../shared/songs/findKey";
import { answer, casesOf, exactShare, keyBars, keyPoints, meanPoints, notesOf } from "../bench/keyScores";
import type { KnownSong } from "./tunes/knownSong";
import { knownSongs } from "./tunes/knownSongs";

/** The key is found from notes and chords alone; what the file states is not passed on. */
const find = (song: KnownSong): KeyFinding =>
  findKey(song.chords === undefined ? { notes: notesOf(song) } : { chart: parseChart(song.chords) })!;
const casesKey = (key: string) => parseKeyName(key)?.mode;
const label = ({ tonic, mode }: KeyFinding["key"]) =>
  tonic + (mode === "minor" ? "m" : mode === "major" ? "" : ` ${mode}`);

const answers = casesOf(knownSongs).map(answer);

test("the corpus has tunes with chords, tunes alone and chords alone, in major, minor and modes, each with its source", () => {
  expect(knownSongs.length).toBeGreaterThanOrEqual(60);
  expect(new Set(knownSongs.map(({ name }) => name)).size).toBe(knownSongs.length);
  for (const { source } of knownSongs) expect(source.length).toBeGreaterThan(8);
  for (const kind of ["tune with chords", "tune alone", "chords alone"])
    expect(answers.filter((each) => each.kind === kind).length).toBeGreaterThanOrEqual(20);
  for (const [mode, least] of [
    ["major", 40],
    ["minor", 15],
    ["dorian", 5],
    ["mixolydian", 4],
  ] as const)
    expect(knownSongs.filter(({ key }) => casesKey(key) === mode).length).toBeGreaterThanOrEqual(least);
});

test.each(keyBars)("$name", ({ kind, measure, atLeast }) => {
  const among = kind === null ? answers : answers.filter((each) => each.kind === kind);
  expect(measure === "exact" ? exactShare(among) : meanPoints(among)).toBeGreaterThanOrEqual(atLeast);
});

test("the half that was not looked at reaches the same bars", () => {
  const unseen = answers.filter(({ half }) => half === "held out");
  expect(exactShare(unseen)).toBeGreaterThanOrEqual(0.9);
  expect(meanPoints(unseen)).toBeGreaterThanOrEqual(0.92);
});

// MIREX, Audio Key Detection: 1 exact, 0.5 perfect fifth, 0.3 relative, 0.2 parallel.
test.each([
  ["C", "C", 1],
  ["G", "C", 0.5],
  ["F", "C", 0.5],
  ["Am", "C", 0.3],
  ["Cm", "C", 0.2],
  ["D dorian", "C", 0.3],
  ["D dorian", "Dm", 0.2],
  ["F#", "Gb", 1],
  ["D", "C", 0],
  ["Em", "C", 0],
])("%s where %s is right scores %s", (found, right, points) => {
  expect(keyPoints(parseKeyName(found)!, parseKeyName(right)!)).toBe(points);
});

test.each(knownSongs.map((song) => [song.name, song] as const))(
  "%s is answered with words and a runner-up",
  (_, song) => {
    const { key, runnerUp, confidence, margin, reasons } = find(song);
    expect(label(runnerUp)).not.toBe(label(key));
    expect(margin).toBeGreaterThanOrEqual(0);
    expect(confidence).toBeGreaterThan(1 / 24);
    expect(confidence).toBeLessThanOrEqual(1);
    expect(reasons.length).toBeGreaterThan(0);
    for (const reason of reasons) expect(reason).toMatch(/^[A-Z][^#!]*\.$/);
    expect(reasons.some((reason) => reason.startsWith("It could be "))).toBe(margin < 0.05);
  },
);

test("moving a song moves its key, and nothing else", () => {
  fc.assert(
    fc.property(fc.constantFrom(...knownSongs), fc.integer({ min: 1, max: 11 }), (song, semitones) => {
      const before = find(song);
      const target = {
        tonic: spellTonic((tonicPitchClass(before.key.tonic) + semitones) % 12, before.key.mode),
        mode: before.key.mode,
      };
      const after =
        song.chords === undefined
          ? findKey({ notes: notesOf(song).map((note) => ({ ...note, midi: note.midi + semitones })) })!
          : findKey({ chart: parseChart(printChart(transposeChart(parseChart(song.chords), before.key, target))) })!;
      expect(after.key).toEqual(target);
      expect(after.margin).toBeCloseTo(before.margin, 9);
    }),
    { numRuns: 60 },
  );
});

test("a song that starts and ends on its home chord is told so in plain words", () => {
  const { reasons } = findKey({ chart: parseChart("D G A D\nBm G A D") })!;
  expect(reasons).toEqual([
    "It starts and ends on D.",
    "D, G and A are its first, fourth and fifth chords.",
    "All its chords belong to D major.",
  ]);
});

test("chords and tune together outweigh either: a tune that could be in two keys follows its chords", () => {
  const notes = [67, 69, 71, 74, 76, 74, 71, 69].map((midi, start) => ({ start, duration: 1, midi }));
  expect(findKey({ notes, chart: parseChart("Em Am B7 Em") })!.key).toEqual({ tonic: "E", mode: "minor" });
  expect(findKey({ notes, chart: parseChart("G C D7 G") })!.key).toEqual({ tonic: "G", mode: "major" });
});

// Common practice: dorian by its major IV, mixolydian by its bVII.
test.each([
  ["Dm C Dm G", "D dorian", "G"],
  ["Am D Am D", "A dorian", "D"],
  ["Em A Em D A Em", "E dorian", "A"],
  ["G F C G", "G mixolydian", "F"],
  ["D C G D\nD C G D", "D mixolydian", "C"],
  ["A♭ G♭ D♭ A♭", "Ab mixolydian", "G♭"],
])("%s is told as %s, and why", (chords, key, mark) => {
  const found = findKey({ chart: parseChart(chords) })!;
  expect(label(found.key)).toBe(key);
  expect(found.reasons.join(" ")).toContain(`; ${mark} would not belong to`);
  expect(["major", "minor"]).toContain(found.runnerUp.mode);
});

test("a mode with one sign alone is the runner-up", () => {
  const found = findKey({ chart: parseChart("Dm F C G") })!;
  expect(label(found.key)).toBe("C");
  expect(label(found.runnerUp)).toBe("D dorian");
});

test.each([
  ["C G F C", "C"],
  ["Am Dm E7 Am", "Am"],
  ["Dm G7 C C", "C"],
  ["G C D7 G", "G"],
  ["Dm Gm A7 Dm", "Dm"],
  ["Em C G D", "G"],
  ["C F G C", "C"],
])("%s stays plain %s, without any mode", (chords, key) => {
  const found = findKey({ chart: parseChart(chords) })!;
  expect([found.key.mode, found.runnerUp.mode].filter((mode) => mode !== "major" && mode !== "minor")).toEqual([]);
  expect(label(found.key)).toBe(key);
});

test("two or three chords from outside are joined as one says it", () => {
  const { reasons } = findKey({ chart: parseChart("Bb Eb F Bb Gm7b5/Bb Eb F C#dim7 Bb Bb Eb F Bb") })!;
  expect(reasons).toContain("Outside B♭ major there are only Gm7♭5/B♭ and C♯dim7.");
});

test("little to go by gives little confidence, and nothing gives no answer", () => {
  const one = findKey({ chart: parseChart("G7") })!;
  const many = findKey({ chart: parseChart("G C D7 G\nG C D7 G\nG C D7 G") })!;
  expect(one.confidence).toBeLessThan(0.7);
  expect(many.confidence).toBeGreaterThan(one.confidence);
  expect(findKey({})).toBeNull();
  expect(findKey({ chart: parseChart("only words"), notes: [] })).toBeNull();
});

test("the key is spelled as its chart spells it", () => {
  expect(findKey({ chart: parseChart("Gb Cb Db7 Gb") })!.key.tonic).toBe("Gb");
  expect(findKey({ chart: parseChart("F# B C#7 F#") })!.key.tonic).toBe("F#");
  expect(findKey({ chart: parseChart("A# D# F7 A#") })!.key.tonic).toBe("Bb");
});
