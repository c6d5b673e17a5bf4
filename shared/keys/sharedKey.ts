import { keyFifths, tonicPitchClass } from "../music/keyName";
import type { KeyScore, SingingVoice, Tune } from "./keyScore";
import { voiceEdges } from "./keyParts";
import { compareTies } from "./keyTies";
import { scoreKeys, type KeyOptions } from "./scoreKeys";
import { sharedKeyReason } from "./sharedKeyReason";
import type { SharedSinger } from "./sharedSinger";

/** One of those who sing together. */
export interface Singer {
  name: string;
  voice: SingingVoice;
}

/** One key, judged for several singers. */
export interface SharedKey {
  /** tonic as this key is spelled, ASCII */
  tonic: string;
  /** the score of the one who is worst off in it, 0 to 100 */
  worst: number;
  /** mean of the scores, 0 to 100, not rounded */
  mean: number;
  /** somebody cannot sing all of it */
  beyond: boolean;
  /** in the order in which they were given */
  singers: SharedSinger[];
  /** who has it hardest and by how much, one sentence with glyphs */
  reason: string;
  coarse: boolean;
}

/**
 * Judges all twelve keys for people who sing the same tune together, each in the octave that suits them best.
 *
 * The fairest key is the one whose worst-off singer is best off; among those equal in this, the one whose second worst
 * off is, and so on (leximin). Singers with the same voice count once there, so that a second one like the first takes
 * nothing from anybody; how many they are counts in the mean, which decides between keys that are equally fair.
 *
 * @param tune notes with durations in quarter notes, or the span alone
 * @param singers at least one
 * @param options mode and present key
 * @returns twelve keys, fairest first; further ties by fewest accidentals, then by closeness to the present key
 * @throws RangeError if nobody sings, or tune or a voice is refused by scoreKeys
 * @see A. Sen, Collective Choice and Social Welfare, 1970, on the leximin order
 */
export function scoreSharedKeys(
  tune: Tune,
  singers: readonly Singer[],
  options: Pick<KeyOptions, "mode" | "presentKey"> = {},
): SharedKey[] {
  if (singers.length === 0) throw new RangeError("at least one singer is needed");
  const mode = options.mode ?? "major";
  const first = singers.map(({ voice }, k) => indexOfSame(singers, voice, k));
  const judged = singers.map(({ voice }) => byPitchClass(scoreKeys(tune, voice, options)));
  const all = Array.from({ length: 12 }, (_, pc) => {
    const each = singers.map(({ name, voice }, k) => singerIn(name, voice, judged[k]![pc]!));
    const distinct = each.flatMap(({ score }, k) => (first[k] === k ? [score] : []));
    const { tonic, coarse } = each[0]!.key;
    const spelling = keyFifths({ tonic, mode }) < 0 ? ("flats" as const) : ("sharps" as const);
    const key: SharedKey = {
      tonic,
      worst: Math.min(...distinct),
      mean: meanScore(each),
      beyond: each.some(({ beyond }) => beyond),
      singers: each,
      reason: sharedKeyReason(each, spelling),
      coarse,
    };
    return { key, ladder: distinct.sort((a, b) => a - b) };
  });
  const ties = compareTies(mode, options.presentKey ?? tune.home);
  return all
    .sort((a, b) => leximin(a.ladder, b.ladder) || b.key.mean - a.key.mean || ties(a.key, b.key))
    .map(({ key }) => key);
}

function byPitchClass(keys: readonly KeyScore[]): KeyScore[] {
  const sorted: KeyScore[] = [];
  for (const key of keys) sorted[tonicPitchClass(key.tonic)] = key;
  return sorted;
}

/** The first singer with the same voice, as voices are judged: by whole semitones. */
function indexOfSame(singers: readonly Singer[], voice: SingingVoice, own: number): number {
  const sign = (of: SingingVoice) => {
    const { rangeLow, rangeHigh, comfortLow, comfortHigh } = voiceEdges(of);
    return [rangeLow, comfortLow, comfortHigh, rangeHigh].join();
  };
  const wanted = sign(voice);
  const found = singers.findIndex((other) => sign(other.voice) === wanted);
  return found < 0 ? own : found;
}

function singerIn(name: string, voice: SingingVoice, key: KeyScore): SharedSinger {
  const { rangeLow, rangeHigh, comfortLow, comfortHigh } = voiceEdges(voice);
  const { octave, shift, score, beyond, lowMidi, highMidi } = key;
  const past = (low: number, high: number) => {
    return { above: Math.max(0, highMidi - high), below: Math.max(0, low - lowMidi) };
  };
  return {
    name,
    octave,
    shift,
    score,
    beyond,
    squeezed: past(comfortLow, comfortHigh),
    outOfRange: past(rangeLow, rangeHigh),
    key,
  };
}

function meanScore(each: readonly SharedSinger[]): number {
  return Math.round((each.reduce((sum, { score }) => sum + score, 0) / each.length) * 1e9) / 1e9;
}

function leximin(a: readonly number[], b: readonly number[]): number {
  const differs = a.findIndex((score, k) => score !== b[k]);
  return differs < 0 ? 0 : b[differs]! - a[differs]!;
}
