import { glyphs } from "../music/pitch";
import type { Instrument } from "./instrument";
import { isWound, tensionChanges, totalTension, type TensionChange, type TensionTotal } from "./tension";
import { listWords } from "../music/listWords";

/** One turn at a peg. */
interface RetuneStep {
  /** place in the instrument's strings */
  string: number;
  from: string;
  to: string;
  direction: "down" | "up";
}

/** A retune in full: every string, in which order, why, and what to beware of. */
export interface RetunePlan {
  changes: TensionChange[];
  total: TensionTotal;
  steps: RetuneStep[];
  /** why in this order; empty where nothing is turned */
  reasons: string[];
  cautions: string[];
  /** no string is taken beyond its limit */
  safe: boolean;
}

/** The heaviest ordinary set at its pitch, 13-56 in phosphor bronze on a six-string: 188.8 lb. */
const heaviestSetLb = 188.8;

/**
 * Plans a retune: strings to let down come first, so that the neck never bears more than it must, and from the outside
 * to the inside, so that it is relieved evenly; then those to bring up, in the same manner.
 *
 * @param instrument in its present tuning
 * @param shifts whole semitones, negative for down: one for all strings alike, or one for each
 * @returns changes, totals, order, reasons and cautions
 * @throws RangeError if a string has no readable note, or a shift is missing or not whole
 * @see common practice for the order and the settling; D'Addario's chart 13934 for the heaviest set
 */
export function planRetune(instrument: Instrument, shifts: number | readonly number[]): RetunePlan {
  const changes = tensionChanges(instrument, shifts);
  const total = totalTension(changes);
  const alternating = outsideIn(changes.length);
  const turned = (direction: RetuneStep["direction"]) =>
    alternating.flatMap((string): RetuneStep[] => {
      const { string: from, to, semitones } = changes[string]!;
      const matches = direction === "down" ? semitones < 0 : semitones > 0;
      return matches ? [{ string, from, to, direction }] : [];
    });
  const down = turned("down");
  const up = turned("up");
  return {
    changes,
    total,
    steps: [...down, ...up],
    reasons: reasonsFor(down.length, up.length),
    cautions: cautionsFor(instrument, changes, total),
    safe: changes.every(({ verdict }) => verdict !== "unsafe"),
  };
}

/** Places 0, n-1, 1, n-2 and so on. */
function outsideIn(count: number): number[] {
  return Array.from({ length: count }, (_, k) => (k % 2 === 0 ? k / 2 : count - 1 - (k - 1) / 2));
}

function reasonsFor(down: number, up: number): string[] {
  if (down + up === 0) return [];
  return [
    ...(down > 0 && up > 0 ? ["Let strings down first: the neck then never bears more than it does now."] : []),
    ...(down + up > 2 ? ["Low and high side in turn, so that the neck is pulled evenly."] : []),
    ...(down > 0
      ? ["Let each string a little below its note and come up to it, so that it does not slip afterwards."]
      : []),
    ...(up > 0 ? ["Bring strings up by half a semitone at a time, all of them, then again."] : []),
    ...(down + up > 1
      ? ["Then go round again in the same order: each turn moves the others while the neck settles."]
      : []),
  ];
}

function cautionsFor(instrument: Instrument, changes: readonly TensionChange[], total: TensionTotal): string[] {
  const named = (wanted: (change: TensionChange, k: number) => boolean) => {
    return listWords(changes.flatMap((change, k) => (wanted(change, k) ? [glyphs(change.string)] : [])));
  };
  const plain = named(({ verdict, load }) => verdict === "unsafe" && load !== null);
  const others = named(({ verdict, load }) => verdict === "unsafe" && load === null);
  const slack = named(({ verdict }) => verdict === "slack");
  const kept = named(({ verdict, semitones }) => verdict === "tight" && semitones <= 0);
  const unknown = named(({ beforeLb }) => beforeLb === null);
  const cautions: string[] = [];
  if (plain !== "") cautions.push(`Not for ${plain}: above 75 % of what the weakest wire of that gauge bears.`);
  if (others !== "") cautions.push(`Not for ${others}: more than a semitone above the note the string was made for.`);
  if (changes.some(({ semitones }) => semitones > 0))
    cautions.push("A string can snap: eyes away, bring it up slowly, and check the maker's limits.");
  if (total.afterLb > heaviestSetLb && total.afterLb > total.beforeLb)
    cautions.push("The whole pull is above that of the heaviest ordinary set; ask the maker what the neck may bear.");
  if (kept !== "") cautions.push(`${kept} stays above the note it was made for; a lighter string would be at ease.`);
  if (slack !== "")
    cautions.push(
      `${slack} falls below 72 % of its own tension: it buzzes and frets sharp unless you put on a heavier one.`,
    );
  if (unknown !== "") cautions.push(`The gauge of ${unknown} is not known, so semitones alone decide there.`);
  else if (instrument.strings.some(({ material }) => isWound(material)))
    cautions.push("Computed from gauges; other makers' strings differ by about 5 %, wound ones by 8 %.");
  return cautions;
}
