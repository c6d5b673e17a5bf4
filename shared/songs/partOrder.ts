import { glyphs } from "../music/pitch";
import { chartParts } from "./chartParts";

const often = ["", "", " twice"];

/**
 * The parts of a song in the order in which they are played, as one sentence.
 *
 * @param chart chords over words
 * @returns "" where the chart has fewer than two parts with a name, because there is no order to keep in mind
 * @example partOrder("Verse 1\nG\nLow tide\n\nChorus x2\nC\nStill") // => "Verse 1, chorus twice."
 */
export function partOrder(chart: string): string {
  const named = chartParts(chart).flatMap(({ name, times }) =>
    name === null ? [] : [`${glyphs(name)}${often[times] ?? ` ${times} times`}`],
  );
  if (named.length < 2) return "";
  const [first = "", ...others] = named;
  return `${[first, ...others.map((name) => name.charAt(0).toLowerCase() + name.slice(1))].join(", ")}.`;
}
