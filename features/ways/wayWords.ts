import { glyphs } from "@/shared/music/pitch";
import { missingWords } from "@/shared/ways/missingShapes";
import type { Way } from "@/shared/ways/way";

type Moves = Pick<Way, "kind" | "retune" | "capo" | "shapeKey">;

/** What the button under the ways does. */
export function takeLabel({ retune, capo }: Moves): string {
  if (retune === 0) return capo === 0 ? "Use it as tuned" : `Use capo ${capo}`;
  return capo === 0 ? "Use this tuning" : `Use this tuning and capo ${capo}`;
}

/** The same where the key is not said beside it. */
export function takeLabelIn(sign: string, { retune, capo }: Moves): string {
  if (retune === 0) return capo === 0 ? `Use ${sign} as tuned` : `Use ${sign} with capo ${capo}`;
  return capo === 0 ? `Use ${sign} in this tuning` : `Use ${sign} in this tuning, capo ${capo}`;
}

/** A way in the few words that a table row has room for. */
export function shortWay({ retune, capo, shapeKey }: Omit<Moves, "kind">): string {
  const shapes = `shapes in ${glyphs(shapeKey)}`;
  const retuned = `${Math.abs(retune)} ${retune < 0 ? "down" : "up"}`;
  if (retune === 0) return capo === 0 ? `As tuned, ${shapes}` : `Capo ${capo}, ${shapes}`;
  return capo === 0 ? `Retuned ${retuned}, ${shapes}` : `Retuned ${retuned}, capo ${capo}, ${shapes}`;
}

/** How hard, in a word. */
export function difficultyWord(difficulty: number): string {
  if (difficulty < 0.34) return "easy";
  return difficulty < 0.67 ? "some work" : "hard";
}

/** What a way asks for, beneath its short form. */
export function shortCost(way: Pick<Way, "difficulty" | "retune" | "strings" | "chords">): string {
  const missing = missingWords(way.chords);
  if (missing !== null) return missing;
  const changed = way.strings.filter((string) => string.from !== string.to).length;
  const retuned = changed === 0 ? "nothing retuned" : `${changed} ${changed === 1 ? "string" : "strings"} retuned`;
  return `${difficultyWord(way.difficulty)}, ${retuned}`;
}

/** A way as a row of a table shows and weighs it. */
export function wayInRow(way: Way) {
  return {
    title: shortWay(way),
    cost: shortCost(way),
    capo: way.capo,
    barres: way.chords.filter(({ shape }) => shape !== null && shape.barre !== null).length,
    difficulty: way.difficulty,
  };
}

/** The way that was kept with a decision, among those found now. */
export function wayKept(ways: readonly Way[], kept: Pick<Way, "retune" | "capo" | "shapeKey"> | null): Way | null {
  if (kept === null) return null;
  return (
    ways.find((way) => way.retune === kept.retune && way.capo === kept.capo && way.shapeKey === kept.shapeKey) ?? null
  );
}
