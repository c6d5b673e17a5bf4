import { parseNoteName } from "@/shared/music/pitch";
import type { SingingVoice } from "@/shared/keys/keyScore";
import { noteWord } from "../noteWords";

/** What stands in the four fields, as typed. */
export interface ByHandFields {
  lowest: string;
  highest: string;
  comfortLow: string;
  comfortTop: string;
}
type ByHandErrors = Partial<Record<keyof ByHandFields, string>>;
export type ByHandReading = { ok: true; voice: SingingVoice } | { ok: false; errors: ByHandErrors };

/** No human voice is sought outside of these: C1 to C7. */
const lowestNote = 24;
const highestNote = 96;
/** Common practice: one to two semitones in reserve at the bottom, two to three at the top. */
const reserves = { low: 2, high: 3 };
/** A range this narrow has nothing to spare for a reserve. */
const leastWithReserves = 8;

/** The band that is assumed where the singer gives none. */
export function usualComfort(lowMidi: number, highMidi: number): SingingVoice["comfort"] {
  if (highMidi - lowMidi < leastWithReserves) return { lowMidi, highMidi };
  return { lowMidi: lowMidi + reserves.low, highMidi: highMidi - reserves.high };
}

/** Reads the fields; every fault is told at its own field, in words. */
export function readByHand(fields: ByHandFields): ByHandReading {
  const errors: ByHandErrors = {};
  const read = (name: keyof ByHandFields, needed: boolean): number | null => {
    const text = fields[name].trim();
    if (text === "") {
      if (needed) errors[name] = `Give your ${name} note, such as ${name === "lowest" ? "G3" : "C5"}.`;
      return null;
    }
    const midi = parseNoteName(text);
    if (midi === null) errors[name] = noSuchNote(text);
    else if (midi < lowestNote || midi > highestNote) errors[name] = "Voices lie between C1 and C7.";
    return errors[name] === undefined ? midi : null;
  };
  const low = read("lowest", true);
  const high = read("highest", true);
  const comfortLow = read("comfortLow", false);
  const comfortTop = read("comfortTop", false);
  if (low !== null && high !== null) {
    if (low >= high) errors.highest = `The highest note must be above ${noteWord(low)}.`;
    else checkComfort({ low, high, comfortLow, comfortTop }, errors);
  }
  if (low === null || high === null || Object.keys(errors).length > 0) return { ok: false, errors };
  const usual = usualComfort(low, high);
  const comfort = { lowMidi: comfortLow ?? usual.lowMidi, highMidi: comfortTop ?? usual.highMidi };
  if (comfort.lowMidi > comfort.highMidi) {
    // One end was given beyond the other's default: the given end holds.
    if (comfortLow === null) comfort.lowMidi = low;
    else comfort.highMidi = high;
  }
  return { ok: true, voice: { range: { lowMidi: low, highMidi: high }, comfort } };
}

interface Ends {
  low: number;
  high: number;
  comfortLow: number | null;
  comfortTop: number | null;
}

function checkComfort({ low, high, comfortLow, comfortTop }: Ends, errors: ByHandErrors): void {
  const outside = (midi: number | null) => midi !== null && (midi < low || midi > high);
  const inside = `Comfort lies inside the range: ${noteWord(low)} to ${noteWord(high)}.`;
  if (outside(comfortLow)) errors.comfortLow = inside;
  if (outside(comfortTop)) errors.comfortTop = inside;
  if (comfortLow !== null && comfortTop !== null && comfortLow > comfortTop && !errors.comfortTop) {
    errors.comfortTop = `This must not be below ${noteWord(comfortLow)}.`;
  }
}

function noSuchNote(text: string): string {
  if (/^[a-gA-G][#b♯♭]{0,2}$/.test(text)) return `Which ${text}? Add the octave, such as ${text}3 or ${text}4.`;
  if (/^[hH]/.test(text)) return `There is no ${text} in this naming. Try B.`;
  return `There is no ${text}. Try a letter and an octave, such as A4 or B♭3.`;
}
