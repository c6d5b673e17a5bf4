import type { SingingVoice, Tune } from "@/shared/keys/keyScore";
import { scoreKeys } from "@/shared/keys/scoreKeys";
import { voiceTypes } from "@/shared/keys/voiceTypes";
import { parseKeyName } from "@/shared/music/keyName";
import { notesOf } from "../bench/keyScores";
import { knownSongs } from "./tunes/knownSongs";
import { printedKeys } from "./tunes/printedKeys";

/** How far the best key of a tune moves from a higher voice to a lower one. */
export interface PairMove {
  tune: string;
  high: string;
  low: string;
  /** semitones between the middles of the two published ranges */
  differ: number;
  /** how far the move is from that; of several keys with the best score, the nearest */
  offBy: number;
  /** the same for the keys that stand first, ties broken by accidentals, which know nothing of voices */
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
      return { id, middle, best: bestPlaces(tune, voice), first: scoreKeys(tune, voice)[0]!.lowMidi };
    });
    return judged.flatMap((high, k) =>
      judged.slice(k + 1).map((low) => {
        const differ = high.middle - low.middle;
        const off = high.best.flatMap((a) => low.best.map((b) => Math.abs(a - b - differ)));
        const firstOffBy = Math.abs(high.first - low.first - differ);
        return { tune: name, high: high.id, low: low.id, differ, offBy: Math.min(...off), firstOffBy };
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
