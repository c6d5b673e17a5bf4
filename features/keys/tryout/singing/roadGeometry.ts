import type { PlannedNote } from "@/shared/songs/backing/backingPlan";

/** Seconds that the road shows before and behind the moment. */
const aheadS = 3.2;
const behindS = 2.8;
const namesPx = 40;

/** Where the notes to be sung come along: its size in px and the pitches it shows. */
export interface RoadPlace {
  width: number;
  height: number;
  low: number;
  high: number;
}

/** Px for one second. */
export function roadPace({ width }: Pick<RoadPlace, "width">): number {
  return (width - namesPx) / (aheadS + behindS);
}

/** Where now is. */
export function nowX(place: Pick<RoadPlace, "width">): number {
  return namesPx + behindS * roadPace(place);
}

export function roadY({ height, low, high }: RoadPlace, midi: number): number {
  return 10 + ((high - Math.min(high, Math.max(low, midi))) * (height - 20)) / (high - low);
}

/** Pitches shown: the tune's with some air, an octave at least; without a tune those of the voice. */
export function roadScale(
  notes: readonly Pick<PlannedNote, "midi">[],
  voice: { lowMidi: number; highMidi: number } | null,
): { low: number; high: number } {
  const pitches = notes.map(({ midi }) => midi);
  const low = pitches.length > 0 ? Math.min(...pitches) : (voice?.lowMidi ?? 52);
  const high = pitches.length > 0 ? Math.max(...pitches) : (voice?.highMidi ?? 69);
  const air = Math.max(2, Math.ceil((12 - (high - low)) / 2));
  return { low: Math.floor(low - air), high: Math.ceil(high + air) };
}
