import type { Instrument } from "../../instruments/instrument";
import type { Shape, WayChord } from "../way";

/** A chord of the song with the very shape it is played with. */
export type ArrangedChord = Pick<WayChord, "written" | "sounding" | "played" | "shape">;

/** What an arrangement is good at; `root`, `place` and `other` stand for more of the same kind. */
export type ArrangementKind = "plainest" | "closest" | "fullest" | "highest" | "balanced" | "root" | "place" | "other";

/** What an arrangement asks of the hand, and where it lies. */
export interface ArrangementWeight {
  /** how far the hand travels along the neck, the song through, mm */
  travelMm: number;
  /** ease of its shapes as often as they come, 0 (hardest) to 1 */
  ease: number;
  /** strings that sound, on average */
  strings: number;
  /** frets from nut or capo, 0 = open; null where nothing is played */
  frets: { lowest: number; highest: number } | null;
  /** the string that carries the lowest root, in all chords or in most; null where no string does */
  root: { string: number; always: boolean } | null;
}

/** One way of playing a song's chords in one key. */
export interface ArrangementProposal {
  /** the same for the same question: "closest", "root-2", "place-7" */
  id: string;
  /** everything it is best at; the first names it */
  kinds: ArrangementKind[];
  chords: ArrangedChord[];
  weight: ArrangementWeight;
}

/** A way's chords, and on what they are played. */
export interface ArrangementQuestion {
  chords: readonly ArrangedChord[];
  /** the chords as they are played, as written, with repeats; each once where it is not told */
  sequence?: readonly string[];
  instrument: Instrument;
  /** fret of the capo, 0 for none */
  capo: number;
}

/**
 * A name for all shapes of an arrangement: those with the same one are the same.
 *
 * @param chords of an arrangement
 * @returns such as "5 7 7,x 0 2"
 */
export function arrangementMark(chords: readonly { shape: Pick<Shape, "frets"> | null }[]): string {
  return chords.map(({ shape }) => (shape ? shape.frets.map((fret) => fret ?? "x").join(" ") : "none")).join(",");
}
