import type { ChartToken } from "./chordLine";

/** A chord line with the words under it. */
export interface LaidLine {
  written: string;
  chords: ChartToken[];
  lyrics: string;
}

/**
 * Lays out a chord line anew after its signs changed their width. Each sign keeps its place over the words; where it
 * would run into the one before it, blanks go in between two words, and never inside a word.
 *
 * @param written the chord line as it stood; tabs count to the next multiple of eight
 * @param before its signs, as they stood
 * @param after the same signs with their new texts (columns are ignored)
 * @param lyrics the words under it; "" for a line of chords alone
 * @returns the new line, its signs with their new columns, and the words
 */
export function reflow(
  written: string,
  before: readonly ChartToken[],
  after: readonly ChartToken[],
  lyrics: string,
): LaidLine {
  let line = "";
  let words = expandTabs(lyrics);
  let shift = 0;
  let oldEnd = 0;
  let overPrevious = -1;
  const chords = before.map((old, index): ChartToken => {
    const gap = written.slice(oldEnd, old.column);
    let column = expandTabs(written.slice(0, old.column)).length + shift;
    if (gap.trim() !== "" || (gap === "" && index > 0)) {
      line += index === 0 ? expandTabs(gap) : gap;
      column = line.length;
    } else {
      const missing = index === 0 ? 0 : line.length + 1 - column;
      const place = missing > 0 ? wordStart(words, overPrevious, column) : null;
      if (place !== null) {
        words = words.slice(0, place) + " ".repeat(missing) + words.slice(place);
        shift += missing;
        column += missing;
      }
      if (missing > 0 && place === null) column += missing;
      line = line.padEnd(column);
    }
    overPrevious = column;
    const { text, chord, kind } = after[index]!;
    line += text;
    oldEnd = old.column + old.text.length;
    return { column, text, chord, kind };
  });
  return { written: line + written.slice(oldEnd), chords, lyrics: words };
}

/** The last start of a word behind one column and not behind another; null if there is none. */
function wordStart(words: string, after: number, upTo: number): number | null {
  for (let place = Math.min(upTo, words.length - 1); place > after && place > 0; place -= 1) {
    if (words[place - 1] === " ") return upTo < words.length ? place : null;
  }
  return null;
}

/**
 * Counts tabs out.
 *
 * @param text one line
 * @returns the line with blanks in the place of each tab, to the next multiple of eight
 * @example expandTabs("G\tC") // => "G       C"
 */
export function expandTabs(text: string): string {
  if (!text.includes("\t")) return text;
  let out = "";
  for (const character of text)
    out = character === "\t" ? out.padEnd(out.length + 8 - (out.length % 8)) : out + character;
  return out;
}
