import type { Chord } from "../music/chord";
import { tonicPitchClass } from "../music/keyName";
import { fretSemitones } from "../instruments/frets";
import type { Instrument } from "../instruments/instrument";
import { stringMidi } from "../instruments/tension";
import { fingering } from "./fingering";
import { easeOf, shapeCost } from "./shapeEase";
import { playableShapes, type PlayableShape, type ShapeOptions } from "./shapeSearch";
import type { Shape } from "./way";

/**
 * Every playable fingering of a chord on an instrument, all the way up the neck.
 *
 * Root and third sound (in suspended chords what stands for the third), at most four fingers, no silent string between
 * sounding ones, reach by millimetres; where the neck has no such fingering, the looser ones of `ShapeOptions.all` are
 * taken: three strings may hold no whole triad. A short string sounds open or not at all. With a capo, a short string is
 * taken to be stopped as many frets up as the others.
 *
 * @param chord a parsed chord; a bass behind a slash is put lowest
 * @param instrument tuning, scale and frets
 * @param options capo, highest fret, looser rules
 * @returns shapes, easiest first; empty where the instrument cannot play the chord
 * @throws RangeError if the capo is negative or not whole, or a string's note cannot be read
 * @see common practice for what counts as playable; spans in mm from equal temperament
 */
export function findShapes(chord: Chord, instrument: Instrument, options: ShapeOptions = {}): Shape[] {
  const capo = options.capo ?? 0;
  return playableShapes(chord, instrument, options)
    .map((playable) => drawnShape(playable, chord, instrument, capo))
    .sort((a, b) => b.ease - a.ease || compareFrets(a.frets, b.frets));
}

/**
 * A fingering with everything that a grid shows.
 *
 * @param playable what a search found
 * @param chord the chord it plays
 * @param instrument tuning, scale and frets
 * @param capo fret of the capo that the shape is counted from, 0 for none
 * @param shrink how much shorter the reach is than the one given, 1 for not at all
 * @returns the shape
 * @throws RangeError if four fingers cannot hold it
 */
export function drawnShape(
  playable: Pick<PlayableShape, "frets" | "load" | "reachMm" | "mostBarres">,
  chord: Chord,
  instrument: Instrument,
  capo: number,
  shrink = 1,
): Shape {
  const { frets, load, mostBarres } = playable;
  const hand = fingering(frets, mostBarres);
  if (!hand) throw new RangeError("four fingers cannot hold this shape");
  const root = tonicPitchClass(chord.root);
  const base = fretSemitones(instrument, capo) ?? 0;
  const roots = frets.flatMap((fret, string) => {
    if (fret === null) return [];
    const raised = (fretSemitones(instrument, capo + fret) ?? 0) - base;
    return (stringMidi(instrument.strings[string]!) + raised) % 12 === root ? [string] : [];
  });
  const reachMm = playable.reachMm * shrink;
  return {
    frets: [...frets],
    fingers: hand.fingers,
    barre: hand.barre,
    reachMm: Math.round(reachMm * 10) / 10,
    ease: easeOf(shapeCost(load, reachMm, capo)),
    roots,
  };
}

function compareFrets(a: readonly (number | null)[], b: readonly (number | null)[]): number {
  for (let k = 0; k < a.length; k++) {
    const difference = (a[k] ?? 99) - (b[k] ?? 99);
    if (difference !== 0) return difference;
  }
  return 0;
}
