import { singPhrase, type PhraseNote } from "../../__tests__/sound/singer";
import { hzToMidi } from "../music/pitch";
import { demoSongs } from "../songs/demoSongs";
import type { PlannedNote } from "../songs/backing/backingPlan";
import { planBacking } from "../songs/backing/planBacking";
import { listenToTake } from "../voice/listenToTake";
import { measureTake } from "./measureTake";
import type { TakeReport } from "../voice/takeReport";
import type { TakeMeasures } from "./takeMeasures";

const lantern = demoSongs[0]!;
/** The verse of "Lantern on the Slipway" in D, an octave down: four phrases from A2 to A3. */
const wishes = { once: true, tempo: 120 };
const plan = planBacking({ ...lantern, notes: lantern.notes.slice(0, 36) }, { tonic: "D", shift: -12 }, wishes)!;
const tune = { notes: plan.notes, phrases: plan.phrases };
const sampleRate = 16_000;
const restDb = -120;
/** Seconds of recording before the first click of the backing. */
const leadS = 0.4;
const backed = { startS: leadS };
const alone = { startS: null };

interface Performance {
  /** what a singer makes of a note: another pitch, another level */
  manner?: (note: PlannedNote) => { midi?: number; levelDb?: number };
  /** how much slower than the backing */
  stretch?: number;
  noiseSnrDb?: number;
}

function sing({ manner = () => ({}), stretch = 1, ...room }: Performance): TakeReport {
  const slots: PhraseNote[] = [];
  let at = -leadS;
  for (const note of plan.notes) {
    const start = note.at * stretch;
    const { midi = note.midi, levelDb = 0 } = manner(note);
    if (start - at > 0.02) slots.push({ midi: note.midi, durationS: start - at, levelDb: restDb, gapS: 0.01 });
    slots.push({ midi, durationS: note.duration * stretch, levelDb });
    at = start + note.duration * stretch;
  }
  return listenToTake(singPhrase({ notes: slots, seed: 5, sampleRate, padS: 0, ...room }).pcm, sampleRate);
}

/** The same take with some of its sound changed: what `change` makes of each frequency at its time. */
function changed(take: TakeReport, change: (hz: number, seconds: number) => number | null): TakeReport {
  return { ...take, f0: take.f0.map((hz, k) => (hz === null ? null : change(hz, k / 100))) };
}

/** The same take without its sound between two times of the plan. */
function cut(take: TakeReport, from: number, end: number): TakeReport {
  const [first, last] = [Math.round((from + leadS) * 100), Math.round((end + leadS) * 100)];
  return { ...take, f0: take.f0.filter((_, k) => k < first || k >= last), notes: [] };
}

let good: TakeReport;
beforeAll(() => {
  good = sing({});
});

const measured = (take: TakeReport, singing: { startS: number | null }, wanted = tune): TakeMeasures => {
  const measures = measureTake(take, wanted, singing);
  if (!measures) throw new Error("nothing measured");
  return measures;
};
const sentences = ({ phrases }: TakeMeasures) => phrases.map(({ sentence }) => sentence);
const allWell = "In tune, and every note was reached.";
const phraseAt = (seconds: number) =>
  plan.phrases.findIndex(({ at, end }) => seconds - leadS >= at - 0.2 && seconds - leadS < end + 0.2);

describe("with a backing", () => {
  test("a true singer is in tune in every phrase", () => {
    const measures = measured(good, backed);
    expect(sentences(measures)).toEqual([allWell, allWell, allWell, allWell]);
    expect(measures).toMatchObject({ octaves: 0, moved: 0, fellShort: null, ranOutOfLow: null });
    expect(measures.offCents).toBeLessThan(15);
    expect(measures.inTune).toBeGreaterThan(0.95);
    expect(measures.sungShare).toBeGreaterThan(0.85);
    expect(measures.pitches.every(({ fellShort }) => fellShort === null)).toBe(true);
  });

  test("who stops at a top note falls short of those above, in the phrases that have them", () => {
    const measures = measured(sing({ manner: ({ midi }) => ({ midi: Math.min(midi, 54.2) }) }), backed);
    expect(measures.fellShort).toMatchObject({ midi: 57, side: "above" });
    expect(Math.abs(measures.fellShort!.semitones! - 2.8)).toBeLessThan(0.4);
    expect(measures.phrases.map(({ fellShort }) => fellShort?.midi ?? null)).toEqual([55, null, 57, null]);
    expect(measures.pitches.filter(({ fellShort }) => fellShort === "above").map(({ midi }) => midi)).toEqual([55, 57]);
    expect(measures.phrases[2]!.sentence).toBe("You fell 3 semitones short of A3.");
  });

  test("a flat singer is in tune by a tuning of their own", () => {
    const measures = measured(
      changed(good, (hz) => hz * 2 ** (-0.4 / 12)),
      backed,
    );
    expect(Math.abs(measures.tuningCents + 40)).toBeLessThan(8);
    expect(measures.offCents).toBeLessThan(15);
    expect(measures.fellShort).toBeNull();
  });

  test("an octave lower is the same tune", () => {
    const high = { notes: tune.notes.map((note) => ({ ...note, midi: note.midi + 12 })), phrases: tune.phrases };
    const measures = measured(good, backed, high);
    expect(measures.octaves).toBe(-1);
    expect(sentences(measures)).toEqual([allWell, allWell, allWell, allWell]);
    expect(Math.max(...measures.pitches.map(({ midi }) => midi))).toBe(57);
  });

  test("a phrase that was not sung is left out, and nothing is said of its notes", () => {
    const measures = measured(
      changed(good, (hz, at) => (phraseAt(at) === 1 ? null : hz)),
      backed,
    );
    expect(sentences(measures)).toEqual([allWell, "Left out.", allWell, allWell]);
    expect(measures.phrases[1]).toMatchObject({ offCents: null, inTune: null, start: null, fellShort: null });
    expect(measures.summary.at(-1)).toBe("One phrase was left out.");
  });

  test("low notes that are left out, or hardly heard, are told", () => {
    const silent = measured(
      changed(good, (hz) => (hzToMidi(hz) < 47.6 ? null : hz)),
      backed,
    );
    expect(silent.ranOutOfLow).toEqual({ midi: 47, why: "left out" });
    const weak = measured(sing({ manner: ({ midi }) => (midi <= 47 ? { levelDb: -15 } : {}) }), backed);
    expect(weak.ranOutOfLow).toEqual({ midi: 47, why: "weak" });
    expect(weak.fellShort).toBeNull();
  });

  test("a quarter of a second behind or before the backing is still the same note", () => {
    for (const late of [-0.25, 0.25]) {
      expect(sentences(measured(good, { startS: leadS - late }))).toEqual([allWell, allWell, allWell, allWell]);
    }
  });

  test("held notes that waver are told by the singer's own measure", () => {
    const notes = good.notes.map((note) => ({ ...note, steadinessCents: phraseAt(note.start) === 0 ? 40 : 12 }));
    const measures = measured({ ...good, notes }, backed);
    expect(measures.phrases[0]!.unsteady).toBeGreaterThan(2);
    expect(measures.phrases[0]!.sentence).toBe("Every note was reached, but less steadily than the rest.");
    expect(measures.phrases[2]!.unsteady).toBeLessThanOrEqual(1);
  });

  test("noise at 15 dB changes little", () => {
    const measures = measured(sing({ noiseSnrDb: 15 }), backed);
    expect(measures.offCents).toBeLessThan(20);
    expect(measures.fellShort).toBeNull();
  });
});

describe("without a backing", () => {
  test("slower, three semitones lower: judged as sung", () => {
    const measures = measured(sing({ stretch: 1.25, manner: ({ midi }) => ({ midi: midi - 3 }) }), alone);
    expect(measures.moved).toBe(-3);
    expect(sentences(measures)).toEqual([allWell, allWell, allWell, allWell]);
    expect(Math.max(...measures.pitches.map(({ midi }) => midi))).toBe(54);
  });

  test("who begins with the third phrase is heard from there", () => {
    const measures = measured(cut(good, -leadS, plan.phrases[2]!.at - 0.3), alone);
    expect(sentences(measures)).toEqual(["Left out.", "Left out.", allWell, allWell]);
  });

  test("who goes from the first phrase to the third has left out the second", () => {
    const measures = measured(cut(good, plan.phrases[1]!.at - 0.2, plan.phrases[2]!.at - 0.2), alone);
    expect(sentences(measures)).toEqual([allWell, "Left out.", allWell, allWell]);
  });
});

describe("what cannot be told", () => {
  test("another tune is not measured, or measured as badly as it was sung where the backing ran", () => {
    for (const other of demoSongs.slice(1, 3)) {
      const wrong = planBacking(other, { tonic: other.writtenKey.tonic, shift: -12 }, wishes)!;
      const wanted = { notes: wrong.notes, phrases: wrong.phrases };
      expect([other.title, measureTake(good, wanted, alone)]).toEqual([other.title, null]);
      expect(measureTake(good, wanted, backed)?.inTune ?? 0).toBeLessThan(0.5);
    }
  });

  test("a take in which no singing was heard is not measured, nor a second of it", () => {
    expect(measureTake({ ...good, verdict: "too-noisy" }, tune, backed)).toBeNull();
    const brief = changed(good, (hz, at) => (at < plan.countInS + leadS + 0.9 ? hz : null));
    expect(measureTake(brief, tune, backed)).toBeNull();
    expect(measureTake({ verdict: "heard", f0: [], notes: [] }, tune, alone)).toBeNull();
    expect(measureTake(good, { notes: [], phrases: [] }, backed)).toBeNull();
  });
});
