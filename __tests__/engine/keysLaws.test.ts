import fc from "fast-check";
import type { KeyScore, SingingVoice, Tune } from "@/shared/keys/keyScore";
import { keyParts, voiceEdges } from "@/shared/keys/keyParts";
import { scoreKeys } from "@/shared/keys/scoreKeys";
import { tunePitches } from "@/shared/keys/tunePicture";
import type { MelodyNote } from "@/shared/songs/melody";
import { tonicPitchClass } from "@/shared/music/keyName";

const noteOf = (midi: fc.Arbitrary<number>): fc.Arbitrary<MelodyNote> =>
  fc.record({ start: fc.constant(0), duration: fc.constantFrom(0.25, 0.5, 1, 1.5, 2, 4), midi });
const tune = fc.record({
  kind: fc.constant("melody" as const),
  notes: fc.array(noteOf(fc.integer({ min: 50, max: 76 })), { minLength: 1, maxLength: 24 }),
  home: fc.constantFrom("C", "D", "Eb", "F#", "G", "A", "Bb"),
});
/** Edges in hundredths of a semitone, as a take gives them. */
const cents = (low: number, high: number) =>
  fc.integer({ min: low * 100, max: high * 100 }).map((value) => value / 100);
const voice: fc.Arbitrary<SingingVoice> = fc
  .record({ low: cents(40, 58), below: cents(0, 6), width: cents(2, 18), above: cents(0, 8) })
  .map(({ low, below, width, above }) => ({
    range: { lowMidi: low, highMidi: low + below + width + above },
    comfort: { lowMidi: low + below, highMidi: low + below + width },
  }));

const byTonic = (keys: readonly KeyScore[]) => new Map(keys.map((key) => [tonicPitchClass(key.tonic), key]));
const runs = { numRuns: 100 };

describe("laws of the key score", () => {
  test("moving voice and song by the same interval changes no score", () => {
    fc.assert(
      fc.property(tune, voice, fc.integer({ min: -14, max: 14 }), (song, singer, by) => {
        const before = byTonic(scoreKeys(song, singer));
        const after = byTonic(scoreKeys(movedTune(song, by), movedVoice(singer, by)));
        for (const [pc, key] of before) {
          const moved = after.get((((pc + by) % 12) + 12) % 12)!;
          expect([moved.score, moved.parts, moved.beyond]).toEqual([key.score, key.parts, key.beyond]);
        }
      }),
      runs,
    );
  });

  test("moving the voice alone moves every key's score with it, and so the best key", () => {
    fc.assert(
      fc.property(tune, voice, fc.integer({ min: -7, max: 7 }), (song, singer, by) => {
        const before = byTonic(scoreKeys(song, singer));
        const after = byTonic(scoreKeys(song, movedVoice(singer, by)));
        for (const [pc, key] of before) expect(after.get((pc + by + 12) % 12)!.score).toBe(key.score);
      }),
      runs,
    );
  });

  test("widening range or comfort band lowers no score", () => {
    const more = fc.record({ a: cents(0, 4), b: cents(0, 4), c: cents(0, 4), d: cents(0, 4) });
    fc.assert(
      fc.property(tune, voice, more, (song, singer, { a, b, c, d }) => {
        const wider: SingingVoice = {
          comfort: { lowMidi: singer.comfort.lowMidi - a, highMidi: singer.comfort.highMidi + b },
          range: {
            lowMidi: Math.min(singer.range.lowMidi - c, singer.comfort.lowMidi - a),
            highMidi: Math.max(singer.range.highMidi + d, singer.comfort.highMidi + b),
          },
        };
        const before = byTonic(scoreKeys(song, singer));
        for (const [pc, key] of byTonic(scoreKeys(song, wider)))
          expect(key.score).toBeGreaterThanOrEqual(before.get(pc)!.score);
      }),
      runs,
    );
  });

  test("a key with a note beyond the range ranks under every key without, and says which notes and how long", () => {
    fc.assert(
      fc.property(tune, voice, (song, singer) => {
        const keys = scoreKeys(song, singer);
        const [low, high] = [Math.round(singer.range.lowMidi), Math.round(singer.range.highMidi)];
        for (const key of keys) {
          expect(key.beyond).toBe(key.lowMidi < low || key.highMidi > high);
          if (key.beyond)
            expect(key.reason).toMatch(/(Under 1|\d+) % (of the tune )?lies (above|below) your range \([A-G][♯♭]?\d/);
        }
        const within = keys.filter(({ beyond }) => !beyond);
        expect(keys.slice(0, within.length)).toEqual(within);
        const worst = Math.min(100, ...within.map(({ score }) => score));
        for (const { score } of keys.slice(within.length)) expect(score).toBeLessThan(worst);
      }),
      runs,
    );
  });

  test("scaling all durations changes nothing but the part for long high notes", () => {
    fc.assert(
      fc.property(tune, voice, fc.constantFrom(0.1, 0.3, 0.5, 1.7, 3, 10), (song, singer, factor) => {
        const scaled = { ...song, notes: song.notes.map((note) => ({ ...note, duration: note.duration * factor })) };
        const before = byTonic(scoreKeys(song, singer));
        for (const [pc, key] of byTonic(scoreKeys(scaled, singer))) {
          const was = before.get(pc)!;
          if (key.octave !== was.octave) continue;
          expect({ ...key.parts, longHigh: 0 }).toEqual({ ...was.parts, longHigh: 0 });
        }
      }),
      runs,
    );
  });

  test("a held note costs at least what the same time in passing notes does", () => {
    const split = fc.record({ at: fc.nat(), pieces: fc.integer({ min: 2, max: 8 }) });
    fc.assert(
      fc.property(tune, voice, split, (song, singer, { at, pieces }) => {
        const chosen = at % song.notes.length;
        const passing = song.notes.flatMap((note, k) =>
          k === chosen ? Array.from({ length: pieces }, () => ({ ...note, duration: note.duration / pieces })) : [note],
        );
        const held = byTonic(scoreKeys(song, singer));
        for (const [pc, key] of byTonic(scoreKeys({ ...song, notes: passing }, singer)))
          expect(held.get(pc)!.score).toBeLessThanOrEqual(key.score);
      }),
      runs,
    );
  });

  test("strain above costs at least what weakness the same distance below does", () => {
    const shape = fc.record({
      comfort: fc.integer({ min: 4, max: 10 }),
      reach: fc.integer({ min: 0, max: 6 }),
      notes: fc.array(noteOf(fc.integer({ min: 0, max: 20 })), { minLength: 1, maxLength: 12 }),
    });
    fc.assert(
      fc.property(shape, ({ comfort, reach, notes }) => {
        const middle = 60;
        const singer: SingingVoice = {
          comfort: { lowMidi: middle - comfort, highMidi: middle + comfort },
          range: { lowMidi: middle - comfort - reach, highMidi: middle + comfort + reach },
        };
        const at = (side: 1 | -1) => notes.map((note) => ({ ...note, midi: middle + side * note.midi }));
        const above = scoreInPlace(at(1), singer);
        const below = scoreInPlace(at(-1), singer);
        expect(above).toBeLessThanOrEqual(below);
      }),
      runs,
    );
  });

  test("parts are whole, stay within their maxima and add up to the score", () => {
    fc.assert(
      fc.property(tune, voice, (song, singer) => {
        for (const { parts, score } of scoreKeys(song, singer)) {
          const { comfort, roomAbove, roomBelow, longHigh, lowCarry } = parts;
          expect(comfort + roomAbove + roomBelow + longHigh + lowCarry).toBe(score);
          const most = { comfort: 50, roomAbove: 15, roomBelow: 10, longHigh: 10, lowCarry: 15 };
          for (const [name, points] of Object.entries(parts)) {
            expect(Number.isInteger(points) && points >= 0).toBe(true);
            expect(points).toBeLessThanOrEqual(most[name as keyof typeof most]);
          }
        }
      }),
      runs,
    );
  });

  test("the order of the notes changes nothing", () => {
    const shuffled = tune.chain((song) =>
      fc.shuffledSubarray(song.notes, { minLength: song.notes.length }).map((notes) => ({ song, notes })),
    );
    fc.assert(
      fc.property(shuffled, voice, ({ song, notes }, singer) => {
        expect(scoreKeys({ ...song, notes }, singer)).toEqual(scoreKeys(song, singer));
      }),
      runs,
    );
  });

  test("equal scores are ordered by fewest accidentals, then by closeness to the present key", () => {
    const accidentals = new Map(
      Object.entries({ C: 0, G: 1, D: 2, A: 3, E: 4, B: 5, "F#": 6, F: 1, Bb: 2, Eb: 3, Ab: 4, Db: 5 }),
    );
    fc.assert(
      fc.property(tune, voice, (song, singer) => {
        const keys = scoreKeys(song, singer);
        const away = (key: KeyScore) => {
          const up = (tonicPitchClass(key.tonic) - tonicPitchClass(song.home) + 12) % 12;
          return Math.min(up, 12 - up);
        };
        keys.slice(1).forEach((key, k) => {
          const ahead = keys[k]!;
          if (ahead.score !== key.score) return;
          const [first, second] = [accidentals.get(ahead.tonic)!, accidentals.get(key.tonic)!];
          expect(first).toBeLessThanOrEqual(second);
          if (first === second) expect(away(ahead)).toBeLessThanOrEqual(away(key));
        });
      }),
      runs,
    );
  });

  test("a pitch that felt hard raises no score, least of all of a key that dwells at or beyond it", () => {
    const rated = fc.array(
      fc.record({ midi: fc.integer({ min: 36, max: 84 }), effort: fc.integer({ min: 1, max: 5 }) }),
      { minLength: 1, maxLength: 4 },
    );
    fc.assert(
      fc.property(tune, voice, rated, (song, singer, evidence) => {
        const before = byTonic(scoreKeys(song, singer));
        for (const [pc, key] of byTonic(scoreKeys(song, singer, { evidence })))
          expect(key.score).toBeLessThanOrEqual(before.get(pc)!.score);
      }),
      runs,
    );
  });
});

function movedTune<T extends Extract<Tune, { kind: "melody" }>>(song: T, by: number): Tune {
  const names = ["C", "Db", "D", "Eb", "E", "F", "F#", "G", "Ab", "A", "Bb", "B"];
  const home = names[(((tonicPitchClass(song.home) + by) % 12) + 12) % 12]!;
  return { kind: "melody", home, notes: song.notes.map((note) => ({ ...note, midi: note.midi + by })) };
}

function movedVoice({ range, comfort }: SingingVoice, by: number): SingingVoice {
  return {
    range: { lowMidi: range.lowMidi + by, highMidi: range.highMidi + by },
    comfort: { lowMidi: comfort.lowMidi + by, highMidi: comfort.highMidi + by },
  };
}

/** The score of a tune exactly where it stands, in no other octave. */
function scoreInPlace(notes: readonly MelodyNote[], singer: SingingVoice): number {
  const parts = keyParts(tunePitches({ kind: "melody", notes, home: "C" }), voiceEdges(singer));
  return parts.comfort + parts.roomAbove + parts.roomBelow + parts.longHigh + parts.lowCarry;
}
