import { parseChord, transposeChord, type Chord } from "../music/chord";
import { spellTonic, tonicPitchClass, type KeyName } from "../music/keyName";
import type { Instrument } from "../instruments/instrument";
import { tensionChanges } from "../instruments/tension";
import { handPath, type HandPath } from "./handPath";
import { easeOf } from "./shapeEase";
import { missingShapes } from "./missingShapes";
import { stockOf } from "./shapeLibrary";
import type { StringChange, Way, WayChord, WayPreferences } from "./way";
import { wayCautions, wayCost, wayTitle, wayWhy, type WayFacts } from "./wayWords";

/** What is to be played, where it shall sound, and on what. */
export interface WaysQuestion {
  /** chord symbols as written, distinct, in order of first appearance */
  chords: readonly string[];
  /** the key the chart is written in */
  from: KeyName;
  /** the key it shall sound in */
  to: KeyName;
  instrument: Instrument;
  preferences?: WayPreferences;
}

/** Wishes of somebody who has not said any. */
export const defaultPreferences: WayPreferences = {
  barre: 0.4,
  capo: 0.2,
  retune: 0.4,
  knownShapes: [],
  highestCapo: 9,
};

const retunes = [0, -1, -2, -3, -4, 1];
const highestCapo = 9;

/** Cost of what is done to the instrument, on the scale of one shape's cost. */
const work = { capoFret: 0.06, capoFretBeyondFive: 0.3, retune: 0.4, retuneSemitone: 0.12, slack: 1.2, tight: 0.8 };
/** What full dislike adds: for each capo fret, each semitone of a retune, and for barres throughout. */
const dislike = { capoFret: 0.3, retuneSemitone: 0.8, barres: 2 };

/** Costs of the hand that differ by no more than this are alike: a capo narrows every reach a little. */
const alike = 0.15;
/** A way that costs this much more than the best is not worth showing. */
const tooMuchMore = 1.5;

interface Candidate {
  kind: Way["kind"];
  retune: number;
  capo: number;
  shapeKey: KeyName;
  asWritten: boolean;
  chords: WayChord[];
  /** how many chords the instrument has no shape for */
  missing: number;
  withoutBass: string[];
  allKnown: boolean;
  path: HandPath;
  strings: StringChange[];
  difficulty: number;
  /** cost of the hand, dislike of barres included */
  hand: number;
  total: number;
}

/**
 * Every sensible way of reaching a key on an instrument: retune r, capo c and shapes of key X with r + c + X = target.
 *
 * Ways with an unsafe string are left out, and so are those that another way beats or equals in everything, and those
 * whose capo only undoes the retune. First come the best as it is, the best capo, the best retune and the best mix of
 * both, then the rest: those with fewer missing shapes before those with more, then by cost. Within a kind, and among
 * the first of each kind, disliking something more never promotes a way that has more of it.
 *
 * @param question chords, keys, instrument and the player's wishes
 * @returns ways, best first; one with nothing retuned and no capo is always among them
 * @throws RangeError if a tonic or a string's note cannot be read
 * @see common practice: G shapes with capo 7 sound in D; strings A-D-F♯ let down a whole tone play D shapes in C
 */
export function findWays(question: WaysQuestion): Way[] {
  const { from, to, instrument } = question;
  const wishes = question.preferences ?? defaultPreferences;
  const target = tonicPitchClass(to.tonic);
  const written = question.chords.map((text) => ({ text, chord: parseChord(text) }));
  const topCapo = Math.max(0, Math.min(highestCapo, instrument.capoTo, wishes.highestCapo));
  const candidates: Candidate[] = [];
  for (const retune of retunes) {
    const strings = stringChanges(instrument, retune);
    if (strings.some(({ verdict }) => verdict === "unsafe")) continue;
    for (let capo = 0; capo <= topCapo; capo++) {
      const shapePc = (target - retune - capo + 24) % 12;
      const shapeKey: KeyName = {
        tonic:
          shapePc === target
            ? to.tonic
            : shapePc === tonicPitchClass(from.tonic)
              ? from.tonic
              : spellTonic(shapePc, from.mode),
        mode: from.mode,
      };
      candidates.push(candidate(written, from, to, shapeKey, { retune, capo, strings }, instrument, wishes));
    }
  }
  const standing = candidates.filter((way) => !candidates.some((other) => dominates(other, way)));
  return inOrder(worthwhile(standing)).map((way) => toWay(way, to, instrument));
}

interface Setup {
  retune: number;
  capo: number;
  strings: StringChange[];
}

function candidate(
  written: readonly { text: string; chord: Chord | null }[],
  from: KeyName,
  to: KeyName,
  shapeKey: KeyName,
  { retune, capo, strings }: Setup,
  instrument: Instrument,
  wishes: WayPreferences,
): Candidate {
  const home = tonicPitchClass(from.tonic);
  const known = new Set(wishes.knownShapes);
  const played = written.map(({ text, chord }) => {
    if (!chord) return { text, sounding: text, stock: null, known: null };
    const name = transposeChord(chord, tonicPitchClass(shapeKey.tonic) - home, shapeKey, from);
    const parsed = parseChord(name);
    const stock = parsed ? stockOf(parsed, instrument) : null;
    const sounding = transposeChord(chord, tonicPitchClass(to.tonic) - home, to, from);
    return { text: name, sounding, stock, known: known.size === 0 ? null : known.has(name) };
  });
  const path = handPath(played, instrument, capo, wishes.barre);
  const kind = retune === 0 ? (capo === 0 ? "as-is" : "capo") : capo === 0 ? "retune" : "retune-capo";
  const chords = played.map(({ text, sounding }, k) => {
    return { sounding, written: written[k]!.text, played: text, shape: path.shapes[k] ?? null };
  });
  const done =
    work.capoFret * capo +
    work.capoFretBeyondFive * Math.max(0, capo - 5) +
    (retune === 0 ? 0 : work.retune + work.retuneSemitone * Math.abs(retune)) +
    (strings.some(({ verdict }) => verdict === "slack") ? work.slack : 0) +
    (strings.some(({ verdict }) => verdict === "tight") ? work.tight : 0);
  const hand = path.cost + (wishes.barre * dislike.barres * path.barres) / Math.max(1, chords.length);
  const wished = wishes.capo * dislike.capoFret * capo + wishes.retune * dislike.retuneSemitone * Math.abs(retune);
  return {
    kind,
    retune,
    capo,
    shapeKey,
    asWritten: tonicPitchClass(shapeKey.tonic) === home,
    chords,
    missing: missingShapes(chords).names.length,
    withoutBass: played.filter(({ stock }) => stock?.withoutBass).map(({ text }) => text),
    allKnown: played.length > 0 && played.every((chord) => chord.known === true),
    path,
    strings,
    difficulty: 1 - easeOf(path.cost),
    hand,
    total: hand + done + wished,
  };
}

function stringChanges(instrument: Instrument, retune: number): StringChange[] {
  return tensionChanges(instrument, retune).map(({ string, to, beforeLb, afterLb, verdict }) => {
    return { from: string, to, beforeLb, afterLb, verdict };
  });
}

/** At least as good in everything that can be weighed, and better in something. */
function dominates(a: Candidate, b: Candidate): boolean {
  // A capo that only undoes the retune leaves the instrument as it is, with looser strings and fewer frets.
  if (b.retune !== 0 && b.retune + b.capo === 0 && a.retune === 0 && a.capo === 0) return true;
  // A capo one fret higher spares the strings, so tuning up is nothing to go with a capo.
  if (b.retune > 0 && b.capo > 0 && a.retune === 0 && a.capo === b.capo + b.retune) return true;
  const worth = (way: Candidate) => [
    way.missing,
    way.capo,
    Math.abs(way.retune),
    way.retune > 0 ? 1 : 0,
    way.path.barres,
    way.asWritten ? 0 : 1,
  ];
  const first = worth(a);
  const second = worth(b);
  const easier = b.hand - a.hand;
  if (easier < -alike || first.some((cost, k) => cost > second[k]!)) return false;
  return easier > alike || first.some((cost, k) => cost < second[k]!);
}

/**
 * Without ways that lack more shapes or cost far more than the best one, but for those that keep the chart or the
 * instrument as it is.
 */
function worthwhile(ways: readonly Candidate[]): Candidate[] {
  const fewest = Math.min(...ways.map(({ missing }) => missing));
  const best = Math.min(...ways.filter(({ missing }) => missing === fewest).map(({ total }) => total));
  return ways.filter(
    ({ kind, asWritten, missing, total }) =>
      kind === "as-is" || asWritten || (missing === fewest && total <= best + tooMuchMore),
  );
}

function inOrder(ways: readonly Candidate[]): Candidate[] {
  const byCost = [...ways].sort(
    (a, b) =>
      a.missing - b.missing ||
      a.total - b.total ||
      a.capo - b.capo ||
      Math.abs(a.retune) - Math.abs(b.retune) ||
      a.retune - b.retune,
  );
  const first = byCost.filter((way, k) => byCost.findIndex(({ kind }) => kind === way.kind) === k);
  return [...first, ...byCost.filter((way) => !first.includes(way))];
}

function toWay(way: Candidate, to: KeyName, instrument: Instrument): Way {
  const { kind, retune, capo, shapeKey, asWritten, allKnown, chords, withoutBass, difficulty, strings } = way;
  const facts: WayFacts = {
    kind,
    retune,
    capo,
    shapeKey,
    asWritten,
    allKnown,
    chords,
    withoutBass,
    difficulty,
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
    difficulty,
    strings,
    title: wayTitle(facts),
    cost: wayCost(facts),
    cautions: wayCautions(facts),
    why: wayWhy(facts),
  };
}
