import type { BackingEvent, HandPlayer } from "../../songs/backing/backingPlan";
import { strikesAt, strokesInTime } from "../../songs/backing/strokesInTime";
import type { Instrument } from "../../instruments/instrument";
import { soundedStrings, type NeckSetting, type SoundedString } from "../neck/soundedStrings";
import type { Shape } from "../way";
import type { Step, StrokePattern } from "./strokePattern";

/** Shapes of a song's chords on one instrument, and what the right hand does with them. */
export interface PlayedShapes {
  chords: readonly { written: string; shape: Shape | null }[];
  instrument: Instrument;
  setting: NeckSetting;
  pattern: StrokePattern;
}

interface Stroke {
  at: number;
  step: Exclude<Step, "rest">;
  level: number;
  /** how many strokes of this step came before it in the bar */
  before: number;
  /** a pluck in a bar without a bass: the first one takes the bass's string */
  alone: boolean;
}

interface Strings {
  /** in the order of the neck, from the bass side */
  all: readonly SoundedString[];
  /** the string that the thumb takes, and the one it takes in turn */
  bass: readonly [SoundedString, SoundedString];
  /** the others, from low to high and back: what plucks go through */
  plucked: readonly SoundedString[];
}

/**
 * Plays a song's chords with the very strings of their shapes. A down stroke goes through the strings from the bass side,
 * an up stroke from the treble side; the bass is the lowest root, by turns with the next string above it; plucks go
 * through the other strings from low to high and back, from the root's string on where the bar has no bass.
 *
 * @param played shapes by written chord, instrument, retune and capo, pattern
 * @returns a right hand for `planBacking`
 * @throws RangeError when it plays a shape that the instrument has not
 */
export function playShapes({ chords, instrument, setting, pattern }: PlayedShapes): HandPlayer {
  const strings = new Map<string, Strings>();
  for (const { written, shape } of chords) {
    const found = shape && stringsOf(shape, instrument, setting);
    if (found) strings.set(written, found);
  }
  return (inTime, { metre, bars }) => {
    const length = bars * metre.quarters;
    const sounding = inTime.flatMap(({ at, chord }, k) => {
      const own = chord ? strings.get(chord.text) : undefined;
      return own ? [{ at, end: inTime[k + 1]?.at ?? length, own }] : [];
    });
    const beat = metre.quarters / metre.beats;
    const bar = barOf(pattern, (at) => metre.strong.some((strong) => Math.abs(strong * beat - at) < 1e-6));
    const strokes = strokesInTime<Stroke>(sounding, {
      metre,
      bars,
      patternOf: () => bar,
      struckAnyway: (at, present) =>
        strikesAt(present, at) ? [] : [{ at, step: "down", level: 0.8, before: 0, alone: false }],
    });
    const events = strokes.map((stroke) => ({ stroke, taken: taken(stroke, sounding[stroke.chord]!.own) }));
    return events.map(({ stroke, taken: own }, index): BackingEvent => {
      const later = events.slice(index + 1, index + 48);
      const next = later.find((other) => other.stroke.at > stroke.at + 1e-9 && stops(other, own, stroke.step));
      const end = Math.min(sounding[stroke.chord]!.end, next?.stroke.at ?? length);
      return {
        at: stroke.at,
        duration: end - stroke.at,
        kind: kindOf(stroke.step),
        midis: own.map(({ midi }) => midi),
        level: stroke.level,
      };
    });
  };
}

/** A strum ends the strum before it; a single string rings until it is struck again. */
function stops(
  other: { stroke: Stroke; taken: readonly SoundedString[] },
  own: readonly SoundedString[],
  step: Stroke["step"],
): boolean {
  const strum = other.stroke.step === "down" || other.stroke.step === "up";
  if (step === "down" || step === "up") return strum;
  return other.taken.some(({ string }) => string === own[0]?.string);
}

function barOf({ steps }: StrokePattern, strong: (at: number) => boolean): Stroke[] {
  const alone = !steps.includes("bass");
  const counts = { down: 0, up: 0, bass: 0, pluck: 0 };
  return steps.flatMap((step, k): Stroke[] => {
    if (step === "rest") return [];
    const at = k / 2;
    const level = step === "up" ? 0.5 : step === "down" ? (strong(at) ? 0.9 : 0.7) : 0.85;
    return [{ at, step, level, before: counts[step]++, alone }];
  });
}

function stringsOf(shape: Shape, instrument: Instrument, setting: NeckSetting): Strings | null {
  const all = soundedStrings(shape.frets, instrument, setting);
  const byPitch = [...all].sort((a, b) => a.midi - b.midi);
  const lowest = byPitch[0];
  if (!lowest) return null;
  // The lowest root, be it lowest of all or not: on closed shapes of three strings it often is in the middle.
  const low = byPitch.find(({ string }) => shape.roots.includes(string)) ?? lowest;
  const others = byPitch.filter((each) => each !== low);
  const up = others.length > 0 ? others : [low];
  return { all, bass: [low, up[0]!], plucked: [...up, ...up.slice(1, -1).reverse()] };
}

function taken({ step, before, alone }: Stroke, { all, bass, plucked }: Strings): readonly SoundedString[] {
  if (step === "down" || step === "up") return all;
  if (step === "bass") return [bass[before % 2 === 0 ? 0 : 1]];
  if (alone && before === 0) return [bass[0]];
  return [plucked[(alone ? before - 1 : before) % plucked.length]!];
}

function kindOf(step: Stroke["step"]): BackingEvent["kind"] {
  if (step === "down") return "strum-down";
  if (step === "up") return "strum-up";
  return step;
}
