import { type KeyName, type Mode, keyOfFifths } from "../music/keyName";
import type { MelodyNote } from "./melody";
import { readBarline, readDirection } from "./musicXmlJumps";
import type { ScoreSigns } from "./scoreSigns";
import { type XmlElement, child, childNumber, childrenOf } from "./xmlTree";

/** A note of a score inside its measure; times in quarter notes. */
export interface ScoreNote extends MelodyNote {
  voice: string;
  tieStop: boolean;
  /** syllables of the verses in turn */
  verses: ({ text: string; endsLine: boolean } | null)[];
}
/** What stands in one measure of a part. */
interface Measure {
  notes: ScoreNote[];
  length: number;
  signs: ScoreSigns;
}
/** One part of a score, read but not yet played. */
export interface PartText {
  percussion: boolean;
  measures: Measure[];
  key: KeyName | null;
  signature: number | null;
  /** quarter notes a minute at the first mark, or null */
  tempo: number | null;
  /** upper figure of the first metre, or null */
  beats: number | null;
  /** whether a later mark of speed or metre says something else */
  changes: { tempo: boolean; metre: boolean };
}

const letters: Record<string, number> = { C: 0, D: 2, E: 4, F: 5, G: 7, A: 9, B: 11 };
const modes: Record<string, Mode> = { ionian: "major", aeolian: "minor" };
for (const mode of ["major", "minor", "dorian", "phrygian", "lydian", "mixolydian", "locrian"] as const)
  modes[mode] = mode;
const mostVerses = 20;
/** Quarter notes of the metronome's units. */
const units: Record<string, number> = { whole: 4, half: 2, quarter: 1, eighth: 0.5, "16th": 0.25 };

/**
 * Reads the measures of one part; pitches as they sound.
 *
 * @param written the part's measures in order
 * @returns its notes by measure, times in quarter notes, with the signs that send a player elsewhere
 * @see MusicXML 4.0: attributes, note, backup, forward, direction, barline
 */
export function readPart(written: readonly XmlElement[]): PartText {
  let divisions = 1;
  let transposition = 0;
  let key: KeyName | null = null;
  let signature: number | null = null;
  let percussion = false;
  let tempo: number | null = null;
  let beats: number | null = null;
  const changes = { tempo: false, metre: false };
  const measures = written.map((measure): Measure => {
    const notes: ScoreNote[] = [];
    const signs: ScoreSigns = {};
    let now = 0;
    let onset = 0;
    let length = 0;
    for (const element of measure.children) {
      if (element.name === "attributes") {
        divisions = Math.max(childNumber(element, "divisions") ?? divisions, 1e-6);
        const transpose = child(element, "transpose");
        if (transpose)
          transposition =
            (childNumber(transpose, "chromatic") ?? 0) + 12 * (childNumber(transpose, "octave-change") ?? 0);
        signature ??= signatureOf(child(element, "key"), transposition);
        key ??= keyOf(child(element, "key"), signature);
        const stated = beatsOf(child(element, "time"));
        beats ??= stated;
        changes.metre ||= stated !== null && stated !== beats;
        if (childrenOf(element, "clef").some((clef) => child(clef, "sign")?.text.trim() === "percussion"))
          percussion = true;
      } else if (element.name === "note") {
        const duration = (childNumber(element, "duration") ?? 0) / divisions;
        if (child(element, "grace") || duration <= 0) continue;
        if (!child(element, "chord")) {
          onset = now;
          now += duration;
        }
        const midi = child(element, "cue") ? null : pitchOf(child(element, "pitch"), transposition);
        if (midi !== null) notes.push({ ...noteSigns(element), start: onset, duration, midi });
      } else if (element.name === "backup")
        now = Math.max(0, now - (childNumber(element, "duration") ?? 0) / divisions);
      else if (element.name === "forward") now += (childNumber(element, "duration") ?? 0) / divisions;
      else if (element.name === "barline") readBarline(element, signs);
      else if (element.name === "sound" || element.name === "direction") {
        readDirection(element, signs);
        const speed = tempoOf(element);
        tempo ??= speed;
        changes.tempo ||= speed !== null && speed !== tempo;
      }
      length = Math.max(length, now);
    }
    return { notes, length, signs };
  });
  return { measures, key, signature, percussion, tempo, beats, changes };
}

function noteSigns(element: XmlElement): Pick<ScoreNote, "voice" | "tieStop" | "verses"> {
  const staff = child(element, "staff")?.text.trim();
  const voice = child(element, "voice")?.text.trim() || "1";
  const ties = [...childrenOf(element, "tie"), ...childrenOf(child(element, "notations"), "tied")];
  return {
    voice: staff === undefined || staff === "1" ? voice : `${voice} of staff ${staff}`,
    tieStop: ties.some((tie) => tie.attributes["type"] === "stop"),
    verses: childrenOf(element, "lyric").slice(0, mostVerses).map(syllableOf),
  };
}

/** A syllable goes on in the next note's where it begins or stands inside a word; "extend" holds it and needs nothing. */
function syllableOf(lyric: XmlElement): ScoreNote["verses"][number] {
  const text = childrenOf(lyric, "text")
    .map((part) => part.text.trim())
    .join(" ")
    .trim();
  if (text === "") return null;
  const parts = childrenOf(lyric, "syllabic");
  const goesOn = ["begin", "middle"].includes(parts.at(-1)?.text.trim() ?? "");
  return {
    text: goesOn && !text.endsWith("-") ? `${text}-` : text,
    endsLine: child(lyric, "end-line") !== undefined || child(lyric, "end-paragraph") !== undefined,
  };
}

function beatsOf(time: XmlElement | undefined): number | null {
  const beats = child(time, "beats")
    ?.text.split("+")
    .reduce((sum, each) => sum + Number(each.trim()), 0);
  return beats !== undefined && Number.isInteger(beats) && beats > 0 ? beats : null;
}

/** Quarter notes a minute, from a sound or from a metronome mark. */
function tempoOf(element: XmlElement): number | null {
  const sounds = element.name === "sound" ? [element] : childrenOf(element, "sound");
  const said = Number(sounds.find((sound) => "tempo" in sound.attributes)?.attributes["tempo"] ?? NaN);
  if (Number.isFinite(said) && said > 0) return said;
  for (const kind of childrenOf(element, "direction-type")) {
    const mark = child(kind, "metronome");
    const unit = units[child(mark, "beat-unit")?.text.trim() ?? ""];
    const speed = childNumber(mark, "per-minute");
    if (unit !== undefined && speed !== null && speed > 0)
      return speed * unit * (child(mark, "beat-unit-dot") ? 1.5 : 1);
  }
  return null;
}

function pitchOf(pitch: XmlElement | undefined, transposition: number): number | null {
  const step = letters[child(pitch, "step")?.text.trim() ?? ""];
  const octave = childNumber(pitch, "octave");
  if (step === undefined || octave === null) return null;
  const midi = 12 * (octave + 1) + step + (childNumber(pitch, "alter") ?? 0) + transposition;
  return midi >= 0 && midi <= 127 ? midi : null;
}

function signatureOf(written: XmlElement | undefined, transposition: number): number | null {
  const fifths = childNumber(written, "fifths");
  if (fifths === null || !Number.isInteger(fifths) || Math.abs(fifths) > 7) return null;
  if (transposition === 0) return fifths;
  // A part's key is written for its transposition: a semitone is seven fifths, counted round the circle.
  const sounding = (((fifths + 7 * transposition) % 12) + 12) % 12;
  return sounding > 6 ? sounding - 12 : sounding;
}

function keyOf(written: XmlElement | undefined, signature: number | null): KeyName | null {
  const mode = modes[child(written, "mode")?.text.trim() ?? ""];
  return signature === null || !mode ? null : keyOfFifths(signature, mode);
}
