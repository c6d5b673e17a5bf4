/**
 * RMS level of a stretch of mono audio.
 *
 * @param pcm samples in [-1, 1], shape [n], n >= 1; not modified
 * @param from first sample, default 0
 * @param to one past the last sample, default n
 * @returns level in dBFS, where a full-scale sine is 0 dBFS; -Infinity for silence
 * @throws RangeError if the stretch is empty
 * @see AES17-2015, full-scale level
 * @example levelDbfs(Float32Array.of(0, 0)) // => -Infinity
 */
export function levelDbfs(pcm: Float32Array, from = 0, to = pcm.length): number {
  if (!(to > from) || from < 0 || to > pcm.length) throw new RangeError("the stretch must hold at least one sample");
  let sum = 0;
  for (let i = from; i < to; i++) sum += pcm[i]! * pcm[i]!;
  return 10 * Math.log10((2 * sum) / (to - from));
}

/**
 * Share of samples that stand at a flat ceiling, as a microphone driven too hard leaves them.
 * Counts samples in runs of three or more at the same extreme value close to the loudest sample.
 *
 * @param pcm samples, shape [n]; not modified
 * @returns 0 to 1; 0 for an empty or silent stretch
 * @example clippedShare(Float32Array.of(0, 1, 1, 1)) // => 0.75
 */
export function clippedShare(pcm: Float32Array): number {
  let top = 0;
  let bottom = 0;
  for (let i = 0; i < pcm.length; i++) {
    const x = pcm[i]!;
    if (x > top) top = x;
    else if (x < bottom) bottom = x;
  }
  if (top === bottom) return 0;
  const ceiling = (top > -bottom ? top : -bottom) * 0.995;
  let clipped = 0;
  let run = 0;
  for (let i = 0; i < pcm.length; i++) {
    const x = pcm[i]!;
    if (x >= ceiling || x <= -ceiling) run++;
    else if (run > 0) {
      if (run >= 3) clipped += run;
      run = 0;
    }
  }
  if (run >= 3) clipped += run;
  return clipped / pcm.length;
}
