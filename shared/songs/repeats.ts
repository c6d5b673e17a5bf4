/** The signs of one measure that send a player elsewhere. */
export interface MeasureSigns {
  repeatStart?: boolean;
  /** how often the passage is played in all, 2 unless the music says more */
  repeatEnd?: number;
  /** numbers of the ending that this measure belongs to, as far as it starts here */
  endingStart?: number[];
  endingEnd?: boolean;
  segno?: boolean;
  coda?: boolean;
  toCoda?: boolean;
  fine?: boolean;
  jump?: "da capo" | "dal segno";
}

const mostMeasures = 50_000;

/**
 * The order in which measures are played: repeats and numbered endings unrolled, da capo, dal segno, coda and fine
 * followed (after such a jump repeats are not taken again).
 *
 * @param signs the signs of each measure, in written order
 * @returns indices of the measures in playing order, or null if the music would go on beyond 50,000 measures
 * @see common practice
 * @example playingOrder([{}, { repeatEnd: 2 }, {}]) // => [0, 1, 0, 1, 2]
 */
export function playingOrder(signs: readonly MeasureSigns[]): number[] | null {
  const endings = endingsByMeasure(signs);
  const order: number[] = [];
  let start = 0;
  let pass = 1;
  let jumped = false;
  let index = 0;
  while (index < signs.length) {
    if (order.length >= mostMeasures) return null;
    const sign = signs[index]!;
    if (sign.repeatStart && index !== start) [start, pass] = [index, 1];
    const numbers = endings[index];
    if (numbers && !numbers.includes(jumped ? Math.max(...lastEnding(endings, index)) : pass)) {
      index += 1;
      continue;
    }
    order.push(index);
    if (jumped && sign.fine) break;
    if (jumped && sign.toCoda) {
      const coda = signs.findIndex((each, at) => at > index && each.coda);
      if (coda >= 0) {
        index = coda;
        continue;
      }
    }
    if (sign.repeatEnd && !jumped) {
      if (pass < times(signs, endings, index)) {
        pass += 1;
        index = start;
        continue;
      }
      [start, pass] = [index + 1, 1];
    } else if (numbers && sign.endingEnd && !jumped) [start, pass] = [index + 1, 1];
    if (sign.jump && !jumped) {
      jumped = true;
      const segno = signs.findIndex((each) => each.segno);
      index = sign.jump === "dal segno" && segno >= 0 ? segno : 0;
      continue;
    }
    index += 1;
  }
  return order;
}

function endingsByMeasure(signs: readonly MeasureSigns[]): (number[] | null)[] {
  let open: number[] | null = null;
  return signs.map((sign) => {
    if (sign.endingStart) open = sign.endingStart;
    const current = open;
    if (sign.endingEnd) open = null;
    return current;
  });
}

/** Numbers of the last of a row of endings that follow each other. */
function lastEnding(endings: readonly (number[] | null)[], from: number): number[] {
  let last = endings[from] ?? [];
  for (let index = from; endings[index]; index += 1) last = endings[index]!;
  return last;
}

/** How often a passage is played: as often as its endings have numbers, counted from the one that repeats. */
function times(signs: readonly MeasureSigns[], endings: readonly (number[] | null)[], index: number): number {
  let most = signs[index]!.repeatEnd ?? 2;
  for (let at = index; endings[at]; at += 1) most = Math.max(most, ...endings[at]!);
  return most;
}
