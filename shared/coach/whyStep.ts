import type { Instrument } from "../instruments/instrument";
import type { KeyName } from "../music/keyName";
import type { Shape } from "../ways/way";
import type { CoachQuestion } from "./coachQuestion";
import type { NumberedChord } from "./numberedChords";
import type { Degree } from "./degrees";

/** A scale laid along the semitones; `from` is where its home note stands, so that two of them share one ruler. */
export interface LaidScale {
  key: KeyName;
  degrees: readonly Degree[];
  from: number;
}

/** A dot on the neck. */
export interface NeckDot {
  string: number;
  /** from the nut, 0 = open */
  fret: number;
  /** note name with glyphs */
  label: string;
  root: boolean;
}

/** What a step shows, from the user's own data. `spoken` says the same in words. */
export type WhyPicture =
  | { kind: "scales"; scales: readonly LaidScale[]; chords: readonly NumberedChord[]; spoken: string }
  /** the song's first lines with numbers over the chords */
  | { kind: "lines"; chords: readonly NumberedChord[]; spoken: string }
  | {
      kind: "neck";
      /** as it is tuned for the way */
      instrument: Instrument;
      capo: number;
      frets: number;
      dots: readonly NeckDot[];
      /** movable shapes beside it */
      shapes: readonly { name: string; shape: Shape }[];
      spoken: string;
    }
  | {
      kind: "strings";
      /** from the bass side, note names with glyphs */
      strings: readonly { from: string; to: string }[];
      /** semitones between neighbours, the same before and after */
      gaps: readonly number[];
      spoken: string;
    };

/** One step of the walk. */
export interface WhyStep {
  kind: "scale" | "numbers" | "new-key" | "capo" | "retune" | "neck";
  title: string;
  /** sentences with glyphs */
  words: readonly string[];
  picture: WhyPicture;
  question: CoachQuestion;
}

/** A step that says nothing about this way. */
export interface LeftOut {
  title: string;
  why: string;
}
