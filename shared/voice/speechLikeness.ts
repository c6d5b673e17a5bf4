import type { SpeechCues } from "./speechCues";

/**
 * Weights of a linear discriminant between singing and speech. `__tests__/bench/fitSpeech.ts` fits them by logistic
 * regression to spoken and sung lines of its own making: some 25 languages of espeak-ng in 20 manners, and synthetic
 * singers of seven kinds, a third of them in lines of few pitches, most of both in rooms with an echo of 0.3 to 1.2 s and
 * through all kinds of microphones. An echo fills the gaps of speech and stretches its syllables, so that length alone
 * tells little; and recordings of
 * people (vocadito, the Dagstuhl ChoirSet, sms-tools), each piece of them three times.
 */
const FITTED_AT_REST = 74.5;
const WEIGHTS: SpeechCues = { band: -1.07, untuned: 3.17, voiced: -9.77, held: -17.8, unsteady: 0.0451, leaps: -6.85, grid: -4.73, long: -7.87, clarity: -37.8 };
/** Taking speech for singing is worse than asking a singer for another line. */
const CAUTION = 0.5;

/** @returns how much a take is like speech: below 0 for singing, above 0 for speech */
export function likenessToSpeech(cues: SpeechCues): number {
  return (Object.keys(WEIGHTS) as (keyof SpeechCues)[]).reduce((sum, cue) => sum + WEIGHTS[cue] * cues[cue], FITTED_AT_REST + CAUTION);
}
