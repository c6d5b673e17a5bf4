import { fretPosition, fretSemitones } from "@/shared/instruments/frets";
import type { Instrument } from "@/shared/instruments/instrument";

/** A neck on its side, the bass side at the foot, as its player sees it. px. */
export interface NeckLayout {
  width: number;
  height: number;
  /** upper and lower string */
  top: number;
  foot: number;
  /** where a fret's wire stands, counted from the nut */
  wire: (fret: number) => number;
  /** middle of the space in which a finger stops a fret; of 0, the place of open strings */
  space: (fret: number) => number;
  y: (string: number) => number;
  /** names of strings stand here */
  nameX: number;
}

/** Room for the strings' names and their open rings. */
const before = 62;
const after = 10;
/** Every fret has so much room, and its share of the scale beside it: true frets would be too narrow up the neck. */
const everyFret = 17;
const scaleShare = 380;
const stringGap = 30;
/** Radius of a place; the chosen shape's stand out. */
export const placeRadius = 10.5;

/** Lays out a neck; left-handed ones are mirrored. */
export function neckLayout(instrument: Instrument, stretch: number): NeckLayout {
  const { frets, strings, leftHanded } = instrument;
  const along = (fret: number) => {
    const semitones = fretSemitones(instrument, fret) ?? fret;
    return (everyFret * fret + scaleShare * fretPosition(1, semitones)) * stretch;
  };
  const width = before + along(frets) + after;
  const mirrored = (x: number) => (leftHanded ? width - x : x);
  const top = 18;
  const foot = top + (strings.length - 1) * stringGap;
  return {
    width,
    height: foot + 44,
    top,
    foot,
    wire: (fret) => mirrored(before + along(fret)),
    space: (fret) => mirrored(fret === 0 ? before - 16 : before + (along(fret - 1) + along(fret)) / 2),
    y: (string) => foot - string * stringGap,
    nameX: mirrored(before - 34),
  };
}

/** Where a place lies that is counted from nut or capo; a short string's open note lies where the string begins. */
export function placeX(
  { space, wire }: NeckLayout,
  { fret, string }: { fret: number; string: number },
  { strings, leftHanded }: Instrument,
  capo: number,
): number {
  const begins = strings[string]?.startsAtFret;
  if (begins === undefined || fret > 0) return space(fret + capo);
  return capo > 0 ? space(begins + capo) : wire(begins) + (leftHanded ? 16 : -16);
}
