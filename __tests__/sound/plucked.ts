import { createRandom, type Random } from "./random";

/** Taken out once: inside a test runner every use of a global is slow. */
const { exp, sin, PI } = Math;

/** One pluck of a stiff string. */
export interface Pluck {
  /** frequency of the first partial, once the pitch has settled */
  hz: number;
  /** B in f_n = n f0 sqrt(1 + B n^2) */
  inharmonicity?: number;
  startS: number;
  lengthS: number;
  /** 1 by default */
  loudness?: number;
  /** seconds in which the first partial falls by 60 dB */
  decayS?: number;
  /** where it is plucked, as a share of its length: partials with a node there are missing */
  place?: number;
  /** how many cents sharp a hard pluck begins; gone after some tenths of a second */
  glideCents?: number;
  /** 0 takes the first partial away, as a small microphone does */
  fundamental?: number;
}

/** What is around the strings. */
export interface Surroundings {
  sampleRate: number;
  durationS: number;
  seed: number;
  /** white noise, dB below the loudest pluck's RMS at its start; none by default */
  noiseDb?: number;
  /** mains hum with harmonics, likewise */
  humDb?: number;
  humHz?: number;
}

/**
 * Modal synthesis of plucked strings with exact truth: stretched partials of two slightly unlike directions, each dying
 * away by itself, behind a click of the pick.
 *
 * @see N. Fletcher, T. Rossing, The Physics of Musical Instruments (1998), chapters 2 and 9
 */
export function pluckStrings(plucks: readonly Pluck[], around: Surroundings): Float32Array {
  const { sampleRate, durationS, seed } = around;
  const random = createRandom(seed);
  const out = new Float32Array(Math.ceil(durationS * sampleRate));
  for (const each of plucks) addPluck(out, each, sampleRate, random);
  const level = 0.13;
  if (around.noiseDb !== undefined) {
    const amplitude = level * Math.SQRT1_2 * 10 ** (around.noiseDb / 20) * Math.sqrt(12);
    for (let i = 0; i < out.length; i++) out[i]! += amplitude * (random.next() - 0.5);
  }
  if (around.humDb !== undefined) {
    const amplitude = level * 10 ** (around.humDb / 20);
    const hum = around.humHz ?? 50;
    for (const [n, share] of [1, 0.6, 0.4, 0.2].entries())
      for (let i = 0; i < out.length; i++)
        out[i]! += amplitude * share * sin((2 * PI * hum * (n + 1) * i) / sampleRate + n);
  }
  return out;
}

function addPluck(out: Float32Array, pluck: Pluck, sampleRate: number, random: Random): void {
  const {
    hz,
    inharmonicity: b = 1e-4,
    loudness = 1,
    decayS = 4,
    place = 0.19,
    glideCents = 0,
    fundamental = 1,
  } = pluck;
  const from = Math.round(pluck.startS * sampleRate);
  const until = Math.min(out.length, from + Math.round(pluck.lengthS * sampleRate));
  const f0 = hz / Math.sqrt(1 + b);
  // A hand stops the string without a click.
  const fade = 0.02 * sampleRate;
  const top = Math.min(0.45 * sampleRate, 6000);
  for (let n = 1; n <= 40; n++) {
    const partialHz = n * f0 * Math.sqrt(1 + b * n * n);
    if (partialHz > top) break;
    const strength =
      (0.3 * loudness * Math.abs(Math.sin(Math.PI * n * place)) * (n === 1 ? fundamental : 1)) / n ** 1.2;
    const fall = Math.log(1000) / (decayS / (1 + 0.12 * (n - 1)));
    const step = (2 * PI * partialHz) / sampleRate;
    const damp = exp(-fall / sampleRate);
    let phase = 2 * PI * random.next();
    let level = strength;
    for (let i = from; i < until; i++) {
      const t = (i - from) / sampleRate;
      phase += glideCents === 0 || t > 1 ? step : step * 2 ** ((glideCents * exp(-t / 0.09)) / 1200);
      const edge = t < 0.002 ? t / 0.002 : until - i < fade ? (until - i) / fade : 1;
      out[i]! += level * edge * sin(phase);
      level *= damp;
    }
  }
  const click = Math.round(0.008 * sampleRate);
  for (let i = 0; i < click && from + i < out.length; i++)
    out[from + i]! += 0.15 * loudness * (random.next() - 0.5) * Math.exp(-i / (0.002 * sampleRate));
}
