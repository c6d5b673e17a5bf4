import { fretName } from "@/shared/instruments/frets";
import type { Instrument } from "@/shared/instruments/instrument";
import { glyphs } from "@/shared/music/pitch";

/** The picture of a neck for those who do not see it. */
export function neckWords(instrument: Omit<Instrument, "id">): string {
  const { strings, frets, fretMap, leftHanded } = instrument;
  const each = strings.map(({ note, startsAtFret, inCourse }) => {
    const course = inCourse ? `, ${inCourse} together` : "";
    const short = startsAtFret ? `, short from fret ${fretName(instrument, startsAtFret)}` : "";
    return `${glyphs(note)}${course}${short}`;
  });
  const board = fretMap
    ? `${frets} frets of a fret map, the last called ${fretName(instrument, frets)}`
    : `${frets} frets, a semitone each`;
  return `Neck${leftHanded ? ", left-handed" : ""}. Strings from the bass side: ${each.join("; ")}. ${board}.`;
}
