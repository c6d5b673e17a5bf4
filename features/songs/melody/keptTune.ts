import type { Song } from "@/shared/contract/song";
import { tonicPitchClass } from "@/shared/music/keyName";
import { distanceWords } from "@/shared/music/moveWords";
import { glyphs } from "@/shared/music/pitch";
import type { MelodyNote } from "@/shared/songs/melody";
import { moveTune } from "@/shared/songs/noteEdits";
import { moveToHomeNote } from "@/shared/songs/sungMelody";

/** A tune as the song keeps it, and what became of it. */
export interface KeptTune {
  tune: NonNullable<Song["tune"]>;
  /** semitones it is moved, so that it sounds with the chart */
  move: number;
}

type Given = { kind: "melody"; notes: readonly MelodyNote[] } | { kind: "span"; lowMidi: number; highMidi: number };

/**
 * The tune of a song: given in any key, kept in the key its chart is written in, so that keys are judged for both at
 * once. Moved by the smaller way, so that it stays in the octave it was given in; null where there is nothing to keep.
 */
export function keptTune(song: Pick<Song, "writtenKey">, given: Given, home: string): KeptTune | null {
  const to = song.writtenKey?.tonic ?? home;
  const move = moveToHomeNote(tonicPitchClass(home), tonicPitchClass(to));
  if (given.kind === "span") {
    const { lowMidi, highMidi } = given;
    if (lowMidi + move < 0 || highMidi + move > 127) return null;
    return { tune: { kind: "span", lowMidi: lowMidi + move, highMidi: highMidi + move, home: to }, move };
  }
  const notes = given.notes.length === 0 ? null : moveTune(given.notes, move);
  return notes && { tune: { kind: "melody", notes, home: to }, move };
}

/** What keeping does to the key of the tune, in words; null where it stays as it is. */
export function keptWords(song: Pick<Song, "writtenKey">, home: string, move: number): string | null {
  if (!song.writtenKey || move === 0) return null;
  const chart = glyphs(song.writtenKey.tonic);
  const way = `${distanceWords(move)} ${move < 0 ? "lower" : "higher"}`;
  return `The chart is written in ${chart} and this tune is in ${glyphs(home)}. It is kept ${way}, in ${chart}, so that chart and tune sound together. The chart stays as it is.`;
}
