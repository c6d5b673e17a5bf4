import type { Chart } from "../chart";
import type { MelodyNote } from "../melody";
import { syllableStarts } from "../syllables";
import { type Bar, spreadChords, writtenBars } from "./lineBars";
import type { Metre } from "./metre";
import { type PlayedLine, type PlayedPart, playedParts } from "./playedParts";
import { type TuneLine, tuneOfLines } from "./tuneOfLines";

/** A line of the song with its bars and the notes it is sung to. */
interface SongLine {
  words: string | null;
  bars: Bar[];
  tune: TuneLine | null;
}

/** A part of the song as it is played. */
export interface SongPart {
  label: string | null;
  lines: SongLine[];
}

/** Syllables that a beat carries at most in ordinary singing, counted in quarters or in eighths; chords in a bar. */
const syllablesPerBeat = { quarters: 1.5, eighths: 1 };
const chordsPerBar = 2;
/** Enough for any song; a tune of many thousand notes is cut off. */
const mostBars = 2000;

/**
 * A song bar by bar. Where the chart writes bars they count; where the tune is known a line has the bars of its notes;
 * else all lines of words get the same number of bars: 1, 2, 4 or 8, by their chords and syllables.
 *
 * @param chart the song's chart
 * @param notes its tune in quarter notes, empty where it is not known
 * @param metre how it is counted
 * @param barsPerLine overrules what lines without bars and tune get
 * @returns parts in playing order; a chart without words or chords gives one part as long as the tune, or none
 */
export function songBars(
  chart: Chart,
  notes: readonly MelodyNote[],
  metre: Metre,
  barsPerLine: number | null = null,
): SongPart[] {
  const parts = playedParts(chart);
  const tunes = tuneOfLines(parts, notes, metre);
  const usual = barsPerLine ?? usualBars(parts, metre);
  const laid = parts.map(({ label, lines }, part) => ({
    label,
    lines: lines.map((line, k) => layLine(line, tunes[part]![k] ?? null, notes, metre, usual)),
  }));
  const last = notes.at(-1);
  const tuneBars = last ? Math.ceil((last.start + last.duration) / metre.quarters - 1e-6) : 0;
  const matched = tunes.flat().some((tune) => tune !== null);
  return matched || last === undefined ? cut(laid) : cut(underWholeTune(laid, notes, tuneBars));
}

function layLine(
  line: PlayedLine,
  tune: TuneLine | null,
  notes: readonly MelodyNote[],
  metre: Metre,
  usual: number,
): SongLine {
  const { words } = line;
  const written = writtenBars(line, metre);
  if (written) return { words, bars: written, tune };
  if (!tune) return { words, bars: spreadChords(line, metre, usual), tune };
  const sung = notes.slice(tune.from, tune.to);
  const told = sung.filter(({ lyric }) => lyric !== undefined && lyric.trim() !== "");
  const carriers = told.length >= 0.6 * sung.length ? told : sung;
  const sure = (of: number) => carriers.length === of;
  const at = (syllable: number, of: number) => {
    const index = sure(of) ? syllable : Math.round((syllable * (carriers.length - 1)) / Math.max(1, of - 1));
    return (carriers[index]?.start ?? 0) - tune.bar * metre.quarters;
  };
  return { words, bars: spreadChords(line, metre, tune.bars, { at, sure }), tune };
}

/** The fewest bars, 1, 2, 4 or 8, that hold the chords and the syllables of most lines. */
function usualBars(parts: readonly PlayedPart[], metre: Metre): number {
  const perBeat = metre.quarters < metre.beats ? syllablesPerBeat.eighths : syllablesPerBeat.quarters;
  const needs = parts.flatMap(({ lines }) =>
    lines.flatMap(({ words, chords }) => {
      if (words === null) return [];
      const count = chords.filter(({ kind }) => kind === "chord").length;
      return [Math.max(count / chordsPerBar, syllableStarts(words).length / (perBeat * metre.beats))];
    }),
  );
  const middle = [...needs].sort((a, b) => a - b)[needs.length >> 1] ?? 1;
  return [1, 2, 4].find((bars) => bars >= middle - 1e-9) ?? 8;
}

/** A tune that no words tell the lines of: the chords go round under it until it ends. */
function underWholeTune(parts: readonly SongPart[], notes: readonly MelodyNote[], bars: number): SongPart[] {
  const whole = { bar: 0, bars, from: 0, to: notes.length };
  const round = parts.flatMap(({ lines }) => lines.flatMap((line) => line.bars));
  const under = Array.from(
    { length: Math.max(bars, round.length) },
    (_, k) => round[k % Math.max(1, round.length)] ?? [],
  );
  const label = parts.length === 1 ? parts[0]!.label : null;
  return [{ label, lines: [{ words: null, bars: under, tune: whole }] }];
}

function cut(parts: readonly SongPart[]): SongPart[] {
  let left = mostBars;
  return parts.map(({ label, lines }) => ({
    label,
    lines: lines.map((line) => {
      const bars = line.bars.slice(0, left);
      left -= bars.length;
      return { ...line, bars };
    }),
  }));
}
