import type { LiveFrame } from "@/shared/voice/liveTracker";

/** The trail shows six seconds; a little more keeps its left edge whole. */
const keptS = 6.6;

/**
 * What is heard right now. It changes some 100 times a second, so it is read by whoever draws, at the pace of drawing,
 * and never passes through the page's state.
 */
export interface LiveSound {
  frames: LiveFrame[];
  /** measured and not yet decided: what the next frames will probably be */
  ahead: LiveFrame[];
  levelDb: number;
  peak: number;
  seconds: number;
  /** clock time in ms at which the last block arrived */
  atMs: number;
  /** called whenever something was heard */
  listeners: Set<() => void>;
}

const nothing = () => ({ frames: [], ahead: [], levelDb: -120, peak: 0, seconds: 0, atMs: 0 });

export function createLiveSound(): LiveSound {
  return { ...nothing(), listeners: new Set() };
}

export function silence(live: LiveSound): void {
  Object.assign(live, nothing());
}

/** Level and peak fall back slowly (about 20 dB a second), so that the words beside them can be read. */
export function hear(
  live: LiveSound,
  heard: { frames: LiveFrame[]; ahead: LiveFrame[]; seconds: number; levelDb: number; peak: number },
  atMs: number,
): void {
  const passed = Math.max(0, heard.seconds - live.seconds);
  live.levelDb = Math.max(heard.levelDb, live.levelDb - 20 * passed);
  live.peak = Math.max(heard.peak, live.peak * 10 ** -passed);
  live.seconds = heard.seconds;
  live.atMs = atMs;
  live.ahead = heard.ahead;
  live.frames.push(...heard.frames);
  // One cut a second spares a copy with every block.
  const oldest = live.frames[0];
  if (oldest && oldest.t < heard.seconds - keptS - 1) {
    const from = heard.seconds - keptS;
    live.frames = live.frames.slice(live.frames.findIndex((frame) => frame.t >= from));
  }
  for (const listener of live.listeners) listener();
}

/** Seconds of the take at clock time `nowMs`: between two blocks time goes on, but never far ahead of the sound. */
export function timeOf(live: LiveSound, nowMs: number): number {
  return live.seconds === 0 ? 0 : live.seconds + Math.min(0.1, Math.max(0, (nowMs - live.atMs) / 1000));
}
