import { createLagMeter, HOP, SHORT_WINDOW, WINDOW, type LagFrame } from "../signal/lagFrame";
import { createResampler } from "../signal/resampler";
import { findCandidates, type CandidateFrame } from "./pitchCandidates";
import { createPathFinder } from "./pitchPath";
import type { MeasuredSound } from "./pitchTrack";
import { measureRoom, silentRoom, type RoomFloor } from "./roomFloor";
import { trackFrame } from "./trackFrame";

/** Frames of 10 ms the live tracker looks ahead before it decides. */
export const LOOK_AHEAD_FRAMES = 12;
const ROOM_MEMORY = 1500;
const ROOM_EVERY = 25;

/** One frame of the live trail. */
export interface LiveFrame {
  /** time in seconds since the first sample pushed */
  t: number;
  /** fundamental frequency in Hz; null where unvoiced */
  hz: number | null;
  /** 0 to 1 */
  clarity: number;
  /** RMS level in dBFS, full-scale sine 0; -Infinity for silence */
  levelDb: number;
}

/** A tracker that is fed while the singer sings. */
export interface LiveTracker {
  push(pcm: Float32Array): LiveFrame[];
  ahead(): LiveFrame[];
  measured(): MeasuredSound | null;
}

/**
 * The tracker of `listenToTake`, run while the singer sings. It decides each 10 ms frame 120 ms later
 * (and needs 33 ms more of sound for the window of a frame), and knows the room only from what it has heard so far,
 * at most the last 15 s; in all else it is the same.
 *
 * @param sampleRate in Hz, 8000 to 192000
 * @param options remember: keep what is measured (0.15 MB a second), default false
 * @returns push(pcm): mono samples in [-1, 1], any length; gives the frames decided by them, in order, one per 10 ms;
 *   ahead(): the frames measured but not yet decided (up to 12, in order, after the decided ones), as they look now;
 *   later sound may still change them;
 *   measured(): where `remember` is set, all that was measured, for `listenToTake` once the take is over (nothing may be
 *   pushed after it)
 * @throws RangeError if the rate is outside 8-192 kHz
 */
export function createLiveTracker(sampleRate: number, options: { remember?: boolean } = {}): LiveTracker {
  const { remember = false } = options;
  const sounds: Float32Array[] = [];
  const lagFrames: LagFrame[] = [];
  const resampler = createResampler(sampleRate);
  const measure = createLagMeter();
  const measureShort = createLagMeter(SHORT_WINDOW);
  const finder = createPathFinder(LOOK_AHEAD_FRAMES + 1);
  let sound = new Float32Array(WINDOW / 2);
  let heard: LagFrame[] = [];
  let room: RoomFloor = silentRoom();
  let waiting: CandidateFrame[] = [];
  let measured = 0;
  let decided = 0;

  function listen(lagFrame: LagFrame, short: () => LagFrame): LiveFrame | null {
    heard.push(lagFrame);
    if (remember) lagFrames.push(lagFrame);
    if (heard.length > 2 * ROOM_MEMORY) heard = heard.slice(-ROOM_MEMORY);
    if (measured % ROOM_EVERY === 0) room = measureRoom(heard.slice(-ROOM_MEMORY));
    measured++;
    const frame = findCandidates(lagFrame, room, short);
    finder.push(frame);
    waiting.push(frame);
    const point = finder.decide(LOOK_AHEAD_FRAMES);
    if (!point) return null;
    const [oldest, ...rest] = waiting;
    waiting = rest;
    const { hz, clarity, levelDb } = trackFrame(oldest!, point.candidate);
    return { t: decided++ / 100, hz, clarity, levelDb };
  }

  return {
    push(pcm) {
      const more = resampler.push(pcm);
      if (remember) sounds.push(more);
      const joined = new Float32Array(sound.length + more.length);
      joined.set(sound);
      joined.set(more, sound.length);
      const out: LiveFrame[] = [];
      let from = 0;
      for (; from + WINDOW <= joined.length; from += HOP) {
        const middle = from + WINDOW / 2;
        const frame = listen(measure(joined, from), () => measureShort(joined, middle - SHORT_WINDOW / 2));
        if (frame) out.push(frame);
      }
      sound = joined.slice(from);
      return out;
    },
    measured() {
      if (!remember) return null;
      sounds.push(resampler.finish());
      const whole = new Float32Array(sounds.reduce((length, piece) => length + piece.length, 0));
      let at = 0;
      for (const piece of sounds) {
        whole.set(piece, at);
        at += piece.length;
      }
      return { sound: whole, lagFrames };
    },
    ahead() {
      return waiting.map((frame, k) => {
        const point = finder.decide(waiting.length - 1 - k);
        const { hz, clarity, levelDb } = trackFrame(frame, point?.candidate ?? null);
        return { t: (decided + k) / 100, hz, clarity, levelDb };
      });
    },
  };
}
