import type { Mode } from "../music/keyName";

/** How well each pitch class fits a key, index 0 = tonic, ascending by semitones. */
export interface KeyProfile {
  name: string;
  major: readonly number[];
  minor: readonly number[];
}

/** A key with its correlation. */
export interface ProfileMatch {
  /** pitch class of the tonic, 0 (C) to 11 (B) */
  tonic: number;
  mode: Extract<Mode, "major" | "minor">;
  /** Pearson correlation, -1 to 1 */
  r: number;
}

/**
 * Krumhansl and Kessler's probe-tone ratings.
 *
 * @see C. L. Krumhansl and E. J. Kessler, Psychological Review 89 (1982), 334-368
 */
export const krumhanslKessler: KeyProfile = {
  name: "Krumhansl-Kessler 1982",
  major: [6.35, 2.23, 3.48, 2.33, 4.38, 4.09, 2.52, 5.19, 2.39, 3.66, 2.29, 2.88],
  minor: [6.33, 2.68, 3.52, 5.38, 2.6, 3.53, 2.54, 4.75, 3.98, 2.69, 3.34, 3.17],
};

/**
 * Temperley's revision of the ratings.
 *
 * @see D. Temperley, Music Perception 17(1) (1999), 65-100
 */
export const temperley1999: KeyProfile = {
  name: "Temperley 1999",
  major: [5, 2, 3.5, 2, 4.5, 4, 2, 4.5, 2, 3.5, 1.5, 4],
  minor: [5, 2, 3.5, 4.5, 2, 4, 2, 4.5, 3.5, 2, 1.5, 4],
};

/**
 * Counts from the examples of a harmony textbook (Kostka and Payne).
 *
 * @see D. Temperley, Music and Probability (2007), table 6.1
 */
export const temperleyKostkaPayne: KeyProfile = {
  name: "Temperley-Kostka-Payne 2007",
  major: [0.748, 0.06, 0.488, 0.082, 0.67, 0.46, 0.096, 0.715, 0.104, 0.366, 0.057, 0.4],
  minor: [0.712, 0.084, 0.474, 0.618, 0.049, 0.46, 0.105, 0.747, 0.404, 0.067, 0.133, 0.33],
};

/**
 * Counts from a large corpus of common-practice pieces.
 *
 * @see J. Albrecht and D. Shanahan, Music Perception 31(1) (2013), 59-67
 */
export const albrechtShanahan: KeyProfile = {
  name: "Albrecht-Shanahan 2013",
  major: [0.238, 0.006, 0.111, 0.006, 0.137, 0.094, 0.016, 0.214, 0.009, 0.08, 0.008, 0.081],
  minor: [0.22, 0.006, 0.104, 0.123, 0.019, 0.103, 0.012, 0.214, 0.062, 0.022, 0.061, 0.052],
};

/**
 * Counts from folk melodies (the Essen collection).
 *
 * @see B. Aarden, Dynamic Melodic Expectancy, dissertation, Ohio State University (2003)
 */
export const aardenEssen: KeyProfile = {
  name: "Aarden-Essen 2003",
  major: [
    17.7661, 0.145624, 14.9265, 0.160186, 19.8049, 11.3587, 0.291248, 22.062, 0.145624, 8.15494, 0.232998, 4.95122,
  ],
  minor: [
    18.2648, 0.737619, 14.0499, 16.8599, 0.702494, 14.4362, 0.702494, 18.6161, 4.56621, 1.93186, 7.37619, 1.75623,
  ],
};

/**
 * Counts from chords in common-practice music.
 *
 * @see H. Bellman, About the Determination of the Key of a Musical Excerpt (2005), after H. Budge (1943)
 */
export const bellmanBudge: KeyProfile = {
  name: "Bellman-Budge 2005",
  major: [16.8, 0.86, 12.95, 1.41, 13.49, 11.93, 1.25, 20.28, 1.8, 8.04, 0.62, 10.57],
  minor: [18.16, 0.69, 12.99, 13.34, 1.07, 11.15, 1.38, 21.07, 7.49, 1.53, 0.92, 10.21],
};

/**
 * Compares how long each pitch class sounds with a profile moved to every key.
 *
 * @param weights time (or any weight) of each pitch class, 12 values from C to B, none negative
 * @param profile one of the published profiles
 * @returns all 24 keys, best first; r is 0 throughout where the weights are all alike
 * @throws RangeError unless there are 12 finite weights
 * @see C. L. Krumhansl, Cognitive Foundations of Musical Pitch (1990), the Krumhansl-Schmuckler algorithm
 */
export function correlateProfiles(weights: readonly number[], profile: KeyProfile): ProfileMatch[] {
  if (weights.length !== 12 || !weights.every(Number.isFinite)) throw new RangeError("12 finite weights are needed");
  const matches: ProfileMatch[] = [];
  for (let tonic = 0; tonic < 12; tonic += 1) {
    const turned = weights.map((_, degree) => weights[(tonic + degree) % 12]!);
    for (const mode of ["major", "minor"] as const) matches.push({ tonic, mode, r: pearson(turned, profile[mode]) });
  }
  return matches.sort((a, b) => b.r - a.r);
}

function pearson(x: readonly number[], y: readonly number[]): number {
  const meanX = x.reduce((sum, value) => sum + value, 0) / x.length;
  const meanY = y.reduce((sum, value) => sum + value, 0) / y.length;
  let xy = 0;
  let xx = 0;
  let yy = 0;
  for (let index = 0; index < x.length; index += 1) {
    const dx = x[index]! - meanX;
    const dy = y[index]! - meanY;
    xy += dx * dy;
    xx += dx * dx;
    yy += dy * dy;
  }
  return xx > 0 && yy > 0 ? xy / Math.sqrt(xx * yy) : 0;
}
