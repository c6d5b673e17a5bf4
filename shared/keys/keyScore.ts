import type { PitchBand } from "../voice/takeReport";
import type { MelodyNote } from "../songs/melody";

/** A voice as the key scorer needs it: comfort lies inside range. Fractional MIDI numbers. */
export interface SingingVoice {
  /** the outer limit that keys are judged by */
  range: PitchBand;
  comfort: PitchBand;
  /**
   * What was sung so far, where that is less than the range because the range is partly an estimate: a phrase shows
   * only part of a voice. Changes no score, only what is said. An end that equals the range's end was measured.
   */
  heard?: PitchBand;
}

/** What is known of the tune: its notes, or (coarser) only its span. */
export type Tune =
  | { kind: "melody"; notes: readonly MelodyNote[]; home: string }
  | { kind: "span"; lowMidi: number; highMidi: number; home: string };

/** The five parts of a score. Their maxima are 50, 15, 10, 10 and 15; they add up to the score exactly. */
export interface KeyParts {
  comfort: number;
  roomAbove: number;
  roomBelow: number;
  longHigh: number;
  lowCarry: number;
}

/** Time at one pitch in a key, with where it lies in the voice. */
export interface KeyMark {
  midi: number;
  /** share of sung time, 0 to 1; the shares of a key add up to 1 */
  share: number;
  zone: "comfort" | "reach" | "beyond";
  /** true on the tonic */
  home: boolean;
}

/** One key, judged for one voice and one tune. */
export interface KeyScore {
  /** tonic as this key is spelled, ASCII: "Db" */
  tonic: string;
  /** octaves moved from the tune as written, after the move by `shift` to the nearest place of the tonic */
  octave: number;
  /** semitones from the tune as written to this key, octave included */
  shift: number;
  lowMidi: number;
  highMidi: number;
  /** 0 to 100 */
  score: number;
  parts: KeyParts;
  /** some of the tune lies outside the range */
  beyond: boolean;
  /** semitones between the tune's ends and the voice's range: singer's top - tune's top, tune's low - singer's low; negative = beyond */
  reserves: { upper: number; lower: number; tessituraShift: number };
  marks: KeyMark[];
  /** the largest reason, one sentence, with glyphs */
  reason: string;
  /** true when only the span was known */
  coarse: boolean;
}
