import type { SingingVoice } from "@/shared/keys/keyScore";
import { scoreKeys } from "@/shared/keys/scoreKeys";
import { accidentalCount, parseKeyName } from "@/shared/music/keyName";
import { notesOf } from "../bench/keyScores";
import { knownSongs } from "./tunes/knownSongs";
import { printedKeys } from "./tunes/printedKeys";

export interface PrintedKeyHit {
  name: string;
  printed: readonly string[];
  printedIn: string;
  /** place of the best printed key in the ranking, 1 = first */
  place: number;
  /** points of that key below our best */
  behind: number;
  /** somebody with this voice cannot sing the printed key */
  beyond: boolean;
  /** the first three of ours */
  first: string[];
}

/** Where each printed key stands in our ranking; keys with more accidentals than that are left out of it. */
export function printedKeyHits(voice: SingingVoice, mostAccidentals = 7): PrintedKeyHit[] {
  return printedKeys.map(({ name, tonics, printedIn }) => {
    const song = knownSongs.find((each) => each.name === name)!;
    const { tonic, mode } = parseKeyName(song.key)!;
    // The tune's own key must not decide ties, as it is often the printed one; the farthest from C decides instead.
    const tune = { kind: "melody" as const, notes: notesOf(song), home: tonic };
    const keys = scoreKeys(tune, voice, { mode, presentKey: "F#" }).filter(
      (key) => accidentalCount({ tonic: key.tonic, mode }) <= mostAccidentals,
    );
    const place = Math.min(
      ...tonics.map((printed) => keys.findIndex((key) => key.tonic === printed)).filter((k) => k >= 0),
    );
    const { score, beyond } = keys[place]!;
    const first = keys.slice(0, 3).map((key) => key.tonic);
    return { name, printed: tonics, printedIn, place: place + 1, behind: keys[0]!.score - score, beyond, first };
  });
}

export function amongBestTwo(hits: readonly PrintedKeyHit[]): number {
  return hits.filter(({ place }) => place <= 2).length / hits.length;
}
