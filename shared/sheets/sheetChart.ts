import { chordNumber } from "../songs/chordNumbers";
import { parseChord, transposeChord } from "../music/chord";
import { type KeyName, tonicPitchClass } from "../music/keyName";
import { type Chart, type ChartLine, parseChart } from "../songs/chart";
import type { ChartToken } from "../songs/chordLine";
import { reflow } from "../songs/reflow";
import { chartRows, type ChartRow } from "./chartRows";
import type { Sheet, SheetOptions } from "./sheet";

/** Letters of a number are so wide beside those of a chord. */
const numberScale = 0.72;

/**
 * The rows of a sheet: its chart with the chords named as they are to be read, in at most so many columns.
 *
 * @param sheet what is to be played
 * @param options what is shown
 * @param columns columns of a row, at least 1
 * @returns the rows; every chord over its syllable, with room for its number where numbers are shown
 * @throws RangeError if columns is less than 1 or a tonic is no note name
 */
export function sheetRows(
  sheet: Pick<Sheet, "chart" | "from" | "key" | "chords" | "instrument">,
  { shows, numbers }: Pick<SheetOptions, "shows" | "numbers">,
  columns: number,
): ChartRow[] {
  const chart = parseChart(sheet.chart);
  const names = chordNames(sheet, shows);
  const numberOf = numbers && sheet.from ? numbersIn(sheet.from) : () => null;
  const numberOfNamed = new Map<string, string | null>();
  const rename = (token: ChartToken): ChartToken => {
    if (!token.chord) return token;
    const bare = token.chord.text;
    const name = names(bare);
    const number = numberOf(bare);
    numberOfNamed.set(name, number);
    const text = token.text.replace(bare, () => name);
    const room = number === null ? 0 : Math.ceil(number.length * numberScale);
    return { ...token, text: text.padEnd(room), chord: { ...token.chord, text: name } };
  };
  return chartRows(renamed(chart, rename), columns, (name) => numberOfNamed.get(name) ?? null);
}

function renamed(chart: Chart, rename: (token: ChartToken) => ChartToken): Chart {
  const sections = chart.sections.map((section) => ({
    ...section,
    lines: section.lines.map((line): ChartLine => {
      if (line.kind !== "sung" && line.kind !== "chords") return line;
      const laid = reflow(line.written, line.chords, line.chords.map(rename), line.kind === "sung" ? line.lyrics : "");
      return line.kind === "sung"
        ? { kind: "sung", ...laid }
        : { kind: "chords", written: laid.written, chords: laid.chords };
    }),
  }));
  return { ...chart, sections };
}

/** How a written chord is called: by the sheet's own list, else moved like the rest. */
function chordNames({ chords, from, key, instrument }: Parameters<typeof sheetRows>[0], shows: SheetOptions["shows"]) {
  const listed = new Map(chords.map((chord) => [chord.written, shows === "played" ? chord.played : chord.sounding]));
  const to = shows === "played" && instrument ? instrument.shapeKey : key;
  return (written: string) => listed.get(written) ?? moved(written, from, to);
}

function moved(written: string, from: KeyName | null, to: KeyName | null): string {
  const chord = parseChord(written);
  if (!chord || !from || !to) return written;
  return transposeChord(chord, tonicPitchClass(to.tonic) - tonicPitchClass(from.tonic), to, from);
}

function numbersIn(key: KeyName): (written: string) => string | null {
  return (written) => {
    const chord = parseChord(written);
    return (
      chord &&
      chordNumber(chord, key).roman.replace(
        /(^|\/)([b#])/g,
        (_, before: string, sign: string) => before + (sign === "b" ? "♭" : "♯"),
      )
    );
  };
}
