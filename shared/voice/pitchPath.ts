import type { CandidateFrame, PitchCandidate } from "./pitchCandidates";

/** The pitch decided for one frame. */
interface PathPoint {
  /** null where unvoiced */
  candidate: PitchCandidate | null;
}

/** Costs of the best-path search; semitones are per frame of 10 ms. */
const COST = {
  perSemitone: 0.12,
  mostForAJump: 0.9,
  voicing: 0.35,
  unvoiced: 0.66,
  absent: 0.4,
  presentFrom: 0.6,
  perOctaveDown: 0.08,
  soft: 0.8,
};

/** A best-path search that is fed frame by frame. */
export interface PathFinder {
  push(frame: CandidateFrame): void;
  /** @returns the state of the best path `back` frames before the newest, or null before the start */
  decide(back: number): PathPoint | null;
  /** @returns the whole best path */
  path(): PathPoint[];
}

/**
 * Viterbi search over the candidates of each frame and the unvoiced state.
 * A jump costs by its size in semitones per 10 ms, up to a cap, so that one weak frame cannot flip an octave.
 *
 * @param keep how many frames of history to keep; Infinity for a whole take
 * @see A. Viterbi, IEEE Trans. Inf. Theory 13(2) 1967; P. Boersma, IFA Proc. 17, 1993 (path through candidates)
 */
export function createPathFinder(keep = Infinity): PathFinder {
  let columns: { states: (PitchCandidate | null)[]; from: Int16Array }[] = [];
  let totals = new Float64Array(1);
  let states: (PitchCandidate | null)[] = [null];

  return {
    push(frame) {
      const next: (PitchCandidate | null)[] = [null, ...frame.candidates];
      const from = new Int16Array(next.length);
      const sums = new Float64Array(next.length);
      for (let j = 0; j < next.length; j++) {
        const to = next[j]!;
        let best = Infinity;
        for (let i = 0; i < states.length; i++) {
          const sum = totals[i]! + transition(states[i]!, to);
          if (sum < best) {
            best = sum;
            from[j] = i;
          }
        }
        sums[j] = best + local(to, frame);
      }
      let least = Infinity;
      for (const sum of sums) least = Math.min(least, sum);
      totals = sums.map((sum) => sum - least);
      states = next;
      columns.push({ states: next, from });
      if (columns.length > 2 * keep + 64) columns = columns.slice(-keep - 1);
    },
    decide(back) {
      if (back >= columns.length) return null;
      let state = bestState(totals);
      for (let i = columns.length - 1; i > columns.length - 1 - back; i--) state = columns[i]!.from[state]!;
      return { candidate: columns[columns.length - 1 - back]!.states[state] ?? null };
    },
    path() {
      const out: PathPoint[] = new Array(columns.length);
      let state = bestState(totals);
      for (let i = columns.length - 1; i >= 0; i--) {
        out[i] = { candidate: columns[i]!.states[state] ?? null };
        state = columns[i]!.from[state]!;
      }
      return out;
    },
  };
}

function bestState(totals: Float64Array): number {
  let best = 0;
  for (let i = 1; i < totals.length; i++) if (totals[i]! < totals[best]!) best = i;
  return best;
}

function transition(from: PitchCandidate | null, to: PitchCandidate | null): number {
  if (from === null && to === null) return 0;
  if (from === null || to === null) return COST.voicing;
  return Math.min(COST.mostForAJump, COST.perSemitone * Math.abs(from.midi - to.midi));
}

function local(candidate: PitchCandidate | null, frame: CandidateFrame): number {
  if (candidate === null) return COST.unvoiced;
  const softness = Math.max(0, 1 - Math.max(0, frame.aboveRoomDb - 1) / 4);
  return (
    haze(candidate.clarity) +
    COST.perOctaveDown * ((100 - candidate.midi) / 12) * 0.5 +
    COST.absent * Math.max(0, 1 - candidate.presence / COST.presentFrom) +
    COST.soft * softness
  );
}

/** Cost of imperfect repetition: steep near 1, where octave errors are decided, flat below. */
function haze(clarity: number): number {
  return 0.5 * (1 + Math.log10(Math.max(0.01, 1.03 - clarity)) / 1.5) + 0.9 * Math.max(0, 1 - clarity) * 0.5;
}
