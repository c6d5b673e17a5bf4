/** Above this share of samples at the ceiling a recording was cut off, and not only once. */
const cutOffShare = 0.05;
/** What the ceiling is read from: so many samples lie above it at most. */
const above = 0.05;
/** A codec and a change of rate make the flat top ripple by a seventh. */
const ripple = 0.85;
const shoulder = 0.6;
/** A round top, as of a pure tone, spends at most 1.5 times as long near its height as on the shoulder below. */
const flatAgainstShoulder = 1.8;

const bins = 2000;
const highest = 2;

/**
 * A recording that was cut off at the microphone's ceiling loses its flat tops when it is coded or its rate is changed:
 * they ripple, and nobody can tell any more. This makes them flat again, so that the engine can. A recording whose tops
 * are round comes back as it is.
 *
 * @param pcm mono samples, shape [n]; changed in place where its tops were flat
 */
export function restoreFlatTops(pcm: Float32Array<ArrayBuffer>): Float32Array<ArrayBuffer> {
  const counts = new Uint32Array(bins + 1);
  const binOf = (level: number) => Math.min(bins, Math.floor((level * bins) / highest));
  for (const sample of pcm) {
    const bin = binOf(Math.abs(sample));
    counts[bin] = (counts[bin] ?? 0) + 1;
  }
  let ceiling = bins;
  for (let seen = 0; ceiling > 0; ceiling -= 1) {
    seen += counts[ceiling] ?? 0;
    if (seen > above * pcm.length) break;
  }
  const sum = (from: number, to: number) =>
    counts.subarray(Math.floor(from), Math.floor(to)).reduce((a, b) => a + b, 0);
  const top = sum(ripple * ceiling, bins + 1);
  const below = sum(shoulder * ceiling, ripple * ceiling);
  if (top <= cutOffShare * pcm.length || top < flatAgainstShoulder * below) return pcm;
  const limit = (ripple * ceiling * highest) / bins;
  for (let k = 0; k < pcm.length; k += 1) pcm[k] = Math.max(-limit, Math.min(limit, pcm[k] ?? 0));
  return pcm;
}
