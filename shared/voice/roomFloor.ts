import { MAX_LAG, WINDOW, type LagFrame } from "../signal/lagFrame";

/** What the room sounds like without the singer, in the lag domain. */
export interface RoomFloor {
  r: Float32Array;
  m: Float32Array;
  /** RMS level in dBFS; null where the take shows no room of its own (digital silence between the notes, or no pause) */
  levelDb: number | null;
}

/** Below this level a frame is taken for a muted microphone, not for a room. */
export const DIGITAL_SILENCE_DB = -90;
const LEAST_STEP_DB = 6;
/** With this share of muted frames the pauses are cut out by a gate, and what is quiet beside them is singing. */
const MUTED_SHARE = 0.03;
/** Lags, at 8 kHz, over which quiet frames are compared with each other: 60 to 300 Hz. */
const COMPARED = { from: 27, to: 133 };

/** @returns a floor that subtracts nothing */
export function silentRoom(): RoomFloor {
  return { r: new Float32Array(MAX_LAG + 1), m: new Float32Array(MAX_LAG + 1), levelDb: null };
}

/**
 * Measures the room from the quietest stretches of a take that are not digital silence.
 *
 * @param frames frames of the take, any order
 * @returns the mean of the quiet frames; a silent room where the quiet is not at least 6 dB under the loud
 */
export function measureRoom(frames: readonly LagFrame[]): RoomFloor {
  const live = frames.filter((f) => f.levelDb > DIGITAL_SILENCE_DB);
  if (live.length < 20 || live.length < (1 - MUTED_SHARE) * frames.length) return silentRoom();
  const levels = live.map((f) => f.levelDb).sort((a, b) => a - b);
  const quiet = levels[Math.floor(levels.length * 0.05)]!;
  const loud = levels[Math.floor(levels.length * 0.9)]!;
  if (loud - quiet < LEAST_STEP_DB) return silentRoom();
  const ceiling = Math.min(quiet + 2.5, loud - LEAST_STEP_DB);
  const still = live.filter((f) => f.levelDb <= ceiling && 10 * Math.log10(f.m[0]! / WINDOW) <= ceiling + 3);
  if (still.length === 0 || isChanging(still)) return silentRoom();
  const room = silentRoom();
  const lastLag = MAX_LAG;
  for (const frame of still) {
    for (let lag = 0; lag <= lastLag; lag++) {
      room.r[lag]! += frame.r[lag]! / still.length;
      room.m[lag]! += frame.m[lag]! / still.length;
    }
  }
  room.levelDb = 10 * Math.log10(room.m[0]! / WINDOW);
  return room;
}

/** Hum repeats alike in all quiet frames, noise hardly repeats; frames that repeat, each in its own way, are soft notes. */
function isChanging(frames: readonly LagFrame[]): boolean {
  const mean = new Float64Array(MAX_LAG + 1);
  let own = 0;
  for (const frame of frames) {
    for (let lag = COMPARED.from; lag <= COMPARED.to; lag++) {
      const share = (2 * frame.r[lag]!) / Math.max(1e-30, frame.m[lag]!);
      mean[lag]! += share / frames.length;
      own += share * share;
    }
  }
  const lags = COMPARED.to - COMPARED.from + 1;
  const common = mean.reduce((sum, x) => sum + x * x, 0) / lags;
  own /= lags * frames.length;
  return own > 0.1 && common < 0.6 * own;
}
