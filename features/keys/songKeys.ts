import type { Decision } from "@/shared/contract/decision";
import type { Song } from "@/shared/contract/song";
import type { SingingVoice } from "@/shared/keys/keyScore";
import type { FixedInstrument } from "@/shared/keys/fixed/fixedInstrument";
import { fittingFirst } from "@/shared/keys/fixed/fittingFirst";
import { scoreKeys } from "@/shared/keys/scoreKeys";
import { parseChord, transposeChord } from "@/shared/music/chord";
import { type KeyName, tonicPitchClass } from "@/shared/music/keyName";
import { movedKey } from "@/shared/music/keyWords";
import { chartChords, parseChart } from "@/shared/songs/chart";
import { playedChords } from "@/shared/songs/playedChords";
import { decidedElsewhere, stillFits } from "./decision/decide";
import { keyRows, rowOf, type KeyRow } from "./keyRows";

/** How many chords a row shows. */
const chordsShown = 4;

/** The key that the chart is in; the tune's home note where there is no key. */
export function writtenKeyOf(song: Pick<Song, "writtenKey" | "tune">): KeyName | null {
  if (song.writtenKey) return song.writtenKey;
  return song.tune ? { tonic: song.tune.home, mode: "major" } : null;
}

/** The song's chords as written, each once. */
export function songChords(song: Pick<Song, "chart">): string[] {
  return chartChords(parseChart(song.chart));
}

/** The same as they are played, with repeats. */
export function songSequence(song: Pick<Song, "chart">): string[] {
  return playedChords(parseChart(song.chart));
}

/** A song as others are given it: its key, its chords, and the same as they are played; null without a key. */
export function songPiece<Given extends Pick<Song, "chart" | "writtenKey" | "tune">>(song: Given) {
  const written = writtenKeyOf(song);
  return written && { song, written, chords: songChords(song), sequence: songSequence(song) };
}

/** Chords moved into a key. */
export function chordsIn(chords: readonly string[], from: KeyName, to: KeyName): string[] {
  const semitones = (tonicPitchClass(to.tonic) - tonicPitchClass(from.tonic) + 12) % 12;
  return chords.flatMap((text) => {
    const chord = parseChord(text);
    return chord ? [transposeChord(chord, semitones, to, from)] : [];
  });
}

/**
 * All twelve keys of a song for a voice, best first; null while the tune or the voice is not known. Keys that the fixed
 * instruments of the line-up play come first.
 */
export function keyRowsOf(
  song: Song,
  singing: SingingVoice | null,
  fixed: readonly FixedInstrument[] = [],
): KeyRow[] | null {
  const written = writtenKeyOf(song);
  if (!song.tune || !singing || !written) return null;
  const chords = songChords(song).slice(0, chordsShown);
  const scores = scoreKeys(song.tune, singing, { mode: written.mode, presentKey: written.tonic });
  return keyRows(fittingFirst(scores, written.mode, fixed), written, (key) => chordsIn(chords, written, key), fixed);
}

/** The key that a page speaks of, and how it came to that. */
export interface KeyInHand {
  key: KeyName;
  /** semitones from the tune as written, octave included */
  shift: number;
  row: KeyRow | null;
  /** "nearest": no key holds the whole tune */
  because: "decided" | "best" | "nearest" | "written";
}

/**
 * The key decided for a song, else the best for the voice, else the written one; null where no key is known at all.
 * What was decided with another voice says nothing of this one.
 */
export function keyInHand(
  song: Song,
  rows: readonly KeyRow[] | null,
  decision: Decision | null,
  voiceId: string | null = null,
): KeyInHand | null {
  const written = writtenKeyOf(song);
  if (!written) return null;
  if (decision && stillFits(decision, written) && !decidedElsewhere(decision, voiceId)) {
    const row = rows ? rowOf(rows, decision.tonic, decision.shift) : null;
    return { key: { tonic: decision.tonic, mode: written.mode }, shift: decision.shift, row, because: "decided" };
  }
  const best = rows?.[0];
  if (best) return { key: best.key, shift: best.shift, row: best, because: best.beyond ? "nearest" : "best" };
  return { key: written, shift: 0, row: null, because: "written" };
}

/** The key that an address asks for; the key in hand where it asks for none, or for one that cannot be read. */
export function askedKey(
  song: Song,
  inHand: KeyInHand | null,
  tonic: string | undefined,
  shift: string | undefined,
): { key: KeyName; shift: number } {
  const written = writtenKeyOf(song) ?? { tonic: "C", mode: "major" };
  const semitones = shift !== undefined && /^-?\d{1,2}$/.test(shift) ? Number(shift) : null;
  if (semitones !== null && Math.abs(semitones) <= 48) {
    const moved = movedKey(written, semitones);
    const named =
      tonic !== undefined && /^[A-G][#b]?$/.test(tonic) && tonicPitchClass(tonic) === tonicPitchClass(moved.tonic);
    return { key: named ? { ...moved, tonic } : moved, shift: semitones };
  }
  return inHand ? { key: inHand.key, shift: inHand.shift } : { key: written, shift: 0 };
}
