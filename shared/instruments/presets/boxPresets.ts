import type { Instrument } from "../instrument";
import { inchesToMm, strung } from "./stringing";

const box = { scaleMm: inchesToMm(25), frets: 20, capoTo: 9, leftHanded: false };

/**
 * Box guitars with three and four strings.
 *
 * Gauges stand where a maker's page prints them or where common practice picks the strings of a guitar set for them.
 *
 * @see makers' pages (G-D-G and its strings, A-E-A, E-B-E, D-A-D, G-B-D, G-B-E, D-G-D); common practice (the rest)
 */
export const boxPresets: readonly Instrument[] = [
  {
    id: "box-gdg",
    name: "Box guitar, G-D-G",
    strings: strung(
      ["G2", 0.042, "phosphor-bronze"],
      ["D3", 0.032, "phosphor-bronze"],
      ["G3", 0.025, "phosphor-bronze"],
    ),
    ...box,
  },
  {
    id: "box-aea",
    name: "Box guitar, A-E-A",
    strings: strung(["A2", null, "phosphor-bronze"], ["E3", null, "phosphor-bronze"], ["A3", null, "unknown"]),
    ...box,
  },
  {
    id: "box-ebe",
    name: "Box guitar, E-B-E",
    strings: strung(["E2", null, "phosphor-bronze"], ["B2", null, "phosphor-bronze"], ["E3", null, "phosphor-bronze"]),
    ...box,
  },
  {
    id: "box-dad",
    name: "Box guitar, D-A-D",
    strings: strung(["D3", null, "phosphor-bronze"], ["A3", null, "unknown"], ["D4", null, "plain-steel"]),
    ...box,
  },
  {
    id: "box-dgb",
    name: "Box guitar, D-G-B",
    strings: strung(["D3", 0.032, "phosphor-bronze"], ["G3", 0.024, "phosphor-bronze"], ["B3", 0.016, "plain-steel"]),
    ...box,
  },
  {
    id: "box-adf",
    name: "Box guitar, A-D-F♯",
    strings: strung(["A3", 0.018, "plain-steel"], ["D4", 0.014, "plain-steel"], ["F#4", 0.011, "plain-steel"]),
    ...box,
  },
  {
    id: "box-gbe",
    name: "Box guitar, G-B-E",
    strings: strung(["G3", 0.026, "phosphor-bronze"], ["B3", 0.017, "plain-steel"], ["E4", 0.013, "plain-steel"]),
    ...box,
  },
  {
    id: "box-gbd",
    name: "Box guitar, G-B-D",
    strings: strung(["G3", 0.026, "phosphor-bronze"], ["B3", 0.017, "plain-steel"], ["D4", 0.013, "plain-steel"]),
    ...box,
  },
  {
    id: "box-dgd",
    name: "Box guitar, D-G-D",
    strings: strung(["D3", 0.032, "phosphor-bronze"], ["G3", 0.024, "phosphor-bronze"], ["D4", 0.013, "plain-steel"]),
    ...box,
  },
  {
    id: "box-gdgb",
    name: "Box guitar, four strings, G-D-G-B",
    strings: strung(
      ["G2", 0.042, "phosphor-bronze"],
      ["D3", 0.032, "phosphor-bronze"],
      ["G3", 0.024, "phosphor-bronze"],
      ["B3", 0.016, "plain-steel"],
    ),
    ...box,
  },
  {
    id: "box-dgbd",
    name: "Box guitar, four strings, D-G-B-D",
    strings: strung(
      ["D3", 0.032, "phosphor-bronze"],
      ["G3", 0.024, "phosphor-bronze"],
      ["B3", 0.016, "plain-steel"],
      ["D4", 0.013, "plain-steel"],
    ),
    ...box,
  },
  {
    // So high an A is nothing for steel on a long neck: a short one, strung like a tenor ukulele.
    id: "box-gcea",
    name: "Box guitar, four strings, G-C-E-A",
    strings: strung(["G4", null, "nylon"], ["C4", null, "nylon"], ["E4", null, "nylon"], ["A4", null, "nylon"]),
    ...box,
    scaleMm: inchesToMm(17),
    frets: 15,
    capoTo: 5,
  },
];
