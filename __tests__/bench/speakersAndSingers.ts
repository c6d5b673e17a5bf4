import { lineTruth, pitchCurve, type ClipTruth, type Delivery, type LineNote } from "../sound/corpusLine";
import * as rooms from "../sound/corpusRoom";
import {
  makeBody,
  makeDelivery,
  makeLine,
  makeVibrato,
  VOICES,
  type PhraseKind,
  type VoiceName,
} from "../sound/corpusSinging";
import { soundLine } from "../sound/corpusVoice";
import { speech } from "../sound/noSinging";
import { createRandom, type Random } from "../sound/random";
import { addRoom } from "../sound/room";
import { singPhrase } from "../sound/singer";

/** Somebody speaking or singing, somewhere. */
export interface Utterance {
  name: string;
  sung: boolean;
  pcm: Float32Array;
  sampleRate: number;
  /** what is sung; null for speech and for lines whose truth nobody asked for */
  truth: ClipTruth | null;
}

const SPEAKERS =
  "en en-us en-gb-scotland de fr-fr it es sv nl pt da pl fi nb cs hu tr el ro ca hr en-gb-x-rp es-419 pt-br ru".split(
    " ",
  );
const MANNERS = [
  "",
  "+f1",
  "+f2",
  "+f3",
  "+f4",
  "+f5",
  "+m1",
  "+m2",
  "+m3",
  "+m4",
  "+m5",
  "+m6",
  "+m7",
  "+m8",
  "+croak",
  "+klatt",
  "+klatt2",
  "+Annie",
  "+linda",
  "+steph",
  "+grandma",
  "+zac",
];
const SENTENCES = [
  "The ferry leaves at half past nine, and nobody has found the lamp that hung beside the gangway since Tuesday.",
  "Would you put the kettle on before the others come? There are seven cups on the shelf and one in the sink.",
  "I never said that the harbour was quiet, only that the gulls are louder on the other side of the wall.",
  "Well, that is wonderful news! When did she write to you, and why on earth did you not tell us?",
  "One, two, three, four. The rope is tied to the second ring, and the third one is for the small boat.",
  "My grandmother remembers summers when the whole village rowed over to the island and came home by moonlight.",
  "No. Really? I am not sure. Maybe we should wait until the rain is over.",
  "Good evening, everybody. Tonight we will start with the second song, and then take a break.",
  "All morning long we ran around in a yellow lorry, whirling along the narrow lane, laughing in the rain.",
  "Oh, I see. Yes, yes, of course. You are very welcome here, any evening you like.",
];

/** One reading by the machine's own voice; null where espeak-ng is not installed. */
export function speaker(seed: number): Utterance | null {
  const random = createRandom(seed);
  const voice = `${pick(SPEAKERS, random)}${pick(MANNERS, random)}`;
  const words = Math.round(random.between(100, 190));
  const spoken = speech(pick(SENTENCES, random), voice, words, Math.round(random.between(20, 80)));
  if (spoken === null) return null;
  const { pcm, place } = somewhere(spoken.pcm, spoken.sampleRate, random);
  return {
    name: `speech ${seed} ${voice} ${words} ${place}`,
    sung: false,
    pcm,
    sampleRate: spoken.sampleRate,
    truth: null,
  };
}

const KINDS: readonly PhraseKind[] = ["song", "song", "scale", "arpeggio", "long", "ornamented", "flipping"];
const rate = 22050;

/** One line by a synthetic singer, every third of few pitches near each other, as in a round or a chant. */
export function singer(seed: number): Utterance {
  const random = createRandom(seed);
  const voice = pick(Object.keys(VOICES) as VoiceName[], random);
  const manner = random.next();
  if (manner < 0.3) return narrowLine(voice, seed, random);
  const loose = manner < 0.6;
  const kind = pick(KINDS, random);
  const body = makeBody(voice, random);
  if (random.next() < 0.15)
    Object.assign(body, { breathDb: random.between(-16, -8), tilt: random.between(1.5, 1.9), firstDb: 6 });
  const delivery = makeDelivery(random);
  delivery.scoopCents = random.next() < 0.4 ? random.between(100, 300) : random.between(0, 60);
  delivery.driftCents = random.between(4, 22);
  if (random.next() < 0.35) delivery.vibrato = makeVibrato(random);
  const line = makeLine(voice, kind, random, { tied: random.between(0, 1), creak: random.next() < 0.1 });
  const { notes, durationS } = loose ? loosely(line, delivery, random) : line;
  const curve = pitchCurve(notes, delivery, durationS, random);
  const dry = soundLine(notes, curve, body, durationS, rate, random);
  const { pcm, place } = somewhere(dry, rate, random);
  return {
    name: `${loose ? "loose " : ""}${kind} ${seed} ${voice} ${place}`,
    sung: true,
    pcm,
    sampleRate: rate,
    truth: lineTruth(notes, curve, durationS, 0.5),
  };
}

/** As people sing who never learnt to: words at the pace of speech, notes approached from afar, that sag, off the grid. */
function loosely(line: { notes: LineNote[]; durationS: number }, delivery: Delivery, random: Random) {
  const quick = random.between(0.5, 0.85);
  const off = random.between(0.1, 0.35);
  delivery.driftCents = random.between(15, 40);
  delivery.glideS = random.between(0.07, 0.18);
  delivery.scoopCents = random.between(50, 300);
  const notes = line.notes.map((n) => ({
    ...n,
    start: n.start * quick,
    end: n.end * quick,
    midi: n.midi + off * random.normal(),
  }));
  return { notes, durationS: line.durationS * quick };
}

function narrowLine(voice: VoiceName, seed: number, random: Random): Utterance {
  const { low, high, tract } = VOICES[voice];
  const scale = pick(
    [
      [0, 2, 4],
      [0, 2, 3, 5],
      [0, 1, 3, 5],
      [0, 2, 4, 5, 7],
      [-1, 0, 2],
      [0, 3, 5],
      [0, 4, 5],
    ] as const,
    random,
  );
  const bottom = random.between(low, high - 8);
  const beat = random.between(0.26, 0.5);
  const looseness = random.between(0.05, 0.25);
  let place = 1;
  const notes = Array.from({ length: Math.round(7 / beat) }, () => {
    place = Math.max(0, Math.min(scale.length - 1, place + Math.round(1.2 * random.normal())));
    const durationS = beat * pick([1, 1, 1, 1, 1.5, 2], random);
    return { midi: bottom + scale[place]! + looseness * random.normal(), durationS, levelDb: random.between(-5, 0) };
  });
  const { pcm: dry } = singPhrase({
    notes,
    seed,
    sampleRate: rate,
    tract: random.between(tract[0], tract[1]),
    scoopCents: random.between(0, 200),
    consonants: random.between(0.2, 0.95),
    jitter: random.between(0.003, 0.01),
    ...(random.next() < 0.3
      ? { vibrato: { rateHz: random.between(5, 6.5), extentCents: random.between(15, 60) } }
      : {}),
  });
  const { pcm, place: where } = somewhere(dry, rate, random);
  return {
    name: `narrow ${seed} ${voice} beat ${beat.toFixed(2)} ${where}`,
    sung: true,
    pcm,
    sampleRate: rate,
    truth: null,
  };
}

/** Two of three in a room with an echo, of two kinds; some through a small microphone or in noise. */
function somewhere(dry: Float32Array, sampleRate: number, random: Random): { pcm: Float32Array; place: string } {
  let pcm = dry;
  let place = "plain";
  const room = random.next();
  if (room < 0.55) {
    const [rt60, wet] = [random.between(0.3, 1.2), random.between(0.15, 0.5)];
    pcm = rooms.hall(pcm, sampleRate, rt60, wet, random);
    place = `hall ${rt60.toFixed(1)} s ${wet.toFixed(2)}`;
  } else if (room < 0.7) {
    const share = random.between(0.1, 0.5);
    pcm = addRoom(pcm, sampleRate, { reverb: share }, random);
    place = `small room ${share.toFixed(2)}`;
  }
  const microphone = random.next();
  if (microphone < 0.15) return { pcm: rooms.laptopMicrophone(pcm, sampleRate, random), place: `${place}, laptop` };
  if (microphone < 0.25) return { pcm: rooms.phoneMicrophone(pcm, sampleRate, random), place: `${place}, phone` };
  const snr = microphone < 0.5 ? random.between(10, 30) : 45;
  return { pcm: rooms.addNoise(pcm, sampleRate, snr, random), place: `${place}, ${snr.toFixed(0)} dB` };
}

function pick<T>(from: readonly T[], random: Random): T {
  return from[Math.floor(random.next() * from.length)]!;
}
