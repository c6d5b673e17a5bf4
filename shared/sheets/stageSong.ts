import type { Chart } from "../songs/chart";
import { parseChart, printChart } from "../songs/chart";
import { metreOf } from "../songs/backing/metre";
import { USUAL_TEMPO } from "../songs/backing/planBacking";
import { songBars } from "../songs/backing/songBars";
import type { MelodyNote } from "../songs/melody";

/** Of a song only so many parts are unrolled: nobody plays more. */
const mostParts = 200;

/** How long a song is, and how it is counted. */
export interface SongLength {
  /** quarter notes from its first bar to its last; 0 for a song without words and chords */
  quarters: number;
  /** what is counted in a bar, and how many quarter notes that is */
  beats: number;
  barQuarters: number;
  /** quarter notes a minute: the song's own, or the usual one */
  tempo: number;
}

/**
 * A chart in the order in which it is played: repeats written out, and headings that call an earlier part back followed
 * by its lines.
 *
 * @param text a chart, chords over words
 * @returns the same as text, at most 200 parts
 * @example playedChart("Chorus\nStill\n\nVerse\nLow tide\n\nChorus") // => "Chorus\nStill\n\nVerse\nLow tide\n\nChorus\nStill\n"
 */
export function playedChart(text: string): string {
  const chart = parseChart(text);
  const sections = chart.sections.flatMap((section): Chart["sections"] => {
    const source = section.recalls === null ? section : (chart.sections[section.recalls] ?? section);
    const once = { ...section, lines: source.lines };
    return Array.from({ length: Math.max(1, section.times) }, () => once);
  });
  const { breaks: _breaks, ...plain } = chart;
  return printChart({ ...plain, sections: sections.slice(0, mostParts) });
}

/**
 * How long a song takes, from its bars.
 *
 * @param song chart, tune, metre and tempo
 * @returns its length; what it does not say is taken as usual
 */
export function songLength(song: {
  chart: string;
  notes: readonly MelodyNote[];
  beatsPerBar: number | null;
  tempo: number | null;
}): SongLength {
  const metre = metreOf(song.beatsPerBar);
  const parts = songBars(parseChart(song.chart), song.notes, metre);
  const bars = parts.reduce((sum, { lines }) => sum + lines.reduce((count, line) => count + line.bars.length, 0), 0);
  return {
    quarters: bars * metre.quarters,
    beats: metre.beats,
    barQuarters: metre.quarters,
    tempo: song.tempo ?? USUAL_TEMPO,
  };
}

/**
 * How fast the words pass by: as fast as the whole song takes at this tempo.
 *
 * @param height of all rows, px
 * @param quarters length of the song in quarter notes
 * @param tempo quarter notes a minute, > 0
 * @returns px a second; 0 for a song without length
 * @throws RangeError if the tempo is not positive
 * @example scrollSpeed(1200, 96, 96) // => 20
 */
export function scrollSpeed(height: number, quarters: number, tempo: number): number {
  if (!(tempo > 0)) throw new RangeError("a tempo is positive");
  return quarters > 0 ? (height * tempo) / (quarters * 60) : 0;
}
