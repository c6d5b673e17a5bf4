import { fretName } from "../../instruments/frets";
import type { Instrument } from "../../instruments/instrument";
import { stringWords } from "../../instruments/stringWords";
import type { NeckPosition } from "./neckPositions";

/** What a neck map shows, beside its places. */
export interface NeckMapped {
  /** the chord as it is called over the map, with glyphs */
  name: string;
  capo: number;
  /** notes of the strings as tuned, with octaves and glyphs */
  stringNames: readonly string[];
  labels: "degrees" | "notes";
}

/**
 * A neck map in words, string by string from the bass side.
 *
 * @param positions what it shows
 * @param instrument for its frets and their names
 * @param mapped what else it shows
 * @returns sentences, such as "A on the whole neck. A string: 1 open, 5 at fret 7, 1 at fret 12. …"
 */
export function neckWords(
  positions: readonly NeckPosition[],
  instrument: Pick<Instrument, "frets" | "fretMap" | "strings">,
  { name, capo, stringNames, labels }: NeckMapped,
): string {
  const strings = instrument.strings.map((string, index) => {
    const places = positions
      .filter((position) => position.string === index)
      .map(({ fret, degree, note, root }) => {
        const tone = labels === "degrees" ? degree : `${note}${root ? ", the root," : ""}`;
        if (fret > 0) return `${tone} at fret ${fretName(instrument, capo + fret)}`;
        return capo > 0 && string.startsAtFret === undefined ? `${tone} at the capo` : `${tone} open`;
      });
    const short = string.startsAtFret === undefined ? "" : `, short, from fret ${string.startsAtFret + capo} on`;
    const called = stringWords(index, stringNames).replace(/,$/, "");
    return `${called}${short}: ${places.length > 0 ? places.join("; ") : "none of its tones"}.`;
  });
  const clamped = capo > 0 ? ` Capo at fret ${fretName(instrument, capo)}.` : "";
  return `${name} on the whole neck.${clamped} ${strings.map((words) => words[0]!.toUpperCase() + words.slice(1)).join(" ")}`;
}
