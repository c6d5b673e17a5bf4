import type { LiveFrame } from "@/shared/voice/liveTracker";

/** The trail shows six seconds; a little more keeps its left edge whole. */
const keptS = 6.6;

/**
 * What is heard right now. It changes some 40 times a second, so it is read by whoever draws, at the pace of drawing,
 * and never passes through React's state.
 */
export interface LiveSound {
  frames: LiveFrame[];
  levelDb: number;
  peak: number;
  seconds: number;
  /** clock time in ms at which the last block arrived */
  atMs: number;
}

export function createLiveSound(): LiveSound {
  return { frames: [], levelDb: -120, peak: 0, seconds: 0, atMs: 0 };
}

export function silence(live: LiveSound): void {
  Object.assign(live, createLiveSound());
}

/** Level and peak fall back slowly (about 20 dB a second), so that the words beside them can be read. */
export function hear(
  live: LiveSound,
  heard: { frames: LiveFrame[]; seconds: number; levelDb: number; peak: number },
  atMs: number,
): void {
  const passed = Math.max(0, heard.seconds - live.seconds);
  live.levelDb = Math.max(heard.levelDb, live.levelDb - 20 * passed);
  live.peak = Math.max(heard.peak, live.peak * 10 ** -passed);
  live.seconds = heard.seconds;
  live.atMs = atMs;
  const from = heard.seconds - keptS;
  const firstKept = live.frames.findIndex((frame) => frame.t >= from);
  live.frames = [...(firstKept > 0 ? live.frames.slice(firstKept) : live.frames), ...heard.frames];
}

/** Seconds of the take at clock time `nowMs`: between two blocks time goes on, but never far ahead of the sound. */
export function timeOf(live: LiveSound, nowMs: number): number {
  return live.seconds === 0 ? 0 : live.seconds + Math.min(0.1, Math.max(0, (nowMs - live.atMs) / 1000));
}
