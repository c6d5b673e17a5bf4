import { diatonicFrets } from "../frets";
import type { Instrument } from "../instrument";
import { inchesToMm, inPairs, strung } from "./stringing";

const dulcimerFrets = diatonicFrets(16, true);
const dulcimer = {
  scaleMm: inchesToMm(27),
  frets: dulcimerFrets.length,
  fretMap: dulcimerFrets,
  capoTo: 0,
  leftHanded: false,
};

/**
 * The five-string banjo with its short string.
 *
 * @see D'Addario, string tension chart 13934 (scales of both kinds of string, set)
 */
export const banjoPresets: readonly Instrument[] = [
  {
    id: "banjo",
    name: "Five-string banjo",
    strings: [
      { note: "G4", gaugeIn: 0.009, material: "plain-steel", scaleMm: inchesToMm(19.625), startsAtFret: 5 },
      ...strung(
        ["D3", 0.02, "nickel-wound"],
        ["G3", 0.013, "plain-steel"],
        ["B3", 0.011, "plain-steel"],
        ["D4", 0.009, "plain-steel"],
      ),
    ],
    scaleMm: inchesToMm(26.25),
    frets: 22,
    capoTo: 7,
    leftHanded: false,
  },
];

/**
 * The mandolin's family, strung in pairs.
 *
 * @see D'Addario, string tension chart 13934 (scales, mandolin set); common practice (octave mandolin)
 */
export const mandolinPresets: readonly Instrument[] = [
  {
    id: "mandolin",
    name: "Mandolin",
    strings: inPairs(
      strung(
        ["G3", 0.039, "phosphor-bronze"],
        ["D4", 0.025, "phosphor-bronze"],
        ["A4", 0.015, "plain-steel"],
        ["E5", 0.011, "plain-steel"],
      ),
    ),
    scaleMm: inchesToMm(13.875),
    frets: 20,
    capoTo: 7,
    leftHanded: false,
  },
  {
    id: "mandola",
    name: "Mandola",
    strings: inPairs(
      strung(
        ["C3", null, "phosphor-bronze"],
        ["G3", null, "phosphor-bronze"],
        ["D4", null, "unknown"],
        ["A4", null, "plain-steel"],
      ),
    ),
    scaleMm: inchesToMm(15.875),
    frets: 20,
    capoTo: 7,
    leftHanded: false,
  },
  {
    id: "octave-mandolin",
    name: "Octave mandolin",
    strings: inPairs(
      strung(
        ["G2", null, "phosphor-bronze"],
        ["D3", null, "phosphor-bronze"],
        ["A3", null, "unknown"],
        ["E4", null, "plain-steel"],
      ),
    ),
    scaleMm: inchesToMm(21),
    frets: 19,
    capoTo: 7,
    leftHanded: false,
  },
  {
    id: "mandocello",
    name: "Mandocello",
    strings: inPairs(
      strung(
        ["C2", null, "phosphor-bronze"],
        ["G2", null, "phosphor-bronze"],
        ["D3", null, "phosphor-bronze"],
        ["A3", null, "unknown"],
      ),
    ),
    scaleMm: inchesToMm(25),
    frets: 20,
    capoTo: 7,
    leftHanded: false,
  },
];

/**
 * Mountain dulcimers: frets of the scale, with the 6½.
 *
 * @see common practice (D-A-D, D-A-A, diatonic frets)
 */
export const dulcimerPresets: readonly Instrument[] = [
  {
    id: "dulcimer",
    name: "Mountain dulcimer, D-A-D",
    strings: strung(["D3", null, "unknown"], ["A3", null, "plain-steel"], ["D4", null, "plain-steel"]),
    ...dulcimer,
  },
  {
    id: "dulcimer-daa",
    name: "Mountain dulcimer, D-A-A",
    strings: strung(["D3", null, "unknown"], ["A3", null, "plain-steel"], ["A3", null, "plain-steel"]),
    ...dulcimer,
  },
];
