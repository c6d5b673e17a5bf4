import type { SingingVoice } from "@/shared/keys/keyScore";
import { scoreKeys } from "@/shared/keys/scoreKeys";
import { accidentalCount, parseKeyName } from "@/shared/music/keyName";
import { parseNoteName } from "@/shared/music/pitch";
import { notesOf } from "../bench/keyScores";
import { knownSongs } from "./tunes/knownSongs";
import { printedKeys } from "./tunes/printedKeys";

/** A band that people sing in unison, women as written and men an octave lower. */
export interface UnisonBand {
  name: string;
  source: string;
  voice: SingingVoice;
}

/**
 * The usual unison band that printed keys are held against: between the outer limits of the middle voice, in comfort
 * where present-day hymnals keep their tunes.
 */
export const usualBand = band(
  ["A3", "C4", "Eb5", "F5"],
  "range: mezzo-soprano of The New Harvard Dictionary of Music, 1986 (and Grove's baritone an octave lower); comfort: where current Unitarian Universalist hymnals' tunes fall (danielharper.org, p=2655)",
);

/** Other readings of the same sources, for comparison: how much hangs on the choice of the band. */
export const otherBands: readonly UnisonBand[] = [
  band(
    ["Bb3", "C4", "D5", "F5"],
    "range: editors' lowest note to the F of older practice; comfort: C to the usual top D (praytellblog.com, 2015)",
  ),
  band(["A3", "C4", "D5", "F5"], "range: mezzo-soprano as above; comfort: C to the usual top D"),
  band(["Bb3", "C4", "D5", "Eb5"], "range: editors' band (common practice); comfort: C to the usual top D"),
  band(["Bb3", "C4", "C5", "Eb5"], "range: editors' band; comfort: C to C, a pastor's rule (spinditty.com)"),
];

export interface PrintedKeyHit {
  name: string;
  printed: readonly string[];
  printedIn: string;
  /** place of the best printed key in the ranking, 1 = first */
  place: number;
  /** the first three of ours */
  first: string[];
}

/** Where each printed key stands in our ranking; keys with more accidentals than that are left out of it. */
export function printedKeyHits({ voice }: UnisonBand, mostAccidentals = 7): PrintedKeyHit[] {
  return printedKeys.map(({ name, tonics, printedIn }) => {
    const song = knownSongs.find((each) => each.name === name)!;
    const { tonic, mode } = parseKeyName(song.key)!;
    // The tune's own key must not decide ties, as it is often the printed one; the farthest from C decides instead.
    const tune = { kind: "melody" as const, notes: notesOf(song), home: tonic };
    const keys = scoreKeys(tune, voice, { mode, presentKey: "F#" })
      .map((key) => key.tonic)
      .filter((key) => accidentalCount({ tonic: key, mode }) <= mostAccidentals);
    const places = tonics.flatMap((printed) => (keys.includes(printed) ? [keys.indexOf(printed) + 1] : []));
    return { name, printed: tonics, printedIn, place: Math.min(...places), first: keys.slice(0, 3) };
  });
}

export function amongBestTwo(hits: readonly PrintedKeyHit[]): number {
  return hits.filter(({ place }) => place <= 2).length / hits.length;
}

function band(edges: readonly [string, string, string, string], source: string): UnisonBand {
  const [low, comfortLow, comfortHigh, high] = edges.map((edge) => parseNoteName(edge)!);
  const voice = {
    range: { lowMidi: low!, highMidi: high! },
    comfort: { lowMidi: comfortLow!, highMidi: comfortHigh! },
  };
  return { name: `${edges[0]}–${edges[3]}, comfort ${edges[1]}–${edges[2]}`, source, voice };
}
