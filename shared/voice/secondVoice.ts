import { createLagMeter, HOP, MAX_LAG, WINDOW } from "../signal/lagFrame";
import { ANALYSIS_RATE } from "../signal/resampler";
import type { TrackFrame } from "./trackFrame";

/** What is left of a frame when everything that repeats at its pitch is taken out. */
interface Remainder {
  /** power left, against twice the power there was, in dB: 0 where nothing repeated */
  leftDb: number;
  /** how well it repeats at a period of its own, 0 to 1 */
  clarity: number;
  /** how well it repeats at the pitch that was taken out, -1 to 1 */
  atPitch: number;
}

/** Bounds of another voice's pitch in Hz. */
const LOWEST_HZ = 70;
const HIGHEST_HZ = 1000;
/** Nearer to a multiple or a part of the period that was taken out, a period is no other voice's. */
const SAME_SEMITONES = 0.6;
const lastLag = MAX_LAG;
/** Frames this much under the loud ones are echoes and breath, in dB. */
const LOUD_WITHIN_DB = 12;
/** A frame this clear holds one voice, and needs no second look. */
const ALONE = 0.95;
/** Every third frame is looked at, and speaks for three. */
const STRIDE = 3;
/** What another voice leaves at least (one voice alone, moving, about -15 dB), how well that repeats, and how much better than at the first one's pitch. */
const LEFT_DB = -10;
const REPEATS = 0.6;
const BY_ITSELF = 0.3;

/**
 * Marks the frames in which a second voice sounds beside the decided pitch as `mixed`.
 *
 * @param frames the track, one frame per 10 ms; not modified
 * @param sound the take at 8 kHz
 * @returns the frames, those with a second voice mixed
 */
export function markSecondVoices(frames: readonly TrackFrame[], sound: Float32Array): TrackFrame[] {
  const levels = frames.map((f) => f.levelDb).sort((a, b) => a - b);
  const loudFrom = (levels[Math.floor(levels.length * 0.95)] ?? 0) - LOUD_WITHIN_DB;
  const look = createRemainderMeter();
  const others = frames.map(({ hz, levelDb, clarity }, k) => {
    if (k % STRIDE !== 0 || hz === null || levelDb <= loudFrom || clarity > ALONE) return false;
    const { leftDb, clarity: repeats, atPitch } = look(sound, k, hz);
    return leftDb > LEFT_DB && repeats > REPEATS && repeats - atPitch > BY_ITSELF;
  });
  return frames.map((f, k) => (others[k - (k % STRIDE)] && f.hz !== null ? { ...f, mixed: true } : f));
}

/**
 * Makes a function that takes one pitch out of a frame and looks for another in what is left. One voice alone leaves
 * little, and that repeats as the voice did; another voice at another pitch is left whole.
 *
 * @returns look(sound at 8 kHz, frame number of 10 ms, pitch in Hz)
 * @see A. de Cheveigné, J. Acoust. Soc. Am. 93(6) 1993 (a voice cancelled by subtracting the sound one period before)
 */
function createRemainderMeter(): (sound: Float32Array, frame: number, hz: number) => Remainder {
  const measure = createLagMeter();
  const left = new Float32Array(WINDOW);
  return (sound, frame, hz) => {
    const period = ANALYSIS_RATE / hz;
    const from = frame * HOP - WINDOW / 2;
    let power = 0;
    let rest = 0;
    for (let i = 0; i < WINDOW; i++) {
      const now = sound[from + i] ?? 0;
      const then = between(sound, from + i - period);
      left[i] = now - then;
      power += now * now + then * then;
      rest += left[i]! ** 2;
    }
    const { r, m } = measure(left, 0);
    const n = (lag: number): number => (m[lag]! > 0 ? (2 * r[lag]!) / m[lag]! : 0);
    let lag = 1;
    while (lag < lastLag && n(lag) > 0) lag++;
    let clarity = 0;
    for (
      lag = Math.max(lag, Math.floor(ANALYSIS_RATE / HIGHEST_HZ));
      lag < Math.min(lastLag, ANALYSIS_RATE / LOWEST_HZ);
      lag++
    ) {
      if (n(lag) > clarity && n(lag) >= n(lag - 1) && n(lag) >= n(lag + 1) && !isRelated(lag, period)) clarity = n(lag);
    }
    const around = Math.min(lastLag, Math.round(period));
    return {
      leftDb: power > 0 ? 10 * Math.log10(Math.max(1e-6, rest / power)) : -60,
      clarity,
      atPitch: Math.max(n(around), n(around - 1), n(Math.min(lastLag, around + 1))),
    };
  };
}

function isRelated(lag: number, period: number): boolean {
  const ratio = Math.max(lag / period, period / lag);
  return Math.abs(12 * Math.log2(ratio / Math.round(ratio))) < SAME_SEMITONES;
}

/** Cubic interpolation between samples. */
function between(sound: Float32Array, at: number): number {
  const whole = Math.floor(at);
  const t = at - whole;
  const a = sound[whole - 1] ?? 0;
  const b = sound[whole] ?? 0;
  const c = sound[whole + 1] ?? 0;
  const d = sound[whole + 2] ?? 0;
  return b + 0.5 * t * (c - a + t * (2 * a - 5 * b + 4 * c - d + t * (3 * (b - c) + d - a)));
}
