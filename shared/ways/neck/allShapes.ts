import type { Instrument } from "../../instruments/instrument";
import { parseChord } from "../../music/chord";
import { findShapes } from "../findShapes";
import type { Shape } from "../way";

/**
 * Every shape of a chord on the neck; where the bass behind its slash cannot be put lowest, its shapes without it.
 *
 * @param played name of the shape that the fingers play, ASCII
 * @param instrument tuning, scale and frets
 * @param capo fret of the capo, 0 for none
 * @param maxFret highest fret to stop, counted from nut or capo; the whole neck where it is left out
 * @returns shapes, easiest first; none for what is no chord and for what the instrument cannot play
 * @throws RangeError if a string's note cannot be read
 */
export function allShapes(played: string, instrument: Instrument, capo: number, maxFret?: number): Shape[] {
  const chord = parseChord(played);
  if (!chord) return [];
  const within = { capo, ...(maxFret === undefined ? null : { maxFret }) };
  const found = findShapes(chord, instrument, within);
  return found.length > 0 || chord.bass === null ? found : findShapes(chord, instrument, { ...within, bass: false });
}
