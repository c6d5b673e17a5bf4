import { choirClips } from "./corpusChoir";
import { CORPUS_RATE, clipRandom, type Clip, type ClipSound, type CorpusHalf } from "./corpusClip";
import { lineTruth, pitchCurve, type Delivery, type LineNote } from "./corpusLine";
import * as rooms from "./corpusRoom";
import {
  makeBody,
  makeDelivery,
  makeLine,
  makeVibrato,
  oneNote,
  VOICES,
  type PhraseKind,
  type VoiceName,
} from "./corpusSinging";
import { soundLine, type VoiceBody } from "./corpusVoice";
import type { Random } from "./random";

const rate = CORPUS_RATE;

/** One kind of recording: who sings it, how, and what the place and the microphone do. */
interface Condition {
  voices: VoiceName[];
  kinds?: PhraseKind[];
  sing?: (delivery: Delivery, body: VoiceBody, random: Random) => void;
  line?: { creak?: boolean; tied?: number };
  place?: (pcm: Float32Array, random: Random) => Float32Array;
  tailS?: number;
  tags?: string[];
}

const everybody = Object.keys(VOICES) as VoiceName[];
const withVibrato = (delivery: Delivery, _: VoiceBody, random: Random): void => {
  delivery.vibrato = makeVibrato(random);
};

const CONDITIONS: Record<string, Condition> = {
  clean: { voices: everybody, kinds: ["song", "scale", "arpeggio", "long"] },
  vibrato: {
    voices: ["baritone", "tenor", "mezzo", "soprano"],
    kinds: ["long", "song"],
    sing: withVibrato,
    tags: ["clean"],
  },
  scoops: {
    voices: ["bass", "alto", "child"],
    sing: (delivery, _, random) => (delivery.scoopCents = random.between(150, 350)),
    tags: ["clean"],
  },
  legato: { voices: ["baritone", "mezzo"], kinds: ["scale"], line: { tied: 1 }, tags: ["clean"] },
  fry: { voices: ["bass", "tenor", "alto"], line: { creak: true } },
  breathy: {
    voices: ["tenor", "alto", "child"],
    sing: (_, body, random) =>
      Object.assign(body, { breathDb: random.between(-14, -8), tilt: random.between(1.5, 1.9), firstDb: 6 }),
  },
  // Cycles alternate, but too little for the pitch to be heard an octave lower.
  rough: {
    voices: ["bass", "tenor", "alto"],
    sing: (_, body, random) =>
      Object.assign(body, {
        alternation: random.between(0.08, 0.2),
        jitter: random.between(0.008, 0.016),
        shimmer: 0.08,
      }),
  },
  belted: {
    voices: ["baritone", "mezzo", "child"],
    sing: (_, body, random) =>
      Object.assign(body, { firstDb: random.between(-18, -9), tilt: random.between(0.5, 0.8) }),
  },
  awkward: {
    voices: ["bass", "baritone", "alto", "child"],
    sing: withVibrato,
    place: (pcm, random) => {
      const humming = rooms.addMains(pcm, rate, random.next() < 0.5 ? 50 : 60, random.between(-22, -14), random);
      return rooms.laptopMicrophone(rooms.addNoise(humming, rate, random.between(12, 18), random), rate, random);
    },
  },
  reverb: {
    voices: ["bass", "tenor", "soprano"],
    place: (pcm, random) => rooms.hall(pcm, rate, random.between(0.6, 1.5), random.between(0.2, 0.45), random),
    tailS: 0.5,
  },
  noise20: {
    voices: ["bass", "tenor", "mezzo", "child"],
    place: (pcm, random) => rooms.addNoise(pcm, rate, 20, random, random.next() < 0.5 ? "white" : "pink"),
  },
  noise10: {
    voices: ["bass", "tenor", "alto", "soprano"],
    place: (pcm, random) => rooms.addNoise(pcm, rate, 10, random, random.next() < 0.5 ? "white" : "pink"),
  },
  hum50: {
    voices: ["bass", "alto"],
    place: (pcm, random) => rooms.addMains(pcm, rate, 50, random.between(-20, -10), random),
    tags: ["hum"],
  },
  hum60: {
    voices: ["tenor", "soprano"],
    place: (pcm, random) => rooms.addMains(pcm, rate, 60, random.between(-20, -10), random),
    tags: ["hum"],
  },
  fan: {
    voices: ["baritone", "child"],
    place: (pcm, random) => rooms.addFan(pcm, rate, random.between(10, 18), random),
    tags: ["hum"],
  },
  bleed: {
    voices: ["bass", "baritone", "alto", "soprano", "child"],
    place: (pcm, random) => rooms.addGuitar(pcm, rate, -20, random),
  },
  laptop: {
    voices: ["bass", "baritone", "tenor", "mezzo"],
    place: (pcm, random) => rooms.laptopMicrophone(pcm, rate, random),
    tags: ["weakfund"],
  },
  phone: {
    voices: ["bass", "tenor", "alto", "child"],
    place: (pcm, random) => rooms.phoneMicrophone(pcm, rate, random),
    tags: ["weakfund"],
  },
  clipped: { voices: ["baritone", "mezzo"], place: (pcm, random) => rooms.clipped(pcm, random.between(2, 4)) },
  quiet: {
    voices: ["tenor", "child"],
    place: (pcm, random) => rooms.addNoise(pcm, rate, 28, random).map((x) => 0.02 * x),
  },
  gated: { voices: ["bass", "mezzo"], place: (pcm) => rooms.gated(pcm, rate) },
  ornamented: { voices: ["tenor", "alto", "soprano"], kinds: ["ornamented"], tags: ["blips"] },
  flipping: { voices: ["baritone", "child"], kinds: ["flipping"], tags: ["flips"] },
  everyday: {
    voices: everybody,
    sing: (delivery, _, random) => {
      delivery.scoopCents = random.between(50, 200);
      if (random.next() < 0.5)
        delivery.vibrato = { rateHz: random.between(5, 6.5), extentCents: random.between(20, 50) };
    },
    place: (pcm, random) => {
      const inRoom = rooms.hall(pcm, rate, random.between(0.3, 0.6), random.between(0.1, 0.25), random);
      const humming = rooms.addMains(inRoom, rate, 50, random.between(-36, -26), random);
      const noisy = rooms.addNoise(humming, rate, random.between(18, 28), random);
      return random.next() < 0.4 ? rooms.laptopMicrophone(noisy, rate, random) : noisy;
    },
    tailS: 0.3,
  },
};

/** Recordings of singing: synthetic voices in every condition, sampled choirs, and too little of it. */
export function singingClips(half: CorpusHalf): Clip[] {
  const synthetic = Object.entries(CONDITIONS).flatMap(([name, condition]) =>
    condition.voices.map((voice, k): Clip => {
      const clip = `${name}-${voice}`;
      const kinds = condition.kinds ?? ["song", "scale", "song", "arpeggio"];
      const kind = kinds[(k + (half === "dev" ? 0 : 1)) % kinds.length]!;
      return {
        name: clip,
        half,
        tags: [name, voice, ...(condition.tags ?? [])],
        make: () => sing(voice, kind, condition, clipRandom(half, clip)),
      };
    }),
  );
  return [...synthetic, ...choirClips(half), ...tooLittle(half)];
}

function sing(voice: VoiceName, kind: PhraseKind, condition: Condition, random: Random): ClipSound {
  const body = makeBody(voice, random);
  const delivery = makeDelivery(random);
  condition.sing?.(delivery, body, random);
  const { notes, durationS } = makeLine(voice, kind, random, condition.line);
  const curve = pitchCurve(notes, delivery, durationS, random);
  const dry = soundLine(notes, curve, body, durationS, rate, random);
  const pcm = condition.place ? condition.place(dry, random) : rooms.addNoise(dry, rate, 50, random);
  return { pcm, sampleRate: rate, truth: lineTruth(notes, curve, durationS, condition.tailS ?? 0) };
}

function tooLittle(half: CorpusHalf): Clip[] {
  const lengths: [string, VoiceName, number][] = [
    ["half-a-second", "alto", 0.5],
    ["one-note", "baritone", 0.9],
    ["one-short-note", "child", 0.25],
  ];
  return lengths.map(([name, voice, lengthS]) => ({
    name,
    half,
    tags: ["too-little"],
    make: () => {
      const random = clipRandom(half, name);
      const { notes, durationS } = oneNote(voice, lengthS, random);
      const line: LineNote[] = notes;
      const curve = pitchCurve(line, makeDelivery(random), durationS, random);
      const pcm = rooms.addNoise(
        soundLine(line, curve, makeBody(voice, random), durationS, rate, random),
        rate,
        45,
        random,
      );
      const truth = lineTruth(line, curve, durationS, 0);
      truth.expected = {
        verdict: "too_little",
        accept: ["too_little", "no_singing"],
        lowMidi: null,
        highMidi: null,
        looseLowMidi: null,
        looseHighMidi: null,
      };
      return { pcm, sampleRate: rate, truth };
    },
  }));
}
