import type { Chart } from "./chart";
import { writtenBars } from "./backing/lineBars";
import { metreOf } from "./backing/metre";
import { playedParts } from "./backing/playedParts";

/**
 * The chords of a song one after the other as they are played: repeats unrolled, parts that are only called back put in,
 * verses without chords given those of the first one.
 *
 * @param chart any chart
 * @returns chord symbols as written, in playing order; what is no chord ("N.C.") is left out
 */
export function playedChords(chart: Chart): string[] {
  // Counting beats changes how long a chord lasts, not which one comes next.
  const metre = metreOf(null);
  const lines = playedParts(chart).flatMap((part) => part.lines);
  return lines.flatMap((line) => {
    const bars = writtenBars(line, metre);
    const chords = bars ? bars.flat().map(({ chord }) => chord) : line.chords.map(({ chord }) => chord);
    return chords.flatMap((chord) => (chord ? [chord.text] : []));
  });
}
