import { tonicPitchClass } from "../../music/keyName";
import { pitchClass } from "../../music/pitch";
import type { BackingEvent, ChordInTime } from "./backingPlan";
import { bassNotes, voiceChord } from "./chordVoicing";
import type { Metre } from "./metre";
import { handPattern, type HandStroke, type RightHand } from "./rightHand";
import { strikesAt, strokesInTime } from "./strokesInTime";

/** How the chords are to be played. */
export interface HandShape {
  metre: Metre;
  bars: number;
  hand: RightHand;
}

interface Sounding {
  at: number;
  end: number;
  voicing: number[];
  /** the string that is plucked alone: the one with the root */
  plucked: number;
  bass: { first: number; other: number };
}

/**
 * The strokes of a right hand over the chords of a song. A change of chord is always heard, on a stroke of its own
 * where the pattern has none there; in the last bar each chord is struck once and rings.
 *
 * @param chords in order
 * @param semitones how far they are moved
 * @param shape metre, length and pattern
 * @returns events by time, `at` and `duration` in quarter notes from the song's start
 */
export function playHand(chords: readonly ChordInTime[], semitones: number, shape: HandShape): BackingEvent[] {
  const { metre, bars, hand } = shape;
  const length = bars * metre.quarters;
  const sounding = voiced(chords, semitones, length);
  const patternOf = (bar: number) => handPattern(hand, metre, bar);
  const strokes = strokesInTime(sounding, { metre, bars, patternOf, struckAnyway });
  return strokes.map((each, index) => {
    const chord = sounding[each.chord]!;
    const next = strokes
      .slice(index + 1, index + 24)
      .find(({ at, kind }) => at > each.at + 1e-9 && family(kind) === family(each.kind));
    const end = Math.min(chord.end, next?.at ?? length);
    return {
      at: each.at,
      duration: end - each.at,
      kind: soundOf(each.kind),
      midis: pitchesOf(each.kind, chord),
      level: each.level,
    };
  });
}

/** What a change of chord adds where the pattern strikes nothing: a bass note and a stroke. */
function struckAnyway(at: number, pattern: readonly HandStroke[]): HandStroke[] {
  const has = (kinds: RegExp) => strikesAt(pattern, at, ({ kind }) => kinds.test(kind));
  return [
    ...(has(/^bass/) ? [] : [{ at, kind: "bass-first" as const, level: 0.75 }]),
    ...(has(/^(strum|pluck)/) ? [] : [{ at, kind: "strum-down" as const, level: 0.8 }]),
  ];
}

function voiced(chords: readonly ChordInTime[], semitones: number, length: number): Sounding[] {
  let before: number[] | null = null;
  return chords.flatMap(({ at, chord }, k) => {
    if (!chord) return [];
    const voicing: number[] = voiceChord(chord, semitones, before);
    before = voicing;
    const lowest = tonicPitchClass(chord.root) + chord.intervals[0]! + semitones;
    const plucked = voicing.find((midi) => pitchClass(midi) === pitchClass(lowest)) ?? voicing[0]!;
    return [{ at, end: chords[k + 1]?.at ?? length, voicing, plucked, bass: bassNotes(chord, semitones) }];
  });
}

function family(kind: HandStroke["kind"]): "bass" | "hand" {
  return kind === "bass-first" || kind === "bass-other" ? "bass" : "hand";
}

function soundOf(kind: HandStroke["kind"]): BackingEvent["kind"] {
  return kind === "bass-first" || kind === "bass-other" ? "bass" : kind;
}

function pitchesOf(kind: HandStroke["kind"], chord: Sounding): number[] {
  if (kind === "bass-first") return [chord.bass.first];
  if (kind === "bass-other") return [chord.bass.other];
  return kind === "pluck" ? [chord.plucked] : chord.voicing;
}
