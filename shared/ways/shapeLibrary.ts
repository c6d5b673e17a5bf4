import { tonicPitchClass } from "../music/keyName";
import type { Chord } from "../music/chord";
import type { Instrument } from "../instruments/instrument";
import { judgedShapes, type JudgedShape } from "./findShapes";

/** The best fingerings of one chord, for choosing a line of them through a song. */
export interface ShapeStock {
  shapes: readonly JudgedShape[];
  /** true if a bass was asked for that the instrument cannot put lowest */
  withoutBass: boolean;
}

/** Highest fret to look at for accompanying. */
const highestFret = 12;
/** How many fingerings of a chord are kept, and how many of them at least without a barre. */
const kept = { easiest: 9, withoutBarre: 3 };
/** Answers remembered before starting over. */
const remembered = 4000;

const library = new Map<string, ShapeStock>();

/**
 * The easiest fingerings of a chord without a capo. Remembers its answers: they depend on the arguments alone.
 *
 * @param chord a parsed chord
 * @param instrument tuning, scale and frets
 * @returns up to a dozen shapes, easiest first; none where the instrument cannot play the chord
 * @throws RangeError if a string's note cannot be read
 */
export function stockOf(chord: Chord, instrument: Instrument): ShapeStock {
  const key = JSON.stringify([
    tonicPitchClass(chord.root),
    chord.intervals,
    chord.bass === null ? null : tonicPitchClass(chord.bass),
    instrument.strings.map(({ note, startsAtFret }) => [note, startsAtFret]),
    instrument.scaleMm,
    instrument.frets,
    instrument.fretMap,
  ]);
  const known = library.get(key);
  if (known) return known;
  if (library.size >= remembered) library.clear();
  const stock = freshStock(chord, instrument);
  library.set(key, stock);
  return stock;
}

function freshStock(chord: Chord, instrument: Instrument): ShapeStock {
  const asked = judgedShapes(chord, instrument, { maxFret: highestFret });
  const withoutBass = asked.length === 0 && chord.bass !== null;
  const all = withoutBass ? judgedShapes(chord, instrument, { maxFret: highestFret, bass: false }) : asked;
  const easiest = all.slice(0, kept.easiest);
  const free = all.filter(({ shape }) => shape.barre === null).slice(0, kept.withoutBarre);
  return { shapes: [...new Set([...easiest, ...free])], withoutBass };
}
