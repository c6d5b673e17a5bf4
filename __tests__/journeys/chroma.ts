import { midiToHz } from "@/shared/music/pitch";

/** Fundamentals of bass and strings; partials above would count for other tones. */
const pitches = { from: 24, to: 71 };

/** Shares of the energy on the twelve pitch classes, C first, of a recording; they add up to 1. */
export function chromaOf(pcm: Float32Array, sampleRate: number): number[] {
  const shares = Array.from({ length: 12 }, () => 0);
  for (let midi = pitches.from; midi <= pitches.to; midi += 1)
    shares[midi % 12]! += energyAt(pcm, (2 * Math.PI * midiToHz(midi)) / sampleRate);
  const sum = shares.reduce((total, share) => total + share, 0);
  return shares.map((share) => (sum > 0 ? share / sum : 0));
}

/** Energy at one frequency, under a window that keeps neighbouring semitones apart. */
function energyAt(pcm: Float32Array, step: number): number {
  const double = 2 * Math.cos(step);
  let [before, last] = [0, 0];
  for (let k = 0; k < pcm.length; k += 1) {
    const window = 0.5 - 0.5 * Math.cos((2 * Math.PI * k) / pcm.length);
    [before, last] = [last, window * pcm[k]! + double * last - before];
  }
  return before * before + last * last - double * before * last;
}
