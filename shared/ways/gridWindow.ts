import type { Shape } from "./way";

/** Which frets a chord grid shows. */
export interface GridWindow {
  /** fret of the first row; 1 at the nut or capo */
  first: number;
  rows: number;
}

/**
 * Four frets from the nut where the shape fits there, else from its lowest stopped fret; more rows where it needs them.
 *
 * @param shape a fingering, frets counted from the nut or capo
 * @returns the first fret and the number of rows
 * @example gridWindow({ frets: [5, 7, null] }) // => { first: 5, rows: 4 }
 */
export function gridWindow(shape: Pick<Shape, "frets">): GridWindow {
  const stopped = shape.frets.filter((fret): fret is number => fret !== null && fret > 0);
  if (stopped.length === 0) return { first: 1, rows: 4 };
  const low = Math.min(...stopped);
  const high = Math.max(...stopped);
  if (high <= 4 || low === 1) return { first: 1, rows: Math.max(4, high) };
  return { first: low, rows: Math.max(4, high - low + 1) };
}
