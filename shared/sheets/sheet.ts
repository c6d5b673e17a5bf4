import type { KeyName } from "../music/keyName";
import type { PitchBand } from "../voice/takeReport";
import type { Shape } from "../ways/way";

/** A chord of the song as this player plays it. */
export interface SheetChord {
  /** as it stands in the chart, ASCII or glyphs; what stands in the chart under another name is another chord */
  written: string;
  /** what is heard */
  sounding: string;
  /** name of the shape that the fingers play */
  played: string;
  /** the very fingering; null where the instrument has none, or none is to be shown */
  shape: Shape | null;
}

/** One thing that the right hand does in a bar. */
interface SheetStroke {
  /** quarter notes from the start of the bar */
  at: number;
  kind: "down" | "up" | "pluck" | "bass";
  strong: boolean;
}

/** What the right hand does in every bar. */
export interface SheetStrokes {
  /** what is counted in a bar, and how long the bar is in quarter notes */
  beats: number;
  quarters: number;
  strokes: SheetStroke[];
  /** the pattern in words; "" for none */
  words: string;
}

/** The instrument as it is tuned and clamped for this song. */
export interface SheetInstrument {
  name: string;
  /** strings from the bass side, ASCII with octaves, before and after retuning */
  strings: string[];
  tuned: string[];
  /** what players call the frets from the open string on, where that is not their number */
  fretNames: string[] | null;
  leftHanded: boolean;
  /** semitones, all strings alike; negative = down */
  retune: number;
  /** 0 for none */
  capo: number;
  /** the key whose shapes are played */
  shapeKey: KeyName;
}

/** Where the tune lies in the singer's voice, in the sheet's key. */
export interface SheetTune {
  range: PitchBand;
  comfort: PitchBand;
  /** ends of the comfort band with octaves, with glyphs */
  comfortNames: { low: string; high: string };
  /** whole semitones from low to high, with their share of the sung time, 0 to 1 */
  marks: { midi: number; share: number }[];
  /** how it sits, in a sentence or two */
  words: string;
}

/** A chart prepared in the chosen key for one player: everything that stands on the paper. Plain data. */
export interface Sheet {
  title: string;
  /** beat and tempo, who made it: the line under the title; "" for none */
  facts: string;
  /** chords over words, as written */
  chart: string;
  /** the key that the chart is written in; null where it is not known, and then nothing is moved */
  from: KeyName | null;
  /** the key in which it sounds; null with `from` */
  key: KeyName | null;
  /** who sings; null where that is not said */
  singer: string | null;
  /** ASCII with octave; null where it is not known */
  firstNote: string | null;
  /** null for a sheet without a way of playing: chords as they sound, no grids */
  instrument: SheetInstrument | null;
  chords: SheetChord[];
  strokes: SheetStrokes | null;
  /** null where tune or voice is not known */
  tune: SheetTune | null;
  /** the parts in the order they are played, as a sentence; "" where there is nothing to keep in mind */
  order: string;
}

/** How the sheet is to be laid out. */
export interface SheetOptions {
  paper: "A4" | "Letter";
  grids: "side" | "top" | "none";
  /** the chords' numbers over them */
  numbers: boolean;
  letters: "small" | "usual" | "large" | "largest";
  /** chord names of the shapes, or of what is heard */
  shows: "played" | "sounding";
  /** grids drawn for the other hand */
  leftHanded: boolean;
}

/** Letters of the chart, in px of which 96 make an inch. */
export const letterSizes: Readonly<Record<SheetOptions["letters"], number>> = {
  small: 14,
  usual: 16.5,
  large: 20,
  largest: 24,
};

/** Width and height of both papers, in px of which 96 make an inch; whole numbers within the sheet. @see ISO 216; ANSI/ASME Y14.1 */
export const paperSizes: Readonly<Record<SheetOptions["paper"], { width: number; height: number }>> = {
  A4: { width: 793, height: 1122 },
  Letter: { width: 816, height: 1056 },
};
