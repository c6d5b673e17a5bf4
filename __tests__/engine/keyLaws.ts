import assert from "node:assert/strict";
import fc from "fast-check";
import { keyParts, voiceEdges } from "@/shared/keys/keyParts";
import type { KeyParts, KeyScore, SingingVoice } from "@/shared/keys/keyScore";
import { nearestSemitone } from "@/shared/keys/nearestSemitone";
import { scoreKeys } from "@/shared/keys/scoreKeys";
import { tunePitches } from "@/shared/keys/tunePicture";
import { tonicPitchClass } from "@/shared/music/keyName";
import type { MelodyNote } from "@/shared/songs/melody";
import { anyNote, anyTune, anyVoice, byTonic, cents, type KeyLaw, law, movedTune, movedVoice } from "./keyCases";

const most: Readonly<KeyParts> = { comfort: 50, roomAbove: 15, roomBelow: 10, longHigh: 10, lowCarry: 15 };
const accidentals = new Map(
  Object.entries({ C: 0, G: 1, D: 2, A: 3, E: 4, B: 5, "F#": 6, F: 1, Bb: 2, Eb: 3, Ab: 4, Db: 5 }),
);
const shuffledTune = anyTune.chain((song) =>
  fc.shuffledSubarray(song.notes, { minLength: song.notes.length }).map((notes) => ({ song, notes })),
);
const wider = fc.record({ a: cents(0, 4), b: cents(0, 4), c: cents(0, 4), d: cents(0, 4) });
const split = fc.record({ at: fc.nat(), pieces: fc.integer({ min: 2, max: 8 }) });
const mirrored = fc.record({
  comfort: fc.integer({ min: 4, max: 10 }),
  reach: fc.integer({ min: 0, max: 6 }),
  notes: fc.array(anyNote(fc.integer({ min: 0, max: 20 })), { minLength: 1, maxLength: 12 }),
});
const rated = fc.array(fc.record({ midi: fc.integer({ min: 36, max: 84 }), effort: fc.integer({ min: 1, max: 5 }) }), {
  minLength: 1,
  maxLength: 4,
});

/** The laws of the key score for one singer. */
export const keyLaws: readonly KeyLaw[] = [
  law(
    "1: moving voice and song by the same interval changes no score",
    fc.property(anyTune, anyVoice, fc.integer({ min: -14, max: 14 }), (song, singer, by) => {
      const before = byTonic(scoreKeys(song, singer));
      const after = byTonic(scoreKeys(movedTune(song, by), movedVoice(singer, by)));
      for (const [pc, key] of before) {
        const moved = after.get((((pc + by) % 12) + 12) % 12)!;
        assert.deepEqual([moved.score, moved.parts, moved.beyond], [key.score, key.parts, key.beyond]);
      }
    }),
  ),
  law(
    "1: moving the voice alone moves every key's score with it, and so the best key",
    fc.property(anyTune, anyVoice, fc.integer({ min: -7, max: 7 }), (song, singer, by) => {
      const before = byTonic(scoreKeys(song, singer));
      const after = byTonic(scoreKeys(song, movedVoice(singer, by)));
      for (const [pc, key] of before) assert.equal(after.get((pc + by + 12) % 12)!.score, key.score);
    }),
  ),
  law(
    "2: widening range or comfort band lowers no score",
    fc.property(anyTune, anyVoice, wider, (song, singer, { a, b, c, d }) => {
      const comfort = { lowMidi: singer.comfort.lowMidi - a, highMidi: singer.comfort.highMidi + b };
      const range = {
        lowMidi: Math.min(singer.range.lowMidi - c, comfort.lowMidi),
        highMidi: Math.max(singer.range.highMidi + d, comfort.highMidi),
      };
      const before = byTonic(scoreKeys(song, singer));
      for (const [pc, key] of byTonic(scoreKeys(song, { comfort, range })))
        assert.ok(key.score >= before.get(pc)!.score);
    }),
  ),
  law(
    "3: a key with a note beyond the range ranks under every key without, and says which notes and how long",
    fc.property(anyTune, anyVoice, (song, singer) => {
      const keys = scoreKeys(song, singer);
      const [low, high] = [nearestSemitone(singer.range.lowMidi), nearestSemitone(singer.range.highMidi)];
      const whole = song.notes.reduce((sum, { duration }) => sum + duration, 0);
      for (const key of keys) {
        assert.equal(key.beyond, key.lowMidi < low || key.highMidi > high);
        const out = song.notes.filter(({ midi }) => midi + key.shift < low || midi + key.shift > high);
        const time = out.reduce((sum, { duration }) => sum + duration, 0);
        const marks = key.marks.filter(({ zone }) => zone === "beyond");
        const told = marks.reduce((sum, { share }) => sum + share, 0);
        assert.ok(Math.abs(told - time / whole) < 1e-9);
        assert.equal(marks.length, new Set(out.map(({ midi }) => midi)).size);
        if (key.beyond)
          assert.match(key.reason, /(Under 1|\d+) % (of the tune )?lies (above|below) your range \([A-G][♯♭]?\d/);
      }
      const within = keys.filter(({ beyond }) => !beyond);
      assert.deepEqual(keys.slice(0, within.length), within);
      const worst = Math.min(100, ...within.map(({ score }) => score));
      for (const { score } of keys.slice(within.length)) assert.ok(score < worst);
    }),
  ),
  law(
    "4: scaling all durations changes nothing but the part for long high notes",
    fc.property(anyTune, anyVoice, fc.constantFrom(0.1, 0.3, 0.5, 1.7, 3, 10), (song, singer, factor) => {
      const scaled = song.notes.map((note) => ({ ...note, duration: note.duration * factor }));
      for (let shift = -12; shift <= 12; shift++) {
        const but = (notes: readonly MelodyNote[]) => ({ ...partsInPlace(notes, singer, shift), longHigh: 0 });
        assert.deepEqual(but(scaled), but(song.notes));
      }
    }),
  ),
  law(
    "5: a held note costs at least what the same time in passing notes does",
    fc.property(anyTune, anyVoice, split, (song, singer, { at, pieces }) => {
      const chosen = at % song.notes.length;
      const passing = song.notes.flatMap((note, k) =>
        k === chosen ? Array.from({ length: pieces }, () => ({ ...note, duration: note.duration / pieces })) : [note],
      );
      const held = byTonic(scoreKeys(song, singer));
      for (const [pc, key] of byTonic(scoreKeys({ ...song, notes: passing }, singer)))
        assert.ok(held.get(pc)!.score <= key.score);
    }),
  ),
  law(
    "5: strain above costs at least what weakness the same distance below does",
    fc.property(mirrored, ({ comfort, reach, notes }) => {
      const singer: SingingVoice = {
        comfort: { lowMidi: 60 - comfort, highMidi: 60 + comfort },
        range: { lowMidi: 60 - comfort - reach, highMidi: 60 + comfort + reach },
      };
      const at = (side: 1 | -1) => notes.map((note) => ({ ...note, midi: 60 + side * note.midi }));
      assert.ok(sum(partsInPlace(at(1), singer)) <= sum(partsInPlace(at(-1), singer)));
    }),
  ),
  law(
    "6: parts are whole, stay within their maxima and add up to the score",
    fc.property(anyTune, anyVoice, (song, singer) => {
      for (const { parts, score } of scoreKeys(song, singer)) {
        assert.equal(sum(parts), score);
        for (const [name, points] of Object.entries(parts)) {
          assert.ok(Number.isInteger(points) && points >= 0);
          assert.ok(points <= most[name as keyof KeyParts]);
        }
      }
    }),
  ),
  law(
    "7: the order of the notes changes nothing",
    fc.property(shuffledTune, anyVoice, ({ song, notes }, singer) => {
      assert.deepEqual(scoreKeys({ ...song, notes }, singer), scoreKeys(song, singer));
    }),
  ),
  law(
    "7: equal scores are ordered by fewest accidentals, then by closeness to the present key",
    fc.property(anyTune, anyVoice, (song, singer) => {
      const keys = scoreKeys(song, singer);
      const away = (key: KeyScore) => {
        const up = (tonicPitchClass(key.tonic) - tonicPitchClass(song.home) + 12) % 12;
        return Math.min(up, 12 - up);
      };
      keys.slice(1).forEach((key, k) => {
        const ahead = keys[k]!;
        if (ahead.score !== key.score) return;
        const [first, second] = [accidentals.get(ahead.tonic)!, accidentals.get(key.tonic)!];
        assert.ok(first <= second);
        if (first === second) assert.ok(away(ahead) <= away(key));
      });
    }),
  ),
  law(
    "8: a pitch that felt hard raises no score, least of all of a key that dwells at or beyond it",
    fc.property(anyTune, anyVoice, rated, (song, singer, evidence) => {
      const before = byTonic(scoreKeys(song, singer));
      for (const [pc, key] of byTonic(scoreKeys(song, singer, { evidence })))
        assert.ok(key.score <= before.get(pc)!.score);
    }),
  ),
];

/** The parts of a tune exactly where it stands, moved by that much, in no other octave. */
function partsInPlace(notes: readonly MelodyNote[], singer: SingingVoice, shift = 0): KeyParts {
  const moved = notes.map((note) => ({ ...note, midi: note.midi + shift }));
  return keyParts(tunePitches({ kind: "melody", notes: moved, home: "C" }), voiceEdges(singer));
}

function sum({ comfort, roomAbove, roomBelow, longHigh, lowCarry }: KeyParts): number {
  return comfort + roomAbove + roomBelow + longHigh + lowCarry;
}
