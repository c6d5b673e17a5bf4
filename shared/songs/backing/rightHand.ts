import type { Metre } from "./metre";

/** What the right hand does: strokes all through, a plucked string between strokes, or a bass that changes its note. */
export type RightHand = "strum" | "pluck-and-strum" | "alternating-bass";

/** One thing the hand does in a bar; `at` in quarter notes from its start. */
export interface HandStroke {
  at: number;
  kind: "strum-down" | "strum-up" | "pluck" | "bass-first" | "bass-other";
  /** 0 to 1 */
  level: number;
}

const stroke =
  (kind: HandStroke["kind"], level: number) =>
  (at: number): HandStroke => ({ at, kind, level });
const down = stroke("strum-down", 0.7);
const strong = stroke("strum-down", 0.9);
const up = stroke("strum-up", 0.5);
const pluck = stroke("pluck", 0.8);
const first = stroke("bass-first", 0.8);
const other = stroke("bass-other", 0.75);

/** Each pattern in each metre, as strumming is taught: beginners' patterns of the folk guitar. */
const hands: Record<RightHand, Record<string, readonly HandStroke[]>> = {
  strum: {
    "2/4": [first(0), strong(0), down(1), up(1.5)],
    "3/4": [first(0), strong(0), down(1), up(1.5), down(2), up(2.5)],
    "4/4": [first(0), strong(0), down(1), up(1.5), first(2), up(2.5), down(3), up(3.5)],
    "6/8": [first(0), strong(0), up(1), first(1.5), down(1.5), up(2.5)],
  },
  "pluck-and-strum": {
    "2/4": [first(0), pluck(0), down(1), up(1.5)],
    "3/4": [first(0), pluck(0), down(1), down(2), up(2.5)],
    "4/4": [first(0), pluck(0), down(1), up(1.5), pluck(2), down(3), up(3.5)],
    "6/8": [first(0), pluck(0), down(0.5), up(1), pluck(1.5), down(2), up(2.5)],
  },
  "alternating-bass": {
    "2/4": [first(0), down(0.5), other(1), down(1.5)],
    "3/4": [first(0), down(1), down(2)],
    "4/4": [first(0), down(1), other(2), down(3)],
    "6/8": [first(0), down(0.5), up(1), other(1.5), down(2), up(2.5)],
  },
};

/**
 * What the right hand does in one bar.
 *
 * @param hand which pattern
 * @param metre how the song is counted
 * @param bar number of the bar, from 0: with one bass note a bar, every second bar takes the other one
 * @returns strokes by time; metres without a pattern of their own get a stroke on every beat
 * @see common practice
 */
export function handPattern(hand: RightHand, metre: Metre, bar: number): readonly HandStroke[] {
  const known = hands[hand][metre.name] ?? everyBeat(hand, metre);
  const single = hand === "alternating-bass" && !known.some(({ kind }) => kind === "bass-other");
  return single && bar % 2 === 1 ? known.map((each) => (each.kind === "bass-first" ? other(each.at) : each)) : known;
}

function everyBeat(hand: RightHand, metre: Metre): HandStroke[] {
  const beat = metre.quarters / metre.beats;
  return [first(0)].concat(
    Array.from({ length: metre.beats }, (_, k) => {
      if (k === 0 && hand !== "strum") return pluck(0);
      return metre.strong.includes(k) ? strong(k * beat) : down(k * beat);
    }),
  );
}
