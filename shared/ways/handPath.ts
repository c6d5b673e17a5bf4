import type { SongFlow } from "./songFlow";

/** One fingering that a chord may be played with. */
export interface HandOption {
  /** cost of the fingering itself */
  cost: number;
  /** what the player's wishes add to it */
  dislike: number;
  /** mm from nut or capo to the first finger; null where the hand is free */
  handMm: number | null;
}

/** One fingering for each chord. */
export interface HandPath {
  /** index of the option taken, per chord */
  taken: number[];
  /** what it costs as a whole, wishes included */
  total: number;
}

/** Moving the hand this far between two chords costs 1. */
const tiringTravelMm = 250;
/** Shares of the whole: all shapes as often as they come, and the hardest alone. */
const share = { shapes: 0.7, hardest: 0.3 };
/** Branches looked at before the best line found so far is taken: far more than any song has been seen to need. */
const mostBranches = 50_000;

/**
 * What a line of fingerings costs a song through: shapes as often as they come, the hardest of them, and the way of the
 * hand from each chord to the next.
 *
 * @param line one option per chord
 * @param flow how the song goes through its chords
 * @returns cost without wishes and with them, on the scale of one shape's cost
 */
export function lineCost(line: readonly HandOption[], flow: SongFlow): { plain: number; total: number } {
  if (line.length === 0) return { plain: 0, total: 0 };
  let shapes = 0;
  let dislikes = 0;
  let hardest = 0;
  line.forEach(({ cost, dislike }, k) => {
    shapes += flow.times[k]! * cost;
    dislikes += flow.times[k]! * dislike;
    hardest = Math.max(hardest, cost);
  });
  const travel = travelMm(line, flow) / tiringTravelMm;
  const plain = (share.shapes * shapes + travel) / flow.played + share.hardest * hardest;
  return { plain, total: plain + dislikes / flow.played };
}

/**
 * How far the hand travels along the neck, the song through.
 *
 * @param line one option per chord
 * @param flow how the song goes through its chords
 * @returns mm; a change to or from open strings alone counts nothing, for the hand is free
 */
export function travelMm(line: readonly Pick<HandOption, "handMm">[], flow: SongFlow): number {
  let sum = 0;
  for (let a = 1; a < line.length; a++)
    for (let b = 0; b < a; b++) {
      const changes = flow.changes[a]![b]!;
      if (changes > 0) sum += changes * distance(line[a]!.handMm, line[b]!.handMm);
    }
  return sum;
}

/**
 * Chooses one fingering for each chord so that shapes, hand travel in the song's own order, and wishes together cost
 * least. Every line is weighed: branches are left only where no line in them can be better.
 *
 * @param chords the options of each chord, at least one each
 * @param flow how the song goes through its chords
 * @returns the line that costs least
 * @see S. Sayegh, Computer Music Journal 13(3), 1989: fingering as the optimum path
 */
export function handPath(chords: readonly (readonly HandOption[])[], flow: SongFlow): HandPath {
  if (chords.length === 0) return { taken: [], total: 0 };
  const search = new LineSearch(chords, flow);
  return search.run();
}

function distance(a: number | null, b: number | null): number {
  return a === null || b === null ? 0 : Math.abs(a - b);
}

interface Choice {
  index: number;
  cost: number;
  /** its part of the total, without travel and the hardest shape's share */
  own: number;
  handMm: number | null;
}

/** A depth-first search with bounds. */
class LineSearch {
  private readonly choices: Choice[][];
  /** the chords that weigh most come first */
  private readonly order: number[];
  private readonly line: (Choice | null)[];
  private best: Choice[] = [];
  private bestTotal = Infinity;
  private branches = 0;

  constructor(
    chords: readonly (readonly HandOption[])[],
    private readonly flow: SongFlow,
  ) {
    this.choices = chords.map((options, chord) => this.worthTaking(options, chord));
    this.line = chords.map(() => null);
    this.order = chords.map((_, k) => k).sort((a, b) => flow.times[b]! - flow.times[a]! || a - b);
  }

  run(): HandPath {
    let hardest = 0;
    for (const choices of this.choices) hardest = Math.max(hardest, Math.min(...choices.map(({ cost }) => cost)));
    this.walk(0, 0, hardest);
    return { taken: this.best.map(({ index }) => index), total: this.bestTotal };
  }

  /** Without options that another one beats wherever the neighbours' hands are: going there first costs less. */
  private worthTaking(options: readonly HandOption[], chord: number): Choice[] {
    const { times, changes, played } = this.flow;
    const perMm = changes[chord]!.reduce((sum, count) => sum + count, 0) / played / tiringTravelMm;
    const choices = options.map(({ cost, dislike, handMm }, index): Choice => {
      return { index, cost, own: (times[chord]! * (share.shapes * cost + dislike)) / played, handMm };
    });
    const beaten = (choice: Choice, k: number) =>
      choices.some((other, j) => {
        if (j === k || other.cost > choice.cost || (choice.handMm === null && other.handMm !== null)) return false;
        const total = other.own + perMm * distance(other.handMm, choice.handMm);
        return total < choice.own || (total === choice.own && j < k);
      });
    return choices.filter((choice, k) => !beaten(choice, k)).sort((a, b) => a.own - b.own || a.index - b.index);
  }

  /** Lays down the next chord; `spent` is the total so far, `hardest` the least that the hardest shape can be. */
  private walk(depth: number, spent: number, hardest: number): void {
    if (depth === this.order.length) {
      const total = spent + share.hardest * hardest;
      if (total >= this.bestTotal) return;
      this.bestTotal = total;
      this.best = this.line.map((choice) => choice!);
      return;
    }
    if (spent + this.rest(depth) + share.hardest * hardest >= this.bestTotal) return;
    const chord = this.order[depth]!;
    const next = this.choices[chord]!.map((choice) => ({ choice, sum: choice.own + this.travelTo(chord, choice) }));
    if (next.length > 1) next.sort((a, b) => a.sum - b.sum);
    for (const { choice, sum } of next) {
      if (this.branches++ > mostBranches && this.best.length > 0) return;
      this.line[chord] = choice;
      this.walk(depth + 1, spent + sum, Math.max(hardest, choice.cost));
    }
    this.line[chord] = null;
  }

  /** The least that the chords not yet laid down can cost, seen from those that are. */
  private rest(depth: number): number {
    let sum = 0;
    for (let k = depth; k < this.order.length; k++) {
      const chord = this.order[k]!;
      let least = Infinity;
      for (const choice of this.choices[chord]!) {
        if (choice.own >= least) break;
        const cost = choice.own + this.travelTo(chord, choice);
        if (cost < least) least = cost;
      }
      sum += least;
    }
    return sum;
  }

  private travelTo(chord: number, choice: Choice): number {
    if (choice.handMm === null) return 0;
    const changes = this.flow.changes[chord]!;
    let mm = 0;
    for (let other = 0; other < changes.length; other++) {
      const laid = this.line[other];
      if (laid && changes[other]! > 0) mm += changes[other]! * distance(choice.handMm, laid.handMm);
    }
    return mm / this.flow.played / tiringTravelMm;
  }
}
