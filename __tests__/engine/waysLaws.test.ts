import fc from "fast-check";
import type { Instrument } from "@/shared/instruments/instrument";
import { presets } from "@/shared/instruments/presets";
import { stringMidi } from "@/shared/instruments/tension";
import { fretSemitones } from "@/shared/instruments/frets";
import { chordPitchClasses, parseChord, transposeChord } from "@/shared/music/chord";
import { spellTonic, tonicPitchClass, type KeyName } from "@/shared/music/keyName";
import { findWays } from "@/shared/ways/findWays";
import type { Way, WayPreferences } from "@/shared/ways/way";
import { wayCandidates } from "@/shared/ways/wayCandidates";
import { differentWays } from "@/shared/ways/wayOrder";

const major = (tonic: string): KeyName => ({ tonic, mode: "major" });
const pcs = fc.integer({ min: 0, max: 11 });
/** Chords of a song in C, carried into its key. */
const song = fc.record({
  chords: fc.uniqueArray(fc.constantFrom("C", "F", "G", "Am", "Dm", "Em", "G7", "D7", "Bb", "Fmaj7", "Gsus4"), {
    minLength: 1,
    maxLength: 5,
  }),
  from: pcs.map((pc) => major(spellTonic(pc, "major"))),
  to: pcs.map((pc) => major(spellTonic(pc, "major"))),
});
const preset = fc.constantFrom(...presets.filter(({ fretMap }) => fretMap === undefined));
const preferences: fc.Arbitrary<WayPreferences> = fc.record({
  barre: fc.constantFrom(0, 0.3, 1),
  capo: fc.constantFrom(0, 0.3, 1),
  retune: fc.constantFrom(0, 0.3, 1),
  knownShapes: fc.constantFrom([], ["C", "F", "G", "Am"], ["G", "C", "D", "Em"]),
  highestCapo: fc.integer({ min: 0, max: 9 }),
});
const inKey = (chords: readonly string[], from: KeyName) =>
  chords.map((text) => transposeChord(parseChord(text)!, tonicPitchClass(from.tonic), from));
const runs = { numRuns: 60 };

/** Pitch classes heard when a shape is played after retune and capo. */
function heard(way: Way, frets: readonly (number | null)[], instrument: Instrument): Set<number> {
  const pitches = frets.flatMap((fret, k) =>
    fret === null
      ? []
      : [stringMidi(instrument.strings[k]!) + way.retune + fretSemitones(instrument, way.capo + fret)!],
  );
  return new Set(pitches.map((pitch) => pitch % 12));
}

describe("laws of the ways", () => {
  test("every shape sounds its chord in the target key, and retune + capo + shape key make that key", () => {
    fc.assert(
      fc.property(song, preset, preferences, ({ chords, from, to }, instrument, wishes) => {
        const written = inKey(chords, from);
        for (const way of findWays({ chords: written, from, to, instrument, preferences: wishes })) {
          const sum = tonicPitchClass(way.shapeKey) + way.retune + way.capo;
          expect((sum + 24) % 12).toBe(tonicPitchClass(to.tonic));
          expect(way.soundingKey).toBe(to.tonic);
          expect(way.chords.map((chord) => chord.written)).toEqual(written);
          for (const { sounding, shape } of way.chords) {
            if (!shape) continue;
            const target = parseChord(sounding)!;
            const allowed = new Set(chordPitchClasses(target));
            const pitches = heard(way, shape.frets, instrument);
            expect([...pitches].every((pc) => allowed.has(pc))).toBe(true);
            // The fifth alone may be missing, and of four tones and more the root.
            const third = target.intervals.find((interval) => [3, 4].includes(interval)) ?? 5;
            expect(pitches.has((tonicPitchClass(target.root) + third) % 12)).toBe(true);
            if (target.intervals.length <= 3) expect(pitches.has(tonicPitchClass(target.root))).toBe(true);
          }
        }
      }),
      runs,
    );
  });

  test("one way leaves everything as it is; no capo is negative or higher than wished; no string is unsafe", () => {
    fc.assert(
      fc.property(song, preset, preferences, ({ chords, from, to }, instrument, wishes) => {
        const ways = findWays({ chords: inKey(chords, from), from, to, instrument, preferences: wishes });
        expect(ways.filter(({ retune, capo }) => retune === 0 && capo === 0)).toHaveLength(1);
        for (const { kind, retune, capo, strings, difficulty } of ways) {
          expect(capo >= 0 && capo <= Math.min(9, instrument.capoTo, wishes.highestCapo)).toBe(true);
          expect(retune >= -4 && retune <= 1).toBe(true);
          expect(strings.map(({ verdict }) => verdict)).not.toContain("unsafe");
          expect(difficulty >= 0 && difficulty < 1).toBe(true);
          expect(kind).toBe(retune === 0 ? (capo === 0 ? "as-is" : "capo") : capo === 0 ? "retune" : "retune-capo");
        }
      }),
      runs,
    );
  });

  test("disliking the capo or the retune more never promotes a way with more of it", () => {
    const dislike = fc.constantFrom("capo" as const, "retune" as const);
    const levels = fc.tuple(fc.double({ min: 0, max: 1, noNaN: true }), fc.double({ min: 0, max: 1, noNaN: true }));
    fc.assert(
      fc.property(
        song,
        preset,
        preferences,
        dislike,
        levels,
        ({ chords, from, to }, instrument, wishes, what, [a, b]) => {
          const ranked = (level: number) =>
            findWays({ chords: inKey(chords, from), from, to, instrument, preferences: { ...wishes, [what]: level } });
          const [mild, strong] = [ranked(Math.min(a, b)), ranked(Math.max(a, b))];
          const amount = (way: Way) => (what === "capo" ? way.capo : Math.abs(way.retune));
          const place = (ways: readonly Way[], way: Way) =>
            ways.findIndex(({ retune, capo }) => retune === way.retune && capo === way.capo);
          for (const more of mild)
            for (const less of mild) {
              if (amount(more) <= amount(less)) continue;
              if (place(strong, more) < 0 || place(strong, less) < 0) continue;
              if (place(mild, less) < place(mild, more)) expect(place(strong, less)).toBeLessThan(place(strong, more));
            }
        },
      ),
      runs,
    );
  });

  test("disliking barres more never brings more of them to the first place", () => {
    const barres = (way: Way) =>
      way.chords.reduce(
        (sum, { shape }) => sum + (shape?.barre ? shape.barre.toString - shape.barre.fromString + 1 : 0),
        0,
      );
    fc.assert(
      fc.property(song, preset, preferences, ({ chords, from, to }, instrument, wishes) => {
        const first = (barre: number) =>
          findWays({ chords: inKey(chords, from), from, to, instrument, preferences: { ...wishes, barre } })[0]!;
        expect(barres(first(1))).toBeLessThanOrEqual(barres(first(0)));
      }),
      runs,
    );
  });

  test("the more a wish about shapes weighs, the less of what it is against is in the first way", () => {
    const wish = fc.constantFrom("barre" as const, "ringing" as const, "familiar" as const);
    const levels = fc.tuple(fc.double({ min: 0, max: 1, noNaN: true }), fc.double({ min: 0, max: 1, noNaN: true }));
    const marks = fc.constantFrom(["3 2 0 0 0 3", "x 3 2 0 1 0"], ["0 0 0", "1 1 1"], ["0 0 0 3", "2 0 1 0"]);
    fc.assert(
      fc.property(
        song,
        preset,
        preferences,
        wish,
        levels,
        marks,
        ({ chords, from, to }, instrument, wishes, what, [a, b], knownMarks) => {
          const amounts = (level: number) => {
            const question = { chords: inKey(chords, from), from, to, instrument };
            const asked = { ...question, preferences: { ...wishes, knownMarks, [what]: level } };
            const [first] = findWays(asked);
            const found = wayCandidates(asked).find(
              ({ retune, capo }) => retune === first!.retune && capo === first!.capo,
            );
            const { barres, stopped, unknown } = found!.played.amounts;
            return { barre: barres, ringing: stopped, familiar: unknown }[what];
          };
          expect(amounts(Math.max(a, b))).toBeLessThanOrEqual(amounts(Math.min(a, b)) + 1e-9);
        },
      ),
      runs,
    );
  });

  test("no way comes twice, and those picked as different are one of each kind in the same order", () => {
    fc.assert(
      fc.property(song, preset, ({ chords, from, to }, instrument) => {
        const ways = findWays({ chords: inKey(chords, from), from, to, instrument });
        expect(new Set(ways.map(({ retune, capo }) => `${retune} ${capo}`)).size).toBe(ways.length);
        const kinds = new Set(ways.map(({ kind }) => kind));
        const different = differentWays(ways, kinds.size);
        expect(new Set(different.map(({ kind }) => kind))).toEqual(kinds);
        expect(different[0]).toBe(ways[0]);
        expect(different).toEqual(ways.filter((way) => different.includes(way)));
        for (const way of different) expect(ways.find(({ kind }) => kind === way.kind)).toBe(way);
      }),
      runs,
    );
  });

  test("sentences use glyphs and no exclamation marks", () => {
    fc.assert(
      fc.property(song, preset, ({ chords, from, to }, instrument) => {
        for (const { title, cost, why, cautions } of findWays({ chords: inKey(chords, from), from, to, instrument }))
          for (const sentence of [title, cost, why, ...cautions]) {
            expect(sentence).not.toMatch(/[A-G][b#](?![a-z])|!|undefined|NaN/);
            expect(sentence).toMatch(/^[A-Z]/);
          }
      }),
      { numRuns: 30 },
    );
  });
});
