import fc from "fast-check";
import { createLiveTracker, LOOK_AHEAD_FRAMES, type LiveFrame } from "@/shared/voice/liveTracker";
import { listenToTake } from "@/shared/voice/listenToTake";
import { singPhrase } from "../sound/singer";
import { phraseFor } from "./voiceSingers";

const rate = 16000;
const alto = singPhrase({ ...phraseFor("alto", 5), noiseSnrDb: 30 });
const report = listenToTake(alto.pcm, rate);

test.each([-20, 20])("a gain of %i dB changes nothing but the levels", (gain) => {
  const louder = listenToTake(
    alto.pcm.map((x) => x * 10 ** (gain / 20)),
    rate,
  );
  expect(louder.verdict).toBe(report.verdict);
  expect(louder.range!.lowMidi).toBeCloseTo(report.range!.lowMidi, 2);
  expect(louder.range!.highMidi).toBeCloseTo(report.range!.highMidi, 2);
  expect(louder.notes).toHaveLength(report.notes.length);
  louder.notes.forEach((note, k) => {
    expect(note.midi).toBeCloseTo(report.notes[k]!.midi, 2);
    expect(note.levelDb - report.notes[k]!.levelDb).toBeCloseTo(gain, 1);
  });
});

test("silence before the singing only shifts the times", () => {
  fc.assert(
    fc.property(fc.integer({ min: 1, max: 120 }), (hundredths) => {
      const clean = singPhrase(phraseFor("tenor", 2));
      const later = new Float32Array(hundredths * 160 + clean.pcm.length);
      later.set(clean.pcm, hundredths * 160);
      const [now, then] = [listenToTake(clean.pcm, rate), listenToTake(later, rate)];
      expect(then.notes).toHaveLength(now.notes.length);
      then.notes.forEach((note, k) => {
        expect(note.start - now.notes[k]!.start).toBeCloseTo(hundredths / 100, 6);
        expect(note.midi).toBeCloseTo(now.notes[k]!.midi, 2);
      });
      expect(then.range!.lowMidi).toBeCloseTo(now.range!.lowMidi, 2);
    }),
    { numRuns: 4, seed: 11 },
  );
});

test("silence after the singing changes nothing at all", () => {
  const clean = singPhrase(phraseFor("tenor", 2)).pcm;
  const now = listenToTake(clean, rate);
  for (const seconds of [0.25, 3]) {
    const longer = new Float32Array(clean.length + seconds * rate);
    longer.set(clean);
    const then = listenToTake(longer, rate);
    expect(then.notes.map((n) => n.midi.toFixed(3))).toEqual(now.notes.map((n) => n.midi.toFixed(3)));
    expect(then.range).toEqual({
      lowMidi: expect.closeTo(now.range!.lowMidi, 3),
      highMidi: expect.closeTo(now.range!.highMidi, 3),
    });
    expect(then.f0.slice(now.f0.length).every((hz) => hz === null)).toBe(true);
  }
});

test.each([-5, -2, 3, 7])("the same sound played %i semitones higher has its range exactly there", (semitones) => {
  const faster = listenToTake(alto.pcm, Math.round(rate * 2 ** (semitones / 12)));
  expect(faster.verdict).toBe("heard");
  expect(Math.abs(faster.range!.lowMidi - report.range!.lowMidi - semitones)).toBeLessThan(0.1);
  expect(Math.abs(faster.range!.highMidi - report.range!.highMidi - semitones)).toBeLessThan(0.1);
});

test("pauses of digital silence, into which the filters ring out, cost no note after them", () => {
  const phrase = phraseFor("alto", 301);
  const spaced = singPhrase({
    ...phrase,
    consonants: 0,
    notes: phrase.notes.map((n, k) => (k % 4 === 3 ? { ...n, durationS: n.durationS + 0.9, gapS: 0.9 } : n)),
  });
  for (const level of [1, 1e-2]) {
    const heard = listenToTake(
      spaced.pcm.map((x) => level * x),
      rate,
    );
    const voiced = spaced.truth.f0.filter(
      (hz, k) => hz !== null && spaced.truth.f0[k - 3] && spaced.truth.f0[k + 3] && heard.f0[k],
    );
    const whole = spaced.truth.f0.filter((hz, k) => hz !== null && spaced.truth.f0[k - 3] && spaced.truth.f0[k + 3]);
    expect(voiced.length / whole.length).toBeGreaterThan(0.98);
  }
});

test("whatever the sound, every number is a number", () => {
  const piece = fc.oneof(
    fc.record({ kind: fc.constant("noise"), level: fc.double({ min: -200, max: 0, noNaN: true }) }),
    fc.record({ kind: fc.constant("click"), level: fc.double({ min: -200, max: 0, noNaN: true }) }),
    fc.record({ kind: fc.constant("tone"), level: fc.double({ min: -400, max: 0, noNaN: true }) }),
  );
  fc.assert(
    fc.property(fc.array(piece, { minLength: 1, maxLength: 6 }), (pieces) => {
      const pcm = new Float32Array(pieces.length * 4000);
      pieces.forEach(({ kind, level }, k) => {
        for (let i = 0; i < 4000; i++) {
          const x =
            kind === "noise" ? Math.sin(i * i * 0.37) : kind === "tone" ? Math.sin(i * 0.11) : i === 2000 ? 1 : 0;
          pcm[4000 * k + i] = 10 ** (level / 20) * x;
        }
      });
      const { f0, notes, certainty, tuningCents } = listenToTake(pcm, rate);
      const numbers = [
        certainty,
        tuningCents,
        ...f0.filter((hz) => hz !== null),
        ...notes.flatMap((n) => [n.midi, n.steadinessCents, n.levelDb]),
      ];
      expect(numbers.filter((x) => !Number.isFinite(x))).toEqual([]);
    }),
    { numRuns: 12, seed: 13 },
  );
});

test("the sample rate of the microphone does not matter: within 10 cents at 16, 44.1 and 48 kHz", () => {
  const ranges = [16000, 44100, 48000].map(
    (sampleRate) =>
      listenToTake(singPhrase({ ...phraseFor("bass", 4), sampleRate, consonants: 0 }).pcm, sampleRate).range!,
  );
  for (const range of ranges) {
    expect(Math.abs(range.lowMidi - ranges[0]!.lowMidi)).toBeLessThanOrEqual(0.1);
    expect(Math.abs(range.highMidi - ranges[0]!.highMidi)).toBeLessThanOrEqual(0.1);
  }
});

test("another reference pitch only renames: A4 = 432 Hz puts every note 31.8 cents higher", () => {
  const renamed = listenToTake(alto.pcm, rate, { a4: 432 });
  expect(renamed.range!.lowMidi - report.range!.lowMidi).toBeCloseTo(0.3177, 3);
});

test("a singer who is flat throughout keeps the notes' names, and the offset is told", () => {
  const notes = [57, 59, 61, 62, 64, 62, 61, 57].map((midi) => ({ midi: midi - 0.35, durationS: 0.5 }));
  const { pcm } = singPhrase({ notes, seed: 8, sampleRate: rate });
  const flat = listenToTake(pcm, rate);
  expect(flat.tuningCents).toBeGreaterThan(-45);
  expect(flat.tuningCents).toBeLessThan(-25);
  expect(flat.sentence).toBe("You sang from A3 to E4.");
});

test("vibrato is told with its rate and extent, and the note is its centre", () => {
  const { pcm } = singPhrase({
    notes: [
      { midi: 60, durationS: 1.6 },
      { midi: 64, durationS: 1.6 },
    ],
    vibrato: { rateHz: 5.7, extentCents: 80 },
    seed: 6,
    consonants: 0,
    sampleRate: rate,
  });
  const long = listenToTake(pcm, rate).notes.filter((n) => n.end - n.start > 1);
  expect(long).toHaveLength(2);
  for (const [k, note] of long.entries()) {
    expect(Math.abs(note.midi - [60, 64][k]!)).toBeLessThan(0.15);
    expect(note.vibrato!.rateHz).toBeCloseTo(5.7, 0);
    expect(note.vibrato!.extentCents).toBeGreaterThan(50);
    expect(note.vibrato!.extentCents).toBeLessThan(110);
  }
});

test("what is said holds together: comfort in range, estimate around it, quantiles in order", () => {
  const { range, comfort, estimate, tessitura, certainty } = report;
  const chain = [
    estimate!.lowMidi,
    range!.lowMidi,
    comfort!.lowMidi,
    comfort!.highMidi,
    range!.highMidi,
    estimate!.highMidi,
  ];
  expect([...chain].sort((a, b) => a - b)).toEqual(chain);
  const { p5, q1, median, q3, p95 } = tessitura!;
  expect([p5, q1, median, q3, p95].sort((a, b) => a - b)).toEqual([p5, q1, median, q3, p95]);
  expect(certainty).toBeGreaterThan(0.4);
  expect(certainty).toBeLessThan(1);
});

test("the advice is a song for a wide take, the ends for a narrow one, and another line where little was heard", () => {
  const take = (steps: number[], durationS: number, noiseSnrDb = 40) =>
    listenToTake(
      singPhrase({
        notes: steps.map((step) => ({ midi: 52 + step, durationS })),
        seed: 9,
        sampleRate: rate,
        noiseSnrDb,
      }).pcm,
      rate,
    );
  const wide = take([0, 4, 7, 12, 14, 12, 7, 4, 0, 14, 0, 7], 0.6);
  const narrow = take([0, 2, 4, 5, 4, 2, 0, 5, 4, 0], 0.6);
  const little = take([0, 9, 4], 0.45, 8);
  expect([wide.advice, wide.nextStep]).toEqual(["go-on", "Try it in a song."]);
  expect([narrow.advice, narrow.nextStep]).toEqual([
    "hold-ends",
    expect.stringContaining("hold your lowest and highest"),
  ]);
  expect([little.advice, listenToTake(new Float32Array(rate), rate).advice]).toEqual(["sing-again", "sing-again"]);
});

function live(pcm: Float32Array, pieces: number): LiveFrame[] {
  const tracker = createLiveTracker(rate);
  const out: LiveFrame[] = [];
  for (let from = 0; from < pcm.length; from += pieces) out.push(...tracker.push(pcm.subarray(from, from + pieces)));
  return out;
}

test("live and afterwards agree, but for the look-ahead", () => {
  const frames = live(alto.pcm, 1024);
  expect(report.f0.length - frames.length).toBeLessThanOrEqual(LOOK_AHEAD_FRAMES + 5);
  frames.forEach(({ t }, k) => expect(t).toBeCloseTo(k / 100, 9));
  const both = frames.filter(({ hz }, k) => hz !== null && report.f0[k] !== null);
  const near = both.filter(({ t, hz }) => Math.abs(1200 * Math.log2(hz! / report.f0[Math.round(t * 100)]!)) < 20);
  const voiced = report.f0.slice(0, frames.length).filter((hz) => hz !== null).length;
  expect(near.length / both.length).toBeGreaterThan(0.995);
  expect(both.length / voiced).toBeGreaterThan(0.97);
});

test("the sizes of the pieces do not matter to the live tracker", () => {
  const start = alto.pcm.subarray(0, 24000);
  const expected = live(start, 160);
  fc.assert(
    fc.property(fc.integer({ min: 64, max: 4000 }), (pieces) => {
      expect(live(start, pieces)).toEqual(expected.slice(0, live(start, pieces).length));
    }),
    { numRuns: 4, seed: 12 },
  );
});

test("the tracker keeps far ahead of real time", () => {
  const started = process.cpuUsage().user;
  for (let k = 0; k < 3; k++) listenToTake(alto.pcm, rate);
  const cpuS = (process.cpuUsage().user - started) / 1e6;
  expect((3 * alto.pcm.length) / rate / cpuS).toBeGreaterThan(10);
});
