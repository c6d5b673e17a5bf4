import { glyphs, noteName, type Spelling } from "../music/pitch";
import { COARSE_WORDS } from "./keyReason";
import type { SharedSinger } from "./sharedSinger";
import { listWords } from "../music/listWords";
import { semitoneWords } from "../music/moveWords";

/**
 * Who has a key hardest, and by how much.
 *
 * @param singers how each fares in this key
 * @param spelling of notes in this key
 * @returns one plain sentence with glyphs; where only the span was known it says so after it
 */
export function sharedKeyReason(singers: readonly SharedSinger[], spelling: Spelling): string {
  const sentence = hardest(singers, spelling);
  return singers.some(({ key }) => key.coarse) ? `${sentence} ${COARSE_WORDS}` : sentence;
}

function hardest(singers: readonly SharedSinger[], spelling: Spelling): string {
  const worst = Math.min(...singers.map(({ score }) => score));
  const low = singers.filter(({ score }) => score === worst);
  const [first] = low;
  const same = low.every(
    ({ squeezed }) => squeezed.above === first!.squeezed.above && squeezed.below === first!.squeezed.below,
  );
  // Equally badly off for different reasons: the one whom the tune leaves furthest stands for both.
  const told = same ? first! : low.reduce((a, b) => (size(b) > size(a) ? b : a));
  const who = same ? namesOf(low) : told.name;
  const { outOfRange, squeezed } = told;
  if (told.beyond) return `${who} cannot sing all of it: ${sides(told, outOfRange, "range", spelling)}.`;
  if (size(told) > 0) return `${who} ${has(same, low)} it hardest: ${sides(told, squeezed, "band", spelling)}.`;
  if (singers.some((singer) => size(singer) > 0))
    return `${who} ${has(same, low)} it hardest, ${worst} of 100, though all of it is comfortable.`;
  return singers.length === 1
    ? `All of it sits in the comfort band of ${who}.`
    : "All of it sits in everyone's comfort band.";
}

function sides(
  { key }: SharedSinger,
  past: { above: number; below: number },
  limit: "range" | "band",
  spelling: Spelling,
): string {
  const note = (midi: number) => glyphs(noteName(midi, spelling));
  const parts = [
    ...(past.above > 0 ? [`${note(key.highMidi)} lies ${semitoneWords(past.above)} over the ${limit}`] : []),
    ...(past.below > 0 ? [`${note(key.lowMidi)} lies ${semitoneWords(past.below)} under it`] : []),
  ];
  return past.above > 0 ? parts.join(", ") : parts.join("").replace("under it", `under the ${limit}`);
}

function size({ squeezed }: SharedSinger): number {
  return squeezed.above + squeezed.below;
}

function has(same: boolean, low: readonly SharedSinger[]): string {
  return same && low.length > 1 ? "have" : "has";
}

function namesOf(singers: readonly SharedSinger[]): string {
  const names = [...new Set(singers.map(({ name }) => name))];
  return names.length > 3 ? `${names.length} singers` : listWords(names);
}
