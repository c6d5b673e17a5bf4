import { randomUUID } from "node:crypto";
import type { Arrangement } from "../../shared/contract/arrangement";
import type { Decision } from "../../shared/contract/decision";
import type { OwnInstrument } from "../../shared/contract/instrument";
import type { PlayerWishes } from "../../shared/contract/playerWishes";
import type { LineUp } from "../../shared/contract/lineUp";
import type { Song } from "../../shared/contract/song";
import type { Take } from "../../shared/contract/take";
import type { Try } from "../../shared/contract/try";
import type { Voice } from "../../shared/contract/voice";

const instant = "2026-11-24T19:20:00.000Z";

export function aVoice(changes: Partial<Voice> = {}): Voice {
  return { id: randomUUID(), name: "With a cold", byHand: null, createdAt: instant, ...changes };
}

export function aTake(voiceId: string, changes: Partial<Take> = {}): Take {
  return {
    id: randomUUID(),
    voiceId,
    kind: "hold",
    shows: "low",
    sungAt: instant,
    warmedUp: false,
    effort: 2,
    durationS: 11.32,
    range: { lowMidi: 53.1, highMidi: 71.9 },
    comfort: { lowMidi: 55, highMidi: 69 },
    estimate: { lowMidi: 51, highMidi: 74 },
    tuningCents: -7.5,
    certainty: 0.82,
    reasons: ["Heard clearly in 14 of 16 notes."],
    notes: [{ start: 0.4, end: 1.5, midi: 60.02, steadinessCents: 11, sustained: true, clear: true }],
    ...changes,
  };
}

export function aSong(changes: Partial<Song> = {}): Song {
  return {
    id: randomUUID(),
    title: "Nets in the Loft",
    chart: "G       D\nNets in the loft, ♯ and ♭",
    writtenKey: { tonic: "G", mode: "major" },
    tune: { kind: "melody", notes: [{ start: 0, duration: 1 / 3, midi: 62 }], home: "G" },
    beatsPerBar: 3,
    tempo: 92,
    demo: null,
    tags: [],
    archivedAt: null,
    playedAt: null,
    createdAt: instant,
    revision: 1,
    ...changes,
  };
}

export function aDecision(songId: string, voiceId: string | null, changes: Partial<Decision> = {}): Decision {
  return {
    id: randomUUID(),
    songId,
    voiceId,
    tonic: "Bb",
    shift: -2,
    score: 91.5,
    reason: "All of it sits in your comfort band.",
    instrument: "box-adf",
    way: { retune: 0, capo: 1, shapeKey: "A" },
    decidedAt: instant,
    earlier: [],
    ...changes,
  };
}

export function anInstrument(changes: Partial<OwnInstrument> = {}): OwnInstrument {
  return {
    id: randomUUID(),
    presetId: "banjo",
    name: "Grandfather's banjo",
    strings: [
      { note: "G4", gaugeIn: 0.009, material: "plain-steel", scaleMm: 498.5, startsAtFret: 5 },
      { note: "D3", gaugeIn: null, material: "unknown" },
    ],
    scaleMm: 666.75,
    frets: 22,
    capoTo: 7,
    leftHanded: true,
    favourite: false,
    ...changes,
  };
}

export function anArrangement(songId: string, changes: Partial<Arrangement> = {}): Arrangement {
  const shape = { frets: [null, 5, 5], fingers: [0, 1, 1], reachMm: 0, ease: 0.75, roots: [1] };
  return {
    id: randomUUID(),
    songId,
    name: "Up the neck",
    tonic: "Bb",
    shift: -2,
    instrument: "box-adf",
    way: { retune: -2, capo: 1, shapeKey: "B" },
    chords: [
      {
        written: "C",
        sounding: "Bb",
        played: "B",
        shape: { ...shape, barre: { fret: 5, fromString: 1, toString: 2 } },
      },
      { written: "N.C.", sounding: "N.C.", played: "N.C.", shape: null },
    ],
    pattern: { name: "Pluck and strum", beats: 4, steps: ["pluck", "rest", "down", "up"] },
    createdAt: instant,
    ...changes,
  };
}

export function aTry(songId: string, voiceId: string | null, changes: Partial<Try> = {}): Try {
  const measures = { sungShare: 1, offCents: 12.5, inTune: 0.9, fellShort: null, unsteady: null, ranOutOfLow: null };
  return {
    id: randomUUID(),
    songId,
    voiceId,
    tonic: "Bb",
    shift: -2,
    tempo: 92,
    backing: true,
    sungAt: instant,
    effort: 2,
    measures: {
      ...measures,
      octaves: -1,
      moved: 0,
      tuningCents: -7.5,
      phrases: [
        {
          ...measures,
          fellShort: { midi: 71, semitones: 1.5, side: "above" },
          phrase: 0,
          label: "Nets in the loft",
          lowMidi: 60,
          highMidi: 71,
          leftOut: false,
          start: 0.4,
          end: 4.25,
          sentence: "Not up to B4, 1.5 semitones short.",
        },
      ],
      pitches: [{ midi: 71, wantedS: 1.5, sungS: 1.2, offCents: 150, fellShort: "above" }],
      summary: ["Most of it was in tune."],
    },
    ...changes,
  };
}

export function someWishes(changes: Partial<PlayerWishes> = {}): PlayerWishes {
  return {
    id: randomUUID(),
    noBarre: true,
    noCapo: false,
    neverRetune: true,
    keepRinging: false,
    highestCapo: 5,
    known: [{ tuning: "5 5 5 4 5", shapes: ["3 2 0 0 0 3", "x 3 2 0 1 0"] }],
    changedAt: instant,
    ...changes,
  };
}

export function aLineUp(songId: string, changes: Partial<LineUp> = {}): LineUp {
  return {
    id: randomUUID(),
    songId,
    players: [
      { id: randomUUID(), name: "Tede", instrument: "whistle-D", way: null },
      {
        id: randomUUID(),
        name: "Maren",
        instrument: "box-adf",
        way: { into: "C", retune: 0, capo: 3, shapeKey: "A" },
      },
    ],
    changedAt: instant,
    ...changes,
  };
}
