import type { KeyMark, SingingVoice } from "@/shared/keys/keyScore";
import type { KeyName } from "@/shared/music/keyName";

/** How a tune lies in one voice: all of it in comfort, some in reach, some outside. */
export type Fit = "comfort" | "reach" | "beyond";

/** One singer in one key. All texts with glyphs. */
export interface GroupPart {
  id: string;
  name: string;
  /** on whole semitones */
  voice: SingingVoice;
  /** octaves away from where the group is told to sing it; -1 = an octave lower */
  octaves: number;
  score: number;
  fit: Fit;
  /** semitones over and under the comfort band */
  over: number;
  under: number;
  lowMidi: number;
  highMidi: number;
  marks: KeyMark[];
  /** how far the tune leaves the comfort band, and what is left of the range: a sentence or two */
  words: string;
  /** the same in a few words, to be heard in a table */
  short: string;
}

/** One key for the whole group. */
export interface GroupKey {
  key: KeyName;
  sign: string;
  /** 1 = the fairest */
  place: number;
  /** semitones from the tune as written to the octave that the others are told from */
  shift: number;
  lowest: number;
  mean: number;
  /** at least one singer misses notes */
  beyond: boolean;
  /** why it stands where it stands, one sentence */
  reason: string;
  /** in the order of the singers */
  parts: GroupPart[];
  /** what the numbers of its column come to, to be heard after the sign */
  spoken: string;
}
