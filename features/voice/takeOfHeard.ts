import type { Take } from "@/shared/contract/take";
import type { HeardTake } from "./recorder/recorder";

/**
 * A heard take as it is kept: numbers only, as sung. The sound is not part of it.
 *
 * @throws RangeError if nothing was heard in it
 */
export function takeOfHeard(heard: HeardTake, voiceId: string): Take {
  const { id, sungAt, warmedUp, effort, report } = heard;
  const { range, comfort, estimate } = report;
  if (!range || !comfort || !estimate) throw new RangeError("only a take in which singing was heard can be kept");
  return {
    id,
    voiceId,
    kind: "phrase",
    shows: "both",
    sungAt,
    warmedUp,
    effort,
    durationS: report.durationS,
    range,
    comfort,
    estimate,
    tuningCents: report.tuningCents,
    certainty: report.certainty,
    reasons: report.reasons.slice(0, 20).map((reason) => reason.slice(0, 300)),
    notes: report.notes.slice(0, 2000).map(({ start, end, midi, steadinessCents, sustained, clear }) => ({
      start,
      end,
      midi,
      steadinessCents,
      sustained,
      clear,
    })),
  };
}
