import type { Scale } from "@/features/span/ladderGeometry";
import type { RosterRow } from "@/shared/contract/studio/roster";

/** px a semitone where there is room for it. */
const semitone = 9;
/** Semitones of air at both ends, for the names of the ends. */
const air = 4;

/** One scale for every voice of a roster, and the songs in them. */
export function rosterScale(rows: readonly Pick<RosterRow, "voice" | "open">[]): Scale {
  const ends = rows.flatMap(({ voice, open }) => {
    if (!voice) return [];
    const [song] = open;
    return [voice.range.lowMidi, voice.range.highMidi, song?.lowMidi, song?.highMidi].flatMap((midi) => midi ?? []);
  });
  if (ends.length === 0) return { low: 40 - air, high: 81 + air };
  return { low: Math.round(Math.min(...ends)) - air, high: Math.round(Math.max(...ends)) + air };
}

/** Width of the bands' column, px: 9 a semitone, less where the room ends. */
export function bandsWidth({ low, high }: Scale, room: number): number {
  return Math.round(Math.min(room, (high - low + 1) * semitone));
}
