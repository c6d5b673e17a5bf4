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
  if (live.length < 20) return silentRoom();
  const levels = live.map((f) => f.levelDb).sort((a, b) => a - b);
  const quiet = levels[Math.floor(levels.length * 0.05)]!;
  const loud = levels[Math.floor(levels.length * 0.9)]!;
  if (loud - quiet < LEAST_STEP_DB) return silentRoom();
  const ceiling = Math.min(quiet + 2.5, loud - LEAST_STEP_DB);
  const room = silentRoom();
  let count = 0;
  for (const frame of live) {
    if (frame.levelDb > ceiling) continue;
    const wholeWindowDb = 10 * Math.log10(frame.m[0]! / WINDOW);
    if (wholeWindowDb > ceiling + 3) continue;
    for (let lag = 0; lag <= MAX_LAG; lag++) {
      room.r[lag]! += frame.r[lag]!;
      room.m[lag]! += frame.m[lag]!;
    }
    count++;
  }
  if (count === 0) return silentRoom();
  for (let lag = 0; lag <= MAX_LAG; lag++) {
    room.r[lag]! /= count;
    room.m[lag]! /= count;
  }
  room.levelDb = 10 * Math.log10(room.m[0]! / WINDOW);
  return room;
}
