import type { Arrangement } from "@/shared/contract/arrangement";
import type { Decision } from "@/shared/contract/decision";
import type { OwnInstrument } from "@/shared/contract/instrument";
import type { LineUp } from "@/shared/contract/lineUp";
import type { Song } from "@/shared/contract/song";
import type { Take } from "@/shared/contract/take";
import type { Try } from "@/shared/contract/try";
import type { Voice } from "@/shared/contract/voice";

let serial = 0;
const nextId = () => `10000000-0000-4000-8000-${String(++serial).padStart(12, "0")}`;
const when = "2026-03-05T18:30:00.000Z";
const band = { lowMidi: 45, highMidi: 62 };

export const aVoice = (change: Partial<Voice> = {}): Voice => ({
  id: nextId(),
  name: "Maren",
  byHand: null,
  createdAt: when,
  ...change,
});

export const anArrangement = (songId: string, change: Partial<Arrangement> = {}): Arrangement => ({
  id: nextId(),
  songId,
  name: "Up the neck",
  tonic: "C",
  shift: -2,
  instrument: "box-adf",
  way: { retune: 0, capo: 0, shapeKey: "C" },
  chords: [],
  pattern: { name: "Down strokes", beats: 4, steps: ["down", "rest", "down", "rest", "down", "rest", "down", "rest"] },
  createdAt: when,
  ...change,
});

export const aTake = (voiceId: string, change: Partial<Take> = {}): Take => ({
  id: nextId(),
  voiceId,
  kind: "phrase",
  shows: "both",
  sungAt: when,
  warmedUp: null,
  effort: 2,
  durationS: 9,
  range: band,
  comfort: band,
  estimate: band,
  tuningCents: 4,
  certainty: 0.9,
  reasons: ["Heard clearly in 14 of 16 notes."],
  notes: [],
  ...change,
});

export const aSong = (change: Partial<Song> = {}): Song => {
  const id = nextId();
  return {
    id,
    title: `Song ${id.slice(-2)}`,
    chart: "D  A\nlow water",
    writtenKey: { tonic: "D", mode: "major" },
    tune: null,
    beatsPerBar: 4,
    tempo: 92,
    demo: null,
    tags: [],
    archivedAt: null,
    playedAt: null,
    createdAt: when,
    revision: 1,
    ...change,
  };
};

export const aDecision = (songId: string, voiceId: string | null, change: Partial<Decision> = {}): Decision => ({
  id: nextId(),
  songId,
  voiceId,
  tonic: "C",
  shift: -2,
  score: 88,
  reason: "Sits well.",
  instrument: null,
  way: null,
  decidedAt: when,
  earlier: [],
  ...change,
});

export const anInstrument = (change: Partial<OwnInstrument> = {}): OwnInstrument => ({
  id: nextId(),
  presetId: null,
  name: "Box of the slipway",
  strings: [{ note: "A3", gaugeIn: null, material: "unknown" }],
  scaleMm: 610,
  frets: 18,
  capoTo: 7,
  leftHanded: false,
  favourite: true,
  ...change,
});

export const aTry = (songId: string, voiceId: string | null, change: Partial<Try> = {}): Try => ({
  id: nextId(),
  songId,
  voiceId,
  tonic: "C",
  shift: -2,
  backing: true,
  sungAt: when,
  effort: 2,
  measures: null,
  ...change,
});

export const aLineUp = (songId: string, change: Partial<LineUp> = {}): LineUp => ({
  id: nextId(),
  songId,
  players: [{ id: nextId(), name: "Tede", instrument: "whistle-D", way: null }],
  changedAt: when,
  ...change,
});
