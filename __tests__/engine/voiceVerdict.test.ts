import { listenToTake } from "@/shared/voice/listenToTake";
import { addGuitar, hall } from "../sound/corpusRoom";
import { renderChoir } from "../sound/choir";
import { beeps } from "../sound/corpusSounds";
import * as sounds from "../sound/noSinging";
import { createRandom } from "../sound/random";
import { singPhrase } from "../sound/singer";
import { phraseFor, singers, type SingerName } from "./voiceSingers";

const nothing: [string, sounds.SoundMaker, string[]][] = [
  ["silence", sounds.silence, ["too-quiet"]],
  ["a quiet room", sounds.roomTone, ["too-quiet", "too-noisy", "not-singing"]],
  ["a fan", sounds.fanNoise, ["too-noisy", "not-singing"]],
  ["mains hum", sounds.mainsHum, ["too-noisy", "not-singing"]],
  ["claps", sounds.claps, ["not-singing"]],
  ["typing", sounds.typing, ["not-singing"]],
  ["whistling", sounds.whistle, ["not-singing"]],
  ["strummed strings", sounds.strummedStrings, ["not-singing", "several-voices"]],
];

test.each(nothing)("%s gives no numbers, but a sentence and a next step", (_, make, verdicts) => {
  for (const seed of [1, 2]) {
    const report = listenToTake(make(seed, 16000, 6), 16000);
    expect(verdicts).toContain(report.verdict);
    expect([report.range, report.comfort, report.estimate, report.tessitura, report.certainty]).toEqual([
      null,
      null,
      null,
      null,
      0,
    ]);
    expect(report.sentence).toMatch(/\.$/);
    expect(report.nextStep).toMatch(/\.$/);
  }
});

const lines = [
  "The half past nine boat was late again, so we sat on the wall and ate the sandwiches before anybody noticed.",
  "Please leave the key under the second flower pot and tell your sister that the kettle is broken.",
];
test.each(["en", "en+f3", "de", "en+m3", "fr+f2"].map((voice, k) => [voice, lines[k % 2]!]))(
  "speech is not taken for singing (espeak-ng voice %s)",
  (voice, line) => {
    const spoken = sounds.speech(line!, voice);
    if (spoken === null) expect(spoken).toBeNull();
    else expect(listenToTake(spoken.pcm, spoken.sampleRate).verdict).toBe("not-singing");
  },
);

const rooms = [
  [0.3, 0.25],
  [0.7, 0.35],
  [1.2, 0.45],
] as const;
test.each(
  ["en+f2", "de+f3", "it+f2", "es+m2", "sv+f4", "en+f4", "fr+m3", "nl+f1"].map(
    (voice, k) => [voice, ...rooms[k % 3]!] as const,
  ),
)("nor is it in a room with an echo (espeak-ng voice %s, %d s)", (voice, rt60, wet) => {
  const spoken = sounds.speech(lines[1]!, voice, 145);
  if (spoken === null) expect(spoken).toBeNull();
  else
    expect(
      listenToTake(hall(spoken.pcm, spoken.sampleRate, rt60, wet, createRandom(4)), spoken.sampleRate).verdict,
    ).not.toBe("heard");
});

test("but singing in that room is heard, in a narrow song too", () => {
  for (const name of Object.keys(singers) as SingerName[]) {
    const low = singers[name].low + 4;
    const notes = [0, 0, 2, 4, 2, 0, -1, 0, 2, 2, 4, 0].map((step, k) => ({
      midi: low + step + 0.15 * Math.sin(7 * k),
      durationS: 0.32 + 0.1 * (k % 3),
    }));
    const { pcm } = singPhrase({ notes, seed: 21, tract: singers[name].tract, scoopCents: 90, sampleRate: 16000 });
    expect([name, listenToTake(hall(pcm, 16000, 0.7, 0.35, createRandom(5)), 16000).verdict]).toEqual([name, "heard"]);
  }
});

test.each([1, 2, 3, 4])("beeps are no singing (%i)", (seed) => {
  expect(["not-singing", "too-short"]).toContain(listenToTake(beeps(16000, 5, createRandom(seed)), 16000).verdict);
});

const tune = [60, 64, 67, 65, 62, 60, 67, 72, 69, 64].map((midi) => ({ midi, durationS: 0.5 }));
test.each([
  ["piano", 0],
  ["nylon guitar", 24],
  ["steel guitar", 25],
  ["vibraphone", 11],
])("a tune on a %s is plucked or struck, not sung", (_, program) => {
  const played = renderChoir(tune, { program, sampleRate: 16000 });
  if (played === null) expect(played).toBeNull();
  else expect(listenToTake(played.pcm, played.sampleRate).verdict).toBe("not-singing");
});

test("a sampled voice that fades like a bell is still a voice", () => {
  const sung = renderChoir(
    tune.map((n) => ({ ...n, midi: n.midi + 5 })),
    { program: 53, sampleRate: 16000 },
  );
  if (sung === null) expect(sung).toBeNull();
  else expect(listenToTake(sung.pcm, sung.sampleRate).verdict).toBe("heard");
});

test("an electric organ's tune is stiller than any throat", () => {
  const pcm = new Float32Array(16000 * 6);
  let phase = 0;
  for (let i = 0; i < pcm.length; i++) {
    const midi = [60, 64, 67, 65, 62, 60][Math.floor(i / 16000)]!;
    phase += (2 * Math.PI * 440 * 2 ** ((midi - 69) / 12)) / 16000;
    pcm[i] =
      0.1 * (Math.sin(phase) + 0.6 * Math.sin(2 * phase) + 0.4 * Math.sin(3 * phase) + 0.2 * Math.sin(4 * phase));
  }
  expect(listenToTake(pcm, 16000).verdict).toBe("not-singing");
});

test("one pitch over and over shows no range", () => {
  const { pcm } = singPhrase({
    notes: Array.from({ length: 6 }, () => ({ midi: 57, durationS: 0.6 })),
    seed: 2,
    sampleRate: 16000,
  });
  expect(listenToTake(pcm, 16000).verdict).toBe("too-short");
});

test("a guitar in the rests of a song gives it no lower end", () => {
  for (const seed of [1, 2]) {
    const phrase = phraseFor("alto", 300 + seed);
    const notes = phrase.notes.map((n, k) =>
      k === 3 || k === 8 || k === 11 ? { ...n, durationS: n.durationS + 0.9, gapS: 0.9 } : n,
    );
    const { pcm, truth } = singPhrase({ ...phrase, notes });
    const { range } = listenToTake(addGuitar(pcm, 16000, -20, createRandom(seed)), 16000);
    expect(Math.abs(range!.lowMidi - truth.lowestMidi)).toBeLessThan(1);
    expect(Math.abs(range!.highMidi - truth.highestMidi)).toBeLessThan(1);
  }
});

test("singing in all its kinds is not refused", () => {
  const kinds = [{}, { breathDb: -22 }, { jitter: 0.012, shimmer: 0.1 }, { gainDb: -30, noiseSnrDb: 25 }];
  for (const [k, name] of (Object.keys(singers) as SingerName[]).entries()) {
    for (const more of [kinds[k % 4]!, kinds[(k + 1) % 4]!]) {
      const { pcm, sampleRate } = singPhrase({ ...phraseFor(name, 9), ...more });
      expect([name, more, listenToTake(pcm, sampleRate).verdict]).toEqual([name, more, "heard"]);
    }
  }
});

test("one short note is too short", () => {
  const { pcm, sampleRate } = singPhrase({ notes: [{ midi: 57, durationS: 0.5 }], seed: 2 });
  expect(listenToTake(pcm, sampleRate).verdict).toBe("too-short");
});

test("a whisper of a signal is too quiet", () => {
  const { pcm, sampleRate } = singPhrase({ ...phraseFor("alto", 3), gainDb: -62 });
  expect(listenToTake(pcm, sampleRate).verdict).toBe("too-quiet");
});

test("two people singing in thirds are several voices", () => {
  const sing = (steps: number[], seed: number, tract: number) =>
    singPhrase({
      notes: steps.map((midi) => ({ midi, durationS: 0.6 })),
      seed,
      tract,
      consonants: 0,
      sampleRate: 22050,
    });
  const upper = sing([60, 62, 64, 65, 67, 65, 64, 62, 60, 64], 3, 1.15);
  const lower = sing([57, 59, 60, 62, 64, 62, 60, 59, 57, 60], 12, 1);
  const together = upper.pcm.map((x, i) => 0.5 * x + 0.4 * (lower.pcm[i] ?? 0));
  expect(listenToTake(together, upper.sampleRate).verdict).toBe("several-voices");
});

test.each([1, 2, 3])("two people singing different songs at once are several voices (%i)", (seed) => {
  const [one, other] = (["tenor", "alto"] as const).map(
    (name, k) => singPhrase(phraseFor(name, 40 + 2 * seed + k)).pcm,
  );
  const length = Math.min(one!.length, other!.length);
  const together = one!.slice(0, length).map((x, i) => 0.5 * (x + other![i]!));
  expect(listenToTake(together, 16000).verdict).toBe("several-voices");
});

test("a guided hold of one note is heard", () => {
  const { pcm, sampleRate } = singPhrase({ notes: [{ midi: 45, durationS: 1.5 }], seed: 4 });
  const report = listenToTake(pcm, sampleRate, { hold: true });
  expect(report.verdict).toBe("heard");
  expect(report.range!.lowMidi).toBeCloseTo(45, 0);
  expect(report.range!.highMidi - report.range!.lowMidi).toBeLessThan(0.5);
});

test("a rate or a reference pitch that cannot be is the caller's mistake", () => {
  expect(() => listenToTake(new Float32Array(10), 100)).toThrow(RangeError);
  expect(() => listenToTake(new Float32Array(10), 44100, { a4: 0 })).toThrow(RangeError);
});

test("no sound at all is a report, not an error", () => {
  expect(listenToTake(new Float32Array(0), 44100)).toMatchObject({
    verdict: "too-quiet",
    durationS: 0,
    f0: [],
    notes: [],
  });
});
