import { tonicPitchClass } from "../music/keyName";
import type { Chord } from "../music/chord";
import { fretPosition, fretSemitones } from "../instruments/frets";
import type { Instrument } from "../instruments/instrument";
import { shapeCost } from "./shapeEase";
import { playableShapes, type PlayableShape } from "./shapeSearch";

/** A fingering with what it costs wherever it is played. */
export interface StockShape extends PlayableShape {
  /** cost without a capo, and softer at the low frets under one */
  cost: { bare: number; underCapo: number };
  /** mm from nut or capo to the lowest stopped fret, capo at the nut; null where the hand is free */
  handMm: number | null;
}

/** The fingerings of one chord within an octave of nut or capo. */
export interface ShapeStock {
  /**
   * all but those that another one at the same place of the neck beats in everything that is ever weighed: cost, barre,
   * open strings, frets needed
   */
  shapes: readonly StockShape[];
  /** every one there is, for players who know shapes that others would not choose; searched when first asked for */
  every: () => readonly StockShape[];
  /** the one that costs least, which is what players mean by the chord's name; null where there is none */
  usual: StockShape | null;
  /** true if a bass was asked for that the instrument cannot put lowest */
  withoutBass: boolean;
}

/** All that is known of one neck: stocks by chord. */
export type NeckStock = Map<string, ShapeStock>;

/** Highest fret to look at for accompanying, counted from nut or capo: from there on everything comes again. */
export const highestUsedFret = 12;
/** Chords, over all necks, that are remembered before starting over. */
const remembered = 800;

const library = new Map<string, NeckStock>();
let held = 0;

/**
 * What is known of a neck with a capo on. On chromatic frets all places of the capo are one neck.
 *
 * @param instrument tuning, scale and frets
 * @param capo fret of the capo, 0 for none
 * @returns its stocks so far, to be filled by {@link stockOf}
 */
export function neckStock(instrument: Instrument, capo: number): NeckStock {
  if (held > remembered) forgetShapes();
  const key = JSON.stringify([
    instrument.strings.map(({ note, startsAtFret }) => [note, startsAtFret]),
    instrument.scaleMm,
    instrument.frets,
    instrument.fretMap ? [instrument.fretMap, capo] : null,
  ]);
  const known = library.get(key);
  if (known) return known;
  const fresh: NeckStock = new Map();
  library.set(key, fresh);
  return fresh;
}

/** Forgets every shape that was ever searched, as if nothing had been asked yet: for measuring how long a first search takes. */
export function forgetShapes(): void {
  library.clear();
  held = 0;
}

/**
 * Every fingering of a chord within an octave of nut or capo. Remembers its answers: they depend on the arguments alone.
 *
 * @param chord a parsed chord
 * @param instrument tuning, scale and frets
 * @param neck what is known of this instrument's neck
 * @param capo fret of the capo; of weight on diatonic fretboards only
 * @returns its shapes; none where the instrument cannot play the chord
 * @throws RangeError if a string's note cannot be read
 */
export function stockOf(chord: Chord, instrument: Instrument, neck: NeckStock, capo: number): ShapeStock {
  const bass = chord.bass === null ? "" : tonicPitchClass(chord.bass);
  const key = `${tonicPitchClass(chord.root)}:${chord.intervals.join()}/${bass}`;
  const known = neck.get(key);
  if (known) return known;
  const stock = freshStock(chord, instrument, instrument.fretMap ? capo : 0);
  neck.set(key, stock);
  held++;
  return stock;
}

function freshStock(chord: Chord, instrument: Instrument, capo: number): ShapeStock {
  const places = new Places();
  const found = search(chord, instrument, capo, true, (shape) => places.take(shape));
  const withoutBass = found.length === 0 && chord.bass !== null;
  const all = withoutBass ? search(chord, instrument, capo, false, (shape) => places.take(shape)) : found;
  const shapes = all.filter((shape) => places.holds(shape));
  let usual: StockShape | null = null;
  for (const shape of shapes) if (usual === null || shape.cost.bare < usual.cost.bare) usual = shape;
  let every: readonly StockShape[] | null = null;
  return {
    shapes,
    usual,
    withoutBass,
    every: () => (every ??= search(chord, instrument, capo, !withoutBass, () => true)),
  };
}

function search(
  chord: Chord,
  instrument: Instrument,
  capo: number,
  bass: boolean,
  keep: (shape: PlayableShape) => boolean,
): StockShape[] {
  const nut = fretPosition(instrument.scaleMm, fretSemitones(instrument, capo) ?? 0);
  return playableShapes(chord, instrument, { maxFret: highestUsedFret, capo, bass }, keep).map((shape) => {
    const { load, reachMm } = shape;
    const { lowestFret } = load;
    const semitones = fretSemitones(instrument, capo + lowestFret) ?? 0;
    return {
      ...shape,
      cost: { bare: shapeCost(load, reachMm, 0), underCapo: shapeCost(load, reachMm, 1) },
      handMm: lowestFret === 0 ? null : fretPosition(instrument.scaleMm, semitones) - nut,
    };
  });
}

/** What a shape is weighed by, whatever the wishes: less is better. */
interface Worth {
  bare: number;
  underCapo: number;
  barre: number;
  stopped: number;
  highest: number;
}

/** The best shapes at each place of the neck. */
class Places {
  private readonly best: Worth[][] = Array.from({ length: highestUsedFret + 1 }, () => []);

  /** True if no shape so far is at least as good in everything; then it stands among the best. */
  take(shape: PlayableShape): boolean {
    const worth = worthOf(shape);
    const place = this.best[shape.load.lowestFret]!;
    for (const other of place) if (noWorse(other, worth)) return false;
    let left = 0;
    for (const other of place) if (!noWorse(worth, other)) place[left++] = other;
    place[left] = worth;
    place.length = left + 1;
    return true;
  }

  /** Whether a shape that was taken has not been beaten since. */
  holds(shape: PlayableShape): boolean {
    const worth = worthOf(shape);
    for (const other of this.best[shape.load.lowestFret]!) if (noWorse(other, worth)) return noWorse(worth, other);
    return false;
  }
}

function worthOf({ load, reachMm, highestFret, frets }: PlayableShape): Worth {
  const bare = shapeCost(load, reachMm, 0);
  // Only a barre at the low frets is softer under a capo.
  const underCapo = load.barreStrings === 0 ? bare : shapeCost(load, reachMm, 1);
  return { bare, underCapo, barre: load.barreStrings, stopped: frets.length - load.openStrings, highest: highestFret };
}

function noWorse(a: Worth, b: Worth): boolean {
  return (
    a.bare <= b.bare &&
    a.underCapo <= b.underCapo &&
    a.barre <= b.barre &&
    a.stopped <= b.stopped &&
    a.highest <= b.highest
  );
}
