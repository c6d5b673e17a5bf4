import { fretName } from "@/shared/instruments/frets";
import type { Instrument } from "@/shared/instruments/instrument";
import { soundAt } from "@/shared/instruments/soundAt";
import { glyphs } from "@/shared/music/pitch";

/** A place on the neck. */
export interface NeckPlace {
  midi: number;
  /** what players call the fret */
  fret: string;
}

/**
 * What sounds on each string at each fret of a window; index 0 of a string is its open note. null where a short string
 * has no such fret, or the neck ends.
 */
export function neckPlaces(
  instrument: Pick<Instrument, "strings" | "frets" | "fretMap">,
  first: number,
  count: number,
): (NeckPlace | null)[][] {
  return instrument.strings.map((_, string) => {
    const at = (fret: number): NeckPlace | null => {
      const midi = soundAt(instrument, string, fret);
      return midi === null ? null : { midi, fret: fretName(instrument, fret) };
    };
    return [at(0), ...Array.from({ length: count }, (_none, k) => at(first + k))];
  });
}

/** "String A3, open", "String A3, fret 2". */
export function placeWords(stringNote: string, place: NeckPlace): string {
  return `String ${glyphs(stringNote)}, ${place.fret === "0" ? "open" : `fret ${place.fret}`}`;
}
