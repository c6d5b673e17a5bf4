/** Samples over which the rise of energy is judged: half a millisecond at 48 kHz. */
const hopS = 0.0005;
/** The time before, longer than a period of the lowest bass string, and the time after that are held against each other. */
const backSteps = 28;
const aheadSteps = 4;
/** Strings of one stroke are one onset. */
const quietSteps = 60;
/** Powers of ten that the energy rises by at an onset, over all and at once. */
const rise = 0.45;
const riseAtOnce = 0.2;

/**
 * When something is struck in a recording: moments at which the energy of its upper partials rises at once, found
 * without knowing when to expect them.
 */
export function findOnsets(pcm: Float32Array, sampleRate: number): number[] {
  const hop = Math.round(hopS * sampleRate);
  const energy: number[] = [];
  for (let from = 2; from + hop <= pcm.length; from += hop) {
    let sum = 0;
    for (let i = from; i < from + hop; i += 1) {
      const bend = pcm[i]! - 2 * pcm[i - 1]! + pcm[i - 2]!;
      sum += bend * bend;
    }
    energy.push(Math.log10(sum / hop + 1e-9));
  }
  const onsets: number[] = [];
  for (let k = 1; k + aheadSteps < energy.length; k += 1) {
    const before = Math.max(...energy.slice(Math.max(0, k - backSteps), k));
    const after = Math.max(...energy.slice(k, k + aheadSteps));
    const rises = after - before > rise;
    const since = k - Math.round((onsets.at(-1) ?? -1) / hopS);
    if (rises && energy[k]! - before > riseAtOnce && since > quietSteps) onsets.push(k * hopS);
  }
  return onsets;
}
