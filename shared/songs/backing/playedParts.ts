import type { Chart } from "../chart";
import type { ChartToken } from "../chordLine";

/** A line that takes time when the song is played. */
export interface PlayedLine {
  /** its words; null where only chords stand */
  words: string | null;
  chords: readonly ChartToken[];
  /** the words that the chords' columns stand over: those of an earlier verse where this one has no chords written */
  under: string;
}

/** A part as often as it is played. */
export interface PlayedPart {
  /** heading; null before the first one */
  label: string | null;
  /** equal for parts that are sung to the same tune */
  tune: string;
  lines: PlayedLine[];
}

/** A song of more lines than this is cut off: nobody plays it through to try a key. */
const mostLines = 400;

/**
 * A chart as it is played: repeats unrolled, headings that call an earlier part back replaced by it, and verses without
 * chords given those of the first one.
 *
 * @param chart any chart
 * @returns parts in playing order, at most 400 lines
 */
export function playedParts(chart: Chart): PlayedPart[] {
  const parts: PlayedPart[] = [];
  const withChords = new Map<string, PlayedLine[]>();
  let count = 0;
  chart.sections.forEach((section, index) => {
    const source = section.recalls === null ? section : (chart.sections[section.recalls] ?? section);
    const kind = source.kind === null || source.kind === "own" ? (source.label ?? "") : source.kind;
    const own = source.lines.flatMap((line): PlayedLine[] => {
      if (line.kind === "sung") return [{ words: line.lyrics, chords: line.chords, under: line.lyrics }];
      if (line.kind === "chords") return [{ words: null, chords: line.chords, under: "" }];
      return line.kind === "lyrics" ? [{ words: line.lyrics, chords: [], under: line.lyrics }] : [];
    });
    const model = withChords.get(kind);
    const bare = own.length > 0 && own.every(({ chords }) => chords.length === 0);
    const lines = bare && model ? own.map((line, k) => borrowed(line, model[k % model.length]!)) : own;
    if (!bare && own.length > 0 && !model) withChords.set(kind, own);
    if (lines.length === 0) return;
    for (let time = 0; time < section.times && count < mostLines; time += 1) {
      const label = section.label ?? source.label;
      parts.push({ label, tune: kind === "" ? `part ${index}` : kind, lines: lines.slice(0, mostLines - count) });
      count += lines.length;
    }
  });
  return parts;
}

function borrowed(line: PlayedLine, model: PlayedLine): PlayedLine {
  return { words: line.words, chords: model.chords, under: model.under };
}
