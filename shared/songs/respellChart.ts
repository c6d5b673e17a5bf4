import { transposeChord } from "../music/chord";
import type { KeyName } from "../music/keyName";
import { type Chart, type ChartLine, parseChart, printChart } from "./chart";
import type { ChartToken } from "./chordLine";
import { reflow } from "./reflow";

/** A chart with its chords called as their key calls them. */
export interface Respelling {
  text: string;
  /** each chord that gets another name, once, as written and as the key has it */
  changes: { from: string; to: string }[];
}

/**
 * Calls the chords of a chart as its key does: A# in F becomes Bb. What they sound like does not change, nor do chords
 * off the scale that lead up from a raised note.
 *
 * @param text a chart
 * @param key the key it is written in
 * @returns the new text with what it changes; null where every chord is called as the key has it already
 * @throws RangeError if the key's tonic is no note name
 * @see common practice: the notes of a scale have one letter each
 * @example respellChart("F  A#\nLow tide", { tonic: "F", mode: "major" })?.text // => "F  Bb\nLow tide"
 */
export function respellChart(text: string, key: KeyName): Respelling | null {
  const changes = new Map<string, string>();
  const chart: Chart = parseChart(text);
  const sections = chart.sections.map((section) => ({
    ...section,
    lines: section.lines.map((line): ChartLine => {
      if (line.kind !== "sung" && line.kind !== "chords") return line;
      const after = line.chords.map((token) => respelled(token, key, changes));
      if (after.every((token, index) => token === line.chords[index])) return line;
      const laid = reflow(line.written, line.chords, after, line.kind === "sung" ? line.lyrics : "");
      return line.kind === "sung"
        ? { kind: "sung", ...laid }
        : { kind: "chords", written: laid.written, chords: laid.chords };
    }),
  }));
  if (changes.size === 0) return null;
  return { text: printChart({ ...chart, sections }), changes: [...changes].map(([from, to]) => ({ from, to })) };
}

function respelled(token: ChartToken, key: KeyName, changes: Map<string, string>): ChartToken {
  const { chord } = token;
  if (!chord) return token;
  // Coming from another mode on the same home note, every root is spelled anew by its function.
  const from: KeyName = { tonic: key.tonic, mode: key.mode === "major" ? "minor" : "major" };
  const to = transposeChord(chord, 0, key, from);
  if (to === chord.text) return token;
  changes.set(chord.text, to);
  return { ...token, text: token.text.replace(chord.text, () => to) };
}
