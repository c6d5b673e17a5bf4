/** A note that was not reached as wanted: a high one sung lower, or a low one sung higher. */
export interface Shortfall {
  /** as wanted, in the singer's octave */
  midi: number;
  /** how far it was missed; null where it was not sung at all while the rest of its phrase was */
  semitones: number | null;
  /** on which side of the tune it lies */
  side: "above" | "below";
}

/** How a phrase, or a whole take, was sung. A figure is null where too little was sung to tell. */
export interface Measures {
  /** share of the wanted time in which something was sung for it, 0 to 1 */
  sungShare: number;
  /** duration-weighted mean distance from the tune in cents, the singer's own tuning taken out; octaves do not count */
  offCents: number | null;
  /** share of the sung time on notes within 50 cents of the tune, 0 to 1 */
  inTune: number | null;
  /** the note that was missed by most; null where every note was reached */
  fellShort: Shortfall | null;
  /** unsteadiness of its held notes against the singer's own median: 1 is as ever, 2 twice as unsteady */
  unsteady: number | null;
  /** the highest low note that was left out, or sung much more softly than the rest; null where the low notes carried */
  ranOutOfLow: { midi: number; why: "left out" | "weak" } | null;
}

/** A phrase of the song as it was sung. */
export interface PhraseMeasures extends Measures {
  /** index of the phrase among those wanted */
  phrase: number;
  /** its words; null where it has none */
  label: string | null;
  /** lowest and highest wanted note in it, in the singer's octave */
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

/** How one pitch of the tune went: what evidence for keys is made from. */
export interface PitchMeasure {
  /** as wanted, in the singer's octave */
  midi: number;
  /** seconds that were to be sung at it, in phrases that were sung */
  wantedS: number;
  sungS: number;
  /** mean distance in cents; null where it was not sung */
  offCents: number | null;
  /** missed by half a semitone or more, or not sung, for most of its time, towards the middle of the voice */
  fellShort: "above" | "below" | null;
}

/** A take held against the tune in a key. */
export interface TakeMeasures extends Measures {
  /** octaves that the singer sang from the wanted notes */
  octaves: number;
  /** whole semitones that the singer sang from the key, -6 to 6; 0 where the key was kept */
  moved: number;
  /** what is left of the singer's own tuning, in cents */
  tuningCents: number;
  phrases: readonly PhraseMeasures[];
  pitches: readonly PitchMeasure[];
  /** one to three plain sentences with glyphs */
  summary: readonly string[];
}
