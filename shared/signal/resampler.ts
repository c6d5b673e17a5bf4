import { createHighPass } from "./highPass";

/** The one rate, in Hz, at which the engine analyses sound; every take is brought to it first. */
export const ANALYSIS_RATE = 8000;

/** Half length of the interpolation kernel and middle of its roll-off; sets a pass band to about 2.3 kHz. */
const HALF_LENGTH_S = 0.0011;
const CUTOFF_HZ = 3000;
const KAISER_BETA = 5.65;
/** Steps on the floor and wind lie below; the lowest sung notes above. */
const RUMBLE_HZ = 45;

/** Brings sound, piece by piece, to the analysis rate. */
export interface Resampler {
  /** @returns all samples at 8 kHz that the input so far determines; shape [n], n >= 0 */
  push(pcm: Float32Array): Float32Array;
  /** @returns the last samples, as if the input were followed by silence */
  finish(): Float32Array;
}

/**
 * Makes a streaming low-pass resampler to 8 kHz (windowed sinc, Kaiser window, about 60 dB of stop band),
 * with rumble below 45 Hz taken out.
 * Sample n of the output stands at time n / 8000 s of the input, whatever the sizes of the pieces.
 *
 * @param sampleRate rate of the input in Hz, 8000 to 192000
 * @returns the resampler, with its own memory
 * @throws RangeError if the rate is outside 8-192 kHz
 * @see J. F. Kaiser, "Nonrecursive digital filter design using the I0-sinh window function", ISCAS 1974
 * @example createResampler(8000).push(new Float32Array(800)).length // => 791
 */
export function createResampler(sampleRate: number): Resampler {
  const rate = Math.round(sampleRate);
  if (!(rate >= 8000 && rate <= 192000)) throw new RangeError("sampleRate must be 8000 to 192000 Hz");
  const divisor = greatestCommonDivisor(rate, ANALYSIS_RATE);
  const step = rate / divisor;
  const phases = ANALYSIS_RATE / divisor;
  const half = Math.ceil(HALF_LENGTH_S * rate);
  const kernels = kernelBank(rate, phases, half);
  const taps = 2 * half;
  let kept = new Float32Array(half);
  let keptFrom = -half;
  let nextOut = 0;
  const withoutRumble = createHighPass(RUMBLE_HZ, ANALYSIS_RATE);

  function take(pcm: Float32Array): Float32Array {
    const input = new Float32Array(kept.length + pcm.length);
    input.set(kept);
    input.set(pcm, kept.length);
    const end = keptFrom + input.length;
    const out = new Float32Array(Math.max(0, Math.ceil(((end - half) * phases) / step) - nextOut));
    for (let n = 0; n < out.length; n++) {
      const position = nextOut * step;
      const whole = Math.floor(position / phases);
      const kernelFrom = (position - whole * phases) * taps;
      const inputFrom = whole - half + 1 - keptFrom;
      let sum = 0;
      for (let tap = 0; tap < taps; tap++) sum += kernels[kernelFrom + tap]! * input[inputFrom + tap]!;
      out[n] = sum;
      nextOut++;
    }
    const firstNeeded = Math.floor((nextOut * step) / phases) - half + 1;
    kept = input.slice(Math.max(0, firstNeeded - keptFrom));
    keptFrom = Math.max(keptFrom, firstNeeded);
    return withoutRumble(out);
  }
  return { push: take, finish: () => take(new Float32Array(half + 1)) };
}

function kernelBank(rate: number, phases: number, half: number): Float32Array {
  const taps = 2 * half;
  const bank = new Float32Array(phases * taps);
  const cutoff = Math.min(CUTOFF_HZ, 0.45 * rate) / rate;
  const edge = besselI0(KAISER_BETA);
  for (let phase = 0; phase < phases; phase++) {
    let sum = 0;
    for (let tap = 0; tap < taps; tap++) {
      const distance = tap - half + 1 - phase / phases;
      const inside = 1 - (distance / half) ** 2;
      const window = inside <= 0 ? 0 : besselI0(KAISER_BETA * Math.sqrt(inside)) / edge;
      const x = 2 * Math.PI * cutoff * distance;
      const value = (Math.abs(x) < 1e-9 ? 1 : Math.sin(x) / x) * window;
      bank[phase * taps + tap] = value;
      sum += value;
    }
    for (let tap = 0; tap < taps; tap++) bank[phase * taps + tap]! /= sum;
  }
  return bank;
}

function besselI0(x: number): number {
  let term = 1;
  let sum = 1;
  for (let k = 1; term > 1e-12 * sum; k++) {
    term *= (x / (2 * k)) ** 2;
    sum += term;
  }
  return sum;
}

function greatestCommonDivisor(a: number, b: number): number {
  return b === 0 ? a : greatestCommonDivisor(b, a % b);
}
