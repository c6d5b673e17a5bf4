import type { ChartRow } from "./chartRows";

/** A row with its place on a page: px from the top of the room that the page has for rows. */
export interface PlacedRow {
  row: ChartRow;
  top: number;
  height: number;
}

/** A part begins on the next page rather than leave less than this share of it here. */
const worthKeeping = 0.35;

/**
 * Lays rows on pages. Chords and their words are one row and are never parted; a heading goes with the first row under
 * it; a part that fits on one page is kept whole where that leaves only the foot of a page empty; no page begins or ends
 * with a blank row.
 *
 * @param rows of a chart
 * @param heightOf height of a row, px, > 0
 * @param roomOn room for rows on a page, counted from 0, px; a row or a heading with its row that is higher than the page
 *   stands on a page of its own all the same
 * @returns rows of each page; at least one page
 */
export function rowPages(
  rows: readonly ChartRow[],
  heightOf: (row: ChartRow) => number,
  roomOn: (page: number) => number,
): PlacedRow[][] {
  const pages: PlacedRow[][] = [[]];
  let top = 0;
  const page = () => pages.at(-1)!;
  const turn = () => {
    while (page().at(-1)?.row.kind === "blank") page().pop();
    pages.push([]);
    top = 0;
  };
  for (let k = 0; k < rows.length;) {
    const block = blockAt(rows, k);
    const height = total(block, heightOf);
    const room = roomOn(pages.length - 1);
    if (block[0]!.kind === "blank") {
      if (page().length > 0) place(block[0]!);
    } else {
      const part = partHeight(rows, k, heightOf);
      const wholeOnNext = part > room - top && part <= roomOn(pages.length) && room - top < worthKeeping * room;
      if (page().length > 0 && (top + height > room + 1e-6 || wholeOnNext)) turn();
      block.forEach(place);
    }
    k += block.length;
  }
  while (page().at(-1)?.row.kind === "blank") page().pop();
  return pages;

  function place(row: ChartRow): void {
    const height = heightOf(row);
    page().push({ row, top, height });
    top += height;
  }
}

/** Headings, what is blank under them, and the row that they head; or one row. */
function blockAt(rows: readonly ChartRow[], from: number): ChartRow[] {
  if (rows[from]!.kind !== "heading") return [rows[from]!];
  let end = from;
  while (end < rows.length && (rows[end]!.kind === "heading" || rows[end]!.kind === "blank")) {
    // A heading with nothing under it stands for itself.
    if (rows[end]!.kind === "blank" && rows[end + 1]?.part !== rows[from]!.part) break;
    if (rows[end]!.part !== rows[from]!.part) break;
    end += 1;
  }
  const head = rows[end];
  return rows.slice(from, head && head.part === rows[from]!.part && head.kind !== "blank" ? end + 1 : end);
}

/** Height of the rest of a part where it begins here; 0 in its midst. */
function partHeight(rows: readonly ChartRow[], from: number, heightOf: (row: ChartRow) => number): number {
  const { part } = rows[from]!;
  const begins =
    from === 0 ||
    rows[from - 1]!.part !== part ||
    (rows[from - 1]!.kind === "blank" && from > 0 && rows[from - 2]?.part !== part);
  if (!begins) return 0;
  let end = from;
  while (end < rows.length && rows[end]!.part === part) end += 1;
  return total(rows.slice(from, end), heightOf);
}

function total(rows: readonly ChartRow[], heightOf: (row: ChartRow) => number): number {
  return rows.reduce((sum, row) => sum + heightOf(row), 0);
}
