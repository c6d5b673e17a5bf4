import type { Part } from "@/shared/contract/studio/assignment";
import { distanceWords } from "@/shared/music/moveWords";
import { glyphs } from "@/shared/music/pitch";

/** How a part is played: "box guitar: capo 3, shapes in A"; "" where nothing is set. */
export function playedWords({ instrument, way }: Pick<Part, "instrument" | "way">): string {
  const moves = way && [
    way.retune !== 0 && `retune ${distanceWords(way.retune)} ${way.retune < 0 ? "down" : "up"}`,
    way.capo > 0 && `capo ${way.capo}`,
    `shapes in ${glyphs(way.shapeKey)}`,
  ];
  const words = moves ? moves.filter(Boolean).join(", ") : "";
  if (!instrument) return words;
  return words === "" ? instrument.name : `${instrument.name}: ${words}`;
}
