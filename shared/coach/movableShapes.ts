import { tonicPitchClass } from "../music/keyName";
import type { Chord } from "../music/chord";
import type { Instrument } from "../instruments/instrument";
import { drawnShape } from "../ways/findShapes";
import { shapeMark } from "../ways/shapeMark";
import { playableShapes } from "../ways/shapeSearch";
import type { Shape } from "../ways/way";

/** A shape without open strings, with where its lowest root lies. */
export interface MovableShape {
  shape: Shape;
  /** index of the string that carries the root */
  rootString: number;
  rootFret: number;
}

/** Highest fret to look at: from there on everything comes again. */
const highest = 13;

/**
 * The shapes of a chord that can be moved along the neck, the fullest for each string that carries the root: those
 * with the root lowest first, then those that sound most strings, then the easier ones.
 *
 * @param chord a parsed chord
 * @param instrument in its tuning
 * @param most how many at most
 * @returns from the nut up; none on a diatonic fretboard, where a moved shape is another chord
 * @throws RangeError if a string's note cannot be read
 * @see common practice: closed shapes move, open strings do not
 */
export function movableShapes(chord: Chord, instrument: Instrument, most: number): MovableShape[] {
  if (instrument.fretMap) return [];
  const closed = playableShapes(chord, instrument, { maxFret: Math.min(highest, instrument.frets) }, ({ frets }) =>
    frets.every((fret) => fret !== 0),
  ).map((playable) => drawnShape(playable, chord, instrument, 0));
  const fullest = closed
    .filter(({ roots }) => roots.length > 0)
    .sort((a, b) => Number(rootLowest(b)) - Number(rootLowest(a)) || sounding(b) - sounding(a) || b.ease - a.ease);
  const found: MovableShape[] = [];
  const marks = new Set<string>();
  const take = (shape: Shape, newRoot: boolean) => {
    const rootString = shape.roots[0]!;
    const mark = shapeMark(shape.frets);
    const known = found.some((each) => each.rootString === rootString);
    if (found.length === most || marks.has(mark) || (newRoot && known)) return;
    marks.add(mark);
    found.push({ shape, rootString, rootFret: shape.frets[rootString]! });
  };
  for (const shape of fullest) take(shape, true);
  for (const shape of fullest) take(shape, false);
  return found.sort((a, b) => lowestFret(a.shape) - lowestFret(b.shape) || a.rootString - b.rootString);
}

/**
 * Where the root goes when a shape is moved to another chord of its kind.
 *
 * @param movable a movable shape
 * @param root of the chord to move to, ASCII
 * @param instrument in its tuning
 * @param open MIDI number of the open string that carries the root
 * @returns frets of that string, ascending, at which the whole shape lies on the neck
 * @throws RangeError if the root is no note name
 */
export function rootFrets(movable: MovableShape, root: string, instrument: Instrument, open: number): number[] {
  const pc = tonicPitchClass(root);
  const stopped = movable.shape.frets.filter((fret): fret is number => fret !== null);
  const [low, high] = [Math.min(...stopped), Math.max(...stopped)];
  return Array.from({ length: instrument.frets }, (_, k) => k + 1).filter((fret) => {
    const by = fret - movable.rootFret;
    return (open + fret) % 12 === pc && low + by >= 1 && high + by <= instrument.frets;
  });
}

function lowestFret({ frets }: Shape): number {
  return Math.min(...frets.map((fret) => fret ?? 99));
}

function sounding({ frets }: Shape): number {
  return frets.filter((fret) => fret !== null).length;
}

function rootLowest({ frets, roots }: Shape): boolean {
  return frets.findIndex((fret) => fret !== null) === roots[0];
}
