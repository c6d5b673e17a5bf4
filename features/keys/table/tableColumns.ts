/** How the key table is divided. */
export interface TableColumns {
  /** px, in the order of the columns */
  widths: readonly number[];
  total: number;
  /** width of the pictures */
  span: number;
  /** chords in a column of their own, over the best way, or nowhere */
  chords: "own" | "folded" | "none";
}

const widest = 1280;
const narrowestSpan = 180;

/**
 * Columns that fit into the room there is, so that none hides beyond an edge: on a roomy screen eight; on a narrower
 * one the chords move over the best way and the pictures take what is left.
 */
export function tableColumns(room: number, withWays: boolean): TableColumns {
  const roomy = room >= widest;
  const chords = withWays ? (roomy ? "own" : "folded") : "none";
  const lead = [28, 104, roomy ? 226 : 204];
  const rooms = roomy ? [56, 56] : [48, 48];
  const ways = { own: [160, 180], folded: [190], none: [] }[chords];
  const sum = [...lead, ...rooms, ...ways].reduce((total, width) => total + width, 0);
  const span = Math.max(narrowestSpan, Math.min(widest, room) - sum);
  return { widths: [...lead, span, ...rooms, ...ways], total: sum + span, span, chords };
}
