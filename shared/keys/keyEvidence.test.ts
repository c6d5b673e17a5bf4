import fc from "fast-check";
import { demoSongs } from "../songs/demoSongs";
import { keyEvidence, narrowedComfort, triedVoice, type SungTry } from "./keyEvidence";
import type { SingingVoice, Tune } from "./keyScore";
import { scoreKeys } from "./scoreKeys";
import type { PitchMeasure } from "./takeMeasures";

const voice: SingingVoice = { range: { lowMidi: 45, highMidi: 69 }, comfort: { lowMidi: 48, highMidi: 64 } };
const tunes = demoSongs.map(({ notes, writtenKey }): Tune => ({ kind: "melody", notes, home: writtenKey.tonic }));

const sung = (midi: number, changes: Partial<PitchMeasure> = {}): PitchMeasure => {
  return { midi, wantedS: 2, sungS: 1.8, offCents: 12, fellShort: null, ...changes };
};
const missedAbove = (midi: number) => sung(midi, { offCents: 180, fellShort: "above" });
const aTry = (effort: number | null, pitches: PitchMeasure[], ranOutOfLow: SungTry["measures"] = null): SungTry => {
  return { effort, measures: { pitches, ranOutOfLow: ranOutOfLow?.ranOutOfLow ?? null } };
};

const anyPitch: fc.Arbitrary<PitchMeasure> = fc.record({
  midi: fc.integer({ min: 36, max: 84 }),
  wantedS: fc.double({ min: 0.1, max: 9, noNaN: true }),
  sungS: fc.double({ min: 0, max: 9, noNaN: true }),
  offCents: fc.option(fc.integer({ min: 0, max: 300 })),
  fellShort: fc.constantFrom("above" as const, "below" as const, null),
});
const anyTry: fc.Arbitrary<SungTry> = fc.record({
  effort: fc.option(fc.integer({ min: 1, max: 5 })),
  measures: fc.option(
    fc.record({
      pitches: fc.uniqueArray(anyPitch, { maxLength: 12, selector: ({ midi }) => midi }),
      ranOutOfLow: fc.option(fc.record({ midi: fc.integer({ min: 36, max: 84 }), why: fc.constant("weak" as const) })),
    }),
  ),
});
const anyVoice: fc.Arbitrary<SingingVoice> = fc
  .tuple(...[1, 2, 3, 4].map(() => fc.double({ min: 36, max: 84, noNaN: true })))
  .map((edges) => edges.sort((a, b) => a - b))
  .map(([a, b, c, d]) => ({ range: { lowMidi: a!, highMidi: d! }, comfort: { lowMidi: b!, highMidi: c! } }));
const hardTry = anyTry.filter(({ effort }) => effort === null || effort >= 3);

const scores = (tune: Tune, singer: SingingVoice, tries: readonly SungTry[]) =>
  new Map(scoreKeys(tune, singer, { evidence: keyEvidence(singer, tries) }).map(({ tonic, score }) => [tonic, score]));
const scoresTried = (tune: Tune, singer: SingingVoice, tries: readonly SungTry[]) =>
  new Map(scoreKeys(tune, triedVoice(singer, tries).voice).map(({ tonic, score }) => [tonic, score]));

describe("law 8", () => {
  test("a take that was hard, or fell short, raises the score of no key, whatever was tried before", () => {
    fc.assert(
      fc.property(
        fc.constantFrom(...tunes),
        anyVoice,
        fc.array(anyTry, { maxLength: 3 }),
        hardTry,
        (tune, singer, tries, hard) => {
          for (const judge of [scores, scoresTried]) {
            const before = judge(tune, singer, tries);
            const after = judge(tune, singer, [...tries, hard]);
            expect([...after].filter(([tonic, score]) => score > before.get(tonic)!)).toEqual([]);
          }
        },
      ),
      { numRuns: 60 },
    );
  });

  test("a key that dwells at or beyond a pitch felt hard loses, and a lower one comes first", () => {
    const ferry = tunes[1]!;
    const best = scoreKeys(ferry, voice)[0]!;
    const hard = aTry(5, [sung(best.lowMidi), sung(best.highMidi - 2), sung(best.highMidi)]);
    const [now] = scoreKeys(ferry, triedVoice(voice, [hard]).voice);
    expect(now!.highMidi).toBeLessThan(best.highMidi);
  });
});

describe("the comfort band", () => {
  test("depends on the tries alone: their order changes nothing, and one taken out was never there", () => {
    fc.assert(
      fc.property(anyVoice, fc.array(anyTry, { maxLength: 4 }), anyTry, (singer, tries, more) => {
        const before = triedVoice(singer, tries);
        const shuffled = triedVoice(singer, [more, ...[...tries].reverse()]);
        expect(shuffled.voice).toEqual(triedVoice(singer, [...tries, more]).voice);
        const all = [...tries, more];
        expect(
          triedVoice(
            singer,
            all.filter((each) => each !== more),
          ),
        ).toEqual(before);
        expect(triedVoice(singer, [])).toEqual({ voice: singer, why: [] });
      }),
      { numRuns: 150 },
    );
  });

  test("stays a band inside the range, and grows by three semitones at most on a side", () => {
    fc.assert(
      fc.property(anyVoice, fc.array(anyTry, { maxLength: 5 }), (singer, tries) => {
        const { range, comfort } = triedVoice(singer, tries).voice;
        expect(range).toEqual(singer.range);
        expect(comfort.lowMidi).toBeLessThanOrEqual(comfort.highMidi);
        expect(comfort.lowMidi).toBeGreaterThanOrEqual(range.lowMidi);
        expect(comfort.highMidi).toBeLessThanOrEqual(range.highMidi);
        expect(comfort.highMidi).toBeLessThanOrEqual(singer.comfort.highMidi + 3);
        expect(comfort.lowMidi).toBeGreaterThanOrEqual(singer.comfort.lowMidi - 3);
      }),
      { numRuns: 150 },
    );
  });

  test("ends below what was hard, and says why", () => {
    const hard = triedVoice(voice, [aTry(4, [sung(55), sung(60), sung(63)])]);
    expect(hard.voice.comfort).toEqual({ lowMidi: 48, highMidi: 62 });
    expect(hard.why).toEqual(["A take that dwelt on E♭4 felt hard (4 of 5), so your comfortable notes now end at D4."]);
  });

  test("ends below a note that was fallen short of, unless a higher one was reached", () => {
    const short = triedVoice(voice, [aTry(3, [sung(55), missedAbove(62), missedAbove(64)])]);
    expect(short.voice.comfort.highMidi).toBe(61);
    expect(short.why).toEqual(["You fell short of D4, so your comfortable notes now end at C♯4."]);
    expect(triedVoice(voice, [aTry(3, [sung(55), missedAbove(62), sung(64)])]).why).toEqual([]);
  });

  test("begins above low notes that were hardly heard", () => {
    const weak = triedVoice(voice, [
      { effort: null, measures: { pitches: [sung(50)], ranOutOfLow: { midi: 50, why: "weak" } } },
    ]);
    expect(weak.voice.comfort.lowMidi).toBe(51);
    expect(weak.why).toEqual(["At D3 your voice ran out of low notes, so your comfortable notes now begin at E♭3."]);
  });

  test("reaches notes that were sung with ease, until they are hard", () => {
    const easy = aTry(1, [sung(55), sung(66)]);
    const wider = triedVoice(voice, [easy]);
    expect(wider.voice.comfort.highMidi).toBe(66);
    expect(wider.why).toEqual(["You sang up to F♯4 with ease, so your comfortable notes now end at F♯4."]);
    expect(triedVoice(voice, [easy, aTry(5, [sung(66)])]).voice.comfort.highMidi).toBe(65);
  });

  test("a hard take without measures counts at the end of its tune that left the band further", () => {
    const span = (lowMidi: number, highMidi: number): SungTry => ({
      effort: 5,
      measures: null,
      span: { lowMidi, highMidi },
    });
    expect(keyEvidence(voice, [span(50, 65)])).toEqual([{ midi: 65, effort: 5 }]);
    expect(keyEvidence(voice, [span(45, 60)])).toEqual([{ midi: 45, effort: 5 }]);
    expect(keyEvidence(voice, [{ effort: 5, measures: null }])).toEqual([]);
  });

  test("in a very narrow band the two ends meet and do not pass each other, whichever side was hard first", () => {
    const narrow = { range: { lowMidi: 36, highMidi: 83.1875 }, comfort: { lowMidi: 82.8125, highMidi: 83.1875 } };
    expect(narrowedComfort(narrow.comfort, keyEvidence(narrow, [aTry(4, [missedAbove(83)])]))).toEqual({
      lowMidi: 83,
      highMidi: 83.1875,
    });
    const first = { midi: 63, effort: 5 };
    const met = narrowedComfort({ lowMidi: 59.5, highMidi: 64.8 }, [first]);
    const both = narrowedComfort({ lowMidi: 59.5, highMidi: 64.8 }, [first, { midi: 62, effort: 5 }]);
    expect([met, both]).toEqual([
      { lowMidi: 59.5, highMidi: 62 },
      { lowMidi: 62, highMidi: 62 },
    ]);
  });

  test("never crosses itself", () => {
    const both = [
      { midi: 55, effort: 5 },
      { midi: 57, effort: 5 },
    ];
    expect(narrowedComfort({ lowMidi: 48, highMidi: 64 }, both)).toEqual({ lowMidi: 56, highMidi: 56 });
  });
});
