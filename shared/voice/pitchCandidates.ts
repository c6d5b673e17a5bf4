import { ANALYSIS_RATE } from "../signal/resampler";
import { MAX_LAG, SHORT_WINDOW, WINDOW, type LagFrame } from "../signal/lagFrame";
import { harmonicPresence } from "./harmonicPresence";
import { DIGITAL_SILENCE_DB, type RoomFloor } from "./roomFloor";

/** Search limits of the tracker in Hz. */
const LOWEST_HZ = 60;
export const HIGHEST_HZ = 1400;
const MOST_CANDIDATES = 8;
/** Read once: these stand in the innermost loops. */
const lastLag = MAX_LAG;
const windowLength = WINDOW;
const LEAST_CLARITY = 0.2;
/** Below this clarity a frame is looked at again through the short window, */
const CLEAR_ENOUGH = 0.8;
/** whose peaks are worth a little less, being found among fewer samples. */
const SHORT_DISCOUNT = 0.96;
/** A candidate with at least this presence of its harmonics explains a sound as one voice. */
const WHOLE = 0.4;
/** A candidate this much less clear than the clearest explains the sound less well. */
const BEHIND = 0.12;
/** Candidates above the search limit are kept for the path to choose, so that a whistle does not pass for its octave below. */
const DECOY_HZ = 2000;

/** Below this mean level, in dBFS, no microphone hears: it is a filter's ringing in digital silence, too small to divide by. */
const NOTHING_DB = -120;
/** A lag at which the window overlaps with less than this share of its energy (a click in its middle) tells nothing. */
const LEAST_OVERLAP = 0.02;

/** One possible pitch of a frame. */
export interface PitchCandidate {
  hz: number;
  /** fractional MIDI number, A4 = 440 Hz */
  midi: number;
  /** normalised square difference at the period after the room was subtracted, at most 1 */
  clarity: number;
  /** how completely its harmonics are there, 0 to 1; near 0 tells an octave-down error */
  presence: number;
}

/** A frame with all its possible pitches and how far it stands out of the room. */
export interface CandidateFrame {
  candidates: PitchCandidate[];
  levelDb: number;
  /** power of the frame over the room's, in dB; 60 where the room is silent */
  aboveRoomDb: number;
  /** the clearest period is only a common one of several sounds, and no candidate explains the frame nearly as well */
  mixed: boolean;
}

/**
 * Finds the possible pitches of one frame: the peaks of its normalised square difference, refined between lags.
 *
 * @param frame lag-domain picture of the frame
 * @param room what the room alone sounds like, subtracted first
 * @param short measures the same frame through the short window; asked for only where the long one is unclear
 * @returns up to 8 candidates between 60 and 2000 Hz (above 1400 Hz only as decoys), shortest period first
 * @see P. McLeod, G. Wyvill, ICMC 2005; S. Boll, IEEE Trans. ASSP 27(2) 1979 (subtraction of mean noise power)
 */
export function findCandidates(frame: LagFrame, room: RoomFloor, short: () => LagFrame): CandidateFrame {
  const power = frame.m[0]!;
  const roomPower = room.m[0]!;
  const aboveRoomDb =
    power <= 0 ? -60 : roomPower <= 0 ? 60 : Math.max(-60, Math.min(60, 10 * Math.log10(power / roomPower)));
  const out: CandidateFrame = { candidates: [], levelDb: frame.levelDb, aboveRoomDb, mixed: false };
  if (!(10 * Math.log10(power / WINDOW) > NOTHING_DB)) return out;
  const long = peaks(cleanedDifference(frame, room, WINDOW));
  const clearest = long.reduce((top, c) => Math.max(top, c.clarity), 0);
  const loudEnough = aboveRoomDb > 3 && frame.levelDb > DIGITAL_SILENCE_DB;
  const candidates =
    clearest < CLEAR_ENOUGH && loudEnough ? joined(long, peaks(cleanedDifference(short(), room, SHORT_WINDOW))) : long;
  const r = withoutRoom;
  for (let lag = 0; lag <= lastLag; lag++) r[lag] = frame.r[lag]! - room.r[lag]!;
  out.candidates = candidates.map((c) =>
    hasShorter(c, candidates) ? { ...c, presence: harmonicPresence(r, c.hz) } : { ...c },
  );
  boundMultiples(out.candidates);
  const whole = out.candidates.filter((c) => c.presence >= WHOLE).reduce((top, c) => Math.max(top, c.clarity), 0);
  const any = out.candidates.reduce((top, c) => Math.max(top, c.clarity), 0);
  out.mixed =
    any > 0.6 &&
    whole < any - BEHIND &&
    !out.candidates.some((c) => c.clarity >= any - BEHIND && harmonicPresence(r, c.hz, true) >= WHOLE);
  return out;
}

/** What a period lacks in harmonics its multiples lack too, whatever the spectrum's resolution says of those. */
function boundMultiples(candidates: readonly PitchCandidate[]): void {
  for (const long of candidates) {
    for (const short of candidates) {
      const ratio = short.hz / long.hz;
      const isMultiple = ratio > 1.9 && Math.abs(ratio - Math.round(ratio)) < 0.012 * ratio;
      if (isMultiple && short.clarity > long.clarity - 0.03)
        long.presence = Math.min(long.presence, 0.8 * short.presence);
    }
  }
}

/** Whether the sound may be a higher pitch of which this candidate is only a multiple of the period. */
function hasShorter(candidate: PitchCandidate, all: readonly PitchCandidate[]): boolean {
  return all.some((c) => c.midi > candidate.midi + 6.5 && c.clarity > 0.4);
}

/** Keeps the clearer of two candidates that stand for the same pitch. */
function joined(long: PitchCandidate[], short: PitchCandidate[]): PitchCandidate[] {
  const discounted = short.map((c) => ({ ...c, clarity: c.clarity * SHORT_DISCOUNT }));
  const kept = long.filter((c) => !discounted.some((s) => Math.abs(s.midi - c.midi) < 0.7 && s.clarity > c.clarity));
  const added = discounted.filter((s) => !kept.some((c) => Math.abs(s.midi - c.midi) < 0.7));
  return [...kept, ...added];
}

function peaks(n: Float32Array): PitchCandidate[] {
  const found: PitchCandidate[] = [];
  const shortest = Math.floor(ANALYSIS_RATE / DECOY_HZ);
  for (let lag = shortest; lag < lastLag - 4; lag++) {
    const here = n[lag]!;
    if (here < LEAST_CLARITY - 0.1 || here < n[lag - 1]! || here <= n[lag + 1]!) continue;
    const [period, clarity] = refine(n, lag);
    const hz = ANALYSIS_RATE / period;
    if (clarity < LEAST_CLARITY || hz < LOWEST_HZ || hz > DECOY_HZ) continue;
    found.push({ hz, midi: 69 + 12 * Math.log2(hz / 440), clarity: Math.min(1, clarity), presence: 1 });
  }
  if (found.length <= MOST_CANDIDATES) return found;
  return [...found]
    .sort((a, b) => rank(b) - rank(a))
    .slice(0, MOST_CANDIDATES)
    .sort((a, b) => b.hz - a.hz);
}

/** A period's multiples repeat as well as it does: where clarities are alike the shortest must stay. */
function rank(candidate: PitchCandidate): number {
  return candidate.clarity + 0.005 * candidate.midi;
}

/** Written anew for every frame and read before the next: memory for each one would cost more than all the sums. */
const difference = new Float32Array(lastLag + 1);
const withoutRoom = new Float32Array(lastLag + 1);

/** The room's share of a window scales with the overlap at each lag. */
function cleanedDifference(frame: LagFrame, room: RoomFloor, length: number): Float32Array {
  const n = difference;
  const { r, m } = frame;
  const { r: roomR, m: roomM } = room;
  const least = LEAST_OVERLAP * m[0]!;
  for (let lag = 0; lag <= lastLag; lag++) {
    const both = m[lag]!;
    const share = (length - lag) / (windowLength - lag);
    const cleaned = both - share * roomM[lag]!;
    const rest = cleaned > 0.2 * both ? cleaned : 0.2 * both;
    n[lag] = rest > least ? (2 * (r[lag]! - share * roomR[lag]!)) / rest : 0;
  }
  return n;
}

/** Peak between lags: band-limited interpolation on a quarter grid, then a parabola. */
function refine(n: Float32Array, lag: number): [number, number] {
  let best = lag;
  let top = n[lag]!;
  for (const offset of [-0.5, -0.25, 0.25, 0.5]) {
    const value = valueAt(n, lag + offset);
    if (value > top) {
      top = value;
      best = lag + offset;
    }
  }
  const before = valueAt(n, best - 0.25);
  const after = valueAt(n, best + 0.25);
  const bend = before - 2 * top + after;
  if (bend >= 0) return [best, top];
  const shift = Math.max(-0.5, Math.min(0.5, (before - after) / (2 * bend)));
  return [best + 0.25 * shift, top - 0.25 * (before - after) * shift];
}

const REACH = 5;
const STEPS = 64;
const kernels = interpolationKernels();

function valueAt(n: Float32Array, lag: number): number {
  const scaled = Math.round(lag * STEPS);
  const whole = Math.floor(scaled / STEPS);
  const from = (scaled - whole * STEPS) * 2 * REACH;
  let sum = 0;
  for (let tap = 0; tap < 2 * REACH; tap++) {
    const index = Math.abs(whole - REACH + 1 + tap);
    sum += kernels[from + tap]! * (n[index] ?? 0);
  }
  return sum;
}

function interpolationKernels(): Float32Array {
  const out = new Float32Array(STEPS * 2 * REACH);
  for (let step = 0; step < STEPS; step++) {
    let sum = 0;
    for (let tap = 0; tap < 2 * REACH; tap++) {
      const distance = tap - REACH + 1 - step / STEPS;
      const window = Math.cos((Math.PI * distance) / (2 * REACH)) ** 2;
      const x = Math.PI * distance;
      const value = (Math.abs(x) < 1e-9 ? 1 : Math.sin(x) / x) * window;
      out[step * 2 * REACH + tap] = value;
      sum += value;
    }
    for (let tap = 0; tap < 2 * REACH; tap++) out[step * 2 * REACH + tap]! /= sum;
  }
  return out;
}
