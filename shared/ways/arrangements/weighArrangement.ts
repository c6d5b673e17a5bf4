import { fretPosition, fretSemitones } from "../../instruments/frets";
import type { Instrument } from "../../instruments/instrument";
import { travelMm } from "../handPath";
import { soundedStrings } from "../neck/soundedStrings";
import { easeOf } from "../shapeEase";
import { songFlow } from "../songFlow";
import type { Shape } from "../way";
import type { ArrangementQuestion, ArrangementWeight } from "./arrangement";

/**
 * What an arrangement asks of the hand, and where on the neck it lies.
 *
 * @param question chords with their shapes, their order in the song, instrument and capo
 * @returns the weight; chords without a shape count nothing
 * @throws RangeError if a string's note cannot be read
 */
export function weighArrangement({ chords, sequence, instrument, capo }: ArrangementQuestion): ArrangementWeight {
  const names = chords.map(({ written }) => written);
  const flow = songFlow(names, sequence ?? names);
  const hands = chords.map(({ shape }) => ({ handMm: shape && handMm(shape, instrument, capo) }));
  const played = chords.flatMap(({ shape }, k) => (shape ? [{ shape, times: flow.times[k]! }] : []));
  const all = played.reduce((sum, { times }) => sum + times, 0);
  const mean = (of: (shape: Shape) => number) =>
    all === 0 ? 0 : played.reduce((sum, { shape, times }) => sum + times * of(shape), 0) / all;
  const frets = played.flatMap(({ shape }) => shape.frets.filter((fret): fret is number => fret !== null));
  return {
    travelMm: Math.round(travelMm(hands, flow)),
    ease: easeOf(mean(costOf)),
    strings: mean(({ frets: each }) => each.filter((fret) => fret !== null).length),
    frets: frets.length === 0 ? null : { lowest: Math.min(...frets), highest: Math.max(...frets) },
    root: carrierOf(played, instrument),
  };
}

/**
 * What a shape costs the hand, on the scale of `shapeCost`.
 *
 * @param shape with its ease
 * @returns 0 or more
 * @example costOf({ ease: 0.5 }) // => 3
 */
export function costOf({ ease }: Pick<Shape, "ease">): number {
  return 3 * (1 / ease - 1);
}

/**
 * Where the hand is for a shape.
 *
 * @param shape with its frets from nut or capo
 * @param instrument scale and frets
 * @param capo fret of the capo
 * @returns mm from nut or capo to the first finger; null where no string is stopped
 */
export function handMm({ frets }: Pick<Shape, "frets">, instrument: Instrument, capo: number): number | null {
  const stopped = frets.filter((fret): fret is number => fret !== null && fret > 0);
  if (stopped.length === 0) return null;
  const at = (fret: number) => fretPosition(instrument.scaleMm, fretSemitones(instrument, fret) ?? 0);
  return at(capo + Math.min(...stopped)) - at(capo);
}

/**
 * The string that carries the lowest root of a shape.
 *
 * @param shape with the strings that sound its root
 * @param instrument tuning and frets
 * @returns index of the string; null where the root is left out
 */
export function rootString(shape: Shape, instrument: Instrument): number | null {
  const sounded = soundedStrings(shape.frets, instrument, { retune: 0, capo: 0 });
  const roots = sounded.filter(({ string }) => shape.roots.includes(string));
  return roots.length === 0 ? null : roots.reduce((low, each) => (each.midi < low.midi ? each : low)).string;
}

function carrierOf(played: readonly { shape: Shape; times: number }[], instrument: Instrument) {
  const times = new Map<number | null, number>();
  for (const { shape, times: count } of played) {
    const string = rootString(shape, instrument);
    times.set(string, (times.get(string) ?? 0) + count);
  }
  const all = [...times.values()].reduce((sum, count) => sum + count, 0);
  const [most] = [...times].sort((a, b) => b[1] - a[1]);
  if (!most || most[0] === null || most[1] * 2 <= all) return null;
  return { string: most[0], always: most[1] === all };
}
