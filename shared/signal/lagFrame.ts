import { Autocorrelator } from "pitchy";

/** Length of one analysis window in samples at 8 kHz: 64 ms, five periods of the lowest sung notes. */
export const WINDOW = 512;
/** Distance of frames in samples at 8 kHz: 10 ms. */
export const HOP = 80;
/** Longest lag kept, in samples at 8 kHz: just under 60 Hz, and room to interpolate. */
export const MAX_LAG = 140;

/** Lag-domain picture of one window: what the normalised square difference is made of. */
export interface LagFrame {
  /** autocorrelation r(lag) of the window, shape [141] */
  r: Float32Array;
  /** energy m(lag) of the two overlapping parts, shape [141] */
  m: Float32Array;
  /** RMS level of the middle 20 ms in dBFS (full-scale sine 0); -Infinity for silence */
  levelDb: number;
}

/** Length of the second, shorter look at frames where the pitch moves too fast for the first: 32 ms. */
export const SHORT_WINDOW = 256;

/**
 * Makes a function that measures one window. Keeps r and m apart, so that the mean r and m of the room
 * can be subtracted before the quotient is taken: uncorrelated sounds add in the lag domain.
 *
 * @param length samples in a window, even, above MAX_LAG + 80
 * @returns measure(samples, from): reads `length` samples at 8 kHz from index `from`; places outside the array count as silence
 * @see P. McLeod, G. Wyvill, "A smarter way to find pitch", ICMC 2005 (normalised square difference)
 * @example createLagMeter()(new Float32Array(512), 0).levelDb // => -Infinity
 */
export function createLagMeter(length = WINDOW): (samples: Float32Array, from: number) => LagFrame {
  const autocorrelator = Autocorrelator.forFloat32Array(length);
  const window = new Float32Array(length);
  const lastLag = MAX_LAG;
  const correlation = new Float32Array(length);
  return (samples, from) => {
    let energy = 0;
    for (let i = 0; i < length; i++) {
      const x = samples[from + i] ?? 0;
      window[i] = x;
      energy += x * x;
    }
    const r = new Float32Array(lastLag + 1);
    const m = new Float32Array(lastLag + 1);
    if (energy > 0) {
      autocorrelator.autocorrelate(window, correlation);
      let both = 2 * energy;
      for (let lag = 0; lag <= lastLag; lag++) {
        if (lag > 0) both -= window[lag - 1]! ** 2 + window[length - lag]! ** 2;
        r[lag] = correlation[lag]!;
        m[lag] = both > 0 ? both : 0;
      }
    }
    let middle = 0;
    for (let i = length / 2 - HOP; i < length / 2 + HOP; i++) middle += window[i]! ** 2;
    return { r, m, levelDb: 10 * Math.log10(middle / HOP) };
  };
}
