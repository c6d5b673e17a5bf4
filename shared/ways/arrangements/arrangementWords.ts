import { stringWords } from "../../instruments/stringWords";
import { glyphs } from "../../music/pitch";
import type { ArrangementKind, ArrangementProposal, ArrangementWeight } from "./arrangement";

const titles: Record<Exclude<ArrangementKind, "root" | "place" | "other">, string> = {
  plainest: "Plainest",
  closest: "Closest together",
  fullest: "Fullest sound",
  highest: "Up the neck",
  balanced: "Plain and near together",
};

/**
 * What a proposed arrangement is called: by all that it is best at, else by its roots or its place.
 *
 * @param proposal an arrangement
 * @param stringNames notes of the strings as tuned, ASCII with octaves
 * @returns such as "Plainest, closest together"
 */
export function arrangementTitle(
  { kinds, weight, id }: Pick<ArrangementProposal, "kinds" | "weight" | "id">,
  stringNames: readonly string[],
): string {
  const words = kinds.flatMap((kind) => (kind in titles ? [titles[kind as keyof typeof titles]] : []));
  const first = words[0];
  if (first !== undefined)
    return [first, ...words.slice(1).map((word) => word[0]!.toLowerCase() + word.slice(1))].join(", ");
  if (kinds[0] === "root" && weight.root) return `Roots on the ${called(weight.root.string, stringNames)}`;
  if (kinds[0] === "place") return `Around fret ${id.replace(/\D/g, "")}`;
  return "Another shape";
}

/**
 * Where on the neck an arrangement lies, and which string carries its roots.
 *
 * @param weight of the arrangement
 * @param stringNames notes of the strings as tuned, ASCII with octaves
 * @returns one or two short sentences: "Frets 2 to 7. Roots on the A string."
 */
export function placeWords({ frets, root }: ArrangementWeight, stringNames: readonly string[]): string {
  if (!frets) return "Nothing is played.";
  const place =
    frets.highest === 0
      ? "Open strings only."
      : frets.lowest === 0
        ? `Open strings to fret ${frets.highest}.`
        : frets.lowest === frets.highest
          ? `Fret ${frets.lowest} only.`
          : `Frets ${frets.lowest} to ${frets.highest}.`;
  if (!root) return `${place} Roots on several strings.`;
  return `${place} Roots ${root.always ? "" : "mostly "}on the ${called(root.string, stringNames)}.`;
}

function called(string: number, stringNames: readonly string[]): string {
  return stringWords(string, stringNames.map(glyphs)).replace(/,$/, "");
}
