import { listenToTake } from "@/shared/voice/listenToTake";
import { pitchCurve, type LineNote } from "../sound/corpusLine";
import { addNoise } from "../sound/corpusRoom";
import { makeBody, makeDelivery, VOICES, type VoiceName } from "../sound/corpusSinging";
import { soundLine } from "../sound/corpusVoice";
import { createRandom } from "../sound/random";

const rate = 16000;

/** Notes held one after the other, with a breath between them. */
function held(voice: VoiceName, midis: readonly number[], lengthS: number, seed: number, steady = false): Float32Array {
  const random = createRandom(seed);
  const body = makeBody(voice, random);
  const delivery = makeDelivery(random);
  if (steady) Object.assign(body, { jitter: 0.0015 });
  if (steady) Object.assign(delivery, { driftCents: 2, scoopCents: 0 });
  const notes = midis.map((midi, k): LineNote => {
    const start = 0.4 + k * (lengthS + 0.5);
    return {
      midi,
      start,
      end: start + lengthS,
      onset: "open",
      vowel: (["a", "u", "i", "o"] as const)[(k + seed) % 4]!,
      levelDb: 0,
    };
  });
  const durationS = 0.4 + midis.length * (lengthS + 0.5);
  return addNoise(
    soundLine(notes, pitchCurve(notes, delivery, durationS, random), body, durationS, rate, random),
    rate,
    40,
    random,
  );
}

const judge = (pcm: Float32Array) => listenToTake(pcm, rate, { hold: true });
const voices = Object.keys(VOICES) as VoiceName[];

test.each(voices)("%s: one note of 0.6 s is heard at both ends and in the middle, however high", (voice) => {
  const { low, high } = VOICES[voice];
  [low, (low + high) / 2, high - 1, high].forEach((midi, k) => {
    const { verdict, range } = judge(held(voice, [midi + 0.2], 0.6, 11 + k));
    expect([voice, midi, verdict]).toEqual([voice, midi, "heard"]);
    expect(Math.abs(range!.lowMidi - midi - 0.2)).toBeLessThan(0.6);
    expect(range!.highMidi - range!.lowMidi).toBeLessThan(0.6);
  });
});

test.each(voices)("%s: who holds a note as well as anybody can is still heard", (voice) => {
  const { low, high } = VOICES[voice];
  for (const seed of [1, 2, 3])
    expect(judge(held(voice, [low + (high - low) * 0.25 * seed], 1.8, seed, true)).verdict).toBe("heard");
});

test("several held notes give the lowest and the highest", () => {
  const { verdict, range, notes } = judge(held("alto", [57, 60, 64, 67], 0.9, 5));
  expect(verdict).toBe("heard");
  expect(notes.filter((n) => n.sustained)).toHaveLength(4);
  expect(range!.lowMidi).toBeCloseTo(57, 0);
  expect(range!.highMidi).toBeCloseTo(67, 0);
});

test("a note of less than half a second is not held", () => {
  expect(judge(held("alto", [62], 0.35, 7)).verdict).toBe("too-short");
});

test.each([
  [220, 1.6, 50],
  [440, 0.6, 30],
  [880, 1.2, 20],
  [1047, 1.6, 40],
  [220, 1.6, 10],
  [440, 0.6, 10],
  [440, 0.6, 12],
  [880, 1.2, 12],
])("an electronic tone of %d Hz is no voice", (hz, lengthS, snrDb) => {
  const tone = Float32Array.from({ length: rate * (lengthS + 0.8) }, (_, i) => {
    const t = i / rate - 0.4;
    const edge = Math.max(0, Math.min(1, t / 0.01, (lengthS - t) / 0.01));
    return 0.1 * edge * (Math.sin(2 * Math.PI * hz * t) + 0.3 * Math.sin(6 * Math.PI * hz * t));
  });
  expect(judge(addNoise(tone, rate, snrDb, createRandom(3))).verdict).toBe("not-singing");
});

test.each([
  [220, 40],
  [440, 10],
  [880, 12],
])("nor is one that sounds four times (%d Hz, %d dB over the noise)", (hz, snrDb) => {
  const [onS, everyS] = [0.8, 1.2];
  const tone = Float32Array.from({ length: rate * 5 }, (_, i) => {
    const t = (i / rate) % everyS;
    return (
      0.1 *
      Math.max(0, Math.min(1, t / 0.01, (onS - t) / 0.01)) *
      (Math.sin(2 * Math.PI * hz * t) + 0.3 * Math.sin(6 * Math.PI * hz * t))
    );
  });
  expect(judge(addNoise(tone, rate, snrDb, createRandom(4))).verdict).toBe("not-singing");
});

test.each(["bass", "alto", "soprano"] as const)(
  "%s: held as well as can be in that noise, a note is heard",
  (voice) => {
    const { low, high } = VOICES[voice];
    const pcm = held(voice, [(low + high) / 2], 1.2, 6, true);
    for (const snrDb of [10, 12]) expect(judge(addNoise(pcm, rate, snrDb, createRandom(5))).verdict).toBe("heard");
  },
);
