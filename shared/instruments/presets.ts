import type { Instrument, InstrumentString, StringMaterial } from "./instrument";

const mmPerInch = 25.4;
const inches = (length: number) => Math.round(length * mmPerInch * 10) / 10;

type Strung = readonly [note: string, gaugeIn: number | null, material: StringMaterial];

function strung(...strings: Strung[]): InstrumentString[] {
  return strings.map(([note, gaugeIn, material]) => ({ note, gaugeIn, material }));
}

/** A light acoustic set, 12-16-24-32-42-53 in phosphor bronze, under any tuning of six strings. */
function lightAcoustic(notes: readonly [string, string, string, string, string, string]): InstrumentString[] {
  const gauges = [0.053, 0.042, 0.032, 0.024, 0.016, 0.012];
  return notes.map((note, k) => ({ note, gaugeIn: gauges[k]!, material: k < 4 ? "phosphor-bronze" : "plain-steel" }));
}

const box = { scaleMm: inches(25), frets: 20, capoTo: 9, leftHanded: false };
const sixString = { scaleMm: inches(25.5), frets: 20, capoTo: 9, leftHanded: false };

/**
 * Instruments in the tunings that the trade uses, strings from the bass side to the treble side.
 *
 * Gauges are given where a maker's chart or page prints them, or where (A-D-F♯) common practice picks them for about
 * even tension; elsewhere they are null and only semitone rules hold.
 *
 * @see D'Addario, string tension chart 13934 (scales, sets); makers' pages (box guitars, ukuleles); common practice (tunings)
 */
export const presets: readonly Instrument[] = [
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
    id: "box-adf",
    name: "Box guitar, A-D-F♯",
    strings: strung(["A3", 0.018, "plain-steel"], ["D4", 0.014, "plain-steel"], ["F#4", 0.011, "plain-steel"]),
    ...box,
  },
  {
    id: "box-gbd",
    name: "Box guitar, G-B-D",
    strings: strung(["G3", 0.026, "phosphor-bronze"], ["B3", 0.017, "plain-steel"], ["D4", 0.013, "plain-steel"]),
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
  { id: "guitar", name: "Guitar", strings: lightAcoustic(["E2", "A2", "D3", "G3", "B3", "E4"]), ...sixString },
  {
    id: "guitar-drop-d",
    name: "Guitar, drop D",
    strings: lightAcoustic(["D2", "A2", "D3", "G3", "B3", "E4"]),
    ...sixString,
  },
  {
    id: "guitar-dadgad",
    name: "Guitar, D-A-D-G-A-D",
    strings: lightAcoustic(["D2", "A2", "D3", "G3", "A3", "D4"]),
    ...sixString,
  },
  {
    id: "guitar-open-g",
    name: "Guitar, open G",
    strings: lightAcoustic(["D2", "G2", "D3", "G3", "B3", "D4"]),
    ...sixString,
  },
  {
    id: "guitar-open-d",
    name: "Guitar, open D",
    strings: lightAcoustic(["D2", "A2", "D3", "F#3", "A3", "D4"]),
    ...sixString,
  },
  {
    id: "ukulele",
    name: "Ukulele",
    strings: strung(["G4", null, "nylon"], ["C4", null, "nylon"], ["E4", null, "nylon"], ["A4", null, "nylon"]),
    scaleMm: inches(15),
    frets: 15,
    capoTo: 5,
    leftHanded: false,
  },
  {
    id: "ukulele-baritone",
    name: "Baritone ukulele",
    strings: strung(["D3", null, "unknown"], ["G3", null, "unknown"], ["B3", null, "nylon"], ["E4", null, "nylon"]),
    scaleMm: inches(19),
    frets: 18,
    capoTo: 7,
    leftHanded: false,
  },
  {
    id: "banjo",
    name: "Five-string banjo",
    strings: [
      { note: "G4", gaugeIn: 0.009, material: "plain-steel", scaleMm: inches(19.625), startsAtFret: 5 },
      ...strung(
        ["D3", 0.02, "nickel-wound"],
        ["G3", 0.013, "plain-steel"],
        ["B3", 0.011, "plain-steel"],
        ["D4", 0.009, "plain-steel"],
      ),
    ],
    scaleMm: inches(26.25),
    frets: 22,
    capoTo: 7,
    leftHanded: false,
  },
  {
    id: "mandolin",
    name: "Mandolin",
    strings: strung(
      ["G3", 0.039, "phosphor-bronze"],
      ["D4", 0.025, "phosphor-bronze"],
      ["A4", 0.015, "plain-steel"],
      ["E5", 0.011, "plain-steel"],
    ),
    scaleMm: inches(13.875),
    frets: 20,
    capoTo: 7,
    leftHanded: false,
  },
  {
    id: "dulcimer",
    name: "Mountain dulcimer, D-A-D",
    strings: strung(["D3", null, "unknown"], ["A3", null, "plain-steel"], ["D4", null, "plain-steel"]),
    scaleMm: inches(27),
    frets: 16,
    fretMap: [2, 4, 5, 7, 9, 10, 11, 12, 14, 16, 17, 19, 21, 22, 23, 24],
    capoTo: 0,
    leftHanded: false,
  },
];

/**
 * Finds a preset.
 *
 * @param id such as "box-adf"
 * @returns the instrument, or null if there is none of that id
 * @example findPreset("lute") // => null
 */
export function findPreset(id: string): Instrument | null {
  return presets.find((instrument) => instrument.id === id) ?? null;
}
