import type { Chord } from "../../music/chord";
import type { ChartToken } from "../chordLine";
import { syllableStarts } from "../syllables";
import type { Metre } from "./metre";
import type { PlayedLine } from "./playedParts";

/** A chord that begins `at` quarter notes after its bar's start; null where all is silent (N.C.). */
interface BarChord {
  at: number;
  chord: Chord | null;
}

/** Where the syllables of a line are sung. */
export interface SyllablePlaces {
  /** quarter notes from the line's first bar */
  at: (syllable: number, of: number) => number;
  /** each syllable is known to have a note of its own */
  sure: (of: number) => boolean;
}

/** Chords of a bar that begin in it; without any the one before goes on. */
export type Bar = BarChord[];

const mostTimes = 8;
const isBeat = (token: ChartToken) => token.kind === "beat" && /^[/\\.]+$/.test(token.text);
const sounds = (token: ChartToken) => token.kind === "chord" || token.kind === "no-chord";

/**
 * Bars that a line of chords writes out itself, by bar signs, or, without words, one chord a bar (or as many beats as
 * it has strokes behind it: "G / / /").
 *
 * @param line a line of the chart
 * @param metre how it is counted
 * @returns its bars; null for a line of words without bar signs, which does not say
 * @see common practice of lead sheets: of several chords in a bar the first is the longest
 */
export function writtenBars(line: PlayedLine, metre: Metre): Bar[] | null {
  const signs = line.chords.filter(
    (token) => sounds(token) || isBeat(token) || token.kind === "bar" || token.kind === "repeat",
  );
  const times = timesBehind(signs);
  if (signs.some(({ kind }) => kind === "bar")) return repeated(barredCells(signs, metre), times);
  if (line.words !== null || !signs.some(sounds)) return null;
  if (!signs.some(isBeat))
    return repeated(
      signs.filter(sounds).map(({ chord }) => [{ at: 0, chord }]),
      times,
    );
  return repeated(byStrokes(signs, metre), times);
}

/**
 * Lays the chords over a line of words on its bars.
 *
 * @param line a line of the chart
 * @param metre how it is counted
 * @param bars how many bars it takes
 * @param syllables where the syllables of the line are sung; without a tune they are spread evenly, the last one on the
 *   last bar
 * @returns as many bars, each chord on the beat nearest to its syllable, strong beats preferred
 */
export function spreadChords(
  line: PlayedLine,
  metre: Metre,
  bars: number,
  syllables: SyllablePlaces | null = null,
): Bar[] {
  const out = Array.from({ length: bars }, (): Bar => []);
  const tokens = line.chords.filter(sounds);
  const starts = syllableStarts(line.under);
  const length = bars * metre.quarters;
  const lastAt = bars > 1 ? length - metre.quarters : length / 2;
  const evenly = (syllable: number, of: number) => (of < 2 ? 0 : (syllable * lastAt) / (of - 1));
  const placeOf = syllables?.at ?? evenly;
  const wanted = tokens.map(({ column }, k) => {
    const alike = syllables === null && tokens.length > bars && tokens.length % bars === 0;
    if (starts.length === 0 || alike) return (k * length) / tokens.length;
    if (column >= line.under.trimEnd().length)
      return Math.max(lastAt, placeOf(starts.length - 1, starts.length)) + metre.quarters / 2;
    const syllable = Math.max(
      0,
      starts.findLastIndex((start) => start <= column + 1),
    );
    return placeOf(syllable, starts.length);
  });
  const beat = metre.quarters / metre.beats;
  const unwilling = unwillingness(metre, !(syllables?.sure(starts.length) ?? false), tokens.length <= bars);
  placeInOrder(wanted, bars * metre.beats, beat, unwilling).forEach((place, k) => {
    const bar = Math.min(bars - 1, Math.floor(place / metre.quarters + 1e-9));
    out[bar]!.push({ at: place - bar * metre.quarters, chord: tokens[k]!.chord });
  });
  return out;
}

/** Beats for chords in their order, none twice, nearest to where they are wanted; by the cheapest path. */
function placeInOrder(
  wanted: readonly number[],
  places: number,
  beat: number,
  unwilling: (place: number) => number,
): number[] {
  const n = wanted.length;
  if (n === 0) return [];
  if (n > places) return wanted.map((_, k) => (k * places * beat) / n);
  let costs = Array.from({ length: places }, (_, p) => Math.abs(p * beat - wanted[0]!) + unwilling(p));
  const cameFrom: number[][] = [];
  for (let k = 1; k < n; k += 1) {
    const from: number[] = [];
    let best = -1;
    costs = costs.map((_, p) => {
      if (p > 0 && (best < 0 || costs[p - 1]! < costs[best]!)) best = p - 1;
      from.push(best);
      return best < 0 ? Infinity : costs[best]! + Math.abs(p * beat - wanted[k]!) + unwilling(p);
    });
    cameFrom.push(from);
  }
  let at = costs.indexOf(Math.min(...costs));
  const path = [at];
  for (let k = n - 2; k >= 0; k -= 1) path.unshift((at = cameFrom[k]![at]!));
  return path.map((place) => place * beat);
}

/**
 * How far, in quarter notes, a chord would rather stand from its syllable than on this beat: chords change on bars and
 * strong beats, the more so where it is not sure which note a syllable has.
 */
function unwillingness(metre: Metre, unsure: boolean, oneABar: boolean): (place: number) => number {
  const eighths = metre.quarters < metre.beats;
  const strong = unsure && oneABar ? 0.9 : 0.3;
  const weak = unsure ? 2.2 : eighths ? 1.2 : 0.7;
  return (place) => {
    const at = place % metre.beats;
    return at === 0 ? 0 : metre.strong.includes(at) ? strong : weak;
  };
}

function barredCells(signs: readonly ChartToken[], metre: Metre): Bar[] {
  const bars: Bar[] = [];
  let cell: ChartToken[] = [];
  let repeatFrom = 0;
  const close = () => {
    if (cell.some(({ text }) => text === "%")) bars.push(bars.at(-1) ?? []);
    else if (cell.some((token) => sounds(token) || isBeat(token))) bars.push(divided(cell, metre));
    cell = [];
  };
  signs.forEach((token, index) => {
    if (!token.text.includes("|")) {
      cell.push(token);
      return;
    }
    const held = token.text === "|" && signs[index - 1]?.text === "|" && bars.length > 0;
    close();
    if (held) bars.push([]);
    if (token.text.startsWith(":")) bars.push(...bars.slice(repeatFrom));
    if (token.text.includes(":")) repeatFrom = bars.length;
  });
  close();
  return bars;
}

/** Chords of one bar: a stroke is a beat; without strokes the first chords are the longer ones. */
function divided(cell: readonly ChartToken[], metre: Metre): Bar {
  const beat = metre.quarters / metre.beats;
  if (cell.some(isBeat)) {
    let at = 0;
    return cell.flatMap((token): BarChord[] => {
      const here = Math.min(at, metre.beats - 1) * beat;
      at += isBeat(token) ? token.text.length : sounds(token) ? 1 : 0;
      return sounds(token) ? [{ at: here, chord: token.chord }] : [];
    });
  }
  const chords = cell.filter(sounds);
  const n = chords.length;
  if (n > metre.beats) return chords.map(({ chord }, k) => ({ at: (k * metre.quarters) / n, chord }));
  const groups = metre.strong.length;
  const inGroups = n > 1 && groups % n === 0;
  const size = Math.floor(metre.beats / Math.max(1, n));
  const longer = metre.beats - size * n;
  let at = 0;
  return chords.map(({ chord }, k) => {
    const here = inGroups ? metre.strong[(k * groups) / n]! : at;
    at += size + (k < longer ? 1 : 0);
    return { at: here * beat, chord };
  });
}

function byStrokes(signs: readonly ChartToken[], metre: Metre): Bar[] {
  const bars: Bar[] = [];
  let beats = 0;
  for (const token of signs) {
    const bar = Math.floor(beats / metre.beats);
    if (sounds(token)) {
      while (bars.length <= bar) bars.push([]);
      bars[bar]!.push({ at: (beats % metre.beats) * (metre.quarters / metre.beats), chord: token.chord });
      beats += 1;
    } else if (isBeat(token)) beats += token.text.length;
  }
  while (bars.length < Math.ceil(beats / metre.beats)) bars.push([]);
  return bars;
}

function timesBehind(signs: readonly ChartToken[]): number {
  const last = signs.findLast(({ kind }) => kind !== "bar");
  const said = last?.kind === "repeat" ? /^\(?(?:[x×]\s?(\d{1,2})|(\d{1,2})\s?[x×])/i.exec(last.text) : null;
  return Math.min(mostTimes, Math.max(1, Number(said?.[1] ?? said?.[2] ?? 1)));
}

function repeated(bars: readonly Bar[], times: number): Bar[] {
  return Array.from({ length: times }, () => bars).flat();
}
