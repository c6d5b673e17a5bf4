import type { Chord } from "../../music/chord";
import { tonicPitchClass } from "../../music/keyName";
import { pitchClass } from "../../music/pitch";
import type { BackingEvent } from "./backingPlan";
import { bassNotes, voiceChord } from "./chordVoicing";
import type { Metre } from "./metre";
import { handPattern, type HandStroke, type RightHand } from "./rightHand";

/** A chord from `at` (quarter notes from the song's start) until the next one; null is silence. */
export interface ChordInTime {
  at: number;
  chord: Chord | null;
}

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
  const strokes: (HandStroke & { chord: Sounding })[] = [];
  let current = 0;
  for (let bar = 0; bar < bars; bar += 1) {
    const from = bar * metre.quarters;
    const pattern = bar === bars - 1 ? [] : handPattern(hand, metre, bar);
    const changes = sounding.filter(({ at }) => at >= from - 1e-9 && at < from + metre.quarters - 1e-9);
    const here = [
      ...pattern.map((each) => ({ ...each, at: from + each.at })),
      ...changes.flatMap(({ at }) => struckAnyway(at, from, pattern)),
      ...(bar === bars - 1 && changes.every(({ at }) => at > from + 1e-9) ? struckAnyway(from, from, []) : []),
    ].sort((a, b) => a.at - b.at);
    for (const each of here) {
      while (sounding[current] && sounding[current]!.end <= each.at + 1e-9) current += 1;
      const chord = sounding[current];
      if (chord && chord.at <= each.at + 1e-9) strokes.push({ ...each, chord });
    }
  }
  return strokes.map((each, index) => {
    const next = strokes
      .slice(index + 1, index + 24)
      .find(({ at, kind }) => at > each.at + 1e-9 && family(kind) === family(each.kind));
    const end = Math.min(each.chord.end, next?.at ?? length);
    return {
      at: each.at,
      duration: end - each.at,
      kind: soundOf(each.kind),
      midis: pitchesOf(each),
      level: each.level,
    };
  });
}

/** What a change of chord adds where the pattern strikes nothing: a bass note and a stroke. */
function struckAnyway(at: number, from: number, pattern: readonly HandStroke[]): HandStroke[] {
  const has = (kinds: RegExp) => pattern.some((each) => Math.abs(from + each.at - at) < 1e-6 && kinds.test(each.kind));
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

function pitchesOf({ kind, chord }: { kind: HandStroke["kind"]; chord: Sounding }): number[] {
  if (kind === "bass-first") return [chord.bass.first];
  if (kind === "bass-other") return [chord.bass.other];
  return kind === "pluck" ? [chord.plucked] : chord.voicing;
}
