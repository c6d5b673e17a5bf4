/** How a phrase, or a whole take, was sung. Every figure is null where too little was sung to tell. */
export interface Measures {
  /** share of the wanted time in which something was sung for it, 0 to 1 */
  sungShare: number;
  /** duration-weighted mean distance from the tune in cents, the singer's own tuning taken out; octaves do not count */
  offCents: number | null;
  /** share of the sung time within 50 cents of the tune, 0 to 1 */
  inTune: number | null;
  /** the note that was fallen short of the most, or not reached at all; null where all were reached */
  fellShort: { midi: number; semitones: number; side: "above" | "below" } | null;
  /** median unsteadiness of its held notes in cents against the singer's own median: 1 is as ever, 2 twice as unsteady */
  unsteady: number | null;
  /** the highest low note that was left out or sung much more softly than the rest; null where the low notes carried */
  ranOutOfLow: { midi: number; why: "left out" | "weak" } | null;
}

/** A phrase of the song as it was sung. */
export interface PhraseMeasures extends Measures {
  /** index of the phrase in the plan */
  phrase: number;
  /** its words; null where it has none */
  label: string | null;
  /** lowest and highest note of the tune in it, as wanted */
  lowMidi: number;
  highMidi: number;
  /** less than a quarter of it was sung */
  leftOut: boolean;
  /** seconds in the take; null where it was left out */
  start: number | null;
  end: number | null;
  /** what stands out, one plain sentence with glyphs */
  sentence: string;
}

/** Pitches as wanted in the key, each with how it went: what evidence for keys is made from. */
export interface PitchMeasure {
  /** MIDI number as the singer sang it to be: the wanted note in the singer's octave */
  midi: number;
  /** seconds sung at it */
  seconds: number;
  /** duration-weighted mean distance in cents */
  offCents: number;
  /** it was fallen short of by half a semitone or more on most of its time */
  fellShort: boolean;
}

/** A take held against the tune in a key. */
export interface TakeMeasures extends Measures {
  /** octaves that the singer sang from the wanted notes */
  octaves: number;
  /** the singer's own tuning in cents, -50 to 50 */
  tuningCents: number;
  phrases: readonly PhraseMeasures[];
  pitches: readonly PitchMeasure[];
  /** one or two plain sentences with glyphs */
  summary: readonly string[];
}
