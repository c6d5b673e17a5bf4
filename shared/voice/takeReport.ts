/** What the recording was judged to be; everything but "heard" says why no range is given. */
export type Verdict = "heard" | "too-short" | "too-quiet" | "too-noisy" | "clipped" | "not-singing" | "several-voices";

/**
 * What would help most after a take: singing it again (nothing was heard, or too little to be sure), holding the lowest
 * and the highest easy note (only a part of the voice was heard), or going on to a song.
 */
export type Advice = "sing-again" | "hold-ends" | "go-on";

/** One sung note. Times in seconds from the start of the take. */
export interface SungNote {
  start: number;
  end: number;
  /** centre of the note (of its vibrato), fractional MIDI number, as sung */
  midi: number;
  /** standard deviation about the centre after removing vibrato, in cents */
  steadinessCents: number;
  vibrato: { rateHz: number; extentCents: number } | null;
  /** RMS level in dBFS */
  levelDb: number;
  /** long and steady enough to count for a range */
  sustained: boolean;
  /** sustained and believed: not soft-and-unclear, not a lone short outlier */
  clear: boolean;
}

/** Lowest and highest note, fractional MIDI numbers, low <= high. */
export interface PitchBand {
  lowMidi: number;
  highMidi: number;
}

/** The outcome of listening to one take. */
export interface TakeReport {
  verdict: Verdict;
  /** one sentence: what was found, or why nothing was */
  sentence: string;
  /** what to do next, one sentence */
  nextStep: string;
  /** the same as one word, for a button that does it */
  advice: Advice;
  durationS: number;
  /** fundamental frequency in Hz every 10 ms, index k is time k/100 s; null where unvoiced */
  f0: (number | null)[];
  notes: SungNote[];
  /** range heard: lowest and highest believed sustained note; null unless heard */
  range: PitchBand | null;
  /** comfortable band; null unless heard */
  comfort: PitchBand | null;
  /** what the voice probably reaches beyond this take, an estimate; null unless heard */
  estimate: PitchBand | null;
  /** time-weighted quartiles and median of the sung pitch, fractional MIDI; null unless heard */
  tessitura: { q1: number; median: number; q3: number; p5: number; p95: number } | null;
  /** singer's common offset from equal temperament, cents, -50 to 50 */
  tuningCents: number;
  /** 0 to 1 */
  certainty: number;
  /** why the numbers are what they are, for people: plain second-person sentences with ♯ and ♭ glyphs */
  reasons: string[];
}
