import { trailNotes, trailScale, type TrailNote } from "@/features/span/trailGeometry";
import { hzToMidi } from "@/shared/music/pitch";
import type { LiveFrame } from "@/shared/voice/liveTracker";
import type { TakeReport } from "@/shared/voice/takeReport";

/** A whole take, ready to be drawn. */
export interface TakePicture {
  frames: readonly LiveFrame[];
  notes: readonly TrailNote[];
  low: number;
  high: number;
}

/** Makes the picture of a take out of its report: one frame for each 10 ms. */
export function takePicture({ f0 }: Pick<TakeReport, "f0">): TakePicture {
  const frames = f0.map((hz, k) => ({ t: k / 100, hz, clarity: 1, levelDb: 0 }));
  const notes = trailNotes(frames.flatMap(({ t, hz }) => (hz === null ? [] : [{ t, midi: hzToMidi(hz) }])));
  const { low, high } = trailScale(
    notes.map(({ end: t, midi }) => ({ t, midi })),
    null,
  );
  return { frames, notes, low, high };
}

/** The notes as strokes of one path: inside the given seconds, or outside them. */
export function strokesOf(
  notes: readonly TrailNote[],
  part: { startS: number; endS: number },
  inside: boolean,
  x: (t: number) => number,
  y: (midi: number) => number,
): string {
  const stretches = ({ start, end }: TrailNote): [number, number][] =>
    inside
      ? [[Math.max(start, part.startS), Math.min(end, part.endS)]]
      : [
          [start, Math.min(end, part.startS)],
          [Math.max(start, part.endS), end],
        ];
  return notes
    .flatMap((note) =>
      stretches(note)
        .filter(([from, to]) => to > from)
        .map(
          ([from, to]) =>
            `M${x(from).toFixed(1)} ${y(note.midi).toFixed(1)}L${x(to).toFixed(1)} ${y(note.midi).toFixed(1)}`,
        ),
    )
    .join("");
}
