import { parseChord } from "@/shared/music/chord";
import { scaleSteps, spellInKey, tonicPitchClass, type KeyName } from "@/shared/music/keyName";
import { chartChords, type Chart } from "@/shared/songs/chart";
import { chordNumber } from "@/shared/songs/chordNumbers";

/** A chord to choose. */
export interface PaletteChord {
  text: string;
  /** its place in the key, such as "IV"; null without a key */
  roman: string | null;
}

export interface Palette {
  /** those of the song: I, IV and V first, then vi, ii and iii, then the rest */
  own: PaletteChord[];
  /** further triads of the key; while there is none, chords to begin with */
  others: PaletteChord[];
}

const order = [1, 4, 5, 6, 2, 3, 7];

/** Offered while no key is known: the open chords that most songs begin with (common practice). */
const firstChords = ["C", "G", "D", "A", "E", "F", "Am", "Em", "Dm"];

const keyless = (text: string): PaletteChord => ({ text, roman: null });

/** The chords to choose from: the song's own first, by their numbers, then the rest of the key. */
export function chordPalette(chart: Chart, key: KeyName | null): Palette {
  const written = chartChords(chart);
  if (key === null) {
    const offered = firstChords.filter((text) => !written.includes(text));
    return { own: written.map(keyless), others: offered.map(keyless) };
  }
  const own = written.map((text, place) => ({ ...numbered(text, key), place }));
  own.sort((a, b) => a.rank - b.rank || a.place - b.place);
  // First the plainest chord of each step, then what else stands on the same steps.
  const seen = new Set<number>();
  const plain = own.filter(({ rank }) => rank < 20 && !seen.has(Math.floor(rank)) && seen.add(Math.floor(rank)));
  const here = new Set(written);
  return {
    own: [...plain, ...own.filter((chord) => !plain.includes(chord))].map(({ text, roman }) => ({ text, roman })),
    others: order
      .map((degree) => triad(degree, key))
      .filter((text) => !here.has(text))
      .map((text) => ({ text, roman: numbered(text, key).roman })),
  };
}

function numbered(text: string, key: KeyName): PaletteChord & { rank: number } {
  const chord = parseChord(text);
  if (!chord) return { text, roman: null, rank: 100 };
  const { roman, degree, accidental } = chordNumber(chord, key);
  // Of two on one step the plainer comes first.
  const beside = (accidental === "" ? 0 : 20) + (chord.bass === null ? 0 : 0.5) + chord.quality.length / 20;
  return { text, roman: roman.replace(/dim/, "°"), rank: order.indexOf(degree) + beside };
}

function triad(degree: number, key: KeyName): string {
  const steps = scaleSteps(key.mode);
  const at = (step: number) => steps[step % 7]! + 12 * Math.floor(step / 7);
  const root = at(degree - 1);
  const third = at(degree + 1) - root;
  const fifth = at(degree + 3) - root;
  const quality = third === 4 ? "" : fifth === 6 ? "dim" : "m";
  return spellInKey((tonicPitchClass(key.tonic) + root) % 12, key) + quality;
}
