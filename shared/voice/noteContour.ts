/** Half a vibrato cycle of the slowest kind, in frames of 10 ms: a window of 2 x 8 + 1 frames holds one cycle of 6 Hz. */
const HALF_CYCLE = 8;
/** Where the windows stand against the frame; each holds the frame and stays inside the stretch. */
const SHIFTS = [0, -HALF_CYCLE, HALF_CYCLE, -HALF_CYCLE / 2, HALF_CYCLE / 2];

/**
 * Smooths a pitch contour so that vibrato gives way to its centre while steps stay sharp:
 * of five windows of one vibrato cycle (from before the frame to after it) the steadiest gives its mean.
 *
 * @param midi fractional MIDI numbers every 10 ms of one unbroken voiced stretch, shape [n]; not modified
 * @returns the smoothed contour, shape [n]
 * @see M. Kuwahara et al., 1976 (edge-preserving smoothing by the least varying neighbourhood)
 */
export function smoothContour(midi: readonly number[]): number[] {
  const n = midi.length;
  const sums = [0];
  const squares = [0];
  const origin = midi[0] ?? 0;
  for (const m of midi) {
    const d = m - origin;
    sums.push(sums[sums.length - 1]! + d);
    squares.push(squares[squares.length - 1]! + d * d);
  }
  const size = Math.min(n, 2 * HALF_CYCLE + 1);
  return midi.map((_, i) => {
    let best = Infinity;
    let value = midi[i]!;
    for (const shift of SHIFTS) {
      const from = Math.max(0, Math.min(n - size, i + shift - HALF_CYCLE));
      const mean = (sums[from + size]! - sums[from]!) / size;
      const spread = (squares[from + size]! - squares[from]!) / size - mean * mean;
      if (spread < best - 1e-9) {
        best = spread;
        value = origin + mean;
      }
    }
    return value;
  });
}

/**
 * Cuts a smoothed contour into stretches of nearly constant pitch: least squared deviation plus a price per stretch.
 *
 * @param contour smoothed fractional MIDI numbers every 10 ms, shape [n]
 * @returns first frame and one past the last frame of each stretch, in order, covering everything
 */
export function cutContour(contour: readonly number[]): { from: number; to: number }[] {
  const n = contour.length;
  if (n === 0) return [];
  const origin = contour[0]!;
  const sums = new Float64Array(n + 1);
  const squares = new Float64Array(n + 1);
  for (let i = 0; i < n; i++) {
    const d = contour[i]! - origin;
    sums[i + 1] = sums[i]! + d;
    squares[i + 1] = squares[i]! + d * d;
  }
  const cost = new Float64Array(n + 1).fill(Infinity);
  const back = new Int32Array(n + 1);
  cost[0] = 0;
  const longest = 600;
  const price = 1.5;
  for (let to = 1; to <= n; to++) {
    for (let from = Math.max(0, to - longest); from < to; from++) {
      const count = to - from;
      const sum = sums[to]! - sums[from]!;
      const deviation = squares[to]! - squares[from]! - (sum * sum) / count;
      const total = cost[from]! + price + (deviation > 0 ? deviation : 0);
      if (total < cost[to]!) {
        cost[to] = total;
        back[to] = from;
      }
    }
  }
  const out: { from: number; to: number }[] = [];
  for (let to = n; to > 0; to = back[to]!) out.unshift({ from: back[to]!, to });
  return out;
}
