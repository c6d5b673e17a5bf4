import { keyFifths, type KeyName, type Mode, scaleSteps, spellTonic, tonicPitchClass } from "../music/keyName";
import { keySign, keyWords, movedKey } from "../music/keyWords";
import { distanceWords } from "../music/moveWords";
import { glyphs, pitchClass } from "../music/pitch";

/** What is known of a recording: its home note, and whether it sounds major or minor, where that could be told. */
export interface RecordingHome {
  tonic: string;
  mode: Mode | null;
}

/** How a chart and a recording come together. */
export type Reconciliation = {
  /**
   * same: nothing to do. relative: the same notes around another home note. mode: the same home note, major against
   * minor. apart: the recording sounds in another key.
   */
  kind: "same" | "relative" | "mode" | "apart";
  chart: KeyName;
  /** the recording's key; its mode is the chart's where only the home note is known */
  recording: KeyName;
  /** semitones from the chart up to the recording, 0 to 11 */
  up: number;
  /** the same by the smaller way, -5 to 6 */
  nearest: number;
  /** the fret that makes the chart sound as the recording; a capo only raises; null where none is needed or none does it */
  capo: number | null;
  /** the chart is probably written in the shapes that are played, and the capo was left out */
  shapesWritten: boolean;
  /** the key in which the chart would sound as the recording; null where that is no question of moving it */
  moveTo: KeyName | null;
  /** plain sentences with glyphs, the answer first */
  words: string[];
};

/** Up to here a capo is of use, unless the instrument says otherwise. */
const usualCapoTo = 9;
/** Capos that people really play with. */
const playedCapoTo = 7;
/** Keys whose main chords have open shapes on common fretted instruments. */
const openKeys = new Set(["C major", "G major", "D major", "A major", "E major", "A minor", "E minor", "D minor"]);

/**
 * Compares the key a chart is written in with the home note of a recording. Octaves do not matter.
 *
 * @param chart the written key
 * @param home the recording's home note; mode null = only the note is known
 * @param capoTo highest fret for a capo, 0 for an instrument without one
 * @returns both keys, the distance, and what brings them together
 * @throws RangeError if a tonic is no note name
 * @see common practice: a chart in G sounding D is capo 7; FACTS of the trade: a capo can only raise
 * @example reconcileKeys({ tonic: "G", mode: "major" }, { tonic: "D", mode: null }).capo // => 7
 */
export function reconcileKeys(chart: KeyName, home: RecordingHome, capoTo = usualCapoTo): Reconciliation {
  const recording: KeyName = {
    tonic: home.tonic,
    mode: home.mode === null || sameThird(home.mode, chart.mode) ? chart.mode : home.mode,
  };
  const mismatch = recording.mode !== chart.mode;
  const tonicUp = distanceUp(chart.tonic, recording.tonic);
  // Major against minor is compared by the notes both use: A minor sounds with the notes of C major.
  const up = mismatch && tonicUp !== 0 ? pitchClass(7 * (keyFifths(recording) - keyFifths(chart))) : tonicUp;
  const kind = up !== 0 ? "apart" : !mismatch ? "same" : tonicUp === 0 ? "mode" : "relative";
  const capo = kind === "apart" && up <= capoTo ? up : null;
  const shapesWritten = capo !== null && capo <= playedCapoTo && openKeys.has(keyWords(chart));
  const moveTo = kind === "apart" ? (mismatch ? movedKey(chart, up) : spelled(recording)) : null;
  const result = { kind, chart, recording, up, nearest: up > 6 ? up - 12 : up, capo, shapesWritten, moveTo } as const;
  return { ...result, words: explain(result, home).map(glyphs) };
}

type Facts = Omit<Reconciliation, "words">;

function explain(facts: Facts, home: RecordingHome): string[] {
  const { chart, recording, kind } = facts;
  const said = home.mode === null ? `Its home note is ${home.tonic}` : `It sounds in ${keyWords(recording)}`;
  const written = `the chart is written in ${keyWords(chart)}`;
  if (kind === "same")
    return [
      `${said}, and ${written}: they fit.`,
      "Play the chart as it is. In which octave the home note lies does not matter.",
    ];
  if (kind === "mode")
    return [
      `${said}, and ${written}: the same home note, but ${thirdWord(recording.mode)} against ${thirdWord(chart.mode)}.`,
      "No capo and no transposing changes that. Listen once more whether the song sounds bright or dark; if it stays so, this is a chart of another version.",
    ];
  if (kind === "relative")
    return [
      `${said}, and ${written}. Both use the same notes, around another home note.`,
      `Chart and recording probably fit as they are: if the song rests on ${keySign(recording)} at its end, call its key ${keyWords(recording)} and leave the chords as they are.`,
    ];
  return [...apart(facts, said, written), ...relativeDoubt(facts, home)];
}

function apart(
  { chart, recording, nearest, up, capo, shapesWritten, moveTo }: Facts,
  said: string,
  written: string,
): string[] {
  const mismatch = recording.mode !== chart.mode;
  const by = mismatch
    ? `${keyWords(recording)} has the notes of ${keyWords(moveTo ?? recording)}, so the recording`
    : "The recording";
  const way = `${by} sounds ${distanceWords(nearest)} ${nearest < 0 ? "lower" : "higher"} than the chart.`;
  const words = [`${said}, and ${written}.`, way];
  if (capo === null)
    words.push(
      `No capo brings them together: a capo only raises, and this one would stand at fret ${up}. Transpose the chart instead.`,
    );
  else
    words.push(
      `Capo ${capo} does it: the chords of the chart as shapes, and it sounds in ${keySign(moveTo ?? recording)}.`,
    );
  if (shapesWritten)
    words.push(
      `So the chart is probably written as shapes with the capo left out: ${keySign(chart)} lies well under the hand, and somebody played it with a capo at fret ${capo}.`,
    );
  return words;
}

/** A hummed home note tells nothing of major and minor: the relative key may be meant. */
function relativeDoubt({ chart, recording, up }: Facts, home: RecordingHome): string[] {
  if (home.mode !== null) return [];
  const minor = isMinor(chart.mode);
  if (up !== (minor ? 3 : 9)) return [];
  const other = { tonic: recording.tonic, mode: minor ? ("major" as const) : ("minor" as const) };
  return [
    `But listen again: ${keyWords(other)} has the same notes as ${keyWords(chart)}. If the recording sounds ${minor ? "bright" : "dark"} and rests on ${keySign(other)}, the chart already fits and nothing needs to move.`,
  ];
}

function spelled(key: KeyName): KeyName {
  return Math.abs(keyFifths(key)) <= 6
    ? key
    : { tonic: spellTonic(tonicPitchClass(key.tonic), key.mode), mode: key.mode };
}

function distanceUp(from: string, to: string): number {
  return pitchClass(tonicPitchClass(to) - tonicPitchClass(from));
}

function isMinor(mode: Mode): boolean {
  return scaleSteps(mode).includes(3);
}

/** What a melody alone tells apart is the third: dorian goes with minor, mixolydian with major. */
function sameThird(one: Mode, other: Mode): boolean {
  return isMinor(one) === isMinor(other);
}

function thirdWord(mode: Mode): string {
  return isMinor(mode) ? "minor" : "major";
}
