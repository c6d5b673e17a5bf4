import type { Instrument, InstrumentString } from "../instrument";
import { inchesToMm, strung } from "./stringing";

type SixNotes = readonly [string, string, string, string, string, string];

const gauges = [0.053, 0.042, 0.032, 0.024, 0.016, 0.012];
const packet: SixNotes = ["E2", "A2", "D3", "G3", "B3", "E4"];

/** A light acoustic set, 12-16-24-32-42-53 in phosphor bronze, under any tuning; made for standard tuning. */
function lightAcoustic(notes: SixNotes): InstrumentString[] {
  return strung(
    ...notes.map((note, k) => [note, gauges[k]!, k < 4 ? "phosphor-bronze" : "plain-steel", packet[k]!] as const),
  );
}

const sixString = { scaleMm: inchesToMm(25.5), frets: 20, capoTo: 9, leftHanded: false };
const six = (id: string, name: string, notes: SixNotes): Instrument => {
  return { id, name, strings: lightAcoustic(notes), ...sixString };
};

/**
 * Six-string guitars in standard and in the common other tunings, and the baritone.
 *
 * @see D'Addario, string tension chart 13934 (scale, set); common practice (tunings)
 */
export const guitarPresets: readonly Instrument[] = [
  six("guitar", "Guitar", packet),
  six("guitar-half-down", "Guitar, half a step down", ["Eb2", "Ab2", "Db3", "Gb3", "Bb3", "Eb4"]),
  six("guitar-whole-down", "Guitar, a whole step down", ["D2", "G2", "C3", "F3", "A3", "D4"]),
  six("guitar-drop-d", "Guitar, drop D", ["D2", "A2", "D3", "G3", "B3", "E4"]),
  six("guitar-dadgad", "Guitar, D-A-D-G-A-D", ["D2", "A2", "D3", "G3", "A3", "D4"]),
  six("guitar-open-g", "Guitar, open G", ["D2", "G2", "D3", "G3", "B3", "D4"]),
  six("guitar-open-d", "Guitar, open D", ["D2", "A2", "D3", "F#3", "A3", "D4"]),
  six("guitar-open-e", "Guitar, open E", ["E2", "B2", "E3", "G#3", "B3", "E4"]),
  six("guitar-open-a", "Guitar, open A", ["E2", "A2", "E3", "A3", "C#4", "E4"]),
  {
    id: "guitar-baritone",
    name: "Baritone guitar",
    strings: strung(
      ["B1", null, "nickel-wound"],
      ["E2", null, "nickel-wound"],
      ["A2", null, "nickel-wound"],
      ["D3", null, "nickel-wound"],
      ["F#3", null, "unknown"],
      ["B3", null, "plain-steel"],
    ),
    ...sixString,
    scaleMm: inchesToMm(27),
  },
];
