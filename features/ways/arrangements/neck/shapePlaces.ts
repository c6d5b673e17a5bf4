import type { Shape } from "@/shared/ways/way";

/** A part of the neck, counted from nut or capo. */
export type Place = "all" | "open" | "low" | "middle" | "high";

export const placeNames: Record<Place, string> = {
  all: "All",
  open: "With open strings",
  low: "Frets 1 to 4",
  middle: "Frets 5 to 8",
  high: "Fret 9 and up",
};

function partOf({ frets }: Pick<Shape, "frets">): Exclude<Place, "all" | "open"> | null {
  const stopped = frets.filter((fret): fret is number => fret !== null && fret > 0);
  if (stopped.length === 0) return null;
  const lowest = Math.min(...stopped);
  return lowest < 5 ? "low" : lowest < 9 ? "middle" : "high";
}

/** The shapes of one part of the neck. */
export function shapesAt(shapes: readonly Shape[], place: Place): readonly Shape[] {
  if (place === "all") return shapes;
  if (place === "open") return shapes.filter(({ frets }) => frets.includes(0));
  return shapes.filter((shape) => partOf(shape) === place);
}

/** The parts of the neck that have shapes, all of it first. */
export function placesOf(shapes: readonly Shape[]): Place[] {
  return (Object.keys(placeNames) as Place[]).filter((place) => shapesAt(shapes, place).length > 0);
}
