import { ANALYSIS_RATE, createResampler } from "../signal/resampler";
import { createSpectrum, spectralPeaks, type SpectralPeak } from "../signal/spectrum";
import { createLiveTracker } from "./liveTracker";
import { findPartialSeries, type PartialSeries } from "./partialSeries";

/** What a plucked string is heard to be. */
export interface StringReading {
  /** seconds since the first sample pushed */
  t: number;
  /** seconds since the string was plucked */
  sincePluckS: number;
  /** frequency of the first partial in Hz */
  hz: number;
  /** B in f_n = n f0 sqrt(1 + B n^2) */
  inharmonicity: number;
  /** how well one string explains the sound, 0 to 1 */
  fit: number;
  /** counts the plucks, from 1 */
  pluck: number;
}

/** A reader that is fed while somebody tunes. */
export interface StringReader {
  push(pcm: Float32Array): StringReading[];
  /** how loud it is now, dBFS of an RMS over 20 ms (a full-scale sine is 0), and what the room alone has */
  level(): { nowDb: number; roomDb: number };
}

const HOP = 160;
const LONGEST = 0.5 * ANALYSIS_RATE;
const SHORTEST = 0.15 * ANALYSIS_RATE;
/** The first moments are the finger's or the pick's. */
const ATTACK = 0.025 * ANALYSIS_RATE;
const SIZE = 8192;
const TOP_HZ = 2300;
const LOWEST_PEAK_HZ = 36;
/** A pluck is at least so much louder than what was there just before, in dB, */
const RISE_DB = 5;
/** and so much louder than the room. */
const ABOVE_ROOM_DB = 8;
const STILL_ABOVE_DB = 1.5;
const SILENCE_DB = -75;
const ROOM_MEMORY = 250;
/** Peaks below this many times the middle amplitude of the spectrum may be noise. */
const OVER_NOISE = 5;
/** Readings in a row that must agree, and within how many cents, before one is told. */
const AGREEING = 3;
const AGREE_CENTS = 6;
const TRACKER_BEHIND_S = 0.17;
const LONGEST_RING_S = 9;
/** No peg turns a ringing string so far at once: what is heard then is something else. */
const FARTHEST_JUMP_CENTS = 120;
/** What was there before the pluck counts only where it has become so much stronger, in power. */
const GROWN = 2;

/**
 * Makes a reader of plucked strings, fed piece by piece: each 20 ms from about 0.2 s after a pluck it tells the pitch,
 * measured in at most the last half second, without the attack.
 *
 * The pitch is the first partial, f1 = f0 sqrt(1 + B), of the series fitted to all partials that are heard: what the ear
 * takes a string's pitch to be, whatever its stiffness does to the higher ones. What sounded just before the pluck (hum, a
 * neighbouring string) is taken out of the spectrum first. The live tracker of voices has a vote in which octave it is.
 *
 * @param sampleRate in Hz, 8000 to 192000
 * @returns push(pcm): mono samples in [-1, 1], any length; gives the readings they bring, in order
 * @throws RangeError if the rate is outside 8-192 kHz
 * @see H. Fletcher, E. D. Blackham, R. Stratton, JASA 34 (1962) (partials of stiff strings)
 */
export function createStringReader(sampleRate: number): StringReader {
  const resampler = createResampler(sampleRate);
  const tracker = createLiveTracker(ANALYSIS_RATE);
  const spectrum = createSpectrum(SIZE, ANALYSIS_RATE);
  const quiet = new Float32Array(SIZE / 2 + 1);
  let kept: Float32Array = new Float32Array(0);
  /** index of kept[0] among all samples, and of the first one not yet looked at */
  let keptFrom = 0;
  let next = HOP;
  let levels: number[] = [];
  let pluckedAt = -1;
  let plucks = 0;
  let before: Float32Array = quiet;
  let recent: PartialSeries[] = [];
  let told: number | null = null;
  let tracked: { t: number; hz: number }[] = [];

  const levelNow = () => levels[levels.length - 1] ?? -120;
  const roomDb = () => {
    const sorted = [...levels].sort((a, b) => a - b);
    return Math.max(SILENCE_DB - 10, sorted[Math.floor(0.1 * sorted.length)] ?? -120);
  };

  function hearPluck(at: number): void {
    const now = levelNow();
    const earlier = Math.max(levels[levels.length - 3] ?? -120, levels[levels.length - 4] ?? -120);
    const fresh = pluckedAt >= 0 && at - pluckedAt < 0.12 * ANALYSIS_RATE;
    if (levels.length < 5 || fresh || now < SILENCE_DB || now < earlier + RISE_DB || now < roomDb() + ABOVE_ROOM_DB)
      return;
    const onset = at - 2 * HOP;
    const length = Math.min(LONGEST / 2, onset - HOP - keptFrom);
    before = length >= SHORTEST ? spectrum.measure(kept, onset - HOP - length - keptFrom, length) : quiet;
    pluckedAt = onset;
    plucks++;
    recent = [];
    told = null;
  }

  function read(at: number): StringReading | null {
    if (pluckedAt < 0 || at - pluckedAt > LONGEST_RING_S * ANALYSIS_RATE) return null;
    if (levelNow() < Math.max(SILENCE_DB, roomDb() + STILL_ABOVE_DB)) return null;
    const from = Math.max(pluckedAt + ATTACK, at - LONGEST, keptFrom);
    if (at - from < SHORTEST) return null;
    const series = findPartialSeries(peaksOf(from, at - from), trackedHz(from, at), TOP_HZ);
    if (!series) {
      recent = [];
      return null;
    }
    const last = recent[recent.length - 1];
    if (last && Math.abs(1200 * Math.log2(series.hz / last.hz)) > AGREE_CENTS) recent = [];
    recent = [...recent, series].slice(-AGREEING);
    if (recent.length < AGREEING) return null;
    const { hz, inharmonicity, fit } = series;
    if (told !== null && Math.abs(1200 * Math.log2(hz / told)) > FARTHEST_JUMP_CENTS) return null;
    told = hz;
    const t = at / ANALYSIS_RATE;
    return { t, sincePluckS: (at - pluckedAt) / ANALYSIS_RATE, hz, inharmonicity, fit, pluck: plucks };
  }

  function peaksOf(from: number, length: number): SpectralPeak[] {
    const amplitudes = spectrum.measure(kept, from - keptFrom, length);
    const top = Math.floor(TOP_HZ / spectrum.binHz);
    const noise = amplitudes.slice(Math.floor(LOWEST_PEAK_HZ / spectrum.binHz), top).sort();
    const least = OVER_NOISE * (noise[Math.floor(0.4 * noise.length)] ?? 0) + 1e-6;
    const peaks = spectralPeaks(amplitudes, spectrum.binHz, { lowHz: LOWEST_PEAK_HZ, highHz: TOP_HZ, least });
    return peaks
      .flatMap(({ hz, amplitude }) => {
        const bin = Math.round(hz / spectrum.binHz);
        const there = Math.max(...before.subarray(bin - 1, bin + 2)) ** 2;
        const power = amplitude * amplitude;
        return power > GROWN * there ? [{ hz, amplitude: Math.sqrt(power - there) }] : [];
      })
      .filter((peak, _, all) => !isSkirt(peak, all, (4 * ANALYSIS_RATE) / length))
      .sort((a, b) => b.amplitude - a.amplitude);
  }

  /** Only what the tracker has decided by then counts, however much sound came at once. */
  function trackedHz(from: number, at: number): number | null {
    const until = at / ANALYSIS_RATE - TRACKER_BEHIND_S;
    const heard = tracked.filter(({ t }) => t > from / ANALYSIS_RATE && t < until).map(({ hz }) => hz);
    heard.sort((a, b) => a - b);
    return heard.length < 5 ? null : heard[heard.length >> 1]!;
  }

  return {
    level: () => ({ nowDb: levelNow(), roomDb: roomDb() }),
    push(pcm) {
      const more = resampler.push(pcm);
      const joined = new Float32Array(kept.length + more.length);
      joined.set(kept);
      joined.set(more, kept.length);
      kept = joined;
      for (const { t, hz } of tracker.push(more)) if (hz !== null) tracked.push({ t, hz });
      const end = keptFrom + kept.length;
      const out: StringReading[] = [];
      for (; next <= end; next += HOP) {
        levels.push(levelDb(kept, next - HOP - keptFrom));
        if (levels.length > ROOM_MEMORY) levels = levels.slice(-ROOM_MEMORY);
        hearPluck(next);
        const reading = read(next);
        if (reading) out.push(reading);
      }
      const oldest = Math.max(keptFrom, Math.min(next, end) - 2 * LONGEST);
      kept = kept.slice(oldest - keptFrom);
      keptFrom = oldest;
      tracked = tracked.filter(({ t }) => t > oldest / ANALYSIS_RATE);
      return out;
    },
  };
}

/** A small peak on the flank of a great one is the window's, not a partial. */
function isSkirt(peak: SpectralPeak, all: readonly SpectralPeak[], withinHz: number): boolean {
  return all.some(({ hz, amplitude }) => Math.abs(hz - peak.hz) < withinHz && amplitude > 12 * peak.amplitude);
}

function levelDb(samples: Float32Array, from: number): number {
  let power = 0;
  for (let i = 0; i < HOP; i++) power += (samples[from + i] ?? 0) ** 2;
  return 10 * Math.log10((2 * power) / HOP + 1e-12);
}
