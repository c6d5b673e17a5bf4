import { glyphs, noteName, type Spelling } from "../music/pitch";
import type { KeyMark, KeyParts } from "./keyScore";
import { partMaxima, type VoiceEdges } from "./keyParts";
import { countWord } from "../music/countWords";

/** Said of a key that was judged without knowing which notes of the span are sung how long. */
export const COARSE_WORDS = "Judged by the span alone.";

/** What the sentence about a key is made from. */
export interface KeyFacts {
  marks: readonly KeyMark[];
  parts: KeyParts;
  beyond: boolean;
  coarse: boolean;
  spelling: Spelling;
}

/** Up to this share of the sung time a note is called brief. */
const briefUpTo = 0.05;

/**
 * The largest reason for a key's score, one sentence for people.
 *
 * @param facts marks, parts and spelling of the key
 * @param edges the voice
 * @returns plain sentence with glyphs: which notes, how far, how long
 */
export function keyReason(facts: KeyFacts, edges: VoiceEdges): string {
  const sentence = facts.beyond ? beyondSentence(facts, edges) : insideSentence(facts, edges);
  return facts.coarse ? `${sentence} ${COARSE_WORDS}` : sentence;
}

function beyondSentence({ marks, spelling, coarse }: KeyFacts, edges: VoiceEdges): string {
  const above = marks.filter(({ midi }) => midi > edges.rangeHigh);
  const below = marks.filter(({ midi }) => midi < edges.rangeLow);
  const sides = [
    ...(above.length > 0 ? [{ out: above, where: "above", estimated: edges.heardHigh < edges.rangeHigh }] : []),
    ...(below.length > 0 ? [{ out: below, where: "below", estimated: edges.heardLow > edges.rangeLow }] : []),
  ];
  if (!coarse) sides.sort((a, b) => shareOf(b.out) - shareOf(a.out));
  const [first, second] = sides;
  const limit = (estimated: boolean) => (estimated ? "what you probably reach" : "your range");
  const amount = coarse ? "Part" : percent(shareOf(first!.out));
  const opening = `${amount} of the tune lies ${first!.where} ${limit(first!.estimated)} (${noteList(first!.out, spelling)})`;
  if (!second) return `${opening}.`;
  const rest = coarse ? " and part" : `, ${percent(shareOf(second.out)).toLowerCase()}`;
  const same = second.estimated === first!.estimated;
  return `${opening}${rest} ${second.where} ${same ? "it" : limit(second.estimated)} (${noteList(second.out, spelling)}).`;
}

function insideSentence({ marks, parts, spelling, coarse }: KeyFacts, edges: VoiceEdges): string {
  const over = marks.filter(({ midi }) => midi > edges.comfortHigh);
  const under = marks.filter(({ midi }) => midi < edges.comfortLow);
  if (over.length === 0 && under.length === 0) return comfortSentence(parts, marks, edges);
  // Strain above decides before weakness below.
  const side = shareOf(over) * 1.3 >= shareOf(under) ? over : under;
  const up = side === over;
  const furthest = up ? side[side.length - 1]! : side[0]!;
  const note = glyphs(noteName(furthest.midi, spelling));
  const distance = stepsInWords(up ? furthest.midi - edges.comfortHigh : edges.comfortLow - furthest.midi);
  const place = up ? "over" : "under";
  const unheard = side.filter(({ midi }) => midi > edges.heardHigh || midi < edges.heardLow);
  if (unheard.length > 0) {
    const what =
      unheard.length === 1
        ? `${note} is ${place} what you have sung so far`
        : `${coarse ? "Part" : percent(shareOf(unheard))} of the tune lies ${place} what you have sung so far, ${up ? "up" : "down"} to ${note}`;
    return `${what}; it is probably within reach (estimate).`;
  }
  const last = furthest.midi === (up ? edges.heardHigh : edges.heardLow);
  const soFar = up ? edges.heardHigh < edges.rangeHigh : edges.heardLow > edges.rangeLow;
  const lastWords = `${note} is the ${up ? "highest" : "lowest"} note you ${soFar ? "held so far" : "have"}`;
  if (side.length === 1) {
    const brief = !coarse && furthest.share <= briefUpTo ? ", briefly" : "";
    return last
      ? `${lastWords}, ${distance} ${place} your band.`
      : `${note} is ${distance} ${place} your band${brief}.`;
  }
  const amount = coarse ? "Part" : percent(shareOf(side));
  const reach = `${amount} of the tune lies ${place} your comfort band`;
  return last ? `${reach}, and ${lastWords}.` : `${reach}, ${up ? "up" : "down"} to ${note}.`;
}

function comfortSentence(parts: KeyParts, marks: readonly KeyMark[], edges: VoiceEdges): string {
  const lost = (part: keyof KeyParts) => partMaxima[part] - parts[part];
  const most = Math.max(lost("longHigh"), lost("lowCarry"), lost("roomAbove"), lost("roomBelow"));
  if (most <= 2) return "All of it sits in your comfort band.";
  if (lost("roomAbove") === most) {
    const room = edges.rangeHigh - marks[marks.length - 1]!.midi;
    return `All of it sits in your comfort band, with ${room === 0 ? "no room" : `only ${semitones(room)}`} to the top of your range.`;
  }
  if (lost("longHigh") === most) return "All of it is comfortable; long notes lie at the top edge of your band.";
  if (lost("lowCarry") === most)
    return "All of it is comfortable; much of it lies at the bottom edge, where it carries less.";
  const room = marks[0]!.midi - edges.rangeLow;
  return `All of it sits in your comfort band, with ${room === 0 ? "no room" : `only ${semitones(room)}`} to the bottom of your range.`;
}

/**
 * A share of the tune in words.
 *
 * @param share 0 to 1
 * @returns whole percent, never "0 %" for something that is there
 * @example percent(0.071) // => "7 %"
 */
export function percent(share: number): string {
  const whole = Math.round(share * 100);
  return share > 0 && whole === 0 ? "Under 1 %" : `${whole} %`;
}

/**
 * A distance in words, as one says it to a singer.
 *
 * @param steps whole semitones, 1 or more
 * @returns with its article
 */
function stepsInWords(steps: number): string {
  if (steps === 1) return "a semitone";
  return steps === 2 ? "a whole tone" : semitones(steps);
}

function semitones(count: number): string {
  return `${countWord(count)} semitone${count === 1 ? "" : "s"}`;
}

function shareOf(marks: readonly KeyMark[]): number {
  return marks.reduce((sum, { share }) => sum + share, 0);
}

function noteList(marks: readonly KeyMark[], spelling: Spelling): string {
  const names = marks.map(({ midi }) => glyphs(noteName(midi, spelling)));
  return names.length <= 2 ? names.join(" and ") : `${names[0]} to ${names[names.length - 1]}`;
}
