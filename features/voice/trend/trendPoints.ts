import type { Take } from "@/shared/contract/take";
import { inTune } from "@/shared/voice/shownTake";
import type { PitchBand } from "@/shared/voice/takeReport";

export type DayTime = "morning" | "afternoon" | "evening";

/** One take in the picture. */
export interface TrendPoint {
  id: string;
  at: Date;
  dayTime: DayTime;
  warmedUp: boolean | null;
  effort: number | null;
  held: boolean;
  /** named by the singer's own tuning, whole semitones */
  range: PitchBand;
  comfort: PitchBand;
}

/** The takes as points, oldest first. */
export function trendPoints(takes: readonly Take[]): TrendPoint[] {
  return takes
    .map((take): TrendPoint => {
      const at = new Date(take.sungAt);
      return {
        ...{ id: take.id, at, dayTime: dayTimeOf(at.getHours()), held: take.kind === "hold" },
        ...{ warmedUp: take.warmedUp, effort: take.effort },
        range: whole(inTune(take.range, take.tuningCents)),
        comfort: whole(inTune(take.comfort, take.tuningCents)),
      };
    })
    .sort((a, b) => a.at.getTime() - b.at.getTime() || (a.id < b.id ? -1 : 1));
}

export function dayTimeOf(hour: number): DayTime {
  if (hour < 12) return "morning";
  return hour < 18 ? "afternoon" : "evening";
}

/**
 * Where the points stand from left to right: by their time, but never closer than `gap`, so that takes of one evening
 * stay apart. Where they do not fit like that they stand evenly.
 */
export function trendPlaces(points: readonly TrendPoint[], from: number, to: number, gap: number): number[] {
  const first = points[0]?.at.getTime() ?? 0;
  const last = points.at(-1)?.at.getTime() ?? 0;
  const room = to - from;
  if (points.length < 2 || last === first) return points.map((_, k) => even(k, points.length, from, room));
  if ((points.length - 1) * gap > room) return points.map((_, k) => even(k, points.length, from, room));
  const places = points.map(({ at }) => from + (room * (at.getTime() - first)) / (last - first));
  for (let k = 1; k < places.length; k += 1) places[k] = Math.max(places[k] ?? 0, (places[k - 1] ?? 0) + gap);
  // What was pushed over the right edge is pushed back from there.
  for (let k = places.length - 1; k >= 0; k -= 1) {
    const most = to - (places.length - 1 - k) * gap;
    places[k] = Math.min(places[k] ?? 0, most);
  }
  return places;
}

function even(k: number, count: number, from: number, room: number): number {
  return count < 2 ? from + room / 2 : from + (room * k) / (count - 1);
}

function whole({ lowMidi, highMidi }: PitchBand): PitchBand {
  return { lowMidi: Math.round(lowMidi), highMidi: Math.round(highMidi) };
}
