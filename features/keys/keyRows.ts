import { fitSentence, type FixedInstrument } from "@/shared/keys/fixed/fixedInstrument";
import { COARSE_WORDS } from "@/shared/keys/keyReason";
import type { SingingVoice, KeyMark, KeyParts, KeyScore } from "@/shared/keys/keyScore";
import { noKeyFits } from "@/shared/keys/noKeyFits";
import { keyFifths, type KeyName, tonicPitchClass } from "@/shared/music/keyName";
import { keySign, movedKey } from "@/shared/music/keyWords";
import { shortMove } from "@/shared/music/moveWords";
import { glyphs, noteName } from "@/shared/music/pitch";

/** Room between the tune's end and the voice's, as a table shows it. */
export interface Room {
  /** semitones; negative = the tune leaves the voice */
  semitones: number;
  text: string;
  tone: "ink" | "honey" | "brick";
}

/** One key as rows and cards show it. All texts with glyphs. */
export interface KeyRow {
  key: KeyName;
  sign: string;
  shift: number;
  moved: string;
  score: number;
  parts: KeyParts;
  /** without the note that it is coarse, which stands once on the page */
  reason: string;
  beyond: boolean;
  coarse: boolean;
  below: Room;
  above: Room;
  lowMidi: number;
  highMidi: number;
  span: string;
  marks: KeyMark[];
  chords: string[];
  /** as the engine judged it */
  judged: KeyScore;
  /** the whole row as a sentence or two */
  spoken: string;
}

/** Scores as rows, in their order. `chordsIn` gives the song's chords in a key; `fixed` instruments say whether it suits them. */
export function keyRows(
  scores: readonly KeyScore[],
  written: KeyName,
  chordsIn: (key: KeyName) => readonly string[],
  fixed: readonly FixedInstrument[] = [],
): KeyRow[] {
  return scores.map((score) => {
    const key = movedKey(written, score.shift);
    const sign = glyphs(keySign(key));
    const span = spanWords(score, key);
    const points = Math.round(score.score);
    const judged = score.reason.replace(` ${COARSE_WORDS}`, "");
    const fit = fitSentence(key, fixed);
    const reason = fit === null ? judged : `${fit} ${judged}`;
    return {
      key,
      sign,
      shift: score.shift,
      moved: movedWords(score.shift),
      score: points,
      parts: score.parts,
      reason,
      beyond: score.beyond,
      coarse: score.coarse,
      below: room(score.reserves.lower, "▼"),
      above: room(score.reserves.upper, "▲"),
      lowMidi: score.lowMidi,
      highMidi: score.highMidi,
      span,
      marks: score.marks,
      chords: chordsIn(key).map(glyphs),
      judged: score,
      spoken: `${sign}, ${points} of 100. The tune runs ${span}. ${reason}`,
    };
  });
}

/** The row of a tonic and move; the same tonic in another octave where the move is not among them. */
export function rowOf(rows: readonly KeyRow[], tonic: string, shift: number | null): KeyRow | null {
  const same = rows.filter((row) => tonicPitchClass(row.key.tonic) === tonicPitchClass(tonic));
  return same.find((row) => row.shift === shift) ?? same[0] ?? null;
}

/** Lowest and highest semitone that any row or the voice reaches, with a little air: one scale for all. */
export function commonScale(rows: readonly KeyRow[], voice: SingingVoice): { low: number; high: number } {
  const lows = [voice.range.lowMidi, ...rows.map((row) => row.lowMidi)];
  const highs = [voice.range.highMidi, ...rows.map((row) => row.highMidi)];
  return { low: Math.round(Math.min(...lows)) - 2, high: Math.round(Math.max(...highs)) + 2 };
}

/** The voice on the semitones that people read and keys are judged by, so that pictures agree with scores. */
export function wholeVoice(voice: SingingVoice): SingingVoice {
  const band = ({ lowMidi, highMidi }: SingingVoice["range"]) => ({
    lowMidi: Math.round(lowMidi),
    highMidi: Math.round(highMidi),
  });
  return {
    range: band(voice.range),
    comfort: band(voice.comfort),
    ...(voice.heard ? { heard: band(voice.heard) } : null),
  };
}

/** What stands over the keys where none of them holds the whole tune; null where one does. */
export function noFitWords(rows: readonly KeyRow[]): string | null {
  const keys = rows.map(({ key, marks, coarse, beyond, above, below }) => ({
    tonic: key.tonic,
    marks,
    coarse,
    beyond,
    reserves: { upper: above.semitones, lower: below.semitones, tessituraShift: 0 },
  }));
  return noKeyFits(keys, rows[0]?.key.mode);
}

/** How notes are spelled in a key. */
export function spellingIn(key: KeyName): "sharps" | "flats" {
  return keyFifths(key) < 0 ? "flats" : "sharps";
}

/** The written key in another octave is still the written one. */
function movedWords(shift: number): string {
  return shift !== 0 && shift % 12 === 0 ? `written, ${shortMove(shift)}` : shortMove(shift);
}

function spanWords(score: KeyScore, key: KeyName): string {
  const spelling = spellingIn(key);
  return glyphs(`${noteName(score.lowMidi, spelling)} to ${noteName(score.highMidi, spelling)}`);
}

function room(reserve: number, sign: string): Room {
  const semitones = Math.round(reserve);
  if (semitones < 0) return { semitones, text: `${sign} ${-semitones}`, tone: "brick" };
  return { semitones, text: String(semitones), tone: semitones <= 1 ? "honey" : "ink" };
}
