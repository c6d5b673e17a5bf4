import type { KeyRow } from "../../keyRows";
import { sameKey } from "../../sameKey";

/** A key's place and score before and after evidence. */
export interface RankMove {
  row: KeyRow;
  /** from 1 */
  place: number;
  placeBefore: number;
  scoreBefore: number;
}

/** The keys as they stand now, each with where it stood before. A key may have found a better octave meanwhile. */
export function rankMoves(before: readonly KeyRow[], after: readonly KeyRow[]): RankMove[] {
  return after.map((row, k) => {
    const was = before.findIndex((each) => each.key.tonic === row.key.tonic);
    return { row, place: k + 1, placeBefore: was < 0 ? k + 1 : was + 1, scoreBefore: before[was]?.score ?? row.score };
  });
}

const ordinals = ["first", "second", "third", "fourth", "fifth", "sixth", "seventh", "eighth", "ninth", "tenth"];

function placeWord(place: number): string {
  return ordinals[place - 1] ?? (place === 11 ? "eleventh" : "twelfth");
}

/** "A went from first, 92, to third, 78." */
export function moveSentence({ row, place, placeBefore, scoreBefore }: RankMove): string {
  const was = `${placeWord(placeBefore)}, ${scoreBefore}`;
  if (place === placeBefore && scoreBefore === row.score) return `${row.sign} stays ${was}.`;
  if (place === placeBefore)
    return `${row.sign} stays ${placeWord(place)}; its score went from ${scoreBefore} to ${row.score}.`;
  return `${row.sign} went from ${was}, to ${placeWord(place)}, ${row.score}.`;
}

/** What moved, largest first: the tried key, the new first one where it changed, and how many others. */
export function whatMoved(moves: readonly RankMove[], shift: number): string[] {
  const tried = moves.find(({ row }) => sameKey(row.shift, shift));
  const first = moves[0];
  const newFirst = first && first.placeBefore !== 1 && first !== tried ? [first] : [];
  const others = moves.filter(
    (each) => each !== tried && !newFirst.includes(each) && each.scoreBefore !== each.row.score,
  );
  const names = others.slice(0, 3).map(({ row }) => row.sign);
  const more = others.length > names.length ? ` and ${others.length - names.length} more` : "";
  return [
    ...(tried ? [moveSentence(tried)] : []),
    ...newFirst.map(moveSentence),
    ...(others.length > 0 ? [`Scores of ${names.join(", ")}${more} changed with it.`] : []),
  ];
}
