import type { PitchBand } from "./takeReport";

/** What a profile needs to know about one take. */
export interface ProfileTake {
  id: string;
  /** ISO time */
  sungAt: string;
  range: PitchBand;
  comfort: PitchBand;
  estimate: PitchBand;
  /** 0 to 1 */
  certainty: number;
  /** how it felt, 1 easy to 5 straining; null where not said */
  effort: number | null;
  /** a guided hold of single notes */
  hold?: boolean;
}

/** A voice, as all its takes together show it. */
export interface VoiceProfile {
  range: PitchBand;
  comfort: PitchBand;
  estimate: PitchBand;
  /** 0 to 1 */
  certainty: number;
  /** id of the take the lowest note comes from */
  lowFrom: string;
  /** id of the take the highest note comes from */
  highFrom: string;
  reasons: string[];
}

/** One take without another near its end may move an end of the range by at most this much beyond the rest, in semitones. */
export const MOST_BY_ONE_TAKE = 4;
/** A take loses half its weight in this many days against the newest one. */
export const HALF_LIFE_DAYS = 180;
const TRUSTED = 0.6;
/** A trusted guided hold decides an end of the range against phrases that went at most this much farther, in semitones. */
const HOLD_WINS_WITHIN = 2;

/**
 * Merges the takes of one voice by evidence and age. The outermost believed notes make the range; an end shown by one
 * take only moves at most 4 semitones beyond what the others show, unless that take was a guided hold heard with a
 * certainty of 0.6 or more. Such a hold also decides an end against phrases that went up to 2 semitones farther. Comfort is the weighted mean of the takes' bands (certainty, age, and ease where it was
 * rated: easy singing counts up to twice, straining singing not at its ends), kept inside the range.
 * A function of the set of takes only: order does not matter, and leaving a take out gives what was before it.
 *
 * @param takes heard takes of one voice, any order
 * @returns the profile; null without takes
 * @throws RangeError if a take has an unreadable time
 */
export function mergeTakes(takes: readonly ProfileTake[]): VoiceProfile | null {
  if (takes.length === 0) return null;
  const sorted = [...takes].sort((a, b) => (a.id < b.id ? -1 : a.id > b.id ? 1 : 0));
  const newest = Math.max(...sorted.map(timeOf));
  const weighed = sorted.map((take) => ({ take, weight: weightOf(take, newest) }));
  const [low, high] = bothEnds(sorted);
  const range = { lowMidi: low.midi, highMidi: high.midi };
  const comfort = within(range, {
    lowMidi: weightedMean(weighed, easyLow),
    highMidi: weightedMean(weighed, easyHigh),
  });
  const estimate = {
    lowMidi: Math.min(range.lowMidi, weightedMean(weighed, (t) => t.estimate.lowMidi)),
    highMidi: Math.max(range.highMidi, weightedMean(weighed, (t) => t.estimate.highMidi)),
  };
  const doubt = sorted.reduce((product, take) => product * (1 - 0.7 * take.certainty), 1);
  const best = Math.max(...sorted.map((t) => t.certainty));
  return {
    range,
    comfort,
    estimate,
    certainty: Math.min(0.98, Math.max(best, 1 - doubt)),
    lowFrom: low.id,
    highFrom: high.id,
    reasons: reasonsFor(sorted, low, high),
  };
}

interface End {
  midi: number;
  id: string;
  held: boolean;
  capped: boolean;
}

/** Two takes far apart would each cap the other past the middle; then both count whole. */
function bothEnds(takes: readonly ProfileTake[]): [End, End] {
  const ends = (most: number): [End, End] => [outerEnd(takes, (t) => t.range.lowMidi, -1, most), outerEnd(takes, (t) => t.range.highMidi, 1, most)];
  const capped = ends(MOST_BY_ONE_TAKE);
  return capped[0].midi <= capped[1].midi ? capped : ends(Infinity);
}

/** @param side -1 for the low end, 1 for the high end */
function outerEnd(takes: readonly ProfileTake[], midiOf: (take: ProfileTake) => number, side: -1 | 1, most: number): End {
  const outward = [...takes].sort((a, b) => side * (midiOf(b) - midiOf(a)) || (a.id < b.id ? -1 : 1));
  const first = outward[0]!;
  const second = outward[1];
  const hold = outward.find((t) => t.hold === true && t.certainty >= TRUSTED);
  if (hold && hold !== first && side * (midiOf(first) - midiOf(hold)) <= HOLD_WINS_WITHIN) return { midi: midiOf(hold), id: hold.id, held: true, capped: false };
  const sure = first.hold === true && first.certainty >= TRUSTED;
  const limit = second === undefined || sure ? Infinity : side * midiOf(second) + most;
  const capped = side * midiOf(first) > limit;
  return { midi: capped ? side * limit : midiOf(first), id: first.id, held: first.hold === true, capped };
}

function easyLow(take: ProfileTake): number {
  const effort = take.effort ?? 3;
  if (effort <= 2) return Math.min(take.comfort.lowMidi, take.range.lowMidi + 1);
  return effort >= 4 ? take.comfort.lowMidi + (effort - 3) * 0.5 : take.comfort.lowMidi;
}

function easyHigh(take: ProfileTake): number {
  const effort = take.effort ?? 3;
  if (effort <= 2) return Math.max(take.comfort.highMidi, take.range.highMidi - 1);
  return effort >= 4 ? take.comfort.highMidi - (effort - 3) : take.comfort.highMidi;
}

function weightOf(take: ProfileTake, newest: number): number {
  const days = (newest - timeOf(take)) / 86_400_000;
  return (0.05 + take.certainty) * 2 ** (-days / HALF_LIFE_DAYS) * (take.effort === null ? 1 : 2);
}

function timeOf(take: ProfileTake): number {
  const time = Date.parse(take.sungAt);
  if (Number.isNaN(time)) throw new RangeError("sungAt must be an ISO time");
  return time;
}

function weightedMean(weighed: readonly { take: ProfileTake; weight: number }[], valueOf: (take: ProfileTake) => number): number {
  const whole = weighed.reduce((sum, { weight }) => sum + weight, 0);
  return weighed.reduce((sum, { take, weight }) => sum + valueOf(take) * weight, 0) / whole;
}

function within(range: PitchBand, band: PitchBand): PitchBand {
  const lowMidi = Math.max(range.lowMidi, Math.min(range.highMidi, band.lowMidi));
  return { lowMidi, highMidi: Math.max(lowMidi, Math.min(range.highMidi, band.highMidi)) };
}

function reasonsFor(takes: readonly ProfileTake[], low: End, high: End): string[] {
  const reasons = [takes.length === 1 ? "One take so far." : `From ${takes.length} takes together.`];
  if (low.held || high.held) reasons.push(`Your ${low.held && high.held ? "lowest and highest notes come" : low.held ? "lowest note comes" : "highest note comes"} from a guided hold.`);
  if (low.capped || high.capped) reasons.push("One take went much farther than all the others, so it counts only in part until another one confirms it.");
  if (takes.some((t) => t.effort !== null)) reasons.push("Your own rating of the effort shaped the comfortable band.");
  else reasons.push("The comfortable band keeps default reserves until you rate how the singing felt.");
  return reasons;
}
