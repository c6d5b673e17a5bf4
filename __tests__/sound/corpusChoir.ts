import { PROGRAM, renderChoir } from "./choir";
import { CORPUS_RATE, clipRandom, type Clip, type ClipSound, type CorpusHalf } from "./corpusClip";
import type { ClipTruth } from "./corpusLine";
import * as rooms from "./corpusRoom";
import type { Random } from "./random";

const { ceil, cos, floor, max, min, PI, round, sin } = Math;
const rate = CORPUS_RATE;
const PAD_S = 0.3;
/** A sampled voice swells in, and the note before it rings on: so much of each note is not scored. */
const SWELL_S = 0.3;

/** Clip, voice, lowest root (MIDI), what the place does, and rest after each note in seconds. */
const CHOIRS: [string, number, number, "plain" | "noise" | "laptop" | "hum", number][] = [
  ["choir-low", PROGRAM.choirAahs, 43, "plain", 0],
  ["choir-middle", PROGRAM.choirAahs, 52, "noise", 0.35],
  ["choir-high", PROGRAM.choirAahs, 62, "plain", 0.35],
  ["oohs-low", PROGRAM.voiceOohs, 48, "laptop", 0],
  ["oohs-middle", PROGRAM.voiceOohs, 57, "plain", 0.35],
  ["oohs-high", PROGRAM.voiceOohs, 66, "hum", 0],
];
const TAGS = { plain: "clean", noise: "noise20", laptop: "weakfund", hum: "hum" } as const;
const STEPS = [
  [0, 2, 4, 5, 7, 9, 7, 4, 0, 12, 7, 0],
  [4, 7, 12, 9, 7, 4, 5, 2, 0, 4, 7, 11],
] as const;

interface ChoirNote {
  midi: number;
  durationS: number;
}

/** Sampled voices of Debian's General MIDI sound font: nothing in them is ours. */
export function choirClips(half: CorpusHalf): Clip[] {
  return CHOIRS.map(([name, program, base, place, gapS]) => ({
    name,
    half,
    tags: ["sampled", TAGS[place]],
    make: () => sampled(program, base, place, gapS, half, clipRandom(half, name)),
  }));
}

function sampled(
  program: number,
  base: number,
  place: keyof typeof TAGS,
  gapS: number,
  half: CorpusHalf,
  random: Random,
): ClipSound | null {
  const root = base + floor(random.between(0, 5));
  const melody = STEPS[half === "dev" ? 0 : 1].map((step) => ({
    midi: root + step,
    durationS: random.between(0.6, 0.85),
  }));
  const rendered = renderChoir(melody, { program, sampleRate: rate, padS: PAD_S, gapS });
  if (rendered === null) return null;
  let { pcm } = rendered;
  const truth = sampledTruth(melody, gapS, pcm);
  if (place === "noise") pcm = rooms.addNoise(pcm, rate, 20, random);
  if (place === "laptop") pcm = rooms.laptopMicrophone(pcm, rate, random);
  if (place === "hum") pcm = rooms.addMains(pcm, rate, 60, -15, random);
  return { pcm, sampleRate: rate, truth };
}

function sampledTruth(melody: readonly ChoirNote[], gapS: number, pcm: Float32Array): ClipTruth {
  const durationS = pcm.length / rate;
  const f0: (number | null)[] = Array.from({ length: floor(durationS * 100) }, () => null);
  const ignore: [number, number][] = [];
  const sounding: number[] = [];
  let at = PAD_S;
  for (const { midi, durationS: lengthS } of melody) {
    const tuned = midi + detuning(pcm.subarray(round((at + SWELL_S) * rate), round((at + lengthS) * rate)), midi) / 100;
    sounding.push(tuned);
    for (let k = ceil(at * 100); k < (at + lengthS) * 100 && k < f0.length; k++) f0[k] = 440 * 2 ** ((tuned - 69) / 12);
    ignore.push([at - 0.03, at + SWELL_S], [at + lengthS - 0.03, at + lengthS + gapS]);
    at += lengthS + gapS;
  }
  ignore.push([at - 0.03, durationS]);
  const [lowMidi, highMidi] = [min(...sounding), max(...sounding)];
  return {
    hopS: 0.01,
    f0,
    ignore,
    expected: { verdict: "ok", accept: ["ok"], lowMidi, highMidi, looseLowMidi: lowMidi, looseHighMidi: highMidi },
  };
}

/** How far a sample is out of tune, in cents within 60: where its first five partials have the most power. */
function detuning(pcm: Float32Array, midi: number): number {
  let best = { cents: 0, power: -1 };
  for (let cents = -60; cents <= 60; cents += 4) {
    const hz = 440 * 2 ** ((midi + cents / 100 - 69) / 12);
    let power = 0;
    for (let h = 1; h <= 5; h++) power += powerAt(pcm, h * hz);
    if (power > best.power) best = { cents, power };
  }
  return best.cents;
}

/** Power at one frequency under a Hann window. @see G. Goertzel, American Mathematical Monthly 65 (1958) */
function powerAt(pcm: Float32Array, hz: number): number {
  const turn = 2 * cos((2 * PI * hz) / rate);
  let before = 0;
  let last = 0;
  for (let i = 0; i < pcm.length; i++) {
    const now = pcm[i]! * sin((PI * i) / pcm.length) ** 2 + turn * last - before;
    before = last;
    last = now;
  }
  return last * last + before * before - turn * last * before;
}
