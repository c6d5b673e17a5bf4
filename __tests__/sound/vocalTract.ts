/** Taken out once: inside a test runner every use of a global is slow. */
const { cos, exp, max, min, PI } = Math;

export type Vowel = "a" | "e" | "i" | "o" | "u";

/** Five formants of an adult man's vowels, in Hz, rounded from common tables of sung vowels (common practice). */
const FORMANTS: Record<Vowel, number[]> = {
  a: [650, 1080, 2650, 2900, 3250],
  e: [400, 1700, 2600, 3200, 3580],
  i: [290, 1870, 2800, 3250, 3540],
  o: [400, 800, 2600, 2800, 3000],
  u: [350, 600, 2700, 2900, 3300],
};
const BANDWIDTHS = [80, 90, 120, 130, 140];

/** Five resonators in a row that move smoothly from vowel to vowel. */
export interface VocalTract {
  /** @param glide share of the way to go this time, 0 to 1 @param hz pitch: the first formant is opened up to it, as singers do */
  setVowel(vowel: Vowel, glide: number, hz: number): void;
  next(x: number): number;
}

export function createVocalTract(rate: number, scale: number): VocalTract {
  const now = FORMANTS.a.map((f) => f * scale);
  const a = new Float64Array(5);
  const b = new Float64Array(5);
  const c = new Float64Array(5);
  const y1 = new Float64Array(5);
  const y2 = new Float64Array(5);
  return {
    setVowel(vowel, glide, hz) {
      for (let k = 0; k < 5; k++) {
        const wanted = FORMANTS[vowel][k]! * scale;
        const goal = k === 0 ? max(wanted, hz * 1.02) : wanted;
        now[k]! += (goal - now[k]!) * glide;
        const r = exp((-PI * BANDWIDTHS[k]! * scale) / rate);
        c[k] = -r * r;
        b[k] = 2 * r * cos((2 * PI * min(now[k]!, 0.45 * rate)) / rate);
        a[k] = 1 - b[k]! - c[k]!;
      }
    },
    next(x) {
      let y = x;
      for (let k = 0; k < 5; k++) {
        y = a[k]! * y + b[k]! * y1[k]! + c[k]! * y2[k]!;
        y2[k] = y1[k]!;
        y1[k] = y;
      }
      return y;
    },
  };
}
