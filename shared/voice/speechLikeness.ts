import type { SpeechCues } from "./speechCues";

/**
 * Weights of a linear discriminant between singing and speech by logistic regression, exactly as
 * `npx tsx __tests__/bench/fitSpeech.ts --folder DIR 1 161` prints them, where DIR holds seven recordings with their truth
 * (vocadito, the Dagstuhl ChoirSet, sms-tools, and lines made from them): 291 made lines, spoken by espeak-ng in 25 languages
 * and sung by synthetic singers, most of them in rooms with an echo and through all kinds of microphones, and 53 pieces of the
 * recordings, each counted three times. An echo fills the gaps of speech and stretches its syllables, so that no cue is enough alone.
 */
const AT_REST = 53.8;
const WEIGHTS: SpeechCues = {
  band: -0.83,
  untuned: 5.75,
  voiced: -7.55,
  held: -14.5,
  unsteady: 0.115,
  leaps: -5.85,
  grid: -2.03,
  long: -9.39,
  clarity: -23.7,
};

/** @returns how much a take is like speech: below 0 for singing, above 0 for speech */
export function likenessToSpeech(cues: SpeechCues): number {
  return (Object.keys(WEIGHTS) as (keyof SpeechCues)[]).reduce((sum, cue) => sum + WEIGHTS[cue] * cues[cue], AT_REST);
}
