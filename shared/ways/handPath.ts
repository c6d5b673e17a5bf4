import { fretPosition } from "../instruments/frets";
import type { Instrument } from "../instruments/instrument";
import { easeOf, shapeCost } from "./shapeEase";
import type { ShapeStock } from "./shapeLibrary";
import type { Shape } from "./way";

/** One chord on the way through a song. */
export interface PathChord {
  /** its fingerings; null for what is no chord ("N.C."), which costs nothing */
  stock: ShapeStock | null;
  /** true if the player knows the usual shape of this name, false if not, null if nothing is known of the player */
  known: boolean | null;
}

/** A line of shapes through a song. */
export interface HandPath {
  /** one per chord; null where the instrument cannot play it */
  shapes: (Shape | null)[];
  /** cost of the whole, on the scale of one shape's cost, without any preference */
  cost: number;
  /** strings under barres, in full six-string barres */
  barres: number;
}

/** Moving the hand this far between two chords costs 1. */
const tiringTravelMm = 250;
/** A chord that cannot be played costs as much as two full barres. */
const unplayableCost = 8;
/** What a barre over six strings costs on top at full dislike; over fewer less. */
const barreDislike = 2;
const fullBarre = 6;
const unfamiliarCost = 0.8;
const familiarFactor = 0.6;

interface Step {
  shape: Shape | null;
  cost: number;
  barres: number;
  weighed: number;
  /** mm from the nut of the lowest stopped fret; null where the hand is free */
  handMm: number | null;
}

/**
 * Chooses one shape for each chord so that shapes and hand travel together cost least.
 *
 * @param chords in the order of the song
 * @param instrument for lengths
 * @param capo fret of the capo, 0 for none
 * @param barre dislike of barres, 0 to 1
 * @returns shapes, cost and barres
 * @see S. Sayegh, Computer Music Journal 13(3), 1989: fingering as the optimum path
 */
export function handPath(chords: readonly PathChord[], instrument: Instrument, capo: number, barre: number): HandPath {
  const layers = chords.map((chord) => layerOf(chord, instrument, capo, barre));
  let totals: number[] = [];
  const cameFrom: number[][] = [];
  layers.forEach((layer, k) => {
    const before = layers[k - 1];
    const origins: number[] = [];
    totals = layer.map((step) => {
      if (!before) return step.weighed;
      let best = Infinity;
      let origin = 0;
      before.forEach((last, j) => {
        const total = totals[j]! + travelCost(last, step);
        if (total < best) {
          best = total;
          origin = j;
        }
      });
      origins.push(origin);
      return best + step.weighed;
    });
    cameFrom.push(origins);
  });
  let at = totals.indexOf(Math.min(...totals));
  const line: Step[] = [];
  for (let k = layers.length - 1; k >= 0; k--) {
    line.unshift(layers[k]![at]!);
    at = cameFrom[k]![at] ?? 0;
  }
  return summary(line);
}

function layerOf({ stock, known }: PathChord, instrument: Instrument, capo: number, barre: number): Step[] {
  if (!stock) return [{ shape: null, cost: 0, barres: 0, weighed: 0, handMm: null }];
  const shrink = 2 ** (-capo / 12);
  const steps = stock.shapes.flatMap(({ shape, load }, rank): Step[] => {
    const highest = Math.max(...shape.frets.map((fret) => fret ?? 0));
    if (highest + capo > instrument.frets) return [];
    const reachMm = Math.round(shape.reachMm * shrink * 10) / 10;
    const plain = shapeCost(load, reachMm, capo);
    const familiar = known === true && rank === 0 ? plain * familiarFactor : plain;
    const cost = known === false ? familiar + unfamiliarCost : familiar;
    const handMm = load.lowestFret === 0 ? null : fretPosition(instrument.scaleMm, capo + load.lowestFret);
    const barres = load.barreStrings / fullBarre;
    const weighed = cost + barre * barreDislike * barres;
    return [{ shape: { ...shape, reachMm, ease: easeOf(plain) }, cost, barres, weighed, handMm }];
  });
  if (steps.length > 0) return steps;
  return [{ shape: null, cost: unplayableCost, barres: 0, weighed: unplayableCost, handMm: null }];
}

function travelCost(from: Step, to: Step): number {
  if (from.handMm === null || to.handMm === null) return 0;
  return Math.abs(to.handMm - from.handMm) / tiringTravelMm;
}

function summary(line: readonly Step[]): HandPath {
  const shapes = line.map(({ shape }) => shape);
  if (line.length === 0) return { shapes, cost: 0, barres: 0 };
  const sum = line.reduce((total, { cost }) => total + cost, 0);
  const hardest = Math.max(...line.map(({ cost }) => cost));
  const travel = line.slice(1).reduce((total, step, k) => total + travelCost(line[k]!, step), 0);
  const cost = (0.7 * sum + travel) / line.length + 0.3 * hardest;
  return { shapes, cost, barres: line.reduce((total, step) => total + step.barres, 0) };
}
