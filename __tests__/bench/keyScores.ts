import { type KeyName, keyFifths, parseKeyName, tonicPitchClass } from "../../shared/music/keyName";
import { parseChart } from "../../shared/songs/chart";
import { findKey, type KeyEvidence, type KeyFinding } from "../../shared/songs/findKey";
import type { MelodyNote } from "../../shared/songs/melody";
import { readMelodyFile } from "../../shared/songs/melodyFile";
import type { KnownSong } from "../engine/tunes/knownSong";

/** From what a key was to be found. */
export type KeyKind = "tune with chords" | "tune alone" | "chords alone";

/** One question put to the key finder. */
export interface KeyCase {
  name: string;
  kind: KeyKind;
  key: KeyName;
  evidence: KeyEvidence;
  /** "tuned" songs were looked at while the finder was adjusted, "held out" ones were not */
  half: "tuned" | "held out";
}

export interface KeyAnswer extends KeyCase {
  found: KeyFinding;
  /** 1 exact, 0.5 a fifth away, 0.3 relative, 0.2 parallel, else 0 */
  points: number;
}

/** What keys must be found from. */
export const keyBars: readonly { name: string; kind: KeyKind | null; measure: "exact" | "points"; atLeast: number }[] =
  [
    { name: "exact key, tune with chords", kind: "tune with chords", measure: "exact", atLeast: 0.9 },
    { name: "exact key, tune alone", kind: "tune alone", measure: "exact", atLeast: 0.85 },
    { name: "weighted score, everything", kind: null, measure: "points", atLeast: 0.92 },
  ];

/** The notes of a song, read without what its key line states. */
export function notesOf(song: KnownSong): MelodyNote[] {
  if (!song.abc) return [];
  const { meter, unit, notes } = song.abc;
  const text = `X:1\nM:${meter}\nL:${unit}\nK:${song.key}\n${notes}\n`;
  const file = readMelodyFile("tune.abc", new TextEncoder().encode(text));
  if (!file.ok) throw new Error(`${song.name}: ${file.reason}`);
  return file.voices[0]!.melody.notes;
}

/** A song with tune and chords asks twice: with its chords, and by the tune alone. */
export function casesOf(songs: readonly KnownSong[]): KeyCase[] {
  return songs.flatMap((song, index) => {
    const notes = notesOf(song);
    const key = parseKeyName(song.key);
    if (!key) throw new Error(`${song.name}: ${song.key} is no key`);
    const about = { name: song.name, key, half: index % 2 === 0 ? "tuned" : "held out" } as const;
    const chart = song.chords === undefined ? null : parseChart(song.chords);
    const both: KeyCase[] =
      chart && notes.length > 0 ? [{ ...about, kind: "tune with chords", evidence: { chart, notes } }] : [];
    if (notes.length > 0) return [...both, { ...about, kind: "tune alone", evidence: { notes } }];
    return chart ? [{ ...about, kind: "chords alone", evidence: { chart } }] : [];
  });
}

export function answer(question: KeyCase): KeyAnswer {
  const found = findKey(question.evidence);
  if (!found) throw new Error(`${question.name}: no answer`);
  return { ...question, found, points: keyPoints(found.key, question.key) };
}

/**
 * How near a key is to the right one; modes are compared by their signature.
 *
 * @see MIREX, Audio Key Detection: 1 exact, 0.5 perfect fifth, 0.3 relative, 0.2 parallel
 */
export function keyPoints(found: KeyName, right: KeyName): number {
  const distance = (tonicPitchClass(found.tonic) - tonicPitchClass(right.tonic) + 12) % 12;
  if (found.mode === right.mode) return distance === 0 ? 1 : distance === 5 || distance === 7 ? 0.5 : 0;
  if (distance === 0) return 0.2;
  return (keyFifths(found) - keyFifths(right)) % 12 === 0 ? 0.3 : 0;
}

export function exactShare(answers: readonly KeyAnswer[]): number {
  return answers.filter(({ points }) => points === 1).length / answers.length;
}

export function meanPoints(answers: readonly KeyAnswer[]): number {
  return answers.reduce((sum, { points }) => sum + points, 0) / answers.length;
}
