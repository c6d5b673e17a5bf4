import type { Chord } from "../music/chord";
import { fretPosition, fretSemitones } from "../instruments/frets";
import type { Instrument } from "../instruments/instrument";
import { stringMidi } from "../instruments/tension";
import { chordNeeds, type ChordNeeds } from "./chordNeeds";
import { fingering } from "./fingering";
import { easeOf, shapeCost, type ShapeLoad } from "./shapeEase";
import type { Shape } from "./way";

/** How to look for fingerings. */
export interface ShapeOptions {
  /** fret of the capo; shapes are then counted from it. Default 0 */
  capo?: number;
  /** highest fret to use, counted from the capo; default as far as the neck goes */
  maxFret?: number;
  /** also shapes with silent inner strings, wider reach, a second barre, few strings, or without root or plain fifth */
  all?: boolean;
  /** false ignores the bass behind a slash; default true */
  bass?: boolean;
}

/** A fingering with what its ease was judged by. */
export interface JudgedShape {
  shape: Shape;
  load: ShapeLoad;
}

/** Reach in mm that four fingers span over four neighbouring frets, and over five. */
const reach = { fourFrets: 116, fiveFrets: 80, fiveFretsWide: 100 };

/**
 * Every playable fingering of a chord on an instrument, all the way up the neck.
 *
 * Root and third sound (in suspended chords what stands for the third), at most four fingers, no silent string between
 * sounding ones, reach by millimetres. A short string sounds open or not at all. With a capo, a short string is taken to
 * be stopped as many frets up as the others.
 *
 * @param chord a parsed chord; a bass behind a slash is put lowest
 * @param instrument tuning, scale and frets
 * @param options capo, highest fret, looser rules
 * @returns shapes, easiest first; empty where the instrument cannot play the chord
 * @throws RangeError if the capo is negative or not whole, or a string's note cannot be read
 * @see common practice for what counts as playable; spans in mm from equal temperament
 */
export function findShapes(chord: Chord, instrument: Instrument, options: ShapeOptions = {}): Shape[] {
  return judgedShapes(chord, instrument, options).map(({ shape }) => shape);
}

/**
 * The fingerings of {@link findShapes}, each with what its ease was judged by.
 *
 * @param chord a parsed chord
 * @param instrument tuning, scale and frets
 * @param options as for findShapes
 * @returns judged shapes, easiest first
 * @throws RangeError if the capo is negative or not whole, or a string's note cannot be read
 */
export function judgedShapes(chord: Chord, instrument: Instrument, options: ShapeOptions = {}): JudgedShape[] {
  const capo = options.capo ?? 0;
  if (!Number.isInteger(capo) || capo < 0) throw new RangeError("a capo stands on a fret, 0 or higher");
  const stoppable = instrument.strings.filter(({ startsAtFret }) => startsAtFret === undefined).length;
  const asked = options.bass === false ? { ...chord, bass: null } : chord;
  const needs = chordNeeds(asked, stoppable, options.all ?? false);
  const maxFret = Math.min(options.maxFret ?? instrument.frets, instrument.frets - capo);
  const neck: Neck = {
    instrument,
    capo,
    maxFret,
    open: instrument.strings.map(stringMidi),
    // Frets count from the capo, and on chromatic necks so do semitones.
    semitones: Array.from({ length: Math.max(0, maxFret) + 1 }, (_, fret) => semitonesFrom(instrument, capo, fret)),
    positions: Array.from({ length: Math.max(0, maxFret) + 1 }, (_, fret) => positionOf(instrument, capo, fret)),
    all: options.all ?? false,
    least: leastStrings(stoppable, needs, options.all ?? false),
  };
  const found: JudgedShape[] = [];
  search(neck, needs, (frets) => {
    const judged = judge(frets, neck, needs);
    if (judged) found.push(judged);
  });
  if (found.length === 0 && !neck.all) return judgedShapes(chord, instrument, { ...options, all: true });
  return found.sort((a, b) => b.shape.ease - a.shape.ease || compareFrets(a.shape.frets, b.shape.frets));
}

interface Neck {
  instrument: Instrument;
  capo: number;
  maxFret: number;
  open: number[];
  semitones: (number | null)[];
  positions: number[];
  all: boolean;
  /** fewest sounding strings, short ones not counted */
  least: number;
}

function semitonesFrom(instrument: Instrument, capo: number, fret: number): number | null {
  const base = fretSemitones(instrument, capo);
  const stopped = fretSemitones(instrument, capo + fret);
  return base === null || stopped === null ? null : stopped - base;
}

function positionOf(instrument: Instrument, capo: number, fret: number): number {
  return fretPosition(instrument.scaleMm, fretSemitones(instrument, capo + fret) ?? 0);
}

function leastStrings(strings: number, needs: ChordNeeds, all: boolean): number {
  const tones = bitCount(needs.needed);
  const ordinary = all ? Math.min(3, strings) : strings <= 4 ? strings : strings - 2;
  return bitCount(needs.allowed) <= 2 ? Math.min(ordinary, Math.max(2, tones)) : ordinary;
}

/** Walks every window of the neck; the lowest stopped fret of a shape is the window's first, so none comes twice. */
function search(neck: Neck, needs: ChordNeeds, visit: (frets: (number | null)[]) => void): void {
  const count = neck.open.length;
  const frets: (number | null)[] = Array.from({ length: count }, () => null);
  const short = neck.instrument.strings.map(({ startsAtFret }) => startsAtFret !== undefined);
  // One finger at least is at the window's first fret; the other three may lie across strings.
  const mostAbove = 5;
  const allowed = (string: number, fret: number) => {
    const raised = neck.semitones[fret];
    return (
      raised !== undefined && raised !== null && ((needs.allowed >> ((neck.open[string]! + raised) % 12)) & 1) === 1
    );
  };
  const tone = (string: number, fret: number) => 1 << ((neck.open[string]! + neck.semitones[fret]!) % 12);
  for (let base = 0; base <= neck.maxFret; base++) {
    const top = base === 0 ? 0 : windowTop(neck, base);
    const choices = neck.open.map((_, string) => {
      const options: number[] = allowed(string, 0) ? [0] : [];
      if (!short[string] && base > 0)
        for (let fret = base; fret <= top; fret++) if (allowed(string, fret)) options.push(fret);
      return options;
    });
    const walk = (string: number, above: number, long: number, ended: boolean, atBase: boolean, sounded: number) => {
      if (string === count) {
        if (atBase && long >= neck.least && (sounded & needs.needed) === needs.needed) visit(frets);
        return;
      }
      if (long + count - string < neck.least) return;
      if (short[string] || !ended || neck.all) {
        for (const fret of choices[string]!) {
          const higher = base > 0 && fret > base ? above + 1 : above;
          if (higher > mostAbove) continue;
          frets[string] = fret;
          const next = short[string] ? long : long + 1;
          walk(string + 1, higher, next, ended, atBase || fret === base, sounded | tone(string, fret));
        }
      }
      frets[string] = null;
      walk(string + 1, above, long, ended || (long > 0 && !short[string]), atBase, sounded);
    };
    walk(0, 0, 0, false, base === 0, 0);
  }
}

function windowTop(neck: Neck, base: number): number {
  let top = base;
  while (top < neck.maxFret && top - base < 4 && withinReach(neck, base, top + 1)) top++;
  return top;
}

function withinReach(neck: Neck, low: number, high: number): boolean {
  const mm = neck.positions[high]! - neck.positions[low]!;
  const five = neck.all ? reach.fiveFretsWide : reach.fiveFrets;
  return mm <= (high - low <= 3 ? reach.fourFrets : five);
}

function judge(frets: readonly (number | null)[], neck: Neck, needs: ChordNeeds): JudgedShape | null {
  let sounded = 0;
  let lowestPitch = Infinity;
  let lowestFret = Infinity;
  let highestFret = 0;
  let hasOpen = false;
  const roots: number[] = [];
  for (let string = 0; string < frets.length; string++) {
    const fret = frets[string]!;
    if (fret === null) continue;
    const pitch = neck.open[string]! + neck.semitones[fret]!;
    sounded |= 1 << (pitch % 12);
    if (pitch % 12 === needs.root) roots.push(string);
    if (pitch < lowestPitch) lowestPitch = pitch;
    if (fret === 0) hasOpen = true;
    else {
      if (fret < lowestFret) lowestFret = fret;
      if (fret > highestFret) highestFret = fret;
    }
  }
  if (needs.bass !== null && lowestPitch % 12 !== needs.bass) return null;
  const hand = fingering(frets, neck.all ? 2 : 1);
  if (!hand) return null;
  const reachMm = highestFret === 0 ? 0 : neck.positions[highestFret]! - neck.positions[lowestFret]!;
  const silent = silentStrings(frets, neck.instrument);
  const load: ShapeLoad = {
    fingers: hand.count,
    barreStrings: hand.barre ? hand.barre.toString - hand.barre.fromString + 1 : 0,
    barreFret: hand.barre ? hand.barre.fret : 0,
    laterBarre: hand.barre !== null && hand.fingers[hand.barre.fromString] !== 1,
    lowestFret: highestFret === 0 ? 0 : lowestFret,
    hasOpen,
    innerSilent: silent.inner,
    bassSilent: silent.bass,
    trebleSilent: silent.treble,
    crossed: crossedStrings(frets, hand.fingers, hand.barre !== null),
    missing: bitCount(needs.allowed & ~sounded),
    inverted: needs.bass === null && frets.length >= 6 && lowestPitch % 12 !== needs.root,
  };
  const shape: Shape = {
    frets: [...frets],
    fingers: hand.fingers,
    barre: hand.barre,
    reachMm: Math.round(reachMm * 10) / 10,
    ease: easeOf(shapeCost(load, reachMm, neck.capo)),
    roots,
  };
  return { shape, load };
}

function silentStrings(frets: readonly (number | null)[], instrument: Instrument) {
  const long = frets.filter((_, k) => instrument.strings[k]!.startsAtFret === undefined);
  const bass = long.findIndex((fret) => fret !== null);
  const last = long.findLastIndex((fret) => fret !== null);
  const inner = long.filter((fret, k) => fret === null && k > bass && k < last).length;
  return { bass, inner, treble: long.length - 1 - last };
}

/** Strings stopped higher between two fingers at one fret: the hand has to fold. A barre needs no second finger there. */
function crossedStrings(frets: readonly (number | null)[], fingers: readonly number[], barred: boolean): number {
  let crossed = 0;
  for (let from = 0; from < frets.length; from++) {
    if (fingers[from] === 0 || (barred && fingers[from] === 1)) continue;
    for (let to = from + 2; to < frets.length; to++) {
      if (fingers[to] !== fingers[from]! + 1 || frets[to] !== frets[from]) continue;
      for (let between = from + 1; between < to; between++) if ((frets[between] ?? 0) > frets[from]!) crossed++;
    }
  }
  return crossed;
}

function compareFrets(a: readonly (number | null)[], b: readonly (number | null)[]): number {
  for (let k = 0; k < a.length; k++) {
    const difference = (a[k] ?? 99) - (b[k] ?? 99);
    if (difference !== 0) return difference;
  }
  return 0;
}

function bitCount(bits: number): number {
  let count = 0;
  for (let rest = bits; rest > 0; rest &= rest - 1) count++;
  return count;
}
