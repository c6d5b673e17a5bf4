import { CORPUS_RATE, clipRandom, type Clip, type CorpusHalf } from "./corpusClip";
import { silentTruth } from "./corpusLine";
import { addMains, addNoise, hall, laptopMicrophone, phoneMicrophone } from "./corpusRoom";
import { beeps, breathing, clapping, fanAlone, picking, room, strumming, whistling } from "./corpusSounds";
import { claps, silence, speech, typing } from "./noSinging";
import type { Random } from "./random";

const rate = CORPUS_RATE;
const durationS = 6;
type Maker = (random: Random) => Float32Array;
const seed = (random: Random): number => Math.floor(random.next() * 1e9);

const SOUNDS: Record<string, Maker> = {
  silence: () => silence(0, rate, durationS),
  room: (random) => room(rate, durationS, random),
  "hum-50": (random) => addMains(room(rate, durationS, random), rate, 50, random.between(6, 20), random),
  "hum-60": (random) => addMains(room(rate, durationS, random), rate, 60, random.between(6, 20), random),
  fan: (random) => fanAlone(rate, durationS, random),
  "fan-2": (random) => fanAlone(rate, durationS, random),
  claps: (random) => clapping(claps(seed(random), rate, durationS), rate, random),
  typing: (random) => typing(seed(random), rate, durationS),
  breaths: (random) => breathing(rate, durationS, random),
  whistle: (random) => whistling(rate, durationS, random),
  beeps: (random) => beeps(rate, durationS, random),
  strumming: (random) => strumming(rate, durationS, random),
  "strumming-phone": (random) => phoneMicrophone(strumming(rate, durationS, random), rate, random),
  "strumming-hall": (random) => hall(strumming(rate, durationS, random), rate, random.between(0.5, 1.2), 0.3, random),
  "whistle-2": (random) => whistling(rate, durationS, random),
  "beeps-2": (random) => beeps(rate, durationS, random),
  picking: (random) => picking(rate, durationS, random),
};

/** Lines to be spoken, and for each half eight of espeak-ng's voices with words per minute and what the room does. */
const LINES = [
  "The ferry leaves at half past nine, and nobody has found the lamp that hung beside the gangway since Tuesday.",
  "Would you put the kettle on before the others come? There are seven cups on the shelf and one in the sink.",
  "I never said that the harbour was quiet, only that the gulls are louder on the other side of the wall.",
  "Well, that is wonderful news! When did she write to you, and why on earth did you not tell us?",
  "One, two, three, four. The rope is tied to the second ring, and the third one is for the small boat.",
];
type Place = "plain" | "noise" | "phone" | "laptop" | "hall";
const SPEAKERS: Record<CorpusHalf, [string, number, Place][]> = {
  dev: [
    ["en", 150, "plain"],
    ["en-us+f2", 170, "noise"],
    ["en+m3", 130, "phone"],
    ["de+f1", 160, "hall"],
    ["en+f5", 145, "plain"],
    ["it+m2", 140, "hall"],
    ["es+f4", 150, "plain"],
    ["sv", 160, "laptop"],
  ],
  "held-out": [
    ["en-gb-scotland", 155, "plain"],
    ["en+f4", 140, "hall"],
    ["en-us+m5", 165, "noise"],
    ["en+m1", 120, "plain"],
    ["fr+f3", 150, "phone"],
    ["nl+m4", 150, "hall"],
    ["pt+f1", 145, "plain"],
    ["da+f2", 155, "laptop"],
  ],
};

/** Recordings in which nobody sings. */
export function quietClips(half: CorpusHalf): Clip[] {
  const plain = Object.entries(SOUNDS).map(([name, make]): Clip => ({
    name,
    half,
    tags: ["nonvoice", name.replace(/-.*/, "")],
    make: () => ({ pcm: make(clipRandom(half, name)), sampleRate: rate, truth: silentTruth(durationS) }),
  }));
  const spoken = SPEAKERS[half].map(([voice, words, place], k): Clip => {
    const name = `speech-${k + 1}-${place}`;
    return {
      name,
      half,
      tags: ["nonvoice", "speech"],
      make: () => speak(LINES[k % LINES.length]!, voice, words, place, clipRandom(half, name)),
    };
  });
  return [...plain, ...spoken];
}

function speak(line: string, voice: string, words: number, place: Place, random: Random) {
  const spoken = speech(line, voice, words);
  if (spoken === null) return null;
  const { sampleRate } = spoken;
  let { pcm } = spoken;
  if (place === "noise") pcm = addNoise(pcm, sampleRate, 20, random);
  if (place === "phone") pcm = phoneMicrophone(pcm, sampleRate, random);
  if (place === "laptop") pcm = laptopMicrophone(pcm, sampleRate, random);
  if (place === "hall") pcm = hall(pcm, sampleRate, random.between(0.3, 0.9), 0.35, random);
  return { pcm, sampleRate, truth: silentTruth(pcm.length / sampleRate) };
}
