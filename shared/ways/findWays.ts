import { drawnShape } from "./findShapes";
import { easeOf } from "./shapeEase";
import type { WayMoves } from "./askedWay";
import type { Way, WayChord } from "./way";
import { wayCandidates, type WayCandidate, type WaysQuestion } from "./wayCandidates";
import { worthwhileInOrder } from "./wayOrder";
import { wayCautions, wayCost, wayTitle, wayWhy, type WayFacts } from "./wayWords";
import { travelWords } from "./travelWords";

/**
 * Every sensible way of reaching a key on an instrument: retune r, capo c and shapes of key X with r + c + X = target.
 *
 * Ways with an unsafe string are left out, and so are those that another way beats or equals in everything, and those
 * whose capo only undoes the retune. Ways with fewer missing shapes come first, then those that cost less; disliking
 * something more never promotes a way that has more of it. `differentWays` picks the best of each kind. A way that
 * was settled on and is not worth proposing stands last.
 *
 * @param question chords, keys, instrument and the player's wishes
 * @returns ways, best first; one with nothing retuned and no capo is always among them
 * @throws RangeError if a tonic or a string's note cannot be read
 * @see common practice: G shapes with capo 7 sound in D; strings A-D-F♯ let down a whole tone play D shapes in C
 */
export function findWays(question: WaysQuestion): Way[] {
  const candidates = wayCandidates(question);
  const found = worthwhileInOrder(candidates);
  const { settled } = question;
  const kept = settled && candidates.find((each) => isSameWay(each, settled));
  return [...found, ...(kept && !found.includes(kept) ? [kept] : [])].map((candidate) => toWay(candidate, question));
}

function isSameWay({ retune, capo, shapeKey }: WayCandidate, settled: WayMoves): boolean {
  return retune === settled.retune && capo === settled.capo && shapeKey.tonic === settled.shapeKey;
}

function toWay(candidate: WayCandidate, { to, instrument }: WaysQuestion): Way {
  const { kind, retune, capo, shapeKey, asWritten, played, strings } = candidate;
  // Frets stand closer above a capo: everything along the neck shrinks alike.
  const shrink = instrument.fretMap ? 1 : 2 ** (-capo / 12);
  const chords = played.chords.map(({ name, chord, taken, known }, k): WayChord => {
    const shape = taken && chord ? drawnShape(taken, chord, instrument, capo, shrink) : null;
    return {
      sounding: candidate.sounding[k]!,
      written: candidate.written[k]!,
      played: name,
      shape,
      ...(known === null ? null : { known }),
    };
  });
  const real = played.chords.filter(({ chord }) => chord !== null);
  const told = real.some(({ known }) => known !== null);
  const travelMm = Math.round(played.travelMm * shrink);
  const facts: WayFacts = {
    kind,
    retune,
    capo,
    shapeKey,
    asWritten,
    allKnown: told && real.every(({ known }) => known === true),
    chords,
    withoutBass: real.filter(({ withoutBass }) => withoutBass).map(({ name }) => name),
    difficulty: 1 - easeOf(played.cost),
    strings,
    instrument,
  };
  return {
    kind,
    retune,
    capo,
    shapeKey: shapeKey.tonic,
    soundingKey: to.tonic,
    chords,
    difficulty: facts.difficulty,
    strings,
    title: wayTitle(facts),
    cost: wayCost(facts),
    cautions: wayCautions(facts),
    why: wayWhy(facts),
    travelMm,
    travel: travelWords(travelMm),
  };
}
