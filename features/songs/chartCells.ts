/** A chord at a column of its line. */
export interface PlacedChord {
  column: number;
  text: string;
}

/** A stretch of a chart line that never breaks: its words and every chord that stands over them. */
export interface ChartCell<Chord extends PlacedChord = PlacedChord> {
  /** the words with their blanks, padded to `width` */
  text: string;
  /** columns taken, blanks behind the last word included */
  width: number;
  /** chords, their columns counted from the start of the cell */
  chords: Chord[];
}

/**
 * Cuts a line into cells at which it may wrap. A chord stays over its syllable in whatever row the cell lands,
 * and a chord longer than its word keeps the next word beside it, so that columns hold inside each row.
 */
export function chartCells<Chord extends PlacedChord>(lyrics: string, chords: readonly Chord[]): ChartCell<Chord>[] {
  const end = Math.max(lyrics.length, ...chords.map((chord) => chord.column + chord.text.length), 0);
  const line = lyrics.padEnd(end);
  const cells: ChartCell<Chord>[] = [];
  let start = 0;
  for (const stop of breaks(line, chords, trailing(lyrics, chords))) {
    const text = line.slice(start, stop);
    const from = start;
    cells.push({
      text,
      width: stop - start,
      chords: chords
        .filter((chord) => chord.column >= from && chord.column < stop)
        .map((chord) => ({ ...chord, column: chord.column - from })),
    });
    start = stop;
  }
  return cells;
}

/** Blanks in a row that stay together; more may wrap, so that a long gap never pushes a page wide. */
const gap = 8;

/** A last word and the chord behind it stay together up to this width. */
const widestEnd = 24;

/** From the start of the last word to the first chord behind it: a chord alone in a row would be sung to nothing. */
function trailing(lyrics: string, chords: readonly PlacedChord[]): { from: number; to: number } | null {
  const end = lyrics.trimEnd().length;
  const from = lyrics.lastIndexOf(" ", end - 1) + 1;
  const behind = chords.find((chord) => chord.column >= end);
  if (end === 0 || !behind || behind.column + behind.text.length - from > widestEnd) return null;
  return { from, to: behind.column };
}

/**
 * Columns behind which the line may wrap: before a word, before a chord over blanks, in a long gap, never inside a chord
 * nor in the part that is kept together.
 */
function breaks(line: string, chords: readonly PlacedChord[], kept: { from: number; to: number } | null): number[] {
  const stops: number[] = [];
  for (let column = 1; column < line.length; column++) {
    const wordStarts = line[column] !== " " && line[column - 1] === " ";
    const chordOverBlanks =
      line[column] === " " && line[column - 1] === " " && chords.some((chord) => chord.column === column);
    const inLongGap =
      column >= gap && line.slice(column - gap, column + 1).trim() === "" && column - (stops.at(-1) ?? 0) >= gap;
    const insideChord = chords.some((chord) => chord.column < column && chord.column + chord.text.length >= column);
    const insideKept = kept !== null && column > kept.from && column <= kept.to;
    if ((wordStarts || chordOverBlanks || inLongGap) && !insideChord && !insideKept) stops.push(column);
  }
  if (line.length > 0) stops.push(line.length);
  return stops;
}
