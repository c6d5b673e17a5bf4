import { glyphs, noteName } from "@/shared/music/pitch";
import type { PitchBand } from "@/shared/voice/takeReport";

/** A note's name for people. */
export function noteWord(midi: number): string {
  return glyphs(noteName(midi));
}

export function bandWords({ lowMidi, highMidi }: PitchBand): string {
  return `${noteWord(lowMidi)} to ${noteWord(highMidi)}`;
}

/** Semitones from the lower to the upper note, as they are named. */
export function semitonesOf({ lowMidi, highMidi }: PitchBand): number {
  return Math.round(highMidi) - Math.round(lowMidi);
}

/** How sure a number is, in words. */
export function certaintyWords(certainty: number): string {
  if (certainty >= 0.8) return "Sure";
  if (certainty >= 0.6) return "Fairly sure";
  return certainty >= 0.4 ? "Not very sure" : "A first hint only";
}

export const effortWords = ["easy", "light", "some work", "hard work", "straining"] as const;

/** Weekday, date and time of a take, in the reader's own zone. */
export function whenWords(iso: string): string {
  const at = new Date(iso);
  const day = new Intl.DateTimeFormat("en-GB", { weekday: "long", day: "numeric", month: "long" }).format(at);
  return `${day}, ${new Intl.DateTimeFormat("en-GB", { hour: "2-digit", minute: "2-digit" }).format(at)}`;
}

export function warmedWords(warmedUp: boolean | null): string | null {
  if (warmedUp === null) return null;
  return warmedUp ? "warmed up" : "not warmed up";
}
