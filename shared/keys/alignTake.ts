import type { TakeReport } from "../voice/takeReport";

/** A note that was to be sung, in the key and in the singer's octave. Times in seconds. */
export interface WantedNote {
  at: number;
  duration: number;
  midi: number;
  /** index of the phrase it belongs to */
  phrase: number;
}

/** What a take must tell to be held against a tune. */
export type SungTake = Pick<TakeReport, "f0" | "notes">;

/** How a take was sung. */
export interface Singing {
  /**
   * when in the take the wanted notes' time 0 was, in seconds (negative: the recording began later), where a backing
   * told the singer the time; null where the singer sang without
   */
  startS: number | null;
}

/** A take laid on a tune. */
export interface Alignment {
  /** for each wanted note the stretch of the take it was sung in; null where nothing was sung for it */
  spans: readonly ({ start: number; end: number } | null)[];
  /** octaves that the singer sang from the wanted notes: -1 is an octave lower */
  octaves: number;
  /** the singer's common deviation in semitones after the octave, fractional: 0.3 is 30 cents sharp */
  offset: number;
}
