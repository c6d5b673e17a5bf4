import { trailNotes, type TrailNote } from "@/features/span/trailGeometry";
import { hzToMidi } from "@/shared/music/pitch";
import type { TakeReport } from "@/shared/voice/takeReport";
import type { LiveFrame } from "@/shared/voice/liveTracker";

/** A whole take, ready to be drawn. */
export interface SungPicture {
  /** one for each 10 ms */
  frames: readonly LiveFrame[];
  notes: readonly TrailNote[];
}

export function sungPicture({ f0 }: Pick<TakeReport, "f0">): SungPicture {
  const frames = f0.map((hz, k) => ({ t: k / 100, hz, clarity: 1, levelDb: 0 }));
  const notes = trailNotes(frames.flatMap(({ t, hz }) => (hz === null ? [] : [{ t, midi: hzToMidi(hz) }])));
  return { frames, notes };
}

/** Octaves by which singing lies off the tune, so that a picture can show one on the other. */
export function octavesOff(wanted: readonly number[], sung: readonly number[]): number {
  if (wanted.length === 0 || sung.length === 0) return 0;
  const middle = (pitches: readonly number[]) => [...pitches].sort((a, b) => a - b)[pitches.length >> 1]!;
  return Math.round((middle(sung) - middle(wanted)) / 12);
}
