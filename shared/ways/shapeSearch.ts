import type { Chord } from "../music/chord";
import { fretPosition, fretSemitones } from "../instruments/frets";
import type { Instrument } from "../instruments/instrument";
import { stringMidi } from "../instruments/tension";
import { chordNeeds, type ChordNeeds } from "./chordNeeds";
import { placeHand, type PlacedHand } from "./fingering";
import type { ShapeLoad } from "./shapeEase";

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

/** A fingering that can be played, before it is drawn. */
export interface PlayableShape {
  /** low to high: 0 = open, null = silent */
  frets: (number | null)[];
  load: ShapeLoad;
  /** distance between the lowest and the highest stopped fret, mm */
  reachMm: number;
  highestFret: number;
  /** how many fingers may lie across strings here */
  mostBarres: number;
}

/** Reach in mm that four fingers span over four neighbouring frets, and over five. */
const reach = { fourFrets: 116, fiveFrets: 80, fiveFretsWide: 100 };

/**
 * Every playable fingering of a chord, in the order of the neck. What counts as playable stands at `findShapes`.
 *
 * @param chord a parsed chord; a bass behind a slash is put lowest
 * @param instrument tuning, scale and frets
 * @param options capo, highest fret, looser rules
 * @param keep whether a fingering is wanted; what it is shown is overwritten by the next one. Default: all
 * @returns fingerings, each once; empty where the instrument cannot play the chord
 * @throws RangeError if the capo is negative or not whole, or a string's note cannot be read
 */
export function playableShapes(
  chord: Chord,
  instrument: Instrument,
  options: ShapeOptions = {},
  keep: (shape: PlayableShape) => boolean = () => true,
): PlayableShape[] {
  const capo = options.capo ?? 0;
  if (!Number.isInteger(capo) || capo < 0) throw new RangeError("a capo stands on a fret, 0 or higher");
  const stoppable = instrument.strings.filter(({ startsAtFret }) => startsAtFret === undefined).length;
  const asked = options.bass === false ? { ...chord, bass: null } : chord;
  const all = options.all ?? false;
  const needs = chordNeeds(asked, stoppable, all);
  const maxFret = Math.max(0, Math.min(options.maxFret ?? instrument.frets, instrument.frets - capo));
  const frets = Array.from({ length: maxFret + 1 }, (_, fret) => fret);
  const neck: Neck = {
    open: instrument.strings.map(stringMidi),
    short: instrument.strings.map(({ startsAtFret }) => startsAtFret !== undefined),
    maxFret,
    semitones: frets.map((fret) => semitonesFrom(instrument, capo, fret)),
    positions: frets.map((fret) => fretPosition(instrument.scaleMm, fretSemitones(instrument, capo + fret) ?? 0)),
    all,
    least: leastStrings(stoppable, needs, all),
  };
  const kept: PlayableShape[] = [];
  let found = false;
  search(neck, needs, (shape) => {
    found = true;
    if (keep(shape)) kept.push({ ...shape, frets: shape.frets.slice(), load: { ...shape.load } });
  });
  return found || all ? kept : playableShapes(chord, instrument, { ...options, all: true }, keep);
}

interface Neck {
  open: number[];
  /** strings that cannot be stopped */
  short: boolean[];
  maxFret: number;
  /** semitones above nut or capo at each fret; null where the fretboard has none */
  semitones: (number | null)[];
  /** mm from the nut */
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

function leastStrings(strings: number, needs: ChordNeeds, all: boolean): number {
  const tones = bitCount(needs.needed);
  const ordinary = all ? Math.min(3, strings) : strings <= 4 ? strings : strings - 2;
  return bitCount(needs.allowed) <= 2 ? Math.min(ordinary, Math.max(2, tones)) : ordinary;
}

/** Walks every window of the neck; the lowest stopped fret of a shape is the window's first, so none comes twice. */
function search(neck: Neck, needs: ChordNeeds, visit: (shape: PlayableShape) => void): void {
  const { open, short, all, least } = neck;
  const count = open.length;
  const shape = blankShape(count, all);
  const { frets } = shape;
  // One finger at least is at the window's first fret; the other three may lie across strings.
  const mostAbove = 5;
  const tones = open.map((midi) =>
    neck.semitones.map((raised) => {
      const bit = raised === null ? 0 : 1 << ((midi + raised) % 12);
      return bit & needs.allowed;
    }),
  );
  let base = 0;
  let choices: number[][] = [];
  const tonesAhead = new Int32Array(count + 1);
  const baseAhead = new Array<boolean>(count + 1).fill(false);
  const walk = (string: number, above: number, long: number, ended: boolean, atBase: boolean, sounded: number) => {
    if (string === count) {
      if (atBase && long >= least && (sounded & needs.needed) === needs.needed)
        judge(shape, sounded, neck, needs) && visit(shape);
      return;
    }
    if (long + count - string < least) return;
    // What the strings still to come cannot bring any more.
    if ((!atBase && !baseAhead[string]) || ((sounded | tonesAhead[string]!) & needs.needed) !== needs.needed) return;
    if (short[string] || !ended || all) {
      const next = short[string] ? long : long + 1;
      const heard = tones[string]!;
      for (const fret of choices[string]!) {
        const higher = base > 0 && fret > base ? above + 1 : above;
        if (higher > mostAbove) continue;
        frets[string] = fret;
        walk(string + 1, higher, next, ended, atBase || fret === base, sounded | heard[fret]!);
      }
    }
    frets[string] = null;
    walk(string + 1, above, long, ended || (long > 0 && !short[string]), atBase, sounded);
  };
  for (; base <= neck.maxFret; base++) {
    const top = base === 0 ? 0 : windowTop(neck, base);
    choices = tones.map((heard, string) => {
      const options = heard[0] === 0 ? [] : [0];
      if (!short[string] && base > 0)
        for (let fret = base; fret <= top; fret++) if (heard[fret] !== 0) options.push(fret);
      return options;
    });
    for (let string = count - 1; string >= 0; string--) {
      const options = choices[string]!;
      tonesAhead[string] = options.reduce((bits, fret) => bits | tones[string]![fret]!, tonesAhead[string + 1]!);
      baseAhead[string] = baseAhead[string + 1]! || options.includes(base);
    }
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

function blankShape(strings: number, all: boolean): PlayableShape {
  return {
    frets: Array.from({ length: strings }, () => null),
    load: {
      fingers: 0,
      barreStrings: 0,
      barreFret: 0,
      laterBarre: false,
      lowestFret: 0,
      openStrings: 0,
      innerSilent: 0,
      bassSilent: 0,
      trebleSilent: 0,
      crossed: 0,
      missing: 0,
      inverted: false,
    },
    reachMm: 0,
    highestFret: 0,
    mostBarres: all ? 2 : 1,
  };
}

/** Fills in what a shape's frets ask of the hand; false where it cannot be played. */
function judge(shape: PlayableShape, sounded: number, neck: Neck, needs: ChordNeeds): boolean {
  const { frets, load } = shape;
  let lowestPitch = Infinity;
  let lowestFret = 99;
  let highestFret = 0;
  let openStrings = 0;
  let bass = -1;
  let last = -1;
  let longSounding = 0;
  let long = 0;
  for (let string = 0; string < frets.length; string++) {
    const fret = frets[string]!;
    if (!neck.short[string]) long++;
    if (fret === null) continue;
    const pitch = neck.open[string]! + neck.semitones[fret]!;
    if (pitch < lowestPitch) lowestPitch = pitch;
    if (fret === 0) openStrings++;
    else {
      if (fret < lowestFret) lowestFret = fret;
      if (fret > highestFret) highestFret = fret;
    }
    if (neck.short[string]) continue;
    if (bass < 0) bass = long - 1;
    last = long - 1;
    longSounding++;
  }
  if (needs.bass !== null && lowestPitch % 12 !== needs.bass) return false;
  const hand = placeHand(frets, shape.mostBarres);
  if (!hand) return false;
  const { count, barreFrom, barreTo } = hand;
  const barred = barreFrom >= 0;
  load.fingers = count;
  load.barreStrings = barred ? barreTo - barreFrom + 1 : 0;
  load.barreFret = barred ? frets[barreFrom]! : 0;
  load.laterBarre = barred && hand.fingers[barreFrom] !== 1;
  load.lowestFret = highestFret === 0 ? 0 : lowestFret;
  load.openStrings = openStrings;
  load.innerSilent = last - bass + 1 - longSounding;
  load.bassSilent = bass;
  load.trebleSilent = long - 1 - last;
  load.crossed = crossedStrings(frets, hand);
  load.missing = bitCount(needs.allowed & ~sounded);
  load.inverted = needs.bass === null && frets.length >= 6 && lowestPitch % 12 !== needs.root;
  shape.highestFret = highestFret;
  shape.reachMm = highestFret === 0 ? 0 : neck.positions[highestFret]! - neck.positions[lowestFret]!;
  return true;
}

/** Strings stopped higher between two fingers at one fret: the hand has to fold. A barre needs no second finger there. */
function crossedStrings(frets: readonly (number | null)[], { fingers, barreFrom }: PlacedHand): number {
  let crossed = 0;
  for (let from = 0; from < frets.length; from++) {
    if (fingers[from] === 0 || (barreFrom >= 0 && fingers[from] === 1)) continue;
    for (let to = from + 2; to < frets.length; to++) {
      if (fingers[to] !== fingers[from]! + 1 || frets[to] !== frets[from]) continue;
      for (let between = from + 1; between < to; between++) if ((frets[between] ?? 0) > frets[from]!) crossed++;
    }
  }
  return crossed;
}

function bitCount(bits: number): number {
  let count = 0;
  for (let rest = bits; rest > 0; rest &= rest - 1) count++;
  return count;
}
