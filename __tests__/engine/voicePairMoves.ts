import type { SingingVoice, Tune } from "@/shared/keys/keyScore";
import { scoreKeys } from "@/shared/keys/scoreKeys";
import { voiceTypes } from "@/shared/keys/voiceTypes";
import { parseKeyName } from "@/shared/music/keyName";
import { notesOf } from "../bench/keyScores";
import { knownSongs } from "./tunes/knownSongs";
import { printedKeys } from "./tunes/printedKeys";

/** How the best key of a tune moves from a higher voice to a lower one. */
export interface PairMove {
  tune: string;
  high: string;
  low: string;
  /** semitones between the middles of the two published ranges */
  differ: number;
  /** one key alone has the best score, for both of them */
  alone: boolean;
  /** how far the move of the middle of the best keys is from that; with one best key each, of that key */
  offBy: number;
  /** the same for the keys that stand first; among equal scores these are chosen by accidentals, not by the voice */
  firstOffBy: number;
}

/** Every pair of the single voice types with every tune of `printedKeys`. */
export function voicePairMoves(): PairMove[] {
  const single = voiceTypes.filter(({ kind }) => kind === "voice");
  return printedKeys.flatMap(({ name }) => {
    const song = knownSongs.find((each) => each.name === name)!;
    const { tonic } = parseKeyName(song.key)!;
    const tune: Tune = { kind: "melody", notes: notesOf(song), home: tonic };
    const judged = single.map(({ id, voice }) => {
      const middle = (voice.range.lowMidi + voice.range.highMidi) / 2;
      const best = bestPlaces(tune, voice);
      const sum = best.reduce((total, place) => total + place, 0);
      return { id, middle, best, centre: sum / best.length, first: scoreKeys(tune, voice)[0]!.lowMidi };
    });
    return judged.flatMap((high, k) =>
      judged.slice(k + 1).map((low) => {
        const differ = high.middle - low.middle;
        return {
          tune: name,
          high: high.id,
          low: low.id,
          differ,
          alone: high.best.length === 1 && low.best.length === 1,
          offBy: Math.abs(high.centre - low.centre - differ),
          firstOffBy: Math.abs(high.first - low.first - differ),
        };
      }),
    );
  });
}

/** The lowest note of the tune in each key that shares the best score, low to high. */
export function bestPlaces(tune: Tune, voice: SingingVoice): number[] {
  const keys = scoreKeys(tune, voice);
  return keys
    .filter(({ score }) => score === keys[0]!.score)
    .map(({ lowMidi }) => lowMidi)
    .sort((a, b) => a - b);
}
