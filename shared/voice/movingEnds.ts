import type { ProfileTake } from "./voiceProfile";

/** One end of a voice that lies elsewhere than some weeks ago. */
export interface MovedEnd {
  end: "low" | "high";
  /** semitones, up positive */
  by: number;
  /** whole weeks between the takes compared */
  weeks: number;
}

/** The takes of so many days up to the newest are what the voice is now. */
const RECENT_DAYS = 21;
/** An end must have moved by this much: from one day to the next it may differ by two semitones. */
const LEAST_MOVE = 3;
const LEAST_GAP_DAYS = 14;
const DAY = 86_400_000;

/**
 * Which ends of a voice have moved between earlier takes and those of the last three weeks. An end counts as moved
 * only where two takes on each side say so (a guided hold counts as two): farther out, if two recent takes lie beyond
 * everything earlier; drawn in, if nothing recent comes near what two earlier takes reached.
 *
 * @param takes takes of one voice, any order
 * @returns the moved ends, low before high; empty where none moved or too little was sung to tell
 * @throws RangeError if a take has an unreadable time
 * @see Brown, Morris, Murry, J. Voice 10(3) 1996 (pitch from session to session: up to 2 semitones)
 */
export function movingEnds(takes: readonly ProfileTake[]): MovedEnd[] {
  const times = takes.map(({ sungAt }) => Date.parse(sungAt));
  if (times.some(Number.isNaN)) throw new RangeError("sungAt must be an ISO time");
  const newest = Math.max(...times);
  const ends = ["low", "high"] as const;
  return ends.flatMap((end) => movedEnd(takes, newest, end) ?? []);
}

function movedEnd(takes: readonly ProfileTake[], newest: number, end: "low" | "high"): MovedEnd | null {
  const side = end === "low" ? -1 : 1;
  const seen = takes
    .filter(({ shows = "both" }) => shows === "both" || shows === end)
    .map(({ sungAt, range, hold }) => ({
      at: Date.parse(sungAt),
      reach: side * (end === "low" ? range.lowMidi : range.highMidi),
      voices: hold ? 2 : 1,
    }));
  const recent = seen.filter(({ at }) => newest - at <= RECENT_DAYS * DAY);
  const earliestRecent = Math.min(...recent.map(({ at }) => at));
  const earlier = seen.filter(
    ({ at }) => newest - at > RECENT_DAYS * DAY && earliestRecent - at >= LEAST_GAP_DAYS * DAY,
  );
  const [farthestNow, agreedNow] = reaches(recent);
  const [farthestThen, agreedThen] = reaches(earlier);
  if (agreedNow === null || agreedThen === null || farthestNow === null || farthestThen === null) return null;
  const move =
    agreedNow - farthestThen >= LEAST_MOVE
      ? agreedNow - farthestThen
      : agreedThen - farthestNow >= LEAST_MOVE
        ? farthestNow - agreedThen
        : 0;
  if (move === 0) return null;
  const weeks = Math.max(1, Math.round((middle(recent) - middle(earlier)) / (7 * DAY)));
  return { end, by: Math.round(side * move), weeks };
}

/** The farthest note, and the farthest that two takes agree on. */
function reaches(seen: readonly { reach: number; voices: number }[]): [number | null, number | null] {
  const outward = seen.flatMap(({ reach, voices }) => Array<number>(voices).fill(reach)).sort((a, b) => b - a);
  return [outward[0] ?? null, outward[1] ?? null];
}

function middle(seen: readonly { at: number }[]): number {
  return seen.reduce((sum, { at }) => sum + at, 0) / seen.length;
}
