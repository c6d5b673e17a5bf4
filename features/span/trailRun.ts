import { hzToMidi } from "@/shared/music/pitch";
import type { LiveFrame } from "@/shared/voice/liveTracker";
import { trailNotes, trailSeconds, type TrailNote, type TrailPoint } from "./trailGeometry";

/** What there is to draw at one moment. */
export interface TrailMoment {
  /** of the tracker, oldest first; older ones than the trail shows may be missing */
  frames: readonly LiveFrame[];
  /** not yet decided; they follow on `frames` and may change */
  ahead: readonly LiveFrame[];
  /** seconds, on the clock of the frames */
  now: number;
}

export interface Trail {
  /** steady notes of the last seconds, oldest first; one that is over stays the very same object */
  notes: readonly TrailNote[];
  /** the newest sounding pitch, null where nothing sounds */
  newest: TrailPoint | null;
}

/** A note this long before the newest frame is over. */
const settledS = 0.3;
/** Within this time of now a pitch still sounds. */
const soundingS = 0.12;
const hurryS = 0.5;

/** Follows the singing: each moment costs only what is new in it, and notes that are over are never made again. */
export function createTrailRun(): (moment: TrailMoment) => Trail {
  let over: TrailNote[] = [];
  let open: TrailPoint[] = [];
  let heardTo = -1;
  let before = -Infinity;

  return ({ frames, ahead, now }) => {
    if (now < before - hurryS) {
      over = [];
      open = [];
      heardTo = -1;
    }
    before = now;
    const fresh = firstAfter(frames, heardTo);
    for (let k = fresh; k < frames.length; k += 1) {
      const frame = frames[k];
      if (!frame || frame.t > now) break;
      heardTo = frame.t;
      if (frame.hz !== null) open.push({ t: frame.t, midi: hzToMidi(frame.hz) });
    }
    const guessed = ahead.flatMap(({ t, hz }) => (hz !== null && t > heardTo ? [{ t, midi: hzToMidi(hz) }] : []));
    const points = guessed.length > 0 ? [...open, ...guessed] : open;
    const growing = trailNotes(points);
    const settled = growing.filter(
      (note, k) => note.end < heardTo - settledS || (k < growing.length - 1 && note.end < heardTo - soundingS),
    );
    const last = settled.at(-1);
    if (last) {
      over.push(...settled);
      open = open.filter(({ t }) => t > last.end);
    } else if (growing.length === 0) open = open.filter(({ t }) => t > heardTo - settledS);
    over = over.filter(({ end }) => end > now - trailSeconds);
    const newest = points.at(-1) ?? null;
    return {
      notes: [...over, ...growing.slice(settled.length)],
      newest: newest && newest.t > Math.max(heardTo, ahead.at(-1)?.t ?? 0) - soundingS ? newest : null,
    };
  };
}

/** The index of the first frame after `t`; new frames stand at the end. */
function firstAfter(frames: readonly LiveFrame[], t: number): number {
  let k = frames.length;
  while (k > 0 && (frames[k - 1]?.t ?? 0) > t) k -= 1;
  return k;
}
