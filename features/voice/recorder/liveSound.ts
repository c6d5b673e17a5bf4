import { hzToMidi } from "@/shared/music/pitch";
import type { LiveFrame } from "@/shared/voice/liveTracker";

/** The trail shows six seconds; a little more keeps its left edge whole. */
const keptS = 6.6;
/** Frames of 10 ms from which on a note counts as held. */
const heldFrames = 24;
const sameNoteSemitones = 0.6;
/** How fast the middle of a note follows its newest frame: a vibrato stays around it. */
const follow = 0.1;

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
  /** seconds that each semitone was held since the take began */
  held: ReadonlyMap<number, number>;
  /** the note that is being held, and for how many frames */
  holding: { midi: number; frames: number };
  /** called whenever something was heard */
  listeners: Set<() => void>;
}

const nothing = () => ({
  ...{ frames: [], ahead: [], levelDb: -120, peak: 0, seconds: 0, atMs: 0 },
  ...{ held: new Map(), holding: { midi: NaN, frames: 0 } },
});

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
  for (const { hz } of heard.frames) hold(live, hz === null ? NaN : hzToMidi(hz));
  // One cut a second spares a copy with every block.
  const oldest = live.frames[0];
  if (oldest && oldest.t < heard.seconds - keptS - 1) {
    const from = heard.seconds - keptS;
    live.frames = live.frames.slice(live.frames.findIndex((frame) => frame.t >= from));
  }
  for (const listener of live.listeners) listener();
}

/** Counts one more frame of 10 ms towards the note it belongs to, once that note has been held long enough. */
function hold(live: LiveSound, midi: number): void {
  const { holding } = live;
  if (!(Math.abs(midi - holding.midi) <= sameNoteSemitones)) {
    live.holding = { midi, frames: 1 };
    return;
  }
  holding.midi += follow * (midi - holding.midi);
  holding.frames += 1;
  if (holding.frames < heldFrames) return;
  const note = Math.round(holding.midi);
  const more = (holding.frames === heldFrames ? heldFrames : 1) / 100;
  live.held = new Map(live.held).set(note, (live.held.get(note) ?? 0) + more);
}

/** Seconds of the take at clock time `nowMs`: between two blocks time goes on, but never far ahead of the sound. */
export function timeOf(live: LiveSound, nowMs: number): number {
  return live.seconds === 0 ? 0 : live.seconds + Math.min(0.1, Math.max(0, (nowMs - live.atMs) / 1000));
}
