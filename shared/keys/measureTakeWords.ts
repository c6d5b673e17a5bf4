import { glyphs, noteName } from "../music/pitch";
import type { PhraseMeasures, Shortfall, TakeMeasures } from "./takeMeasures";
import { semitoneWords } from "../music/moveWords";

/** From these figures on something is worth saying. */
const offFrom = 35;
const farOffFrom = 70;
const unsteadyFrom = 1.8;

/**
 * What stands out in a phrase, the gravest first.
 *
 * @param phrase its measures
 * @returns one plain sentence with glyphs
 */
export function phraseSentence(phrase: Omit<PhraseMeasures, "sentence">): string {
  if (phrase.leftOut) return "Left out.";
  if (phrase.fellShort) return shortfallSentence(phrase.fellShort);
  if (phrase.ranOutOfLow) return lowSentence(phrase.ranOutOfLow);
  if (phrase.offCents === null) return "Too little was sung to tell.";
  if (phrase.offCents >= farOffFrom) return `Every note was reached, but ${phrase.offCents} cents off on average.`;
  if (phrase.unsteady !== null && phrase.unsteady >= unsteadyFrom) {
    return "Every note was reached, but less steadily than the rest.";
  }
  if (phrase.offCents >= offFrom) return `Every note was reached, ${phrase.offCents} cents off on average.`;
  return "In tune, and every note was reached.";
}

/**
 * What is to be said of a whole take.
 *
 * @param take its measures
 * @returns one to three plain sentences with glyphs
 */
export function takeSummary(take: Omit<TakeMeasures, "summary">): string[] {
  const sung = take.phrases.filter(({ leftOut }) => !leftOut);
  const out = take.phrases.length - sung.length;
  const moved = Math.abs(take.moved);
  const sentences: string[] = [];
  if (moved > 0) {
    const where = take.moved > 0 ? "above" : "below";
    sentences.push(`You sang ${semitoneWords(moved)} ${where} this key; it is judged as you sang it.`);
  }
  if (take.offCents !== null) {
    const share = Math.round(100 * (take.inTune ?? 0));
    sentences.push(`${share} % of what you sang was in tune, ${take.offCents} cents off on average.`);
  }
  if (take.fellShort) sentences.push(shortfallSentence(take.fellShort));
  else if (take.ranOutOfLow) sentences.push(lowSentence(take.ranOutOfLow));
  else if (out > 0) sentences.push(out === 1 ? "One phrase was left out." : `${out} phrases were left out.`);
  return sentences;
}

function shortfallSentence({ midi, semitones, side }: Shortfall): string {
  const name = glyphs(noteName(midi));
  if (semitones === null) return `${name} was not sung.`;
  const amount =
    semitones < 0.75 ? "half a semitone" : semitones < 1.25 ? "a semitone" : `${Math.round(semitones)} semitones`;
  return side === "above" ? `You fell ${amount} short of ${name}.` : `${name} came out ${amount} too high.`;
}

function lowSentence({ midi, why }: { midi: number; why: "left out" | "weak" }): string {
  const name = glyphs(noteName(midi));
  return why === "weak"
    ? `From ${name} down your voice was hardly heard.`
    : `From ${name} down the notes were left out.`;
}
