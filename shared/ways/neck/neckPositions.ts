import { fretSemitones } from "../../instruments/frets";
import type { Instrument } from "../../instruments/instrument";
import { stringMidi } from "../../instruments/tension";
import type { Chord } from "../../music/chord";
import { tonicPitchClass } from "../../music/keyName";
import { glyphs } from "../../music/pitch";
import { chordDegrees, degreeNote } from "./chordDegrees";

/** A place on the neck that sounds a tone of a chord. */
export interface NeckPosition {
  /** index of the string, from the bass side */
  string: number;
  /** counted from nut or capo; 0 is open, or at the capo */
  fret: number;
  /** as counted from the root, with glyphs: "♭3" */
  degree: string;
  /** note as it is heard, with glyphs */
  note: string;
  root: boolean;
}

/**
 * Every place on the neck that sounds a tone of a chord, from nut or capo to the last fret. A short string sounds open
 * only.
 *
 * @param chord the chord whose shapes the fingers play
 * @param heard root of the chord that is heard, ASCII; the same as the shape's where nothing is retuned or clamped
 * @param instrument tuning and frets
 * @param capo fret of the capo, 0 for none
 * @returns places, string by string from the bass side, each from nut or capo up
 * @throws RangeError if a string's note cannot be read or heard is no note name
 */
export function neckPositions(chord: Chord, heard: string, instrument: Instrument, capo: number): NeckPosition[] {
  const root = tonicPitchClass(chord.root);
  const tones = new Map(chordDegrees(chord).map((degree) => [degree.semitones, degree]));
  const base = fretSemitones(instrument, capo) ?? 0;
  return instrument.strings.flatMap((string, index) => {
    const open = stringMidi(string);
    const last = string.startsAtFret === undefined ? instrument.frets - capo : 0;
    return Array.from({ length: last + 1 }, (_, fret) => fret).flatMap((fret): NeckPosition[] => {
      const raised = fretSemitones(instrument, capo + fret);
      const degree = raised === null ? undefined : tones.get((((open + raised - base - root) % 12) + 12) % 12);
      if (!degree) return [];
      const note = glyphs(degreeNote(degree, heard));
      return [{ string: index, fret, degree: degree.name, note, root: degree.semitones === 0 }];
    });
  });
}
