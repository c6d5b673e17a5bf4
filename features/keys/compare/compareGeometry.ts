import type { SingingVoice } from "@/shared/keys/keyScore";
import type { Scale } from "@/features/span/ladderGeometry";
import type { KeyRow } from "../keyRows";

/** px a semitone */
export const step = 15;

/** How the page is divided: names at the left, and one column for each key. */
export interface CompareColumns {
  lead: number;
  each: number;
  total: number;
}

/** Equal columns that fill the room, or as many px as one needs where they do not fit: then the table scrolls. */
export function compareColumns(room: number, count: number): CompareColumns {
  const narrow = room < 600;
  const lead = narrow ? 88 : 150;
  const each = Math.max(narrow ? 216 : 236, Math.floor((Math.min(1280, room) - lead) / Math.max(1, count)));
  return { lead, each, total: lead + each * count };
}

/** The semitones that the pictures show: voice and tunes with one of air below and two above. */
export function compareScale(rows: readonly KeyRow[], { range }: SingingVoice): Scale {
  return {
    low: Math.min(range.lowMidi, ...rows.map(({ lowMidi }) => lowMidi)) - 1,
    high: Math.max(range.highMidi, ...rows.map(({ highMidi }) => highMidi)) + 2,
  };
}

/** Height of the picture, half a semitone of air at both ends. */
export function compareHeight(scale: Scale): number {
  return (scale.high - scale.low + 1) * step;
}

export function compareY(midi: number, scale: Scale): number {
  return (scale.high - midi + 0.5) * step;
}

/** Where in a column the tune and the dimension lines stand, and how long the longest mark is. */
export function comparePlaces(width: number): { tune: number; room: number; longest: number } {
  return {
    tune: Math.round(width * 0.42),
    room: Math.round(Math.min(width * 0.79, width - 68)),
    longest: Math.round(width * 0.44),
  };
}
