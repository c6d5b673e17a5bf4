/** How a song is counted. */
export interface Metre {
  /** as musicians write it: "6/8" */
  name: string;
  /** what is counted in a bar: quarters, or eighths where the lower figure is 8 */
  beats: number;
  /** length of a bar in quarter notes */
  quarters: number;
  /** beats that are stressed, from 0 */
  strong: readonly number[];
}

/** Songs are in four unless they say otherwise. */
const usual = 4;

/**
 * The metre of a song from the upper figure alone, which is all that a song keeps: 6, 9 and 12 are counted in eighths,
 * in groups of three; everything else in quarters.
 *
 * @param beatsPerBar 1 to 16; null where the song does not say
 * @returns the metre
 * @throws RangeError if the figure is no whole number from 1 to 16
 * @see common practice
 * @example metreOf(6) // => { name: "6/8", beats: 6, quarters: 3, strong: [0, 3] }
 */
export function metreOf(beatsPerBar: number | null): Metre {
  const beats = beatsPerBar ?? usual;
  if (!Number.isInteger(beats) || beats < 1 || beats > 16) throw new RangeError("a bar has 1 to 16 beats");
  const every = (step: number) => Array.from({ length: Math.ceil(beats / step) }, (_, k) => k * step);
  if (beats === 6 || beats === 9 || beats === 12) {
    return { name: `${beats}/8`, beats, quarters: beats / 2, strong: every(3) };
  }
  return { name: `${beats}/4`, beats, quarters: beats, strong: beats % 2 === 0 && beats > 2 ? every(2) : [0] };
}
