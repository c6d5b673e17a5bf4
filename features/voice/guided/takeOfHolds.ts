import type { Take } from "@/shared/contract/take";
import { noteWord } from "../noteWords";
import { holdsEvidence } from "./holdsEvidence";
import { shownEnds, type GuidedEnd, type GuidedFindings, type GuidedRun } from "./guidedSteps";

/**
 * A guided way as it is kept: the notes one after the other, what can be held as range, what the singer would use in a
 * song as comfort. All are kept as sung, with the singer's own offset beside them, as in a phrase.
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
  const { tuningCents, certainty } = holdsEvidence(run);
  const asSung = (named: number) => within(named + tuningCents / 100);
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
    comfort: { lowMidi: asSung(findings.singLow), highMidi: asSung(findings.singHigh) },
    estimate: range,
    tuningCents,
    certainty,
    reasons: [
      `You held ${notes.length} notes one by one, ${heldS.toFixed(1)} seconds in all.`,
      ...ends.map((end) => endWords(end, run.misses[end])),
      `${noteWord(findings.singLow)} to ${noteWord(findings.singHigh)} are the notes you would use in a song.`,
      ...(run.under16 ? ["You are under 16: this was the range of that week, and it moves."] : []),
    ],
    notes,
  };
}

function endWords(end: GuidedEnd, misses: number): string {
  const name = end === "low" ? "lowest" : "highest";
  if (misses === 0) return `You called your ${name} note enough; nothing beyond it was tried.`;
  return `Beyond your ${name} note ${misses === 1 ? "one more try" : `${misses} more tries`} did not hold.`;
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
