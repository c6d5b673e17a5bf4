import type { HeldNote } from "./hearing/guidedHold";
import { farthest, shownEnds, tuningOf, type GuidedRun } from "./guidedSteps";

/** Half of what held time can give is reached after so many seconds. */
const halfHeldS = 6;
/** Notes that waver by so many cents are half as sure as still ones. */
const halfSteadyCents = 40;
/** An end that the singer called enough; each try beyond it that was not held adds to it. */
const untriedEnd = 0.5;
const surePerMiss = 0.25;

/** How sure the ends are, and what it rests on. */
export interface HoldsEvidence {
  /** singer's common offset from equal temperament in cents, -50 to 50 */
  tuningCents: number;
  /** 0 to 1 */
  certainty: number;
}

/**
 * What held notes say about themselves: the offset is the circular mean of what each note is away from a semitone,
 * weighed by how long it was held; the certainty grows with the time held, with how well the notes agree on that
 * offset, with how steady the two ends were, and with the tries beyond an end that did not hold.
 */
export function holdsEvidence(run: Pick<GuidedRun, "held" | "home" | "misses">): HoldsEvidence {
  const { held, misses } = run;
  const heldS = held.reduce((sum, note) => sum + note.heldS, 0);
  const ends = shownEnds(run);
  const tried = mean(ends.map((end) => Math.min(1, untriedEnd + surePerMiss * misses[end])));
  const wavering = mean(ends.map((end) => farthest(run, end)?.steadinessCents ?? 0));
  const steady = halfSteadyCents / (halfSteadyCents + wavering);
  const certainty = 0.3 * (heldS / (heldS + halfHeldS)) + 0.25 * agreement(held) + 0.2 * steady + 0.25 * tried;
  return { tuningCents: tuningOf(held), certainty: Math.max(0.05, Math.min(0.98, certainty)) };
}

/** How well the notes agree on their offset: 1 where all have the same, near 0 where it is any. */
function agreement(held: readonly HeldNote[]): number {
  let x = 0;
  let y = 0;
  for (const { midi } of held) {
    x += Math.cos(2 * Math.PI * midi);
    y += Math.sin(2 * Math.PI * midi);
  }
  return held.length === 0 ? 0 : Math.hypot(x, y) / held.length;
}

function mean(values: readonly number[]): number {
  return values.length === 0 ? 0 : values.reduce((sum, value) => sum + value, 0) / values.length;
}
