import { fretSemitones } from "../instruments/frets";
import type { Instrument } from "../instruments/instrument";
import { stringMidi } from "../instruments/tension";
import { parseChord, type Chord } from "../music/chord";
import { tonicPitchClass } from "../music/keyName";
import { glyphs } from "../music/pitch";
import type { Shape } from "./way";
import { listWords } from "../music/listWords";
import { countWord } from "../music/countWords";

const toneNames: Record<number, string> = {
  0: "root",
  3: "third",
  4: "third",
  6: "flat fifth",
  8: "raised fifth",
  9: "6th",
  10: "7th",
  11: "major 7th",
  13: "♭9th",
  14: "9th",
  15: "♯9th",
  17: "11th",
  18: "♯11th",
  20: "♭13th",
  21: "13th",
};
/** Plainer chords that may be what is left, the fullest first. */
const plainer = [
  "9",
  "m9",
  "maj9",
  "7",
  "m7",
  "maj7",
  "m7b5",
  "dim7",
  "7sus4",
  "6",
  "m6",
  "add9",
  "",
  "m",
  "sus4",
  "sus2",
  "dim",
  "aug",
];

/**
 * What a shape leaves out of its chord, in a sentence. The plain fifth, and the tones under the highest extension, are
 * left out by custom and not spoken of.
 *
 * @param played name of the chord that the fingers play, ASCII
 * @param shape the fingering, frets counted from nut or capo
 * @param instrument tuning and frets
 * @returns such as "C13 as C7: the 13th does not fit on three strings"; null where nothing of weight is missing
 * @see common practice: root, third, seventh and the highest extension make the chord
 */
export function leftOutWords(played: string, shape: Shape, instrument: Instrument): string | null {
  const chord = parseChord(played);
  if (!chord) return null;
  const heard = heardIntervals(chord, shape, instrument);
  const missing = weighty(chord).filter((interval) => !heard.has(interval % 12));
  if (missing.length === 0) return null;
  const names = missing.map((interval) => toneNames[interval] ?? "tone");
  const what = `the ${listWords(names)} ${names.length === 1 ? "does" : "do"}`;
  const strings = instrument.strings.filter(({ startsAtFret }) => startsAtFret === undefined).length;
  const rest = plainName(chord, heard);
  return `${glyphs(played)}${rest === null ? "" : ` as ${glyphs(rest)}`}: ${what} not fit on ${countWord(strings, 8)} strings.`;
}

/** Intervals above the root that sound, 0 to 11. */
function heardIntervals(chord: Chord, shape: Shape, instrument: Instrument): Set<number> {
  const root = tonicPitchClass(chord.root);
  const heard = new Set<number>();
  shape.frets.forEach((fret, k) => {
    const semitones = fret === null ? null : fretSemitones(instrument, fret);
    if (semitones !== null) heard.add((stringMidi(instrument.strings[k]!) + semitones - root + 120) % 12);
  });
  return heard;
}

/** The tones that make the chord what its name says. */
function weighty(chord: Chord): number[] {
  const extensions = chord.intervals.filter((interval) => interval >= 12);
  const altered = extensions.filter((interval) => [13, 15, 18, 20].includes(interval));
  const highest = extensions.slice(-1);
  const inside = chord.intervals.filter((interval) => interval < 12 && interval !== 7);
  return [...new Set([...inside, ...altered, ...highest])];
}

function plainName(chord: Chord, heard: ReadonlySet<number>): string | null {
  const signature = (intervals: Iterable<number>) =>
    [...new Set([...intervals].map((interval) => interval % 12))]
      .filter((interval) => interval !== 7)
      .sort()
      .join();
  const own = new Set(chord.intervals.map((interval) => interval % 12));
  const left = signature([...heard].filter((interval) => own.has(interval)));
  const found = plainer.find((suffix) => {
    const candidate = parseChord(chord.root + suffix);
    return candidate !== null && signature(candidate.intervals) === left;
  });
  return found === undefined ? null : chord.root + found;
}
