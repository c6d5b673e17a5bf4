import { chordThird, parseChord, transposeChord, type Chord } from "../music/chord";
import { type KeyName, tonicPitchClass } from "../music/keyName";
import type { Chart } from "../songs/chart";
import { chartTokens } from "../songs/chart";
import { chordNumber } from "../songs/chordNumbers";

/** A chord of the song with its number, which is the same in both keys. */
export interface NumberedChord {
  /** as in the chart, ASCII or glyphs as written */
  written: string;
  /** in the new key */
  sounding: string;
  /** roman, ASCII: "IV", "bVII" */
  roman: string;
  /** plain: "4" */
  plain: string;
  /** number, 1 to 7, of the root or of the step it alters */
  degree: number;
  /** the root lies off the scale */
  accidental: "" | "b" | "#";
  third: "major" | "minor" | null;
  /** "V7/V" where it leads to a chord of the key other than home, and that chord as written */
  leads: { roman: string; to: string } | null;
  chord: Chord;
}

/**
 * The chords of a chart with their numbers, each once.
 *
 * @param chart any chart
 * @param from the key it is written in
 * @param to the key it moves to
 * @returns in order of first appearance; signs that are no chords are left out
 * @throws RangeError if a tonic is no note name
 * @see common practice: roman numerals, and plain numbers as bands call them
 */
export function numberedChords(chart: Chart, from: KeyName, to: KeyName): NumberedChord[] {
  const sequence = chartTokens(chart).flatMap(({ chord }) => (chord ? [chord] : []));
  const move = semitonesUp(from, to);
  const found = new Map<string, NumberedChord>();
  sequence.forEach((chord, k) => {
    const next = sequence[k + 1] ?? null;
    const number = chordNumber(chord, from, next);
    const leads = number.leadsTo && next ? { roman: number.leadsTo.roman, to: next.text } : null;
    const known = found.get(chord.text);
    if (known) {
      known.leads ??= leads;
      return;
    }
    const { roman, plain, degree, accidental } = number;
    found.set(chord.text, {
      ...{ roman, plain, degree, accidental, leads, chord },
      written: chord.text,
      sounding: transposeChord(chord, move, to, from, chart.naming),
      third: chordThird(chord),
    });
  });
  return [...found.values()];
}

/**
 * How far one key lies above another, going up.
 *
 * @param from lower key
 * @param to upper key
 * @returns semitones, 0 to 11
 * @example semitonesUp({ tonic: "D", mode: "major" }, { tonic: "C", mode: "major" }) // => 10
 */
export function semitonesUp(from: KeyName, to: KeyName): number {
  return (tonicPitchClass(to.tonic) - tonicPitchClass(from.tonic) + 12) % 12;
}

/**
 * A chord of a key's own notes on one of its degrees.
 *
 * @param notes the seven notes of the key with their semitones
 * @param at index of the root, 0 to 6
 * @returns the triad as a chord, or null where its fifth is neither plain nor diminished
 */
export function triadOn(notes: readonly { note: string; semitones: number }[], at: number): Chord | null {
  const above = (steps: number) => (notes[(at + steps) % 7]!.semitones - notes[at]!.semitones + 12) % 12;
  const [third, fifth] = [above(2), above(4)];
  const quality = fifth === 6 ? "dim" : fifth !== 7 ? null : third === 3 ? "m" : "";
  return quality === null ? null : parseChord(notes[at]!.note + quality);
}
