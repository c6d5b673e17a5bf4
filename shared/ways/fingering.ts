/** Which finger stops which string. */
export interface Fingering {
  /** finger 1-4 per string, 0 where none is needed */
  fingers: number[];
  barre: { fret: number; fromString: number; toString: number } | null;
  /** fingers in use; a barre is one */
  count: number;
}

/**
 * Finds fingers for a set of stopped strings: lower frets lower fingers, at one fret from the bass side on. One finger
 * may lie across several strings (a barre) where every string between is stopped there or higher.
 *
 * @param frets per string: null = silent, 0 = open, else the fret
 * @param mostBarres how many fingers may lie across strings, where four single ones do not suffice
 * @returns the fingering, or null if four fingers cannot do it
 * @example fingering([2, 2, 2], 1).fingers // => [1, 1, 1]
 * @example fingering([null, 3, 2, 0, 1, 0], 1).fingers // => [0, 3, 2, 0, 1, 0]
 */
export function fingering(frets: readonly (number | null)[], mostBarres: number): Fingering | null {
  const hand = placeHand(frets, mostBarres);
  if (!hand) return null;
  const { count, barreFrom } = hand;
  const barre = barreFrom < 0 ? null : { fret: frets[barreFrom]!, fromString: barreFrom, toString: hand.barreTo };
  return { fingers: Array.from(hand.fingers.subarray(0, frets.length)), barre, count };
}

const mostStrings = 32;

/** A hand on the neck. One object serves every search: read it before the next call. */
export interface PlacedHand {
  fingers: Int8Array;
  count: number;
  /** outer strings of the barre, -1 for none */
  barreFrom: number;
  barreTo: number;
}

const hand: PlacedHand = { fingers: new Int8Array(mostStrings), count: 0, barreFrom: -1, barreTo: -1 };
/** One finger's work each: the fret, the strings as bits, the lowest and the highest of them. */
const units = {
  fret: new Int16Array(mostStrings),
  strings: new Int32Array(mostStrings),
  from: new Int8Array(mostStrings),
  to: new Int8Array(mostStrings),
};

/**
 * The same as {@link fingering} without making anything anew, for searches.
 *
 * @param frets per string: null = silent, 0 = open, else the fret; at most 32 strings
 * @param mostBarres how many fingers may lie across strings
 * @returns the hand, overwritten by the next call; null if four fingers cannot do it
 */
export function placeHand(frets: readonly (number | null)[], mostBarres: number): PlacedHand | null {
  hand.count = 0;
  hand.barreFrom = hand.barreTo = -1;
  let stopped = 0;
  let lowest = 99;
  let highest = 0;
  let open = false;
  for (let string = 0; string < frets.length; string++) {
    const fret = frets[string]!;
    hand.fingers[string] = 0;
    if (fret === 0) open = true;
    if (fret === null || fret === 0) continue;
    stopped++;
    if (fret < lowest) lowest = fret;
    if (fret > highest) highest = fret;
  }
  if (stopped === 0) return hand;
  const barred = layBarre(frets, lowest, stopped, open);
  let count = unitsOf(frets, lowest, highest, barred);
  for (let left = barred ? mostBarres - 1 : mostBarres; left > 0 && count > 4; left--) {
    const joined = joinWidest(frets, count);
    if (joined === count) break;
    count = joined;
  }
  if (count > 4) return null;
  assign(count, lowest);
  return hand;
}

/** Whether the first finger lies across the strings at the lowest fret. */
function layBarre(frets: readonly (number | null)[], lowest: number, stopped: number, open: boolean): boolean {
  let from = -1;
  let to = -1;
  let at = 0;
  for (let string = 0; string < frets.length; string++) {
    if (frets[string] !== lowest) continue;
    if (from < 0) from = string;
    to = string;
    at++;
  }
  const wanted = stopped > 4 || (!open && (at >= 3 || (at === 2 && stopped >= 4)));
  return wanted && at >= 2 && coveredAbove(frets, from, to, lowest);
}

/** Fills the units, by fret and then from the bass side on; tells how many there are. */
function unitsOf(frets: readonly (number | null)[], lowest: number, highest: number, barred: boolean): number {
  let count = 0;
  for (let fret = lowest; fret <= highest; fret++) {
    const across = barred && fret === lowest;
    let first = true;
    for (let string = 0; string < frets.length; string++) {
      if (frets[string] !== fret) continue;
      if (across && !first) {
        units.strings[count - 1]! |= 1 << string;
        units.to[count - 1] = string;
        continue;
      }
      first = false;
      units.fret[count] = fret;
      units.strings[count] = 1 << string;
      units.from[count] = units.to[count] = string;
      count++;
    }
  }
  return count;
}

/** Lays one finger across the most neighbouring strings of one fret that it can; tells how many units are left. */
function joinWidest(frets: readonly (number | null)[], count: number): number {
  let at = -1;
  let width = 1;
  for (let k = 0; k < count; k++) {
    if (units.from[k] !== units.to[k]) continue;
    let last = k;
    while (last + 1 < count && joins(frets, k, last + 1)) last++;
    const wide = last - k + 1;
    if (wide > 1 && (wide > width || (wide === width && units.fret[k]! > units.fret[at]!))) {
      at = k;
      width = wide;
    }
    k = last;
  }
  if (at < 0) return count;
  for (let k = at + 1; k < at + width; k++) units.strings[at]! |= units.strings[k]!;
  units.to[at] = units.to[at + width - 1]!;
  for (let k = at + width; k < count; k++) {
    units.fret[k - width + 1] = units.fret[k]!;
    units.strings[k - width + 1] = units.strings[k]!;
    units.from[k - width + 1] = units.from[k]!;
    units.to[k - width + 1] = units.to[k]!;
  }
  return count - width + 1;
}

function joins(frets: readonly (number | null)[], first: number, next: number): boolean {
  return (
    units.from[next] === units.to[next] &&
    units.fret[next] === units.fret[first] &&
    coveredAbove(frets, units.from[first]!, units.from[next]!, units.fret[first]!)
  );
}

function assign(count: number, lowest: number): void {
  let finger = 0;
  for (let k = 0; k < count; k++) {
    // A finger a fret, as far as the fingers still to come allow.
    const last = 4 - (count - 1 - k);
    finger = Math.max(finger + 1, Math.min(1 + units.fret[k]! - lowest, last));
    for (let string = units.from[k]!; string <= units.to[k]!; string++)
      if ((units.strings[k]! >> string) & 1) hand.fingers[string] = finger;
    if (hand.barreFrom >= 0 || units.from[k] === units.to[k]) continue;
    hand.barreFrom = units.from[k]!;
    hand.barreTo = units.to[k]!;
  }
  hand.count = count;
}

/** Whether every string between two is stopped at this fret or higher, or silent. */
function coveredAbove(frets: readonly (number | null)[], from: number, to: number, fret: number): boolean {
  for (let string = from; string <= to; string++) {
    const stopped = frets[string]!;
    if (stopped !== null && stopped < fret) return false;
  }
  return true;
}
