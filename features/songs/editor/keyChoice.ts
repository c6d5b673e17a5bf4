import type { KeyName, Mode } from "@/shared/music/keyName";
import { keyWords } from "@/shared/music/keyWords";
import { glyphs } from "@/shared/music/pitch";
import type { KeyFinding } from "@/shared/songs/findKey";

/** Home notes to choose from, in the order of a scale. */
export const tonics: readonly string[] = [
  "C",
  "C#",
  "Db",
  "D",
  "D#",
  "Eb",
  "E",
  "F",
  "F#",
  "Gb",
  "G",
  "G#",
  "Ab",
  "A",
  "A#",
  "Bb",
  "B",
];

export const modes: readonly Mode[] = ["major", "minor", "dorian", "mixolydian", "lydian", "phrygian", "locrian"];

/** Below this lead over the second best key nothing firmer than "could be" is said. */
const narrow = 0.05;

export function sameKey(a: KeyName, b: KeyName): boolean {
  return a.tonic === b.tonic && a.mode === b.mode;
}

/** How the written key was found, and what else it could be. */
export function foundWords(finding: KeyFinding | null): string {
  if (finding === null) return "It is found as soon as there are a few chords or a melody.";
  const other = glyphs(keyWords(finding.runnerUp));
  if (finding.margin < narrow) return `It could be this or ${other}. Listen for the note the song comes home to.`;
  const sure = finding.confidence >= 0.8 ? "Sure" : finding.confidence >= 0.5 ? "Fairly sure" : "Not very sure";
  return `${sure}. The next likely is ${other}.`;
}
