import { PitchDetector } from "pitchy";
import { midiToHz } from "../../shared/music/pitch";
import { createStringReader } from "../../shared/voice/pluckedString";
import { pluckStrings, type Pluck, type Surroundings } from "../sound/plucked";
import { createRandom } from "../sound/random";

/** A string of an instrument, as bench and bars pluck it. */
export interface BenchString {
  name: string;
  midi: number;
  decayS: number;
}

/** Lowest of a baritone let down to the top of a mandolin's neck; short scales die away sooner. */
export const benchStrings: readonly BenchString[] = [
  { name: "guitar E2", midi: 40, decayS: 6 },
  { name: "guitar A2", midi: 45, decayS: 6 },
  { name: "guitar D3", midi: 50, decayS: 5 },
  { name: "guitar G3", midi: 55, decayS: 5 },
  { name: "guitar B3", midi: 59, decayS: 4 },
  { name: "guitar E4", midi: 64, decayS: 4 },
  { name: "ukulele C4", midi: 60, decayS: 1.6 },
  { name: "ukulele A4", midi: 69, decayS: 1.4 },
  { name: "banjo short G4", midi: 67, decayS: 1.2 },
  { name: "mandolin E5", midi: 76, decayS: 1.6 },
  { name: "mandolin A5", midi: 81, decayS: 1.4 },
  { name: "baritone B1", midi: 35, decayS: 6 },
];

/** From an ideal string over plain steel and wound ones to the stiffest of a short scale. */
export const stiffness = [0, 1e-4, 4e-4, 1e-3];

/** What stands in the way. */
export interface BenchCondition {
  name: string;
  pluck?: Partial<Pluck>;
  around?: Partial<Surroundings>;
  /** other strings ring along, so many dB below */
  alongDb?: number;
}

export const conditions: readonly BenchCondition[] = [
  { name: "clean" },
  { name: "room noise at -20 dB", around: { noiseDb: -20 } },
  { name: "room noise at -10 dB", around: { noiseDb: -10 } },
  { name: "hum of 50 Hz at -12 dB", around: { humDb: -12 } },
  { name: "hum of 60 Hz at -12 dB", around: { humDb: -12, humHz: 60 } },
  { name: "no fundamental", pluck: { fundamental: 0.02 } },
  { name: "other strings ring along at -18 dB", alongDb: -18 },
  { name: "plucked hard, 8 cents sharp at first", pluck: { glideCents: 8 } },
  { name: "plucked in the middle", pluck: { place: 0.48 } },
];

/** How one pluck was read: cents off and seconds from the pluck, null where it was not read. */
export interface BenchReading {
  string: string;
  stiffness: number;
  condition: string;
  first: { cents: number; afterS: number } | null;
  /** the reading 0.9 s after the pluck, or the last before */
  settledCents: number | null;
  pitchyCents: number | null;
}

const sampleRate = 44_100;
const pluckS = 1;
const settledS = 0.9;
const block = 441;

/** Plucks one string once and reads it, with ours and with plain pitchy. */
export function readPluck(string: BenchString, b: number, condition: BenchCondition, seed: number): BenchReading {
  const random = createRandom(seed);
  const hz = midiToHz(string.midi + random.between(-0.45, 0.45));
  const { decayS } = string;
  const plucks: Pluck[] = [
    {
      hz,
      inharmonicity: b,
      decayS,
      startS: pluckS,
      lengthS: 1,
      place: random.between(0.12, 0.24),
      ...condition.pluck,
    },
  ];
  if (condition.alongDb !== undefined) {
    const loudness = 10 ** (condition.alongDb / 20);
    for (const step of [-5, 5.03, 9.06])
      plucks.push({ hz: hz * 2 ** (step / 12), loudness, decayS, inharmonicity: 1e-4, startS: 0.2, lengthS: 1.8 });
  }
  const pcm = pluckStrings(plucks, { sampleRate, durationS: 2, seed, ...condition.around });
  const cents = (heard: number) => 1200 * Math.log2(heard / hz);
  const reader = createStringReader(sampleRate);
  let first: BenchReading["first"] = null;
  let settled: number | null = null;
  for (let from = 0; from + block <= pcm.length; from += block) {
    // A reading is there once the block that brought it has been pushed.
    const nowS = (from + block) / sampleRate - pluckS;
    for (const reading of reader.push(pcm.subarray(from, from + block))) {
      if (nowS < 0 || nowS > settledS + 0.05) continue;
      first ??= { cents: cents(reading.hz), afterS: nowS };
      settled = cents(reading.hz);
    }
  }
  const names = { string: string.name, stiffness: b, condition: condition.name };
  const plain = plainPitchy(pcm);
  return { ...names, first, settledCents: settled, pitchyCents: plain === null ? null : cents(plain) };
}

/** The middle one of what pitchy alone says about 85 ms windows in the same time, clarity 0.9 asked for as is usual. */
function plainPitchy(pcm: Float32Array): number | null {
  const detector = PitchDetector.forFloat32Array(4096);
  const heard: number[] = [];
  for (let at = pluckS + 0.03; at + 0.093 < pluckS + settledS; at += 0.02) {
    const from = Math.round(at * sampleRate);
    const [hz, clarity] = detector.findPitch(pcm.slice(from, from + 4096), sampleRate);
    if (clarity >= 0.9) heard.push(hz);
  }
  heard.sort((a, b) => a - b);
  return heard[heard.length >> 1] ?? null;
}
