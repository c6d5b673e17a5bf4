import { glyphs, noteName } from "../music/pitch";
import { type WrittenVoice, singleLine } from "./melodyVoice";

/** How much a voice looks like the sung one, and why. */
export interface VocalLikelihood {
  /** any number; the likeliest vocal line of a file has the largest */
  points: number;
  /** sentences, the weightiest first */
  reasons: string[];
}

const vocalNames =
  /\b(?:vocals?|vox|voice|sing(?:er|ing)?|melod(?:y|ie)|lead|tune|solo|song|canto|cantus|gesang|stimme|soprano|alto|tenor|chant)\b/i;
const otherNames =
  /\b(?:bass|drums?|percussion|guitar|piano|pad|strings|harmony|accomp\w*|chords?|organ|backing|choir)\b/i;
/** From the lowest note of a choir bass to the highest of a soprano, common practice. */
const singable = { low: 40, high: 84 };

/**
 * Weighs how much a voice of a file looks like the one that is sung, and says why.
 *
 * @param voice a voice as read, with at least one note
 * @returns points to compare with the other voices of the file, and the reasons in words
 * @see common practice
 */
export function vocalLikelihood(voice: WrittenVoice): VocalLikelihood {
  const line = singleLine(voice.notes);
  const pitches = line.map((note) => note.midi);
  const low = pitches.reduce((a, b) => Math.min(a, b));
  const high = pitches.reduce((a, b) => Math.max(a, b));
  const time = line.reduce((sum, note) => sum + note.duration, 0);
  const mean = line.reduce((sum, note) => sum + note.midi * note.duration, 0) / time;
  let leaps = 0;
  for (let i = 1; i < pitches.length; i += 1) if (Math.abs(pitches[i]! - pitches[i - 1]!) > 9) leaps += 1;
  const evidence: [points: number, reason: string | null][] = [];
  const say = (points: number, reason: string | null = null) => evidence.push([points, reason]);

  if (voice.percussion) say(-20, "It is drums.");
  if (voice.lyrics.length > 0) say(5, "It has words.");
  const named = vocalNames.exec(voice.name)?.[0];
  const other = otherNames.exec(voice.name)?.[0];
  if (named !== undefined) say(3, `Its name says “${named}”.`);
  if (other !== undefined) say(-3, `Its name says “${other}”.`);
  const { program } = voice;
  if (program !== null && program >= 52 && program <= 54) say(1, "Its sound is a choir or a voice.");
  if (program !== null && program >= 32 && program <= 39) say(-3, "Its sound is a bass.");
  const alone = line.length / voice.notes.length;
  say(4 * alone, alone > 0.95 ? "It has one note at a time." : null);
  if (alone <= 0.75) say(-1, "It has several notes at once.");
  say(Math.min(2, line.length / 40), null);
  if (line.length < 8) say(-0.5, `It has only ${line.length} ${line.length === 1 ? "note" : "notes"}.`);

  const ends = `${glyphs(noteName(low))} to ${glyphs(noteName(high))}`;
  const height = Math.max(0, 50 - mean) / 4 + Math.max(0, mean - 79) / 4;
  const width = Math.max(0, high - low - 24) / 4 + (high - low < 3 ? 2 : 0);
  const fits = height + width === 0 && low >= singable.low && high <= singable.high;
  if (!voice.percussion) {
    if (fits) say(0.9, `Its notes, ${ends}, fit a voice.`);
    else if (high - low < 3) say(-width, "It hardly moves from its note.");
    else if (high - low > 24) say(-width, `Its notes, ${ends}, span more than two octaves.`);
    else say(0, `Its notes, ${ends}, lie ${mean > 62 ? "high" : "low"} for a voice.`);
  }
  say(-height);
  const leaping = leaps / line.length;
  say(-8 * leaping, leaping > 0.15 ? "It leaps a lot." : null);
  return {
    points: evidence.reduce((sum, [points]) => sum + points, 0),
    reasons: evidence
      .filter((each): each is [number, string] => each[1] !== null)
      .sort(([a], [b]) => Math.abs(b) - Math.abs(a))
      .map(([, reason]) => reason),
  };
}
