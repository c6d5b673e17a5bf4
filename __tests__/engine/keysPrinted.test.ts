import { scoreKeys } from "@/shared/keys/scoreKeys";
import type { SingingVoice, Tune } from "@/shared/keys/keyScore";
import { scoreSharedKeys } from "@/shared/keys/sharedKey";
import { voiceTypes } from "@/shared/keys/voiceTypes";
import { parseNoteName } from "@/shared/music/pitch";
import { parseKeyName } from "@/shared/music/keyName";
import { cycleDose, tessitura, tessituragram } from "@/shared/songs/tessituragram";
import { notesOf } from "../bench/keyScores";
import { amongBestTwo, printedKeyHits } from "./printedKeyHits";
import { middleRanges, unisonBand, unisonReadings, usualBand } from "./unisonBands";
import { bestPlaces, voicePairMoves } from "./voicePairMoves";
import { printedKeys } from "./tunes/printedKeys";
import { knownSongs } from "./tunes/knownSongs";

const tunes = printedKeys.map(({ name }) => {
  const song = knownSongs.find((each) => each.name === name)!;
  return [name, { kind: "melody", notes: notesOf(song), home: parseKeyName(song.key)!.tonic } satisfies Tune] as const;
});
const single = voiceTypes.filter(({ kind }) => kind === "voice");

describe("keys that hymnals and songbooks print", () => {
  test("at least twelve traditional tunes are asked, each with the book that prints it", () => {
    expect(new Set(printedKeys.map(({ name }) => name)).size).toBeGreaterThanOrEqual(12);
    for (const { printedIn } of printedKeys) expect(printedIn).toMatch(/\b(19|18|20)\d\d\b/);
  });

  test("the printed key is among our best two in at least 80 %, for the usual unison band", () => {
    const hits = printedKeyHits(usualBand.voice);
    expect(hits.every(({ place }) => place >= 1 && place <= 12)).toBe(true);
    expect(amongBestTwo(hits)).toBeGreaterThanOrEqual(0.8);
  });

  test("so it is within the other published range of the middle voice, and among the keys that books have", () => {
    const within = (range: (typeof middleRanges)[number]) => unisonBand(unisonReadings[0]!, range)!.voice;
    for (const range of middleRanges.slice(0, 2))
      for (const mostAccidentals of [7, 4])
        expect(amongBestTwo(printedKeyHits(within(range), mostAccidentals))).toBeGreaterThanOrEqual(0.8);
  });
});

describe("published ranges by voice type", () => {
  // D. M. Randel (ed.), The New Harvard Dictionary of Music, 1986: every range is 20 or 21 semitones.
  test("the table is the published one, high to low", () => {
    const table = single.map(({ id, voice: { range } }) => [id, range.lowMidi, range.highMidi]);
    expect(table).toEqual([
      ["soprano", 60, 81],
      ["mezzo", 57, 77],
      ["alto", 53, 74],
      ["tenor", 47, 67],
      ["baritone", 43, 64],
      ["bass", 40, 60],
    ]);
  });

  test("each names its source, keeps comfort inside range, and men in unison sing an octave under women", () => {
    for (const { voice, source } of voiceTypes) {
      expect(voice.comfort.lowMidi).toBeGreaterThanOrEqual(voice.range.lowMidi);
      expect(voice.comfort.highMidi).toBeLessThanOrEqual(voice.range.highMidi);
      expect(source).toMatch(/range: .+; comfort:? .+/);
    }
    const [women, men] = ["women", "men"].map((id) => voiceTypes.find((type) => type.id === id)!.voice);
    expect(men).toEqual(moved(women!, -12));
  });

  const moves = voicePairMoves();

  test("for two of them the best keys move by what the voices differ, give or take a semitone, in every tune", () => {
    expect(moves).toHaveLength(printedKeys.length * 15);
    expect(moves.filter(({ offBy }) => offBy > 1)).toEqual([]);
  });

  test("so does the first place wherever one key alone is best; where several are, accidentals choose among them", () => {
    const alone = moves.filter((move) => move.alone);
    expect(alone.length).toBeGreaterThan(50);
    expect(alone.filter(({ firstOffBy }) => firstOffBy > 1)).toEqual([]);
    for (const [, tune] of tunes)
      for (const { voice } of single) expect(bestPlaces(tune, voice)).toContain(scoreKeys(tune, voice)[0]!.lowMidi);
  });

  test.each([1, 5])("a voice %i semitones higher has its best keys exactly that much higher", (by) => {
    for (const [, tune] of tunes)
      for (const { voice } of single)
        expect(bestPlaces(tune, moved(voice, by))).toEqual(bestPlaces(tune, voice).map((low) => low + by));
  });

  test("women and men in unison share every key fairly, an octave apart", () => {
    const [women, men] = ["women", "men"].map((id) => voiceTypes.find((type) => type.id === id)!);
    for (const [, tune] of tunes)
      for (const key of scoreSharedKeys(tune, [women!, men!])) {
        const [her, him] = key.singers;
        expect(him!.score).toBe(her!.score);
        expect(her!.shift - him!.shift).toBe(12);
      }
  });
});

describe("the worked tessituragram", () => {
  // "Ah! vous dirai-je, maman" in C4 major, quarter = 1, the last of each phrase = 2; figures worked out by hand.
  const notes = notesOf(knownSongs.find(({ name }) => name === "Ah! vous dirai-je, maman")!);

  test("eighth notes of the histogram, mean, spread, quartiles and cycle dose", () => {
    const total = notes.reduce((sum, { duration }) => sum + duration, 0);
    expect(total).toBe(48);
    const beats = tessituragram(notes).map(({ midi, share }) => [midi, Math.round(share * 48 * 1e9) / 1e9]);
    expect(beats).toEqual([
      [60, 8],
      [62, 8],
      [64, 8],
      [65, 8],
      [67, 12],
      [69, 4],
    ]);
    const figures = tessitura(notes)!;
    expect(figures.mean).toBeCloseTo(64.3333, 4);
    expect(figures.sd).toBeCloseTo(2.7789, 4);
    expect([figures.q1, figures.median, figures.q3]).toEqual([62, 64, 67]);
    expect(cycleDose(notes, 1)).toBeCloseTo(16337.11, 2);
  });

  test("for a singer A2 to E4, an octave down: 3 below, 7 above, so best moved up by 2", () => {
    const voice = {
      range: { lowMidi: parseNoteName("A2")!, highMidi: parseNoteName("E4")! },
      comfort: { lowMidi: 47, highMidi: 60 },
    };
    const inC = scoreKeys({ kind: "melody", notes, home: "C" }, voice).find(({ tonic }) => tonic === "C")!;
    expect(inC.reserves).toEqual({ upper: 7, lower: 3, tessituraShift: -2 });
  });
});

function moved({ range, comfort }: SingingVoice, by: number): SingingVoice {
  return {
    range: { lowMidi: range.lowMidi + by, highMidi: range.highMidi + by },
    comfort: { lowMidi: comfort.lowMidi + by, highMidi: comfort.highMidi + by },
  };
}
