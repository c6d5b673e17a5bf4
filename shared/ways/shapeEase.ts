/** What makes a fingering easy or hard, apart from where on the neck it lies. */
export interface ShapeLoad {
  /** fingers in use; a barre is one */
  fingers: number;
  /** strings under the barre, 0 for none */
  barreStrings: number;
  /** fret of the barre, 0 for none */
  barreFret: number;
  /** true if another finger than the first lies across strings */
  laterBarre: boolean;
  /** lowest stopped fret, 0 if all is open */
  lowestFret: number;
  /** strings that ring open, or at the capo */
  openStrings: number;
  innerSilent: number;
  /** silent strings on the bass side and on the treble side */
  bassSilent: number;
  trebleSilent: number;
  /** strings stopped higher between two fingers at one fret */
  crossed: number;
  /** chord tones that do not sound */
  missing: number;
  /** true if another tone than the root lies lowest on an instrument with six strings or more */
  inverted: boolean;
}

/** Reach across frets that tires: the cost of this many mm is 1. */
const tiringReachMm = 90;

/**
 * How hard a fingering is: 0 for open strings alone, about 2 for the first open chords, 4 and more for full barres.
 *
 * @param load fingers, barre, silent strings
 * @param reachMm distance between the lowest and the highest stopped fret
 * @param capo fret of the capo, 0 for none: it makes the low frets softer to press
 * @returns cost, 0 or more; one scale for all instruments
 * @see common practice: open strings are free, a barre is hardest at the nut, muted inner strings cost more than outer ones
 */
export function shapeCost(load: ShapeLoad, reachMm: number, capo: number): number {
  const nearNut = (load.barreFret === 1 ? 0.1 : load.barreFret === 2 ? 0.05 : 0) * (capo > 0 ? 0.5 : 1);
  const barre =
    load.barreStrings === 0
      ? 0
      : 0.5 + 0.15 * (load.barreStrings - 2) + nearNut * load.barreStrings + (load.laterBarre ? 0.6 : 0);
  const height = 0.1 * Math.max(0, load.lowestFret - 1) + (load.openStrings > 0 && load.lowestFret > 4 ? 0.7 : 0);
  const silent = 0.9 * load.innerSilent + 0.2 * load.bassSilent + 0.5 * load.trebleSilent;
  const sound = 0.3 * load.missing + (load.inverted ? 0.8 : 0);
  return 0.35 * load.fingers + barre + (reachMm / tiringReachMm) ** 1.5 + height + 0.3 * load.crossed + silent + sound;
}

/**
 * Ease of a fingering from its cost.
 *
 * @param cost 0 or more
 * @returns 1 (open strings) down towards 0
 * @example easeOf(0) // => 1
 */
export function easeOf(cost: number): number {
  return 1 / (1 + cost / 3);
}
