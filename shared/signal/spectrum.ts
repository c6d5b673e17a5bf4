/** One peak of a spectrum. */
export interface SpectralPeak {
  /** frequency in Hz, interpolated between bins */
  hz: number;
  /** amplitude; a sine of amplitude 1 gives about 1 */
  amplitude: number;
}

/** Taken out once: it stands in the innermost loop. */
const squareRoot = Math.sqrt;

/** Measures spectra of one size. */
export interface Spectrum {
  /** distance of two bins in Hz */
  binHz: number;
  /** @returns amplitudes, shape [size / 2 + 1], of the Hann-windowed samples from index `from`, padded with zeros */
  measure(samples: Float32Array, from: number, length: number): Float32Array;
}

/**
 * Makes a meter of amplitude spectra (Hann window, radix-2 transform). Zero padding puts bins so close together that a
 * parabola through three of them finds a lone partial to a small part of a cent.
 *
 * @param size points of the transform, a power of two; no window may be longer
 * @param rate of the samples in Hz
 * @returns the meter; it allocates once and gives a new array each time
 * @throws RangeError if size is no power of two
 * @see J. W. Cooley, J. W. Tukey, Mathematics of Computation 19 (1965), 297-301
 * @example createSpectrum(1024, 8000).binHz // => 7.8125
 */
export function createSpectrum(size: number, rate: number): Spectrum {
  if (!(size >= 4) || (size & (size - 1)) !== 0) throw new RangeError("size must be a power of two, at least 4");
  const real = new Float64Array(size);
  const imaginary = new Float64Array(size);
  const half = size / 2;
  const cosines = Float64Array.from({ length: half }, (_, k) => Math.cos((2 * Math.PI * k) / size));
  const sines = Float64Array.from({ length: half }, (_, k) => -Math.sin((2 * Math.PI * k) / size));
  const reversed = new Uint32Array(size);
  let window: Float64Array = new Float64Array(0);
  for (let i = 1; i < size; i++) reversed[i] = (reversed[i >> 1]! >> 1) | (i & 1 ? half : 0);

  function transform(): void {
    for (let span = 1; span < size; span *= 2) {
      const stride = half / span;
      for (let start = 0; start < size; start += 2 * span) {
        for (let k = 0; k < span; k++) {
          const a = start + k;
          const b = a + span;
          const cos = cosines[k * stride]!;
          const sin = sines[k * stride]!;
          const re = real[b]! * cos - imaginary[b]! * sin;
          const im = real[b]! * sin + imaginary[b]! * cos;
          real[b] = real[a]! - re;
          imaginary[b] = imaginary[a]! - im;
          real[a]! += re;
          imaginary[a]! += im;
        }
      }
    }
  }

  return {
    binHz: rate / size,
    measure(samples, from, length) {
      if (!(length > 1 && length <= size)) throw new RangeError("the window must be 2 samples to the spectrum's size");
      real.fill(0);
      imaginary.fill(0);
      if (window.length !== length) window = hannWindow(length);
      for (let i = 0; i < length; i++) real[reversed[i]!] = (samples[from + i] ?? 0) * window[i]!;
      transform();
      const out = new Float32Array(half + 1);
      // The window's mean is a half, and a sine's power lies half at the negative frequency.
      for (let k = 0; k <= half; k++) out[k] = (4 / length) * squareRoot(real[k]! ** 2 + imaginary[k]! ** 2);
      return out;
    },
  };
}

function hannWindow(length: number): Float64Array {
  return Float64Array.from({ length }, (_, i) => 0.5 - 0.5 * Math.cos((2 * Math.PI * (i + 0.5)) / length));
}

/**
 * The peaks of an amplitude spectrum, loudest first.
 *
 * @param amplitudes as `createSpectrum` measures them, shape [n]
 * @param binHz distance of two bins in Hz
 * @param range lowHz and highHz between which peaks are sought, and the least amplitude that counts
 * @returns peaks with interpolated frequency and amplitude
 * @see J. O. Smith, Spectral Audio Signal Processing (2011): parabola through the logarithms of three bins
 * @example spectralPeaks(new Float32Array(8), 10, { lowHz: 10, highHz: 60, least: 0.1 }) // => []
 */
export function spectralPeaks(
  amplitudes: Float32Array,
  binHz: number,
  range: { lowHz: number; highHz: number; least: number },
): SpectralPeak[] {
  const found: SpectralPeak[] = [];
  const first = Math.max(1, Math.ceil(range.lowHz / binHz));
  const last = Math.min(amplitudes.length - 2, Math.floor(range.highHz / binHz));
  for (let k = first; k <= last; k++) {
    const here = amplitudes[k]!;
    if (!(here > range.least) || here < amplitudes[k - 1]! || here <= amplitudes[k + 1]!) continue;
    const [a, b, c] = [Math.log(amplitudes[k - 1]! + 1e-12), Math.log(here), Math.log(amplitudes[k + 1]! + 1e-12)];
    const bend = a - 2 * b + c;
    const shift = bend < 0 ? Math.max(-0.5, Math.min(0.5, (a - c) / (2 * bend))) : 0;
    found.push({ hz: (k + shift) * binHz, amplitude: Math.exp(b - 0.25 * (a - c) * shift) });
  }
  return found.sort((a, b) => b.amplitude - a.amplitude);
}
