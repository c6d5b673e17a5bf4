/** Which finger stops which string. */
export interface Fingering {
  /** finger 1-4 per string, 0 where none is needed */
  fingers: number[];
  barre: { fret: number; fromString: number; toString: number } | null;
  /** fingers in use; a barre is one */
  count: number;
}

/** One finger's work: one string, or several at the same fret. */
interface Unit {
  fret: number;
  strings: number[];
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
  const stopped: number[] = [];
  let lowest = Infinity;
  let open = false;
  for (let string = 0; string < frets.length; string++) {
    const fret = frets[string]!;
    if (fret === 0) open = true;
    if (fret === null || fret === 0) continue;
    stopped.push(string);
    if (fret < lowest) lowest = fret;
  }
  if (stopped.length === 0) return { fingers: frets.map(() => 0), barre: null, count: 0 };
  const index = stopped.filter((string) => frets[string] === lowest);
  const canBarre = index.length >= 2 && coveredAbove(frets, index, lowest);
  const singles = stopped.length <= 4;
  const wantsBarre = !open && (index.length >= 3 || (index.length === 2 && stopped.length >= 4));
  const barred = canBarre && (!singles || wantsBarre);
  const rest = stopped.filter((string) => frets[string] !== lowest);
  const units: Unit[] = [
    ...(barred ? [{ fret: lowest, strings: index }] : index.map((string) => ({ fret: lowest, strings: [string] }))),
    ...rest.map((string) => ({ fret: frets[string]!, strings: [string] })),
  ].sort((a, b) => a.fret - b.fret || a.strings[0]! - b.strings[0]!);
  const joined = joinRuns(units, frets, barred ? mostBarres - 1 : mostBarres);
  if (joined.length > 4) return null;
  return assign(joined, frets.length);
}

function assign(units: readonly Unit[], strings: number): Fingering {
  const fingers = Array.from({ length: strings }, () => 0);
  const lowest = units[0]!.fret;
  let finger = 0;
  units.forEach((unit, k) => {
    // A finger a fret, as far as the fingers still to come allow.
    const last = 4 - (units.length - 1 - k);
    finger = Math.max(finger + 1, Math.min(1 + unit.fret - lowest, last));
    for (const string of unit.strings) fingers[string] = finger;
  });
  const across = units.find((unit) => unit.strings.length > 1);
  const barre = across
    ? { fret: across.fret, fromString: across.strings[0]!, toString: across.strings[across.strings.length - 1]! }
    : null;
  return { fingers, barre, count: units.length };
}

/** Lays fingers across neighbouring strings of one fret, the widest first, until four suffice or no more may lie. */
function joinRuns(units: readonly Unit[], frets: readonly (number | null)[], barres: number): Unit[] {
  let joined = [...units];
  for (let left = barres; left > 0 && joined.length > 4; left--) {
    const widest = runs(joined, frets).sort((a, b) => b.strings.length - a.strings.length || b.fret - a.fret)[0];
    if (!widest) break;
    joined = [...joined.filter(({ strings }) => !widest.strings.includes(strings[0]!)), widest];
  }
  return joined.sort((a, b) => a.fret - b.fret || a.strings[0]! - b.strings[0]!);
}

/** Sets of two and more single-string units at one fret that one finger could stop. */
function runs(units: readonly Unit[], frets: readonly (number | null)[]): Unit[] {
  const found: Unit[] = [];
  for (const { fret, strings } of units) {
    const last = found[found.length - 1];
    if (strings.length > 1) continue;
    if (last?.fret === fret && coveredAbove(frets, [last.strings[0]!, strings[0]!], fret))
      last.strings.push(strings[0]!);
    else found.push({ fret, strings: [strings[0]!] });
  }
  return found.filter(({ strings }) => strings.length > 1);
}

/** Whether every string between the outer ones is stopped at this fret or higher, or silent. */
function coveredAbove(frets: readonly (number | null)[], strings: readonly number[], fret: number): boolean {
  for (let string = strings[0]!; string <= strings[strings.length - 1]!; string++) {
    const stopped = frets[string]!;
    if (stopped !== null && stopped < fret) return false;
  }
  return true;
}
