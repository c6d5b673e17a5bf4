/** Taken out once: inside a test runner every use of a global is slow. */
const { cos, imul, log, PI, sqrt } = Math;

/** Seeded random numbers (mulberry32), so that every clip can be made again. */
export interface Random {
  /** uniform in [0, 1) */
  next(): number;
  /** uniform in [low, high) */
  between(low: number, high: number): number;
  /** standard normal */
  normal(): number;
}

export function createRandom(seed: number): Random {
  let state = seed >>> 0;
  const next = (): number => {
    state = (state + 0x6d2b79f5) >>> 0;
    let t = state;
    t = imul(t ^ (t >>> 15), t | 1);
    t ^= t + imul(t ^ (t >>> 7), t | 61);
    return ((t ^ (t >>> 14)) >>> 0) / 4294967296;
  };
  return {
    next,
    between: (low, high) => low + (high - low) * next(),
    normal: () => sqrt(-2 * log(1 - next())) * cos(2 * PI * next()),
  };
}
