/**
 * Makes a streaming second-order high-pass filter (Butterworth, bilinear transform).
 *
 * @param hz corner frequency (-3 dB) in Hz, 0 < hz < rate / 2
 * @param rate sample rate in Hz
 * @returns filter(pcm): the next piece filtered, a new array of the same length; the state carries over
 * @throws RangeError if the corner is not below half the rate
 * @see A. V. Oppenheim, R. W. Schafer, Discrete-Time Signal Processing (bilinear transformation)
 * @example createHighPass(45, 8000)(Float32Array.of(0, 0)).length // => 2
 */
export function createHighPass(hz: number, rate: number): (pcm: Float32Array) => Float32Array {
  if (!(hz > 0 && hz < rate / 2)) throw new RangeError("the corner must lie between 0 and half the rate");
  const w = Math.tan((Math.PI * hz) / rate);
  const norm = 1 / (1 + Math.SQRT2 * w + w * w);
  const b1 = 2 * (w * w - 1) * norm;
  const b2 = (1 - Math.SQRT2 * w + w * w) * norm;
  let x1 = 0;
  let x2 = 0;
  let y1 = 0;
  let y2 = 0;
  return (pcm) =>
    pcm.map((x) => {
      const y = norm * (x - 2 * x1 + x2) - b1 * y1 - b2 * y2;
      x2 = x1;
      x1 = x;
      y2 = y1;
      y1 = y < 1e-15 && y > -1e-15 ? 0 : y;
      return y;
    });
}
