/** Steps of a waveform that is drawn. */
const usualSteps = 400;

/**
 * How loud sound is from beginning to end, for a picture: the greatest swing in each of so many steps of equal length.
 *
 * @param pcm samples, -1 to 1; shape [n]
 * @param steps most steps; fewer where there are fewer samples
 * @returns swings from 0 to 1 in thousandths; shape [min(n, steps)]
 * @example waveform(new Float32Array([0.1, -0.25, 0.5]), 2) // => [0.1, 0.5]
 */
export function waveform(pcm: Float32Array, steps: number = usualSteps): number[] {
  const count = Math.min(steps, pcm.length);
  return Array.from({ length: count }, (_, step) => {
    const end = Math.floor(((step + 1) * pcm.length) / count);
    let most = 0;
    for (let k = Math.floor((step * pcm.length) / count); k < end; k++) most = Math.max(most, Math.abs(pcm[k]!));
    return Math.round(Math.min(1, most) * 1000) / 1000;
  });
}
