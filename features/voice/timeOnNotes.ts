import type { KeyMark } from "@/shared/keys/keyScore";
import type { Take } from "@/shared/contract/take";

type HeldNote = Pick<Take["notes"][number], "start" | "end" | "midi" | "clear">;

/** Time on one semitone, in seconds. */
export interface NoteTime {
  midi: number;
  seconds: number;
}

/** How long each semitone was held clearly, lowest first, after taking the singer's offset off. */
export function timeOnNotes(notes: readonly HeldNote[], tuningCents: number): NoteTime[] {
  const times = new Map<number, number>();
  for (const { start, end, midi, clear } of notes) {
    if (!clear) continue;
    const nearest = Math.round(midi - tuningCents / 100);
    times.set(nearest, (times.get(nearest) ?? 0) + end - start);
  }
  return [...times].map(([midi, seconds]) => ({ midi, seconds })).sort((a, b) => a.midi - b.midi);
}

/** The note sung longest, or null where none was held. */
export function longestNote(times: readonly NoteTime[]): NoteTime | null {
  return times.reduce<NoteTime | null>(
    (longest, time) => (longest && longest.seconds >= time.seconds ? longest : time),
    null,
  );
}

/** The times as marks of a ladder, in ink: what was sung is neither reach nor beyond. Their shares add up to 1. */
export function marksOfTimes(times: readonly NoteTime[]): KeyMark[] {
  const all = times.reduce((sum, { seconds }) => sum + seconds, 0);
  return times.map(({ midi, seconds }) => ({ midi, share: seconds / all, zone: "comfort", home: false }));
}
