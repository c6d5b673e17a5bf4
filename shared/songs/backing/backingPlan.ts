import type { Chord } from "../../music/chord";
import type { RightHand } from "./rightHand";
import type { Metre } from "./metre";

/** Something that sounds. Times in seconds from the first click of the count-in. */
export interface BackingEvent {
  at: number;
  /** until it is damped or ends */
  duration: number;
  kind: "strum-down" | "strum-up" | "pluck" | "bass" | "click" | "guide";
  /** MIDI numbers from the bass side of the neck to the treble side; a click has none */
  midis: readonly number[];
  /** 0 to 1 */
  level: number;
}

/** A beat to be seen, whether or not it is heard. */
export interface BackingBeat {
  at: number;
  /** bars from the start of the song, negative in the count-in */
  bar: number;
  /** from 0 */
  beat: number;
  strong: boolean;
}

/** A note that the singer is to sing, in the key and in the singer's octave. */
export interface PlannedNote {
  at: number;
  duration: number;
  midi: number;
  /** index into `phrases` */
  phrase: number;
}

/** A stretch of the song between two times. */
export interface BackingStretch {
  at: number;
  end: number;
  /** the words of a phrase, the heading of a part; null without */
  label: string | null;
}

/** Everything that a player needs, and everything that a listener compares with. */
export interface BackingPlan {
  /** ordered by `at` */
  events: readonly BackingEvent[];
  beats: readonly BackingBeat[];
  /** chord symbols in the key, each until the next; null where all is silent */
  chords: readonly { at: number; name: string | null }[];
  parts: readonly BackingStretch[];
  /** lines of the song that are sung, where the tune is known */
  phrases: readonly BackingStretch[];
  /** the tune as often as it is sung, ordered by `at`; empty where it is not known */
  notes: readonly PlannedNote[];
  metre: Metre;
  /** quarter notes a minute */
  tempo: number;
  bars: number;
  /** when the song begins */
  countInS: number;
  /** when it ends, the count-in included */
  durationS: number;
}

/** A chord from `at` (quarter notes from the song's start) until the next one; null is silence. */
export interface ChordInTime {
  at: number;
  chord: Chord | null;
}

/**
 * A right hand of its own: gets the chords as written and the length of the song, gives what sounds by time, `at` and
 * `duration` in quarter notes from the song's start.
 */
export type HandPlayer = (
  chords: readonly ChordInTime[],
  song: { metre: Metre; bars: number },
) => readonly BackingEvent[];

/** How a backing is to be played. */
export interface BackingWishes {
  /** quarter notes a minute, 20 to 400; default the song's, else 90 */
  tempo?: number;
  /** one of the patterns, or somebody who plays the chords in their own way */
  hand?: RightHand | HandPlayer;
  /** default 1 */
  countInBars?: 1 | 2;
  /** plays the tune softly along; default no */
  guide?: boolean;
  /** clicks through the whole song; default only in the count-in */
  click?: boolean;
  /** only the parts that the tune is written for, once; default the whole song */
  once?: boolean;
  /** for lines that neither bars nor the tune tell the length of */
  barsPerLine?: number;
}
