import type { PitchBand } from "./takeReport";
import { HALF_LIFE_DAYS, mergeTakes, type ProfileTake, type VoiceProfile } from "./voiceProfile";

/** A take that may speak for one end of the voice only: a guided hold that looked for one. */
export interface ShownTake extends ProfileTake {
  /** which ends it speaks for; both where not said */
  shows?: "both" | "low" | "high";
}

/** Reserve that stays under the highest (and over the lowest) note of a take that felt easy, in semitones. */
const EASY_RESERVE = 1;
/** What each step of effort above 3 takes off the comfortable band, in semitones. */
const HARD_STEP_TOP = 1;
const HARD_STEP_BOTTOM = 0.5;

/**
 * The voice that several takes show together. Each end of the range is merged by `mergeTakes` from the takes that
 * speak for it. Each end of the comfortable band is their mean, weighed by certainty and age (half after 180 days);
 * a take that felt easy (1 or 2) counts up to one semitone inside what was sung, one that felt hard (4 or 5) loses a
 * semitone a step at the top and half of one at the bottom. Effort never changes a take's weight, so that a harder
 * rating can never widen the band. A function of the set of takes only.
 *
 * @param takes heard takes of one voice, any order
 * @returns the profile, comfort inside range inside estimate; null without takes
 * @throws RangeError if a take has an unreadable time
 * @see Lamarche, Ternström, Pabon, J. Voice 2010 (what can be held and what is used in song differ)
 */
export function voiceOfTakes(takes: readonly ShownTake[]): VoiceProfile | null {
  const whole = mergeTakes(takes);
  if (!whole) return null;
  const forLow = speakingFor(takes, "low");
  const forHigh = speakingFor(takes, "high");
  const low = mergeTakes(forLow)!;
  const high = mergeTakes(forHigh)!;
  const fits = low.range.lowMidi <= high.range.highMidi;
  const range = fits ? { lowMidi: low.range.lowMidi, highMidi: high.range.highMidi } : whole.range;
  const newest = Math.max(...takes.map(({ sungAt }) => Date.parse(sungAt)));
  const mean = (list: readonly ShownTake[], of: (take: ShownTake) => number) => weighedMean(list, newest, of);
  // Where the end itself was looked for, nothing is left to estimate.
  const held = (id: string) => takes.some((take) => take.id === id && take.hold === true);
  return {
    range,
    comfort: inside(range, { lowMidi: mean(forLow, easyLow), highMidi: mean(forHigh, easyHigh) }),
    estimate: {
      lowMidi: held(low.lowFrom)
        ? range.lowMidi
        : Math.min(
            range.lowMidi,
            mean(forLow, (take) => take.estimate.lowMidi),
          ),
      highMidi: held(high.highFrom)
        ? range.highMidi
        : Math.max(
            range.highMidi,
            mean(forHigh, (take) => take.estimate.highMidi),
          ),
    },
    certainty: whole.certainty,
    lowFrom: fits ? low.lowFrom : whole.lowFrom,
    highFrom: fits ? high.highFrom : whole.highFrom,
    reasons: reasonsFor(takes),
  };
}

/** Where no take speaks for an end, all of them have to. */
function speakingFor(takes: readonly ShownTake[], end: "low" | "high"): readonly ShownTake[] {
  const some = takes.filter(({ shows = "both" }) => shows === "both" || shows === end);
  return some.length > 0 ? some : takes;
}

function easyLow({ effort, comfort, range }: ShownTake): number {
  if (effort !== null && effort <= 2) return Math.min(comfort.lowMidi, range.lowMidi + EASY_RESERVE);
  return comfort.lowMidi + HARD_STEP_BOTTOM * Math.max(0, (effort ?? 3) - 3);
}

function easyHigh({ effort, comfort, range }: ShownTake): number {
  if (effort !== null && effort <= 2) return Math.max(comfort.highMidi, range.highMidi - EASY_RESERVE);
  return comfort.highMidi - HARD_STEP_TOP * Math.max(0, (effort ?? 3) - 3);
}

/** Summed in the order of ids, so that the order of takes changes not even the last bit. */
function weighedMean(takes: readonly ShownTake[], newest: number, valueOf: (take: ShownTake) => number): number {
  let sum = 0;
  let whole = 0;
  for (const take of [...takes].sort((a, b) => (a.id < b.id ? -1 : 1))) {
    const days = (newest - Date.parse(take.sungAt)) / 86_400_000;
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

function reasonsFor(takes: readonly ShownTake[]): string[] {
  return [
    takes.length === 1 ? "One take so far." : `From ${takes.length} takes together.`,
    takes.some(({ effort }) => effort !== null)
      ? "Your own rating of the effort shaped the comfortable band."
      : "The comfortable band keeps default reserves until you say how the singing felt.",
  ];
}
