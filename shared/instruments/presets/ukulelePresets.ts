import type { Instrument } from "../instrument";
import { inchesToMm, strung } from "./stringing";

const nylon = (...notes: readonly string[]) => strung(...notes.map((note) => [note, null, "nylon"] as const));

/**
 * Ukuleles in four sizes. Their strings' weights are printed nowhere per gauge, so semitone rules hold.
 *
 * @see makers' pages (scales, G-C-E-A, D-G-B-E); common practice (low G, the older A-D-F♯-B)
 */
export const ukulelePresets: readonly Instrument[] = [
  {
    id: "ukulele-soprano",
    name: "Soprano ukulele",
    strings: nylon("G4", "C4", "E4", "A4"),
    scaleMm: inchesToMm(13),
    frets: 12,
    capoTo: 5,
    leftHanded: false,
  },
  {
    id: "ukulele-soprano-adfb",
    name: "Soprano ukulele, A-D-F♯-B",
    strings: nylon("A4", "D4", "F#4", "B4"),
    scaleMm: inchesToMm(13),
    frets: 12,
    capoTo: 5,
    leftHanded: false,
  },
  {
    id: "ukulele",
    name: "Concert ukulele",
    strings: nylon("G4", "C4", "E4", "A4"),
    scaleMm: inchesToMm(15),
    frets: 15,
    capoTo: 5,
    leftHanded: false,
  },
  {
    id: "ukulele-tenor",
    name: "Tenor ukulele",
    strings: nylon("G4", "C4", "E4", "A4"),
    scaleMm: inchesToMm(17),
    frets: 18,
    capoTo: 7,
    leftHanded: false,
  },
  {
    id: "ukulele-tenor-low-g",
    name: "Tenor ukulele, low G",
    strings: strung(["G3", null, "unknown"], ["C4", null, "nylon"], ["E4", null, "nylon"], ["A4", null, "nylon"]),
    scaleMm: inchesToMm(17),
    frets: 18,
    capoTo: 7,
    leftHanded: false,
  },
  {
    id: "ukulele-baritone",
    name: "Baritone ukulele",
    strings: strung(["D3", null, "unknown"], ["G3", null, "unknown"], ["B3", null, "nylon"], ["E4", null, "nylon"]),
    scaleMm: inchesToMm(19),
    frets: 18,
    capoTo: 7,
    leftHanded: false,
  },
];
