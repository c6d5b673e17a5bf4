import type { SpeechCues } from "./speechCues";

/**
 * Weights of a linear discriminant between singing and speech, from logistic regression to some 1,100 spoken and sung
 * lines: 25 languages of espeak-ng in 20 manners, and synthetic singers of seven kinds, part of them in lines of few
 * pitches or loosely tuned, most of both in rooms with an echo of 0.3 to 1.2 s and through all kinds of microphones; and
 * to recordings of people (vocadito, the Dagstuhl ChoirSet, sms-tools), each piece of them counted three times. An echo
 * fills the gaps of speech and stretches its syllables, so that length alone tells little.
 * `__tests__/bench/fitSpeech.ts` makes such lines and fits anew; fewer lines, or another mixture, give smaller weights.
 */
const FITTED_AT_REST = 74.5;
const WEIGHTS: SpeechCues = { band: -1.07, untuned: 3.17, voiced: -9.77, held: -17.8, unsteady: 0.0451, leaps: -6.85, grid: -4.73, long: -7.87, clarity: -37.8 };
/** Taking speech for singing is worse than asking a singer for another line. */
const CAUTION = 0.5;

/** @returns how much a take is like speech: below 0 for singing, above 0 for speech */
export function likenessToSpeech(cues: SpeechCues): number {
  return (Object.keys(WEIGHTS) as (keyof SpeechCues)[]).reduce((sum, cue) => sum + WEIGHTS[cue] * cues[cue], FITTED_AT_REST + CAUTION);
}
