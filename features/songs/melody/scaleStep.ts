import { pitchClass, glyphs, noteName, parseNoteName, plainAccidentals } from "@/shared/music/pitch";

/** Semitones of the steps 1 to 7 over the home note, as of a major scale. */
const steps = [0, 2, 4, 5, 7, 9, 11];
const names = ["1", "♭2", "2", "♭3", "3", "4", "♯4", "5", "♭6", "6", "♭7", "7"];
const step = /^([b#]?)([1-7])\s*([',’]*)\s*(below|under|above|over)?(?:\s+(?:home|the home note))?$/;

/**
 * A note as a step of the scale: 1 is the home note, each ' an octave higher, each , an octave lower; "5," is the fifth
 * step below home.
 */
export function stepName(midi: number, homeMidi: number): string {
  const above = Math.round(midi - homeMidi);
  const octave = Math.floor(above / 12);
  return `${names[pitchClass(above)] ?? ""}${octave < 0 ? ",".repeat(-octave) : "'".repeat(octave)}`;
}

/** The same to be heard: "5 below home", "1, an octave up". */
export function stepSpoken(midi: number, homeMidi: number): string {
  const octave = Math.floor(Math.round(midi - homeMidi) / 12);
  const name = names[pitchClass(midi - homeMidi)] ?? "";
  if (octave === 0) return name;
  if (octave === -1) return `${name} below home`;
  const octaves = Math.abs(octave) === 1 ? "an octave" : `${Math.abs(octave)} octaves`;
  return `${name}, ${octaves} ${octave > 0 ? "up" : "down"}`;
}

/** Reads "A3", "5,", "b3", "1'" or "5 below home" as a MIDI number; null for anything else. */
export function readNoteOrStep(text: string, homeMidi: number | null): number | null {
  const named = parseNoteName(text);
  if (named !== null) return named >= 0 && named <= 127 ? named : null;
  const match = step.exec(plainAccidentals(text).trim().toLowerCase());
  if (!match || homeMidi === null) return null;
  const [, accidental = "", digit = "1", octaves = "", side = ""] = match;
  const semitones = (steps[Number(digit) - 1] ?? 0) + (accidental === "b" ? -1 : accidental === "#" ? 1 : 0);
  const written = [...octaves].reduce((sum, mark) => sum + (mark === "," ? -1 : 1), 0);
  const octave =
    octaves === "" && (side === "below" || side === "under")
      ? -1
      : octaves === "" && /above|over/.test(side) && digit === "1"
        ? 1
        : written;
  const midi = homeMidi + semitones + 12 * octave;
  return midi >= 0 && midi <= 127 ? midi : null;
}

/** The home note that the steps of a tune are counted from: the one with most of the tune in the octave over it. */
export function homeUnder(midis: readonly number[], homeClass: number): number {
  const low = Math.min(...midis);
  const first = low - pitchClass(low - homeClass);
  if (midis.length === 0) return 60 + homeClass;
  const over = (home: number) => midis.filter((midi) => midi >= home && midi <= home + 12).length;
  const candidates = [first, first + 12, first + 24];
  return candidates.reduce((best, home) => (over(home) > over(best) ? home : best), first);
}

/** "A3, the step 5, from home". */
export function noteAndStep(midi: number, homeMidi: number): string {
  return `${glyphs(noteName(midi))}, step ${stepName(midi, homeMidi)}`;
}
