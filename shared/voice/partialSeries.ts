import type { SpectralPeak } from "../signal/spectrum";

/** The partials of one string, found among the peaks of a spectrum. */
export interface PartialSeries {
  /** frequency of the first partial in Hz, as the fitted series has it: the pitch that a string is tuned by */
  hz: number;
  /** B in f_n = n f0 sqrt(1 + B n^2), 0 where it does not show */
  inharmonicity: number;
  /** how well the series explains the peaks, 0 to 1 */
  fit: number;
  /** weighted deviation of the partials from the series in cents */
  spreadCents: number;
  /** how many partials were found */
  partials: number;
}

interface Partial {
  n: number;
  hz: number;
  amplitude: number;
  /** relative to the loudest, on a scale of dB: 1 the loudest, 0 what is 50 dB below */
  strength: number;
}

const LOWEST_HZ = 38;
const HIGHEST_HZ = 1150;
const MOST_PARTIALS = 12;
/** Partials of which a sound made by a string has most. */
const EXPECTED = 7;
const RANGE_DB = 50;
const MOST_B = 4e-3;
/** What a candidate is worth more on which the tracker agrees. */
const TRACKER_VOTE = 0.12;
const LEAST_FIT = 0.42;

/**
 * Finds the string that sounds: the series of stretched partials that explains the peaks best and lacks least.
 *
 * The stiffness of a string stretches its partials, so a period of the whole sound lies above the first partial. Here
 * f0 and B are fitted to all partials found, with less weight for those that lie off (another string beside, hum), and
 * the first partial of that fit is given, also where a small microphone does not hear it.
 *
 * @param peaks of the spectrum, loudest first
 * @param trackedHz what the tracker of voices takes the pitch to be, null where it hears none; only a vote
 * @param topHz up to which the spectrum is heard
 * @returns the series, or null where no string explains the sound
 * @see H. Fletcher, E. D. Blackham, R. Stratton, "Quality of piano tones", JASA 34 (1962): f_n = n f0 sqrt(1 + B n^2)
 * @example findPartialSeries([], null, 2300) // => null
 */
export function findPartialSeries(
  peaks: readonly SpectralPeak[],
  trackedHz: number | null,
  topHz: number,
): PartialSeries | null {
  const loudest = peaks[0]?.amplitude ?? 0;
  if (!(loudest > 0)) return null;
  const strong = peaks
    .map((peak) => ({ ...peak, strength: 1 + (20 * Math.log10(peak.amplitude / loudest)) / RANGE_DB }))
    .filter(({ strength }) => strength > 0)
    .slice(0, 30);
  let best: { partials: Partial[]; worth: number; fit: number } | null = null;
  for (const { hz } of strong.slice(0, 8)) {
    for (let n = 1; n <= 8; n++) {
      const candidate = hz / n;
      if (candidate < LOWEST_HZ || candidate > HIGHEST_HZ) continue;
      const partials = match(strong, candidate, topHz);
      const fit = worthOf(partials, strong, candidate, topHz);
      const agrees = trackedHz !== null && Math.abs(1200 * Math.log2(candidate / trackedHz)) < 70;
      const worth = fit + (agrees ? TRACKER_VOTE : 0);
      if (!best || worth > best.worth) best = { partials, worth, fit };
    }
  }
  if (!best || best.fit < LEAST_FIT || best.partials.length === 0) return null;
  return { ...fitSeries(best.partials), fit: Math.min(1, best.fit), partials: best.partials.length };
}

/** The strongest peak near each multiple; how far partials are stretched is learned from those below. */
function match(peaks: readonly (SpectralPeak & { strength: number })[], hz: number, topHz: number): Partial[] {
  const found: Partial[] = [];
  let unit = hz;
  for (let n = 1; n <= MOST_PARTIALS && n * unit < topHz; n++) {
    const stretch = found.length < 2 ? 0.004 * n : 0.012;
    let best: Partial | null = null;
    for (const { hz: at, amplitude, strength } of peaks) {
      const off = at / (n * unit) - 1;
      if (off < -0.012 || off > 0.012 + stretch) continue;
      if (!best || strength > best.strength) best = { n, hz: at, amplitude, strength };
    }
    if (!best) continue;
    found.push(best);
    unit = best.hz / n;
  }
  return found;
}

/** What is explained of all that sounds, and how much of the series is there. */
function worthOf(
  partials: readonly Partial[],
  peaks: readonly { hz: number; strength: number }[],
  hz: number,
  topHz: number,
): number {
  const reach = Math.min(topHz, (MOST_PARTIALS + 0.5) * hz);
  let all = 0;
  for (const peak of peaks) if (peak.hz < reach) all += peak.strength;
  let explained = 0;
  for (const { strength } of partials) explained += strength;
  let expected = 0;
  let present = 0;
  for (let n = 1; n <= EXPECTED && n * hz < topHz; n++) {
    const weight = 1 / Math.sqrt(n);
    expected += weight;
    const partial = partials.find((each) => each.n === n);
    if (partial) present += weight * Math.min(1, 1.6 * partial.strength);
  }
  if (all === 0 || expected === 0) return 0;
  return (explained / all) * (0.35 + 0.65 * (present / expected));
}

/** Least squares on f_n^2 / n^2 = f0^2 + (f0^2 B) n^2, again and again with less weight for what lies off. */
function fitSeries(partials: readonly Partial[]): Pick<PartialSeries, "hz" | "inharmonicity" | "spreadCents"> {
  const robust = partials.map(() => 1);
  const loudest = Math.max(...partials.map(({ amplitude }) => amplitude));
  const weights = partials.map(({ n, amplitude }) => n * n * Math.min(1, (4 * amplitude) / loudest) ** 2);
  let square = 0;
  let slope = 0;
  let spread = 0;
  for (let round = 0; round < 6; round++) {
    let [w, x, y, xx, xy] = [0, 0, 0, 0, 0];
    partials.forEach(({ n, hz }, k) => {
      const weight = weights[k]! * robust[k]!;
      const value = (hz / n) ** 2;
      w += weight;
      x += weight * n * n;
      y += weight * value;
      xx += weight * n ** 4;
      xy += weight * n * n * value;
    });
    const spreadX = xx - (x * x) / w;
    slope = spreadX > 1e-9 * xx ? (xy - (x * y) / w) / spreadX : 0;
    slope = Math.max(0, Math.min(slope, (MOST_B * y) / w));
    square = (y - slope * x) / w;
    let total = 0;
    let off = 0;
    partials.forEach(({ n, hz }, k) => {
      const cents = 1200 * Math.log2(hz / (n * Math.sqrt(square + slope * n * n)));
      off += weights[k]! * robust[k]! * cents * cents;
      total += weights[k]! * robust[k]!;
      robust[k] = 1 / (1 + (cents / 1.2) ** 2);
    });
    spread = Math.sqrt(off / total);
  }
  return { hz: Math.sqrt(square + slope), inharmonicity: slope / square, spreadCents: spread };
}
