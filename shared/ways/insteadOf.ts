import { parseChord, type Chord } from "../music/chord";
import { tonicPitchClass } from "../music/keyName";
import { glyphs } from "../music/pitch";
import { fretName, fretSemitones } from "../instruments/frets";
import type { Instrument } from "../instruments/instrument";
import { stringMidi } from "../instruments/tension";
import { playableShapes } from "./shapeSearch";

/** Highest fret that a single note is looked for at. */
const highestFret = 12;

/**
 * What to play where an instrument has no shape for a chord: a plainer chord on the same root, else the root alone, else
 * nothing.
 *
 * @param name of the chord that has no shape, ASCII
 * @param instrument tuning and frets
 * @param capo fret of the capo, 0 for none
 * @returns what to do, with glyphs, beginning small: "play E♭5 instead"; null for what is no chord
 * @see common practice: a chord may be thinned to root and fifth, or to its root, and be silent rather than wrong
 * @example insteadOf("N.C.", { id: "x", name: "", strings: [], scaleMm: 600, frets: 12, capoTo: 0, leftHanded: false }, 0) // => null
 */
export function insteadOf(name: string, instrument: Instrument, capo: number): string | null {
  const chord = parseChord(name);
  if (!chord) return null;
  const plainer = plainerNames(chord).find((text) => {
    const candidate = parseChord(text);
    return candidate !== null && playableShapes(candidate, instrument, { capo, maxFret: highestFret }).length > 0;
  });
  if (plainer !== undefined) return `play ${glyphs(plainer)} instead`;
  const root = tonicPitchClass(chord.root);
  const base = fretSemitones(instrument, capo) ?? 0;
  for (let fret = 0; fret <= Math.min(highestFret, instrument.frets - capo); fret++) {
    const semitones = fretSemitones(instrument, capo + fret);
    if (semitones === null) continue;
    const string = instrument.strings.find(
      (each) => each.startsAtFret === undefined && (stringMidi(each) + semitones - base) % 12 === root,
    );
    if (!string) continue;
    const where = fret === 0 ? "open" : `at fret ${fretName(instrument, fret)}`;
    return `pluck its root alone: the ${glyphs(string.note.replace(/-?\d+$/, ""))} string ${where}`;
  }
  return "let the strings be silent there";
}

/** Chords on the same root that hold less of it, the fullest first. */
function plainerNames({ root, quality, intervals, bass }: Chord): string[] {
  const minor = intervals.includes(3);
  const seventh = intervals.includes(10);
  const qualities = minor ? [...(seventh ? ["m7"] : []), "m", "5"] : [...(seventh ? ["7"] : []), "", "5"];
  // A chord without a plain fifth is not thinned to one that has it.
  const fitting = intervals.includes(7) ? qualities : qualities.filter((each) => each === "m7" || each === "7");
  return fitting.filter((each) => bass !== null || each !== quality).map((each) => root + each);
}
