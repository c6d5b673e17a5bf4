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
  /** which ends of the voice it speaks for, where it looked for one only; both where not said */
  shows?: "both" | "low" | "high";
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
const HALF_LIFE_DAYS = 180;
const TRUSTED = 0.6;
/** A trusted guided hold decides an end of the range against phrases that went at most this much farther, in semitones. */
const HOLD_WINS_WITHIN = 2;
/** Reserve that stays under the highest (and over the lowest) note of a take that felt easy, in semitones. */
const EASY_RESERVE = 1;
/** What each step of effort above 3 takes off the comfortable band, in semitones. */
const HARD_STEP_TOP = 1;
const HARD_STEP_BOTTOM = 0.5;

/**
 * The voice that several takes show together, merged by evidence and age.
 *
 * Each end of the range comes from the takes that speak for it: the outermost believed note; an end shown by one take
 * only moves at most 4 semitones beyond what the others show, unless that take was a guided hold heard with a certainty
 * of 0.6 or more. Such a hold also decides an end against phrases that went up to 2 semitones farther. Each end of the
 * comfortable band is the mean of those takes, weighed by certainty and age (half after 180 days); a take that felt easy
 * (1 or 2) counts up to one semitone inside what was sung, one that felt hard (4 or 5) loses a semitone a step at the
 * top and half of one at the bottom. Effort never changes a take's weight, so that a harder rating can never widen the
 * band. A function of the set of takes only: order does not matter, and leaving a take out gives what was before it.
 *
 * @param takes heard takes of one voice, any order
 * @returns the profile, comfort inside range inside estimate; null without takes
 * @throws RangeError if a take has an unreadable time
 * @see Lamarche, Ternström, Pabon, J. Voice 2010 (what can be held and what is used in song differ)
 */
export function mergeTakes(takes: readonly ProfileTake[]): VoiceProfile | null {
  if (takes.length === 0) return null;
  // Summed in the order of ids, so that the order of takes changes not even the last bit.
  const sorted = [...takes].sort((a, b) => (a.id < b.id ? -1 : a.id > b.id ? 1 : 0));
  const newest = Math.max(...sorted.map(timeOf));
  const forLow = speakingFor(sorted, "low");
  const forHigh = speakingFor(sorted, "high");
  const apart: [End, End] = [bothEnds(forLow)[0], bothEnds(forHigh)[1]];
  const [low, high] = apart[0].midi <= apart[1].midi ? apart : bothEnds(sorted);
  const range = { lowMidi: low.midi, highMidi: high.midi };
  const mean = (list: readonly ProfileTake[], of: (take: ProfileTake) => number) => weighedMean(list, newest, of);
  const doubt = sorted.reduce((product, take) => product * (1 - 0.7 * take.certainty), 1);
  const best = Math.max(...sorted.map((t) => t.certainty));
  return {
    range,
    comfort: inside(range, { lowMidi: mean(forLow, easyLow), highMidi: mean(forHigh, easyHigh) }),
    estimate: {
      // Where the end itself was looked for, nothing is left to estimate.
      lowMidi: low.held
        ? low.midi
        : Math.min(
            low.midi,
            mean(forLow, (take) => take.estimate.lowMidi),
          ),
      highMidi: high.held
        ? high.midi
        : Math.max(
            high.midi,
            mean(forHigh, (take) => take.estimate.highMidi),
          ),
    },
    certainty: Math.min(0.98, Math.max(best, 1 - doubt)),
    lowFrom: low.id,
    highFrom: high.id,
    reasons: reasonsFor(sorted, low, high),
  };
}

/** Where no take speaks for an end, all of them have to. */
function speakingFor(takes: readonly ProfileTake[], end: "low" | "high"): readonly ProfileTake[] {
  const some = takes.filter(({ shows = "both" }) => shows === "both" || shows === end);
  return some.length > 0 ? some : takes;
}

interface End {
  midi: number;
  id: string;
  held: boolean;
  capped: boolean;
}

/** Two takes far apart would each cap the other past the middle; then both count whole. */
function bothEnds(takes: readonly ProfileTake[]): [End, End] {
  const ends = (most: number): [End, End] => [
    outerEnd(takes, (t) => t.range.lowMidi, -1, most),
    outerEnd(takes, (t) => t.range.highMidi, 1, most),
  ];
  const capped = ends(MOST_BY_ONE_TAKE);
  return capped[0].midi <= capped[1].midi ? capped : ends(Infinity);
}

/** @param side -1 for the low end, 1 for the high end */
function outerEnd(
  takes: readonly ProfileTake[],
  midiOf: (take: ProfileTake) => number,
  side: -1 | 1,
  most: number,
): End {
  const outward = [...takes].sort((a, b) => side * (midiOf(b) - midiOf(a)) || (a.id < b.id ? -1 : 1));
  const first = outward[0]!;
  const second = outward[1];
  const hold = outward.find((t) => t.hold === true && t.certainty >= TRUSTED);
  if (hold && hold !== first && side * (midiOf(first) - midiOf(hold)) <= HOLD_WINS_WITHIN)
    return { midi: midiOf(hold), id: hold.id, held: true, capped: false };
  const sure = first.hold === true && first.certainty >= TRUSTED;
  const limit = second === undefined || sure ? Infinity : side * midiOf(second) + most;
  const capped = side * midiOf(first) > limit;
  return { midi: capped ? side * limit : midiOf(first), id: first.id, held: first.hold === true, capped };
}

function easyLow({ effort, comfort, range }: ProfileTake): number {
  if (effort !== null && effort <= 2) return Math.min(comfort.lowMidi, range.lowMidi + EASY_RESERVE);
  return comfort.lowMidi + HARD_STEP_BOTTOM * Math.max(0, (effort ?? 3) - 3);
}

function easyHigh({ effort, comfort, range }: ProfileTake): number {
  if (effort !== null && effort <= 2) return Math.max(comfort.highMidi, range.highMidi - EASY_RESERVE);
  return comfort.highMidi - HARD_STEP_TOP * Math.max(0, (effort ?? 3) - 3);
}

function timeOf(take: ProfileTake): number {
  const time = Date.parse(take.sungAt);
  if (Number.isNaN(time)) throw new RangeError("sungAt must be an ISO time");
  return time;
}

function weighedMean(takes: readonly ProfileTake[], newest: number, valueOf: (take: ProfileTake) => number): number {
  let sum = 0;
  let whole = 0;
  for (const take of takes) {
    const days = (newest - timeOf(take)) / 86_400_000;
    const weight = (0.05 + take.certainty) * 2 ** (-days / HALF_LIFE_DAYS);
    sum += weight * valueOf(take);
    whole += weight;
  }
  return whole > 0 ? sum / whole : valueOf(takes[0]!);
}

/** Ends that hard singing pushed past each other meet halfway. */
function inside(range: PitchBand, { lowMidi, highMidi }: PitchBand): PitchBand {
  const clamp = (midi: number) => Math.max(range.lowMidi, Math.min(range.highMidi, midi));
  if (lowMidi <= highMidi) return { lowMidi: clamp(lowMidi), highMidi: clamp(highMidi) };
  const middle = clamp((lowMidi + highMidi) / 2);
  return { lowMidi: middle, highMidi: middle };
}

function reasonsFor(takes: readonly ProfileTake[], low: End, high: End): string[] {
  const reasons = [takes.length === 1 ? "One take so far." : `From ${takes.length} takes together.`];
  if (low.held || high.held)
    reasons.push(
      `Your ${low.held && high.held ? "lowest and highest notes come" : low.held ? "lowest note comes" : "highest note comes"} from a guided hold.`,
    );
  if (low.capped || high.capped)
    reasons.push(
      "One take went much farther than all the others, so it counts only in part until another one confirms it.",
    );
  if (takes.some((t) => t.effort !== null)) reasons.push("Your own rating of the effort shaped the comfortable band.");
  else reasons.push("The comfortable band keeps default reserves until you say how the singing felt.");
  return reasons;
}
