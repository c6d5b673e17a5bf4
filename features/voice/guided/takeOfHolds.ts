import type { Take } from "@/shared/contract/take";
import { noteWord } from "../noteWords";
import { shownEnds, type GuidedFindings, type GuidedRun } from "./guidedSteps";

/** Each end was held for itself, to a known note: a guided hold starts from this certainty, and more held time adds to it. */
const leastCertainty = 0.7;
const mostCertainty = 0.95;

/**
 * A guided way as it is kept: the notes one after the other, what can be held as range, what the singer would use in a
 * song as comfort. Reference tones fix the tuning, so that notes are named as they stand.
 *
 * @throws RangeError if the way showed no end of the voice
 */
export function takeOfHolds(run: GuidedRun, findings: GuidedFindings, voiceId: string): Take {
  const ends = shownEnds(run);
  const [only] = ends;
  if (only === undefined) throw new RangeError("only a way that led to an end can be kept");
  const { notes, heldS } = laidOut(run);
  const all = run.held.map(({ midi }) => midi);
  const range = { lowMidi: Math.min(...all), highMidi: Math.max(...all) };
  const within = (midi: number) => Math.max(range.lowMidi, Math.min(range.highMidi, midi));
  return {
    id: run.id,
    voiceId,
    kind: "hold",
    shows: ends.length === 2 ? "both" : only,
    sungAt: run.startedAt,
    warmedUp: findings.warmedUp,
    effort: findings.effort,
    durationS: Math.min(600, heldS),
    range,
    comfort: { lowMidi: within(findings.singLow), highMidi: within(findings.singHigh) },
    estimate: range,
    tuningCents: 0,
    certainty: leastCertainty + (mostCertainty - leastCertainty) * (heldS / (heldS + 6)),
    reasons: [
      `You held ${notes.length} notes one by one.`,
      `${noteWord(findings.singLow)} to ${noteWord(findings.singHigh)} are the notes you would use in a song.`,
    ],
    notes,
  };
}

function laidOut({ held }: GuidedRun): { notes: Take["notes"]; heldS: number } {
  let at = 0;
  const notes = held.slice(0, 200).map(({ midi, heldS, steadinessCents }) => {
    const start = at;
    at += heldS;
    return { start, end: at, midi, steadinessCents, sustained: true, clear: true };
  });
  return { notes, heldS: at };
}
